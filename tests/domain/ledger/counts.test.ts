import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { type CountEntry, type CountKind, countKinds } from '../../../shared/domain/ledger/count-entry.ts'
import { countAt } from '../../../shared/domain/ledger/count-at.ts'
import { listRunningCounts } from '../../../shared/domain/ledger/list-running-counts.ts'
import { postCount } from '../../../shared/domain/ledger/post-count.ts'
import { transferCount } from '../../../shared/domain/ledger/transfer-count.ts'
import { findUnbalancedTransfers } from '../../../shared/domain/ledger/find-unbalanced-transfers.ts'

let lines = 0
function line(kind: CountKind, delta: number, at: string, more: Partial<CountEntry> = {}): CountEntry {
  lines += 1
  return {
    entryId: `l${lines}`,
    animalId: 'tangs',
    kind,
    delta,
    at,
    recordedAt: at,
    transferId: null,
    ...more,
  }
}
const day = (n: number) => new Date(Date.UTC(2026, 3, 1 + n)).toISOString()
const tangs = [line('purchase', 14, day(0)), line('death', -1, day(3)), line('purchase', 2, day(5))]

describe('the count of a group', () => {
  it('is the sum of its ledger up to and including the instant', () => {
    expect([-1, 0, 2, 3, 5].map((n) => countAt(tangs, day(n)))).toEqual(
      [0, 14, 14, 13, 15].map((value) => ({ ok: true, value })),
    )
  })
  it('leaves out voided lines and does not ask in which order they came', () => {
    const voided = line('death', -5, day(1), { voided: true })
    expect(countAt([...tangs, voided].reverse(), day(9))).toEqual({ ok: true, value: 15 })
  })
  it('lets animals come and go at one instant', () => {
    const same = [line('split-out', -4, day(0)), line('purchase', 4, day(0))]
    expect(countAt(same, day(0))).toEqual({ ok: true, value: 0 })
  })
  it('names the line that would make it negative', () => {
    const tooMany = line('death', -15, day(2))
    expect(listRunningCounts([...tangs, tooMany])).toMatchObject({
      refusal: { code: 'count-below-zero', params: { entryId: tooMany.entryId, balance: -1 } },
    })
  })
  it.each([
    ['delta-not-whole', line('death', -0.5, day(1))],
    ['delta-not-whole', line('death', 0, day(1))],
    ['delta-not-whole', line('death', Number.NaN, day(1))],
    ['delta-sign-does-not-fit-kind', line('death', 1, day(1))],
    ['delta-sign-does-not-fit-kind', line('purchase', -1, day(1))],
    ['not-an-instant', line('death', -1, '2026-04-01')],
    ['several-animals', line('purchase', 1, day(1), { animalId: 'wrasses' })],
  ])('refuses a line: %s', (code, bad) => {
    expect(listRunningCounts([...tangs, bad])).toMatchObject({ ok: false, refusal: { code } })
  })
  it('takes an adjustment of either sign', () => {
    expect(countAt([...tangs, line('count-adjustment', 1, day(6))], day(7))).toEqual({ ok: true, value: 16 })
    expect(countAt([...tangs, line('count-adjustment', -1, day(6))], day(7))).toEqual({ ok: true, value: 14 })
  })
})

describe('posting what was seen', () => {
  it('keeps three carcasses where the ledger says two: two posted, one to be explained', () => {
    const two = [line('purchase', 2, day(0))]
    const posting = postCount(two, line('death', -3, day(1)))
    expect(posting).toMatchObject({
      ok: true,
      value: {
        entry: { delta: -2 },
        postedCount: 2,
        excessCount: 1,
        discrepancy: { animalId: 'tangs', seenCount: 3, availableCount: 2, excessCount: 1 },
      },
    })
  })
  it('writes no line where nothing is left', () => {
    expect(postCount([], line('death', -1, day(1)))).toMatchObject({ value: { entry: null, excessCount: 1 } })
  })
  it('does not let a late entry undo what was posted since', () => {
    const ledger = [line('purchase', 10, day(0)), line('transfer-out', -8, day(5))]
    expect(postCount(ledger, line('death', -5, day(2)))).toMatchObject({
      value: { postedCount: 2, excessCount: 3 },
    })
  })

  const someLines = fc.array(
    fc.record({
      kind: fc.constantFrom(...(Object.keys(countKinds) as CountKind[])),
      size: fc.integer({ min: 1, max: 20 }),
      on: fc.integer({ min: 0, max: 12 }),
    }),
    { maxLength: 25 },
  )
  it('never makes a ledger negative, and loses no animal that was seen', () => {
    fc.assert(
      fc.property(someLines, (facts) => {
        let ledger: CountEntry[] = []
        for (const { kind, size, on } of facts) {
          const sign = countKinds[kind] === 'out' ? -1 : 1
          const posting = postCount(ledger, line(kind, sign * size, day(on)))
          if (!posting.ok) return false
          const { entry, postedCount, excessCount, discrepancy } = posting.value
          if (postedCount + excessCount !== size || excessCount > 0 !== (discrepancy !== null)) return false
          if (Math.abs(entry?.delta ?? 0) !== postedCount) return false
          if (entry) ledger = [...ledger, entry]
          if (!listRunningCounts(ledger).ok) return false
        }
        const sum = ledger.reduce((total, { delta }) => total + delta, 0)
        const shuffled = [...ledger].sort((a, b) => (a.entryId < b.entryId ? 1 : -1))
        expect(countAt(shuffled, day(40))).toEqual({ ok: true, value: sum })
        return true
      }),
    )
  })
})

