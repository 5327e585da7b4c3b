import type { WorkingCode } from '../working/working-code.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'

const litresPerCubicMetre = 1000

/**
 * The volume of a shape that takes one line of working.
 *
 * @param cubicMetres the same arithmetic as the expression, in metres
 */
export function oneLineVolume(
  place: ShapePlace,
  code: WorkingCode,
  expression: string,
  cubicMetres: number,
): ShapeVolume {
  const litres = cubicMetres * litresPerCubicMetre
  const line = { key: place.key, code, params: place.params, expression: `${expression} to L`, value: litres }
  return { litres, lines: [{ ...line, unit: 'L', rests: [] }] }
}
