import { ok, refuse, type Result } from '../result.ts'
import { checkNumber, type NumberRules } from '../units/check-number.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'

/**
 * Molar masses of nitrogen and of the two forms of ammonia, g/mol.
 *
 * @source iupac-weights · check values nh3conv.01 to nh3conv.03
 */
const nitrogenGPerMol = 14.007
const ammoniaGPerMol = 17.031
const ammoniumGPerMol = 18.039

/** What a test for ammonia says its figure is of; never guessed. */
export const ammoniaBases = ['n', 'nh3', 'nh4'] as const
export type AmmoniaBasis = (typeof ammoniaBases)[number]

export type AmmoniaBasisRefusal = LimitRefusal | 'not-finite' | 'ammonia-basis-not-stated'

/** Grams of the form that hold a gram of nitrogen. */
const gramsPerGramOfNitrogen: Readonly<Record<AmmoniaBasis, number>> = {
  n: 1,
  nh3: ammoniaGPerMol / nitrogenGPerMol,
  nh4: ammoniumGPerMol / nitrogenGPerMol,
}

const isBasis = (value: unknown): value is AmmoniaBasis => ammoniaBases.some((each) => each === value)
const rules: NumberRules = { field: 'mgPerL', unit: 'mg/L', min: 0, max: 1000 }

/**
 * The same ammonia counted as something else: 1 mg/L as nitrogen is 1.2159 mg/L as NH3 and 1.2879 as NH4.
 *
 * @param input.mgPerL 0…1,000, counted as `of`
 * @returns mg/L counted as `as`
 * @refuses not-finite · below-least, above-most (mgPerL) · ammonia-basis-not-stated (of, as)
 * @source  iupac-weights · check values nh3conv.01 to nh3conv.03
 */
export function ammoniaCountedAs(input: {
  mgPerL: number
  of: AmmoniaBasis
  as: AmmoniaBasis
}): Result<number, AmmoniaBasisRefusal> {
  const { mgPerL, of, as } = input
  if (!isBasis(of)) return refuse('ammonia-basis-not-stated', 'of')
  if (!isBasis(as)) return refuse('ammonia-basis-not-stated', 'as')
  const checked = checkNumber(mgPerL, rules)
  if (!checked.ok || of === as) return checked
  return ok((mgPerL / gramsPerGramOfNitrogen[of]) * gramsPerGramOfNitrogen[as])
}