describe('splits and merges', () => {
  const split = {
    kind: 'split',
    transferId: 't1',
    outEntryId: 'out',
    inEntryId: 'in',
    fromAnimalId: 'tangs',
    toAnimalId: 'sick-tangs',
    count: 5,
    at: day(6),
    recordedAt: day(6),
  } as const
  it('write one balanced pair', () => {
    const posting = transferCount(tangs, split)
    expect(
      posting.ok && posting.value.entries.map(({ animalId, kind, delta }) => [animalId, kind, delta]),
    ).toEqual([
      ['tangs', 'split-out', -5],
      ['sick-tangs', 'split-in', 5],
    ])
    expect(posting.ok && findUnbalancedTransfers(posting.value.entries)).toEqual([])
  })
  it('move what there is and report the rest', () => {
    const posting = transferCount(tangs, { ...split, kind: 'merge', count: 20 })
    expect(posting).toMatchObject({ value: { postedCount: 15, excessCount: 5 } })
    expect(posting.ok && posting.value.entries.map(({ kind, delta }) => [kind, delta])).toEqual([
      ['merge-out', -15],
      ['merge-in', 15],
    ])
    expect(transferCount([], split)).toEqual({
      ok: true,
      value: { entries: [], postedCount: 0, excessCount: 5 },
    })
  })
  it('refuse nonsense', () => {
    expect(transferCount(tangs, { ...split, toAnimalId: 'tangs' })).toMatchObject({
      refusal: { code: 'same-group' },
    })
    for (const count of [0, -1, 1.5, Number.NaN])
      expect(transferCount(tangs, { ...split, count })).toMatchObject({
        refusal: { code: 'count-not-positive' },
      })
  })
  it('conserve animals over any chain of transfers', () => {
    const moves = fc.array(
      fc.record({
        from: fc.nat(3),
        to: fc.nat(3),
        count: fc.integer({ min: 1, max: 30 }),
        on: fc.integer({ min: 1, max: 9 }),
      }),
      { maxLength: 20 },
    )
    fc.assert(
      fc.property(moves, (chain) => {
        let ledger = [0, 1, 2, 3].map((n) => line('purchase', 10, day(0), { animalId: `g${n}` }))
        for (const [i, { from, to, count, on }] of chain.entries()) {
          const posting = transferCount(
            ledger.filter((entry) => entry.animalId === `g${from}`),
            {
              ...split,
              transferId: `t${i}`,
              outEntryId: `o${i}`,
              inEntryId: `i${i}`,
              fromAnimalId: `g${from}`,
              toAnimalId: `g${to}`,
              count,
              at: day(on),
            },
          )
          if (posting.ok) ledger = [...ledger, ...posting.value.entries]
        }
        const counts = [0, 1, 2, 3].map((n) =>
          countAt(
            ledger.filter((e) => e.animalId === `g${n}`),
            day(20),
          ),
        )
        const total = counts.reduce((sum, one) => sum + (one.ok ? one.value : Number.NaN), 0)
        return total === 40 && findUnbalancedTransfers(ledger).length === 0
      }),
    )
  })
  it('are found when somebody broke a pair', () => {
    const out = line('split-out', -3, day(1), { transferId: 'x' })
    const into = line('split-in', 3, day(1), { transferId: 'x', animalId: 'other' })
    expect(findUnbalancedTransfers([out, into])).toEqual([])
    expect(findUnbalancedTransfers([out])).toEqual(['x'])
    expect(findUnbalancedTransfers([out, { ...into, delta: 2 }])).toEqual(['x'])
    expect(findUnbalancedTransfers([out, { ...into, animalId: 'tangs' }])).toEqual(['x'])
    expect(findUnbalancedTransfers([out, { ...into, at: day(2) }])).toEqual(['x'])
    expect(findUnbalancedTransfers([out, { ...into, kind: 'merge-in' }])).toEqual(['x'])
    expect(findUnbalancedTransfers([out, { ...into, voided: true }])).toEqual(['x'])
    expect(findUnbalancedTransfers([line('split-out', -1, day(1))])).toEqual([''])
    expect(findUnbalancedTransfers(tangs)).toEqual([])
  })
})
