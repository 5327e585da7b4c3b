import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import type { BathProduct } from '../../../shared/domain/dose/bath-product.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import { computeBathDose, type BathDoseInput } from '../../../shared/domain/dose/compute-bath-dose.ts'
import { computeTopUp } from '../../../shared/domain/dose/compute-top-up.ts'
import { concentrationReached } from '../../../shared/domain/dose/concentration-reached.ts'
import { copperInPentahydrate } from '../../../shared/domain/dose/copper.ts'
import { secondCalculationAgrees } from '../../../shared/domain/dose/second-calculation-agrees.ts'
import type { ConcentrationBasis } from '../../../shared/domain/units/basis.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'

const decimals = (least: number, most: number, places: number) =>
  fc.integer({ min: least, max: most }).map((whole) => (whole / 10 ** places).toFixed(places))
const q = (value: string, unit: UnitCode): Quantity => ({ value, unit })

const targets = decimals(1, 500_000, 2)
const litres = fc.double({ min: 1, max: 1e7, noNaN: true })
const purities = decimals(1, 10_000, 2).map((value) => q(value, 'percent_w_w'))
const densities = decimals(500, 3000, 3).map((value) => q(value, 'g/mL'))

const products: fc.Arbitrary<{ product: BathProduct; basis: ConcentrationBasis; unit: UnitCode }> = fc.oneof(
  purities.map((strength) => ({
    product: { form: 'solid' as const, strength, strengthBasis: 'active' as const },
    basis: 'active' as const,
    unit: 'mg/L' as const,
  })),
  purities.map((strength) => ({
    product: {
      form: 'solid' as const,
      strength,
      strengthBasis: 'salt' as const,
      share: copperInPentahydrate,
    },
    basis: 'free' as const,
    unit: 'ug/L' as const,
  })),
  fc.tuple(purities, densities).map(([strength, density]) => ({
    product: { form: 'liquid' as const, strength, density, strengthBasis: 'active' as const },
    basis: 'active' as const,
    unit: 'mg/L' as const,
  })),
  decimals(100, 50_000, 2).map((value) => ({
    product: { form: 'liquid' as const, strength: q(value, 'mg/mL'), strengthBasis: 'total' as const },
    basis: 'total' as const,
    unit: 'ug/L' as const,
  })),
  densities.map((density) => ({
    product: { form: 'liquid' as const, density },
    basis: 'product' as const,
    unit: 'mg/L' as const,
  })),
  fc.constant({ product: { form: 'liquid' as const }, basis: 'product' as const, unit: 'uL/L' as const }),
)

const baths: fc.Arbitrary<BathDoseInput> = fc
  .tuple(products, targets, litres)
  .map(([{ product, basis, unit }, target, netLitres]) => ({
    target: { concentration: q(target, unit), basis },
    netLitres,
    product,
  }))

function amount(input: BathDoseInput): number | undefined {
  const result = computeBathDose(input)
  // weak products cannot reach strong targets; every other refusal is a fault of the generator
  if (!result.ok && result.refusal.code !== 'target-above-strength') throw new Error(result.refusal.code)
  return result.ok ? result.value.amount : undefined
}

function close(a: number, b: number, relative = 1e-9): void {
  expect(Math.abs(a - b)).toBeLessThanOrEqual(relative * Math.max(Math.abs(a), Math.abs(b)))
}

