import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { NumberRules } from '../units/check-number.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'

const zeroCelsiusK = 273.15

type Checked = Result<number, LimitRefusal | 'not-finite'>

/** Where both constants are asked: above 40 °C nothing of a collection lives. */
export const ammoniaTemperatureRules = (leastC: number): NumberRules => ({
  field: 'temperatureC',
  unit: 'degC',
  min: leastC,
  max: 40,
})
export const ammoniaSalinityRules: NumberRules = {
  field: 'salinityPss78',
  unit: 'PSS-78',
  min: 0,
  max: 40,
}

/**
 * pKa of ammonium in fresh water: 0.09018 + 2729.92 ÷ T.
 *
 * @param input.temperatureC °C, 0…40; the source goes to 50
 * @refuses not-finite · below-least, above-most
 * @source  emerson-1975 · check value uia.fw17. One help page prints 2727.92: a misprint
 */
export function freshWaterPk({ temperatureC }: { temperatureC: number }): Checked {
  const refused = checkNumbers([[temperatureC, ammoniaTemperatureRules(0)]])
  return refused ?? ok(0.09018 + 2729.92 / (temperatureC + zeroCelsiusK))
}

/** Water in which the scale of the pH matters. */
export interface SaltWater {
  /** °C, −2…40. */
  temperatureC: number
  /** 0…40. */
  salinityPss78: number
}

const checkSaltWater = ({ temperatureC, salinityPss78 }: SaltWater) =>
  checkNumbers([
    [temperatureC, ammoniaTemperatureRules(-2)],
    [salinityPss78, ammoniaSalinityRules],
  ])

/** Both scales at salinity 0, where they are one. */
const pkAtZero = (t: number): number => 9.244605 - 2729.33 * (1 / 298.15 - 1 / t)

/**
 * Stoichiometric pK of ammonium in brackish and sea water on the free scale of hydrogen ions.
 *
 * @refuses not-finite · below-least, above-most (temperatureC, salinityPss78)
 * @source  clegg-whitfield-1995 · check values uia.cw05 to uia.cw08
 */
export function freeScalePk(water: SaltWater): Checked {
  const refused = checkSaltWater(water)
  if (refused) return refused
  const t = water.temperatureC + zeroCelsiusK
  const s = water.salinityPss78
  return ok(
    pkAtZero(t) +
      (0.0500616 - 9.412696 / t - 2.029559e-7 * t ** 2) * s ** 0.5 +
      (-0.0142372 + 1.46041e-5 * t + 3.730005 / t) * s +
      (7.14045e-5 - 0.0229021 / t) * s ** 2 +
      (-5.521278e-7 + 1.95413e-4 / t) * s ** 3,
  )
}

/**
 * Stoichiometric pK of ammonium in brackish and sea water on the total scale of hydrogen ions.
 *
 * @refuses as freeScalePk
 * @source  clegg-whitfield-1995 · check values uia.cw01 to uia.cw04
 */
export function totalScalePk(water: SaltWater): Checked {
  const refused = checkSaltWater(water)
  if (refused) return refused
  const t = water.temperatureC + zeroCelsiusK
  const s = water.salinityPss78
  return ok(
    pkAtZero(t) +
      (0.04203362 - 11.24742 / t) * s ** 0.25 +
      (-13.6416 + 1.176949 * t ** 0.5 - 0.02860785 * t + 545.4834 / t) * s ** 0.5 +
      (-0.1462507 + 0.0090226468 * t ** 0.5 - 0.0001471361 * t + 10.5425 / t) * s ** 1.5 +
      (0.004669309 - 0.0001691742 * t ** 0.5 - 0.5677934 / t) * s ** 2 +
      (-2.354039e-5 + 0.009698623 / t) * s ** 2.5,
  )
}
