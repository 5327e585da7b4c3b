import { orderRoutes } from '../../orders/order-route.ts'
import { defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** The first use of an agent in a taxon here begins with a few animals, unless a vet has declared experience with it. */
export const firstUse = defineRule({
  id: 'R42',
  levels: ['warning'],
  when: 'design',
  overridable: true,
  routes: orderRoutes,
  parameters: {},
  uses: ['animals.withoutExperience'],
  findings: {
    'first-use': ['test-some-first', 'declare-experience'],
    'first-use-unknown': ['test-some-first', 'declare-experience'],
  },
  sources: [
    { source: 'cfr-529-1030', mark: 'V' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: () => true,
  judge({ animals }) {
    const taxa = valueOf(animals.withoutExperience)
    const base = { level: 'warning', resolvedBy: ['test-some-first', 'declare-experience'] } as const
    if (taxa === null && animals.withoutExperience.state === 'unknown')
      return [{ ...base, code: 'first-use-unknown', params: {}, unknown: ['animals.withoutExperience'] }]
    return taxa && taxa.length > 0 ? [{ ...base, code: 'first-use', params: { taxa } }] : []
  },
})
