import { describe, expect, it } from 'vitest'
import { recordObservation } from '../../../shared/contracts/observations.contract.ts'
import {
  bodyOf,
  draftOf,
  emptyDraft,
  isAllWell,
  isWorthSaving,
  saysWhatIsSeen,
  toggleAllWell,
} from '../../../src/features/observations/observation-draft.ts'
import type { ObservationDraft } from '../../../src/features/observations/observation-draft.ts'
import { patienceMs, urgentFate } from '../../../src/features/observations/urgent-fate.ts'
import { roundGroups } from '../../../src/features/observations/rounds.tsx'

const ids = ['1', '2', '3', '4'].map((n) => `019a0000-0000-7000-8000-00000000000${n}`)
function of(more: Partial<Parameters<typeof bodyOf>[1]> = {}) {
  const left = [...ids]
  return {
    id: '019a0000-0000-7000-8000-0000000000aa',
    enclosure: 'QT-5',
    happenedAt: '2026-12-01T14:20:00.000Z',
    device: 'test',
    online: true,
    urgent: false,
    newId: () => left.shift() ?? '',
    ...more,
  }
}
const draft = (more: Partial<ObservationDraft> = {}): ObservationDraft => ({ ...emptyDraft, ...more })

describe('the form of an observation', () => {
  it('says nothing beforehand and saves nothing then', () => {
    expect(bodyOf(emptyDraft, of())).toMatchObject({
      lookedAt: false,
      feeding: null,
      breathing: null,
      skin: null,
      signs: [],
      words: null,
      count: null,
      foundDead: null,
      forVeterinarian: false,
      urgent: false,
      deaths: [],
    })
    expect(isWorthSaving(emptyDraft)).toBe(false)
    // a mark alone is not a thing seen
    expect(isWorthSaving(draft({ forVeterinarian: true }))).toBe(false)
  })

  it('by "All well" says looked at, feeding, breathing, no dead; never a count, skin or sign; and takes it back', () => {
    const well = toggleAllWell(draft({ words: 'calm' }))
    expect(bodyOf(well, of())).toMatchObject({
      lookedAt: true,
      feeding: 'all',
      breathing: 'normal',
      foundDead: 0,
      skin: null,
      count: null,
      signs: [],
    })
    expect(isAllWell(well)).toBe(true)
    expect(toggleAllWell(well)).toEqual(draft({ words: 'calm' }))
    expect(isAllWell({ ...well, foundDead: 1 })).toBe(false)
  })

  it.each([
    ['counted', '8', '', { basis: 'counted', low: 8, high: 8 }],
    ['estimated', '20', '30', { basis: 'estimated', low: 20, high: 30 }],
    ['not-counted', '', '', { basis: 'not-counted' }],
  ] as const)('sends %s as it was said', (countBasis, countLow, countHigh, count) => {
    const given = draft({ countBasis, countLow, countHigh })
    expect(bodyOf(given, of()).count).toEqual(count)
    expect(isWorthSaving(given)).toBe(true)
  })

  it.each([
    ['counted', '', ''],
    ['counted', '8.5', ''],
    ['counted', '-1', ''],
    ['estimated', '30', '20'],
    ['estimated', '20', ''],
  ] as const)(
    'does not save a count of %s %s %s whose numbers are missing',
    (countBasis, countLow, countHigh) => {
      expect(isWorthSaving(draft({ feeding: 'all', countBasis, countLow, countHigh }))).toBe(false)
    },
  )

  it('names bodies only as far as somebody could say, and only when some were found', () => {
    const deadOf = { 'A-1': 2, 'A-2': 0 }
    expect(bodyOf(draft({ foundDead: 3, deadOf }), of()).deaths).toEqual([
      { id: ids[0], accession: 'A-1', count: 2 },
    ])
    expect(bodyOf(draft({ foundDead: 0, deadOf }), of()).deaths).toEqual([])
  })

  it('makes a body that the contract takes, and opens on it again for mending', () => {
    const given = draft({
      lookedAt: true,
      feeding: 'some',
      signs: ['gasping'],
      words: 'two lie on the floor',
      countBasis: 'estimated',
      countLow: '20',
      countHigh: '30',
      foundDead: 1,
      deadOf: { 'A-1': 1 },
    })
    const body = bodyOf(given, of({ urgent: true, online: false }))
    expect(recordObservation.body?.safeParse(body).error).toBeUndefined()
    expect(body).toMatchObject({ origin: 'outbox', urgent: true, noticeId: ids[1] })
    expect(draftOf(body)).toEqual(given)
  })

  it('calls nobody before it is said what is seen', () => {
    expect(saysWhatIsSeen(draft({ feeding: 'none', words: '  ' }))).toBe(false)
    expect(saysWhatIsSeen(draft({ signs: ['gasping'] }))).toBe(true)
    expect(saysWhatIsSeen(draft({ words: 'lies on the floor' }))).toBe(true)
  })
})

describe('the fate of an urgent call', () => {
  const local = (state: 'waiting' | 'refused', tries = 0) => ({ state, tries })
  it.each([
    ['on its way', { local: local('waiting'), ageMs: 1000 }, 'sending'],
    ['tried in vain', { local: local('waiting', 1), ageMs: 1000 }, 'not-sent'],
    ['without a signal', { local: local('waiting'), down: true, ageMs: 0 }, 'not-sent'],
    ['on its way too long', { local: local('waiting'), ageMs: patienceMs }, 'not-sent'],
    ['refused', { local: local('refused'), ageMs: 1000 }, 'not-sent'],
    ['with the server, not yet mailed', { notice: { state: 'sending' as const }, ageMs: 1000 }, 'sending'],
    ['with the server too long', { notice: { state: 'sending' as const }, ageMs: patienceMs }, 'not-sent'],
    ['mailed to nobody', { notice: { state: 'not-sent' as const }, ageMs: 1000 }, 'not-sent'],
    ['mailed', { notice: { state: 'sent' as const }, ageMs: 99_000 }, 'sent'],
    [
      'seen, while nobody answers now',
      { notice: { state: 'seen' as const }, down: true, ageMs: 99_000 },
      'seen',
    ],
  ])('%s', (_, known, fate) => {
    expect(urgentFate({ local: undefined, notice: undefined, down: false, ...known })).toBe(fate)
  })
})

describe('the round', () => {
  const row = (enclosure: string, boundary: string | null) => ({
    enclosure,
    name: enclosure,
    area: boundary === null ? 'Kelp hall' : 'Wing',
    boundary,
    cases: [],
    animals: [],
    lastLookAt: null,
    looksToday: 0,
    waterBodyId: null,
  })
  it('keeps the order of work and puts a heading where the place changes', () => {
    const groups = roundGroups([row('KH-1', null), row('KH-2', null), row('QT-1', 'Wing A')])
    expect(groups.map(({ heading, rows }) => [heading, rows.map(({ enclosure }) => enclosure)])).toEqual([
      ['Kelp hall', ['KH-1', 'KH-2']],
      ['Quarantine: Wing A', ['QT-1']],
    ])
  })
})