describe('laws of a bath', () => {
  it('every line of every kind of bath is borne out by the second evaluation', async () => {
    await fc.assert(
      fc.asyncProperty(baths, async (input) => {
        const result = computeBathDose(input)
        fc.pre(result.ok)
        expect(await verifyWorking(result.ok ? result.value.working : [])).toEqual({ ok: true })
      }),
      { numRuns: 300 },
    )
  })

  it('twice the water or twice the target takes twice the product', () => {
    fc.assert(
      fc.property(baths, (input) => {
        const once = amount(input)
        const { concentration, basis } = input.target
        const doubled = quantityOf(2 * Number(concentration.value), concentration.unit)
        const stronger = amount({ ...input, target: { concentration: doubled, basis } })
        fc.pre(once !== undefined && stronger !== undefined)
        close(amount({ ...input, netLitres: 2 * input.netLitres }) ?? NaN, 2 * (once ?? NaN))
        close(stronger ?? NaN, 2 * (once ?? NaN))
      }),
    )
  })

  it('a weaker product takes more, in proportion', () => {
    fc.assert(
      fc.property(decimals(5000, 10_000, 2), targets, litres, (purity, target, netLitres) => {
        const of = (strength: string) =>
          amount({
            target: { concentration: q(target, 'mg/L'), basis: 'active' },
            netLitres,
            product: { form: 'solid', strength: q(strength, 'percent_w_w'), strengthBasis: 'active' },
          }) ?? NaN
        close(of(purity) * Number(purity), of('100') * 100)
        expect(of(purity)).toBeGreaterThanOrEqual(of('100'))
      }),
    )
  })

  it('the amount put back into the water makes the target', async () => {
    await fc.assert(
      fc.asyncProperty(baths, async (input) => {
        fc.pre(input.target.concentration.unit !== 'uL/L')
        const result = computeBathDose(input)
        fc.pre(result.ok)
        if (!result.ok) return
        const reached = concentrationReached({
          amount: quantityOf(Number(result.value.amount.toPrecision(15)), result.value.unit),
          basis: input.target.basis ?? 'active',
          netLitres: input.netLitres,
          product: input.product,
        })
        if (!reached.ok) throw new Error(reached.refusal.code)
        const { value, unit } = input.target.concentration
        close(reached.value.mgPerL, unit === 'ug/L' ? Number(value) / 1000 : Number(value))
        expect(await verifyWorking(reached.value.working)).toEqual({ ok: true })
      }),
      { numRuns: 200 },
    )
  })

  it('two steps by reading come to the same as one', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 2, max: 1000 }),
        fc.integer({ min: 1, max: 999 }),
        litres,
        (wanted, first, netLitres) => {
          fc.pre(first < wanted)
          const step = (target: number, present: number) =>
            amount({
              target: { concentration: quantityOf(target / 1000, 'mg/L'), basis: 'free' },
              present: quantityOf(present / 1000, 'mg/L'),
              netLitres,
              product: {
                form: 'solid',
                strength: q('99', 'percent_w_w'),
                strengthBasis: 'salt',
                share: copperInPentahydrate,
              },
            }) ?? NaN
          close(step(first, 0) + step(wanted, first), step(wanted, 0))
        },
      ),
    )
  })

  it('a top-up for all of the water is the whole dose, and never more', () => {
    fc.assert(
      fc.property(
        targets,
        fc.integer({ min: 1, max: 100_000 }),
        fc.integer({ min: 1, max: 100 }),
        (target, net, share) => {
          const bath: BathDoseInput = {
            target: { concentration: q(target, 'mg/L'), basis: 'active' },
            netLitres: net,
            product: { form: 'solid', strength: q('98', 'percent_w_w'), strengthBasis: 'active' },
          }
          const top = computeTopUp({ ...bath, changed: quantityOf((net * share) / 100, 'L') })
          if (!top.ok) throw new Error(top.refusal.code)
          close(top.value.amount, ((amount(bath) ?? NaN) * share) / 100)
        },
      ),
    )
  })

  it('the range is the error of the volume around the amount', () => {
    fc.assert(
      fc.property(baths, fc.integer({ min: 0, max: 100 }), (input, volumeErrorPercent) => {
        const result = computeBathDose({ ...input, volumeErrorPercent })
        fc.pre(result.ok)
        if (!result.ok) return
        const { low, high } = result.value.range ?? { low: NaN, high: NaN }
        expect(low).toBeLessThanOrEqual(result.value.amount)
        expect(high).toBeGreaterThanOrEqual(result.value.amount)
        close(high - low, (2 * result.value.amount * volumeErrorPercent) / 100, 1e-6)
      }),
    )
  })

  it('what is weighed lies within half a division of what was worked out', () => {
    fc.assert(
      fc.property(
        targets,
        litres,
        fc.constantFrom('0.001', '0.01', '0.1', '0.5', '1', '5'),
        (target, netLitres, division) => {
          const result = computeBathDose({
            target: { concentration: q(target, 'mg/L'), basis: 'active' },
            netLitres,
            product: { form: 'solid', strength: q('100', 'percent_w_w'), strengthBasis: 'active' },
            measure: { division: q(division, 'g') },
          })
          fc.pre(result.ok)
          if (!result.ok) return
          const off = Math.abs(Number(result.value.measured?.value) - result.value.amount)
          expect(off).toBeLessThanOrEqual((Number(division) / 2) * (1 + 1e-6) + result.value.amount * 1e-11)
        },
      ),
    )
  })

  it('answers with a finite amount or a refusal, whatever it is handed', () => {
    const anything = fc.anything()
    fc.assert(
      fc.property(
        fc.record({
          target: fc.record({
            concentration: fc.record({ value: fc.string(), unit: fc.string() }),
            basis: anything,
          }),
          netLitres: fc.oneof(fc.double(), anything),
          volumeErrorPercent: fc.oneof(fc.double(), fc.constant(undefined)),
          present: fc.option(fc.record({ value: fc.string(), unit: fc.string() }), { nil: undefined }),
          product: fc.record({
            form: fc.constantFrom('solid', 'liquid'),
            strength: fc.option(fc.record({ value: fc.string(), unit: fc.string() }), { nil: undefined }),
            strengthBasis: anything,
            density: fc.option(fc.record({ value: fc.string(), unit: fc.string() }), { nil: undefined }),
            share: fc.option(fc.record({ activeGPerMol: fc.double(), compoundGPerMol: fc.double() }), {
              nil: undefined,
            }),
          }),
        }),
        (input) => {
          const result = computeBathDose(input as unknown as BathDoseInput)
          if (result.ok) expect(Number.isFinite(result.value.amount)).toBe(true)
          else expect(result.refusal.code).toMatch(/^[a-z-]+$/)
        },
      ),
      { numRuns: 1000 },
    )
  })
})

describe('laws of drift and agreement', () => {
  const positive = fc.double({ min: 1e-3, max: 1e6, noNaN: true })

  it('nothing drifts from itself, and a wider allowance never takes away', () => {
    fc.assert(
      fc.property(positive, positive, fc.integer({ min: 0, max: 99 }), (signed, now, allowed) => {
        expect(checkDrift(signed, signed, 0)).toMatchObject({ ok: true, value: { percent: 0, within: true } })
        const narrow = checkDrift(signed, now, allowed)
        const wide = checkDrift(signed, now, allowed + 1)
        if (narrow.ok && narrow.value.within) expect(wide).toMatchObject({ value: { within: true } })
      }),
    )
  })

  it('an amount agrees with itself, and not with ten times itself', () => {
    fc.assert(
      fc.property(decimals(100, 1_000_000, 2), (value) => {
        const [first, division] = [q(value, 'g'), q('0.01', 'g')]
        expect(secondCalculationAgrees(first, first, division)).toMatchObject({ value: { agrees: true } })
        const tenfold = q((Number(value) * 10).toFixed(1), 'g')
        expect(secondCalculationAgrees(first, tenfold, division)).toMatchObject({ value: { agrees: false } })
      }),
    )
  })
})
