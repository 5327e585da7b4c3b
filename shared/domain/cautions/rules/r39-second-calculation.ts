import { hazardAgents } from '../../formulary/agent.ts'
import type { SecondCalculationCause } from '../caution-code.ts'
import type { CautionFacts } from '../caution-facts.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'

interface Limits {
  volumeLitres: number
  amountGrams: number
  amountMillilitres: number
  amountShare: number
}

/**
 * A blind second calculation by another person, for hazards, large waters and large amounts: at the first dose, after
 * any change of volume, lot or order version, and when the amount is more than a quarter above the plan. Not for
 * top-ups inside signed limits.
 */
export const secondCalculation = defineRule({
  id: 'R39',
  levels: ['note'],
  when: 'start',
  overridable: true,
  routes: orderRoutes,
  parameters: {
    volumeLitres: { default: 10_000, unit: 'L', source: 'project-default', mark: 'P', tighter: 'lower' },
    amountGrams: { default: 1000, unit: 'g', source: 'project-default', mark: 'P', tighter: 'lower' },
    amountMillilitres: { default: 1000, unit: 'mL', source: 'project-default', mark: 'P', tighter: 'lower' },
    amountShare: { default: 1.25, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: [
    'volume.determination',
    'order.amountGrams',
    'order.amountMillilitres',
    'order.amountShareOfPlan',
    'order.isTopUpInsideLimits',
    'order.dosesGiven',
    'order.changedSinceLastCalculation',
  ],
  findings: {
    'second-calculation': ['calculate-again-by-another'],
  },
  effects: ['secondCalculation'],
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: (facts) => valueOf(facts.order.isTopUpInsideLimits) !== true,
  judge(facts, limits) {
    if (valueOf(facts.order.isTopUpInsideLimits) === true || !isDue(facts, limits)) return []
    const because = findCause(facts, limits)
    if (because === null) return []
    return [
      {
        code: 'second-calculation',
        level: 'note',
        params: { because },
        resolvedBy: ['calculate-again-by-another'],
        effects: [{ kind: 'secondCalculation' }],
      },
    ]
  },
  condition: () => ({}),
})

function findCause(facts: CautionFacts, limits: Limits): SecondCalculationCause | null {
  if (hazardAgents.includes(facts.agent)) return 'hazard'
  const litres = valueOf(facts.volume.determination)?.netVolumeLitres ?? null
  if (litres !== null && exceeds(litres, limits.volumeLitres)) return 'volume'
  const grams = valueOf(facts.order.amountGrams)
  const millilitres = valueOf(facts.order.amountMillilitres)
  if (grams !== null && exceeds(grams, limits.amountGrams)) return 'amount'
  if (millilitres !== null && exceeds(millilitres, limits.amountMillilitres)) return 'amount'
  const { state } = facts.volume.determination
  const isVolumeMissing = litres === null && (facts.route === 'immersion' || state === 'unknown')
  return isVolumeMissing || (grams === null && millilitres === null) ? 'not-known' : null
}

/** What is not known counts as a reason to calculate again. */
function isDue({ order }: CautionFacts, { amountShare }: Limits): boolean {
  const given = valueOf(order.dosesGiven)
  const changed = valueOf(order.changedSinceLastCalculation)
  const share = valueOf(order.amountShareOfPlan)
  return given === null || given === 0 || changed !== false || share === null || exceeds(share, amountShare)
}
