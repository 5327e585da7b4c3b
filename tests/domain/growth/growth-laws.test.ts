import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  coefficientFromUnits,
  coefficientInUnits,
} from '../../../shared/domain/growth/coefficient-in-units.ts'
import {
  conditionFactorFromEnglish,
  fultonConditionFactor,
} from '../../../shared/domain/growth/condition-factor.ts'
import { isTypicalExponent, isUsualCoefficient } from '../../../shared/domain/growth/growth-limits.ts'
import {
  lengthFromWeight,
  relativeCondition,
  weightFromLength,
} from '../../../shared/domain/growth/length-weight.ts'
import { lengthTypes } from '../../../shared/domain/growth/length-type.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const total = { lengthType: 'total', coefficientsLengthType: 'total' } as const
const fish = fc.record({
  aGPerCmB: between(0.001, 0.1),
  b: between(2.5, 3.5),
  lengthCm: between(1, 200),
  lengthType: fc.constant('total' as const),
  coefficientsLengthType: fc.constant('total' as const),
})

describe('laws of length and weight', () => {
  it('comes back from the weight to the length', () => {
    fc.assert(
      fc.property(fish, (input) => {
        const weightG = valueOf(weightFromLength(input))
        fc.pre(weightG <= 20_000_000)
        expectNear(valueOf(lengthFromWeight({ ...input, weightG })), input.lengthCm, 1e-11)
      }),
    )
  })

  it('weighs more the longer it is, by 2^b for twice the length', () => {
    fc.assert(
      fc.property(fish, (input) => {
        const twice = valueOf(weightFromLength({ ...input, lengthCm: 2 * input.lengthCm }))
        expectNear(twice, 2 ** input.b * valueOf(weightFromLength(input)), 1e-11)
      }),
    )
  })

  it('has a relative condition of 1 at the expected weight, and of K over 100 a where b is 3', () => {
    fc.assert(
      fc.property(fish, between(1, 10_000), (input, weightG) => {
        const expected = valueOf(relativeCondition({ ...input, weightG })).expectedG
        fc.pre(expected <= 20_000_000)
        expect(valueOf(relativeCondition({ ...input, weightG: expected })).kn).toBe(1)
        const { kn } = valueOf(relativeCondition({ ...input, b: 3, weightG }))
        expectNear(kn * 100 * input.aGPerCmB, valueOf(fultonConditionFactor({ ...input, weightG })), 1e-11)
      }),
    )
  })

  it('has the same K in pounds and inches', () => {
    fc.assert(
      fc.property(between(0.01, 100), between(1, 60), (pounds, inches) => {
        const cLbPerIn3 = pounds / inches ** 3
        fc.pre(cLbPerIn3 <= 1)
        const metric = { weightG: pounds * 453.59237, lengthCm: inches * 2.54 }
        expectNear(
          valueOf(conditionFactorFromEnglish({ cLbPerIn3 })),
          valueOf(fultonConditionFactor(metric)),
          1e-11,
        )
      }),
    )
  })

  it('weighs the same by coefficients in other units, and comes back from them', () => {
    const units = [
      ['g', 'mm', 10, 1],
      ['kg', 'cm', 1, 0.001],
      ['kg', 'm', 0.01, 0.001],
      ['lb', 'in', 1 / 2.54, 1 / 453.59237],
    ] as const
    fc.assert(
      fc.property(fish, fc.constantFrom(...units), (input, [massUnit, lengthUnit, perCm, perGram]) => {
        const a = valueOf(coefficientInUnits({ ...input, massUnit, lengthUnit }))
        const weight = a * (input.lengthCm * perCm) ** input.b
        expectNear(weight, valueOf(weightFromLength(input)) * perGram, 1e-11)
        const back = valueOf(coefficientFromUnits({ a, b: input.b, massUnit, lengthUnit }))
        expectNear(back, input.aGPerCmB, 1e-12)
      }),
    )
  })

  it('asks what a length was measured to, and takes no other than that of the coefficients', () => {
    const input = { aGPerCmB: 0.01, b: 3, lengthCm: 20, ...total }
    for (const first of lengthTypes)
      for (const second of lengthTypes) {
        const asked = { ...input, lengthType: first, coefficientsLengthType: second }
        const expected = first === second ? ['answered', undefined] : ['length-type-differs', 'lengthType']
        expect(refusalOf(weightFromLength(asked))).toEqual(expected)
        expect(refusalOf(relativeCondition({ ...asked, weightG: 80 }))).toEqual(expected)
      }
    const unsaid = { ...input, lengthType: undefined as unknown as 'total' }
    expect(refusalOf(weightFromLength(unsaid))).toEqual(['length-type-not-stated', 'lengthType'])
    const table = { ...input, coefficientsLengthType: '' as 'total' }
    expect(refusalOf(weightFromLength(table))).toEqual(['length-type-not-stated', 'coefficientsLengthType'])
  })

  it('takes exponents of 2 to 4, and says which are typical', () => {
    const withB = (b: number) => refusalOf(weightFromLength({ aGPerCmB: 0.01, b, lengthCm: 20, ...total }))[0]
    expect([1.99, 2, 4, 4.01].map(withB)).toEqual(['below-least', 'answered', 'answered', 'above-most'])
    expect([2.49, 2.5, 3.5, 3.51].map(isTypicalExponent)).toEqual([false, true, true, false])
    // a trout's 0.01 printed in millimetres is a thousandth of it
    expect([0.01, 0.00001, 10].map(isUsualCoefficient)).toEqual([true, false, false])
  })

  it('refuses a unit that is none of mass or length', () => {
    const a = { aGPerCmB: 0.01, b: 3, massUnit: 'g', lengthUnit: 'L' as 'cm' } as const
    expect(refusalOf(coefficientInUnits(a))).toEqual(['dimensions-differ', 'lengthUnit'])
    const unknown = { ...a, massUnit: 'stone' as 'g', lengthUnit: 'cm' } as const
    expect(refusalOf(coefficientInUnits(unknown))).toEqual(['unknown-unit', 'massUnit'])
    const overTable = { a: 5000, b: 3, massUnit: 'g', lengthUnit: 'cm' } as const
    expect(refusalOf(coefficientFromUnits(overTable))).toEqual(['above-most', 'a'])
  })

  it('answers nonsense with a refusal or a finite number', () => {
    const length = ['lengthCm', 'lengthType', 'coefficientsLengthType']
    expectTotal([
      [weightFromLength, ['aGPerCmB', 'b', ...length]],
      [
        (input: { aGPerCmB: number; b: number; lengthCm: number }) =>
          weightFromLength({ ...input, ...total }),
        ['aGPerCmB', 'b', 'lengthCm'],
      ],
      [
        (input: { aGPerCmB: number; b: number; lengthCm: number; weightG: number }) =>
          relativeCondition({ ...input, ...total }),
        ['aGPerCmB', 'b', 'lengthCm', 'weightG'],
      ],
      [lengthFromWeight, ['aGPerCmB', 'b', 'weightG']],
      [fultonConditionFactor, ['weightG', 'lengthCm']],
      [conditionFactorFromEnglish, ['cLbPerIn3']],
      [coefficientInUnits, ['aGPerCmB', 'b', 'massUnit', 'lengthUnit']],
      [coefficientFromUnits, ['a', 'b', 'massUnit', 'lengthUnit']],
      [
        (input: { a: number; b: number }) =>
          coefficientFromUnits({ ...input, massUnit: 'kg', lengthUnit: 'm' }),
        ['a', 'b'],
      ],
    ])
  })
})
