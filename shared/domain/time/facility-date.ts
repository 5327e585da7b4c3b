import {
  type FacilityDate,
  type Instant,
  MS_PER_DAY,
  MS_PER_MINUTE,
  type Zone,
  isFacilityDate,
} from './instant.ts'
import { instantToMs } from './instant-arithmetic.ts'

const formatters = new Map<Zone, Intl.DateTimeFormat>()

/** Making a formatter costs a hundred times more than using it, and a clock asks for thousands of dates. */
function formatterOf(zone: Zone): Intl.DateTimeFormat {
  const kept = formatters.get(zone)
  if (kept) return kept
  const made = new Intl.DateTimeFormat('en-US', {
    timeZone: zone,
    calendar: 'gregory',
    numberingSystem: 'latn',
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  })
  formatters.set(zone, made)
  return made
}

/** Whether the machine knows the zone. Server and browser carry the same IANA names. */
export function isZone(zone: string): boolean {
  if (zone.trim() === '') return false
  try {
    formatterOf(zone)
    return true
  } catch {
    return false
  }
}

/** What a wall clock in the zone shows: `2026-03-28` and `14:05:00`. */
export function wallClockOf(instant: Instant, zone: Zone): { date: FacilityDate; time: string } {
  const ms = instantToMs(instant)
  const shown =
    ms >= wholeMinutesSinceMs && ms < wholeMinutesUntilMs
      ? new Date(ms + offsetInMinute(Math.floor(ms / MS_PER_MINUTE), zone)).toISOString()
      : readWallClock(ms, zone)
  const [date = '', time = ''] = shown.split('T')
  return { date, time: time.slice(0, 8) }
}

/** The wall clock as the zone's formatter writes it: `2026-03-28T14:05:00`. */
function readWallClock(ms: number, zone: Zone): string {
  const parts: Record<string, string> = {}
  for (const part of formatterOf(zone).formatToParts(ms)) parts[part.type] = part.value
  const year = (parts.year ?? '').padStart(4, '0')
  return `${year}-${parts.month}-${parts.day}T${parts.hour}:${parts.minute}:${parts.second}`
}

// Since February 1972 no zone has been off UTC by part of a minute, nor changed within one (IANA time zone database)
const wholeMinutesSinceMs = Date.UTC(1972, 1, 1)
const wholeMinutesUntilMs = Date.UTC(9999, 0, 1)
const mostKept = 50_000
const keptOffsets = new Map<Zone, Map<number, number>>()

/** How far the zone is ahead of UTC, in milliseconds; kept, because a board asks for the same instants again and again. */
function offsetInMinute(minute: number, zone: Zone): number {
  const ofZone = keptOffsets.get(zone) ?? new Map<number, number>()
  keptOffsets.set(zone, ofZone)
  const kept = ofZone.get(minute)
  if (kept !== undefined) return kept
  const startMs = minute * MS_PER_MINUTE
  const offsetMs = Date.parse(`${readWallClock(startMs, zone)}Z`) - startMs
  if (ofZone.size >= mostKept) ofZone.clear()
  ofZone.set(minute, offsetMs)
  return offsetMs
}

/**
 * The facility's calendar day on which an instant fell: the day that a quarantine counts by.
 *
 * @param instant ISO instant
 * @param zone    IANA zone of the facility
 * @returns `YYYY-MM-DD`; 19 Sep 2026 23:25 UTC is 20 Sep in Lisbon
 */
export function facilityDateOf(instant: Instant, zone: Zone): FacilityDate {
  return wallClockOf(instant, zone).date
}

function dayNumber(date: FacilityDate): number {
  if (!isFacilityDate(date)) throw new RangeError(`not a date: ${date}`)
  return Date.parse(`${date}T00:00:00Z`) / MS_PER_DAY
}

/**
 * The calendar date `days` later (or earlier, when negative). Dates have no hours, so no clock change gains or loses
 * a day.
 */
export function addDays(date: FacilityDate, days: number): FacilityDate {
  return new Date((dayNumber(date) + days) * MS_PER_DAY).toISOString().slice(0, 10)
}

/** Calendar days from `a` to `b`: 0 for the same day, negative when `b` is earlier. Never hours ÷ 24. */
export function daysBetween(a: FacilityDate, b: FacilityDate): number {
  return dayNumber(b) - dayNumber(a)
}

/** The later of two dates. Written out because a list of dates is compared as text in many places. */
export function laterDate(a: FacilityDate, b: FacilityDate): FacilityDate {
  return a >= b ? a : b
}
