import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { computeBathDose } from '../../../shared/domain/dose/compute-bath-dose.ts'
import { computeStock } from '../../../shared/domain/dose/compute-stock.ts'
import { concentrationReached } from '../../../shared/domain/dose/concentration-reached.ts'
import { productVolumeReached } from '../../../shared/domain/dose/product-volume-reached.ts'
import type { Result } from '../../../shared/domain/result.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const close = (a: number, b: number) =>
  expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(a), Math.abs(b)))
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const product = (percent: number) => ({
  form: 'solid' as const,
  strength: quantityOf(percent, 'percent_w_w' as const),
  strengthBasis: 'active' as const,
})

describe('a stock', () => {
  it('of what was weighed out for it has its strength, also above what a bath may have', () => {
    fc.assert(
      fc.property(between(0.1, 999), between(0.01, 100), between(1, 100), (gPerL, stockLitres, percent) => {
        const target = { concentration: quantityOf(gPerL, 'g/L'), basis: 'active' as const }
        const { amount } = valueOf(computeStock({ target, stockLitres, product: product(percent) }))
        const reached = concentrationReached({
          amount: quantityOf(amount, 'g'),
          basis: 'active',
          netLitres: stockLitres,
          product: product(percent),
        })
        close(valueOf(reached).mgPerL, gPerL * 1000)
      }),
    )
    const over = { concentration: quantityOf(1001, 'g/L' as const), basis: 'active' as const }
    expect(computeStock({ target: over, stockLitres: 1, product: product(100) })).toMatchObject({
      refusal: { code: 'above-most', field: 'target' },
    })
    // a bath keeps its own limit
    const bath = { concentration: quantityOf(101, 'g/L' as const), basis: 'active' as const }
    expect(computeBathDose({ target: bath, netLitres: 1, product: product(100) })).toMatchObject({
      refusal: { code: 'above-most', field: 'target' },
    })
  })
})

describe('microlitres of product in a litre', () => {
  it('are what the bath was dosed for', () => {
    fc.assert(
      fc.property(between(0.1, 50_000), between(0.1, 1e6), (ulPerL, netLitres) => {
        const target = { concentration: quantityOf(ulPerL, 'uL/L'), basis: 'product' as const }
        const { amount } = valueOf(computeBathDose({ target, netLitres, product: { form: 'liquid' } }))
        close(valueOf(productVolumeReached({ amount: quantityOf(amount, 'mL'), netLitres })).ulPerL, ulPerL)
      }),
    )
  })
  it('are finite or refused, whatever is handed over', () => {
    for (const netLitres of [NaN, Infinity, -1, 0, 1e-320, 1, 1e308, 'ten' as unknown as number])
      for (const value of ['1', '-1', '0', '1e308', 'ten', '']) {
        const reached = productVolumeReached({ amount: { value, unit: 'mL' }, netLitres })
        if (reached.ok) expect(Number.isFinite(reached.value.ulPerL)).toBe(true)
        else expect(reached.refusal.field).toMatch(/^(amount|netVolume)$/)
      }
  })
})
