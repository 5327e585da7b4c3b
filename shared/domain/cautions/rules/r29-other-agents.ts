import type { AgentCode } from '../../formulary/agent.ts'
import { hoursApart } from '../hours-apart.ts'
import { type CautionFinding, type CautionLevel, defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** Oxidants, and formalin with the one that it is not combined with; formalin and permanganate are R08's matter. */
const oxidants: readonly AgentCode[] = ['hydrogen-peroxide', 'potassium-permanganate', 'chloramine-t']
const notTogether = (a: AgentCode, b: AgentCode): boolean =>
  (oxidants.includes(a) && oxidants.includes(b)) ||
  (a === 'formalin' && b === 'chloramine-t') ||
  (a === 'chloramine-t' && b === 'formalin')

/**
 * What is in the water already, or is ordered for the same time. The same drug from two orders is twice the dose; some
 * drugs do not go together; any other is said, since it has not been taken out of the water.
 */
export const otherAgents = defineRule({
  id: 'R29',
  levels: ['note', 'warning', 'stop'],
  when: 'both',
  overridable: true,
  parameters: {
    sameDayHours: { default: 24, unit: 'h', source: 'treatment-practice', mark: 'M', tighter: 'higher' },
  },
  uses: ['history.agentUses', 'order.startsAt', 'order.endsAt'],
  findings: {
    'agent-history-unknown': ['record-history'],
    'same-agent-together': ['amend-order', 'wait-between-agents'],
    'same-agent-same-day': ['amend-order', 'wait-between-agents'],
    'agents-not-together': ['wait-between-agents', 'choose-other-agent'],
    'agent-in-water': ['wait-between-agents', 'choose-other-agent'],
    'agent-same-day': ['wait-between-agents', 'choose-other-agent'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: () => true,
  judge(facts, { sameDayHours }, stage) {
    const uses = valueOf(facts.history.agentUses)
    if (uses === null)
      return [
        {
          code: 'agent-history-unknown',
          level: 'stop',
          params: {},
          resolvedBy: ['record-history'],
          unknown: ['history.agentUses'],
        },
      ]
    return uses.flatMap((use): CautionFinding[] => {
      const { agent, orderNumber } = use
      const pair = [facts.agent, agent]
      // never mixed, and judged by a rule that nobody overrides
      if (pair.includes('formalin') && pair.includes('potassium-permanganate')) return []
      const hours = hoursApart(use, facts, stage)
      const together = hours <= 0
      if (agent === facts.agent && together)
        return [
          {
            code: 'same-agent-together',
            level: 'stop',
            params: { orderNumber },
            resolvedBy: ['amend-order', 'wait-between-agents'],
          },
        ]
      if (!(hours < sameDayHours)) return []
      // each order is within what its line allows a day; the two of them together are counted by nobody
      if (agent === facts.agent)
        return [
          {
            code: 'same-agent-same-day',
            level: 'warning',
            params: { orderNumber },
            resolvedBy: ['amend-order', 'wait-between-agents'],
          },
        ]
      const apart = notTogether(facts.agent, agent)
      const level: CautionLevel = apart ? 'stop' : together ? 'warning' : 'note'
      return [
        {
          code: apart ? 'agents-not-together' : together ? 'agent-in-water' : 'agent-same-day',
          level,
          params: { orderNumber, agent },
          resolvedBy: ['wait-between-agents', 'choose-other-agent'],
        },
      ]
    })
  },
})
