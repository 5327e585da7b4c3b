import type { CautionFacts } from '../caution-facts.ts'
import { doseOf } from '../caution-param.ts'
import { defineRule } from '../caution-rule.ts'
import { nearestLine } from '../dose-lines.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'

/** What stays in the water is held against no line for a bath, however short. */
const noBath = { untimedBathMinutes: 0, contactStopFactor: 1 }

/**
 * Doses that stay in the water add up unless it is changed between them. An order is told what its last dose makes; a
 * dose is held while what went in before it was not recorded as out and the two would be far too strong.
 */
export const dosesAddUp = defineRule({
  id: 'R50',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  parameters: {
    stopFactor: { default: 2, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: [
    'order.timing',
    'order.contactMinutes',
    'order.spacing',
    'order.dosesStillIn',
    'order.target',
    'order.defaultRange',
    'order.agentRanges',
    'water.kind',
    'lot.densityGPerMl',
  ],
  findings: {
    'doses-add-up': ['take-agent-out', 'lower-target', 'amend-order'],
    'dose-on-dose': ['take-agent-out', 'amend-order'],
  },
  sources: [
    { source: 'treatment-practice', mark: 'M' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ order }) => valueOf(order.timing) === 'indefinite',
  judge(facts, { stopFactor }, stage) {
    const spacing = valueOf(facts.order.spacing)
    const nearest = nearestLine(facts, noBath)
    if (spacing?.readingDriven || !nearest) return []
    const stillIn = stillInOf(facts)
    const toCome =
      stage === 'start' ? 1 : Math.max(0, (spacing?.plannedDoses ?? 1) - (spacing?.givenDoses ?? 0))
    const doses = stillIn + toCome
    const { value, range } = nearest
    const total = value * doses
    if (doses < 2 || !exceeds(total, range.high)) return []
    const params = {
      doses,
      target: doseOf(value, range.unit),
      total: doseOf(total, range.unit),
      high: doseOf(range.high, range.unit),
      factor: total / range.high,
    }
    if (stage === 'design')
      return [
        {
          code: 'doses-add-up',
          level: 'warning',
          params,
          resolvedBy: ['take-agent-out', 'lower-target', 'amend-order'],
        },
      ]
    return stillIn < 1
      ? []
      : [
          {
            code: 'dose-on-dose',
            level: exceeds(total, range.high * stopFactor) ? 'stop' : 'warning',
            params: { ...params, stillIn },
            resolvedBy: ['take-agent-out', 'amend-order'],
          },
        ]
  },
})

/** Doses that may be in the water still; where nobody can tell, all that were given. */
function stillInOf({ order }: CautionFacts): number {
  return valueOf(order.dosesStillIn) ?? valueOf(order.spacing)?.givenDoses ?? 0
}
