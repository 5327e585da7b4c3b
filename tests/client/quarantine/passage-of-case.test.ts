import { describe, expect, it } from 'vitest'
import type { CaseRow, CaseStepView } from '../../../shared/contracts/quarantine-primitives.ts'
import {
  boardSpan,
  dayOfStep,
  flagOfCase,
  passageOfCase,
  stateOfCase,
} from '../../../src/features/quarantine/passage-of-case.ts'
import { headlineReason, sayReason, sayUnmet } from '../../../src/features/quarantine/clock-sentences.ts'

const nbsp = '\u00a0'
const names = { cases: { c9: 'Q-109' }, criteria: { scrapes: 'Two clean scrapes' }, tests: {} }

const step = (key: string, more: Partial<CaseStepView> = {}): CaseStepView => ({
  key,
  kind: 'husbandry',
  name: `${key} in full`,
  short: key,
  day: 0,
  untilDay: 0,
  on: '2026-05-01',
  untilOn: '2026-05-03',
  state: 'to-come',
  doneOn: null,
  doneBy: null,
  note: null,
  lateDays: 0,
  daily: null,
  ...more,
})

const reason = (code: string, params: Record<string, string | number>, more = {}) => ({
  code,
  rule: 'K02',
  eventId: `e ${code}`,
  at: '2026-04-25T12:00:00.000Z',
  standing: true,
  effect: { kind: 'day-zero' },
  params,
  ...more,
})

const came = reason('restarted-animals', {
  happenedOn: '2026-04-25',
  water: 'same-water',
  animalCount: 1,
  animalName: 'ray',
  heldAfter: 4,
})
const died = reason(
  'extended-death',
  { happenedOn: '2026-05-04', untilOn: '2026-05-30', days: 14, deathCount: 1 },
  { effect: { kind: 'extension' } },
)

const row = (more: Partial<CaseRow> = {}): CaseRow => ({
  id: 'c1',
  number: 'Q-115',
  name: 'Cownose ray',
  quarantineKind: 'fish',
  status: 'in-quarantine',
  held: false,
  enclosures: ['QT-6'],
  areas: ['Wing'],
  boundaries: ['Wing'],
  protocolCode: 'QP-30',
  animals: { low: 4, high: 4 },
  members: 4,
  day0On: '2026-04-25',
  dayNumber: 19,
  requiredDays: 30,
  pausedDays: 0,
  earliestClearanceOn: '2026-05-25',
  readyToClear: false,
  endedOn: null,
  legs: [
    { day0On: '2026-04-08', endedOn: '2026-04-25', daysRun: 17, endReason: came, steps: [] },
    {
      day0On: '2026-04-25',
      endedOn: null,
      daysRun: null,
      endReason: null,
      steps: [
        step('count', { state: 'done', doneOn: '2026-04-26' }),
        step('look', { state: 'done', daily: { doneDays: 19, passedDays: 19, missedOn: [] } }),
        step('scrape', { state: 'overdue', lateDays: 2, untilOn: '2026-05-12' }),
        step('faecal', { on: '2026-05-23', untilOn: '2026-05-24' }),
        step('decide', { kind: 'decide', on: '2026-05-25' }),
      ],
    },
  ],
  pauses: [],
  counts: [
    { on: '2026-04-08', low: 3, high: 3 },
    { on: '2026-04-25', low: 4, high: 4 },
  ],
  reasons: [came, died],
  forVeterinarian: 0,
  ...more,
})

