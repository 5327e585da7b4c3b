import { describe, expect, it } from 'vitest'
import type { SharedWaterSpell } from '../../../shared/domain/quarantine/case-clock.ts'
import type { ClockEvent } from '../../../shared/domain/quarantine/clock-event.ts'
import { listSharedWaterSpells } from '../../../shared/domain/quarantine/list-shared-water-spells.ts'
import { aBody, aValve, turned } from '../connections/a-water-map.ts'
import { boxOfFish, clocks, event, local, policy, standingCodes } from './a-clock.ts'

// Fish, N 30, day 0 on 2 April; corals, N 45, day 0 on 20 April; the valve between their waters opened on 25 April.
// Expected dates: the quarantine reference's test values of the clock, section 1.2 (mark C); beyond them as rule K12 says.
const cases = [
  { caseId: 'fish', policy: policy({ requiredDays: 30 }) },
  { caseId: 'corals', quarantineKind: 'invertebrate', policy: policy({ requiredDays: 45 }) },
] as const
const corals = { caseId: 'corals' }
const both: ClockEvent[] = [
  event('2026-04-02 10:00', boxOfFish),
  event('2026-04-02 11:00', { kind: 'closed' }),
  event('2026-04-20 10:00', { kind: 'arrival', quarantineKind: 'invertebrate' }, corals),
  event('2026-04-20 11:00', { kind: 'closed' }, corals),
]
const valve = (until: string | null = null): SharedWaterSpell => ({
  spellId: 'valve',
  caseIds: ['fish', 'corals'],
  from: local('2026-04-25 09:00'),
  until: until === null ? null : local(until),
})
const outage = [
  event('2026-05-01 08:00', { kind: 'pause-started', pauseId: 'o', cause: 'life-support-failure' }, corals),
  event('2026-05-02 14:00', { kind: 'pause-ended', pauseId: 'o' }, corals),
]
const ask = (more: ClockEvent[], asOf: string, sharedWater = [valve()]) =>
  clocks({ cases, events: [...both, ...more], asOf, sharedWater })

describe('two cases on one water', () => {
  it('keep their own days until their waters meet', () => {
    const { fish, corals } = ask([], '2026-04-25 08:59')
    expect([fish?.day0On, fish?.earliestClearanceOn]).toEqual(['2026-04-02', '2026-05-02'])
    expect([corals?.day0On, corals?.earliestClearanceOn]).toEqual(['2026-04-20', '2026-06-04'])
  })
  it('take the latest day 0 and keep their own length', () => {
    const { fish, corals } = ask([], '2026-04-25 12:00')
    expect([fish?.day0On, fish?.earliestClearanceOn]).toEqual(['2026-04-20', '2026-05-20'])
    expect([corals?.day0On, corals?.earliestClearanceOn]).toEqual(['2026-04-20', '2026-06-04'])
    expect(fish?.reasons.find(({ code }) => code === 'restarted-shared-water')).toMatchObject({
      rule: 'K12',
      eventId: 'valve',
      effect: { kind: 'day-zero', fromOn: '2026-04-02', toOn: '2026-04-20' },
      params: { otherCaseId: 'corals', happenedOn: '2026-04-25' },
    })
    expect(corals && standingCodes(corals)).toContain('shared-water')
    expect(fish?.legs.map(({ day0On, daysRun }) => [day0On, daysRun])).toEqual([
      ['2026-04-02', 23],
      ['2026-04-20', null],
    ])
    expect(fish?.sharesWaterWith).toEqual(['corals'])
  })
  it('both stand still while the water has no life support', () => {
    const { fish, corals } = ask(outage, '2026-05-03')
    expect([fish?.earliestClearanceOn, corals?.earliestClearanceOn]).toEqual(['2026-05-22', '2026-06-06'])
    expect(fish?.pauses).toMatchObject([{ pauseId: 'o', fromCaseId: 'corals' }])
  })
  it('are cleared by neither while the other is locked', () => {
    const lock = event('2026-05-15 10:00', { kind: 'locked', cause: 'notifiable-suspicion' }, corals)
    const { fish, corals: locked } = ask([...outage, lock], '2026-05-22')
    expect([fish?.status, fish?.earliestClearanceOn, locked?.status]).toEqual(['locked', null, 'locked'])
    expect(fish?.unmet).toEqual([
      {
        code: 'locked-shared-water',
        params: { eventId: lock.eventId, otherCaseId: 'corals' },
        overridable: false,
      },
    ])
    const lifted = event('2026-05-23 10:00', { kind: 'unlocked', lockEventId: lock.eventId }, corals)
    expect(ask([...outage, lock, lifted], '2026-05-23 11:00').fish?.earliestClearanceOn).toBe('2026-05-22')
  })
  it('do not share a hold', () => {
    const hold = event('2026-05-15 10:00', { kind: 'locked', cause: 'held' }, corals)
    const { fish, corals: held } = ask([hold], '2026-05-16')
    expect([fish?.status, held?.status]).toEqual(['in-quarantine', 'locked'])
    expect(held?.unmet.map(({ code }) => code)).toContain('held')
  })
  it('are not a fresh start for each other: joining is no addition', () => {
    const { corals } = ask([], '2026-04-26')
    expect(corals?.day0On).toBe('2026-04-20')
  })
})

