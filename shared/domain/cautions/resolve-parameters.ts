import type { CautionRule, CautionSettings, ConfirmedParameter, RuleParameter } from './caution-rule.ts'
import { loosens } from './check-parameter.ts'

/** A parameter as it was used, so that a caution can show by what it was judged. */
export interface ResolvedParameter extends RuleParameter {
  key: string
  value: number
  /** True where a facility's value lets through what the default would not. */
  isLoosened: boolean
  /** Who confirmed the facility's value; null = project default, not confirmed. */
  confirmed: Omit<ConfirmedParameter, 'value'> | null
}

/**
 * The values of a rule's parameters for a facility. A value that is no finite number is not used.
 *
 * @param settings confirmed values; a loosened one is used too, and marked, with the vet, reason and jurisdiction
 */
export function resolveParameters(rule: CautionRule, settings: CautionSettings): ResolvedParameter[] {
  return Object.entries(rule.parameters).map(([key, parameter]) => {
    const confirmed = settings[rule.id]?.[key]
    if (!confirmed || !Number.isFinite(confirmed.value))
      return { ...parameter, key, value: parameter.default, isLoosened: false, confirmed: null }
    const { value, ...by } = confirmed
    return { ...parameter, key, value, isLoosened: loosens(parameter, value), confirmed: by }
  })
}
