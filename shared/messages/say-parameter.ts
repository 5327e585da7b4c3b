import type { RuleParameter, RuleParameterKey } from '../domain/cautions/caution-rule.ts'
import type { ResolvedParameter } from '../domain/cautions/resolve-parameters.ts'
import { formatDose } from '../domain/quantities/format-dose.ts'
import { unitOf } from '../domain/units/unit-of.ts'
import { ruleParameterWords } from './cautions.ts'
import { defineMessages } from './define-messages.ts'
import { sayDate } from './say-date.ts'

/** Words about the thresholds of the rules, wherever a value of the facility is told. */
export const parameterWords = defineMessages({
  loosened: (p: {
    name: string
    value: string
    standard: string
    by: string
    on: string
    where: string
    why: string
  }) =>
    `Loosened here: ${p.name} ${p.value} in place of ${p.standard}, confirmed by ${p.by} on ${p.on} for ${p.where}: ${p.why}.`,
  loosenedInShort: (p: { name: string; value: string; standard: string }) =>
    `loosened here: ${p.name} ${p.value} in place of ${p.standard}`,
})

/** The unit of a threshold as it stands beside a number; nothing for a count or a factor, whose name says what it is. */
export function unitTextOf(unit: RuleParameter['unit']): string {
  return unit === 'factor' || unit === 'count' ? '' : unitOf(unit).symbol
}

/** A value of a threshold with its unit. @param value in the unit of the parameter */
export function sayParameterValue(value: number, unit: RuleParameter['unit']): string {
  if (unit !== 'factor' && unit !== 'count') return formatDose(value, unit).text
  return formatDose(value, 'g').number
}

const nameOf = (key: string) => ruleParameterWords[key as RuleParameterKey]
const small = (text: string) => text.charAt(0).toLowerCase() + text.slice(1)
const withoutStop = (text: string) => text.replace(/[.\s]+$/u, '')

/** A threshold by its name inside a sentence. */
export const sayParameterName = (key: string): string => small(nameOf(key))

/** What a facility loosened of the thresholds that a caution was judged by: a sentence each. */
export function sayLoosened(settings: readonly ResolvedParameter[]): string[] {
  return settings.flatMap((one) =>
    one.isLoosened && one.confirmed
      ? [
          parameterWords.loosened({
            name: small(nameOf(one.key)),
            value: sayParameterValue(one.value, one.unit),
            standard: sayParameterValue(one.default, one.unit),
            by: one.confirmed.confirmedBy,
            on: sayDate(one.confirmed.confirmedOn),
            where: one.confirmed.jurisdiction,
            why: withoutStop(one.confirmed.reason),
          }),
        ]
      : [],
  )
}

/** The same for a condition, which is a line without a full stop. */
export function sayLoosenedInShort(settings: readonly ResolvedParameter[]): string {
  const said = settings
    .filter(({ isLoosened }) => isLoosened)
    .map((one) =>
      parameterWords.loosenedInShort({
        name: small(nameOf(one.key)),
        value: sayParameterValue(one.value, one.unit),
        standard: sayParameterValue(one.default, one.unit),
      }),
    )
  return said.length === 0 ? '' : ` (${said.join('; ')})`
}
