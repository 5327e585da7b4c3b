import { ok, refuse, type Result } from '../result.ts'
import { checkNumber, type NumberRules } from '../units/check-number.ts'
import { convert } from '../units/convert.ts'
import { finiteOrRefuse } from '../units/finite-or-refuse.ts'
import type { UnitOf } from '../units/unit-table.ts'
import { aRules, bRules } from './growth-limits.ts'
import type { GrowthRefusal } from './growth-refusal.ts'

/** What a table of coefficients is in; b is the same in all of them. */
export interface CoefficientUnits {
  massUnit: UnitOf<'mass'>
  lengthUnit: UnitOf<'length'>
}

/** a in the other units for a of 1 in g/cm^b. */
function factorOf(b: number, units: CoefficientUnits): Result<number, GrowthRefusal> {
  const exponent = checkNumber(b, bRules)
  if (!exponent.ok) return exponent
  const mass = convert(1, 'g', units.massUnit)
  if (!mass.ok) return refuse(mass.refusal.code, 'massUnit', mass.refusal.params)
  const length = convert(1, 'cm', units.lengthUnit)
  if (!length.ok) return refuse(length.refusal.code, 'lengthUnit', length.refusal.params)
  return ok(mass.value / length.value ** b)
}

/**
 * The coefficient a in other units than g/cm^b: in g/mm^b it is a ÷ 10^b.
 *
 * @param input.aGPerCmB above 0, at most 1,000
 * @param input.b        2…4
 * @returns a in massUnit/lengthUnit^b
 * @refuses not-finite · not-above-zero, below-least, above-most · unknown-unit, dimensions-differ (massUnit, lengthUnit)
 * @source  algebra of W = a L^b · units: nist-sp-811 · check value lw.09
 */
export function coefficientInUnits(
  input: CoefficientUnits & { aGPerCmB: number; b: number },
): Result<number, GrowthRefusal> {
  const a = checkNumber(input.aGPerCmB, aRules)
  if (!a.ok) return a
  const factor = factorOf(input.b, input)
  return factor.ok ? finiteOrRefuse(a.value * factor.value, 'aGPerCmB') : factor
}

/**
 * The way back: a in g/cm^b, as the engines take it, from a table in other units.
 *
 * @param input.a in massUnit/lengthUnit^b, above 0
 * @param input.b 2…4
 * @returns g/cm^b; above 1,000 it is refused as a table of other units than it says
 * @refuses as coefficientInUnits, for a
 * @source  as coefficientInUnits
 */
export function coefficientFromUnits(
  input: CoefficientUnits & { a: number; b: number },
): Result<number, GrowthRefusal> {
  const inGiven: NumberRules = { field: 'a', unit: 'ratio', above: 0 }
  const a = checkNumber(input.a, inGiven)
  if (!a.ok) return a
  const factor = factorOf(input.b, input)
  if (!factor.ok) return factor
  return checkNumber(a.value / factor.value, { ...aRules, field: 'a' })
}
