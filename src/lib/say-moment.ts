import { sayDate, sayTime } from '../../shared/messages/say-date.ts'
import { facilityDateOf } from '../../shared/domain/time/facility-date.ts'

const withoutYear = (date: string) => sayDate(date).replace(/\u00a0\d{4}$/, '')

/** A moment as shown beside current work: "14:20" today, "30 Nov 14:20" this year, with the year before that. */
export function sayMoment(at: string, zone: string, now: string): string {
  const date = facilityDateOf(at, zone)
  const today = facilityDateOf(now, zone)
  if (date === today) return sayTime(at, zone)
  const day = date.slice(0, 4) === today.slice(0, 4) ? withoutYear(date) : sayDate(date)
  return `${day}\u00a0${sayTime(at, zone)}`
}
