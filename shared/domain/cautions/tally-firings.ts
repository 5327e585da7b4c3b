import type { CautionRuleId } from './caution-rule.ts'
import { cautionRuleIds } from './caution-rule.ts'

/** One time that a rule fired, as a signature or a recorded dose kept it. */
export interface Firing {
  ruleId: string
  /** Why it was overridden, as signed; null: it was not. */
  reason: string | null
}

/** What became of one rule in a month. */
export interface RuleTally {
  ruleId: CautionRuleId
  fired: number
  overridden: number
  /** Reasons in the words that were signed, each once, the most frequent first. */
  reasons: { reason: string; times: number }[]
  /** Overridden more often than not: a veterinarian looks at the rule itself. */
  isOften: boolean
}

/** A rule that is overridden in more than this share of its firings is put before a veterinarian. Project default. */
const oftenShare = 0.5

const isRule = (ruleId: string): ruleId is CautionRuleId => cautionRuleIds.some((one) => one === ruleId)

function reasonsOf(firings: readonly Firing[]): RuleTally['reasons'] {
  const times = new Map<string, number>()
  for (const { reason } of firings) if (reason !== null) times.set(reason, (times.get(reason) ?? 0) + 1)
  return [...times]
    .map(([reason, count]) => ({ reason, times: count }))
    .sort((a, b) => b.times - a.times || a.reason.localeCompare(b.reason))
}

/**
 * Counts firings by rule: those that are put before a veterinarian first, then the most frequent. What is no rule, such as a
 * mark of a record, is not counted.
 */
export function tallyFirings(firings: readonly Firing[]): RuleTally[] {
  return cautionRuleIds
    .flatMap((ruleId) => {
      const own = firings.filter((one) => isRule(one.ruleId) && one.ruleId === ruleId)
      if (own.length === 0) return []
      const overridden = own.filter(({ reason }) => reason !== null).length
      const isOften = overridden > own.length * oftenShare
      return [{ ruleId, fired: own.length, overridden, reasons: reasonsOf(own), isOften }]
    })
    .sort((a, b) => Number(b.isOften) - Number(a.isOften) || b.fired - a.fired)
}
