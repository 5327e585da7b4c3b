import type { FoodOrRelease } from './caution-facts.ts'
import type { CautionFinding } from './caution-rule.ts'
import type { Fact } from './fact.ts'

/** Asks for what nobody said: whether these animals may be eaten or set free. Unknown is never taken for no. */
export function foodNotKnown(fact: Fact<FoodOrRelease>): CautionFinding[] {
  const base = {
    level: 'stop',
    resolvedBy: ['say-food-or-release'],
    unknown: ['animals.foodOrRelease'],
  } as const
  if (fact.state !== 'known') return [{ ...base, code: 'food-or-release-unknown', params: {} }]
  const { notSaid } = fact.value
  return notSaid.length === 0
    ? []
    : [{ ...base, code: 'food-or-release-not-said', params: { animals: notSaid } }]
}
