import { addDays, daysBetween } from '../../../shared/domain/time/facility-date.ts'
import type { DayDate } from './passage-view.ts'

/** Where a facility date stands on a drawing: its beginning, in px from the left edge. */
export interface DayScale {
  from: DayDate
  until: DayDate
  width: number
  pxPerDay: number
  x: (date: DayDate) => number
}

/** A scale from the beginning of `from` to the end of `until`. */
export function dayScale(from: DayDate, until: DayDate, width: number): DayScale {
  const days = Math.max(1, daysBetween(from, until) + 1)
  const pxPerDay = width / days
  return { from, until, width, pxPerDay, x: (date) => daysBetween(from, date) * pxPerDay }
}

/** Every seventh day from the left edge. */
export function weekStarts(scale: DayScale): DayDate[] {
  const days = daysBetween(scale.from, scale.until)
  return Array.from({ length: Math.floor(days / 7) + 1 }, (_, i) => addDays(scale.from, i * 7))
}
