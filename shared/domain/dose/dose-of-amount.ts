import { ok, refuse, type Result } from '../result.ts'
import { concentrationBases } from '../units/basis.ts'
import { findUnit } from '../units/find-unit.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { unitOf } from '../units/unit-of.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { activeShare } from './active-share.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { productStrength } from './product-strength.ts'
import { readDensity } from './read-density.ts'
import type { WeightDoseInput } from './weight-dose.ts'

type Given = Pick<WeightDoseInput, 'weight' | 'product'> & {
  /** What goes in of the product: "0.59", mL. */
  amount: Quantity
  basis: WeightDoseInput['target']['basis']
}

/**
 * The dose that an amount of a product is for an animal: the way back from computeWeightDose. A fixed amount is judged by
 * it, and so is what was really given.
 *
 * @returns mg/kg on the basis asked for, and its working
 * @refuses as parseQuantity (field amount, weight) · amount-of-other-kind: a liquid by weight or a solid by volume ·
 *          basis-missing, strength-basis-missing, share-missing · as productStrength
 * @source  the formula of computeWeightDose turned round; held by its law · check value: 200 mg in 25.0 kg is 8 mg/kg
 */
export function doseOfAmount({
  weight: given,
  amount: taken,
  product,
  basis: asked,
}: Given): Result<{ mgPerKg: number; working: WorkingLine[] }, DoseRefusal> {
  const basis = concentrationBases.find((each) => each === asked)
  if (basis === undefined) return refuse('basis-missing', 'basis')
  const weight = parseQuantity(given, {
    dimension: 'mass',
    above: 0,
    max: doseLimits.mostWeightGrams,
    field: 'weight',
  })
  if (!weight.ok) return weight
  const held = milligramsIn(taken, product, basis === 'product')
  if (!held.ok) return held
  const wanted = basis === 'product' ? held : partOf(held.value, product, basis)
  if (!wanted.ok) return wanted
  const { milligrams, lines } = wanted.value
  const mgPerKg = milligrams / (weight.value.value / 1000)
  const line: WorkingLine = {
    key: 'dose-by-amount',
    code: 'dose-by-amount',
    params: {},
    expression: `${valueTerm(milligrams, 'mg')} / (${enteredTerm(weight.value)})`,
    value: mgPerKg,
    unit: 'mg/kg',
    rests: lines.slice(-1).map(({ key }) => key),
  }
  return Number.isFinite(mgPerKg)
    ? ok({ mgPerKg, working: [...lines, line] })
    : refuse('not-finite', 'amount')
}

interface Held {
  milligrams: number
  lines: WorkingLine[]
}

/** What of the labelled substance, or of the product itself, is in an amount. */
function milligramsIn(
  taken: Quantity,
  product: Given['product'],
  ofProduct: boolean,
): Result<Held, DoseRefusal> {
  const field = 'amount'
  const unit = findUnit(taken.unit, {})
  const isVolume = unit.ok && unitOf(unit.value).dimension === 'volume'
  if (unit.ok && isVolume !== (product.form === 'liquid')) return refuse('amount-of-other-kind', field)
  const amount = parseQuantity(taken, { dimension: isVolume ? 'volume' : 'mass', above: 0, field })
  if (!amount.ok) return amount
  const term = enteredTerm(amount.value)
  const inMass = (expression: string, milligrams: number, before: readonly WorkingLine[] = []): Held => {
    const rests = before.slice(-1).map(({ key }) => key)
    const line = { key: 'active-in-amount', code: 'active-in-amount' as const, params: {}, expression }
    return { milligrams, lines: [...before, { ...line, value: milligrams, unit: 'mg', rests }] }
  }
  if (ofProduct && product.form === 'solid') return ok(inMass(`${term} to mg`, amount.value.value * 1000))
  if (ofProduct) {
    const density = readDensity(product)
    if (!density.ok) return density
    const milligrams = amount.value.value * 1e6 * density.value.value
    return ok(inMass(`${term} * ${enteredTerm(density.value)} to mg`, milligrams))
  }
  const strength = productStrength(product)
  if (!strength.ok) return strength
  if (strength.value.of === 'volume') {
    const { mgPerMl, line } = strength.value
    const milligrams = amount.value.value * 1000 * mgPerMl
    return ok(inMass(`${term} * ${valueTerm(mgPerMl, 'mg/mL')} to mg`, milligrams, [line]))
  }
  const { fraction, percentText } = strength.value
  return ok(inMass(`${term} * ${percentText} / 100 to mg`, amount.value.value * 1000 * fraction))
}

/** The part of the labelled compound that the dose is of. */
function partOf(held: Held, product: Given['product'], basis: string): Result<Held, DoseRefusal> {
  const { strengthBasis, share } = product
  if (strengthBasis === undefined) return refuse('strength-basis-missing', 'strengthBasis')
  if (strengthBasis === basis) return ok(held)
  if (share === undefined) return refuse('share-missing', 'share')
  const fraction = activeShare(share)
  if (!fraction.ok) return fraction
  const { activeGPerMol, compoundGPerMol } = share
  const milligrams = held.milligrams * fraction.value
  const line: WorkingLine = {
    key: 'part-in-amount',
    code: 'active-share',
    params: {},
    expression: `${valueTerm(held.milligrams, 'mg')} * ${String(activeGPerMol)} / ${String(compoundGPerMol)} to mg`,
    value: milligrams,
    unit: 'mg',
    rests: held.lines.slice(-1).map(({ key }) => key),
  }
  return ok({ milligrams, lines: [...held.lines, line] })
}
