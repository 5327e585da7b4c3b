import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { planDoses } from '../../../shared/domain/schedule/plan-doses.ts'
import type { OrderFrequency } from '../../../shared/domain/schedule/order-frequency.ts'
import { hoursBetween } from '../../../shared/domain/time/instant-arithmetic.ts'
import { wallClockOf } from '../../../shared/domain/time/facility-date.ts'
import { instantOfLocalTime } from '../../../shared/domain/time/local-time.ts'

const zone = 'Europe/Lisbon'
const firstAt = instantOfLocalTime('2026-03-27', '14:00', zone)
function plan(frequency: OrderFrequency) {
  const answer = planDoses(frequency, firstAt, zone)
  if (!answer.ok) throw new Error(answer.refusal.code)
  return answer.value
}

// Windows: treatments reference, rule R28 (q24 h ± 6 h, others ± 20 %, true hours; project default). Clock change in
// Lisbon on 29 March 2026 (IANA time zone database).
describe('planned doses', () => {
  it('daily ones keep the time of day over a clock change, with 6 true hours either way', () => {
    const doses = plan({ kind: 'every-hours', intervalHours: 24, doseCount: 3 })
    expect(doses.map(({ key }) => key)).toEqual(['1', '2', '3'])
    expect(doses.map(({ dueAt }) => wallClockOf(dueAt, zone))).toEqual(
      ['2026-03-27', '2026-03-28', '2026-03-29'].map((date) => ({ date, time: '14:00:00' })),
    )
    expect(hoursBetween(doses[1]?.dueAt ?? '', doses[2]?.dueAt ?? '')).toBe(23)
    for (const { opensAt, dueAt, closesAt } of doses)
      expect([hoursBetween(opensAt, dueAt), hoursBetween(dueAt, closesAt)]).toEqual([6, 6])
  })
  it('those of less than a day count true hours, with a fifth either way', () => {
    const doses = plan({ kind: 'every-hours', intervalHours: 12, doseCount: 5 })
    expect(hoursBetween(firstAt, doses[4]?.dueAt ?? '')).toBe(48)
    expect(wallClockOf(doses[4]?.dueAt ?? '', zone).time).toBe('15:00:00')
    expect(hoursBetween(doses[4]?.dueAt ?? '', doses[4]?.closesAt ?? '')).toBeCloseTo(2.4, 9)
  })
  it('on chosen days have the window of the interval before them, the first that of the one after', () => {
    const doses = plan({ kind: 'on-days', days: [0, 8, 9] })
    const width = doses.map(({ opensAt, dueAt }) => hoursBetween(opensAt, dueAt))
    expect(width[0]).toBeCloseTo(38.4, 9)
    expect(width[1]).toBeCloseTo(38.4, 9)
    expect(width[2]).toBe(6)
  })
  it('a single one has the window of a day, and a reading-driven line has none', () => {
    expect(plan({ kind: 'once' }).map(({ opensAt, closesAt }) => hoursBetween(opensAt, closesAt))).toEqual([
      12,
    ])
    expect(plan({ kind: 'reading-driven' })).toEqual([])
  })
  it.each<[string, OrderFrequency]>([
    ['interval-not-positive', { kind: 'every-hours', intervalHours: 0, doseCount: 3 }],
    ['interval-not-positive', { kind: 'every-hours', intervalHours: Number.NaN, doseCount: 3 }],
    ['dose-count-not-whole', { kind: 'every-hours', intervalHours: 24, doseCount: 1.5 }],
    ['dose-count-not-whole', { kind: 'every-hours', intervalHours: 24, doseCount: 0 }],
    ['too-many-doses', { kind: 'every-hours', intervalHours: 1, doseCount: 5000 }],
    ['days-not-rising', { kind: 'on-days', days: [] }],
    ['days-not-rising', { kind: 'on-days', days: [3, 3] }],
    ['days-not-rising', { kind: 'on-days', days: [-1, 3] }],
    ['days-not-rising', { kind: 'on-days', days: [0.5] }],
  ])('refuses %s', (code, frequency) => {
    expect(planDoses(frequency, firstAt, zone)).toMatchObject({ ok: false, refusal: { code } })
  })
  it('refuses what is no instant or no zone', () => {
    expect(planDoses({ kind: 'once' }, '2026-03-27', zone)).toMatchObject({
      refusal: { code: 'not-an-instant' },
    })
    expect(planDoses({ kind: 'once' }, firstAt, 'X/Y')).toMatchObject({ refusal: { code: 'unknown-zone' } })
  })
  it('come in order, each inside its own window, with keys of their own', () => {
    const frequencies = fc.record({
      kind: fc.constant('every-hours' as const),
      intervalHours: fc.constantFrom(6, 8, 12, 24, 36, 48, 72),
      doseCount: fc.integer({ min: 1, max: 40 }),
    })
    fc.assert(
      fc.property(frequencies, fc.integer({ min: 0, max: 400 }), (frequency, dayOfYear) => {
        const start = new Date(Date.UTC(2026, 0, 1, 9) + dayOfYear * 86_400_000).toISOString()
        const answer = planDoses(frequency, start, zone)
        const doses = answer.ok ? answer.value : []
        expect(new Set(doses.map(({ key }) => key)).size).toBe(frequency.doseCount)
        for (const [i, dose] of doses.entries()) {
          expect(dose.opensAt < dose.dueAt && dose.dueAt < dose.closesAt).toBe(true)
          expect(i === 0 || (doses[i - 1]?.dueAt ?? '') < dose.dueAt).toBe(true)
        }
      }),
    )
  })
})
