import type { AgentCode } from '../../formulary/agent.ts'
import { type CautionFinding, defineRule } from '../caution-rule.ts'
import { isBelow } from '../exceeds.ts'
import { valueOf } from '../fact.ts'
import { hoursApart } from '../hours-apart.ts'

const nsaids: readonly AgentCode[] = ['meloxicam', 'ketoprofen']
const steroids: readonly AgentCode[] = ['dexamethasone']

/** Two pain killers of this kind, or one and a corticosteroid; two corticosteroids are not this rule's matter. */
const areHard = (a: AgentCode, b: AgentCode): boolean =>
  (nsaids.includes(a) && (nsaids.includes(b) || steroids.includes(b))) ||
  (steroids.includes(a) && nsaids.includes(b))

/**
 * Two non-steroidal anti-inflammatories, or one with a corticosteroid, less than three days apart in one animal. Of a
 * route by which nothing was ever given to the animals themselves there is nothing to compare with.
 */
export const antiInflammatories = defineRule({
  id: 'R44',
  levels: ['warning'],
  when: 'design',
  overridable: true,
  routes: ['injection', 'by-mouth', 'in-feed', 'on-skin'],
  parameters: {
    apartHours: { default: 72, unit: 'h', source: 'treatment-practice', mark: 'M', tighter: 'higher' },
  },
  uses: ['history.animalUses', 'order.startsAt', 'order.endsAt'],
  findings: {
    'animal-uses-unknown': ['record-history'],
    'anti-inflammatories-together': ['wait-between-agents', 'choose-other-agent'],
  },
  sources: [{ source: 'treatment-practice', mark: 'M' }],
  concerns: ({ agent }) => nsaids.includes(agent) || steroids.includes(agent),
  judge(facts, { apartHours }, stage) {
    const { animalUses } = facts.history
    if (animalUses.state === 'unknown')
      return [
        {
          code: 'animal-uses-unknown',
          level: 'warning',
          params: {},
          resolvedBy: ['record-history'],
          unknown: ['history.animalUses'],
        },
      ]
    return (valueOf(animalUses) ?? []).flatMap((use): CautionFinding[] =>
      areHard(facts.agent, use.agent) && isBelow(hoursApart(use, facts, stage), apartHours)
        ? [
            {
              code: 'anti-inflammatories-together',
              level: 'warning',
              params: { orderNumber: use.orderNumber, agent: use.agent, limitHours: apartHours },
              resolvedBy: ['wait-between-agents', 'choose-other-agent'],
            },
          ]
        : [],
    )
  },
})
