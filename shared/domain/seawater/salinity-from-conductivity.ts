import { ok, refuse, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import {
  checkGaugePressure,
  checkSalinity,
  checkTemperature,
  firstRefused,
  mostSalinity,
} from './check-seawater.ts'
import {
  conductivityRatio68,
  practicalSalinity68,
  ratioToStandard,
  standardConductivityMSPerCm,
} from './practical-salinity.ts'
import type { SeawaterRefusal } from './seawater-refusal.ts'
import { temperature68 } from './temperature-68.ts'

/** The pressure up to which the scale was fitted, kPa: 10,000 dbar. */
const mostPressureKPa = 100_000

/**
 * Practical salinity (PSS-78) from a ratio of conductivities.
 *
 * The scale was fitted for 2…42 and −2…35 °C. Below 2 it goes on with a term of its own; from 35 to 40 °C it is
 * extrapolated, which whoever shows the answer has to say. It is defined for the ions of sea water: of a bath of common
 * salt or of fresh water it gives a nominal figure only.
 *
 * @param input.conductivityRatio R = C(S,t,p) / C(35,15,0), above 0
 * @param input.temperatureC      °C, ITS-90, −2…40
 * @param input.gaugePressureKPa  above that of the air, kPa, 0…100,000; 0 for a sample from a tank
 * @returns practical salinity, no unit, 0…42
 * @refuses not-finite · not-above-zero · below-least · above-most · salinity-above-scale over 42 ·
 *          salinity-below-scale where the water is too pure for the scale (below about 1.8 µS/cm at 25 °C)
 * @source  unesco-44, below 2 hill-1986 · check values pss78.01 to pss78.10
 */
export function salinityFromConductivityRatio(input: {
  conductivityRatio: number
  temperatureC: number
  gaugePressureKPa: number
}): Result<number, SeawaterRefusal> {
  const { conductivityRatio, temperatureC, gaugePressureKPa } = input
  const refused = firstRefused(
    checkNumber(conductivityRatio, { field: 'conductivityRatio', unit: 'ratio', above: 0 }),
    checkTemperature(temperatureC),
    checkGaugePressure(gaugePressureKPa, mostPressureKPa),
  )
  return refused ?? onScale(conductivityRatio, temperatureC, gaugePressureKPa, 'conductivityRatio')
}

/**
 * Practical salinity (PSS-78) from the conductivity that a meter shows without compensation, at the surface.
 *
 * A meter that compensates for temperature shows the conductivity at 25 °C: then 25 is the temperature to give, and the
 * answer is approximate. A compensated reading with the true temperature is wrong.
 *
 * @param input.conductivityMSPerCm mS/cm, above 0
 * @param input.temperatureC        °C, ITS-90, −2…40; above 35 the scale is extrapolated
 * @returns practical salinity, no unit, 0…42
 * @refuses as salinityFromConductivityRatio, naming conductivityMSPerCm
 * @source  unesco-44, below 2 hill-1986 · check values cond.01 to cond.13
 */
export function salinityFromConductivity(input: {
  conductivityMSPerCm: number
  temperatureC: number
}): Result<number, SeawaterRefusal> {
  const { conductivityMSPerCm, temperatureC } = input
  const refused = firstRefused(
    checkNumber(conductivityMSPerCm, { field: 'conductivityMSPerCm', unit: 'mS/cm', above: 0 }),
    checkTemperature(temperatureC),
  )
  if (refused) return refused
  return onScale(ratioToStandard(conductivityMSPerCm), temperatureC, 0, 'conductivityMSPerCm')
}

function onScale(
  conductivityRatio: number,
  temperatureC: number,
  gaugePressureKPa: number,
  field: string,
): Result<number, SeawaterRefusal> {
  const salinity = practicalSalinity68(conductivityRatio, temperature68(temperatureC), gaugePressureKPa / 10)
  if (salinity < 0) return refuse('salinity-below-scale', field, { limit: 0, unit: 'PSS-78' })
  // an overflow inside leaves no number, which is not at most 42 either
  if (!(salinity <= mostSalinity))
    return refuse('salinity-above-scale', field, { limit: mostSalinity, unit: 'PSS-78' })
  return ok(salinity)
}

/**
 * The ratio of conductivities that sea water of a practical salinity has.
 *
 * @param input.salinityPss78    0…42
 * @param input.temperatureC     °C, ITS-90, −2…40; above 35 the scale is extrapolated
 * @param input.gaugePressureKPa above that of the air, kPa, 0…100,000
 * @returns R = C(S,t,p) / C(35,15,0)
 * @refuses not-finite · below-least · above-most
 * @source  unesco-44, below 2 hill-1986 · check values pss78inv.01 to pss78inv.09
 */
export function conductivityRatioFromSalinity(input: {
  salinityPss78: number
  temperatureC: number
  gaugePressureKPa: number
}): Result<number, SeawaterRefusal> {
  const { salinityPss78, temperatureC, gaugePressureKPa } = input
  const refused = firstRefused(
    checkSalinity(salinityPss78),
    checkTemperature(temperatureC),
    checkGaugePressure(gaugePressureKPa, mostPressureKPa),
  )
  return refused ?? ok(conductivityRatio68(salinityPss78, temperature68(temperatureC), gaugePressureKPa / 10))
}

/**
 * What a meter without compensation shows at the surface in sea water of a practical salinity.
 *
 * @param input.salinityPss78 0…42
 * @param input.temperatureC  °C, ITS-90, −2…40; above 35 the scale is extrapolated
 * @returns R = C(S,t,0) / C(35,15,0), and 42.914 mS/cm × R
 * @refuses not-finite · below-least · above-most
 * @source  unesco-44, below 2 hill-1986 · check values pss78inv.01 to pss78inv.09, cond.10
 */
export function conductivityFromSalinity(input: {
  salinityPss78: number
  temperatureC: number
}): Result<{ conductivityRatio: number; conductivityMSPerCm: number }, SeawaterRefusal> {
  const ratio = conductivityRatioFromSalinity({ ...input, gaugePressureKPa: 0 })
  return ratio.ok
    ? ok({
        conductivityRatio: ratio.value,
        conductivityMSPerCm: ratio.value * standardConductivityMSPerCm,
      })
    : ratio
}
