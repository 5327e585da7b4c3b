import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { CountEntry, CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import type { Move } from '../../../shared/domain/ledger/move.ts'
import { balanceCustody } from '../../../shared/domain/register/balance-custody.ts'
import { listCustody } from '../../../shared/domain/register/list-custody.ts'

const day = (n: number) => new Date(Date.UTC(2026, 3, 1 + n, 12)).toISOString()
const entry = (
  entryId: string,
  kind: CountKind,
  delta: number,
  n: number,
  more: Partial<CountEntry> = {},
): CountEntry => ({
  entryId,
  animalId: 'school',
  kind,
  delta,
  at: day(n),
  recordedAt: day(n),
  transferId: null,
  ...more,
})
const move = (
  moveId: string,
  fromEnclosureId: string | null,
  toEnclosureId: string | null,
  n: number,
): Move => ({
  moveId,
  animalId: 'school',
  fromEnclosureId,
  toEnclosureId,
  at: day(n),
  recordedAt: day(n),
})

// Worked by hand: 24 came, 1 died, 8 were split off, 2 hatched; 17 are left.
const entries = [
  entry('e1', 'purchase', 24, 0),
  entry('e2', 'death', -1, 3),
  entry('e3', 'split-out', -8, 10, { transferId: 't1' }),
  entry('e4', 'birth-or-hatch', 2, 20),
  entry('e5', 'death', -5, 21, { voided: true }),
]
const moves = [move('m1', null, 'quarantine', 0), move('m2', 'quarantine', 'display', 15)]
const looks = [
  {
    statementId: 's1',
    at: day(16),
    recordedAt: day(16),
    basis: 'estimated' as const,
    low: 14,
    high: 18,
  },
]
const custody = listCustody(entries, moves, looks)

describe('the custody of a group', () => {
  it('is one line an event, in order, with the arrival and its place in one', () => {
    expect(custody.map(({ eventId, kind, toEnclosureId }) => [eventId, kind, toEnclosureId])).toEqual([
      ['e1', 'purchase', 'quarantine'],
      ['e2', 'death', null],
      ['e3', 'split-out', null],
      ['m2', 'move', 'display'],
      ['s1', 'estimated', null],
      ['e4', 'birth-or-hatch', null],
      ['e5', 'death', null],
    ])
    expect(custody[4]?.found).toEqual({ low: 14, high: 18 })
  })

  it('puts the last departure and the way out in one', () => {
    const all = listCustody(
      [entry('a', 'loan-in', 1, 0), entry('b', 'loan-returned', -1, 9)],
      [move('m1', null, 'tub', 0), move('m2', 'tub', null, 9)],
    )
    expect(
      all.map(({ eventId, fromEnclosureId, toEnclosureId }) => [eventId, fromEnclosureId, toEnclosureId]),
    ).toEqual([
      ['a', null, 'tub'],
      ['b', 'tub', null],
    ])
  })

  it('lets the last of several losses at one instant empty the place', () => {
    const all = listCustody(
      [entry('a', 'purchase', 2, 0), entry('b', 'sale', -1, 9), entry('c', 'sale', -1, 9)],
      [move('m1', null, 'tub', 0), move('m2', 'tub', null, 9)],
    )
    expect(all.map(({ eventId, fromEnclosureId }) => [eventId, fromEnclosureId])).toEqual([
      ['a', null],
      ['b', null],
      ['c', 'tub'],
    ])
  })

  it('says of each death where the last move that stands had put them', () => {
    const struck = { ...move('m3', 'quarantine', 'tub', 4), voided: true }
    const all = listCustody(
      [
        entry('a', 'purchase', 5, 0),
        entry('b', 'death', -1, 3),
        entry('c', 'euthanasia', -1, 5),
        entry('d', 'death', -1, 15),
        entry('e', 'death', -1, 20),
        entry('f', 'death', -1, 20),
        entry('g', 'death', -1, 18, { voided: true }),
      ],
      [...moves, struck, move('m4', 'display', null, 20)],
    )
    expect(
      all
        .filter(({ kind }) => kind === 'death' || kind === 'euthanasia')
        .map(({ eventId, fromEnclosureId }) => [eventId, fromEnclosureId]),
    ).toEqual([
      ['b', 'quarantine'],
      ['c', 'quarantine'],
      ['d', 'display'],
      ['g', 'display'],
      ['e', 'display'],
      ['f', 'display'],
    ])
  })

  it('stands in the order of the ledger at one instant: gains, moves, losses', () => {
    const all = listCustody(
      [entry('z', 'death', -1, 0), entry('y', 'purchase', 3, 0)],
      [move('x', null, 'tub', 0), move('w', 'tub', 'pool', 0)],
    )
    expect(all.map((event) => event.eventId)).toEqual(['y', 'w', 'z'])
  })
})

describe('the balance of a history', () => {
  it('adds up over the whole time', () => {
    expect(balanceCustody(custody)).toMatchObject({
      ok: true,
      value: {
        opening: 0,
        gained: 26,
        lost: 9,
        closing: 17,
        totals: [
          { kind: 'purchase', lines: 1, delta: 24 },
          { kind: 'death', lines: 1, delta: -1 },
          { kind: 'split-out', lines: 1, delta: -8 },
          { kind: 'birth-or-hatch', lines: 1, delta: 2 },
        ],
        events: [24, 23, 15, 15, 15, 17, 17].map((countAfter) => ({ countAfter })),
      },
    })
  })

  it('opens a period with what was there before it, and ends it with what was there then', () => {
    expect(balanceCustody(custody, { from: day(3), until: day(20) })).toMatchObject({
      ok: true,
      value: { opening: 24, gained: 0, lost: 9, closing: 15, events: { length: 4 } },
    })
    expect(balanceCustody(custody, { from: day(40) })).toMatchObject({
      ok: true,
      value: { opening: 17, closing: 17, events: [] },
    })
  })

  it('refuses a ledger that goes below zero', () => {
    expect(balanceCustody(listCustody([entry('e', 'death', -1, 0)], []))).toMatchObject({
      ok: false,
      refusal: { code: 'count-below-zero', params: { eventId: 'e', count: -1 } },
    })
  })

  it('adds up for any ledger and any period, whatever the order it is read in', () => {
    const anyEntries = fc
      .array(
        fc.record({
          n: fc.integer({ min: 1, max: 30 }),
          delta: fc.integer({ min: -3, max: 5 }).filter((d) => d !== 0),
          voided: fc.boolean(),
        }),
        { maxLength: 20 },
      )
      .map((drawn) => [
        entry('start', 'purchase', 100, 0),
        ...drawn.map(({ n, delta, voided }, i) =>
          entry(`e${String(i)}`, delta > 0 ? 'purchase' : 'death', delta, n, { voided }),
        ),
      ])
    fc.assert(
      fc.property(anyEntries, fc.nat(30), fc.nat(30), (lines, a, b) => {
        const period = { from: day(Math.min(a, b)), until: day(Math.max(a, b)) }
        const one = balanceCustody(listCustody(lines, []), period)
        const other = balanceCustody(listCustody([...lines].reverse(), []), period)
        expect(other).toEqual(one)
        if (!one.ok) throw new Error(one.refusal.code)
        const { opening, gained, lost, closing, totals } = one.value
        expect(opening + gained - lost).toBe(closing)
        expect(totals.reduce((sum, total) => sum + total.delta, 0)).toBe(closing - opening)
      }),
    )
  })
})
