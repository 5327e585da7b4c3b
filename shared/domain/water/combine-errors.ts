import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'

/** A part of a volume, added or subtracted, with the relative error of its own measurement. */
export interface PartError {
  key: string
  litres: number
  errorPercent: number
  /**
   * How much of it counts, in percent; all of it unless told. Of tanks of which a fifth is rock, four fifths are water, and
   * an error of the tanks is one of that water.
   */
  countedPercent?: number
}

/**
 * The error of a volume that is a sum of separately measured parts.
 *
 * Each part's error in litres is its volume × its relative error. They are combined as the root of the sum of their
 * squares, since parts measured one by one do not all err to the same side: a tank of 1,958 L known to 2 % (39 L) and a
 * sump of 264 L known to 5 % (13 L) are together known to √(39² + 13²) = 41 L, 1.8 %. A subtracted part errs like an
 * added one. A fault common to all parts (a stretched tape) is not in this; it belongs into each part's own figure.
 *
 * @param netLitres what the error is relative to, above zero
 * @returns the error in litres and in percent, with a line of working for each
 * @source  jcgm-100
 */
export function combineErrors(
  parts: readonly PartError[],
  netLitres: number,
): { errorLitres: number; errorPercent: number; lines: WorkingLine[] } {
  const uncertain = parts.filter((part) => part.errorPercent > 0 && part.litres > 0)
  const each = uncertain.map(
    (part) => (((part.litres * part.errorPercent) / 100) * (part.countedPercent ?? 100)) / 100,
  )
  const errorLitres = Math.sqrt(each.reduce((sum, litres) => sum + litres ** 2, 0))
  const errorPercent = (errorLitres / netLitres) * 100
  const squares = uncertain.map((part) => {
    const counted = part.countedPercent === undefined ? '' : ` * ${String(part.countedPercent)} / 100`
    return `(${valueTerm(part.litres, 'L')} * ${part.errorPercent} / 100${counted})^2`
  })
  const lines: WorkingLine[] = [
    {
      key: 'volume-error',
      code: 'volume-error',
      params: {},
      expression: squares.length === 0 ? '0 L' : `sqrt(${squares.join(' + ')}) to L`,
      value: errorLitres,
      unit: 'L',
      rests: uncertain.map((part) => part.key),
    },
    {
      key: 'volume-error-percent',
      code: 'volume-error-percent',
      params: {},
      expression: `${valueTerm(errorLitres, 'L')} / (${valueTerm(netLitres, 'L')}) * 100`,
      value: errorPercent,
      unit: 'percent',
      rests: ['volume-error', 'net-volume'],
    },
  ]
  return { errorLitres, errorPercent, lines }
}
