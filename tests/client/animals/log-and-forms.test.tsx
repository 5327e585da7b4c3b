import { describe, expect, it } from 'vitest'
import { logEntries } from '../../../src/features/animals/animal-log.tsx'
import { animalName, countText } from '../../../src/features/animals/animal-name.ts'
import { sayLogLine } from '../../../src/features/animals/log-model.ts'
import { asksAfter, judgeMoveTo } from '../../../src/features/animals/move-form-model.ts'
import { missingAnswer, noAnswer, sentAnswer } from '../../../src/features/animals/move-rule-fields.tsx'
import { sayDiscrepancy } from '../../../src/features/animals/say-discrepancy.ts'
import { wholeNumber } from '../../../src/features/animals/whole-number.ts'

const nbsp = '\u00a0'

describe('the log of an animal', () => {
  it.each([
    [
      'weight',
      {
        value: '41.60',
        unit: 'kg',
        animals: 1,
        basis: 'measured',
        method: 'in a sling',
        confirmedReason: null,
      },
      `Weight 41.60${nbsp}kg, measured, in a sling.`,
    ],
    [
      'weight',
      {
        value: '416',
        unit: 'kg',
        animals: 1,
        basis: 'measured',
        method: null,
        confirmedReason: 'weighed twice',
      },
      `Weight 416${nbsp}kg, measured. Kept because weighed twice.`,
    ],
    [
      'weight',
      { value: '938', unit: 'g', animals: 5, basis: 'estimated', method: null, confirmedReason: null },
      `5${nbsp}animals weighed together, 938${nbsp}g, estimated.`,
    ],
    ['move', { from: null, to: 'KH-1', reason: null }, 'Came into KH-1.'],
    ['move', { from: 'KH-1', to: 'KH-2', reason: 'bigger pool' }, 'Moved from KH-1 to KH-2: bigger pool.'],
    ['move', { from: 'KH-1', to: null, reason: null }, 'Left KH-1.'],
    [
      'move',
      { from: 'QT-3', to: 'RP-1', reason: null, transfer: 'to the ray pool, same clock' },
      'Documented transfer from QT-3 to RP-1: to the ray pool, same clock.',
    ],
    [
      'move',
      { from: 'QT-3', to: 'RP-1', reason: 'the pipe burst', againstRule: 'crossed-boundary' },
      'Moved from QT-3 to RP-1 against the rule: the pipe burst.',
    ],
    [
      'death',
      { death: 'found-dead', seen: 1, posted: 1, state: 'fresh', note: 'behind the filter' },
      'Found dead, fresh: behind the filter.',
    ],
    ['death', { death: 'found-dead', seen: 2, posted: 2, state: null, note: null }, '2 found dead.'],
    ['death', { death: 'found-dead', seen: 3, posted: 2 }, '3 found dead; the ledger had 2.'],
    [
      'count',
      { change: 'split-out', delta: -4, other: 'HP-0070', reason: null },
      'Split away, \u22124, HP-0070.',
    ],
    ['count', { change: 'purchase', delta: 12, other: null, reason: null }, 'Purchase, +12.'],
    ['statement', { basis: 'estimated', low: 48, high: 64 }, `Estimated: 48 to 64${nbsp}animals.`],
    [
      'lock',
      { lock: 'all', source: 'Q-014', reason: 'a notifiable disease' },
      'Held, no movement, Q-014: a notifiable disease.',
    ],
    [
      'discrepancy',
      { discrepancy: 'more-than-counted', forRole: 'registrar' },
      'To be explained by a registrar: more than the ledger had.',
    ],
  ])('says %s %j', (kind, facts, sentence) => {
    expect(sayLogLine({ kind, facts })).toBe(sentence)
  })

  it('says a line of a kind it does not know by its name, and shows every word the server sent', () => {
    expect(sayLogLine({ kind: 'sonar', facts: {} })).toBe('sonar')
    expect(sayLogLine({ kind: 'count', facts: { change: 'gift', delta: 1 } })).toBe('Gift, +1.')
  })

  it('puts a heading where a day of the facility begins', () => {
    const line = (id: string, happenedAt: string, knownOn: string | null = null) => ({
      id,
      kind: 'statement',
      facts: { basis: 'counted', low: 1 },
      happenedAt,
      happenedOn: happenedAt.slice(0, 10),
      recordedAt: happenedAt,
      recordedBy: 'Tamsin',
      knownOn,
      struckReason: null,
    })
    const entries = logEntries(
      [
        line('a', '2026-12-01T13:00:00Z'),
        line('b', '2026-12-01T04:30:00Z'),
        line('c', '2026-12-01T03:30:00Z'),
        line('d', '2026-11-30T20:00:00Z'),
        line('e', '2026-11-30T04:00:00Z', '2026-11-30'),
        line('f', '2026-11-01T03:00:00Z', '2026-11'),
      ],
      'America/Halifax',
      '2026-12-01',
    )
    expect(entries.map((entry) => entry.day)).toEqual([
      'Today',
      undefined,
      `30${nbsp}Nov${nbsp}2026`,
      undefined,
      undefined,
      `Nov${nbsp}2026`,
    ])
    expect(entries.map((entry) => entry.time)).toEqual(['09:00', '00:30', '23:30', '16:00', '', ''])
    expect(entries.at(-1)?.instant).toBe('2026-11')
  })
})

