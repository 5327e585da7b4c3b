import type { NumberRules } from '../units/check-number.ts'

/**
 * Where length and weight are asked at all; beyond, a figure is taken for a slip.
 *
 * @source project-default: no animal of a collection is longer than 25 m or heavier than 20 t; usual a · exponents: froese-2006
 */
export const growthLimits = {
  mostLengthCm: 2500,
  mostWeightG: 20_000_000,
  mostA: 1000,
  leastB: 2,
  mostB: 4,
  /** Outside of these an exponent is possible and worth a second look. */
  leastTypicalB: 2.5,
  mostTypicalB: 3.5,
  /** Eels and pipefish are below, puffers and boxfish above; beyond, a table is in other units than it says. */
  leastUsualA: 0.0005,
  mostUsualA: 0.2,
} as const

export const lengthRules: NumberRules = {
  field: 'lengthCm',
  unit: 'cm',
  above: 0,
  max: growthLimits.mostLengthCm,
}
export const weightRules: NumberRules = {
  field: 'weightG',
  unit: 'g',
  above: 0,
  max: growthLimits.mostWeightG,
}
/** In g/cm^b, a unit that goes with the exponent and has no code. */
export const aRules: NumberRules = { field: 'aGPerCmB', unit: 'ratio', above: 0, max: growthLimits.mostA }
export const bRules: NumberRules = {
  field: 'b',
  unit: 'ratio',
  min: growthLimits.leastB,
  max: growthLimits.mostB,
}

/** Whether an exponent is one that most species have, 2.5…3.5. @source froese-2006 */
export function isTypicalExponent(b: number): boolean {
  return b >= growthLimits.leastTypicalB && b <= growthLimits.mostTypicalB
}

/** Whether a coefficient in g/cm^b is one that some fish has, 0.0005…0.2. @source project-default */
export function isUsualCoefficient(aGPerCmB: number): boolean {
  return aGPerCmB >= growthLimits.leastUsualA && aGPerCmB <= growthLimits.mostUsualA
}
