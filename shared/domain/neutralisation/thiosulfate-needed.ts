import { ok, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { chlorineRules, treatedVolumeRules } from './neutralisation-limits.ts'
import type { NeutralisationRefusal } from './neutralisation-refusal.ts'

const mgPerGram = 1000

/**
 * Thiosulfate for the chlorine in a water: chlorine × volume × ratio ÷ 1000. A plan: the water may go out when a test of
 * total chlorine reads nothing.
 *
 * @param input.chlorineMgPerL a reading of total chlorine, 0…100,000; none is no zero and is refused
 * @param input.volumeLitres   above 0, at most 100,000,000
 * @param input.ratioMgPerMg   of the form that is weighed, above 0, at most 50
 * @returns g, of the form that the ratio is of
 * @refuses not-finite · below-least, not-above-zero, above-most
 * @source  piper-1982 (p. 283) · dechlorination-practice · check values dechl.04 to dechl.06, dechl.refuse1
 */
export function thiosulfateNeeded(input: {
  chlorineMgPerL: number
  volumeLitres: number
  ratioMgPerMg: number
}): Result<number, NeutralisationRefusal> {
  const { chlorineMgPerL, volumeLitres, ratioMgPerMg } = input
  const refused = checkNumbers([
    [chlorineMgPerL, chlorineRules('chlorineMgPerL')],
    [volumeLitres, treatedVolumeRules],
    [ratioMgPerMg, { field: 'ratioMgPerMg', unit: 'ratio', above: 0, max: 50 }],
  ])
  return refused ?? ok((chlorineMgPerL * volumeLitres * ratioMgPerMg) / mgPerGram)
}
