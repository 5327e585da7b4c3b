import { describe, expect, it } from 'vitest'
import type { ClockEvent, ClockEventBody } from '../../../shared/domain/quarantine/clock-event.ts'
import type { ClockReasonCode } from '../../../shared/domain/quarantine/clock-reason.ts'
import { boxOfFish, clock, event, local, policy, standingCodes } from './a-clock.ts'

// Rules K02 to K11 of the quarantine reference, section 1.2, case by case. Day 0 is 1 April, N 30: 1 May.
const closed = [event('2026-04-01 09:00', boxOfFish), event('2026-04-01 10:00', { kind: 'closed' })]
const asked = (more: ClockEvent[], asOf = '2026-04-20', change = {}) =>
  clock({ cases: [{ caseId: 'fish', policy: policy(change) }], events: [...closed, ...more], asOf })
const animals = (quarantineKind: 'fish' | 'amphibian' | 'invertebrate', into: 'same-water' | 'same-room') =>
  ({ kind: 'addition', what: 'animals', quarantineKind, into }) as const

describe('K02: an open batch', () => {
  it('has no day 0, but says when the last box came', () => {
    const one = clock({
      events: [event('2026-04-03 09:00', boxOfFish), ...closed.slice(0, 1)],
      asOf: '2026-04-10',
    })
    expect([one.status, one.day0On, one.dayNumber, one.lastEntryOn, one.earliestClearanceOn]).toEqual([
      'open',
      null,
      null,
      '2026-04-03',
      null,
    ])
    expect(one.unmet.map(({ code }) => code)).toEqual(['not-closed'])
  })
  it('counts a box that came after closing as an addition', () => {
    const one = asked([event('2026-04-05 09:00', boxOfFish)])
    expect(one.day0On).toBe('2026-04-05')
    expect(standingCodes(one)).toContain('restarted-animals')
    expect(one.legs).toHaveLength(2)
  })
  it('counts from the closing where no box was recorded', () => {
    expect(clock({ events: closed.slice(1), asOf: '2026-04-02' }).day0On).toBe('2026-04-01')
  })
  it('tells the start in its history', () => {
    expect(asked([]).reasons).toMatchObject([
      { code: 'started', rule: 'K02', effect: { kind: 'day-zero', fromOn: null, toOn: '2026-04-01' } },
    ])
  })
})

describe('K06: what restarts, and what does not', () => {
  // The first three rows: the reference's test values (C): frogs into the room of a fish case; fish into that room;
  // snails into the fish's water.
  it.each<[string, ClockEventBody, boolean, ClockReasonCode]>([
    ['frogs, same room, own water', animals('amphibian', 'same-room'), false, 'no-restart-other-kind'],
    ['fish, same room, own water', animals('fish', 'same-room'), true, 'restarted-same-room'],
    ['snails into the water', animals('invertebrate', 'same-water'), true, 'restarted-animals'],
    [
      'fish into connected water',
      { ...animals('fish', 'same-water'), into: 'connected-water' },
      true,
      'restarted-animals',
    ],
    [
      'rock into the water',
      { kind: 'addition', what: 'wet-material', quarantineKind: null, into: 'same-water' },
      true,
      'restarted-wet-material',
    ],
    [
      'rock into the room',
      { kind: 'addition', what: 'wet-material', quarantineKind: null, into: 'same-room' },
      false,
      'no-restart-other-water',
    ],
    [
      'undisinfected gear',
      { kind: 'addition', what: 'undisinfected-gear', quarantineKind: null, into: 'same-room' },
      true,
      'restarted-gear',
    ],
    [
      'animals of a kind nobody wrote down',
      { ...animals('fish', 'same-room'), quarantineKind: null },
      true,
      'restarted-same-room',
    ],
    [
      'a splash from a lower unit',
      { kind: 'breach', how: 'splash', otherUnitStatus: 'lower' },
      true,
      'restarted-breach',
    ],
    [
      'a splash from an equal unit',
      { kind: 'breach', how: 'splash', otherUnitStatus: 'same-or-higher' },
      false,
      'no-restart-status',
    ],
  ])('%s', (_, body, restarts, code) => {
    const one = asked([event('2026-04-12 10:00', body)])
    expect(one.day0On).toBe(restarts ? '2026-04-12' : '2026-04-01')
    expect(one.reasons.map((reason) => reason.code)).toContain(code)
    expect(one.legs).toHaveLength(restarts ? 2 : 1)
  })
  it('an entry on day 0 changes nothing, and says so', () => {
    const one = asked([event('2026-04-01 18:00', animals('fish', 'same-water'))])
    expect(one.legs).toHaveLength(1)
    expect(standingCodes(one)).toContain('no-restart-counted')
  })
})

