import { ok, refuse, type Result } from '../result.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import { valueTerm } from '../working/value-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { Amount } from './amount-from-product.ts'
import type { BathProduct } from './bath-product.ts'
import { compoundNeeded } from './compound-needed.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { productStrength } from './product-strength.ts'
import type { Rise } from './rise-needed.ts'

/**
 * Amount for a target of the substance itself: mass wanted, ÷ share of it in the labelled compound, ÷ strength.
 *
 * @param volume the line that gives the litres
 * @refuses as productForMass · target-above-strength: no amount of a liquid brings the water to
 *          more than the liquid's own strength
 * @source  check values bath.06, bath.07, bath.09, bath.10, bath.13 to bath.15, cu.01, cu.02
 */
export function amountFromMass(
  basis: ConcentrationBasis,
  rise: Rise,
  volume: WorkingLine,
  product: BathProduct,
): Result<Amount, DoseRefusal> {
  const active: WorkingLine = {
    key: 'active-needed',
    code: 'active-needed',
    params: {},
    expression: `${valueTerm(volume.value, 'L')} * ${rise.term} to mg`,
    value: volume.value * rise.value,
    unit: 'mg',
    rests: [...rise.rests, volume.key],
  }
  const amount = productForMass(basis, active, product)
  if (!amount.ok) return amount
  return amount.value.unit === 'mL' && amount.value.value >= volume.value * 1000
    ? refuse('target-above-strength', 'target')
    : amount
}

/**
 * Amount of a product that holds a mass of what is wanted: ÷ share of it in the labelled compound, ÷ strength.
 *
 * @param active the line that gives the mass of what is wanted, mg
 * @refuses as compoundNeeded and productStrength
 */
export function productForMass(
  basis: ConcentrationBasis,
  active: WorkingLine,
  product: BathProduct,
): Result<Amount, DoseRefusal> {
  const strength = productStrength(product)
  if (!strength.ok) return strength
  const compound = compoundNeeded(basis, active, product)
  if (!compound.ok) return compound
  const { mass, lines } = compound.value
  const massTerm = valueTerm(mass.value, 'mg')

  if (strength.value.of === 'volume') {
    const { mgPerMl, line } = strength.value
    const value = mass.value / mgPerMl
    const expression = `${massTerm} / (${valueTerm(mgPerMl, 'mg/mL')}) to mL`
    const last = { key: 'amount', code: 'product-volume-from-active' as const, params: {}, expression, value }
    return ok({
      value,
      unit: 'mL',
      lines: [...lines, line, { ...last, unit: 'mL', rests: [mass.key, line.key] }],
    })
  }
  const { fraction, percentText } = strength.value
  const value = mass.value / 1000 / fraction
  const pure = fraction === 1
  const last: WorkingLine = {
    key: 'amount',
    code: pure ? 'product-mass' : 'product-at-purity',
    params: {},
    expression: pure ? `${massTerm} to g` : `${massTerm} / (${percentText} / 100) to g`,
    value,
    unit: 'g',
    rests: [mass.key],
  }
  return ok({ value, unit: 'g', lines: [...lines, last] })
}
