import type { CautionFacts } from '../caution-facts.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** Ionic and chelated copper are never in one course, and nothing that reduces or binds goes with chelated copper. */
export const copperForms = defineRule({
  id: 'R13',
  levels: ['stop'],
  when: 'design',
  overridable: true,
  parameters: {},
  uses: ['history.agentUses', 'history.reducerInUse', 'order.target', 'water.kind'],
  findings: {
    'agent-history-unknown': ['record-history'],
    'copper-forms-mixed': ['choose-one-copper'],
    'copper-reducer': ['take-reducer-out'],
    'copper-reducer-unknown': ['record-history'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ agent }) => agent === 'copper-sulfate' || agent === 'chelated-copper',
  judge(facts) {
    const found: CautionFinding[] = []
    const other = facts.agent === 'copper-sulfate' ? 'chelated-copper' : 'copper-sulfate'
    const uses = valueOf(facts.history.agentUses)
    if (uses === null)
      found.push({
        code: 'agent-history-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['record-history'],
        unknown: ['history.agentUses'],
      })
    for (const { agent, state, orderNumber } of uses ?? [])
      if (agent === other && state !== 'ended')
        found.push({
          code: 'copper-forms-mixed',
          level: 'stop',
          params: { orderNumber },
          resolvedBy: ['choose-one-copper'],
        })
    if (hasChelatedTarget(facts))
      found.push({
        code: 'copper-forms-mixed',
        level: 'stop',
        params: { orderNumber: '' },
        resolvedBy: ['choose-one-copper'],
      })
    if (facts.agent !== 'chelated-copper') return found
    const reducer = valueOf(facts.history.reducerInUse)
    if (reducer === true)
      found.push({ code: 'copper-reducer', level: 'stop', params: {}, resolvedBy: ['take-reducer-out'] })
    if (reducer === null && facts.history.reducerInUse.state === 'unknown')
      found.push({
        code: 'copper-reducer-unknown',
        level: 'stop',
        params: {},
        resolvedBy: ['record-history'],
        unknown: ['history.reducerInUse'],
      })
    return found
  },
})

/** A figure of total copper belongs to chelated products; ionic copper is dosed by free copper. */
function hasChelatedTarget({ agent, order, water }: CautionFacts): boolean {
  return (
    agent === 'copper-sulfate' && valueOf(water.kind) === 'marine' && valueOf(order.target)?.basis === 'total'
  )
}
