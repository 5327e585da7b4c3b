import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { isFacilityDate, isInstant } from '../../../shared/domain/time/instant.ts'
import {
  addDays,
  daysBetween,
  facilityDateOf,
  isZone,
  laterDate,
  wallClockOf,
} from '../../../shared/domain/time/facility-date.ts'

const zones = [
  'Europe/Lisbon',
  'America/New_York',
  'Australia/Lord_Howe',
  'Asia/Kathmandu',
  'Pacific/Kiritimati',
  'UTC',
]
const aDate = fc
  .integer({ min: Date.UTC(1990, 0, 1) / 86_400_000, max: Date.UTC(2060, 0, 1) / 86_400_000 })
  .map((day) => new Date(day * 86_400_000).toISOString().slice(0, 10))

describe('what counts as an instant or a date', () => {
  it.each(['2026-03-28T14:00:00Z', '2026-03-28T14:00Z', '2026-03-28T14:00:00.250+01:00'])(
    'takes %s',
    (text) => expect(isInstant(text)).toBe(true),
  )
  it.each([
    '2026-03-28',
    '2026-03-28T14:00:00',
    '28 Mar 2026 14:00Z',
    '2026-02-30T10:00:00Z',
    '2026-13-01T10:00:00Z',
    '2026-03-28T25:00:00Z',
    '',
  ])('refuses %s, which is no instant or means another one on each machine', (text) =>
    expect(isInstant(text)).toBe(false),
  )
  it('knows the days that the calendar has', () => {
    expect(isFacilityDate('2028-02-29')).toBe(true)
    for (const none of ['2026-02-29', '2026-04-31', '2026-4-1', '2026-04-01T00:00Z', 'today'])
      expect(isFacilityDate(none), none).toBe(false)
  })

  it('has the days that the calendar has, leap years of a century too (against the calendar of JavaScript)', () => {
    const two = (n: number) => String(n).padStart(2, '0')
    for (const year of [1600, 1900, 1999, 2000, 2023, 2024, 2026, 2028, 2100, 2400])
      for (let month = 0; month <= 13; month++)
        for (let day = 0; day <= 32; day++) {
          const text = `${year}-${two(month)}-${two(day)}`
          const ms = Date.parse(`${text}T00:00:00Z`)
          const has = Number.isFinite(ms) && new Date(ms).toISOString().startsWith(text)
          expect(isFacilityDate(text), text).toBe(has)
        }
  })
  it('shows the clock that the machine shows in every zone it knows, before and after offsets had seconds', () => {
    const anInstant = fc.integer({ min: Date.UTC(1900, 0, 1), max: Date.UTC(2060, 0, 1) })
    const aZone = fc.constantFrom(...Intl.supportedValuesOf('timeZone'))
    fc.assert(
      fc.property(anInstant, aZone, (ms, timeZone) => {
        const shown = new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'medium' })
        // asked twice: the second answer is a kept one
        for (const at of [ms, ms + 1, ms]) {
          const { date, time } = wallClockOf(new Date(at).toISOString(), timeZone)
          expect(`${date} ${time}`).toBe(shown.format(at))
        }
      }),
      { numRuns: 600 },
    )
  })
  it('knows zones by name', () => {
    expect(isZone('Europe/Lisbon')).toBe(true)
    expect(isZone('Harrow/Point')).toBe(false)
    expect(isZone('')).toBe(false)
  })
})

describe('the facility date of an instant', () => {
  // Instants and dates of the project's clock cases (quarantine reference, section 1.2, test values; computed there).
  it.each([
    ['2026-09-19T23:25:00Z', 'Europe/Lisbon', '2026-09-20'],
    ['2026-10-11T23:10:00Z', 'Europe/Lisbon', '2026-10-12'],
    ['2026-03-29T23:20:00Z', 'Europe/Lisbon', '2026-03-30'],
    ['2026-03-02T04:40:00Z', 'America/New_York', '2026-03-01'],
    ['2026-10-25T23:30:00Z', 'Europe/Lisbon', '2026-10-25'],
    ['2026-03-01T23:30:00-05:00', 'America/New_York', '2026-03-01'],
  ])('%s in %s is %s', (instant, zone, date) => expect(facilityDateOf(instant, zone)).toBe(date))

  it('shows the hour that happens twice, and midnight as 00', () => {
    expect(wallClockOf('2026-10-25T00:30:00Z', 'Europe/Lisbon')).toEqual({
      date: '2026-10-25',
      time: '01:30:00',
    })
    expect(wallClockOf('2026-10-25T01:30:00Z', 'Europe/Lisbon')).toEqual({
      date: '2026-10-25',
      time: '01:30:00',
    })
    expect(wallClockOf('2026-06-30T23:00:00Z', 'Europe/Lisbon')).toEqual({
      date: '2026-07-01',
      time: '00:00:00',
    })
  })

  it('never goes back while time goes on', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...zones),
        fc.integer({ min: Date.UTC(2026, 0, 1), max: Date.UTC(2027, 0, 1) }),
        fc.integer({ min: 0, max: 3 * 86_400_000 }),
        (zone, ms, later) => {
          const a = facilityDateOf(new Date(ms).toISOString(), zone)
          const b = facilityDateOf(new Date(ms + later).toISOString(), zone)
          return a <= b
        },
      ),
    )
  })
})

describe('days on the calendar', () => {
  it('crosses both clock changes, a leap day and a year without gaining or losing a day', () => {
    expect(addDays('2026-03-10', 20)).toBe('2026-03-30')
    expect(addDays('2026-10-12', 13)).toBe('2026-10-25')
    expect(addDays('2028-02-28', 2)).toBe('2028-03-01')
    expect(addDays('2026-12-31', 1)).toBe('2027-01-01')
    expect(daysBetween('2026-03-30', '2026-03-10')).toBe(-20)
    expect(laterDate('2026-03-30', '2026-04-01')).toBe('2026-04-01')
  })
  it('adding and counting are each other’s inverse', () => {
    fc.assert(
      fc.property(
        aDate,
        fc.integer({ min: -5000, max: 5000 }),
        (date, n) => daysBetween(date, addDays(date, n)) === n,
      ),
    )
  })
})
