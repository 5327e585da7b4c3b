import type { OrderRoute } from '../orders/order-route.ts'
import type { CautionCode, ResolveCode } from './caution-code.ts'
import type {
  CautionEffect,
  CautionLevel,
  CautionRuleId,
  CautionSettings,
  CautionStage,
  RuleSource,
} from './caution-rule.ts'
import { cautionRules } from './caution-rules.ts'
import { routesOf } from './evaluate-cautions.ts'
import { type ResolvedParameter, resolveParameters } from './resolve-parameters.ts'

/** A rule as it is shown to whoever asks which rules there are. */
export interface ListedCautionRule {
  ruleId: CautionRuleId
  levels: readonly CautionLevel[]
  when: CautionStage | 'both'
  overridable: boolean
  routes: readonly OrderRoute[]
  effects: readonly CautionEffect['kind'][]
  /** What it can find, each with what would resolve it. */
  findings: readonly { code: CautionCode; resolvedBy: readonly ResolveCode[] }[]
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
    routes: routesOf(rule),
    effects: rule.effects ?? [],
    findings: Object.entries(rule.findings).map(([code, resolvedBy]) => ({
      code: code as CautionCode,
      resolvedBy,
    })),
    parameters: resolveParameters(rule, settings),
    sources: rule.sources,
  }))
}
