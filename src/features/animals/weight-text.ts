import type { NewestWeight } from '../../../shared/contracts/animal-primitives.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import type { FormattedQuantity } from '../../../shared/domain/quantities/formatted-quantity.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import { isUnitCode } from '../../../shared/domain/units/is-unit-code.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import type { UnitOf } from '../../../shared/domain/units/unit-table.ts'

export type MassUnit = UnitOf<'mass'>

const isMass = (code: unknown): code is MassUnit => isUnitCode(code) && unitOf(code).dimension === 'mass'
const isMetric = (unit: MassUnit) => unit !== 'lb' && unit !== 'oz_av'

/**
 * The unit that a person reads a weight in: grams stay grams and kilograms kilograms, since a preference for kilograms
 * does not mean a seahorse of 0.0112 kg; pounds are converted.
 */
export function shownMassUnit(entered: string, preferred: string | undefined): MassUnit {
  const unit = isMass(entered) ? entered : 'kg'
  if (!isMass(preferred)) return unit
  return isMetric(preferred) && isMetric(unit) ? unit : preferred
}

/** What lay on the balance, with the digits of the balance. */
export function enteredWeight(
  weight: Pick<NewestWeight, 'value' | 'unit'>,
  preferred?: string,
): FormattedQuantity {
  const unit = isMass(weight.unit) ? weight.unit : 'kg'
  return formatReading({ value: weight.value, unit }, shownMassUnit(weight.unit, preferred))
}

/** The weight of one animal: as entered, or the mean of those weighed together to the digits that it is worth. */
export function weightOfOne(
  weight: Pick<NewestWeight, 'value' | 'unit' | 'weightKg' | 'animalsWeighed'>,
  preferred?: string,
): FormattedQuantity {
  if (weight.animalsWeighed === 1) return enteredWeight(weight, preferred)
  return massText(weight.weightKg, shownMassUnit(weight.unit, preferred))
}

/** A worked-out mass to three digits, in a unit. */
export function massText(kg: number, unit: MassUnit): FormattedQuantity {
  const converted = convert(kg, 'kg', unit)
  const value = converted.ok ? converted.value : kg
  return formatReading({ value: plainDigits(value, 3), unit: converted.ok ? unit : 'kg' })
}

/** A number to so many digits, never with an exponent. */
export function plainDigits(value: number, digits: number): string {
  const places = Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(value) || 1)))
  return value.toFixed(Math.min(places, 12))
}

/** A band of plausible weights as it was entered: "10 to 100 kg". */
export function bandText(
  band: { low: string; high: string; unit: string },
  between: (p: { low: string; high: string }) => string,
): string {
  const unit = isMass(band.unit) ? band.unit : 'kg'
  return between({
    low: formatReading({ value: band.low, unit }).number,
    high: formatReading({ value: band.high, unit }).text,
  })
}
