import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { allometricDose } from '../../../shared/domain/dose/allometric-dose.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const scalings = fc.record({
  referenceDoseMgPerKg: between(0.01, 40),
  referenceWeightKg: between(0.01, 500),
  targetWeightKg: between(0.01, 500),
  exponent: between(0.5, 1),
})

describe('laws of allometric scaling', () => {
  it('is the reference dose for an animal of the reference weight', () => {
    fc.assert(
      fc.property(scalings, (scaling) => {
        const same = valueOf(allometricDose({ ...scaling, targetWeightKg: scaling.referenceWeightKg }))
        expectNear(same.mgPerKg, scaling.referenceDoseMgPerKg)
        expectNear(same.doseMg, scaling.referenceDoseMgPerKg * scaling.referenceWeightKg)
      }),
    )
  })

  it('comes back to where it began', () => {
    fc.assert(
      fc.property(scalings, (scaling) => {
        const there = valueOf(allometricDose(scaling))
        const back = allometricDose({
          referenceDoseMgPerKg: there.mgPerKg,
          referenceWeightKg: scaling.targetWeightKg,
          targetWeightKg: scaling.referenceWeightKg,
          exponent: scaling.exponent,
        })
        expectNear(valueOf(back).mgPerKg, scaling.referenceDoseMgPerKg, 1e-9)
      }),
    )
  })

  it('gives a larger animal more, and never more for each of its kilograms', () => {
    fc.assert(
      fc.property(scalings, between(1.001, 20), (scaling, factor) => {
        const small = valueOf(allometricDose(scaling))
        const large = valueOf(allometricDose({ ...scaling, targetWeightKg: scaling.targetWeightKg * factor }))
        expect(large.doseMg).toBeGreaterThan(small.doseMg)
        expect(large.mgPerKg).toBeLessThanOrEqual(small.mgPerKg * (1 + 1e-12))
      }),
    )
  })

  it('scales with an exponent of 1 as every other dose does', () => {
    fc.assert(
      fc.property(scalings, (scaling) => {
        const { mgPerKg } = valueOf(allometricDose({ ...scaling, exponent: 1 }))
        expectNear(mgPerKg, scaling.referenceDoseMgPerKg)
      }),
    )
  })

  it('refuses what is no weight, no dose and no exponent', () => {
    const scaling = { referenceDoseMgPerKg: 10, referenceWeightKg: 1, targetWeightKg: 0.1, exponent: 0.75 }
    for (const field of ['referenceDoseMgPerKg', 'referenceWeightKg', 'targetWeightKg'] as const)
      expect(refusalOf(allometricDose({ ...scaling, [field]: 0 }))).toEqual(['not-above-zero', field])
    expect(refusalOf(allometricDose({ ...scaling, exponent: 0.4 }))[0]).toBe('below-least')
    expect(refusalOf(allometricDose({ ...scaling, exponent: 1.1 }))[0]).toBe('above-most')
  })

  it('answers nonsense with a refusal or a finite number', () => {
    expectTotal([
      [allometricDose, ['referenceDoseMgPerKg', 'referenceWeightKg', 'targetWeightKg', 'exponent']],
    ])
  })
})
