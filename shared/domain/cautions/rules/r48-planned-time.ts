import { addHours, compareInstants, hoursBetween } from '../../time/instant-arithmetic.ts'
import { doseWindow } from '../../schedule/dose-window.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'

const hoursPerDay = 24

/**
 * Whether the plan of an order is one for the days to come and of a length that one looks ahead, and counts what an
 * earlier version of it already gave.
 */
export const plannedTime = defineRule({
  id: 'R48',
  levels: ['note', 'warning'],
  when: 'design',
  overridable: true,
  routes: orderRoutes,
  parameters: {
    aheadDays: { default: 90, unit: 'd', source: 'project-default', mark: 'P', tighter: 'lower' },
    planDays: { default: 90, unit: 'd', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['order.startsAt', 'order.spacing'],
  findings: {
    'start-past': ['check-start'],
    'start-far': ['check-start'],
    'plan-long': ['check-plan'],
    'doses-carried': ['check-start'],
    'plan-counts-given': ['check-start'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, { aheadDays, planDays }) {
    const startsAt = valueOf(facts.order.startsAt)
    const spacing = valueOf(facts.order.spacing)
    if (startsAt === null) return []
    const found: CautionFinding[] = []
    const resolvedBy = ['check-start'] as const
    const { earlyHours, lateHours } = doseWindow(spacing?.intervalHours || hoursPerDay)
    const given = spacing?.givenDoses ?? 0
    if (given === 0 && compareInstants(addHours(startsAt, lateHours), facts.at) < 0)
      found.push({ code: 'start-past', level: 'warning', params: { startsAt }, resolvedBy })
    if (hoursBetween(facts.at, startsAt) > aheadDays * hoursPerDay)
      found.push({
        code: 'start-far',
        level: 'warning',
        params: { startsAt, limitDays: aheadDays },
        resolvedBy,
      })
    const days = spacing ? (spacing.intervalHours * (spacing.plannedDoses - 1)) / hoursPerDay : 0
    if (exceeds(days, planDays))
      found.push({
        code: 'plan-long',
        level: 'warning',
        params: { days: Math.ceil(days), limitDays: planDays },
        resolvedBy: ['check-plan'],
      })
    const lastAt = spacing?.lastGivenAt ?? null
    if (given > 0 && spacing && lastAt !== null) {
      const params = { given, planned: spacing.plannedDoses, lastAt, startsAt }
      // a plan that begins after what was given looks like one of new doses, and is not; its own first may be early
      if (compareInstants(addHours(startsAt, -earlyHours), lastAt) > 0)
        found.push({ code: 'plan-counts-given', level: 'warning', params, resolvedBy })
      else found.push({ code: 'doses-carried', level: 'note', params, resolvedBy })
    }
    return found
  },
})
