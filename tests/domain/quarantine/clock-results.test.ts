import { describe, expect, it } from 'vitest'
import type { ClockEvent, ClockEventBody } from '../../../shared/domain/quarantine/clock-event.ts'
import { boxOfFish, clock, event, local, policy, standingCodes } from './a-clock.ts'

// Rules K05, K07, K08 and K13 to K15 of the quarantine reference, section 1.2, case by case. Day 0 is 1 April, N 30: 1 May.
const closed = [event('2026-04-01 09:00', boxOfFish), event('2026-04-01 10:00', { kind: 'closed' })]
const asked = (more: ClockEvent[], asOf = '2026-04-20', change = {}) =>
  clock({ cases: [{ caseId: 'fish', policy: policy(change) }], events: [...closed, ...more], asOf })
const animals = (quarantineKind: 'fish' | 'amphibian' | 'invertebrate', into: 'same-water' | 'same-room') =>
  ({ kind: 'addition', what: 'animals', quarantineKind, into }) as const

describe('K07 and K08: positives and locks', () => {
  const result = (
    body: Partial<Extract<ClockEventBody, { kind: 'sample-result' }>>,
    reported = '2026-04-12 10:00',
  ) =>
    event(
      reported,
      {
        kind: 'sample-result',
        sampleId: 's',
        testKey: 'scrape',
        takenAt: local('2026-04-10 10:00'),
        result: 'positive',
        ...body,
      },
      { eventId: `r ${reported}` },
    )
  const criteria = [
    {
      criterionId: 'clean',
      kind: 'negatives',
      testKey: 'scrape',
      count: 1,
      daysApart: 7,
      daysAfterMasking: 0,
    },
  ] as const
  it('a lesser positive extends until its criterion is met again', () => {
    const positive = result({ pathogenName: 'monogenean', pathogenStatus: 'other' })
    const waiting = asked([positive], '2026-05-02', { criteria })
    expect([waiting.status, waiting.day0On]).toEqual(['in-quarantine', '2026-04-01'])
    expect(waiting.unmet.map(({ code }) => code)).toEqual(['extension-running', 'negatives-missing'])
    const clean = result({ takenAt: local('2026-05-03 10:00'), result: 'negative' }, '2026-05-04 10:00')
    const met = asked([positive, clean], '2026-05-05', { criteria })
    expect([met.unmet, met.earliestClearanceOn]).toEqual([[], '2026-05-03'])
    expect(met.reasons.find(({ code }) => code === 'extended-positive')?.standing).toBe(false)
  })
  it('without a criterion a vet ends it', () => {
    const positive = result({ pathogenStatus: 'other' })
    expect(asked([positive], '2026-05-02').unmet.map(({ code }) => code)).toEqual(['extension-running'])
    const ended = event('2026-05-01 10:00', { kind: 'extension-ended', extensionEventId: positive.eventId })
    expect(asked([positive, ended], '2026-05-02').unmet).toEqual([])
  })
  it('an untreated critical positive stays locked until a vet decides', () => {
    const positive = result({ pathogenStatus: 'facility-critical' })
    expect(asked([positive], '2026-06-01').status).toBe('locked')
    const lifted = event('2026-05-20 10:00', { kind: 'unlocked', lockEventId: positive.eventId })
    const one = asked([positive, lifted], '2026-06-01')
    expect([one.status, one.earliestClearanceOn, one.locks[0]?.liftedAt]).toEqual([
      'in-quarantine',
      '2026-05-01',
      local('2026-05-20 10:00'),
    ])
  })
  it('a treatment that still runs keeps the lock, one that ended before the report does not lift it', () => {
    const positive = result({ pathogenStatus: 'listed' })
    const treatment = { treatmentId: 't', agentName: 'x', masks: true, forResultEventId: positive.eventId }
    const again = event('2026-04-25 10:00', { kind: 'treatment-started', ...treatment, treatmentId: 'u' })
    const ended = event('2026-04-24 10:00', { kind: 'treatment-ended', ...treatment })
    expect(asked([positive, ended], '2026-04-26').status).toBe('in-quarantine')
    expect(asked([positive, ended, again], '2026-04-26').status).toBe('locked')
    const before = event('2026-04-11 10:00', { kind: 'treatment-ended', ...treatment })
    expect(asked([positive, before], '2026-04-26').status).toBe('locked')
  })
  it.each(['notifiable-suspicion', 'veterinarian', 'held'] as const)(
    'a lock (%s) leaves no date until lifted',
    (cause) => {
      const lock = event('2026-04-12 10:00', { kind: 'locked', cause })
      expect(asked([lock]).earliestClearanceOn).toBeNull()
      const lifted = event('2026-04-13 10:00', { kind: 'unlocked', lockEventId: lock.eventId })
      const one = asked([lock, lifted])
      expect([one.status, one.earliestClearanceOn]).toEqual(['in-quarantine', '2026-05-01'])
      expect(standingCodes(one)).toEqual(['started', 'unlocked'])
    },
  )
})

