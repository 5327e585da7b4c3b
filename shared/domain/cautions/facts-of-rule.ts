import type { CautionFacts, FactPath } from './caution-facts.ts'
import { factAt } from './caution-facts.ts'
import type { CautionRuleId } from './caution-rule.ts'
import { cautionRules } from './caution-rules.ts'
import type { Fact } from './fact.ts'
import { normaliseFacts } from './normalise-facts.ts'

/**
 * The facts that a rule looks at, as they stand: what an answer to its finding was given on. Another reading, another
 * state of a valve or another lot makes it another finding, though the rule and the code are the same.
 */
export function factsOfRule(
  facts: CautionFacts,
  ruleId: CautionRuleId,
): Partial<Record<FactPath, Fact<unknown>>> {
  const sound = normaliseFacts(facts)
  const paths = cautionRules.find(({ id }) => id === ruleId)?.uses ?? []
  return Object.fromEntries(paths.map((path) => [path, factAt(sound, path)]))
}