describe('while waters are joined, and after', () => {
  const addition = (at: string) =>
    event(at, { kind: 'addition', what: 'animals', quarantineKind: 'fish', into: 'same-water' })
  it('an addition to either restarts both', () => {
    const { fish, corals } = ask([addition('2026-04-28 10:00')], '2026-04-29')
    expect([fish?.day0On, corals?.day0On]).toEqual(['2026-04-28', '2026-04-28'])
  })
  it('an addition after the valve was shut again restarts one', () => {
    const { fish, corals } = ask([addition('2026-05-05 10:00')], '2026-05-06', [valve('2026-05-04 09:00')])
    expect([fish?.day0On, corals?.day0On]).toEqual(['2026-05-05', '2026-04-20'])
  })
  it('a lock met over the water stays after the valve was shut, until it is lifted or lifted for this case', () => {
    const lock = event('2026-05-01 10:00', { kind: 'locked', cause: 'veterinarian' }, corals)
    const spells = [valve('2026-05-04 09:00')]
    expect(ask([lock], '2026-05-10', spells).fish?.status).toBe('locked')
    const here = event('2026-05-11 10:00', { kind: 'unlocked', lockEventId: lock.eventId })
    const after = ask([lock, here], '2026-05-12', spells)
    expect([after.fish?.status, after.corals?.status]).toEqual(['in-quarantine', 'locked'])
  })
  it('a lock of later than the parting, and a pause, concern one', () => {
    const spells = [valve('2026-04-30 09:00')]
    const lock = event('2026-05-01 10:00', { kind: 'locked', cause: 'veterinarian' }, corals)
    const { fish } = ask([lock, ...outage], '2026-05-10', spells)
    expect([fish?.status, fish?.pausedMinutes]).toEqual(['in-quarantine', 0])
  })
  it('counts only the joined part of a pause, and two faults at once only once', () => {
    const own = [
      event('2026-05-02 10:00', { kind: 'pause-started', pauseId: 'own', cause: 'life-support-failure' }),
      event('2026-05-02 16:00', { kind: 'pause-ended', pauseId: 'own' }),
    ]
    const { fish } = ask([...outage, ...own], '2026-05-10', [valve('2026-05-02 12:00')])
    expect(fish?.pausedMinutes).toBe((28 + 4) * 60)
  })
  it('shares over a third case that touches both', () => {
    const third = { caseId: 'snails', quarantineKind: 'invertebrate', policy: policy() } as const
    const all = clocks({
      cases: [...cases, third],
      events: [...both, event('2026-04-27 10:00', { kind: 'closed' }, { caseId: 'snails' })],
      asOf: '2026-04-28',
      sharedWater: [
        { ...valve(), spellId: 'a', caseIds: ['fish', 'snails'] },
        { ...valve(), spellId: 'b', caseIds: ['snails', 'corals'] },
      ],
    })
    expect(Object.values(all).map(({ day0On }) => day0On)).toEqual(['2026-04-27', '2026-04-27', '2026-04-27'])
  })
  it('a cleared case shares nothing any more', () => {
    const cleared = event('2026-05-20 10:00', { kind: 'cleared' })
    const { fish } = ask([cleared, addition('2026-05-25 10:00')], '2026-06-01')
    expect([fish?.status, fish?.day0On, fish?.dayNumber, fish?.sharesWaterWith]).toEqual([
      'cleared',
      '2026-04-20',
      30,
      [],
    ])
  })
  it('boxes of a batch still coming in restart a closed case on the same water', () => {
    const open = { caseId: 'new', policy: policy() }
    const all = clocks({
      cases: [...cases, open],
      events: [...both, event('2026-04-22 10:00', boxOfFish, { caseId: 'new' })],
      asOf: '2026-04-23',
      sharedWater: [{ spellId: 's', caseIds: ['fish', 'new'], from: local('2026-04-22 09:00'), until: null }],
    })
    expect([all.fish?.day0On, all.new?.status, all.new?.day0On, all.new?.lastEntryOn]).toEqual([
      '2026-04-22',
      'open',
      null,
      '2026-04-22',
    ])
  })
})

