import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import {
  type CopperReading,
  computeCopperCourse,
} from '../../../shared/domain/quarantine/compute-copper-course.ts'
import { msToInstant } from '../../../shared/domain/time/instant-arithmetic.ts'
import { local } from './a-clock.ts'

// Source of the expected instants: the quarantine reference's test values of the copper course (K17, section 1.2), mark C:
// target 0.15 mg/L, 21 d = 504 true hours, Europe/Lisbon, clocks back on 25 October 2026.
const reading = (at: string, freeCopperMgPerL: number): CopperReading => ({
  readAt: local(at),
  freeCopperMgPerL,
})
const utc = (at: string) => msToInstant(Date.parse(local(at)))
/** Two good readings a day, 08:00 and 20:00, from one date to another. */
function good(fromOn: number, untilOn: number): CopperReading[] {
  const days = Array.from({ length: untilOn - fromOn + 1 }, (_, i) => String(fromOn + i).padStart(2, '0'))
  return days.flatMap((day) => [reading(`2026-10-${day} 08:00`, 0.18), reading(`2026-10-${day} 20:00`, 0.17)])
}
const first = reading('2026-10-05 08:30', 0.15)
const ask = (readings: CopperReading[], asOf: string) => {
  const course = computeCopperCourse({
    readings,
    targetMgPerL: 0.15,
    rampEndedAt: local('2026-10-05 00:00'),
    courseHours: 504,
    asOf: local(asOf),
  })
  if (!course.ok) throw new Error(course.refusal.code)
  return course.value
}

describe('a copper course', () => {
  it('runs 504 true hours from the first reading at target after the ramp: an hour earlier by the clock', () => {
    const before = reading('2026-10-04 20:00', 0.16)
    const low = reading('2026-10-05 08:00', 0.14)
    const course = ask([before, low, first, reading('2026-10-05 20:00', 0.15)], '2026-10-06 06:00')
    expect(course).toMatchObject({
      state: 'running',
      countStartedAt: utc('2026-10-05 08:30'),
      endsAt: utc('2026-10-26 07:30'),
    })
  })
  it.each([
    ['12 h 00 stands', '2026-10-13 07:40', [], '2026-10-26 07:30'],
    ['12 h 01 restarts', '2026-10-13 07:41', [utc('2026-10-13 07:41')], '2026-11-03 06:41'],
  ])('a low spell of %s, whatever was added meanwhile', (_, until, restartedAt, ends) => {
    const readings = [
      first,
      ...good(6, 11),
      reading('2026-10-12 08:00', 0.16),
      reading('2026-10-12 19:40', 0.12),
      reading(until, 0.16),
    ]
    const course = ask(readings, '2026-10-13 20:00')
    expect([course.state, course.endsAt, course.restartedAt]).toEqual(['running', utc(ends), restartedAt])
    expect(course.lowSpells).toMatchObject([
      { because: 'low-reading', restartsCount: restartedAt.length === 1 },
    ])
  })
  it('no reading counts as low from the 24th hour', () => {
    const readings = [
      first,
      ...good(6, 14),
      reading('2026-10-15 08:00', 0.16),
      reading('2026-10-16 20:30', 0.16),
    ]
    const course = ask(readings, '2026-10-17 06:00')
    expect(course.lowSpells).toEqual([
      {
        from: utc('2026-10-16 08:00'),
        until: utc('2026-10-16 20:30'),
        hours: 12.5,
        because: 'no-reading',
        restartsCount: true,
      },
    ])
    expect(course.endsAt).toBe(utc('2026-11-06 19:30'))
  })
  it('a gap of exactly 24 h is none', () => {
    const course = ask([first, reading('2026-10-06 08:30', 0.15)], '2026-10-06 09:00')
    expect(course.lowSpells).toEqual([])
  })
  it('is interrupted while low for longer than 12 h, and has then no end', () => {
    const readings = [first, reading('2026-10-05 20:00', 0.1)]
    expect(ask(readings, '2026-10-06 08:00').state).toBe('running')
    expect(ask(readings, '2026-10-06 08:01')).toMatchObject({ state: 'interrupted', endsAt: null })
    expect(ask([first], '2026-10-06 21:00')).toMatchObject({ state: 'interrupted' })
  })
  it('is complete when its hours are full, and what comes later no longer matters', () => {
    const all = [first, ...good(6, 25)]
    expect(ask(all, '2026-10-26 07:29').state).toBe('running')
    expect(ask(all, '2026-10-26 07:30').state).toBe('complete')
    const after = [...all, reading('2026-10-26 09:00', 0.02), reading('2026-10-28 09:00', 0)]
    expect(ask(after, '2026-10-30 07:30')).toMatchObject({ state: 'complete', lowSpells: [] })
  })
  it('is not complete while a low reading before the end has not been answered', () => {
    const all = [first, ...good(6, 25), reading('2026-10-26 06:00', 0.1)]
    expect(ask(all, '2026-10-26 08:00').state).toBe('running')
    expect(ask([...all, reading('2026-10-26 09:00', 0.15)], '2026-10-26 10:00').state).toBe('complete')
  })
  it('has not started before a reading reaches the target', () => {
    expect(ask([reading('2026-10-05 08:30', 0.14)], '2026-10-07 08:30')).toEqual({
      state: 'not-started',
      countStartedAt: null,
      endsAt: null,
      restartedAt: [],
      lowSpells: [],
    })
  })
  it.each([
    ['not-an-instant', { asOf: 'now' }],
    ['target-not-positive', { targetMgPerL: 0 }],
    ['target-not-positive', { targetMgPerL: Number.NaN }],
    ['hours-not-positive', { courseHours: -1 }],
    ['hours-not-positive', { toleratedLowHours: Infinity }],
    ['reading-not-a-number', { readings: [reading('2026-10-05 08:30', -0.1)] }],
    ['not-an-instant', { readings: [{ readAt: '2026-10-05', freeCopperMgPerL: 0.15 }] }],
  ])('refuses %s', (code, change) => {
    const question = {
      readings: [first],
      targetMgPerL: 0.15,
      rampEndedAt: local('2026-10-05 00:00'),
      courseHours: 504,
      asOf: local('2026-10-06 00:00'),
      ...change,
    }
    expect(computeCopperCourse(question)).toMatchObject({ ok: false, refusal: { code } })
  })
  it('does not depend on the order of readings, and a later start never ends earlier', () => {
    const some = fc.array(
      fc.record({ hour: fc.integer({ min: 0, max: 700 }), level: fc.integer({ min: 5, max: 25 }) }),
      { minLength: 1, maxLength: 30 },
    )
    const zero = Date.parse(local('2026-10-05 00:00'))
    fc.assert(
      fc.property(some, fc.integer({ min: 0, max: 900 }), (list, asOfHour) => {
        const readings = list.map(({ hour, level }) => ({
          readAt: msToInstant(zero + hour * 3_600_000),
          freeCopperMgPerL: level / 100,
        }))
        const question = {
          readings,
          targetMgPerL: 0.15,
          rampEndedAt: msToInstant(zero),
          courseHours: 504,
          asOf: msToInstant(zero + asOfHour * 3_600_000),
        }
        const course = computeCopperCourse(question)
        expect(computeCopperCourse({ ...question, readings: [...readings].reverse() })).toEqual(course)
        if (!course.ok || course.value.endsAt === null) return
        const { countStartedAt, endsAt } = course.value
        expect(Date.parse(endsAt) - Date.parse(countStartedAt ?? '')).toBe(504 * 3_600_000)
      }),
    )
  })
})
