import type {
  CautionRule,
  ListedParameter,
  ParameterVersion,
} from '../../../shared/contracts/caution-rules.contract.ts'
import type { CautionSettings, RuleParameterKey } from '../../../shared/domain/cautions/caution-rule.ts'
import { isLegal, loosens, parameterLimits } from '../../../shared/domain/cautions/check-parameter.ts'
import { listCautionRules } from '../../../shared/domain/cautions/list-caution-rules.ts'
import type { ListedCautionRule } from '../../../shared/domain/cautions/list-caution-rules.ts'
import type { ResolvedParameter } from '../../../shared/domain/cautions/resolve-parameters.ts'
import { sources } from '../../../shared/domain/sources.ts'
import { cautionReasonWords } from '../../../shared/messages/caution-reasons.ts'
import { cautionTitles } from '../../../shared/messages/caution-texts.ts'
import { cautionRuleWords, resolveWords, ruleParameterWords } from '../../../shared/messages/cautions.ts'
import { sayParameterValue, unitTextOf } from '../../../shared/messages/say-parameter.ts'
import type { ParameterVersionRow } from './parameters.reads.ts'

function presentVersion(
  parameter: ResolvedParameter,
  row: ParameterVersionRow,
  inForce: boolean,
  isNewest: boolean,
) {
  const value = Number(row.entered_value)
  const version: ParameterVersion = {
    id: row.id,
    value: row.entered_value,
    text: sayParameterValue(value, parameter.unit),
    state: inForce ? 'confirmed' : row.confirmed_at === null && isNewest ? 'proposed' : 'superseded',
    loosens: loosens(parameter, value),
    proposedBy: row.proposed_by_name,
    proposedAt: row.proposed_at.toISOString(),
    reason: row.reason,
    confirmation: row.confirmed_at && {
      by: row.confirmed_by_name ?? '',
      at: row.confirmed_at.toISOString(),
      on: row.confirmed_on ?? '',
      reason: row.confirmed_reason ?? '',
      jurisdiction: row.jurisdiction ?? '',
    },
  }
  return version
}

function presentParameter(
  parameter: ResolvedParameter,
  rows: readonly ParameterVersionRow[],
): ListedParameter {
  const { key, unit, source, mark, tighter, value, isLoosened } = parameter
  const { least, most } = parameterLimits(parameter)
  const inForce = rows.find((row) => row.confirmed_at !== null)
  return {
    key,
    label: ruleParameterWords[key as RuleParameterKey],
    unit,
    unitText: unitTextOf(unit),
    default: parameter.default,
    defaultText: sayParameterValue(parameter.default, unit),
    source,
    citation: sources[source].citation,
    mark,
    tighter,
    legal: isLegal(parameter),
    least,
    most,
    value,
    valueText: sayParameterValue(value, unit),
    state: parameter.confirmed ? 'confirmed' : 'default',
    loosened: isLoosened,
    versions: rows.map((row) => presentVersion(parameter, row, row === inForce, row === rows[0])),
  }
}

function presentRule(rule: ListedCautionRule, rows: readonly ParameterVersionRow[]): CautionRule {
  return {
    ruleId: rule.ruleId,
    asks: cautionRuleWords[rule.ruleId],
    reason: cautionReasonWords[rule.ruleId],
    levels: [...rule.levels],
    when: rule.when,
    overridable: rule.overridable,
    routes: [...rule.routes],
    effects: [...rule.effects],
    findings: rule.findings.map(({ code, resolvedBy }) => ({
      code,
      title: cautionTitles[code],
      resolvedBy: resolvedBy.map((one) => ({ code: one, text: resolveWords[one] })),
    })),
    sources: rule.sources.map(({ source, mark }) => ({ source, citation: sources[source].citation, mark })),
    parameters: rule.parameters.map((parameter) =>
      presentParameter(
        parameter,
        rows.filter((row) => row.rule_id === rule.ruleId && row.parameter_key === parameter.key),
      ),
    ),
  }
}

/** Every rule as this facility has it. @param rows values that were proposed, the newest first */
export function presentRules(settings: CautionSettings, rows: readonly ParameterVersionRow[]): CautionRule[] {
  return listCautionRules(settings).map((rule) => presentRule(rule, rows))
}
