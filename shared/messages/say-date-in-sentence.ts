import type { FacilityDate } from '../domain/time/instant.ts'

const months = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
]

/**
 * A date in a sentence: `25 April`, with the year where it is not that of the day it is read on. Never in figures
 * alone, which two countries read as two dates.
 *
 * @param on     facility date, `YYYY-MM-DD`
 * @param readOn the day of reading, or of the document; absent = always with the year
 */
export function sayDateInSentence(on: FacilityDate, readOn?: FacilityDate): string {
  const [year = '', month = '', day = ''] = on.split('-')
  const words = `${Number(day)}\u00a0${months[Number(month) - 1] ?? month}`
  return readOn !== undefined && readOn.startsWith(`${year}-`) ? words : `${words} ${year}`
}
