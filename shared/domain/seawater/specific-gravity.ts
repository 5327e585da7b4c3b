import { ok, refuse, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { checkSalinity, checkTemperature, firstRefused, mostSalinity } from './check-seawater.ts'
import { pureWaterDensity68, seawaterDensity68 } from './seawater-density.ts'
import type { SeawaterRefusal } from './seawater-refusal.ts'
import { temperature68 } from './temperature-68.ts'

/** Between these lies what a hydrometer or a refractometer for sea water shows. */
const leastSpecificGravity = 0.995
const mostSpecificGravity = 1.035

/**
 * Whether a number given as a salinity may be a specific gravity in the wrong field: 0.99…1.05, of which 1.025 is sea
 * water. 1.0 lies among them and may be either, so it is asked about too; 0.98 and 1.06 are the salinities next to it,
 * nearer than instruments tell apart.
 *
 * @source check value sal.refuse2
 */
export function readsAsSpecificGravity(salinityPss78: number): boolean {
  return salinityPss78 >= 0.99 && salinityPss78 <= 1.05
}

/**
 * Specific gravity of sea water: its density at the temperature of the water over that of pure water at the reference
 * temperature, both at one atmosphere. Both belong to the figure: 35 is 1.0264 as 25/25 °C and 1.0266 as 20/20 °C.
 *
 * @param input.salinityPss78         0…42
 * @param input.waterTemperatureC     °C, ITS-90, −2…40
 * @param input.referenceTemperatureC °C, ITS-90, 0…40, as printed on the instrument
 * @returns a ratio
 * @refuses not-finite · below-least · above-most · specific-gravity-as-salinity from 0.99 to 1.05
 * @source  unesco-44 · check values sg.01 to sg.16
 */
export function specificGravityFromSalinity(input: {
  salinityPss78: number
  waterTemperatureC: number
  referenceTemperatureC: number
}): Result<number, SeawaterRefusal> {
  const { salinityPss78, waterTemperatureC, referenceTemperatureC } = input
  const refused = firstRefused(
    checkSalinity(salinityPss78),
    checkTemperature(waterTemperatureC, 'waterTemperatureC'),
    checkTemperature(referenceTemperatureC, 'referenceTemperatureC', 0),
  )
  if (refused) return refused
  if (readsAsSpecificGravity(salinityPss78)) return refuse('specific-gravity-as-salinity', 'salinityPss78')
  const density = seawaterDensity68(salinityPss78, temperature68(waterTemperatureC))
  return ok(density / pureWaterDensity68(temperature68(referenceTemperatureC)))
}

/**
 * Practical salinity from a specific gravity, by halving: the density rises with the salinity at every temperature here.
 *
 * The reference matters: 1.025 is 33.2 as 25/25 °C, 32.9 as 20/20 °C and 37.2 as 25 °C against water at 4 °C. A
 * refractometer made for brine of common salt reads differently again.
 *
 * @param input.specificGravity       0.995…1.035
 * @param input.waterTemperatureC     °C, ITS-90, −2…40
 * @param input.referenceTemperatureC °C, ITS-90, 0…40, as printed on the instrument
 * @returns practical salinity, no unit, 0…42
 * @refuses not-finite · below-least · above-most · salinity-as-specific-gravity from 2 to 42 ·
 *          lighter-than-fresh-water · salinity-above-scale over 42
 * @source  unesco-44 · check values sginv.01 to sginv.08
 */
export function salinityFromSpecificGravity(input: {
  specificGravity: number
  waterTemperatureC: number
  referenceTemperatureC: number
}): Result<number, SeawaterRefusal> {
  const { specificGravity, waterTemperatureC, referenceTemperatureC } = input
  const field = 'specificGravity'
  if (typeof specificGravity === 'number' && specificGravity >= 2 && specificGravity <= mostSalinity)
    return refuse('salinity-as-specific-gravity', field)
  const refused = firstRefused(
    checkNumber(specificGravity, { field, unit: 'SG', min: leastSpecificGravity, max: mostSpecificGravity }),
    checkTemperature(waterTemperatureC, 'waterTemperatureC'),
    checkTemperature(referenceTemperatureC, 'referenceTemperatureC', 0),
  )
  if (refused) return refused
  const density = specificGravity * pureWaterDensity68(temperature68(referenceTemperatureC))
  return salinityOfDensity(density, temperature68(waterTemperatureC), field)
}

function salinityOfDensity(
  density: number,
  temperature68C: number,
  field: string,
): Result<number, SeawaterRefusal> {
  // the last digit of a product: a gravity computed from salinity 0 or 42 comes back as 0 or 42
  const rounding = 1e-9
  if (density < seawaterDensity68(0, temperature68C) - rounding)
    return refuse('lighter-than-fresh-water', field)
  if (density <= seawaterDensity68(0, temperature68C) + rounding) return ok(0)
  if (density > seawaterDensity68(mostSalinity, temperature68C) + rounding)
    return refuse('salinity-above-scale', field, { limit: mostSalinity, unit: 'PSS-78' })
  let [low, high] = [0, mostSalinity]
  for (let halving = 0; halving < 60; halving += 1) {
    const middle = (low + high) / 2
    if (seawaterDensity68(middle, temperature68C) < density) low = middle
    else high = middle
  }
  return ok(high)
}
