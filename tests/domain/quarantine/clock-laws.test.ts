import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import type { ClockEvent, ClockEventBody } from '../../../shared/domain/quarantine/clock-event.ts'
import { compareClocks } from '../../../shared/domain/quarantine/compare-clocks.ts'
import { computeClock, computeClocks } from '../../../shared/domain/quarantine/compute-clocks.ts'
import { findBatchTransferObstacle } from '../../../shared/domain/quarantine/find-batch-transfer-obstacle.ts'
import { judgeClearance } from '../../../shared/domain/quarantine/judge-clearance.ts'
import { addDays } from '../../../shared/domain/time/facility-date.ts'
import { type Asked, boxOfFish, clock, clocks, event, policy } from './a-clock.ts'

const criteria = [
  { criterionId: 'two', kind: 'negatives', testKey: 'scrape', count: 2, daysApart: 7, daysAfterMasking: 3 },
  { criterionId: 'feeding', kind: 'declared' },
] as const
const cases = [
  { caseId: 'a', policy: policy({ criteria }) },
  { caseId: 'b', quarantineKind: 'invertebrate', policy: policy({ requiredDays: 45 }) },
  { caseId: 'c', policy: policy({ requiredDays: 20, temperaturePauseHours: 12 }) },
] as const
const start = Date.UTC(2026, 2, 1)
const hour = (n: number) => new Date(start + n * 3_600_000).toISOString()
const anHour = fc.integer({ min: 0, max: 24 * 80 })

const aBody: fc.Arbitrary<ClockEventBody> = fc.oneof(
  fc.constant<ClockEventBody>(boxOfFish),
  fc.constant<ClockEventBody>({ kind: 'closed' }),
  fc.record({
    kind: fc.constant('addition' as const),
    what: fc.constantFrom('animals', 'wet-material', 'undisinfected-gear'),
    quarantineKind: fc.constantFrom(null, 'fish', 'amphibian'),
    into: fc.constantFrom('same-water', 'connected-water', 'same-room'),
  }),
  fc.record({
    kind: fc.constant('breach' as const),
    how: fc.constant('net' as const),
    otherUnitStatus: fc.constantFrom('lower', 'same-or-higher'),
  }),
  fc.constant<ClockEventBody>({ kind: 'death' }),
  fc.constant<ClockEventBody>({ kind: 'clinical-signs' }),
  fc.record({ kind: fc.constantFrom('not-feeding' as const, 'feeding' as const), subject: fc.constant('x') }),
  fc.record({
    kind: fc.constantFrom('treatment-started' as const, 'treatment-ended' as const),
    treatmentId: fc.constantFrom('t', 'u'),
    agentName: fc.constant('copper'),
    masks: fc.boolean(),
    forResultEventId: fc.constantFrom('e3', 'e7'),
  }),
  fc.record({
    kind: fc.constant('pause-started' as const),
    pauseId: fc.constantFrom('p', 'q'),
    cause: fc.constantFrom('life-support-failure', 'temperature-out-of-range'),
  }),
  fc.record({ kind: fc.constant('pause-ended' as const), pauseId: fc.constantFrom('p', 'q') }),
  fc.record({ kind: fc.constant('locked' as const), cause: fc.constantFrom('veterinarian', 'held') }),
  fc.record({
    kind: fc.constant('unlocked' as const),
    lockEventId: fc.constantFrom('e1', 'e2', 'e3', 'e4', 'e5'),
  }),
  fc.record({
    kind: fc.constant('criterion-declared' as const),
    criterionId: fc.constant('feeding'),
    met: fc.boolean(),
  }),
  fc.record({
    kind: fc.constant('extension-ended' as const),
    extensionEventId: fc.constantFrom('e2', 'e4', 'e6'),
  }),
  fc.record({
    kind: fc.constant('death-cause-signed' as const),
    deathEventId: fc.constantFrom('e1', 'e2', 'e3', 'e4'),
    finding: fc.constantFrom('explained-not-transmissible', 'explained-transmissible', 'unexplained'),
  }),
  fc.record({ kind: fc.constant('voided' as const), voidsEventId: fc.constantFrom('e0', 'e2', 'e5', 'e8') }),
  fc.constant<ClockEventBody>({ kind: 'cleared' }),
)
const aResult = fc.record({
  result: fc.constantFrom('negative', 'positive', 'inconclusive'),
  pathogenStatus: fc.constantFrom('listed', 'other'),
  taken: anHour,
  wait: fc.integer({ min: 0, max: 200 }),
})

