import { decimalOf, decimalText, type Decimal } from './decimal.ts'

export const noBreakSpace = '\u00a0'
export const minusSign = '\u2212'
export const plusMinus = '\u00b1'

/** Digits in groups of three from 1,000 on, with a true minus; the fraction is left alone. */
export function groupThousands(digits: string): string {
  const [whole = '', fraction] = digits.replace('-', '').split('.')
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, ',')
  return `${digits.startsWith('-') ? minusSign : ''}${grouped}${fraction === undefined ? '' : `.${fraction}`}`
}

/** Digits without trailing zeros after the point, and never "-0". */
export function withoutTrailingZeros(digits: string): string {
  const shorter = digits.includes('.') ? digits.replace(/\.?0+$/, '') : digits
  return shorter === '-0' ? '0' : shorter
}

/**
 * A number rounded to decimal places, halves up in decimal; negative places round to tens, hundreds …
 *
 * @throws RangeError when the value is not a finite number: nothing may ever be drawn as "NaN"
 */
export function fixedPlaces(value: number | string, places: number): string {
  const decimal = finiteDecimal(value)
  const shift = decimal.scale - places
  if (shift <= 0)
    return decimalText({ digits: decimal.digits * 10n ** BigInt(-shift), scale: Math.max(places, 0) })
  const divisor = 10n ** BigInt(shift)
  const negative = decimal.digits < 0n
  const size = negative ? -decimal.digits : decimal.digits
  const rounded = (2n * size + divisor) / (2n * divisor)
  const digits = (negative ? -rounded : rounded) * 10n ** BigInt(Math.max(-places, 0))
  return decimalText({ digits, scale: Math.max(places, 0) })
}

/** The exact decimal of what is to be drawn. @throws RangeError when there is none */
export function finiteDecimal(value: number | string): Decimal {
  const decimal = decimalOf(value)
  if (!decimal) throw new RangeError(`not a number that can be drawn: ${String(value)}`)
  return decimal
}
