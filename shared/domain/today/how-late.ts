import { minutesBetween } from '../time/instant-arithmetic.ts'
import { daysBetween } from '../time/facility-date.ts'
import type { FacilityDate, Instant } from '../time/instant.ts'
import type { TodayItem } from './today-item.ts'

export interface Lateness {
  count: number
  unit: 'minutes' | 'hours' | 'days'
}

const minutesInHour = 60
const hoursInDay = 24

/**
 * How long ago the window of an item closed, in the largest unit that is whole: minutes below an hour, hours below a
 * day, then days. Work with days is late by days of the facility.
 *
 * @param now   the instant asked about
 * @param today its day at the facility
 * @returns null for an item that is not late
 */
export function howLate(
  item: Pick<TodayItem, 'state' | 'latestAt' | 'latestOn'>,
  now: Instant,
  today: FacilityDate,
): Lateness | null {
  if (item.state !== 'late') return null
  if (item.latestAt !== null) {
    const minutes = Math.max(0, Math.floor(minutesBetween(item.latestAt, now)))
    if (minutes < minutesInHour) return { count: minutes, unit: 'minutes' }
    const hours = Math.floor(minutes / minutesInHour)
    if (hours < hoursInDay) return { count: hours, unit: 'hours' }
    return { count: Math.floor(hours / hoursInDay), unit: 'days' }
  }
  if (item.latestOn !== null) return { count: daysBetween(item.latestOn, today), unit: 'days' }
  return null
}
