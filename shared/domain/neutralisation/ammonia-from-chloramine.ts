import { ok, type Result } from '../result.ts'
import { checkNumber } from '../units/check-number.ts'
import { chlorineMasses } from './chlorine-masses.ts'
import { chlorineRules } from './neutralisation-limits.ts'
import type { NeutralisationRefusal } from './neutralisation-refusal.ts'

/**
 * Ammonia that is left in the water when thiosulfate has taken the chlorine out of monochloramine: one nitrogen for each
 * Cl₂ equivalent, 0.198 mg of N for a milligram of Cl₂.
 *
 * @param input.monochloramineMgCl2PerL as tests report it, in mg/L as Cl₂, 0…100,000
 * @returns mg/L of ammonia nitrogen, NH₃ and NH₄⁺ together
 * @refuses not-finite · below-least, above-most
 * @source  iupac-weights: 14.007 ÷ 70.90 · check value dechl.08
 */
export function ammoniaFromChloramine(input: {
  monochloramineMgCl2PerL: number
}): Result<number, NeutralisationRefusal> {
  const reading = checkNumber(input.monochloramineMgCl2PerL, chlorineRules('monochloramineMgCl2PerL'))
  if (!reading.ok) return reading
  return ok((reading.value * chlorineMasses.nitrogenGPerMol) / chlorineMasses.chlorineGPerMol)
}
