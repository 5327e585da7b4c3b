import type { ClockReason } from '../domain/quarantine/clock-reason.ts'
import type { FacilityDate, Instant } from '../domain/time/instant.ts'
import { clockReasons } from './clock-reasons.ts'

/** How ids, dates and instants are written where the sentence will stand. */
export interface ClockWords {
  date(on: FacilityDate): string
  instant(at: Instant): string
  /** The number of a case, e.g. `Q-115`. */
  caseName(caseId: string): string
  criterionName(criterionId: string): string
  testName(testKey: string): string
}

/** The sentence for one change of a quarantine clock. */
export function sayClockReason(reason: ClockReason, words: ClockWords): string {
  const said = Object.entries(reason.params).map(([name, value]): [string, string | number] => [
    name,
    typeof value === 'string' ? sayParam(name, value, words) : value,
  ])
  const sentence = clockReasons[reason.code] as (params: Record<string, string | number>) => string
  return sentence(Object.fromEntries(said))
}

function sayParam(name: string, value: string, words: ClockWords): string {
  if (value === '') return value
  if (name.endsWith('On')) return words.date(value)
  if (name.endsWith('At')) return words.instant(value)
  if (name === 'otherCaseId') return words.caseName(value)
  if (name === 'criterionId') return words.criterionName(value)
  return name === 'testKey' ? words.testName(value) : value
}
