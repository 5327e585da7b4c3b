/**
 * The years in which anything of a collection can lie: facts, validities, plans. Outside them a date is a slip of the hand
 * (0206 for 2026, 20226), and neither calendars nor databases agree on what it means.
 */
export const firstPlausibleYear = 1900
export const lastPlausibleYear = 2199

/** Long-lived animals and old collections: a birth or a collection may lie further back. */
export const firstYearOfOrigin = 1800

/** Whether a date, a month, a year or an instant begins with a year that anything of a collection can lie in. */
export function isInPlausibleYear(text: string, firstYear = firstPlausibleYear): boolean {
  const year = /^(\d{4})(?!\d)/.exec(text)?.[1]
  return year !== undefined && Number(year) >= firstYear && Number(year) <= lastPlausibleYear
}

const widestOffsetMs = 14 * 3_600_000

/** Whether an instant lies in such a year wherever it is read: what it is on the facility's calendar is a date too. */
export function isPlausibleInstant(text: string): boolean {
  const ms = Date.parse(text)
  const yearAt = (at: number) => new Date(at).getUTCFullYear()
  return (
    isInPlausibleYear(text) &&
    yearAt(ms - widestOffsetMs) >= firstPlausibleYear &&
    yearAt(ms + widestOffsetMs) <= lastPlausibleYear
  )
}