const aHistory: fc.Arbitrary<Asked> = fc
  .record({
    facts: fc.array(fc.record({ body: aBody, at: anHour, caseId: fc.constantFrom('a', 'b', 'c') }), {
      maxLength: 22,
    }),
    results: fc.array(aResult, { maxLength: 6 }),
    spells: fc.array(
      fc.record({
        from: anHour,
        hours: fc.integer({ min: 1, max: 900 }),
        pair: fc.constantFrom('ab', 'bc', 'ac'),
      }),
      { maxLength: 3 },
    ),
    asOf: fc.integer({ min: 24 * 20, max: 24 * 100 }),
    zone: fc.constantFrom('Europe/Lisbon', 'America/New_York', 'Asia/Kathmandu'),
  })
  .map(({ facts, results, spells, asOf, zone }) => ({
    cases,
    zone,
    asOf: hour(asOf),
    events: [
      ...facts.map(({ body, at, caseId }, i): ClockEvent => ({
        eventId: `e${i}`,
        caseId,
        at: hour(at),
        ...body,
      })),
      ...results.map(({ taken, wait, ...result }, i): ClockEvent => ({
        eventId: `r${i}`,
        caseId: 'a',
        at: hour(taken + wait),
        kind: 'sample-result',
        sampleId: `s${i}`,
        testKey: 'scrape',
        takenAt: hour(taken),
        ...result,
      })),
    ],
    sharedWater: spells.map(({ from, hours, pair }, i) => ({
      spellId: `w${i}`,
      caseIds: [...pair],
      from: hour(from),
      until: hour(from + hours),
    })),
  }))

/** A deterministic shuffle by an arbitrary list of numbers. */
function shuffled<T>(list: readonly T[], keys: readonly number[]): T[] {
  return list
    .map((value, i) => ({ value, key: keys[i % Math.max(1, keys.length)] ?? 0, i }))
    .sort((a, b) => a.key - b.key || b.i - a.i)
    .map(({ value }) => value)
}

