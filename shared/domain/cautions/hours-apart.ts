import { hoursBetween } from '../time/instant-arithmetic.ts'
import type { AgentUse, CautionFacts } from './caution-facts.ts'
import type { CautionStage } from './caution-rule.ts'
import { valueOf } from './fact.ts'

/** True hours between another use of an agent and this order; 0 when they overlap or nobody set their days. */
export function hoursApart(use: AgentUse, facts: CautionFacts, stage: CautionStage): number {
  const startsAt = stage === 'start' ? facts.at : (valueOf(facts.order.startsAt) ?? facts.at)
  const endsAt = valueOf(facts.order.endsAt)
  if (use.until !== null && hoursBetween(use.until, startsAt) > 0) return hoursBetween(use.until, startsAt)
  if (use.from !== null && endsAt !== null && hoursBetween(endsAt, use.from) > 0)
    return hoursBetween(endsAt, use.from)
  return 0
}
