import { refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { bathLitresRules, bathTargetRules, stockStrengthRules } from './anaesthesia-limits.ts'
import type { AnaesthesiaRefusal } from './anaesthesia-refusal.ts'

const mgPerGram = 1000
const mlPerLitre = 1000

/** Refuses what is no target, volume or stock, and a target that the stock cannot reach. */
function checkStock(targetMgPerL: number, litres: number, litresField: string, stockGPerL: number) {
  const refused = checkNumbers([
    [targetMgPerL, bathTargetRules],
    [litres, bathLitresRules(litresField)],
    [stockGPerL, stockStrengthRules],
  ])
  if (refused) return refused
  return targetMgPerL >= stockGPerL * mgPerGram ? refuse('target-not-below-stock', 'targetMgPerL') : undefined
}

/**
 * Stock in a bath that is filled up to its volume afterwards: target × volume ÷ strength.
 *
 * @param input.targetMgPerL   above 0, at most 100,000, below the strength of the stock
 * @param input.bathLitres     the finished bath, the stock in it; above 0, at most 100,000,000
 * @param input.stockGPerL     above 0, at most 2,000
 * @returns mL
 * @refuses not-finite · not-above-zero, above-most · target-not-below-stock (targetMgPerL)
 * @source  mass balance · check value tri.01
 */
export function stockVolumeInBath(input: {
  targetMgPerL: number
  bathLitres: number
  stockGPerL: number
}): Result<number, AnaesthesiaRefusal> {
  const { targetMgPerL, bathLitres, stockGPerL } = input
  const refused = checkStock(targetMgPerL, bathLitres, 'bathLitres', stockGPerL)
  return refused ?? finiteOrRefuse((targetMgPerL * bathLitres) / stockGPerL, 'stockGPerL')
}

/**
 * Stock to pour into water that is there already, so that the two together have the target: target × volume ÷ (strength −
 * target).
 *
 * @param input.targetMgPerL above 0, at most 100,000, below the strength of the stock
 * @param input.waterLitres  before the stock goes in; above 0, at most 100,000,000
 * @param input.stockGPerL   above 0, at most 2,000
 * @returns mL
 * @refuses not-finite · not-above-zero, above-most · target-not-below-stock (targetMgPerL)
 * @source  mass balance · check values tri.02, tri.refuse1
 */
export function stockVolumeOnTop(input: {
  targetMgPerL: number
  waterLitres: number
  stockGPerL: number
}): Result<number, AnaesthesiaRefusal> {
  const { targetMgPerL, waterLitres, stockGPerL } = input
  const refused = checkStock(targetMgPerL, waterLitres, 'waterLitres', stockGPerL)
  if (refused) return refused
  // in mg/L on both sides: a difference of grams could come out as nothing where the two are not equal
  const strongerMgPerL = stockGPerL * mgPerGram - targetMgPerL
  return finiteOrRefuse((targetMgPerL / strongerMgPerL) * waterLitres * mlPerLitre, 'targetMgPerL')
}
