import type { CautionFacts, DefaultRange } from '../caution-facts.ts'
import { doseOf } from '../caution-param.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds, isBelow } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { targetOnBasisOf } from '../target-on-basis.ts'

/**
 * A dose well outside the range of its own dose line is more often a slip of the decimal point than a decision. An order
 * that names no line is held against the highest of the drug, so that leaving the line out loosens nothing.
 */
export const defaultRange = defineRule({
  id: 'R26',
  levels: ['warning', 'stop'],
  when: 'design',
  overridable: true,
  parameters: {
    stopFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
    lowFactor: { default: 0.5, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: ['order.target', 'order.defaultRange', 'order.agentRanges', 'lot.densityGPerMl'],
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, { stopFactor, lowFactor }) {
    const target = valueOf(facts.order.target)
    // No figure yet, or one without a basis, is R27's matter.
    if (!target || target.basis === null) return []
    const named = valueOf(facts.order.defaultRange)
    const lines = (named ? [named] : (valueOf(facts.order.agentRanges) ?? [])).filter(({ high }) => high > 0)
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
    const nearest = nearestLine(facts, lines)
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

/** The line whose upper end the target is the smallest multiple of; null where no line can be compared with. */
function nearestLine(
  facts: CautionFacts,
  lines: readonly DefaultRange[],
): { value: number; range: DefaultRange } | null {
  const compared = lines.flatMap((range) => {
    const value = targetOnBasisOf(facts, range)
    return value === null ? [] : [{ value, range }]
  })
  return compared.sort((a, b) => a.value / a.range.high - b.value / b.range.high)[0] ?? null
}
