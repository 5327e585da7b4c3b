import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { instantOfLocalTime, startOfFacilityDay } from '../../../shared/domain/time/local-time.ts'
import { addDays, facilityDateOf, wallClockOf } from '../../../shared/domain/time/facility-date.ts'
import {
  addHours,
  compareInstants,
  hoursBetween,
  instantToMs,
  minutesBetween,
} from '../../../shared/domain/time/instant-arithmetic.ts'

describe('the instant of a local time', () => {
  // Clock changes of 2026 (IANA time zone database): Lisbon 29 Mar 01:00 UTC and 25 Oct 01:00 UTC.
  it.each([
    ['2026-03-28', '14:00', 'Europe/Lisbon', '2026-03-28T14:00:00.000Z'],
    ['2026-03-29', '09:15', 'Europe/Lisbon', '2026-03-29T08:15:00.000Z'],
    ['2026-03-29', '01:30', 'Europe/Lisbon', '2026-03-29T01:30:00.000Z'], // skipped: becomes 02:30
    ['2026-10-25', '01:30', 'Europe/Lisbon', '2026-10-25T00:30:00.000Z'], // twice: the first
    ['2026-03-08', '02:30', 'America/New_York', '2026-03-08T07:30:00.000Z'],
    ['2026-07-01', '00:00:30', 'Asia/Kathmandu', '2026-06-30T18:15:30.000Z'],
  ])('%s %s in %s is %s', (date, time, zone, instant) =>
    expect(instantOfLocalTime(date, time, zone)).toBe(instant),
  )
  it('starts the day where midnight is skipped at the end of the gap', () => {
    // Cairo goes forward on the last Friday of April at 00:00 (IANA time zone database, since 2023).
    const start = startOfFacilityDay('2026-04-24', 'Africa/Cairo')
    expect(start).toBe('2026-04-23T22:00:00.000Z')
    expect(wallClockOf(start, 'Africa/Cairo')).toEqual({ date: '2026-04-24', time: '01:00:00' })
  })
  it('is the first instant of its date in every zone', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(
          'Europe/Lisbon',
          'America/New_York',
          'Africa/Cairo',
          'Australia/Lord_Howe',
          'Pacific/Chatham',
        ),
        fc.integer({ min: 0, max: 1500 }),
        (zone, n) => {
          const date = addDays('2025-01-01', n)
          const start = startOfFacilityDay(date, zone)
          const justBefore = new Date(instantToMs(start) - 1).toISOString()
          return (
            facilityDateOf(start, zone) === date && facilityDateOf(justBefore, zone) === addDays(date, -1)
          )
        },
      ),
    )
  })
})

describe('true hours', () => {
  it('counts the night of a clock change as it was lived', () => {
    // Treatments reference, section 4.1: 28 Mar 14:00 to 29 Mar 08:30 in Lisbon is 17.5 h, not 18.5.
    const given = instantOfLocalTime('2026-03-28', '14:00', 'Europe/Lisbon')
    expect(hoursBetween(given, instantOfLocalTime('2026-03-29', '08:30', 'Europe/Lisbon'))).toBe(17.5)
    expect(hoursBetween(given, instantOfLocalTime('2026-03-29', '09:15', 'Europe/Lisbon'))).toBe(18.25)
  })
  it('compares instants, not their text', () => {
    expect(compareInstants('2026-03-01T23:40:00-05:00', '2026-03-02T04:40:00Z')).toBe(0)
    expect(minutesBetween('2026-03-01T23:40:00-05:00', '2026-03-02T04:41:00Z')).toBe(1)
    expect(addHours('2026-10-24T22:00:00+01:00', 49)).toBe('2026-10-26T22:00:00.000Z')
  })
  it('calls text without a zone a bug', () => {
    expect(() => instantToMs('2026-03-01T10:00')).toThrow(RangeError)
    expect(() => instantOfLocalTime('2026-03-01', 'noon', 'UTC')).toThrow(RangeError)
  })
})
