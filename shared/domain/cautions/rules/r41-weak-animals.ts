import { orderRoutes } from '../../orders/order-route.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { exceeds } from '../exceeds.ts'

/** Moribund or starving animals, and animals handled within a day, bear a treatment badly. */
export const weakAnimals = defineRule({
  id: 'R41',
  levels: ['warning'],
  when: 'start',
  overridable: true,
  routes: orderRoutes,
  parameters: {
    unwellPercent: { default: 5, unit: 'percent', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['animals.unwellPercent', 'animals.handledInLast24h'],
  findings: {
    'animals-unwell': ['let-animals-rest'],
    'animals-unwell-unknown': ['look-at-animals'],
    'animals-handled': ['let-animals-rest'],
    'animals-handled-unknown': ['look-at-animals'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge({ animals }, { unwellPercent }) {
    const found: CautionFinding[] = []
    const unwell = animals.unwellPercent
    const handled = animals.handledInLast24h
    if (unwell.state === 'known' && exceeds(unwell.value, unwellPercent))
      found.push({
        code: 'animals-unwell',
        level: 'warning',
        params: { percent: unwell.value, limitPercent: unwellPercent },
        resolvedBy: ['let-animals-rest'],
      })
    if (unwell.state === 'unknown')
      found.push({
        code: 'animals-unwell-unknown',
        level: 'warning',
        params: { limitPercent: unwellPercent },
        resolvedBy: ['look-at-animals'],
        unknown: ['animals.unwellPercent'],
      })
    if (handled.state === 'known' && handled.value)
      found.push({ code: 'animals-handled', level: 'warning', params: {}, resolvedBy: ['let-animals-rest'] })
    if (handled.state === 'unknown')
      found.push({
        code: 'animals-handled-unknown',
        level: 'warning',
        params: {},
        resolvedBy: ['look-at-animals'],
        unknown: ['animals.handledInLast24h'],
      })
    return found
  },
  condition: (_, { unwellPercent }) => ({ limitPercent: unwellPercent }),
})
