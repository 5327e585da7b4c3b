import { ok, refuse, type Result } from '../result.ts'
import { type FacilityDate, isFacilityDate } from '../time/instant.ts'

/**
 * A calendar date as exactly as it is known: `2026-03-14`, `2026-03` or `2026`. How it is written says how exact it is,
 * on the wire, in the table and in every export.
 */
export type PartialDate = string

export type DatePrecision = 'day' | 'month' | 'year'

/** The days a partial date may mean, first and last included. */
export interface DatePeriod {
  precision: DatePrecision
  first: FacilityDate
  last: FacilityDate
}

/** Whether the text is a date, a month or a year that the calendar has, from year 1000 on. */
export function isPartialDate(text: string): boolean {
  return /^[1-9]\d{3}(-(0[1-9]|1[0-2]))?$/.test(text) || (/^[1-9]/.test(text) && isFacilityDate(text))
}

/**
 * The days that a partial date stands for.
 *
 * @param text `YYYY`, `YYYY-MM` or `YYYY-MM-DD`
 * @returns `2026-02` is 2026-02-01 to 2026-02-28
 * @refuses not-a-date (field text)
 */
export function readPartialDate(text: PartialDate): Result<DatePeriod, 'not-a-date'> {
  if (!isPartialDate(text)) return refuse('not-a-date', 'text')
  if (text.length === 10) return ok({ precision: 'day', first: text, last: text })
  if (text.length === 4) return ok({ precision: 'year', first: `${text}-01-01`, last: `${text}-12-31` })
  const [year, month] = text.split('-').map(Number)
  const days = new Date(Date.UTC(year ?? 0, month ?? 0, 0)).getUTCDate()
  return ok({ precision: 'month', first: `${text}-01`, last: `${text}-${String(days)}` })
}

/** Writes a date no more exactly than it is known: a stored first day and its precision give back what was entered. */
export function writePartialDate(first: FacilityDate, precision: DatePrecision): PartialDate {
  return first.slice(0, { day: 10, month: 7, year: 4 }[precision])
}