describe('K09 and K10: extensions and deaths', () => {
  const death = (at: string, more = {}) => event(at, { kind: 'death', ...more }, { eventId: 'd' })
  it('48 h after the last box is the journey, one minute more is not', () => {
    expect(asked([death('2026-04-03 09:00')]).extensions).toEqual([])
    expect(asked([death('2026-04-03 09:01')]).extensions).toMatchObject([
      { kind: 'death', untilOn: '2026-04-17' },
    ])
  })
  it('a vet may let a death of the journey extend all the same', () => {
    const ruled = event('2026-04-03 10:00', { kind: 'transport-death-extends', deathEventId: 'd' })
    expect(asked([death('2026-04-02 09:00'), ruled]).extensions).toMatchObject([{ untilOn: '2026-04-16' }])
  })
  it('an animal that came later has its own journey', () => {
    const late = death('2026-04-13 09:00', { arrivedAt: local('2026-04-12 10:00') })
    expect(asked([event('2026-04-12 10:00', animals('fish', 'same-water')), late]).extensions).toEqual([])
    expect(
      asked([event('2026-04-12 10:00', animals('fish', 'same-water')), death('2026-04-13 09:00')]).extensions,
    ).toHaveLength(1)
  })
  it('counts a death as unexplained where no arrival is recorded', () => {
    const one = clock({ events: [...closed.slice(1), death('2026-04-01 12:00')], asOf: '2026-04-02' })
    expect(one.extensions).toMatchObject([{ kind: 'death', untilOn: '2026-04-15' }])
  })
  it('a signed transmissible cause keeps the extension, also of a death of the journey', () => {
    const signed = event('2026-04-04 10:00', {
      kind: 'death-cause-signed',
      deathEventId: 'd',
      finding: 'explained-transmissible',
      cause: 'vibriosis',
    })
    const one = asked([death('2026-04-02 09:00'), signed])
    expect(one.reasons.find(({ code }) => code === 'extended-transmissible-death')?.params).toMatchObject({
      cause: 'vibriosis',
      untilOn: '2026-04-16',
    })
  })
  it('the newest signed cause counts, and voiding it brings the extension back', () => {
    const explained = {
      kind: 'death-cause-signed',
      deathEventId: 'd',
      finding: 'explained-not-transmissible',
    } as const
    const first = event('2026-04-10 10:00', explained)
    const revised = event('2026-04-12 10:00', { ...explained, finding: 'unexplained' })
    const standing = (more: ClockEvent[]) =>
      asked([death('2026-04-08 09:00'), ...more]).extensions.filter(({ state }) => state === 'standing')
        .length
    expect([standing([]), standing([first]), standing([first, revised])]).toEqual([1, 0, 1])
    expect(
      standing([first, event('2026-04-13 10:00', { kind: 'voided', voidsEventId: first.eventId })]),
    ).toBe(1)
  })
  it('new signs extend; extensions are not added up', () => {
    const signs = event('2026-04-25 09:00', { kind: 'clinical-signs', signs: 'flashing' })
    const one = asked([death('2026-04-20 09:00'), signs], '2026-04-26')
    expect(one.earliestClearanceOn).toBe('2026-05-09')
    expect(one.bounds.map(({ on, binds }) => [on, binds])).toEqual([
      ['2026-05-01', false],
      ['2026-05-04', false],
      ['2026-05-09', true],
    ])
  })
  it('a vet ends an extension', () => {
    const signs = event('2026-04-25 09:00', { kind: 'clinical-signs' })
    const ended = event('2026-04-27 09:00', { kind: 'extension-ended', extensionEventId: signs.eventId })
    const one = asked([signs, ended], '2026-04-28')
    expect([one.earliestClearanceOn, one.extensions[0]?.state]).toEqual(['2026-05-01', 'ended'])
    expect(standingCodes(one)).toEqual(['started', 'extension-ended'])
  })
  it('an animal not feeding by half way waits for a vet, fed or not', () => {
    const refuses = event('2026-04-03 09:00', { kind: 'not-feeding', subject: 'HP-0421' })
    const eats = (at: string) => event(at, { kind: 'feeding', subject: 'HP-0421' })
    expect(asked([refuses], '2026-04-15').extensions).toEqual([]) // day 14 of 30
    expect(asked([refuses], '2026-04-16').extensions).toMatchObject([{ kind: 'not-feeding', untilOn: null }])
    expect(asked([refuses, eats('2026-04-10 09:00')], '2026-04-16').extensions).toEqual([])
    expect(asked([refuses, eats('2026-04-18 09:00')], '2026-04-20').unmet.map(({ code }) => code)).toContain(
      'extension-running',
    )
    const ended = event('2026-04-19 09:00', { kind: 'extension-ended', extensionEventId: refuses.eventId })
    expect(asked([refuses, eats('2026-04-18 09:00'), ended], '2026-05-01').unmet).toEqual([])
  })
})

