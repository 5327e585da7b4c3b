import { describe, expect, it } from 'vitest'
import { licenceNotices } from '../../../shared/domain/licences/licence-notices.ts'
import type { HeldLicence } from '../../../shared/domain/licences/licence-classes.ts'
import { licenceState } from '../../../shared/domain/licences/licence-state.ts'
import { licenceWarning } from '../../../shared/domain/licences/licence-warning.ts'
import { addDays, facilityDateOf } from '../../../shared/domain/time/facility-date.ts'

const days = { first: 60, second: 30, last: 7 }
const today = '2026-12-01'
const accepted = ['Norrell Sound', 'Outer Skerries']

const licence = (given: Partial<HeldLicence>): HeldLicence => ({
  id: 'a',
  class: 'veterinary',
  jurisdiction: 'Norrell Sound',
  number: 'VL-1',
  validFrom: '2024-01-01',
  validUntil: '2027-12-31',
  endedOn: null,
  void: false,
  superseded: false,
  ...given,
})
const told = (...licences: HeldLicence[]) =>
  licenceNotices(licences, today, accepted, days).map(({ licence: { number }, level, daysLeft }) => [
    number,
    level,
    daysLeft,
  ])

describe('the warning about the end of a licence', () => {
  it.each([
    [61, 'none'],
    [60, 'first'],
    [59, 'first'],
    [31, 'first'],
    [30, 'second'],
    [29, 'second'],
    [8, 'second'],
    [7, 'last'],
    [6, 'last'],
    [1, 'last'],
    [0, 'last'],
    [-1, 'ended'],
  ] as const)('%s days before its last day stands at: %s', (daysLeft, level) => {
    expect(licenceWarning(addDays(today, daysLeft), today, days)).toEqual({ level, daysLeft })
    const state = licenceState(licence({ validUntil: addDays(today, daysLeft) }), today, accepted)
    expect(state).toBe(level === 'ended' ? 'expired' : 'valid')
  })

  it('counts days of the facility, also across the change of its clocks', () => {
    const zone = 'America/Halifax'
    const lastDay = '2026-11-08'
    const on = (instant: string) => licenceWarning(lastDay, facilityDateOf(instant, zone), days)
    // clocks go back on 1 November 2026: that day has 25 hours
    expect(on('2026-11-01T02:59:59Z')).toEqual({ level: 'second', daysLeft: 8 })
    expect(on('2026-11-01T03:00:00Z')).toEqual({ level: 'last', daysLeft: 7 })
    expect(on('2026-11-09T03:59:59Z')).toEqual({ level: 'last', daysLeft: 0 })
    expect(on('2026-11-09T04:00:00Z')).toEqual({ level: 'ended', daysLeft: -1 })
  })

  it('goes by the settings of the facility', () => {
    const own = { first: 90, second: 14, last: 3 }
    expect(licenceWarning(addDays(today, 90), today, own).level).toBe('first')
    expect(licenceWarning(addDays(today, 15), today, own).level).toBe('first')
    expect(licenceWarning(addDays(today, 14), today, own).level).toBe('second')
    expect(licenceWarning(addDays(today, 3), today, own).level).toBe('last')
  })
})

describe('what is said of the licences of a person', () => {
  it('says nothing of none, and of one that goes on', () => {
    expect(told()).toEqual([])
    expect(told(licence({}))).toEqual([])
  })

  it('names what ends soon and what has ended, the most pressing first', () => {
    const soon = licence({ id: 'b', number: 'VL-2', validUntil: '2026-12-26' })
    const over = licence({ id: 'c', class: 'controlled-substance', number: 'CS-1', validUntil: '2026-11-30' })
    expect(told(soon, over)).toEqual([
      ['CS-1', 'ended', -1],
      ['VL-2', 'second', 25],
    ])
  })

  it('is silent about one that another follows at once, not about a gap', () => {
    const old = licence({ validUntil: '2026-12-10' })
    expect(told(old, licence({ id: 'b', validFrom: '2026-12-11' }))).toEqual([])
    expect(told(old, licence({ id: 'b', validFrom: '2026-12-12' }))).toEqual([['VL-1', 'second', 9]])
    // of another class or jurisdiction it is no follower
    expect(told(old, licence({ id: 'b', class: 'controlled-substance' }))).toHaveLength(1)
    expect(told(old, licence({ id: 'b', jurisdiction: 'outer skerries ' }))).toHaveLength(1)
  })

  it('says the end of the follower when that is near too', () => {
    const chain = [
      licence({ validUntil: '2026-12-05' }),
      licence({ id: 'b', number: 'VL-2', validFrom: '2026-12-06', validUntil: '2027-01-15' }),
    ]
    expect(told(...chain)).toEqual([['VL-2', 'first', 45]])
  })

  it('does not go on about an ended one beside a valid one, one ended on purpose, a void or a corrected one', () => {
    const over = licence({ id: 'b', jurisdiction: 'Outer Skerries', validUntil: '2026-06-30' })
    expect(told(over)).toHaveLength(1)
    expect(told(over, licence({}))).toEqual([])
    expect(told(licence({ endedOn: '2026-06-30' }))).toEqual([])
    expect(told(licence({ validUntil: '2026-12-05', void: true }))).toEqual([])
    expect(told(licence({ validUntil: '2026-12-05', superseded: true }))).toEqual([])
    expect(told(licence({ validUntil: '2026-12-05', jurisdiction: 'Elsewhere' }))).toEqual([])
  })

  it('warns of the day on which one is ended before its time', () => {
    expect(told(licence({ endedOn: '2026-12-05' }))).toEqual([['VL-1', 'last', 4]])
    expect(licenceState(licence({ endedOn: '2026-12-01' }), today, accepted)).toBe('valid')
    expect(licenceState(licence({ endedOn: '2026-11-30' }), today, accepted)).toBe('ended')
  })
})
