import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { sayDate, sayTime } from '../../../shared/messages/say-date.ts'

/** A moment for a list: the time when it was today, else the day alone. */
export function sayDayOrTime(at: string, zone: string, now: string): string {
  const date = facilityDateOf(at, zone)
  return date === facilityDateOf(now, zone) ? sayTime(at, zone) : sayDate(date)
}
