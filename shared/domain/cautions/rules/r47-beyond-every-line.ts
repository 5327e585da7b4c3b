import { doseOf } from '../caution-param.ts'
import { orderRoutes } from '../../orders/order-route.ts'
import { defineRule } from '../caution-rule.ts'
import { isForWater, linesOfAgent } from '../dose-lines.ts'
import { exceeds } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { bareShareOf, targetOnBasisOf } from '../target-on-basis.ts'

/** Product for active part, salt for base: the widest apart that two bases of one drug are, formalin and copper among them. */
const widestBasisFactor = 4

/**
 * A figure beyond every line of the drug, whichever line the order names or none, is a slip and no decision: nobody signs
 * it away. A facility that does use such a dose confirms a line for it first.
 */
export const beyondEveryLine = defineRule({
  id: 'R47',
  levels: ['stop'],
  when: 'both',
  overridable: false,
  routes: orderRoutes,
  parameters: {
    beyondFactor: { default: 10, unit: 'factor', source: 'project-default', mark: 'P', tighter: 'lower' },
  },
  uses: ['order.target', 'order.agentRanges', 'water.kind', 'lot.densityGPerMl'],
  findings: {
    'beyond-every-line': ['check-figure', 'lower-target', 'confirm-dose-line'],
  },
  sources: [{ source: 'project-default', mark: 'P' }],
  concerns: () => true,
  judge(facts, { beyondFactor }) {
    const target = valueOf(facts.order.target)
    if (!target) return []
    const all = linesOfAgent(facts)
    const own = all.filter((line) => isForWater(line, facts))
    const lines = own.length > 0 ? own : all
    const compared = lines.flatMap((range) => {
      const value = targetOnBasisOf(facts, range)
      return value === null ? [] : [{ share: value / range.high, range }]
    })
    // where nothing joins the bases, the bare figures still show what no basis explains
    const bare = lines.flatMap((range) => {
      const share = bareShareOf(facts, range)
      return share === null ? [] : [{ share: share / widestBasisFactor, range }]
    })
    const nearest = (compared.length > 0 ? compared : bare).sort((a, b) => a.share - b.share)[0]
    if (!nearest || !exceeds(nearest.share, beyondFactor)) return []
    return [
      {
        code: 'beyond-every-line',
        level: 'stop',
        params: {
          target: doseOf(target.value, target.unit),
          high: doseOf(nearest.range.high, nearest.range.unit),
          limitFactor: beyondFactor,
        },
        resolvedBy: ['check-figure', 'lower-target', 'confirm-dose-line'],
      },
    ]
  },
})
