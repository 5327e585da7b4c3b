import type { UnitCode } from '../units/unit-table.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'
import { decimalText } from './decimal.ts'
import { finiteDecimal, fixedPlaces, groupThousands, withoutTrailingZeros } from './number-text.ts'
import { withUnit } from './with-unit.ts'

/**
 * An amount or strength of a drug, written so that nobody misreads it: no trailing zero (never 1.0 mg), a leading zero
 * (never .5 mg), thousands separated, a no-break space before the unit, micrograms and units spelled.
 *
 * @param value  digits as entered or rounded ("0.440"), or a finite number
 * @param places most decimal places to draw; without it all that the value has (of a number at most 12 digits)
 * @returns a quantity of kind `dose`: 0.44 g, 100,000 units, 250 µL/L
 * @throws RangeError when the value is not a finite number
 * @source ismp-dose-designations
 */
export function formatDose(value: string | number, unit: UnitCode, places?: number): FormattedQuantity {
  const digits = places === undefined ? decimalText(finiteDecimal(value)) : fixedPlaces(value, places)
  return withUnit('dose', groupThousands(withoutTrailingZeros(digits)), unit)
}