describe('laws of the clock', () => {
  it('the same events give the same clocks, in whatever order they were entered, and given twice', () => {
    fc.assert(
      fc.property(aHistory, fc.array(fc.nat(1000), { minLength: 5, maxLength: 30 }), (asked, keys) => {
        const again = {
          ...asked,
          events: shuffled([...asked.events, ...asked.events.slice(0, 4)], keys),
          sharedWater: shuffled(asked.sharedWater ?? [], keys),
        }
        expect(clocks(again)).toEqual(clocks(asked))
      }),
      { numRuns: 120 },
    )
  })
  it('a void holds although another void names it, whichever was entered first', () => {
    const signs = event('2026-03-01', { kind: 'clinical-signs' }, { eventId: 'e1' })
    const itsVoid = event('2026-03-01', { kind: 'voided', voidsEventId: 'e1' }, { eventId: 'e2' })
    const voidOfVoid = event('2026-03-01', { kind: 'voided', voidsEventId: 'e2' }, { eventId: 'e3' })
    const read = (events: ClockEvent[]) => clock({ events, asOf: '2026-03-21' })
    expect(read([signs]).extensions).toHaveLength(1)
    for (const events of [
      [signs, itsVoid, voidOfVoid],
      [voidOfVoid, signs, itsVoid],
      [voidOfVoid, itsVoid, signs],
    ])
      expect(read(events).extensions).toEqual([])
  })
  it('voiding an event is never having had it', () => {
    fc.assert(
      fc.property(aHistory, fc.nat(40), (asked, pick) => {
        const target = asked.events[pick % Math.max(1, asked.events.length)]
        // A void cannot itself be voided: it is entered again.
        if (!target || target.kind === 'voided') return
        const isVoid = (one: ClockEvent) => one.kind === 'voided' && one.voidsEventId === target.eventId
        const without = asked.events.filter((one) => one !== target && !isVoid(one))
        const voided: ClockEvent = {
          eventId: 'v',
          caseId: target.caseId,
          at: asked.asOf,
          kind: 'voided',
          voidsEventId: target.eventId,
        }
        expect(clocks({ ...asked, events: [...asked.events, voided] })).toEqual(
          clocks({ ...asked, events: without }),
        )
      }),
      { numRuns: 80 },
    )
  })
  it('every change names its event and its rule, and every date is the latest of its bounds', () => {
    fc.assert(
      fc.property(aHistory, (asked) => {
        const ids = new Set([
          ...asked.events.map(({ eventId }) => eventId),
          ...(asked.sharedWater ?? []).map(({ spellId }) => spellId),
        ])
        for (const one of Object.values(clocks(asked))) {
          for (const reason of one.reasons) expect(ids.has(reason.eventId), reason.code).toBe(true)
          const latest =
            one.bounds
              .map(({ on }) => on)
              .sort()
              .at(-1) ?? null
          expect(one.earliestIfUnlockedOn).toBe(latest)
          expect(one.bounds.filter(({ binds }) => binds)).toHaveLength(one.bounds.length > 0 ? 1 : 0)
          const isLocked = one.locks.some(({ liftedAt }) => liftedAt === null)
          if (isLocked || one.day0On === null) expect(one.earliestClearanceOn).toBeNull()
          if (one.day0On !== null) {
            const least = addDays(one.day0On, one.requiredDays + one.pausedDays)
            expect(one.earliestIfUnlockedOn !== null && one.earliestIfUnlockedOn >= least).toBe(true)
          }
          const moves = one.reasons.filter(
            ({ effect, code }) => effect.kind === 'day-zero' && code !== 'started',
          )
          if (moves.length === 0 && one.day0On !== null) expect(one.legs).toHaveLength(1)
        }
      }),
      { numRuns: 80 },
    )
  })
  it('cases on one water at the instant have one day 0', () => {
    fc.assert(
      fc.property(aHistory, (asked) => {
        const all = clocks(asked)
        for (const one of Object.values(all))
          for (const other of one.sharesWaterWith) {
            const theirs = all[other]?.day0On ?? null
            if (one.day0On !== null && theirs !== null) expect(theirs).toBe(one.day0On)
          }
      }),
      { numRuns: 120 },
    )
  })
  it('one more restart, death or pause never makes the clearance earlier', () => {
    const worse = fc.constantFrom<ClockEventBody>(
      { kind: 'addition', what: 'animals', quarantineKind: 'fish', into: 'same-water' },
      { kind: 'death' },
      { kind: 'clinical-signs' },
      { kind: 'treatment-ended', treatmentId: 'z', agentName: 'copper', masks: true },
    )
    const simple = fc.array(fc.record({ body: worse, at: fc.integer({ min: 48, max: 24 * 40 }) }), {
      maxLength: 8,
    })
    fc.assert(
      fc.property(simple, worse, fc.integer({ min: 48, max: 24 * 40 }), (facts, body, at) => {
        const closed: ClockEvent[] = [{ eventId: 'closed', caseId: 'fish', at: hour(0), kind: 'closed' }]
        const events = [
          ...closed,
          ...facts.map((one, i): ClockEvent => ({
            eventId: `e${i}`,
            caseId: 'fish',
            at: hour(one.at),
            ...one.body,
          })),
        ]
        const more: ClockEvent = { eventId: 'more', caseId: 'fish', at: hour(at), ...body }
        const before = clock({ events, asOf: hour(24 * 60) }).earliestClearanceOn ?? ''
        const after = clock({ events: [...events, more], asOf: hour(24 * 60) }).earliestClearanceOn ?? ''
        return after >= before
      }),
    )
  })
})

