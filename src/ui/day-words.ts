import { sayDate } from '../../shared/messages/say-date.ts'
import { weekdays } from '../../shared/messages/weekdays.ts'

const noBreak = '\u00a0'

/** "14 May" of a facility date, for rulers and lists where the year is plain. */
export function shortDay(date: string): string {
  return sayDate(date).split(noBreak).slice(0, 2).join(noBreak)
}

/** "Thu 14 May" of a facility date. */
export function longDay(date: string): string {
  const day = new Date(`${date}T00:00:00Z`).getUTCDay()
  return `${weekdays[`d${day}` as keyof typeof weekdays]}${noBreak}${shortDay(date)}`
}
