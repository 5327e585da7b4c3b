import { describe, expect, it } from 'vitest'
import { hasPassed, placeInTime } from '../../../shared/domain/register/place-in-time.ts'

const zone = 'America/Halifax'
const now = '2026-12-01T18:20:00.000Z' // 14:20 in Halifax, UTC-4
const place = (given: { on: string; time?: string; way?: 'in' | 'out' }) => {
  const placed = placeInTime({ way: 'in', ...given }, zone, now)
  return placed.ok ? placed.value.at : placed.refusal.code
}

describe('where an event stands in the ledgers', () => {
  it('is exact with a time of day, in the zone of the facility', () => {
    expect(place({ on: '2026-03-14', time: '13:25' })).toBe('2026-03-14T16:25:00.000Z') // summer time since 8 March
    expect(place({ on: '2026-02-14', time: '13:25' })).toBe('2026-02-14T17:25:00.000Z')
  })
  it('opens an arrival and closes a departure of the same day', () => {
    expect(place({ on: '2026-11-20' })).toBe('2026-11-20T04:00:00.000Z')
    expect(place({ on: '2026-11-20', way: 'out' })).toBe('2026-11-21T03:59:59.999Z')
  })
  it('spans a month or a year', () => {
    expect(place({ on: '2025-06' })).toBe('2025-06-01T03:00:00.000Z')
    expect(place({ on: '2025-06', way: 'out' })).toBe('2025-07-01T02:59:59.999Z')
    expect(place({ on: '2025', way: 'out' })).toBe('2026-01-01T03:59:59.999Z')
  })
  it('never lies ahead: a death of today stands at the present instant', () => {
    expect(place({ on: '2026-12-01', way: 'out' })).toBe(now)
    expect(place({ on: '2026', way: 'out' })).toBe(now)
  })
  it('refuses the future, but not a watch that runs 5 min fast', () => {
    expect(place({ on: '2026-12-02' })).toBe('in-the-future')
    expect(place({ on: '2027' })).toBe('in-the-future')
    expect(place({ on: '2026-12-01', time: '14:25' })).toBe('2026-12-01T18:25:00.000Z')
    expect(place({ on: '2026-12-01', time: '14:26' })).toBe('in-the-future')
    expect(hasPassed('2026-12-01T18:25:00Z', now)).toBe(true)
    expect(hasPassed('2026-12-01T18:25:01Z', now)).toBe(false)
    expect(hasPassed('yesterday', now)).toBe(false)
  })
  it('wants a whole date for a time of day, and a time that a clock shows', () => {
    expect(place({ on: '2026-11', time: '10:00' })).toBe('time-needs-a-day')
    expect(place({ on: '2026-11-20', time: '24:00' })).toBe('not-a-time')
    expect(place({ on: '2026-11-20', time: '9:00' })).toBe('not-a-time')
    expect(place({ on: 'soon' })).toBe('not-a-date')
  })
})
