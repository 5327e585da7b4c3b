import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { NumberRules } from '../units/check-number.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'
import {
  ammoniaSalinityRules,
  ammoniaTemperatureRules,
  freeScalePk,
  freshWaterPk,
  totalScalePk,
} from './ammonium-pk.ts'

export type AmmoniaRefusal = LimitRefusal | 'not-finite' | 'ph-scale-not-stated'

/** Un-ionised ammonia, as nitrogen, above which fish suffer. @source treatment-practice, from memory */
export const harmfulNMgPerL = 0.05

/** From this salinity on the water is brackish, and the scale of the pH matters. */
export const brackishFrom = 0.5

/**
 * Which constant a pH goes with. A meter calibrated with ordinary (NBS) buffers reads within a few hundredths of the free
 * scale in sea water, and 0.13 to 0.15 above the total scale. Of a pH whose calibration nobody knows the free scale is
 * taken, as most probes are calibrated so; the total scale is then the cautious bound, to be asked for beside it.
 *
 * @source ph-scale-rule, from memory
 */
export const phCalibrations = ['nbs', 'total', 'unknown'] as const
export type PhCalibration = (typeof phCalibrations)[number]

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

const phRules: NumberRules = { field: 'ph', unit: 'pH', min: 4, max: 11 }
const pkRules: NumberRules = { field: 'pk', unit: 'ratio', min: 7, max: 12 }

/**
 * The un-ionised share at a constant: 1 ÷ (1 + 10^(pK − pH)).
 *
 * @param input.pk 7…12, on the scale of the pH
 * @param input.ph 4…11
 * @returns a fraction, 0…1
 * @refuses not-finite · below-least, above-most
 * @source  emerson-1975
 */
export function unionisedShare(input: {
  pk: number
  ph: number
}): Result<number, LimitRefusal | 'not-finite'> {
  const refused = checkNumbers([
    [input.ph, phRules],
    [input.pk, pkRules],
  ])
  return refused ?? ok(1 / (1 + 10 ** (input.pk - input.ph)))
}

/**
 * The un-ionised share of ammonia: Emerson in fresh water, Clegg and Whitfield from salinity 0.5 on, by the constant of the
 * scale that the pH was calibrated on. At the seam of 0.5 the free-scale share lies between 0.02 % below and 0.12 % above
 * Emerson's.
 *
 * @refuses not-finite · below-least, above-most (ph, temperatureC, salinityPss78) · ph-scale-not-stated (calibration) in
 *          brackish and sea water: the two constants differ by a quarter
 * @source  emerson-1975 · clegg-whitfield-1995 · ph-scale-rule · check values uia.*
 */
export function unionisedAmmonia(water: AmmoniaWater): Result<UnionisedAmmonia, AmmoniaRefusal> {
  const { ph, calibration, temperatureC, salinityPss78 } = water
  const refused = checkNumbers([
    [ph, phRules],
    [salinityPss78, ammoniaSalinityRules],
    [temperatureC, ammoniaTemperatureRules(salinityPss78 < brackishFrom ? 0 : -2)],
  ])
  if (refused) return refused
  if (salinityPss78 < brackishFrom) return shareBy('emerson', freshWaterPk({ temperatureC }), ph)
  if (!phCalibrations.some((each) => each === calibration))
    return refuse('ph-scale-not-stated', 'calibration')
  const salt = { temperatureC, salinityPss78 }
  return calibration === 'total'
    ? shareBy('total', totalScalePk(salt), ph)
    : shareBy('free', freeScalePk(salt), ph)
}

function shareBy(
  constant: UnionisedAmmonia['constant'],
  pk: Result<number, LimitRefusal | 'not-finite'>,
  ph: number,
): Result<UnionisedAmmonia, AmmoniaRefusal> {
  if (!pk.ok) return pk
  const fraction = unionisedShare({ pk: pk.value, ph })
  return fraction.ok ? ok({ fraction: fraction.value, pk: pk.value, constant }) : fraction
}

/**
 * Un-ionised ammonia in a water, counted as nitrogen: share × total ammonia as nitrogen.
 *
 * @param water.totalNMgPerL 0…1,000 mg/L as N
 * @returns mg/L as N, with the share
 * @refuses as unionisedAmmonia · below-least, above-most (totalNMgPerL)
 * @source  emerson-1975 · check values uia.fw15, uia.fw16
 */
export function unionisedConcentration(
  water: AmmoniaWater & { totalNMgPerL: number },
): Result<UnionisedAmmonia & { nMgPerL: number }, AmmoniaRefusal> {
  const { totalNMgPerL } = water
  const refused = checkNumbers([[totalNMgPerL, { field: 'totalNMgPerL', unit: 'mg/L', min: 0, max: 1000 }]])
  if (refused) return refused
  const share = unionisedAmmonia(water)
  return share.ok ? ok({ ...share.value, nMgPerL: share.value.fraction * totalNMgPerL }) : share
}
