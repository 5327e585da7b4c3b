import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { verifyWorking } from '../../../server/platform/arithmetic/verify-working.ts'
import { checkDrift } from '../../../shared/domain/dose/check-drift.ts'
import { computeWeightDose } from '../../../shared/domain/dose/compute-weight-dose.ts'
import { doseOfAmount } from '../../../shared/domain/dose/dose-of-amount.ts'
import type { WeightDose, WeightDoseInput } from '../../../shared/domain/dose/weight-dose.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'

const q = (value: string, unit: Quantity['unit']): Quantity => ({ value, unit })
const liquid = (mgPerMl: string) =>
  ({ form: 'liquid', strength: q(mgPerMl, 'mg/mL'), strengthBasis: 'base' }) as const

/** Enrofloxacin 22.7 mg/mL at 10 mg/kg in a fish of 1.35 kg. */
const fish: WeightDoseInput = {
  weight: q('1.35', 'kg'),
  target: { dose: q('10', 'mg/kg'), basis: 'base' },
  product: liquid('22.7'),
  measure: { division: q('0.01', 'mL') },
}

function doseOf(input: WeightDoseInput): WeightDose {
  const dose = computeWeightDose(input)
  if (!dose.ok) throw new Error(JSON.stringify(dose.refusal))
  return dose.value
}

