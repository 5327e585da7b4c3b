import { ok, refuse, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { convert } from '../units/convert.ts'
import type { UnitOf } from '../units/unit-table.ts'
import { gasLimits } from './gas-limits.ts'
import type { GasRefusal } from './gas-refusal.ts'

/** The units that barometers and weather stations show; the first that fits is named to whoever typed another. */
export const airPressureUnits = [
  'mmHg',
  'hPa',
  'kPa',
  'inHg',
  'psi',
  'atm',
  'bar',
] as const satisfies readonly UnitOf<'pressure'>[]
export type AirPressureUnit = (typeof airPressureUnits)[number]

const { leastPressureKPa, mostPressureKPa } = gasLimits

function inKilopascals(pressure: number, unit: AirPressureUnit): number | undefined {
  const converted = convert(pressure, unit, 'kPa')
  if (!converted.ok) return undefined
  // 1.1 atm comes out as 111.45750000000001 kPa and is the limit itself
  for (const limit of [leastPressureKPa, mostPressureKPa])
    if (Math.abs(converted.value - limit) <= limit * 1e-12) return limit
  return converted.value
}

const isAirPressure = (kPa: number | undefined): boolean =>
  kPa !== undefined && kPa >= leastPressureKPa && kPa <= mostPressureKPa

/**
 * An air pressure as it was read, in kPa. A number that is no air pressure in its unit and would be one in another
 * (760 in atm, 101.3 in mmHg) is refused as such, for it is a wrong choice of unit and not a strange place.
 * 760 hPa stays undetected: it is the air at 2,400 m.
 *
 * @param input.pressure 0.5…1.1 atm in its unit
 * @returns kPa
 * @refuses not-finite · unknown-pressure-unit · pressure-looks-like-other-unit with params unit, other (one unit that
 *          fits; others may) · below-least · above-most with the limit in kPa
 * @source  benson-krause-1984 (the limits)
 */
export function readAirPressure(input: {
  pressure: number
  unit: AirPressureUnit
}): Result<number, GasRefusal> {
  const { pressure, unit } = input
  if (!airPressureUnits.includes(unit)) return refuse('unknown-pressure-unit', 'unit')
  const entered = checkNumber(pressure, { field: 'pressure', unit })
  if (!entered.ok) return entered
  const kPa = inKilopascals(pressure, unit)
  if (kPa === undefined) return refuse('not-finite', 'pressure', { unit })
  if (isAirPressure(kPa)) return ok(kPa)
  const other = airPressureUnits.find((each) => isAirPressure(inKilopascals(pressure, each)))
  if (other) return refuse('pressure-looks-like-other-unit', 'pressure', { unit, other })
  return checkNumber(kPa, { field: 'pressure', unit: 'kPa', min: leastPressureKPa, max: mostPressureKPa })
}
