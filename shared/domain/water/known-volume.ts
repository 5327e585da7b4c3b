import { ok, refuse, type Result } from '../result.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { VolumeMethod } from './volume-sheet.ts'
import { isErrorPercent } from './is-error-percent.ts'
import { waterLimits } from './water-limits.ts'

/**
 * A determination that gives net water in one step (meter, dilution, statement): its last line is the net volume, and
 * its error is the stated one.
 *
 * @refuses error-outside-range · below-least, above-most when the volume is no volume of a tank (field netVolume)
 */
export function knownVolume(
  method: VolumeMethod,
  lines: WorkingLine[],
  litres: number,
  errorPercent: number,
): Result<VolumeDetermination, VolumeRefusal> {
  if (!isErrorPercent(errorPercent)) return refuse('error-outside-range', 'errorPercent')
  const { leastLitres, mostLitres } = waterLimits
  if (!(litres >= leastLitres)) return refuse('below-least', 'netVolume', { limit: leastLitres, unit: 'L' })
  if (litres > mostLitres) return refuse('above-most', 'netVolume', { limit: mostLitres, unit: 'L' })
  const errorLitres = (litres * errorPercent) / 100
  const error: WorkingLine = {
    key: 'volume-error',
    code: 'volume-error',
    params: {},
    expression: `${valueTerm(litres, 'L')} * ${errorPercent} / 100 to L`,
    value: errorLitres,
    unit: 'L',
    rests: lines.slice(-1).map((line) => line.key),
  }
  return ok({
    method,
    grossLitres: litres,
    displacedLitres: 0,
    netLitres: litres,
    errorLitres,
    errorPercent,
    displacement: 'not-applicable',
    working: [...lines, error],
  })
}
