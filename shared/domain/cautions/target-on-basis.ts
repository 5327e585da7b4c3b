import { convert } from '../units/convert.ts'
import { unitOf } from '../units/unit-of.ts'
import type { CautionFacts, DefaultRange, DoseUnit } from './caution-facts.ts'
import { copperConcentration } from './copper-concentration.ts'
import { formalinConcentration } from './formalin-concentration.ts'
import { valueOf } from './fact.ts'

/** The target in the unit and on the basis of a dose line; null where nothing known joins the two. */
export function targetOnBasisOf(
  facts: CautionFacts,
  range: Pick<DefaultRange, 'unit' | 'basis'>,
): number | null {
  const target = valueOf(facts.order.target)
  if (!target) return null
  if (target.basis === range.basis) {
    const converted = convert(target.value, target.unit, range.unit)
    if (converted.ok) return converted.value
  }
  if (facts.agent === 'formalin' && range.basis === 'product') {
    const strength = formalinConcentration(facts)
    const inUl = strength && convert(strength.productUlPerL, 'uL/L', range.unit)
    if (inUl?.ok) return inUl.value
    const inMg = strength && convert(strength.productMgPerL, 'mg/L', range.unit)
    return inMg?.ok ? inMg.value : null
  }
  if (facts.agent === 'copper-sulfate') {
    const strength = copperConcentration(target)
    if (!strength) return null
    const mgPerL = range.basis === 'salt' ? strength.pentahydrateMgPerL : strength.copperMgPerL
    const converted = convert(mgPerL, 'mg/L', range.unit)
    return converted.ok ? converted.value : null
  }
  return null
}

/**
 * How many times a dose line's upper end the bare figure of a target is, whatever each is a concentration of; null where
 * even the units are of another kind. A dose for a weight is compared with such doses alone. A microlitre counts as a milligram: near enough to see a slip by powers of ten.
 */
export function bareShareOf(facts: CautionFacts, range: DefaultRange): number | null {
  const target = valueOf(facts.order.target)
  if (!target) return null
  const isByWeight = unitOf(target.unit).dimension === 'bodyDose'
  if (isByWeight !== (unitOf(range.unit).dimension === 'bodyDose')) return null
  const figure = bareFigure(target.value, target.unit)
  const high = bareFigure(range.high, range.unit)
  return figure === null || high === null || !(high > 0) ? null : figure / high
}

function bareFigure(value: number, unit: DoseUnit): number | null {
  const byWeight = convert(value, unit, 'mg/kg')
  if (byWeight.ok) return byWeight.value
  const byMass = convert(value, unit, 'mg/L')
  if (byMass.ok) return byMass.value
  const byVolume = convert(value, unit, 'uL/L')
  return byVolume.ok ? byVolume.value : null
}
