import { ok, refuse, type Result } from '../result.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { waterLimits } from '../water/water-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'

/**
 * The first line of a bath: a volume of water that was worked out before, unrounded.
 *
 * @param litres above zero, at most 100,000,000
 * @refuses not-finite, not-above-zero, above-most (field given)
 */
export function litresLine(
  litres: number,
  code: 'net-volume-used' | 'changed-volume-used' | 'stock-volume-used',
  field: string,
): Result<WorkingLine, DoseRefusal> {
  if (typeof litres !== 'number' || !Number.isFinite(litres)) return refuse('not-finite', field)
  if (litres <= 0) return refuse('not-above-zero', field, { limit: '0', unit: 'L' })
  const most = waterLimits.mostLitres
  if (litres > most) return refuse('above-most', field, { limit: most, unit: 'L' })
  return ok({
    key: code,
    code,
    params: {},
    expression: valueTerm(litres, 'L'),
    value: litres,
    unit: 'L',
    rests: [],
  })
}
