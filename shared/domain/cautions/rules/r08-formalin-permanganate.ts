import { hoursApart } from '../hours-apart.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { valueOf } from '../fact.ts'

/** Formalin and permanganate are never mixed, nor used in one water within hours of each other: it can explode. */
export const formalinPermanganate = defineRule({
  id: 'R08',
  levels: ['stop'],
  when: 'both',
  overridable: false,
  parameters: {
    apartHours: { default: 72, unit: 'h', source: 'project-default', mark: 'P', tighter: 'higher' },
  },
  uses: ['history.agentUses', 'order.startsAt', 'order.endsAt'],
  findings: {
    'formalin-and-permanganate': ['wait-between-agents', 'choose-other-agent'],
    'formalin-and-permanganate-together': ['wait-between-agents', 'choose-other-agent'],
    'agent-history-unknown': ['record-history'],
  },
  sources: [
    { source: 'ufifas-fa37', mark: 'V2' },
    { source: 'project-default', mark: 'P' },
  ],
  concerns: ({ agent }) => agent === 'formalin' || agent === 'potassium-permanganate',
  judge(facts, { apartHours }, stage) {
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
    const other = facts.agent === 'formalin' ? 'potassium-permanganate' : 'formalin'
    return uses
      .filter(({ agent }) => agent === other)
      .flatMap((use): CautionFinding[] => {
        const hours = hoursApart(use, facts, stage)
        if (hours >= apartHours) return []
        const base = { level: 'stop', resolvedBy: ['wait-between-agents', 'choose-other-agent'] } as const
        const { orderNumber } = use
        return hours <= 0
          ? [
              {
                ...base,
                code: 'formalin-and-permanganate-together',
                params: { orderNumber, limitHours: apartHours },
              },
            ]
          : [
              {
                ...base,
                code: 'formalin-and-permanganate',
                params: { orderNumber, hours: Math.floor(hours), limitHours: apartHours },
              },
            ]
      })
  },
})
