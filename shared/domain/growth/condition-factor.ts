import { refuse, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { convert } from '../units/convert.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { lengthRules, weightRules } from './growth-limits.ts'
import type { GrowthRefusal } from './growth-refusal.ts'

/**
 * Condition factor of Fulton: 100 W ÷ L³ in grams and centimetres. Comparable only within one species and one kind of length.
 *
 * @param input.weightG  above 0, at most 20,000,000
 * @param input.lengthCm above 0, at most 2,500
 * @returns K, about 1 for a trout
 * @refuses not-finite · not-above-zero, above-most
 * @source  froese-2006 · check values lw.05, lw.06
 */
export function fultonConditionFactor(input: {
  weightG: number
  lengthCm: number
}): Result<number, GrowthRefusal> {
  const { weightG, lengthCm } = input
  const refused = checkNumbers([
    [weightG, weightRules],
    [lengthCm, lengthRules],
  ])
  return refused ?? finiteOrRefuse((100 * weightG) / lengthCm ** 3, 'lengthCm')
}

/**
 * K from a condition factor in English units, C = W ÷ L³ in pounds and inches. Tables print C times ten million: 4055e−7.
 *
 * @param input.cLbPerIn3 above 0, at most 1; about 0.0004
 * @returns K = 100 C in g/cm³, which is 2767.99 C
 * @refuses not-finite · not-above-zero, above-most
 * @source  nist-sp-811: 453.59237 g ÷ 16.387064 cm³ · check value lw.08
 */
export function conditionFactorFromEnglish(input: { cLbPerIn3: number }): Result<number, GrowthRefusal> {
  const { cLbPerIn3 } = input
  const checked = checkNumber(cLbPerIn3, { field: 'cLbPerIn3', unit: 'ratio', above: 0, max: 1 })
  if (!checked.ok) return checked
  const grams = convert(cLbPerIn3, 'lb', 'g')
  const cubicCentimetres = convert(1, 'in3', 'mL')
  if (!grams.ok || !cubicCentimetres.ok) return refuse('not-finite', 'cLbPerIn3')
  return finiteOrRefuse((100 * grams.value) / cubicCentimetres.value, 'cLbPerIn3')
}
