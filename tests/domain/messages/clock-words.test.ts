import { clearanceWords } from '../../../shared/messages/clearance.ts'
import { caseWords } from '../../../shared/messages/quarantine-case.ts'
import { describe, expect, it } from 'vitest'
import type { ClockReason } from '../../../shared/domain/quarantine/clock-reason.ts'
import { clockReasons } from '../../../shared/messages/clock-reasons.ts'
import { sayClockReason } from '../../../shared/messages/say-clock-reason.ts'
import { sayDateInSentence } from '../../../shared/messages/say-date-in-sentence.ts'
import { sayWhoCame } from '../../../shared/messages/say-who-came.ts'
import { setMessageLocale } from '../../../shared/messages/define-messages.ts'
import { boxOfFish, clock, event, local } from '../quarantine/a-clock.ts'

const words = {
  date: (on: string) => sayDateInSentence(on, '2026-05-14'),
  instant: (at: string) => at.slice(0, 16).replace('T', ' '),
  caseName: (id: string) => `Q-${id}`,
  criterionName: () => 'Two clean scrapes',
  testName: () => 'skin scrape',
}
const plain = (text: string) => text.replaceAll('\u00a0', ' ')
const closed = [event('2026-04-08 09:00', boxOfFish), event('2026-04-08 10:00', { kind: 'closed' })]

describe('a date in a sentence', () => {
  it('shows its year only where it is another one', () => {
    expect(plain(sayDateInSentence('2026-04-05', '2026-05-14'))).toBe('5 April')
    expect(plain(sayDateInSentence('2025-12-31', '2026-05-14'))).toBe('31 December 2025')
    expect(plain(sayDateInSentence('2026-04-25'))).toBe('25 April 2026')
  })
})

describe('who came', () => {
  it.each([
    [1, 'ray', 4, 'a fourth ray'],
    [1, 'octopus', 0, 'an octopus'],
    [1, 'ray', 8, 'an eighth ray'],
    [1, 'ray', 40, 'a ray'],
    [3, 'ray', 7, '3 animals (ray)'],
    [2, '', 0, '2 animals'],
    [0, '', 0, 'animals'],
    [0, 'ray', 0, 'animals (ray)'],
  ])('%i %s, then %i: %s', (animalCount, animalName, heldAfter, said) =>
    expect(plain(sayWhoCame({ animalCount, animalName, heldAfter }))).toBe(said),
  )
})

describe('the sentences of a clock', () => {
  it('say why it restarted', () => {
    const ray = event('2026-04-25 10:00', {
      kind: 'addition',
      what: 'animals',
      quarantineKind: 'fish',
      into: 'same-water',
      animalCount: 1,
      animalName: 'ray',
      heldAfter: 4,
    })
    const { reasons } = clock({ events: [...closed, ray], asOf: '2026-05-14' })
    expect(reasons.map((reason) => plain(sayClockReason(reason, words)))).toEqual([
      'Day 0 is 8 April, the day the last of the batch came in.',
      'Restarted on 25 April because a fourth ray entered the same water.',
    ])
  })
  it('say what extends, what no longer does, and what never did', () => {
    const events = [
      ...closed,
      event('2026-04-20 09:00', { kind: 'death' }, { eventId: 'd' }),
      event('2026-04-22 09:00', {
        kind: 'death-cause-signed',
        deathEventId: 'd',
        finding: 'explained-not-transmissible',
        cause: 'trauma',
      }),
      event('2026-04-23 09:00', {
        kind: 'treatment-ended',
        treatmentId: 'm',
        agentName: 'meloxicam',
        masks: false,
      }),
      event('2026-04-24 09:00', { kind: 'pause-started', pauseId: 'p', cause: 'life-support-failure' }),
      event('2026-04-24 10:30', { kind: 'pause-ended', pauseId: 'p' }),
    ]
    const { reasons } = clock({ events, asOf: '2026-05-14' })
    expect(reasons.slice(1).map((reason) => plain(sayClockReason(reason, words)))).toEqual([
      'Extended to 4 May: 14 days from 20 April, when an animal died without a known cause.',
      'The death of 20 April no longer extends: its cause was signed on 22 April as explained and not transmissible: trauma.',
      'meloxicam on 23 April hides nothing from the tests and changes nothing.',
      `Stood still for 1 hour 30 minutes, from ${local('2026-04-24 09:00').slice(0, 16).replace('T', ' ')} to ${local('2026-04-24 10:30').slice(0, 16).replace('T', ' ')}, because life support had failed.`,
    ])
  })
  it('name criteria and tests by their words, never by their keys', () => {
    const reason: ClockReason = {
      code: 'negatives-counted',
      rule: 'K15',
      eventId: 'e',
      at: '2026-05-01T10:00:00Z',
      standing: true,
      effect: { kind: 'criterion' },
      params: { testKey: 'scrape-key', takenOn: '2026-05-01', count: 1, wanted: 2 },
    }
    expect(plain(sayClockReason(reason, words))).toBe('Negative skin scrape of 1 May: 1 of 2 in a row.')
  })
  it('never show a rule code, an ISO date or an id, whatever they are given', () => {
    const params = {
      happenedOn: '1 May',
      day0On: '1 May',
      closedOn: '1 May',
      untilOn: '15 May',
      endedOn: '2 May',
      takenOn: '2 May',
      reportedOn: '3 May',
      signedOn: '4 May',
      startedOn: '1 May',
      halfWayOn: '5 May',
      metOn: '6 May',
      fromAt: '1 May 10:00',
      untilAt: '2 May 10:00',
      otherCaseId: 'Q-1',
      criterionId: 'Feeding',
      testKey: 'scrape',
      animalCount: 1,
      animalName: 'ray',
      heldAfter: 4,
      water: 'same-water',
      how: 'net',
      days: 14,
      deathCount: 2,
      cause: 'life-support-failure',
      signs: 'flashing',
      agentName: 'copper',
      hours: 3,
      limitHours: 48,
      minutes: 90,
      subject: 'HP-0421',
      pathogenName: 'x',
      count: 1,
      wanted: 2,
      daysApart: 7,
      result: 'inconclusive',
      decision: 'no-case',
      fromDays: 30,
      toDays: 45,
    }
    for (const [code, sentence] of Object.entries(clockReasons)) {
      const said = (sentence as (p: typeof params) => string)(params)
      expect(said, code).toMatch(/^[A-Za-z].*\.$/)
      expect(said, code).not.toMatch(/undefined|NaN|K\d\d|\d{4}-\d{2}-\d{2}/)
    }
  })
  it('follow the language of the catalogue', () => {
    setMessageLocale('pseudo')
    try {
      expect(clockReasons.cleared({ happenedOn: '1 May' })).toMatch(/^\[.*·\]$/)
    } finally {
      setMessageLocale('en')
    }
  })
})

describe('negatives that are as many as wanted and still not enough', () => {
  it('say why, on the certificate and on the screen', () => {
    const why = /2 of 2, the last taken too soon after a treatment that can hide what the test looks for/
    const state = { count: 2, wanted: 2, met: false }
    expect(clearanceWords.negatives(state)).toMatch(why)
    expect(caseWords.criterionCount(state)).toMatch(why)
    expect(clearanceWords.negatives({ ...state, met: true })).toBe(', 2 of 2')
    expect(caseWords.criterionCount({ ...state, count: 1 })).toBe('1 of 2')
  })
})
