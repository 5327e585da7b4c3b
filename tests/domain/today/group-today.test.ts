import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { groupToday } from '../../../shared/domain/today/group-today.ts'
import { sortToday } from '../../../shared/domain/today/sort-today.ts'
import { todayStates } from '../../../shared/domain/today/today-item.ts'
import type { TodayItem } from '../../../shared/domain/today/today-item.ts'
import { todayKindNames } from '../../../shared/domain/today/today-kinds.ts'

const zone = 'America/Halifax'
// 14:20 at the facility, UTC−4
const now = '2026-12-01T18:20:00Z'

const item = (id: string, given: Partial<TodayItem> = {}): TodayItem => ({
  id,
  kind: 'dose',
  state: 'due',
  dueAt: null,
  latestAt: null,
  dueOn: null,
  latestOn: null,
  at: null,
  ...given,
})

const late = item('late', { state: 'late', dueAt: '2026-12-01T12:00:00Z', latestAt: '2026-12-01T14:00:00Z' })
const longLate = item('long-late', { state: 'late', kind: 'sample', latestOn: '2026-11-29' })
const running = item('running', { state: 'running', kind: 'bath-running', at: '2026-12-01T18:00:00Z' })
const due = item('due', { dueAt: '2026-12-01T18:00:00Z', latestAt: '2026-12-01T19:00:00Z' })
const waits = item('waits', { state: 'waiting', kind: 'order-draft', at: '2026-11-30T18:00:00Z' })
const atFour = item('at-four', { state: 'coming', dueAt: '2026-12-01T20:05:00Z' })
const atFourToo = item('at-four-too', { state: 'coming', dueAt: '2026-12-01T20:50:00Z' })
// 23:30 at the facility, already the next day in UTC
const lateTonight = item('tonight', { state: 'coming', dueAt: '2026-12-02T03:30:00Z' })
const tomorrow = item('tomorrow', { state: 'coming', dueAt: '2026-12-02T13:00:00Z' })
const inTwoDays = item('in-two-days', { state: 'coming', kind: 'sample', dueOn: '2026-12-03' })
const done = item('done', { state: 'done', at: '2026-12-01T12:00:00Z' })
const all = [done, inTwoDays, tomorrow, lateTonight, atFourToo, atFour, waits, due, running, longLate, late]

describe('the bands of the worklist', () => {
  it('put late work first, then what can be done now, then the hours of today, then the days after', () => {
    const bands = groupToday(all, now, zone)
    expect(bands.map((band) => [band.key, band.items.map(({ id }) => id)])).toEqual([
      ['late', ['long-late', 'late']],
      ['now', ['running', 'due', 'waits']],
      ['16:00', ['at-four', 'at-four-too']],
      ['23:00', ['tonight']],
      ['2026-12-02', ['tomorrow']],
      ['2026-12-03', ['in-two-days']],
    ])
    expect(bands.find(({ key }) => key === '16:00')).toMatchObject({ kind: 'hour', hour: 16, on: null })
    expect(bands.at(-1)).toMatchObject({ kind: 'day', hour: null, on: '2026-12-03' })
  })

  it('say that nothing is to be done now, and nothing of hours and days without work', () => {
    expect(groupToday([done], now, zone)).toEqual([
      { key: 'now', kind: 'now', hour: null, on: null, items: [] },
    ])
  })

  it('keep the hours of the facility on a night of 25 hours apart by the clock on its wall', () => {
    // Clocks go back at 02:00 on 1 November 2026: 01:30 comes twice, an hour apart
    const first = item('first', { state: 'coming', dueAt: '2026-11-01T04:30:00Z' })
    const again = item('again', { state: 'coming', dueAt: '2026-11-01T05:30:00Z' })
    const bands = groupToday([again, first], '2026-11-01T03:30:00Z', zone)
    expect(bands.map((band) => [band.key, band.items.map(({ id }) => id)])).toEqual([
      ['now', []],
      ['01:00', ['first', 'again']],
    ])
  })
})

const instants = fc
  .date({ min: new Date('2026-11-28T00:00:00Z'), max: new Date('2026-12-04T00:00:00Z'), noInvalidDate: true })
  .map((date) => date.toISOString())
const days = instants.map((instant) => instant.slice(0, 10))
const anyItem: fc.Arbitrary<TodayItem> = fc.record({
  id: fc.uuid(),
  kind: fc.constantFrom(...todayKindNames),
  state: fc.constantFrom(...todayStates),
  dueAt: fc.option(instants),
  latestAt: fc.option(instants),
  dueOn: fc.option(days),
  latestOn: fc.option(days),
  at: fc.option(instants),
})

describe('whatever work there is', () => {
  it('every piece that is not done stands in exactly one band', () => {
    fc.assert(
      fc.property(fc.array(anyItem, { maxLength: 30 }), (items) => {
        const shown = groupToday(items, now, zone).flatMap((band) => band.items)
        expect(shown.map(({ id }) => id).sort()).toEqual(
          items
            .filter(({ state }) => state !== 'done')
            .map(({ id }) => id)
            .sort(),
        )
      }),
    )
  })

  it('the order does not depend on the order in which it was gathered', () => {
    fc.assert(
      fc.property(fc.uniqueArray(anyItem, { maxLength: 20, selector: ({ id }) => id }), (items) => {
        const ids = (list: TodayItem[]) => sortToday(list, zone).map(({ id }) => id)
        expect(ids([...items].reverse())).toEqual(ids(items))
      }),
    )
  })
})
