import { describe, expect, it } from 'vitest'
import { offsetMinutesAt, writeLocalInstant } from '../../../shared/domain/time/write-local-instant.ts'
import {
  sayDate,
  sayInstant,
  sayInstantWithOffset,
  sayOffset,
  sayTime,
} from '../../../shared/messages/say-date.ts'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')
// Halifax is 4 h behind UTC, 3 h from the second Sunday of March to the first of November (IANA time zone database).
const halifax = 'America/Halifax'

describe('dates and times in words', () => {
  it('say a date as exactly as it is known', () => {
    expect(plain(sayDate('2026-05-14'))).toBe('14 May 2026')
    expect(plain(sayDate('2019-08-09'))).toBe('9 Aug 2019')
    expect(plain(sayDate('2019-08'))).toBe('Aug 2019')
    expect(sayDate('2019')).toBe('2019')
  })
  it('say an instant by the wall clock of the facility', () => {
    expect(plain(sayInstant('2026-12-01T18:20:00Z', halifax))).toBe('1 Dec 2026, 14:20')
    expect(plain(sayInstant('2026-12-02T03:59:59Z', halifax))).toBe('1 Dec 2026, 23:59')
    expect(sayTime('2026-06-01T18:20:00Z', halifax)).toBe('15:20')
  })
  it('say the offset in force on that day', () => {
    expect(sayOffset('2026-12-01T18:20:00Z', halifax)).toBe('UTC−4')
    expect(sayOffset('2026-06-01T18:20:00Z', halifax)).toBe('UTC−3')
    expect(sayOffset('2026-06-01T18:20:00Z', 'Asia/Kathmandu')).toBe('UTC+5:45')
    expect(sayOffset('2026-12-01T18:20:00Z', 'Europe/Lisbon')).toBe('UTC')
    expect(plain(sayInstantWithOffset('2026-12-01T18:20:07Z', halifax))).toBe('1 Dec 2026, 14:20, UTC−4')
    expect(plain(sayInstantWithOffset('2026-12-01T18:20:07Z', halifax, 'second'))).toBe(
      '1 Dec 2026, 14:20:07, UTC−4',
    )
  })
})

describe('an instant written as local time', () => {
  it.each([
    ['2026-03-14T16:25:00Z', halifax, '2026-03-14T13:25:00-03:00', -180],
    ['2026-02-14T17:25:00.999Z', halifax, '2026-02-14T13:25:00-04:00', -240],
    ['2026-06-01T12:00:00+02:00', 'Asia/Kathmandu', '2026-06-01T15:45:00+05:45', 345],
    ['2026-12-01T12:00:00Z', 'UTC', '2026-12-01T12:00:00+00:00', 0],
  ])('%s in %s is %s', (at, zone, written, offset) => {
    expect(writeLocalInstant(at, zone)).toBe(written)
    expect(offsetMinutesAt(at, zone)).toBe(offset)
    expect(Math.floor(Date.parse(written) / 1000)).toBe(Math.floor(Date.parse(at) / 1000))
  })
})