describe('K11: pauses', () => {
  const hot = (from: string, until: string) => [
    event(from, { kind: 'pause-started', pauseId: 'h', cause: 'temperature-out-of-range' }),
    event(until, { kind: 'pause-ended', pauseId: 'h' }),
  ]
  it('a temperature spell of 24 h does not count; one minute more counts as a whole', () => {
    expect(asked(hot('2026-04-05 08:00', '2026-04-06 08:00')).pausedMinutes).toBe(0)
    expect(standingCodes(asked(hot('2026-04-05 08:00', '2026-04-06 08:00')))).toContain('no-pause-short')
    expect(asked(hot('2026-04-05 08:00', '2026-04-06 08:01')).pausedMinutes).toBe(24 * 60 + 1)
  })
  it('counts only from 00:00 of day 0, also after a restart', () => {
    const spell = hot('2026-04-10 12:00', '2026-04-12 12:00')
    expect(asked(spell).pausedMinutes).toBe(48 * 60)
    expect(asked([...spell, event('2026-04-12 10:00', animals('fish', 'same-water'))]).pausedMinutes).toBe(
      12 * 60,
    )
  })
  it('a pause still running counts up to now and stands against clearance', () => {
    const running = [
      event('2026-04-19 12:00', { kind: 'pause-started', pauseId: 'p', cause: 'life-support-failure' }),
    ]
    const one = asked(running, '2026-04-20 12:00')
    expect([one.pausedMinutes, one.earliestClearanceOn]).toEqual([24 * 60, '2026-05-02'])
    expect(one.unmet.map(({ code }) => code)).toContain('pause-running')
    expect(one.pauses[0]?.until).toBeNull()
  })
  it('before day 0 there is nothing to pause', () => {
    const one = clock({
      events: [
        event('2026-04-01 09:00', { kind: 'pause-started', pauseId: 'p', cause: 'life-support-failure' }),
      ],
      asOf: '2026-04-03',
    })
    expect(one.pausedMinutes).toBe(0)
  })
})

describe('a change of protocol', () => {
  it('gives the new length from the day it was made', () => {
    const change = event('2026-04-15 10:00', {
      kind: 'protocol-changed',
      policy: policy({ requiredDays: 45 }),
    })
    expect(asked([change], '2026-04-14').earliestClearanceOn).toBe('2026-05-01')
    expect(asked([change], '2026-04-16').earliestClearanceOn).toBe('2026-05-16')
    expect(
      asked([change], '2026-04-16').reasons.find(({ code }) => code === 'protocol-changed')?.effect,
    ).toEqual({
      kind: 'length',
      fromDays: 30,
      toDays: 45,
    })
  })
})
