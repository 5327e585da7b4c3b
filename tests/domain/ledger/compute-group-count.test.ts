import { describe, expect, it } from 'vitest'
import { type CountStatement, computeGroupCount } from '../../../shared/domain/ledger/compute-group-count.ts'
import type { CountEntry } from '../../../shared/domain/ledger/count-entry.ts'

const at = (n: number) => new Date(Date.UTC(2026, 3, 1 + n)).toISOString()
const entry = (entryId: string, kind: 'purchase' | 'death', delta: number, n: number): CountEntry => ({
  entryId,
  animalId: 'anchovies',
  kind,
  delta,
  at: at(n),
  recordedAt: at(n),
  transferId: null,
})
const ledger = [entry('a', 'purchase', 350, 0), entry('b', 'death', -12, 10)]
const look = (
  n: number,
  found: { count: number } | { low: number; high: number },
  recorded = n,
): CountStatement => ({
  statementId: `s${n}-${recorded}`,
  at: at(n),
  recordedAt: at(recorded),
  ...('count' in found ? { basis: 'counted', ...found } : { basis: 'estimated', ...found }),
})

describe('the count of a school', () => {
  it('is that of the ledger where nobody looked', () => {
    expect(computeGroupCount(ledger, [], at(20))).toEqual({
      ok: true,
      value: { basis: 'counted', ledgerCount: 338, differsFromStatement: 0 },
    })
  })
  it('carries an estimate along with what was posted since', () => {
    expect(computeGroupCount(ledger, [look(5, { low: 300, high: 400 })], at(20))).toEqual({
      ok: true,
      value: { basis: 'estimated', ledgerCount: 338, low: 288, high: 388, ledgerOutsideRange: false },
    })
  })
  it('says when the ledger lies outside the range, and never shows a negative figure', () => {
    const scarce = computeGroupCount(ledger, [look(5, { low: 5, high: 8 })], at(20))
    expect(scarce).toMatchObject({ value: { low: 0, high: 0, ledgerOutsideRange: true } })
  })
  it('compares a later count with the ledger', () => {
    const counted = computeGroupCount(
      ledger,
      [look(5, { low: 300, high: 400 }), look(12, { count: 330 })],
      at(20),
    )
    expect(counted).toMatchObject({ value: { basis: 'counted', ledgerCount: 338, differsFromStatement: 8 } })
    const before = computeGroupCount(ledger, [look(12, { count: 330 })], at(11))
    expect(before).toMatchObject({ value: { differsFromStatement: 0 } })
  })
  it('takes the later record of one look, and leaves out a voided one', () => {
    const first = look(12, { count: 330 })
    const again = look(12, { count: 338 }, 13)
    expect(computeGroupCount(ledger, [again, first], at(20))).toMatchObject({
      value: { differsFromStatement: 0 },
    })
    const voided: CountStatement = { ...again, voided: true }
    expect(computeGroupCount(ledger, [voided, first], at(20))).toMatchObject({
      value: { differsFromStatement: 8 },
    })
  })
  it.each([
    ['statement-not-whole', look(1, { count: 1.5 })],
    ['statement-not-whole', look(1, { count: -1 })],
    ['range-backwards', look(1, { low: 9, high: 3 })],
    ['not-an-instant', { ...look(1, { count: 3 }), at: '2026-04-02' }],
  ])('refuses a statement: %s', (code, bad) => {
    expect(computeGroupCount(ledger, [bad], at(20))).toMatchObject({ refusal: { code } })
  })
  it('refuses to answer for no instant, or a broken ledger', () => {
    expect(computeGroupCount(ledger, [], 'today')).toMatchObject({ refusal: { code: 'not-an-instant' } })
    expect(computeGroupCount([entry('x', 'death', -1, 0)], [], at(1))).toMatchObject({
      refusal: { code: 'count-below-zero' },
    })
  })
})
