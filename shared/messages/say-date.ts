import { wallClockOf } from '../domain/time/facility-date.ts'
import { offsetMinutesAt } from '../domain/time/write-local-instant.ts'
import { defineMessages } from './define-messages.ts'

const months = defineMessages({
  m01: 'Jan',
  m02: 'Feb',
  m03: 'Mar',
  m04: 'Apr',
  m05: 'May',
  m06: 'Jun',
  m07: 'Jul',
  m08: 'Aug',
  m09: 'Sep',
  m10: 'Oct',
  m11: 'Nov',
  m12: 'Dec',
})

const nbsp = '\u00a0'

/**
 * A calendar date in words, as exactly as it is known: `14 May 2026`, `May 2026`, `2026`.
 *
 * @param date `YYYY-MM-DD`, `YYYY-MM` or `YYYY`
 */
export function sayDate(date: string): string {
  const [year = '', month, day] = date.split('-')
  const name = month === undefined ? undefined : months[`m${month}` as keyof typeof months]
  if (name === undefined) return year
  return [day === undefined ? '' : String(Number(day)), name, year].filter(Boolean).join(nbsp)
}

/** The time of day on the facility's wall clock, `14:20`. */
export function sayTime(at: string, zone: string): string {
  return wallClockOf(at, zone).time.slice(0, 5)
}

/** Date and time on the facility's wall clock: `14 May 2026, 14:20`. */
export function sayInstant(at: string, zone: string): string {
  return `${sayDate(wallClockOf(at, zone).date)}, ${sayTime(at, zone)}`
}

/** The offset from UTC in force at an instant, for what is printed or signed: `UTC−4`, `UTC+5:45`, `UTC`. */
export function sayOffset(at: string, zone: string): string {
  const offset = offsetMinutesAt(at, zone)
  if (offset === 0) return 'UTC'
  const [hours, minutes] = [Math.floor(Math.abs(offset) / 60), Math.abs(offset) % 60]
  return `UTC${offset < 0 ? '−' : '+'}${String(hours)}${minutes > 0 ? `:${String(minutes).padStart(2, '0')}` : ''}`
}

/** As it stands on prints and beside signatures: `14 May 2026, 14:20, UTC−3`; with seconds where the second counts. */
export function sayInstantWithOffset(at: string, zone: string, to: 'minute' | 'second' = 'minute'): string {
  const { date, time } = wallClockOf(at, zone)
  return `${sayDate(date)}, ${to === 'second' ? time : time.slice(0, 5)}, ${sayOffset(at, zone)}`
}
