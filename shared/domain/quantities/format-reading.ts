import { convert } from '../units/convert.ts'
import type { Quantity } from '../units/quantity.ts'
import type { UnitCode } from '../units/unit-table.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'
import { fixedPlaces, finiteDecimal, groupThousands } from './number-text.ts'
import { decimalText } from './decimal.ts'
import { withUnit } from './with-unit.ts'

/**
 * A measured value with the digits of its instrument: 5.80 mg/L stays 5.80 mg/L, pH 7.0 stays pH 7.0.
 *
 * @param reading as entered; digits with a decimal point
 * @param inUnit  the unit the reader prefers; the converted value gets the places that the instrument's step is worth
 *                there (25.6 °C, read to 0.1 °C, is 78.1 °F)
 * @throws RangeError when the digits are no number, or the units have different dimensions
 */
export function formatReading(reading: Quantity, inUnit: UnitCode = reading.unit): FormattedQuantity {
  const entered = finiteDecimal(reading.value)
  if (inUnit === reading.unit) return withUnit('reading', groupThousands(decimalText(entered)), inUnit)
  const value = converted(Number(reading.value), reading.unit, inUnit)
  const step = 10 ** -entered.scale
  const stepThere = Math.abs(converted(Number(reading.value) + step, reading.unit, inUnit) - value)
  const places = Math.max(0, Math.ceil(-Math.log10(stepThere) - 1e-9))
  return withUnit('reading', groupThousands(fixedPlaces(value, places)), inUnit)
}

function converted(value: number, from: UnitCode, to: UnitCode): number {
  const result = convert(value, from, to)
  if (!result.ok) throw new RangeError(`${from} cannot be drawn in ${to}: ${result.refusal.code}`)
  return result.value
}
