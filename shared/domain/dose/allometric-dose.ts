import type { Result } from '../result.ts'
import { ok, refuse } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'

/** A dose carried from one body mass to another. */
export interface AllometricDose {
  /** For the whole animal. */
  doseMg: number
  mgPerKg: number
}

/**
 * A dose scaled by body mass: dose × (mass ÷ reference mass) ^ exponent for the whole animal. With the usual exponent of 0.75
 * the dose for a kilogram falls with the fourth root of the mass.
 *
 * For information only. It knows nothing of the species, the temperature of the animal, the route or the drug; where animals
 * take up or lose a drug in another way it is wrong by any factor. It never fills a dose, and no order rests on it.
 *
 * @param input.referenceDoseMgPerKg in the animal that it is known of, above 0, at most 10,000
 * @param input.referenceWeightKg    of that animal, above 0, at most 20,000
 * @param input.targetWeightKg       above 0, at most 20,000
 * @param input.exponent             0.5…1; 0.75 is usual, and 1 is no scaling at all
 * @refuses not-finite · not-above-zero, below-least, above-most
 * @source  allometric-scaling, from memory · limits: project-default · check values lw.10, lw.11
 */
export function allometricDose(input: {
  referenceDoseMgPerKg: number
  referenceWeightKg: number
  targetWeightKg: number
  exponent: number
}): Result<AllometricDose, LimitRefusal | 'not-finite'> {
  const { referenceDoseMgPerKg, referenceWeightKg, targetWeightKg, exponent } = input
  const refused = checkNumbers([
    [referenceDoseMgPerKg, { field: 'referenceDoseMgPerKg', unit: 'mg/kg', above: 0, max: 10_000 }],
    [referenceWeightKg, { field: 'referenceWeightKg', unit: 'kg', above: 0, max: 20_000 }],
    [targetWeightKg, { field: 'targetWeightKg', unit: 'kg', above: 0, max: 20_000 }],
    [exponent, { field: 'exponent', unit: 'ratio', min: 0.5, max: 1 }],
  ])
  if (refused) return refused
  const referenceMg = referenceDoseMgPerKg * referenceWeightKg
  const doseMg = referenceMg * (targetWeightKg / referenceWeightKg) ** exponent
  const mgPerKg = doseMg / targetWeightKg
  return Number.isFinite(doseMg) && Number.isFinite(mgPerKg)
    ? ok({ doseMg, mgPerKg })
    : refuse('not-finite', 'targetWeightKg')
}