describe('a move, before it is sent', () => {
  const place = { id: 'p', code: 'QT-3', name: 'Ray isolation', area: 'Wing', boundary: 'Quarantine wing' }
  const lock = {
    id: 'l',
    kind: 'boundary' as const,
    sourceLabel: 'Q-014',
    reason: 'in quarantine',
    since: '',
  }
  const ray = { place, locks: [lock], discrepancies: [] }

  it('asks a veterinarian for a documented transfer, and others whether it has happened already', () => {
    expect(judgeMoveTo(ray, 'Quarantine wing', false)).toBe('nothing')
    expect(judgeMoveTo(ray, null, true)).toBe('documented-transfer')
    expect(judgeMoveTo(ray, null, false)).toBe('happened-already')
    expect(judgeMoveTo({ ...ray, locks: [{ ...lock, kind: 'all' }] }, 'Quarantine wing', true)).toBe(
      'happened-already',
    )
    expect(judgeMoveTo({ ...ray, locks: [] }, null, false)).toBe('nothing')
    expect(judgeMoveTo(ray, undefined, false)).toBe('nothing')
  })

  it('asks after a refusal for what the server alone could know: locks on the water, and holds since', () => {
    expect(asksAfter('nothing', undefined, true)).toBe('nothing')
    expect(asksAfter('nothing', 'movement-locked', true)).toBe('happened-already')
    expect(asksAfter('documented-transfer', 'movement-locked', true)).toBe('happened-already')
    expect(asksAfter('nothing', 'documented-transfer-needed', true)).toBe('documented-transfer')
    expect(asksAfter('nothing', 'documented-transfer-needed', false)).toBe('happened-already')
  })

  it('is not sent before it has its answer, and sends only the answer that was asked', () => {
    expect(missingAnswer('nothing', noAnswer)).toBeUndefined()
    expect(missingAnswer('documented-transfer', noAnswer)).toBe('Say why first')
    expect(missingAnswer('happened-already', noAnswer)).toMatch(/moved already/)
    const transfer = { ...noAnswer, transfer: ' to the ray pool ' }
    expect(missingAnswer('documented-transfer', transfer)).toBeUndefined()
    expect(sentAnswer('documented-transfer', transfer)).toEqual({ documentedTransfer: 'to the ray pool' })
    const happened = { transfer: 'left over', happened: true, reason: 'the pipe burst' }
    expect(sentAnswer('documented-transfer', happened)).toEqual({ alreadyHappened: 'the pipe burst' })
    expect(sentAnswer('nothing', happened)).toEqual({})
  })
})

describe('figures and names', () => {
  it('writes estimates as ranges, and whole numbers with either minus', () => {
    const count = { basis: 'counted' as const, ledger: 1200, low: 1200, high: 1200, agrees: true }
    expect(countText(count)).toBe('1,200')
    expect(countText({ ...count, basis: 'estimated', low: 75, high: 95 })).toBe('75\u201395')
    expect(['3', '-3', '\u22123', '+3', '3.5', '', 'x', '1e3'].map(wholeNumber)).toEqual([
      3,
      -3,
      -3,
      3,
      null,
      null,
      null,
      null,
    ])
  })

  it('speaks of an animal by its house name, else by taxon and number', () => {
    const taxon = {
      id: 't',
      scientificName: '',
      commonName: 'Cunner',
      group: 'teleost' as const,
      quarantineKind: 'fish' as const,
    }
    expect(animalName({ name: 'Marl', accession: 'HP-1', taxon })).toBe('Marl')
    expect(animalName({ name: null, accession: 'HP-1', taxon })).toBe('Cunner HP-1')
  })

  it('tells a discrepancy with its figures', () => {
    expect(sayDiscrepancy({ kind: 'more-than-counted', facts: { seen: 3, posted: 2, excess: 1 } })).toBe(
      '3 were seen, 2 were in the ledger.',
    )
    expect(sayDiscrepancy({ kind: 'count-differs', facts: { low: 97, high: 97, ledger: 100 } })).toBe(
      '97 were counted, 100 are in the ledger.',
    )
    const facts = { from: 'QT-3', to: 'RP-1', by: 'Q-014', reason: 'the pipe burst' }
    expect(sayDiscrepancy({ kind: 'moved-under-lock', facts })).toBe(
      'Moved from QT-3 to RP-1 while it or the water was held (Q-014): the pipe burst',
    )
    expect(sayDiscrepancy({ kind: 'moved-before-lock', facts: { ...facts, from: '' } })).toBe(
      'Came to RP-1, before a hold began (Q-014), but entered after it: the pipe burst',
    )
  })
})