describe('what the clock refuses', () => {
  const good = {
    cases: [{ caseId: 'fish', quarantineKind: 'fish', policy: policy() }],
    asOf: hour(0),
    zone: 'Europe/Lisbon',
  } as const
  const closed = event('2026-04-01 10:00', { kind: 'closed' })
  it.each([
    ['not-an-instant', { ...good, asOf: '2026-04-01', events: [] }],
    ['not-an-instant', { ...good, events: [{ ...closed, at: '2026-04-01T10:00' }] }],
    [
      'not-an-instant',
      { ...good, events: [], sharedWater: [{ spellId: 's', caseIds: ['fish'], from: 'x', until: null }] },
    ],
    ['unknown-zone', { ...good, zone: 'Harrow/Point', events: [] }],
    ['unknown-case', { ...good, events: [{ ...closed, caseId: 'other' }] }],
    ['duplicate-case', { ...good, cases: [...good.cases, ...good.cases], events: [] }],
    [
      'policy-not-whole-days',
      { ...good, cases: [{ ...good.cases[0], policy: policy({ requiredDays: 30.5 }) }], events: [] },
    ],
    [
      'policy-not-whole-days',
      { ...good, cases: [{ ...good.cases[0], policy: policy({ requiredDays: -1 }) }], events: [] },
    ],
  ])('%s', (code, question) => {
    expect(computeClocks(question)).toMatchObject({ ok: false, refusal: { code } })
  })
  it('a sample taken after it was reported', () => {
    const sample = event('2026-04-01 10:00', {
      kind: 'sample-result',
      sampleId: 's',
      testKey: 't',
      takenAt: hour(24 * 60),
      result: 'negative',
    })
    expect(computeClocks({ ...good, events: [sample] })).toMatchObject({
      refusal: { code: 'sample-taken-after-report' },
    })
  })
  it('a case it was not given', () => {
    expect(computeClock({ ...good, events: [] }, 'other')).toMatchObject({
      refusal: { code: 'unknown-case' },
    })
    expect(computeClock({ ...good, events: [] }, 'fish')).toMatchObject({
      ok: true,
      value: { status: 'open' },
    })
  })
})

describe('clearance, transfer and comparison', () => {
  const closed = [event('2026-04-01 09:00', boxOfFish), event('2026-04-01 10:00', { kind: 'closed' })]
  const addition = event('2026-04-12 10:00', {
    kind: 'addition',
    what: 'animals',
    quarantineKind: 'fish',
    into: 'same-water',
  })
  const lock = event('2026-04-20 10:00', { kind: 'locked', cause: 'veterinarian' })
  it('is clear on the earliest day, wants a reason before it, and is refused while locked or ended', () => {
    expect(judgeClearance(clock({ events: closed, asOf: '2026-05-01' })).verdict).toBe('clear')
    const early = judgeClearance(clock({ events: closed, asOf: '2026-04-30' }))
    expect([early.verdict, early.unmet[0]?.params.daysLeft]).toEqual(['with-reason', 1])
    const locked = judgeClearance(clock({ events: [...closed, lock], asOf: '2026-05-01' }))
    expect([locked.verdict, locked.refusedBy.map(({ code }) => code)]).toEqual(['refused', ['locked']])
    const open = clock({ events: closed.slice(0, 1), asOf: '2026-05-01' })
    expect(judgeClearance(open).verdict).toBe('refused')
    const done = clock({
      events: [...closed, event('2026-05-01 10:00', { kind: 'cleared' })],
      asOf: '2026-05-02',
    })
    expect(judgeClearance(done)).toMatchObject({ verdict: 'refused', alreadyEnded: true })
  })
  it('a batch may only go to days as few or fewer', () => {
    const early = clock({ events: closed, asOf: '2026-04-15' })
    const late = clock({ events: [...closed, addition], asOf: '2026-04-15' })
    const locked = clock({ events: [...closed, lock], asOf: '2026-04-21' })
    const open = clock({ events: closed.slice(0, 1), asOf: '2026-04-15' })
    const ended = clock({
      events: [...closed, event('2026-04-14 10:00', { kind: 'transferred-out' })],
      asOf: '2026-04-15',
    })
    expect(findBatchTransferObstacle(early, late)).toBeNull()
    expect(findBatchTransferObstacle(early, early)).toBeNull()
    expect(findBatchTransferObstacle(late, early)).toBe('further-along')
    expect(findBatchTransferObstacle(locked, late)).toBe('locked')
    expect(findBatchTransferObstacle(early, locked)).toBe('locked')
    expect(findBatchTransferObstacle(early, open)).toBe('not-closed')
    expect(findBatchTransferObstacle(ended, early)).toBe('ended')
  })
  it('two clocks differ by what the event did', () => {
    const before = clock({ events: closed, asOf: '2026-04-15' })
    const after = clock({ events: [...closed, addition], asOf: '2026-04-15' })
    const change = compareClocks(before, after)
    expect(change).toMatchObject({
      day0On: { before: '2026-04-01', after: '2026-04-12' },
      earliestClearanceOn: { before: '2026-05-01', after: '2026-05-12' },
      status: null,
    })
    expect(change.newReasons.map(({ code }) => code)).toEqual(['restarted-animals'])
    expect(change.goneReasons).toEqual([])
    expect(compareClocks(after, after)).toMatchObject({ day0On: null, newReasons: [], goneReasons: [] })
  })
})
