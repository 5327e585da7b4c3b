import { orderRoutes } from '../../orders/order-route.ts'
import { defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** A strength that does not say of what may be wrong by a factor of four. Nobody can sign it away. */
export const basis = defineRule({
  id: 'R27',
  levels: ['stop'],
  when: 'design',
  overridable: false,
  routes: orderRoutes,
  parameters: {},
  uses: ['order.target'],
  findings: {
    'basis-missing': ['state-basis'],
  },
  sources: [{ source: 'dose-arithmetic', mark: 'C' }],
  concerns: () => true,
  judge({ order }) {
    const target = valueOf(order.target)
    if (target && target.basis !== null) return []
    return [
      {
        code: 'basis-missing',
        level: 'stop',
        params: {},
        resolvedBy: ['state-basis'],
        unknown: ['order.target'],
      },
    ]
  },
})
