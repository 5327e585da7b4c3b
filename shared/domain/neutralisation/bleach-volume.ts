import { refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { chlorineRules, neutralisationLimits, treatedVolumeRules } from './neutralisation-limits.ts'
import type { NeutralisationRefusal } from './neutralisation-refusal.ts'

const mgPerLOfOnePercent = 10_000

/**
 * Bleach in a disinfecting solution: target × volume ÷ (10 × % available chlorine w/v). The volume is that of the finished
 * solution, the bleach in it.
 *
 * @param input.targetChlorineMgPerL       above 0, at most 100,000
 * @param input.volumeLitres               above 0, at most 100,000,000
 * @param input.availableChlorinePercentWv by weight in volume as printed, above 0, at most 20; bleach loses it with age
 * @returns mL
 * @refuses not-finite · not-above-zero, above-most · target-above-bleach (targetChlorineMgPerL)
 * @source  mass balance of chlorine · check value dechl.07
 */
export function bleachVolume(input: {
  targetChlorineMgPerL: number
  volumeLitres: number
  availableChlorinePercentWv: number
}): Result<number, NeutralisationRefusal> {
  const { targetChlorineMgPerL, volumeLitres, availableChlorinePercentWv } = input
  const { mostBleachPercentWv: max } = neutralisationLimits
  const refused = checkNumbers([
    [targetChlorineMgPerL, { ...chlorineRules('targetChlorineMgPerL'), above: 0 }],
    [volumeLitres, treatedVolumeRules],
    [availableChlorinePercentWv, { field: 'availableChlorinePercentWv', unit: 'percent_w_v', above: 0, max }],
  ])
  if (refused) return refused
  if (targetChlorineMgPerL > availableChlorinePercentWv * mgPerLOfOnePercent)
    return refuse('target-above-bleach', 'targetChlorineMgPerL')
  const millilitres = (targetChlorineMgPerL * volumeLitres) / (10 * availableChlorinePercentWv)
  return finiteOrRefuse(millilitres, 'availableChlorinePercentWv')
}
