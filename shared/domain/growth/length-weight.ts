import { refuse, type Result } from '../result.ts'
import { checkNumbers } from '../units/check-numbers.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import { aRules, bRules, lengthRules, weightRules } from './growth-limits.ts'
import type { GrowthRefusal } from './growth-refusal.ts'
import { checkLengthType, type LengthType } from './length-type.ts'

/** W = a L^b with the weight in grams and the length in centimetres. */
export interface LengthWeightCoefficients {
  /** g/cm^b, above 0, at most 1,000; about 0.01 for most fish. */
  aGPerCmB: number
  /** 2…4; 2.5…3.5 is typical (isTypicalExponent). */
  b: number
}

/** A length with what it and the coefficients were measured to. */
export interface MeasuredLength {
  /** Above 0, at most 2,500. */
  lengthCm: number
  lengthType: LengthType
  /** What the coefficients were fitted on. */
  coefficientsLengthType: LengthType
}

/**
 * What an animal of this length weighs by its species' coefficients: a L^b. For logs and the feed of a group; an anaesthetic
 * or an injection needs a weight from the scales.
 *
 * @returns g
 * @refuses not-finite · not-above-zero, below-least, above-most (aGPerCmB, b, lengthCm) · length-type-not-stated,
 *          length-type-differs
 * @source  le-cren-1951 · froese-2006 · check values lw.01 to lw.03, lw.refuse1, lw.refuse2
 */
export function weightFromLength(
  input: LengthWeightCoefficients & MeasuredLength,
): Result<number, GrowthRefusal> {
  const { aGPerCmB, b, lengthCm, lengthType, coefficientsLengthType } = input
  const refused = checkNumbers([
    [aGPerCmB, aRules],
    [b, bRules],
    [lengthCm, lengthRules],
  ])
  return (
    refused ??
    checkLengthType(lengthType, coefficientsLengthType) ??
    finiteOrRefuse(aGPerCmB * lengthCm ** b, 'lengthCm')
  )
}

/**
 * How long an animal of this weight is by its species' coefficients: (W ÷ a)^(1 ÷ b).
 *
 * @param input.weightG above 0, at most 20,000,000
 * @returns cm, of the kind of length that the coefficients were fitted on
 * @refuses not-finite · not-above-zero, below-least, above-most (aGPerCmB, b, weightG)
 * @source  le-cren-1951 · check value lw.04
 */
export function lengthFromWeight(
  input: LengthWeightCoefficients & { weightG: number },
): Result<number, GrowthRefusal> {
  const { aGPerCmB, b, weightG } = input
  const refused = checkNumbers([
    [aGPerCmB, aRules],
    [b, bRules],
    [weightG, weightRules],
  ])
  return refused ?? finiteOrRefuse((weightG / aGPerCmB) ** (1 / b), 'aGPerCmB')
}

/** What an animal weighs against what its length lets expect. */
export interface RelativeCondition {
  /** Weight ÷ expected weight: 1 where it is as its species' coefficients say. */
  kn: number
  /** a L^b. */
  expectedG: number
}

/**
 * Relative condition of Le Cren: W ÷ (a L^b).
 *
 * @param input.weightG above 0, at most 20,000,000
 * @refuses as weightFromLength · not-above-zero, above-most (weightG)
 * @source  le-cren-1951 · check value lw.07
 */
export function relativeCondition(
  input: LengthWeightCoefficients & MeasuredLength & { weightG: number },
): Result<RelativeCondition, GrowthRefusal> {
  const refused = checkNumbers([[input.weightG, weightRules]])
  if (refused) return refused
  const expected = weightFromLength(input)
  if (!expected.ok) return expected
  const kn = input.weightG / expected.value
  if (!Number.isFinite(kn)) return refuse('not-finite', 'lengthCm')
  return { ok: true, value: { kn, expectedG: expected.value } }
}