describe('a case as a passage', () => {
  const view = passageOfCase(row(), names, '2026-05-14')

  it('has its legs, why the first ended, and the counts at their days', () => {
    expect(view.legs.map(({ from, until, endWords }) => ({ from, until, endWords }))).toEqual([
      { from: '2026-04-08', until: '2026-04-25', endWords: 'a fourth ray entered the water' },
      { from: '2026-04-25', until: null, endWords: undefined },
    ])
    expect(view.legs.map(({ counts }) => counts)).toEqual([
      [{ on: '2026-04-08', animals: '3' }],
      [{ on: '2026-04-25', animals: '4' }],
    ])
  })

  it('draws steps where they were done, late or come; not the daily look and not the decision', () => {
    expect(view.legs[1]?.fixes.map(({ name, on, state, late }) => [name, on, state, late])).toEqual([
      ['count in full', '2026-04-26', 'done', undefined],
      ['scrape in full', '2026-05-12', 'overdue', `2${nbsp}days late`],
      ['faecal in full', '2026-05-23', 'to-come', undefined],
    ])
  })

  it('notes what moved the harbour where it happened', () => {
    expect(view.notes).toEqual([{ on: '2026-05-04', words: `unexplained death, to 30${nbsp}May` }])
    expect(view.harbour).toEqual({ on: '2026-05-25', allMet: false })
  })

  it('of a held case foresees nothing', () => {
    const held = passageOfCase(
      row({ held: true, status: 'locked', earliestClearanceOn: null }),
      names,
      '2026-05-14',
    )
    expect(held).toMatchObject({ flag: 'L', harbour: null, held: 'No movement. Clearance date not set.' })
    expect(held.legs[1]?.fixes.map(({ state }) => state)).toEqual(['done', 'overdue'])
  })

  it('is due today on today, whatever day its window began', () => {
    expect(dayOfStep(step('scrape', { state: 'due', on: '2026-05-12' }), '2026-05-14')).toBe('2026-05-14')
  })

  it.each([
    ['in-quarantine', false, 'Q', 'In quarantine'],
    ['open', false, 'Q', 'In quarantine, batch still open'],
    ['locked', false, 'L', 'Locked'],
    ['locked', true, 'L', 'Held'],
    ['recalled', false, 'N', 'Recalled, not cleared'],
    ['cleared', false, 'C', `Cleared 25${nbsp}May`],
  ] as const)('says %s (held %s) by flag %s and in words', (status, held, flag, words) => {
    const given = row({ status, held, endedOn: status === 'cleared' ? '2026-05-25' : null })
    expect([flagOfCase(given), stateOfCase(given)]).toEqual([flag, words])
  })

  it.each(['broken', 'unknown-key'] as const)('never says cleared where the clearance is %s', (state) => {
    const given = {
      ...row({ status: 'cleared', endedOn: '2026-05-25' }),
      clearance: { signature: { state } },
    }
    expect([flagOfCase(given), stateOfCase(given)]).toEqual(['N', 'Clearance does not agree: not cleared'])
    expect(passageOfCase(given, names, '2026-05-25')).toMatchObject({ flag: 'N', harbour: { allMet: false } })
  })

  it('says cleared where the clearance is what was signed', () => {
    const given = {
      ...row({ status: 'cleared', endedOn: '2026-05-25' }),
      clearance: { signature: { state: 'intact' as const } },
    }
    expect(flagOfCase(given)).toBe('C')
  })

  it('and the ruler holds every harbour, but not the whole past', () => {
    expect(boardSpan([view], '2026-05-14')).toEqual({ from: '2026-04-06', until: '2026-06-14' })
    expect(boardSpan([], '2026-05-14').from < '2026-05-01').toBe(true)
  })
})

describe('sentences of a clock', () => {
  it('lead with what last moved day 0', () => {
    expect(headlineReason([came, died])).toBe(came)
    expect(sayReason(came, names, 'America/Halifax')).toBe(
      `Restarted on 25${nbsp}Apr${nbsp}2026 because a fourth ray entered the same water.`,
    )
  })

  it('name conditions, other cases and dates in words', () => {
    expect(
      sayUnmet(
        {
          code: 'negatives-missing',
          overridable: true,
          params: { criterionId: 'scrapes', count: 1, wanted: 2, earliestSampleOn: '2026-05-23' },
        },
        names,
      ),
    ).toBe(`Two clean scrapes: 1 of 2. A sample taken on 23${nbsp}May${nbsp}2026 or later can complete it.`)
    expect(
      sayUnmet({ code: 'locked-shared-water', overridable: false, params: { otherCaseId: 'c9' } }, names),
    ).toContain('Locked with Q-109')
  })
})
