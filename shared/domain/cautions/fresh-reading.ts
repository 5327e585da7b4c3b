import type { Instant } from '../time/instant.ts'
import { minutesBetween } from '../time/instant-arithmetic.ts'
import type { Fact } from './fact.ts'

/** A reading as a rule may use it: `old` keeps the value for the sentence, but nothing may be decided by it. */
export type FreshReading =
  | { state: 'fresh'; value: number; digits: string | undefined; at: Instant }
  | { state: 'old'; value: number; digits: string | undefined; at: Instant; ageMinutes: number }
  | { state: 'unknown' }

/**
 * Judges the age of a reading. Without a time it is unknown; of exactly the allowed age it still counts.
 *
 * @param at            the instant judged
 * @param maxAgeMinutes true minutes
 */
export function freshReading(fact: Fact<number>, at: Instant, maxAgeMinutes: number): FreshReading {
  if (fact.state !== 'known' || fact.at === null || !Number.isFinite(fact.value)) return { state: 'unknown' }
  const ageMinutes = minutesBetween(fact.at, at)
  const { value, digits, at: readAt } = fact
  return ageMinutes > maxAgeMinutes
    ? { state: 'old', value, digits, at: readAt, ageMinutes: Math.floor(ageMinutes) }
    : { state: 'fresh', value, digits, at: readAt }
}
