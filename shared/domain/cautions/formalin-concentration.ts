import { convert } from '../units/convert.ts'
import { unitOf } from '../units/unit-of.ts'
import type { CautionFacts, DoseTarget } from './caution-facts.ts'
import { valueOf } from './fact.ts'

/** Density of 37 % formaldehyde solution unless the lot says otherwise, g/mL (mark M). */
export const formalinDensityGPerMl = 1.08

/** Formaldehyde in the solution by mass (37 % w/w). */
const formaldehydeMassFraction = 0.37

/** A strength of formalin in both of the units that its sources print. */
export interface FormalinConcentration {
  productUlPerL: number
  productMgPerL: number
}

/**
 * The target of a formalin order as microlitres and as milligrams of **product** per litre.
 *
 * A figure without a basis gives null, except a volume of product per litre, which can be of nothing else; R27 stops it
 * anyway.
 *
 * @source 25 µL/L = 27 mg product/L at 1.08 g/mL (computed)
 */
export function formalinConcentration(facts: CautionFacts): FormalinConcentration | null {
  const target = valueOf(facts.order.target)
  if (!target || !Number.isFinite(target.value)) return null
  const stated = valueOf(facts.lot.densityGPerMl)
  const density = stated !== null && stated > 0 && Number.isFinite(stated) ? stated : formalinDensityGPerMl
  if (unitOf(target.unit).dimension === 'volumeConcentration') {
    const productUlPerL = inUnit(target, 'uL/L')
    return productUlPerL === null ? null : { productUlPerL, productMgPerL: productUlPerL * density }
  }
  const mgPerL = inUnit(target, 'mg/L')
  if (mgPerL === null) return null
  if (target.basis === 'product') return { productUlPerL: mgPerL / density, productMgPerL: mgPerL }
  if (target.basis !== 'active') return null
  const productMgPerL = mgPerL / formaldehydeMassFraction
  return { productUlPerL: productMgPerL / density, productMgPerL }
}

function inUnit(target: DoseTarget, unit: 'uL/L' | 'mg/L'): number | null {
  const converted = convert(target.value, target.unit, unit)
  return converted.ok ? converted.value : null
}
