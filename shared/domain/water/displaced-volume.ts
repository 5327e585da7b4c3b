import { ok, refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { PartError } from './combine-errors.ts'
import { isErrorPercent } from './is-error-percent.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { Displacement } from './volume-sheet.ts'
import { waterLimits } from './water-limits.ts'

/**
 * What stands in the tanks and takes the place of water.
 *
 * @param displacement measured by volume, a guessed share of the tanks, or absent: nothing is subtracted
 * @param tankLitres   volume of tanks and vessels, without sumps and pipes
 * @param parts        the parts with their volumes, for the terms of a share
 * @param tankKeys     keys of the parts that a share is of
 * @refuses as parseQuantity · error-outside-range · displaces-too-much above 95 % of the tanks, field displacement
 * @source  check value geom.23; the limit of 95 % is project-default
 */
export function displacedVolume(
  displacement: Displacement | undefined,
  tankLitres: number,
  parts: readonly PartError[],
  tankKeys: readonly string[],
): Result<{ litres: number; lines: WorkingLine[]; error?: PartError }, VolumeRefusal> {
  if (!displacement) return ok({ litres: 0, lines: [] })
  const { errorPercent } = displacement
  if (!isErrorPercent(errorPercent)) return refuse('error-outside-range', 'displacement.errorPercent')
  const field = 'displacement'
  const key = 'displaced'
  const most = waterLimits.mostDisplacedPercent
  const tooMuch = () => refuse('displaces-too-much', field, { most })
  const line = (code: WorkingLine['code'], expression: string, litres: number, rests: string[]) => ({
    litres,
    lines: [
      { key, code, params: {}, expression: `${expression} to L`, value: litres, unit: 'L' as const, rests },
    ],
    error: { key, litres, errorPercent },
  })

  if (displacement.by === 'volume') {
    const volume = parseQuantity(displacement.volume, { dimension: 'volume', min: 0, field })
    if (!volume.ok) return volume
    const litres = volume.value.value
    if (litres * 100 > tankLitres * most) return tooMuch()
    return ok(line('displaced-stated', enteredTerm(volume.value), litres, []))
  }
  const share = parseQuantity(displacement.share, { dimension: 'percentage', min: 0, field })
  if (!share.ok) return share
  if (share.value.value > most || tankLitres === 0) return tooMuch()
  const terms = parts.filter((part) => tankKeys.includes(part.key)).map((part) => valueTerm(part.litres, 'L'))
  const expression = `${enteredTerm(share.value)} / 100 * (${terms.join(' + ')})`
  return ok(line('displaced-share', expression, (share.value.value / 100) * tankLitres, [...tankKeys]))
}
