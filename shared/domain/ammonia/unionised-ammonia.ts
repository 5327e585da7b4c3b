import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'
import { freeScalePk, freshWaterPk, totalScalePk } from './ammonium-pk.ts'

export type AmmoniaRefusal = LimitRefusal | 'not-finite' | 'ph-scale-not-stated'

/** From this salinity on the water is brackish, and the scale of the pH matters. */
export const brackishFrom = 0.5

/**
 * Which constant a pH goes with. A meter calibrated with ordinary (NBS) buffers reads within a few hundredths of the free
 * scale in sea water, and 0.13 to 0.15 above the total scale.
 */
export type PhCalibration = 'nbs' | 'total'

export interface AmmoniaWater {
  /** 4…11. */
  ph: number
  /** What the pH was calibrated on; not needed in fresh water. */
  calibration?: PhCalibration | undefined
  /** −2…40 °C; in fresh water from 0. */
  temperatureC: number
  /** 0…40. */
  salinityPss78: number
}

/** The share that is un-ionised, with the constant that gave it. */
export interface UnionisedAmmonia {
  /** NH3 of all ammonia, 0…1. */
  fraction: number
  pk: number
  constant: 'emerson' | 'free' | 'total'
}

/**
 * The un-ionised share of ammonia, 1 ÷ (1 + 10^(pK − pH)): Emerson in fresh water, Clegg and Whitfield from salinity 0.5 on,
 * by the constant of the scale that the pH was calibrated on. At the seam of 0.5 the free-scale share lies within 0.1 % of
 * Emerson's.
 *
 * @refuses not-finite · below-least, above-most (ph, temperatureC, salinityPss78) · ph-scale-not-stated (calibration) in
 *          brackish and sea water: the two constants differ by a quarter
 * @source  emerson-1975 · clegg-whitfield-1995 · ph-scale-rule · check values uia.*
 */
export function unionisedAmmonia(water: AmmoniaWater): Result<UnionisedAmmonia, AmmoniaRefusal> {
  const { ph, calibration, temperatureC, salinityPss78 } = water
  const refused = checkNumbers([
    [ph, { field: 'ph', unit: 'pH', min: 4, max: 11 }],
    [salinityPss78, { field: 'salinityPss78', unit: 'PSS-78', min: 0, max: 40 }],
    [
      temperatureC,
      { field: 'temperatureC', unit: 'degC', min: salinityPss78 < brackishFrom ? 0 : -2, max: 40 },
    ],
  ])
  if (refused) return refused
  const share = (pk: number) => 1 / (1 + 10 ** (pk - ph))
  if (salinityPss78 < brackishFrom) {
    const pk = freshWaterPk(temperatureC)
    return ok({ fraction: share(pk), pk, constant: 'emerson' })
  }
  if (calibration !== 'nbs' && calibration !== 'total') return refuse('ph-scale-not-stated', 'calibration')
  const constant = calibration === 'nbs' ? 'free' : 'total'
  const pk = (constant === 'free' ? freeScalePk : totalScalePk)(temperatureC, salinityPss78)
  return ok({ fraction: share(pk), pk, constant })
}