describe('spells of shared water from the map', () => {
  const map = {
    bodies: ['a', 'b', 'c'].map(aBody),
    connections: [aValve('a', 'b'), aValve('b', 'c')],
    ledger: [
      turned('a-b', 'shut', '2026-04-01T00:00:00Z'),
      turned('b-c', 'shut', '2026-04-01T00:00:00Z'),
      turned('a-b', 'open', '2026-04-25T08:00:00Z'),
      turned('a-b', 'shut', '2026-04-27T08:00:00Z'),
    ],
  }
  const stays = [
    { caseId: 'fish', waterBodyId: 'a', from: '2026-04-02T09:00:00Z', until: null },
    { caseId: 'corals', waterBodyId: 'b', from: '2026-04-20T09:00:00Z', until: null },
    { caseId: 'rays', waterBodyId: 'b', from: '2026-04-26T09:00:00Z', until: '2026-04-28T09:00:00Z' },
  ]
  it('begin and end with valves and with stays', () => {
    const spells = listSharedWaterSpells(map, stays, '2026-06-01T00:00:00Z')
    expect(
      spells.ok && spells.value.map(({ caseIds, from, until }) => [caseIds.join('+'), from, until]),
    ).toEqual([
      ['corals+fish', '2026-04-25T08:00:00Z', '2026-04-26T09:00:00Z'],
      ['corals+fish+rays', '2026-04-26T09:00:00Z', '2026-04-27T08:00:00Z'],
      ['corals+rays', '2026-04-27T08:00:00Z', '2026-04-28T09:00:00Z'],
    ])
  })
  it('stay open while they last, and need no valve in one body', () => {
    const spells = listSharedWaterSpells(map, stays, '2026-04-26T10:00:00Z')
    expect(spells.ok && spells.value.at(-1)?.until).toBeNull()
  })
  it('refuse what is no instant', () => {
    expect(listSharedWaterSpells(map, stays, 'now')).toMatchObject({ refusal: { code: 'not-an-instant' } })
    const bad = [{ caseId: 'x', waterBodyId: 'a', from: '2026-04-02', until: null }]
    expect(listSharedWaterSpells(map, bad, '2026-06-01T00:00:00Z')).toMatchObject({
      refusal: { code: 'not-an-instant', params: { caseId: 'x' } },
    })
  })
})
