import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { type OrderStanding, orderPhase } from '../../../shared/domain/orders/order-phase.ts'
import { plannedDoses } from '../../../shared/domain/orders/planned-doses.ts'
import { wallClockOf } from '../../../shared/domain/time/facility-date.ts'

const hour = (n: number) => new Date(Date.UTC(2026, 4, 14, n)).toISOString()
const planned = plannedDoses({ startsAt: hour(14), doses: 3, intervalHours: 24 }, 'UTC')
const lastWindowUntil = planned.at(-1)?.closesAt ?? ''
const signed = (doneKeys: string[] = [], more: Partial<OrderStanding> = {}): OrderStanding => ({
  stage: 'none',
  signed: { planned, doneKeys, lastWindowUntil },
  held: false,
  ended: false,
  running: false,
  hasRecords: doneKeys.length > 0,
  ...more,
})

describe('the doses of an order', () => {
  it('keep their time of day when the clocks change, and carry their windows', () => {
    const zone = 'America/Halifax'
    const daily = plannedDoses({ startsAt: '2026-10-31T17:00:00.000Z', doses: 3, intervalHours: 24 }, zone)
    expect(daily.map(({ key, dueAt }) => [key, wallClockOf(dueAt, zone).time])).toEqual([
      ['1', '14:00:00'],
      ['2', '14:00:00'],
      ['3', '14:00:00'],
    ])
    expect(lastWindowUntil).toBe(hour(14 + 48 + 6))
  })
  it('are one for a single dose, and none for a plan that is none', () => {
    expect(plannedDoses({ startsAt: hour(0), doses: 1, intervalHours: null }, 'UTC')).toHaveLength(1)
    expect(plannedDoses({ startsAt: 'soon', doses: 1, intervalHours: null }, 'UTC')).toEqual([])
    expect(plannedDoses({ startsAt: hour(0), doses: 2, intervalHours: 0 }, 'UTC')).toEqual([])
  })
})

describe('the phase of an order', () => {
  const draft: OrderStanding = {
    stage: 'draft',
    signed: null,
    held: false,
    ended: false,
    running: false,
    hasRecords: false,
  }
  it.each<[string, OrderStanding, number, string]>([
    ['a draft', draft, 0, 'draft'],
    ['a proposal', { ...draft, stage: 'proposed' }, 0, 'proposed'],
    [
      'a signed one with a newer draft stands by its signed version',
      signed([], { stage: 'draft' }),
      0,
      'not-started',
    ],
    ['the first dose done', signed(['1']), 20, 'in-progress'],
    ['all done', signed(['1', '2', '3']), 20, 'completed'],
    ['all done stays so after the last window', signed(['1', '2', '3']), 200, 'completed'],
    ['the last instant of the last window', signed(['1']), 68, 'in-progress'],
    ['past the last window', signed(['1']), 69, 'expired'],
    ['gone with its versions, with doses on record', { ...draft, hasRecords: true }, 20, 'in-progress'],
    ['past the last window while a bath runs', signed(['1'], { running: true }), 69, 'in-progress'],
    ['past it while two run', signed(['1', '2'], { running: true }), 69, 'in-progress'],
    ['all recorded while a bath runs', signed(['1', '2', '3'], { running: true }), 20, 'in-progress'],
    [
      'held while the last bath runs: somebody may mean that one',
      signed(['1', '2', '3'], { running: true, held: true }),
      20,
      'held',
    ],
    ['all done, though it was held before', signed(['1', '2', '3'], { held: true }), 20, 'completed'],
    ['held while a bath runs', signed(['1'], { running: true, held: true }), 69, 'held'],
    ['held', signed(['1'], { held: true }), 20, 'held'],
    [
      'a hold does not lapse with the window: somebody has to look',
      signed(['1'], { held: true }),
      200,
      'held',
    ],
    ['discontinued, whatever else', signed(['1'], { held: true, ended: true }), 20, 'discontinued'],
  ])('%s', (_, standing, at, phase) => expect(orderPhase(standing, hour(at))).toBe(phase))
  it('does not depend on the order in which doses were recorded', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray(['1', '2', '3']), fc.nat(100), (keys, at) => {
        expect(orderPhase(signed([...keys].reverse()), hour(at))).toBe(orderPhase(signed(keys), hour(at)))
      }),
    )
  })
})
