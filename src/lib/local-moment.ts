import { wallClockOf } from '../../shared/domain/time/facility-date.ts'
import type { Instant, Zone } from '../../shared/domain/time/instant.ts'
import { instantOfLocalTime } from '../../shared/domain/time/local-time.ts'

/** What stands in a date-and-time field: `2026-12-01T14:20`, facility time. */
export type LocalMoment = string

/** An instant as the facility's wall clock shows it, for a date-and-time field. */
export function localMomentOf(instant: Instant, zone: Zone): LocalMoment {
  const { date, time } = wallClockOf(instant, zone)
  return `${date}T${time.slice(0, 5)}`
}

/** The instant that somebody means by facility time; null while the field is empty or half typed. */
export function instantOfMoment(moment: LocalMoment, zone: Zone): Instant | null {
  const [date, time] = moment.split('T')
  if (!date || !time || !/^\d{4}-\d{2}-\d{2}$/.test(date) || !/^\d{2}:\d{2}/.test(time)) return null
  try {
    return instantOfLocalTime(date, time.slice(0, 5), zone)
  } catch {
    return null
  }
}