describe('K14: masking treatments', () => {
  const bath = { treatmentId: 'b', agentName: 'praziquantel', masks: true } as const
  it('uses the window of the treatment where a vet set one', () => {
    const one = asked(
      [event('2026-04-20 10:00', { kind: 'treatment-ended', ...bath, windowDays: 21 })],
      '2026-04-21',
    )
    expect(one.earliestClearanceOn).toBe('2026-05-11')
  })
  it('a running treatment gives the earliest date it can, and says that it may move', () => {
    const started = event('2026-04-20 10:00', { kind: 'treatment-started', ...bath })
    expect(asked([started], '2026-04-25').extensions).toMatchObject([
      { untilOn: '2026-05-09', provisional: true },
    ])
    const planned = { ...started, plannedEndOn: '2026-05-01' } as ClockEvent
    expect(asked([planned], '2026-04-25').earliestClearanceOn).toBe('2026-05-15')
    const ended = event('2026-04-28 10:00', { kind: 'treatment-ended', ...bath })
    expect(asked([planned, ended], '2026-04-29').extensions).toMatchObject([
      { untilOn: '2026-05-12', provisional: false },
    ])
  })
  it('prophylaxis that a vet lets run on delays nothing', () => {
    const one = asked(
      [
        event('2026-04-20 10:00', { kind: 'treatment-started', ...bath, continues: true }),
        event('2026-04-25 10:00', { kind: 'treatment-ended', ...bath, treatmentId: 'c', continues: true }),
      ],
      '2026-05-02',
    )
    expect([one.unmet, one.earliestClearanceOn]).toEqual([[], '2026-05-01'])
    expect(standingCodes(one).filter((code) => code === 'masking-continues')).toHaveLength(2)
  })
})

describe('K13, K05, clearance and recall', () => {
  const cleared = event('2026-05-01 10:00', { kind: 'cleared' })
  it('marks cleared animals exposed until a vet decides', () => {
    const joined = event(
      '2026-04-10 10:00',
      { kind: 'cleared-water-joined', animalCount: 12 },
      { eventId: 'x' },
    )
    expect(asked([joined]).decisionsDue).toEqual([
      { code: 'exposure', eventId: 'x', params: { animalCount: 12 } },
    ])
    const decided = event('2026-04-11 10:00', {
      kind: 'exposure-decided',
      exposureEventId: 'x',
      decision: 'no-case',
    })
    expect(asked([joined, decided]).decisionsDue).toEqual([])
  })
  it('stops on the day of clearance', () => {
    const one = asked([cleared, event('2026-05-20 10:00', animals('fish', 'same-water'))], '2026-06-01')
    expect([one.status, one.day0On, one.dayNumber, one.unmet]).toEqual(['cleared', '2026-04-01', 30, []])
  })
  const late = (takenAt: string, result: 'positive' | 'negative' = 'positive') =>
    event(
      '2026-05-04 10:00',
      {
        kind: 'sample-result',
        sampleId: 's',
        testKey: 'pcr',
        takenAt: local(takenAt),
        result,
        pathogenName: 'x',
      },
      { eventId: 'late' },
    )
  it('a positive taken before and reported after clearance recalls the case', () => {
    const one = asked([cleared, late('2026-04-29 10:00')], '2026-05-05')
    expect([one.status, one.earliestClearanceOn]).toEqual(['recalled', null])
    expect(one.locks).toMatchObject([{ cause: 'recall', liftedAt: null }])
    expect(one.decisionsDue.map(({ code }) => code)).toEqual(['recall'])
    const decided = event('2026-05-06 10:00', { kind: 'unlocked', lockEventId: 'late' })
    expect(asked([cleared, late('2026-04-29 10:00'), decided], '2026-05-07').status).toBe('cleared')
  })
  it('one taken after clearance, or negative, does not', () => {
    expect(asked([cleared, late('2026-05-02 10:00')], '2026-05-05').status).toBe('cleared')
    expect(asked([cleared, late('2026-04-29 10:00', 'negative')], '2026-05-05').status).toBe('cleared')
  })
  it('a batch transferred as a whole has ended here', () => {
    const one = asked([event('2026-04-10 10:00', { kind: 'transferred-out' })])
    expect([one.status, one.dayNumber, one.unmet]).toEqual(['transferred', 9, []])
  })
})

