import { ok, refuse, type Result } from '../result.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import { findUnit } from '../units/find-unit.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { unitOf } from '../units/unit-of.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { activeShare } from './active-share.ts'
import type { BathProduct } from './bath-product.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'
import { productStrength } from './product-strength.ts'
import { readDensity } from './read-density.ts'

/**
 * What a stated amount of product makes of a volume of water: the rate that a fixed amount works out to today, and the
 * strength of a stock solution. The other way round from computeBathDose; the volume of the product itself is not added.
 *
 * @param input.amount g or mL of the product, in any unit
 * @param input.basis  what the answer is of; of the product itself, mg/L
 * @returns mg/L of the basis, with its working
 * @refuses as parseQuantity (field amount), litresLine, productStrength, readDensity · strength-basis-missing ·
 *          share-missing · ionic-target-chelated-product
 * @source  check values bath.17, cu.03, cu.04
 */
export function concentrationReached(input: {
  amount: Quantity
  basis: ConcentrationBasis
  netLitres: number
  product: BathProduct
}): Result<{ mgPerL: number; working: WorkingLine[] }, DoseRefusal> {
  const volume = litresLine(input.netLitres, 'net-volume-used', 'netVolume')
  if (!volume.ok) return volume
  const mass = productMass(input)
  if (!mass.ok) return mass
  const share = shareOf(input)
  if (!share.ok) return share
  const mgPerL = (mass.value.milligrams * share.value.fraction) / input.netLitres
  const net = valueTerm(input.netLitres, 'L')
  const line: WorkingLine = {
    key: 'concentration-reached',
    code: 'concentration-reached',
    params: {},
    expression: `${mass.value.term}${share.value.term} / (${net}) to mg/L`,
    value: mgPerL,
    unit: 'mg/L',
    rests: [...mass.value.lines.map((each) => each.key), volume.value.key],
  }
  return ok({ mgPerL, working: [volume.value, ...mass.value.lines, line] })
}

interface ProductMass {
  milligrams: number
  term: string
  lines: WorkingLine[]
}

/** Milligrams of what the label is of (of the product itself, when that is the basis) in the amount. */
function productMass(input: {
  amount: Quantity
  basis: ConcentrationBasis
  product: BathProduct
}): Result<ProductMass, DoseRefusal> {
  const { amount, basis, product } = input
  const unit = findUnit(amount.unit)
  const byVolume = unit.ok && unitOf(unit.value).dimension === 'volume'
  const rules = { above: 0, field: 'amount' }
  if (!byVolume) {
    const grams = parseQuantity(amount, { ...rules, dimension: 'mass' })
    if (!grams.ok) return grams
    const milligrams = grams.value.value * 1000
    const term = enteredTerm(grams.value)
    if (basis === 'product') return ok({ milligrams, term, lines: [] })
    const strength = productStrength({ ...product, form: 'solid' })
    if (!strength.ok) return strength
    if (strength.value.of !== 'mass') return refuse('strength-unit-not-usable', 'strength')
    const { fraction, percentText } = strength.value
    return ok({ milligrams: milligrams * fraction, term: `${term} * ${percentText} / 100`, lines: [] })
  }
  if (product.form === 'solid') return refuse('volume-unit-for-solid', 'amount')
  const litres = parseQuantity(amount, { ...rules, dimension: 'volume' })
  if (!litres.ok) return litres
  const millilitres = litres.value.value * 1000
  const term = enteredTerm(litres.value)
  if (basis === 'product') {
    const density = readDensity(product)
    if (!density.ok) return density
    const milligrams = millilitres * density.value.value * 1000
    return ok({ milligrams, term: `${term} * ${enteredTerm(density.value)}`, lines: [] })
  }
  const strength = productStrength(product)
  if (!strength.ok) return strength
  if (strength.value.of !== 'volume') return refuse('strength-unit-not-usable', 'strength')
  const { mgPerMl, line } = strength.value
  return ok({
    milligrams: millilitres * mgPerMl,
    term: `${term} * ${valueTerm(mgPerMl, 'mg/mL')}`,
    lines: [line],
  })
}

function shareOf(input: {
  basis: ConcentrationBasis
  product: BathProduct
}): Result<{ fraction: number; term: string }, DoseRefusal> {
  const { basis, product } = input
  if (basis === 'product' || basis === product.strengthBasis) return ok({ fraction: 1, term: '' })
  if (product.strengthBasis === undefined) return refuse('strength-basis-missing', 'strengthBasis')
  if (basis === 'free' && product.strengthBasis === 'total')
    return refuse('ionic-target-chelated-product', 'basis')
  if (product.share === undefined) return refuse('share-missing', 'share')
  const fraction = activeShare(product.share)
  if (!fraction.ok) return fraction
  const { activeGPerMol, compoundGPerMol } = product.share
  return ok({ fraction: fraction.value, term: ` * (${activeGPerMol} / ${compoundGPerMol})` })
}
