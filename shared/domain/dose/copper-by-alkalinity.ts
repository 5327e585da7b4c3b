import { ok, refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { convert } from '../units/convert.ts'
import type { LimitRefusal } from '../units/number-refusal.ts'
import { copperInPentahydrate } from './copper.ts'

export type CopperByAlkalinityRefusal =
  | LimitRefusal
  | 'not-finite'
  /** Copper in water of so little alkalinity is lethal without a bioassay. */
  | 'alkalinity-too-low-for-copper'
  /** The rule was found in fresh water. */
  | 'copper-rule-fresh-water-only'

/**
 * The rule's own figures: a hundredth of the alkalinity, from 50 mg/L on, and no more than 250 mg/L of it counted.
 *
 * @source mcnevin-2003 · copper-alkalinity-limits, the cap from memory
 */
export const copperAlkalinityRule = {
  mgPerLForOneOfAlkalinity: 0.01,
  leastMgPerLCaCO3: 50,
  mostCountedMgPerLCaCO3: 250,
  /** From this practical salinity on the water is not fresh. */
  brackishFrom: 0.5,
  /** No pond of a collection is larger; a project default. */
  mostAcreFt: 1000,
} as const

/** Copper sulfate for fresh water, with what of its alkalinity was counted. */
export interface CopperByAlkalinity {
  /** Of copper sulfate pentahydrate. */
  copperSulfateMgPerL: number
  /** Of copper in it. */
  copperMgPerL: number
  /** The alkalinity, or 250 where it is more. */
  countedMgPerLCaCO3: number
  capped: boolean
}

/**
 * Copper sulfate pentahydrate for fresh water: total alkalinity ÷ 100. Hard water binds copper, so it takes more; more than
 * 250 mg/L of alkalinity is counted as 250, which makes 2.5 mg/L the most.
 *
 * @param input.alkalinityMgPerLCaCO3 total alkalinity in mg/L as CaCO₃, 50…5,000
 * @param input.salinityPss78         0 and below 0.5
 * @returns mg/L of the product and of copper
 * @refuses not-finite · below-least, above-most · alkalinity-too-low-for-copper (params limit 50, cap 250) ·
 *          copper-rule-fresh-water-only (params limit 0.5)
 * @source  mcnevin-2003 · copper-alkalinity-limits · copper: copperInPentahydrate · check values cu.05 to cu.07, cu.refuse1,
 *          cu.refuse3
 */
export function copperByAlkalinity(input: {
  alkalinityMgPerLCaCO3: number
  salinityPss78: number
}): Result<CopperByAlkalinity, CopperByAlkalinityRefusal> {
  const { alkalinityMgPerLCaCO3, salinityPss78 } = input
  const {
    mgPerLForOneOfAlkalinity,
    leastMgPerLCaCO3: least,
    mostCountedMgPerLCaCO3: cap,
    brackishFrom,
  } = copperAlkalinityRule
  const refused = checkNumbers([
    [salinityPss78, { field: 'salinityPss78', unit: 'PSS-78', min: 0 }],
    [alkalinityMgPerLCaCO3, { field: 'alkalinityMgPerLCaCO3', unit: 'mg/L_CaCO3', min: 0, max: 5000 }],
  ])
  if (refused) return refused
  if (salinityPss78 >= brackishFrom)
    return refuse('copper-rule-fresh-water-only', 'salinityPss78', {
      limit: String(brackishFrom),
      unit: 'PSS-78',
    })
  if (alkalinityMgPerLCaCO3 < least)
    return refuse('alkalinity-too-low-for-copper', 'alkalinityMgPerLCaCO3', {
      limit: String(least),
      cap: String(cap),
      unit: 'mg/L_CaCO3',
    })
  const countedMgPerLCaCO3 = Math.min(alkalinityMgPerLCaCO3, cap)
  const copperSulfateMgPerL = countedMgPerLCaCO3 * mgPerLForOneOfAlkalinity
  const { activeGPerMol, compoundGPerMol } = copperInPentahydrate
  const copperMgPerL = (copperSulfateMgPerL * activeGPerMol) / compoundGPerMol
  return ok({
    copperSulfateMgPerL,
    copperMgPerL,
    countedMgPerLCaCO3,
    capped: alkalinityMgPerLCaCO3 > cap,
  })
}

/**
 * Pounds of copper sulfate pentahydrate for a pond by the same rule; 1 mg/L is 2.72 lb in an acre-foot.
 *
 * @param input.volumeAcreFt of the international foot, above 0, at most 1,000
 * @returns lb
 * @refuses as copperByAlkalinity · not-above-zero, above-most (volumeAcreFt)
 * @source  as copperByAlkalinity · nist-sp-811 · check value cu.08
 */
export function copperSulfatePounds(input: {
  alkalinityMgPerLCaCO3: number
  salinityPss78: number
  volumeAcreFt: number
}): Result<number, CopperByAlkalinityRefusal> {
  const rule = copperByAlkalinity(input)
  if (!rule.ok) return rule
  const { volumeAcreFt } = input
  const refused = checkNumbers([
    [
      volumeAcreFt,
      { field: 'volumeAcreFt', unit: 'acre_ft', above: 0, max: copperAlkalinityRule.mostAcreFt },
    ],
  ])
  if (refused) return refused
  const litres = convert(volumeAcreFt, 'acre_ft', 'L')
  if (!litres.ok) return refuse('not-finite', 'volumeAcreFt')
  const pounds = convert(rule.value.copperSulfateMgPerL * litres.value, 'mg', 'lb')
  return pounds.ok ? pounds : refuse('not-finite', 'volumeAcreFt')
}
