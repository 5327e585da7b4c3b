import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import type { BathDose } from '../../../shared/domain/dose/bath-dose.ts'
import { computeBathDose } from '../../../shared/domain/dose/compute-bath-dose.ts'
import {
  computeMakeUpAfterChange,
  computeMakeUpAfterLoss,
} from '../../../shared/domain/dose/compute-make-up.ts'
import { computeTopUp } from '../../../shared/domain/dose/compute-top-up.ts'
import type { Result } from '../../../shared/domain/result.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'

const amountOf = (result: Result<BathDose>): number => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value.amount
}
const close = (a: number, b: number) =>
  expect(Math.abs(a - b)).toBeLessThanOrEqual(1e-9 * Math.max(Math.abs(a), Math.abs(b)))
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const bath = (target: number, netLitres: number) => ({
  target: { concentration: quantityOf(target, 'mg/L' as const), basis: 'active' as const },
  netLitres,
  product: {
    form: 'solid' as const,
    strength: quantityOf(80, 'percent_w_w' as const),
    strengthBasis: 'active' as const,
  },
})

describe('a make-up', () => {
  it('of a bath that was at its target is the dose for the water changed; of one that held nothing, the whole dose', () => {
    fc.assert(
      fc.property(between(0.1, 1000), between(10, 1e6), between(0.01, 1), (target, net, share) => {
        const input = bath(target, net)
        const changed = quantityOf(net * share, 'L')
        const exact = computeMakeUpAfterChange({ ...input, changed, before: quantityOf(target, 'mg/L') })
        const top = amountOf(computeTopUp({ ...input, changed }))
        expect(Math.abs(amountOf(exact) - top)).toBeLessThanOrEqual(1e-9 * amountOf(computeBathDose(input)))
        const nothing = computeMakeUpAfterChange({ ...input, changed, before: quantityOf(0, 'mg/L') })
        close(amountOf(nothing), amountOf(computeBathDose(input)))
      }),
    )
  })
  it('after one half-life is half a dose, after more always more and never a whole one', () => {
    fc.assert(
      fc.property(between(0.1, 1000), between(10, 1e6), between(0.1, 1000), (target, net, half) => {
        const input = bath(target, net)
        const whole = amountOf(computeBathDose(input))
        const after = (times: number) =>
          amountOf(
            computeMakeUpAfterLoss({
              ...input,
              halfLife: quantityOf(half, 'h'),
              elapsed: quantityOf(half * times, 'h'),
            }),
          )
        close(after(1), whole / 2)
        expect(after(3)).toBeGreaterThan(after(2))
        expect(after(60)).toBeLessThanOrEqual(whole)
      }),
    )
  })
  it('is borne out by the second evaluation', async () => {
    await fc.assert(
      fc.asyncProperty(between(0.1, 1000), between(10, 1e6), between(0.01, 1), async (target, net, share) => {
        const input = bath(target, net)
        const changed = quantityOf(net * share, 'L')
        const before = quantityOf(target * 0.9, 'mg/L')
        const [elapsed, halfLife] = [quantityOf(share * 50, 'h'), quantityOf(1, 'd')]
        for (const result of [
          computeMakeUpAfterChange({ ...input, changed, before }),
          computeMakeUpAfterLoss({ ...input, halfLife, elapsed }),
        ])
          expect(await verifyWorking(result.ok ? result.value.working : [])).toEqual({ ok: true })
      }),
      { numRuns: 100 },
    )
  })
  it('gives a finite amount or a refusal, whatever it is handed', () => {
    const any = fc.constantFrom('0', '1', '-1', '1e308', '0.000000001', '', 'ten', 'Infinity')
    const unit = fc.constantFrom('mg/L', 'uL/L', 'L', 'h', 'd', 'ppm', '')
    const quantity = fc.record({ value: any, unit }) as fc.Arbitrary<never>
    const net = fc.constantFrom(0, 1, 1000, NaN, Infinity, -1, 1e-320, undefined as unknown as number)
    fc.assert(
      fc.property(quantity, quantity, quantity, net, (target, a, b, netLitres) => {
        const input = {
          ...bath(1, 1),
          netLitres,
          target: { concentration: target, basis: 'active' as const },
        }
        for (const result of [
          computeMakeUpAfterChange({ ...input, changed: a, before: b }),
          computeMakeUpAfterLoss({ ...input, halfLife: a, elapsed: b }),
        ])
          if (result.ok) expect(Number.isFinite(result.value.amount)).toBe(true)
          else expect(result.refusal.code).toMatch(/^[a-z-]+$/)
      }),
      { numRuns: 2000 },
    )
  })
})