describe('K15: negatives', () => {
  const criteria = [
    {
      criterionId: 'two',
      kind: 'negatives',
      testKey: 'faecal',
      count: 2,
      daysApart: 14,
      daysAfterMasking: 10,
    },
  ] as const
  const taken = (
    date: string,
    result: 'negative' | 'positive' | 'inconclusive' | 'insufficient' = 'negative',
  ) =>
    event(`${date} 18:00`, {
      kind: 'sample-result',
      sampleId: date,
      testKey: 'faecal',
      takenAt: local(`${date} 09:00`),
      result,
      pathogenStatus: 'other',
    })
  const state = (...samples: ClockEvent[]) => asked(samples, '2026-06-30', { criteria }).criteria[0]
  it('need their distance, but not from the one taken too soon', () => {
    expect(state(taken('2026-04-05'), taken('2026-04-18'))).toMatchObject({
      met: false,
      count: 1,
      earliestSampleOn: '2026-04-19',
    })
    expect(state(taken('2026-04-05'), taken('2026-04-18'), taken('2026-04-19'))).toMatchObject({
      metOn: '2026-04-19',
    })
  })
  it('only the last has to lie behind the masking treatment', () => {
    const bath = event('2026-04-12 10:00', {
      kind: 'treatment-ended',
      treatmentId: 'b',
      agentName: 'x',
      masks: true,
    })
    expect(state(bath, taken('2026-04-05'), taken('2026-04-21'))).toMatchObject({
      met: false,
      count: 2,
      earliestSampleOn: '2026-04-22',
    })
    expect(state(bath, taken('2026-04-05'), taken('2026-04-22'))).toMatchObject({ metOn: '2026-04-22' })
    expect(state(bath, taken('2026-04-05'), taken('2026-04-21'), taken('2026-04-24'))).toMatchObject({
      metOn: '2026-04-24',
    })
  })
  it('a masking treatment after it takes a met criterion back', () => {
    const bath = event('2026-05-01 10:00', {
      kind: 'treatment-ended',
      treatmentId: 'b',
      agentName: 'x',
      masks: true,
    })
    expect(state(bath, taken('2026-04-05'), taken('2026-04-22'))).toMatchObject({
      met: false,
      metOn: null,
      earliestSampleOn: '2026-05-11',
    })
    const running = event('2026-05-01 10:00', {
      kind: 'treatment-started',
      treatmentId: 'b',
      agentName: 'x',
      masks: true,
    })
    expect(state(running, taken('2026-04-05'), taken('2026-04-22'))).toMatchObject({
      met: false,
      earliestSampleOn: null,
    })
  })
  it('an inconclusive one neither counts nor resets; a positive resets', () => {
    expect(
      state(taken('2026-04-05'), taken('2026-04-12', 'inconclusive'), taken('2026-04-19')),
    ).toMatchObject({ met: true })
    expect(state(taken('2026-04-05'), taken('2026-04-12', 'positive'), taken('2026-04-19'))).toMatchObject({
      met: false,
      count: 1,
    })
  })
  it('opens a repeat until the next sample', () => {
    const due = (...samples: ClockEvent[]) =>
      asked(samples, '2026-06-30', { criteria }).decisionsDue.map(({ code }) => code)
    expect(due(taken('2026-04-12', 'insufficient'))).toEqual(['repeat-sample'])
    expect(due(taken('2026-04-12', 'insufficient'), taken('2026-04-14'))).toEqual([])
  })
  it('samples of before the present day 0 do not count', () => {
    const addition = event('2026-04-10 10:00', animals('fish', 'same-water'))
    expect(state(addition, taken('2026-04-05'), taken('2026-04-19'))).toMatchObject({ met: false, count: 1 })
  })
  it('a declared criterion is as somebody last declared it', () => {
    const declared = [{ criterionId: 'feeding', kind: 'declared' }] as const
    const say = (at: string, met: boolean) =>
      event(at, { kind: 'criterion-declared', criterionId: 'feeding', met })
    const unmet = (...events: ClockEvent[]) =>
      asked(events, '2026-05-02', { criteria: declared }).unmet.map(({ code }) => code)
    expect(unmet()).toEqual(['not-declared'])
    expect(unmet(say('2026-04-10 10:00', true))).toEqual([])
    expect(unmet(say('2026-04-12 10:00', false), say('2026-04-10 10:00', true))).toEqual(['not-declared'])
  })
})
