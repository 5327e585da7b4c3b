/**
 * Time as the engines see it. Three kinds of text, never mixed, never a Date object:
 * an **instant** (`2026-03-28T14:00:00Z` or with an offset), a **facility date** (`2026-03-28`, the calendar day in the
 * facility's zone) and a **zone** (`Europe/Lisbon`).
 *
 * Engines check what they are given with `isInstant`, `isFacilityDate` and `isZone` and refuse; the small functions
 * of this folder expect checked text, and a RangeError from them is a bug of the caller.
 */

/** ISO 8601 with a time of day and either `Z` or a numeric offset. */
export type Instant = string

/** A local calendar date of the facility, `YYYY-MM-DD`. */
export type FacilityDate = string

/** An IANA time zone name. */
export type Zone = string

export const MS_PER_MINUTE = 60_000
export const MS_PER_HOUR = 3_600_000
export const MS_PER_DAY = 86_400_000

const instantShape = /^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}(:\d{2}(\.\d{1,9})?)?(Z|[+-]\d{2}:?\d{2})$/

/**
 * Whether the text names one instant on every machine. A date and time without `Z` or offset does not: it would mean
 * the zone of whichever computer reads it.
 */
export function isInstant(text: string): boolean {
  return instantShape.test(text) && realDay(text.slice(0, 10)) && Number.isFinite(Date.parse(text))
}

/** Whether the text is a day that the calendar has: `2026-02-30` is none, though JavaScript would read it as 2 March. */
export function isFacilityDate(text: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(text) && realDay(text)
}

const daysOfMonth = [31, 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31]

/** By the rule of leap years, without a Date: clocks ask this thousands of times for one board. */
function realDay(date: string): boolean {
  const year = Number(date.slice(0, 4))
  const month = Number(date.slice(5, 7))
  const day = Number(date.slice(8, 10))
  const isLeap = year % 4 === 0 && (year % 100 !== 0 || year % 400 === 0)
  const last = month === 2 && isLeap ? 29 : (daysOfMonth[month - 1] ?? 0)
  return day >= 1 && day <= last
}
