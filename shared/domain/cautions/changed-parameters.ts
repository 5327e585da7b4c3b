import type { CautionFacts } from './caution-facts.ts'
import type { CautionRule, CautionSettings, CautionStage } from './caution-rule.ts'
import { normaliseFacts } from './normalise-facts.ts'
import { resolveParameters } from './resolve-parameters.ts'
import type { ResolvedParameter } from './resolve-parameters.ts'

/** A threshold that is another one now than it was at a signature. */
export interface ChangedParameter {
  /** As it was at the signature. */
  then: ResolvedParameter
  /** As it is in force now. */
  now: ResolvedParameter
  /** What is in force now lets less through. */
  isStricter: boolean
}

const valuesOf = (parameters: readonly ResolvedParameter[]) =>
  Object.fromEntries(parameters.map(({ key, value }) => [key, value]))

/**
 * The thresholds of a rule that a facility changed since an order was signed, as far as they have to do with the order: what
 * the condition says, or what the rule finds, is another by that threshold alone.
 *
 * @param rule  any rule
 * @param given.facts as the rule is judged by now
 * @param given.then  confirmed thresholds at the signature
 * @param given.now   confirmed thresholds in force now
 */
export function changedParameters(
  rule: CautionRule,
  given: { facts: CautionFacts; stage: CautionStage; then: CautionSettings; now: CautionSettings },
): ChangedParameter[] {
  const { stage } = given
  const facts = normaliseFacts(given.facts)
  const then = resolveParameters(rule, given.then)
  const now = resolveParameters(rule, given.now)
  const signed = valuesOf(then)
  const says = (values: Record<string, number>) =>
    JSON.stringify([rule.condition?.(facts, values) ?? null, rule.judge(facts, values, stage)])
  return then.flatMap((one) => {
    const other = now.find(({ key }) => key === one.key)
    if (!other || other.value === one.value) return []
    if (says(signed) === says({ ...signed, [one.key]: other.value })) return []
    const isStricter = one.tighter === 'lower' ? other.value < one.value : other.value > one.value
    return [{ then: one, now: other, isStricter }]
  })
}
