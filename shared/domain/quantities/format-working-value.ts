import { convert } from '../units/convert.ts'
import { unitOf } from '../units/unit-of.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { decimalText } from './decimal.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'
import { finiteDecimal, fixedPlaces, groupThousands, withoutTrailingZeros } from './number-text.ts'
import { withUnit } from './with-unit.ts'

const significantDigits = 4
const smallestInTenths = 10

/**
 * The answer of a working line, unrounded for practical purposes: a volume of water to a tenth of a litre (smaller than
 * 10 L to four significant digits), everything else to four significant digits and at least one decimal place, without
 * trailing zeros: 1,958.4 L, 110.9 mg, 0.4357 g, 25.45 %.
 *
 * @throws RangeError when the line's value is not a finite number
 */
export function formatWorkingValue(
  line: Pick<WorkingLine, 'value' | 'unit'> & { code: string },
): FormattedQuantity {
  const water = line.code.startsWith('water-') || waterCodes.has(line.code)
  if (water && unitOf(line.unit).dimension === 'volume') {
    const litres = convert(line.value, line.unit, 'L')
    if (litres.ok && Math.abs(litres.value) >= smallestInTenths)
      return withUnit('volume', groupThousands(fixedPlaces(line.value, 1)), line.unit)
  }
  return withUnit(water ? 'volume' : 'dose', groupThousands(significant(line.value)), line.unit)
}

const waterCodes = new Set<string>([
  'gross-volume',
  'displaced-stated',
  'displaced-share',
  'net-volume',
  'net-volume-used',
  'changed-volume-used',
  'flow-volume',
  'volume-error',
  'volume-error-percent',
  'segment-area',
  'bow-radius',
  'bow-segment',
])

function significant(value: number): string {
  const exact = finiteDecimal(value)
  if (exact.digits === 0n) return '0'
  const exponent = Number(value.toExponential(significantDigits).split('e')[1])
  const places = Math.max(1, significantDigits - 1 - exponent)
  return withoutTrailingZeros(fixedPlaces(decimalText(exact), places))
}
