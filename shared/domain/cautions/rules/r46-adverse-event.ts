import { orderRoutes } from '../../orders/order-route.ts'
import { defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** After an adverse event no further dose of its order is given until a veterinarian has reviewed it; no reason overrides that. */
export const adverseEvent = defineRule({
  id: 'R46',
  levels: ['stop'],
  when: 'start',
  overridable: false,
  routes: orderRoutes,
  parameters: {},
  uses: ['order.openAdverseEvents'],
  findings: {
    'adverse-event-open': ['review-adverse-event'],
    'adverse-events-unknown': ['review-adverse-event'],
  },
  sources: [{ source: 'cfr-530-3', mark: 'V' }],
  // an order under which nothing went wrong has no such condition
  concerns: ({ order: { openAdverseEvents } }) => valueOf(openAdverseEvents)?.length !== 0,
  judge({ order: { openAdverseEvents } }) {
    const events = valueOf(openAdverseEvents)
    if (events === null)
      return [
        {
          code: 'adverse-events-unknown',
          level: 'stop',
          params: {},
          resolvedBy: ['review-adverse-event'],
          unknown: ['order.openAdverseEvents'],
        },
      ]
    const [first] = events
    return first
      ? [
          {
            code: 'adverse-event-open',
            level: 'stop',
            params: { seenAt: first.at, seen: events.map(({ seen }) => seen) },
            resolvedBy: ['review-adverse-event'],
          },
        ]
      : []
  },
  condition: () => ({}),
})
