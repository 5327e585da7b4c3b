import { convert } from '../../units/convert.ts'
import type { CautionFacts } from '../caution-facts.ts'
import { doseOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { exceeds, isBelow } from '../exceeds.ts'
import { copperConcentration } from '../copper-concentration.ts'
import { formalinConcentration } from '../formalin-concentration.ts'
import { valueOf } from '../fact.ts'

/** A dose well outside the range of its own dose line is more often a slip of the decimal point than a decision. */
export const defaultRange = defineRule({
  id: 'R26',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  parameters: {
    stopFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
    lowFactor: { default: 0.5, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: ['order.target', 'order.defaultRange', 'lot.densityGPerMl'],
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, { stopFactor, lowFactor }) {
    const target = valueOf(facts.order.target)
    // No figure yet, or one without a basis, is R27's matter.
    if (!target || target.basis === null) return []
    const range = valueOf(facts.order.defaultRange)
    if (!range || !(range.high > 0))
      return [
        {
          code: 'no-default-range',
          level: 'warning',
          params: {},
          resolvedBy: ['choose-dose-line', 'check-figure'],
          unknown: ['order.defaultRange'],
        },
      ]
    const value = targetOnBasisOf(facts)
    if (value === null)
      return [
        {
          code: 'default-not-comparable',
          level: 'warning',
          params: {},
          resolvedBy: ['state-basis', 'check-figure'],
        },
      ]
    const shown = doseOf(value, range.unit)
    const high = doseOf(range.high, range.unit)
    const factor = value / range.high
    if (exceeds(value, range.high * stopFactor))
      return [
        {
          code: 'far-over-default',
          level: 'stop',
          params: { target: shown, high, factor },
          resolvedBy: ['check-figure', 'lower-target'],
        },
      ]
    if (exceeds(value, range.high))
      return [
        {
          code: 'over-default',
          level: 'warning',
          params: { target: shown, high, factor },
          resolvedBy: ['check-figure', 'lower-target'],
        },
      ]
    if (range.low === null || !(range.low > 0) || !isBelow(value, range.low * lowFactor)) return []
    return [
      {
        code: 'under-default',
        level: 'warning',
        params: { target: shown, low: doseOf(range.low, range.unit) },
        resolvedBy: ['check-figure', 'raise-target'],
      },
    ]
  },
})

/** The target in the unit and on the basis of the dose line; null where nothing known joins the two. */
function targetOnBasisOf(facts: CautionFacts): number | null {
  const target = valueOf(facts.order.target)
  const range = valueOf(facts.order.defaultRange)
  if (!target || !range) return null
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