describe('a dose for the weight of an animal', () => {
  // Source: check values inj.01 and injr.01 of the water and dose reference (computed there from dose × weight ÷ strength)
  it('is dose × weight ÷ strength, rounded to the syringe', () => {
    const dose = doseOf(fish)
    expect(dose.amount).toBeCloseTo(0.594714, 6)
    expect(dose.measured).toEqual(q('0.59', 'mL'))
    expect(dose.roundingPercent).toBeCloseTo(-0.7926, 3)
    expect(dose.thinTo).toBeUndefined()
  })

  // Source: treatments reference 4.1, computed there: 8 mg/kg signed at 25.0 kg; 23.1 kg within, 22.0 kg held
  it.each([
    ['25.0', 200, 0, true],
    ['23.1', 184.8, -7.6, true],
    ['22.0', 176, -12, false],
  ])('of 8 mg/kg at %s kg is %d mg', (weight, milligrams, percent, within) => {
    const powder = { form: 'solid', strength: q('100', 'percent_w_w'), strengthBasis: 'base' } as const
    const dose = doseOf({
      ...fish,
      weight: q(weight, 'kg'),
      target: { dose: q('8', 'mg/kg'), basis: 'base' },
      product: powder,
      measure: { division: q('0.1', 'mg') },
    })
    expect(dose.amount * 1000).toBeCloseTo(milligrams, 9)
    const drift = checkDrift(25, Number(weight), 10)
    expect(drift.ok && drift.value.percent).toBeCloseTo(percent, 9)
    expect(drift.ok && drift.value.within).toBe(within)
  })

  it('rounds halves up in decimal, not in binary', () => {
    // 1 mg/kg × 0.125 kg ÷ 1 mg/mL = 0.125 mL; check value injr: 0.125 at 0.01 is 0.13
    const dose = doseOf({
      ...fish,
      weight: q('125', 'g'),
      target: { dose: q('1', 'mg/kg'), basis: 'base' },
      product: liquid('1'),
    })
    expect(dose.measured?.value).toBe('0.13')
  })

  it('is divided in whole steps over the places that the largest volume asks for', () => {
    const large = { ...fish, weight: q('12.5', 'kg') }
    expect(doseOf(large).measured?.value).toBe('5.51')
    expect(doseOf({ ...large, mostPerPlace: q('2', 'mL') }).portions).toEqual([
      q('1.84', 'mL'),
      q('1.84', 'mL'),
      q('1.83', 'mL'),
    ])
    expect(doseOf({ ...large, mostPerPlace: q('5.51', 'mL') }).portions).toBeUndefined()
    // two of 2.755 mL would each be a step too much when rounded
    expect(doseOf({ ...large, mostPerPlace: q('2.755', 'mL') }).portions).toHaveLength(3)
    expect(computeWeightDose({ ...large, mostPerPlace: q('0.005', 'mL') })).toMatchObject({
      ok: false,
      refusal: { code: 'place-below-step' },
    })
  })

  it('says to how much the product has to be thinned to be read well, and refuses what would be nothing', () => {
    const small = { ...fish, weight: q('30', 'g') } // 0.0132 mL
    expect(doseOf(small)).toMatchObject({ measured: q('0.01', 'mL'), thinTo: 16 })
    expect(computeWeightDose({ ...fish, weight: q('8', 'g') })).toMatchObject({
      ok: false,
      refusal: { code: 'below-half-step', params: { parts: 57 } },
    })
  })

  it.each<[string, Partial<WeightDoseInput>, string]>([
    ['no basis', { target: { dose: q('10', 'mg/kg'), basis: undefined } }, 'basis-missing'],
    ['a concentration for a dose', { target: { dose: q('10', 'mg/L'), basis: 'base' } }, 'dimensions-differ'],
    [
      'another substance on the label',
      { target: { dose: q('10', 'mg/kg'), basis: 'salt' } },
      'share-missing',
    ],
    [
      'a label without a basis',
      { product: { form: 'liquid', strength: q('22.7', 'mg/mL') } },
      'strength-basis-missing',
    ],
    ['no weight', { weight: q('0', 'kg') }, 'not-above-zero'],
    ['a balance for a liquid', { measure: { division: q('0.01', 'g') } }, 'division-of-other-kind'],
    ['a weight of a hundred tonnes', { weight: q('100000', 'kg') }, 'above-most'],
    [
      'a dose a thousand times too high',
      { target: { dose: q('11000', 'mg/kg'), basis: 'base' } },
      'above-most',
    ],
  ])('refuses %s', (_, change, code) => {
    expect(computeWeightDose({ ...fish, ...change })).toMatchObject({ ok: false, refusal: { code } })
  })

  it('counts the base in a salt by molar masses', () => {
    // chloroquine base per g diphosphate 319.87/515.87 = 0.620 (treatments reference 2.6, computed)
    const salt = {
      form: 'liquid',
      strength: q('50', 'mg/mL'),
      strengthBasis: 'salt',
      share: { activeGPerMol: 319.87, compoundGPerMol: 515.87 },
    } as const
    const dose = doseOf({ ...fish, product: salt })
    expect(dose.amount).toBeCloseTo((10 * 1.35) / (319.87 / 515.87) / 50, 9)
  })

  it('comes back from the amount, with a working that a second way bears out', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.integer({ min: 1, max: 99_999 }),
        fc.integer({ min: 1, max: 9_999 }),
        fc.integer({ min: 1, max: 9_999 }),
        fc.constantFrom('kg' as const, 'g' as const, 'lb' as const),
        fc.constantFrom('base' as const, 'product' as const),
        async (weight, dose, strength, unit, basis) => {
          const input: WeightDoseInput = {
            weight: q(String(weight / 100), unit),
            target: { dose: q(String(dose / 100), 'mg/kg'), basis },
            product: { ...liquid(String(strength / 100)), density: q('1.02', 'g/mL') },
          }
          const there = doseOf(input)
          const back = doseOfAmount({
            ...input,
            basis,
            // every digit of it: the smallest amounts here are less than a millionth of a millilitre
            amount: quantityOf(there.amount, 'mL'),
          })
          if (!back.ok) throw new Error(JSON.stringify(back.refusal))
          expect(back.value.mgPerKg / (dose / 100)).toBeCloseTo(1, 4)
          expect(await verifyWorking(there.working)).toEqual({ ok: true })
          expect(await verifyWorking(back.value.working)).toEqual({ ok: true })
        },
      ),
      { numRuns: 150 },
    )
  })

  it('never makes more or less of the measured amount by dividing it', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 10, max: 90_000 }),
        fc.integer({ min: 1, max: 500 }),
        fc.constantFrom('0.01', '0.05', '0.1', '0.2', '1'),
        (grams, most, division) => {
          const dose = computeWeightDose({
            ...fish,
            weight: q(String(grams), 'g'),
            measure: { division: q(division, 'mL') },
            mostPerPlace: q(String(most / 10), 'mL'),
          })
          if (!dose.ok || dose.value.portions === undefined) return
          const steps = dose.value.portions.map(({ value }) => Math.round(Number(value) / Number(division)))
          const all = Math.round(Number(dose.value.measured?.value) / Number(division))
          expect(steps.reduce((a, b) => a + b, 0)).toBe(all)
          expect(Math.max(...steps) * Number(division)).toBeLessThanOrEqual((most / 10) * (1 + 1e-9))
          expect(Math.max(...steps) - Math.min(...steps)).toBeLessThanOrEqual(1)
        },
      ),
    )
  })

  it('refuses an amount of another kind than the product', () => {
    expect(doseOfAmount({ ...fish, basis: 'base', amount: q('0.59', 'g') })).toMatchObject({
      ok: false,
      refusal: { code: 'amount-of-other-kind', field: 'amount' },
    })
  })
})
