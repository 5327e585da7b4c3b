import type {
  CautionLevel,
  CautionRuleId,
  CautionSettings,
  CautionStage,
  RuleSource,
} from './caution-rule.ts'
import { cautionRules } from './caution-rules.ts'
import { type ResolvedParameter, resolveParameters } from './resolve-parameters.ts'

/** A rule as it is shown to whoever asks which rules there are. */
export interface ListedCautionRule {
  ruleId: CautionRuleId
  levels: readonly CautionLevel[]
  when: CautionStage | 'both'
  overridable: boolean
  parameters: readonly ResolvedParameter[]
  sources: readonly RuleSource[]
}

/** Every rule with its thresholds as this facility has them, in the order of their numbers. */
export function listCautionRules(settings: CautionSettings = {}): ListedCautionRule[] {
  return cautionRules.map((rule) => ({
    ruleId: rule.id,
    levels: rule.levels,
    when: rule.when,
    overridable: rule.overridable,
    parameters: resolveParameters(rule, settings),
    sources: rule.sources,
  }))
}
