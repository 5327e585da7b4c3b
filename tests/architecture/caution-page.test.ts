import { describe, expect, it } from 'vitest'
import { parameterLimits } from '../../shared/domain/cautions/check-parameter.ts'
import { listCautionRules } from '../../shared/domain/cautions/list-caution-rules.ts'
import type { ListedCautionRule } from '../../shared/domain/cautions/list-caution-rules.ts'
import { sources } from '../../shared/domain/sources.ts'
import type { RuleParameterKey } from '../../shared/domain/cautions/caution-rule.ts'
import {
  cautionEffectWords,
  cautionReasonWords,
  orderRouteWords,
} from '../../shared/messages/caution-reasons.ts'
import { cautionTitles } from '../../shared/messages/caution-texts.ts'
import {
  cautionLevelWords,
  cautionRuleWords,
  cautionStageWords,
  resolveWords,
  ruleParameterWords,
} from '../../shared/messages/cautions.ts'
import { sayParameterValue } from '../../shared/messages/say-parameter.ts'

const cell = (text: string) => text.replaceAll('\u00a0', ' ').replaceAll('|', '\\|')
const row = (...cells: string[]) => `| ${cells.map(cell).join(' | ')} |`

function parametersOf({ parameters }: ListedCautionRule): string[] {
  if (parameters.length === 0) return []
  return [
    row('threshold', 'default', 'tighter', 'may be confirmed', 'source', 'mark'),
    row('---', '---', '---', '---', '---', '---'),
    ...parameters.map((one) => {
      const { least, most } = parameterLimits(one)
      const said = (value: number) => sayParameterValue(value, one.unit)
      return row(
        ruleParameterWords[one.key as RuleParameterKey],
        said(one.default),
        one.tighter,
        `${said(least)} to ${said(most)}`,
        sources[one.source].citation,
        one.mark,
      )
    }),
    '',
  ]
}

function sectionOf(rule: ListedCautionRule): string[] {
  const effects = rule.effects.map((kind) => cautionEffectWords[kind]).join(', ')
  return [
    `## ${rule.ruleId} ${cautionRuleWords[rule.ruleId]}`,
    '',
    cautionReasonWords[rule.ruleId],
    '',
    `- Levels: ${rule.levels.map((level) => cautionLevelWords[level].toLowerCase()).join(', ')}`,
    `- Judged ${cautionStageWords[rule.when]}`,
    `- ${rule.overridable ? 'A veterinarian may override it with a signed reason' : 'Nobody may override it'}`,
    `- Asked for: ${rule.routes.map((route) => orderRouteWords[route]).join(', ')}`,
    ...(effects === '' ? [] : [`- Brings: ${effects}`]),
    ...rule.sources.map(({ source, mark }) => `- Source: ${sources[source].citation} (${mark})`),
    '',
    ...parametersOf(rule),
    row('finding', 'code', 'any one of these resolves it'),
    row('---', '---', '---'),
    ...rule.findings.map(({ code, resolvedBy }) =>
      row(cautionTitles[code], `\`${code}\``, resolvedBy.map((one) => resolveWords[one]).join(' ')),
    ),
    '',
  ]
}

/** The page of the rules, made from the rules themselves. */
function cautionPage(): string {
  return [
    '# The rules of the cautions',
    '',
    'Made by its test from `shared/domain/cautions`. Every threshold is a default that a licensed veterinarian of the facility confirms or replaces before use; what this facility confirmed stands at `GET /api/caution-rules`. Marks: V the source itself was read, V2 a page restating it was read, C computed, M from memory, P project default.',
    '',
    ...listCautionRules().flatMap(sectionOf),
  ].join('\n')
}

describe('the page of the rules', () => {
  it('is docs/caution-rules.md, as it would be made now', async () => {
    await expect(cautionPage()).toMatchFileSnapshot('../../docs/caution-rules.md')
  })

  it('holds every rule once, with each of its findings', () => {
    const page = cautionPage()
    for (const { ruleId, findings } of listCautionRules()) {
      expect(page.split(`\n## ${ruleId} `)).toHaveLength(2)
      for (const { code } of findings) expect(page).toContain(`\`${code}\``)
    }
  })
})
