import { describe, expect, it } from 'vitest'
import { howLate } from '../../../shared/domain/today/how-late.ts'
import { judgeDays, judgeHours } from '../../../shared/domain/today/judge-window.ts'

describe('work with an hour', () => {
  const window = { dueAt: '2026-12-01T18:00:00Z', latestAt: '2026-12-01T20:00:00Z' }
  it.each([
    ['before its hour is coming', '2026-12-01T17:59:59Z', 'coming'],
    ['at its hour is due', '2026-12-01T18:00:00Z', 'due'],
    ['at the last instant is still on time', '2026-12-01T20:00:00Z', 'due'],
    ['after it is late', '2026-12-01T20:00:01Z', 'late'],
    ['is judged by the instant, whatever offset it is written with', '2026-12-01T16:30:00-04:00', 'late'],
  ])('%s', (_says, now, state) => expect(judgeHours(window, now)).toBe(state))
})

describe('work with days', () => {
  const window = { dueOn: '2026-12-01', latestOn: '2026-12-03' }
  it.each([
    ['2026-11-30', 'coming'],
    ['2026-12-01', 'due'],
    ['2026-12-03', 'due'],
    ['2026-12-04', 'late'],
  ])('on %s is %s', (today, state) => expect(judgeDays(window, today)).toBe(state))
})

describe('how late something is', () => {
  const by = (latestAt: string, now: string) =>
    howLate({ state: 'late', latestAt, latestOn: null }, now, '2026-12-01')
  it.each([
    ['2026-12-01T18:00:30Z', { count: 0, unit: 'minutes' }],
    ['2026-12-01T18:59:59Z', { count: 59, unit: 'minutes' }],
    ['2026-12-01T19:00:00Z', { count: 1, unit: 'hours' }],
    ['2026-12-02T17:59:59Z', { count: 23, unit: 'hours' }],
    ['2026-12-02T18:00:00Z', { count: 1, unit: 'days' }],
    ['2026-12-04T17:00:00Z', { count: 2, unit: 'days' }],
  ])('at %s after a window that closed at 18:00Z', (now, said) =>
    expect(by('2026-12-01T18:00:00Z', now)).toEqual(said),
  )

  it('is counted in days of the facility for work with days', () => {
    const lateOn = (latestOn: string) =>
      howLate({ state: 'late', latestAt: null, latestOn }, '2026-12-01T04:10:00Z', '2026-12-01')
    expect(lateOn('2026-11-30')).toEqual({ count: 1, unit: 'days' })
    expect(lateOn('2026-11-22')).toEqual({ count: 9, unit: 'days' })
  })

  it('is nothing for what is not late', () => {
    expect(
      howLate(
        { state: 'due', latestAt: '2026-12-01T18:00:00Z', latestOn: null },
        '2026-12-01T17:00:00Z',
        '2026-12-01',
      ),
    ).toBeNull()
  })
})
