import type { DayDate } from './passage-view.ts'

const dayMs = 86_400_000
const month = new Intl.DateTimeFormat('en-US', { month: 'short', timeZone: 'UTC' })
const weekday = new Intl.DateTimeFormat('en-US', { weekday: 'short', timeZone: 'UTC' })

const utc = (date: DayDate) => new Date(`${date}T00:00:00Z`)

/** Days from one facility date to another; calendar days, so clock changes gain or lose none. */
export function daysBetween(from: DayDate, to: DayDate): number {
  return Math.round((utc(to).getTime() - utc(from).getTime()) / dayMs)
}

/** The date so many days later. */
export function addDays(date: DayDate, days: number): DayDate {
  return new Date(utc(date).getTime() + days * dayMs).toISOString().slice(0, 10)
}

/** "14 May" */
export function shortDay(date: DayDate): string {
  return `${utc(date).getUTCDate()}\u00a0${month.format(utc(date))}`
}

/** "Thu 14 May" */
export function longDay(date: DayDate): string {
  return `${weekday.format(utc(date))}\u00a0${shortDay(date)}`
}
