import { describe, expect, it } from 'vitest'
import type { ClockEvent } from '../../../shared/domain/quarantine/clock-event.ts'
import { boxOfFish, clock, event, local, policy, standingCodes } from './a-clock.ts'

// Source of every expected date in this file: the quarantine reference's test values of the clock (section 1.2),
// computed there by hand for each case (mark C); the figures 30, 14 and 10 are project defaults or settings (P).

describe('N = 30, X = 14, window 14', () => {
  const closed = [event('2026-03-01 09:00', boxOfFish), event('2026-03-01 10:00', { kind: 'closed' })]
  const addition = event('2026-03-13 11:00', {
    kind: 'addition',
    what: 'animals',
    quarantineKind: 'fish',
    into: 'same-water',
  })
  const death = event('2026-03-25 07:00', { kind: 'death' })
  const bath = event('2026-03-24 10:00', {
    kind: 'treatment-ended',
    treatmentId: 'b',
    agentName: 'praziquantel',
    masks: true,
  })
  it.each<[string, ClockEvent[], string]>([
    ['day 0 on 1 March', [], '2026-03-31'],
    ['addition of the same kind on 13 March', [addition], '2026-04-12'],
    ['death on 25 March', [death], '2026-04-08'],
    ['last praziquantel bath ended on 24 March', [bath], '2026-04-07'],
    ['death and bath: the later', [death, bath], '2026-04-08'],
  ])('%s', (_, more, earliest) => {
    expect(clock({ events: [...closed, ...more], asOf: '2026-03-26' }).earliestClearanceOn).toBe(earliest)
  })
})

describe('America/New_York, over the clock change of 8 March 2026', () => {
  const zone = 'America/New_York'
  const events = [
    event('2026-02-20 21:30', boxOfFish, { zone }),
    event('2026-02-22 10:00', boxOfFish, { zone }),
    event('2026-02-22 18:00', { kind: 'closed' }, { zone }),
  ]
  it('counts from the last box', () => {
    const one = clock({ events, asOf: '2026-02-23', zone })
    expect([one.day0On, one.earliestClearanceOn]).toEqual(['2026-02-22', '2026-03-24'])
  })
  it('takes the local date of an addition that is the next day in UTC', () => {
    const addition: ClockEvent = {
      eventId: 'a',
      caseId: 'fish',
      at: '2026-03-02T04:40:00Z',
      kind: 'addition',
      what: 'animals',
      quarantineKind: 'fish',
      into: 'same-water',
    }
    const one = clock({ events: [...events, addition], asOf: '2026-03-15', zone })
    expect([one.day0On, one.dayNumber, one.earliestClearanceOn]).toEqual(['2026-03-01', 14, '2026-03-31'])
  })
})

