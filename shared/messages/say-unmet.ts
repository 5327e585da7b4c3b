import type { UnmetCriterion } from '../domain/quarantine/case-clock.ts'
import { extensionKindWords, unmetWords } from './quarantine.ts'
import type { ClockWords } from './say-clock-reason.ts'

/** The sentence for one thing that stands between a case and clearance. */
export function sayUnmet(
  unmet: Pick<UnmetCriterion, 'params'> & { code: string },
  words: Pick<ClockWords, 'date' | 'caseName' | 'criterionName'>,
): string {
  const said = Object.entries(unmet.params).map(([name, value]): [string, string | number] => [
    name,
    typeof value === 'string' ? sayParam(name, value, words) : value,
  ])
  const sentence = unmetWords[unmet.code as UnmetCriterion['code']] as (
    params: Record<string, string | number>,
  ) => string
  return sentence(Object.fromEntries(said))
}

function sayParam(
  name: string,
  value: string,
  words: Pick<ClockWords, 'date' | 'caseName' | 'criterionName'>,
): string {
  if (value === '') return value
  if (name.endsWith('On')) return words.date(value)
  if (name === 'otherCaseId') return words.caseName(value)
  if (name === 'criterionId') return words.criterionName(value)
  return name === 'kind' ? extensionKindWords[value as keyof typeof extensionKindWords] : value
}
