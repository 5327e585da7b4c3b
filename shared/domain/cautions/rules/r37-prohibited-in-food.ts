import type { AgentCode } from '../../formulary/agent.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { foodNotKnown } from '../food-not-known.ts'
import { valueOf } from '../fact.ts'

/**
 * Agents whose extralabel use in food animals is forbidden: nitroimidazoles and fluoroquinolones, of those that are
 * ordered here.
 *
 * @source cfr-530-41
 */
export const prohibitedInFood: readonly AgentCode[] = ['enrofloxacin', 'metronidazole']

/** What is forbidden in animals that may be eaten or set free is signed by nobody, and silence is no answer. */
export const prohibitedFood = defineRule({
  id: 'R37',
  levels: ['stop'],
  when: 'design',
  overridable: false,
  routes: orderRoutes,
  parameters: {},
  uses: ['animals.foodOrRelease'],
  findings: {
    'food-or-release-unknown': ['say-food-or-release'],
    'food-or-release-not-said': ['say-food-or-release'],
    'prohibited-in-food': ['choose-other-agent'],
  },
  sources: [{ source: 'cfr-530-41', mark: 'V' }],
  concerns: ({ agent }) => prohibitedInFood.includes(agent),
  judge({ animals: { foodOrRelease } }) {
    const found: CautionFinding[] = foodNotKnown(foodOrRelease)
    const animals = valueOf(foodOrRelease)?.yes ?? []
    if (animals.length > 0)
      found.push({
        code: 'prohibited-in-food',
        level: 'stop',
        params: { animals },
        resolvedBy: ['choose-other-agent'],
      })
    return found
  },
})