describe('Europe/Lisbon, one case, N = 35, X = 14, window 10, in order of entry', () => {
  const cases = [{ caseId: 'fish', policy: policy({ requiredDays: 35, maskingWindowDays: 10 }) }]
  const box = event('2026-09-20 00:25', boxOfFish)
  const death = event('2026-10-17 09:00', { kind: 'death' }, { eventId: 'death of 17 Oct' })
  const addition = event(
    '2026-10-12 00:10',
    { kind: 'addition', what: 'animals', quarantineKind: 'fish', into: 'same-water' },
    { eventId: 'addition' },
  )
  const heater = { pauseId: 'heater' }
  const pump = { pauseId: 'pump' }
  const rows: { entered: ClockEvent[]; asOf: string; day0On: string; earliest: string; day?: number }[] = [
    {
      entered: [event('2026-09-18 20:15', boxOfFish), box, event('2026-09-20 09:00', { kind: 'closed' })],
      asOf: '2026-09-20 23:00',
      day0On: '2026-09-20',
      earliest: '2026-10-25',
    },
    {
      entered: [event('2026-09-21 23:00', { kind: 'death' })],
      asOf: '2026-09-22',
      day0On: '2026-09-20',
      earliest: '2026-10-25',
    },
    { entered: [death], asOf: '2026-10-17', day0On: '2026-09-20', earliest: '2026-10-31' },
    { entered: [addition], asOf: '2026-10-18', day0On: '2026-10-12', earliest: '2026-11-16' },
    { entered: [], asOf: '2026-10-25 23:30', day0On: '2026-10-12', earliest: '2026-11-16', day: 13 },
    {
      entered: [
        event('2026-10-23 22:00', { kind: 'pause-started', cause: 'life-support-failure', ...heater }),
        event('2026-10-25 22:00', { kind: 'pause-ended', ...heater }),
      ],
      asOf: '2026-10-25 23:30',
      day0On: '2026-10-12',
      earliest: '2026-11-19',
    },
    {
      entered: [
        event('2026-10-28 00:00', { kind: 'pause-started', cause: 'life-support-failure', ...pump }),
        event('2026-10-28 23:00', { kind: 'pause-ended', ...pump }),
      ],
      asOf: '2026-10-29',
      day0On: '2026-10-12',
      earliest: '2026-11-19',
    },
    {
      entered: [
        event('2026-11-12 10:00', {
          kind: 'treatment-ended',
          treatmentId: 'p',
          agentName: 'praziquantel',
          masks: true,
        }),
      ],
      asOf: '2026-11-12',
      day0On: '2026-10-12',
      earliest: '2026-11-22',
    },
    {
      entered: [
        event('2026-11-14 10:00', {
          kind: 'treatment-ended',
          treatmentId: 'm',
          agentName: 'meloxicam',
          masks: false,
        }),
      ],
      asOf: '2026-11-14',
      day0On: '2026-10-12',
      earliest: '2026-11-22',
    },
    {
      entered: [event('2026-11-14 12:00', { kind: 'voided', voidsEventId: 'addition' })],
      asOf: '2026-11-14 13:00',
      day0On: '2026-09-20',
      earliest: '2026-11-22',
    },
    {
      entered: [
        event('2026-11-15 10:00', {
          kind: 'death-cause-signed',
          deathEventId: 'death of 17 Oct',
          finding: 'explained-not-transmissible',
          cause: 'jumped',
        }),
      ],
      asOf: '2026-11-15',
      day0On: '2026-09-20',
      earliest: '2026-11-22',
    },
  ]
  const after = (n: number) => {
    const events = rows.slice(0, n + 1).flatMap(({ entered }) => entered)
    return clock({ cases, events, asOf: rows[n]?.asOf ?? '' })
  }
  it.each(rows.map((row, n) => [n + 1, row] as const))('row %i of the table', (n, row) => {
    const one = after(n - 1)
    expect([one.day0On, one.earliestClearanceOn]).toEqual([row.day0On, row.earliest])
    if (row.day !== undefined) expect(one.dayNumber).toBe(row.day)
  })

  it('row 2: 46 h 35 after the last box is a death of transport', () => {
    expect(standingCodes(after(1))).toContain('transport-death')
    expect(after(1).extensions).toEqual([])
  })
  it('row 4: the extension survives the restart but does not bind', () => {
    const { bounds, legs } = after(3)
    expect(bounds.map(({ kind, on, binds }) => [kind, on, binds])).toEqual([
      ['length', '2026-11-16', true],
      ['extension', '2026-10-31', false],
    ])
    expect(legs.map((leg) => [leg.day0On, leg.endedOn, leg.daysRun])).toEqual([
      ['2026-09-20', '2026-10-12', 22],
      ['2026-10-12', null, null],
    ])
  })
  it('row 6: 49 true hours, not the 48 of the wall clock', () => {
    expect([after(5).pausedMinutes, after(5).pausedDays]).toEqual([49 * 60, 3])
  })
  it('row 7: pauses are summed before they are rounded: 72 h are 3 days', () => {
    expect([after(6).pausedMinutes, after(6).pausedDays]).toEqual([72 * 60, 3])
  })
  it('row 9: an analgesic does not mask, and the history says so', () => {
    expect(after(8).reasons.find(({ code }) => code === 'not-masking')?.params).toMatchObject({
      agentName: 'meloxicam',
    })
  })
  it('row 10: without the addition 28 Oct, death 31 Oct and bath 22 Nov; the bath binds', () => {
    expect(after(9).bounds.map(({ kind, on, binds }) => [kind, on, binds])).toEqual([
      ['length', '2026-10-28', false],
      ['extension', '2026-10-31', false],
      ['extension', '2026-11-22', true],
    ])
  })
  it('row 11: the signed cause leaves one standing extension fewer, and history shows both', () => {
    const extending = (n: number) =>
      after(n).reasons.filter(({ effect, standing }) => effect.kind === 'extension' && standing).length
    expect(extending(10)).toBe(extending(9) - 1)
    const told = after(10).reasons.filter(
      ({ eventId, code }) => eventId === 'death of 17 Oct' || code === 'death-explained',
    )
    expect(told.map(({ code, standing }) => [code, standing])).toEqual([
      ['extended-death', false],
      ['death-explained', true],
    ])
    expect(after(10).extensions.map(({ kind, state }) => [kind, state])).toEqual([
      ['masking', 'standing'],
      ['death', 'withdrawn'],
    ])
  })
})

