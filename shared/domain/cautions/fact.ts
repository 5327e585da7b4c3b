import type { Instant } from '../time/instant.ts'

/**
 * Something a rule asks about, as far as it is known. Every rule has to say what it does with each of the three states:
 * not knowing is never the same as all being well.
 *
 * `source` says where the value came from, for the person who reads the caution: a reading, a ledger, what somebody
 * stated on the form. `at` is when it was true; null where that has no meaning.
 */
export type Fact<T> =
  | {
      state: 'known'
      value: T
      at: Instant | null
      source: string
      /** Of a reading: the digits as the instrument showed them, in the unit of the fact; 7.0 is not 7. */
      digits?: string
    }
  | { state: 'unknown' }
  | { state: 'not-applicable' }

/** A fact that is known. */
export function known<T>(value: T, at: Instant | null = null, source = '', digits?: string): Fact<T> {
  return { state: 'known', value, at, source, ...(digits === undefined ? {} : { digits }) }
}

/** A fact that nobody recorded. */
export function unknown<T>(): Fact<T> {
  return { state: 'unknown' }
}

/** A fact that cannot exist here: carbon where there is no carbon filter. */
export function notApplicable<T>(): Fact<T> {
  return { state: 'not-applicable' }
}

/** The value of a known fact, or null. */
export function valueOf<T>(fact: Fact<T>): T | null {
  return fact.state === 'known' ? fact.value : null
}
