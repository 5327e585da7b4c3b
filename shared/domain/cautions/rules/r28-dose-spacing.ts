import { addHours, hoursBetween } from '../../time/instant-arithmetic.ts'
import { doseWindow } from '../../schedule/dose-window.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

const minutesPerHour = 60

/**
 * A dose outside its window, past the planned number, or before the bath of the last one is over, counted in true hours
 * since the last one given.
 * Reading-driven additions are spaced by their own signed limits.
 */
export const doseSpacing = defineRule({
  id: 'R28',
  levels: ['warning', 'stop'],
  when: 'both',
  overridable: true,
  routes: orderRoutes,
  parameters: {
    veryEarlyFactor: {
      default: 0.5,
      unit: 'factor',
      source: 'project-default',
      mark: 'P',
      tighter: 'higher',
    },
  },
  uses: ['order.spacing', 'order.startsAt', 'order.contactMinutes'],
  findings: {
    'dose-early': ['wait-for-window'],
    'dose-very-early': ['wait-for-window', 'amend-order'],
    'interval-within-contact': ['amend-order', 'check-figure'],
    'dose-late': ['amend-order'],
    'doses-past-plan': ['amend-order'],
  },
  sources: [
    { source: 'hyatt-2017', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ order }) => valueOf(order.spacing)?.readingDriven !== true,
  judge(facts, { veryEarlyFactor }, stage) {
    const spacing = valueOf(facts.order.spacing)
    if (!spacing || spacing.readingDriven) return []
    const found: CautionFinding[] = []
    const { givenDoses, plannedDoses, intervalHours, lastGivenAt } = spacing
    if (stage === 'start' && givenDoses >= plannedDoses)
      found.push({
        code: 'doses-past-plan',
        level: 'stop',
        params: { given: givenDoses, planned: plannedDoses },
        resolvedBy: ['amend-order'],
      })
    const contactMinutes = valueOf(facts.order.contactMinutes)
    if (plannedDoses > 1 && contactMinutes !== null && intervalHours * minutesPerHour <= contactMinutes)
      found.push({
        code: 'interval-within-contact',
        level: 'stop',
        params: { intervalHours, contactMinutes },
        resolvedBy: ['amend-order', 'check-figure'],
      })
    const startsAt = valueOf(facts.order.startsAt)
    // of an amended order the doses given before count: the next is the one after them
    const planned = startsAt && addHours(startsAt, intervalHours * givenDoses)
    const doseAt = stage === 'start' ? facts.at : planned
    if (lastGivenAt === null || doseAt === null || !(intervalHours > 0)) return found
    const { earlyHours, lateHours } = doseWindow(intervalHours)
    const hours = Math.max(0, hoursBetween(lastGivenAt, doseAt))
    const earliestHours = intervalHours - earlyHours
    const latestHours = intervalHours + lateHours
    if (hours < intervalHours * veryEarlyFactor)
      found.push({
        code: 'dose-very-early',
        level: 'stop',
        params: { hours, intervalHours },
        resolvedBy: ['wait-for-window', 'amend-order'],
      })
    else if (hours < earliestHours)
      found.push({
        code: 'dose-early',
        level: 'warning',
        params: { hours, earliestHours },
        resolvedBy: ['wait-for-window'],
      })
    else if (hours > latestHours)
      found.push({
        code: 'dose-late',
        level: 'warning',
        params: { hours, latestHours },
        resolvedBy: ['amend-order'],
      })
    return found
  },
})
