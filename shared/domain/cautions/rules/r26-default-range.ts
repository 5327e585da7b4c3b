import { doseOf } from '../caution-param.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds, isBelow } from '../exceeds.ts'
import { contactParameters, linesOfAgent, linesToCompare, nearestLine } from '../dose-lines.ts'
import { valueOf } from '../fact.ts'

/**
 * A dose well outside the range of its own dose line is more often a slip of the decimal point than a decision. An order
 * that names no line is held against the highest of the drug for such water and such a contact, so that leaving the line
 * out loosens nothing.
 */
export const defaultRange = defineRule({
  id: 'R26',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  routes: orderRoutes,
  parameters: {
    stopFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
    lowFactor: { default: 0.5, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'higher' },
    ...contactParameters,
  },
  uses: [
    'order.target',
    'order.defaultRange',
    'order.agentRanges',
    'order.timing',
    'order.contactMinutes',
    'order.contactMinutesPerDay',
    'water.kind',
    'lot.densityGPerMl',
  ],
  findings: {
    'over-default': ['check-figure', 'lower-target'],
    'far-over-default': ['check-figure', 'lower-target'],
    'under-default': ['check-figure', 'raise-target'],
    'no-default-range': ['choose-dose-line', 'check-figure'],
    'default-not-comparable': ['state-basis', 'check-figure'],
    'no-line-fits': ['choose-dose-line', 'check-figure', 'confirm-dose-line'],
    'line-not-named': ['choose-dose-line'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, { stopFactor, lowFactor, ...contactLimits }) {
    const target = valueOf(facts.order.target)
    // No figure yet, or one without a basis, is R27's matter.
    if (!target || target.basis === null) return []
    const named = valueOf(facts.order.defaultRange)
    const lines = linesToCompare(facts, contactLimits)
    if (lines.length === 0 && !named && linesOfAgent(facts).length > 0)
      return [
        {
          code: 'no-line-fits',
          level: 'stop',
          params: {},
          resolvedBy: ['choose-dose-line', 'check-figure', 'confirm-dose-line'],
        },
      ]
    if (lines.length === 0)
      return [
        {
          code: 'no-default-range',
          level: 'stop',
          params: {},
          resolvedBy: ['choose-dose-line', 'check-figure'],
          unknown: ['order.agentRanges'],
        },
      ]
    const nearest = nearestLine(facts, contactLimits)
    if (!nearest)
      return [
        {
          code: 'default-not-comparable',
          level: 'stop',
          params: {},
          resolvedBy: ['state-basis', 'check-figure'],
        },
      ]
    const { value, range } = nearest
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
    const found: CautionFinding[] = []
    if (!named)
      found.push({
        code: 'line-not-named',
        level: 'warning',
        params: { target: shown, high },
        resolvedBy: ['choose-dose-line'],
      })
    if (named && range.low !== null && range.low > 0 && isBelow(value, range.low * lowFactor))
      found.push({
        code: 'under-default',
        level: 'warning',
        params: { target: shown, low: doseOf(range.low, range.unit) },
        resolvedBy: ['check-figure', 'raise-target'],
      })
    return found
  },
})
