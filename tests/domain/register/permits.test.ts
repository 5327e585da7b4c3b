import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { judgeLineCover } from '../../../shared/domain/register/judge-line-cover.ts'
import { judgePermitUse } from '../../../shared/domain/register/judge-permit-use.ts'
import type { PermitTerms } from '../../../shared/domain/register/judge-permit-use.ts'
import { permitState } from '../../../shared/domain/register/permit-state.ts'

// Common practice of permit keeping, no source; the 60 days of warning are a project default.
const terms: PermitTerms = {
  validFrom: '2026-01-01',
  validUntil: '2026-12-31',
  quantityAllowed: 20,
  taxonIds: ['seahorse'],
  voided: false,
}
const use = { first: '2026-06-01', last: '2026-06-01', taxonId: 'seahorse', quantity: 5 }
const on = (day: string) => ({ first: day, last: day })
const judge = (given: Partial<PermitTerms>, usedSoFar = 0, over: Partial<typeof use> = {}) => {
  const judged = judgePermitUse({ ...terms, ...given }, usedSoFar, { ...use, ...over })
  if (!judged.ok) throw new Error(judged.refusal.code)
  return judged.value
}

describe('the animals of a line under the permits of one kind', () => {
  const line = { alive: 8, dead: 2 }
  it('are covered together, the dead in the boxes counted or not', () => {
    for (const quantities of [[8], [5, 3], [10], [9]]) expect(judgeLineCover(line, quantities)).toBeNull()
  })
  it('are too many for what was taken, or too few', () => {
    expect(judgeLineCover(line, [5])).toBe('fewer-than-animals')
    expect(judgeLineCover(line, [5, 2])).toBe('fewer-than-animals')
    expect(judgeLineCover(line, [8, 3])).toBe('more-than-animals')
  })
})

describe('taking animals under a permit', () => {
  it('counts what is left', () => {
    expect(judge({}, 12)).toEqual({ remainingBefore: 8, remainingAfter: 3, excess: 0, marks: [] })
  })
  it('covers the last animal, and not one more', () => {
    expect(judge({}, 15).marks).toEqual([])
    expect(judge({}, 16)).toEqual({
      remainingBefore: 4,
      remainingAfter: -1,
      excess: 1,
      marks: ['over-quantity'],
    })
    expect(judge({}, 23)).toMatchObject({ remainingBefore: -3, remainingAfter: -8, excess: 5 })
  })
  it('has no end where no number is stated', () => {
    expect(judge({ quantityAllowed: null }, 900)).toEqual({
      remainingBefore: null,
      remainingAfter: null,
      excess: 0,
      marks: [],
    })
  })
  it('holds on its first and last day, and not a day beside them', () => {
    expect(judge({}, 0, on('2026-01-01')).marks).toEqual([])
    expect(judge({}, 0, on('2026-12-31')).marks).toEqual([])
    expect(judge({}, 0, on('2025-12-31')).marks).toEqual(['not-yet-valid'])
    expect(judge({}, 0, on('2027-01-01')).marks).toEqual(['expired'])
  })
  it('is not said to be invalid where the month of the event touches its time', () => {
    expect(judge({}, 0, { first: '2025-12-01', last: '2026-01-31' }).marks).toEqual([])
    expect(judge({}, 0, { first: '2026-12-01', last: '2027-12-31' }).marks).toEqual([])
    expect(judge({}, 0, { first: '2027-01-01', last: '2027-12-31' }).marks).toEqual(['expired'])
  })
  it('names every fault at once', () => {
    expect(judge({ voided: true }, 20, { ...on('2027-01-01'), taxonId: 'tang' }).marks).toEqual([
      'voided',
      'expired',
      'other-taxon',
      'over-quantity',
    ])
    expect(judge({ taxonIds: [] }, 0, { taxonId: 'tang' }).marks).toEqual([])
  })
  it('refuses a number that is no number of animals', () => {
    for (const quantity of [0, -1, 1.5, Number.NaN, Infinity])
      expect(judgePermitUse(terms, 0, { ...use, quantity })).toMatchObject({
        ok: false,
        refusal: { code: 'quantity-not-whole', field: 'quantity' },
      })
  })
  it('splits every use into what is covered and what is not', () => {
    fc.assert(
      fc.property(fc.nat(500), fc.nat(500), fc.integer({ min: 1, max: 500 }), (allowed, used, quantity) => {
        const j = judge({ quantityAllowed: allowed }, used, { quantity })
        expect(j.remainingAfter).toBe(allowed - used - quantity)
        expect(j.excess).toBe(Math.min(quantity, Math.max(0, used + quantity - allowed)))
        expect(j.marks.includes('over-quantity')).toBe(j.excess > 0)
      }),
    )
  })
})

describe('the state of a permit', () => {
  const permit = { validFrom: '2026-01-01', validUntil: '2026-12-31', voided: false }
  it.each([
    ['2025-12-31', 'not-yet'],
    ['2026-01-01', 'valid'],
    ['2026-10-31', 'valid'], // 61 days before the last day
    ['2026-11-01', 'runs-out'],
    ['2026-12-31', 'runs-out'],
    ['2027-01-01', 'expired'],
  ])('on %s is %s', (on, state) => {
    expect(permitState(permit, on)).toBe(state)
    expect(permitState({ ...permit, voided: true }, on)).toBe('void')
  })
})
