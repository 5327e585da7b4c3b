import { convert } from '../units/convert.ts'
import type { UnitOf } from '../units/unit-table.ts'
import { unitOf } from '../units/unit-of.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'
import { fixedPlaces, groupThousands, noBreakSpace, plusMinus, withoutTrailingZeros } from './number-text.ts'

/**
 * A volume of water to the first digit of its error: 2,217.6 L with 2 % is "2,220 L ± 2 %", since the error of 44 L
 * has its first digit in the tens. The unrounded figure stands only in the working.
 *
 * @param litres       volume, finite
 * @param errorPercent relative error, 0…100 %; 0 draws one decimal place and no error
 * @throws RangeError when either is not a finite number, or the error is negative
 * @source safe writing, project rule: computed amounts are rounded to what their error supports
 */
export function formatVolumeWithError(
  litres: number,
  errorPercent: number,
  unit: UnitOf<'volume'> = 'L',
): FormattedQuantity {
  const converted = convert(litres, 'L', unit)
  if (!converted.ok || !Number.isFinite(errorPercent) || errorPercent < 0)
    throw new RangeError('a volume with an error needs two finite numbers')
  const symbol = unitOf(unit).symbol
  const error = Math.abs(converted.value) * (errorPercent / 100)
  const places = error === 0 ? 1 : -firstDigitExponent(error)
  const number = groupThousands(fixedPlaces(converted.value, places))
  const volume = `${number}${noBreakSpace}${symbol}`
  const text =
    errorPercent === 0
      ? volume
      : `${volume}${noBreakSpace}${plusMinus}${noBreakSpace}${twoDigits(errorPercent)}${noBreakSpace}%`
  return { kind: 'volume', text: text.replaceAll(' ', noBreakSpace), number, symbol, unit }
}

/** 2.345 % is drawn as 2.3, 10.4 as 10, 0.5 as 0.5. */
function twoDigits(percent: number): string {
  return withoutTrailingZeros(fixedPlaces(percent, Math.max(0, 1 - firstDigitExponent(percent))))
}

/** The power of ten of the first digit, from the digits themselves: a logarithm of 1000 may come out as 2.9999999999999996. */
function firstDigitExponent(value: number): number {
  return Number(value.toExponential().split('e')[1])
}