describe('Europe/Lisbon 2026, day count and pauses', () => {
  const closed = [event('2026-03-10 15:00', { kind: 'closed' })]
  it('day 20 shortly after midnight on 30 March, across the clock change', () => {
    const one = clock({ events: closed, asOf: '2026-03-29T23:20:00Z' })
    expect([one.day0On, one.dayNumber, one.earliestClearanceOn]).toEqual(['2026-03-10', 20, '2026-04-09'])
  })
  it.each([
    ['47 true hours over the clock change', '2026-03-28 12:00', '2026-03-30 12:00', 47 * 60, 2, '2026-04-11'],
    ['48 h', '2026-03-26 09:00', '2026-03-28 09:00', 48 * 60, 2, '2026-04-11'],
    ['48 h 01', '2026-03-26 09:00', '2026-03-28 09:01', 48 * 60 + 1, 3, '2026-04-12'],
  ])('paused %s', (_, from, until, minutes, days, earliest) => {
    const one = clock({
      events: [
        ...closed,
        event(from, { kind: 'pause-started', pauseId: 'p', cause: 'life-support-failure' }),
        event(until, { kind: 'pause-ended', pauseId: 'p' }),
      ],
      asOf: '2026-03-31',
    })
    expect([one.pausedMinutes, one.pausedDays, one.earliestClearanceOn]).toEqual([minutes, days, earliest])
  })
})

describe('Europe/Lisbon 2026, a listed pathogen', () => {
  const criteria = [
    {
      criterionId: 'two-clean',
      kind: 'negatives',
      testKey: 'pcr',
      count: 2,
      daysApart: 14,
      daysAfterMasking: 10,
    },
  ] as const
  const cases = [{ caseId: 'fish', policy: policy({ criteria }) }]
  const positive = event(
    '2026-05-08 16:00',
    {
      kind: 'sample-result',
      sampleId: 's0',
      testKey: 'pcr',
      takenAt: local('2026-05-05 09:00'),
      result: 'positive',
      pathogenName: 'koi herpesvirus',
      pathogenStatus: 'listed',
    },
    { eventId: 'positive' },
  )
  const treated = event('2026-05-30 12:00', {
    kind: 'treatment-ended',
    treatmentId: 't',
    agentName: 'heat',
    masks: true,
    forResultEventId: 'positive',
  })
  const closed = [event('2026-04-20 09:00', boxOfFish), event('2026-04-20 10:00', { kind: 'closed' })]
  const sample = (
    taken: string,
    reported: string,
    result: 'negative' | 'positive' | 'inconclusive',
  ): ClockEvent =>
    event(reported, {
      kind: 'sample-result',
      sampleId: taken,
      testKey: 'pcr',
      takenAt: local(`${taken} 09:00`),
      result,
      ...(result === 'positive' ? { pathogenName: 'koi herpesvirus', pathogenStatus: 'listed' } : {}),
    })

  it('locks from the report, and gives no date while locked', () => {
    const before = clock({ cases, events: [...closed, positive], asOf: '2026-05-08 15:59' })
    expect(before.status).toBe('in-quarantine')
    const one = clock({ cases, events: [...closed, positive], asOf: '2026-05-09' })
    expect([one.status, one.earliestClearanceOn]).toEqual(['locked', null])
    expect(one.earliestIfUnlockedOn).toBe('2026-05-20')
    expect(one.decisionsDue.map(({ code }) => code)).toContain('positive-untreated')
  })
  it('sets day 0 to the day its treatment ends, with no negative counted', () => {
    const one = clock({ cases, events: [...closed, positive, treated], asOf: '2026-05-30 13:00' })
    expect([one.status, one.day0On, one.earliestClearanceOn]).toEqual([
      'in-quarantine',
      '2026-05-30',
      '2026-06-29',
    ])
    expect(one.criteria[0]).toMatchObject({ met: false, count: 0, wanted: 2, earliestSampleOn: '2026-06-13' })
  })
  it('meets the criterion on the day the last negative was taken, whenever it was reported', () => {
    const events = [
      ...closed,
      positive,
      treated,
      sample('2026-06-14', '2026-06-17 10:00', 'negative'),
      sample('2026-06-21', '2026-06-23 10:00', 'inconclusive'),
      sample('2026-06-28', '2026-07-06 10:00', 'negative'),
    ]
    const one = clock({ cases, events, asOf: '2026-07-07' })
    expect(one.criteria[0]).toMatchObject({ met: true, metOn: '2026-06-28', count: 2 })
    expect(one.earliestClearanceOn).toBe('2026-06-29')
    expect(one.bounds.find(({ binds }) => binds)?.kind).toBe('length')
    expect(one.reasons.find(({ code }) => code === 'repeat-due')?.standing).toBe(false)
  })
  it('locks again and counts none when the second sample is positive instead', () => {
    const events = [
      ...closed,
      positive,
      treated,
      sample('2026-06-14', '2026-06-17 10:00', 'negative'),
      sample('2026-06-28', '2026-07-01 10:00', 'positive'),
    ]
    const one = clock({ cases, events, asOf: '2026-07-02' })
    expect([one.status, one.earliestClearanceOn, one.criteria[0]?.count]).toEqual(['locked', null, 0])
  })
})
