import { ok, refuse, type Result } from '../result.ts'
import { concentrationBases } from '../units/basis.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { productForMass } from './amount-from-mass.ts'
import { productByMass } from './amount-from-product.ts'
import type { Amount } from './amount-from-product.ts'
import type { BathProduct } from './bath-product.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { measureForAnimal } from './measure-for-animal.ts'
import { targetTerm } from './rise-needed.ts'
import type { WeightDose, WeightDoseInput } from './weight-dose.ts'

/**
 * Amount of product for one weighed animal: dose × weight, through share, strength, purity and density as the basis of
 * the dose asks, rounded to the syringe or balance, and divided over as many places as the largest volume for one asks.
 *
 * @returns the amount unrounded and as measured, what rounding and the error of the weight make of it, and the working
 * @refuses as parseQuantity (field weight, target) · basis-missing · as productForMass, measureForAnimal ·
 *          error-outside-range
 * @source  check values inj.01 to inj.05, injr.*, inje.* · treatments reference: 8 mg/kg at 25.0 kg is 200 mg
 */
export function computeWeightDose(input: WeightDoseInput): Result<WeightDose, DoseRefusal> {
  const { weightErrorPercent: error, target, product } = input
  if (error !== undefined && !(error >= 0 && error <= 100)) return refuse('error-outside-range', 'error')
  const weight = parseQuantity(input.weight, {
    dimension: 'mass',
    above: 0,
    max: doseLimits.mostWeightGrams,
    field: 'weight',
  })
  if (!weight.ok) return weight
  const dose = parseQuantity(target.dose, {
    dimension: 'bodyDose',
    above: 0,
    max: doseLimits.mostDoseMgPerKg,
    field: 'target',
  })
  if (!dose.ok) return dose
  const basis = concentrationBases.find((each) => each === target.basis)
  if (basis === undefined) return refuse('basis-missing', 'basis')
  const drug: WorkingLine = {
    key: 'drug-for-weight',
    code: 'drug-for-weight',
    params: {},
    expression: `${targetTerm(dose.value)} * ${enteredTerm(weight.value)} to mg`,
    value: (dose.value.value * weight.value.value) / gramsPerKilogram,
    unit: 'mg',
    rests: [],
  }
  const amount = basis === 'product' ? amountOfProduct(drug, product) : productForMass(basis, drug, product)
  if (!amount.ok) return amount
  const { value, unit, lines } = amount.value
  const measured = measureForAnimal(value, unit, input)
  if (!measured.ok) return measured
  return ok({
    amount: value,
    unit,
    ...measured.value,
    ...(error === undefined
      ? {}
      : { range: { low: value * (1 - error / 100), high: value * (1 + error / 100) } }),
    working: lines,
  })
}

const gramsPerKilogram = 1000

/** A dose of the product itself: weighed as it is, or by its density. */
function amountOfProduct(drug: WorkingLine, product: BathProduct): Result<Amount, DoseRefusal> {
  const amount = productByMass(
    { grams: drug.value / 1000, expression: `${valueTerm(drug.value, 'mg')} to g`, rests: [drug.key] },
    product,
  )
  return amount.ok ? ok({ ...amount.value, lines: [drug, ...amount.value.lines] }) : amount
}
