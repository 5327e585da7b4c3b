import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import type { CautionStage } from '../../../shared/domain/cautions/caution-rule.ts'
import { cautionLevels } from '../../../shared/domain/cautions/caution-rule.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { unknown } from '../../../shared/domain/cautions/fact.ts'
import { causeOf, groupSaid } from '../../../shared/domain/cautions/group-said.ts'
import type { SaidWithCause } from '../../../shared/domain/cautions/group-said.ts'
import { anyFacts } from './any-facts.ts'
import { formalin, someFacts } from './some-facts.ts'

const said = (given: Partial<SaidWithCause> & { ruleId: string }) => ({
  level: 'warning' as const,
  ...given,
})
const cause = (given: object) => ({ resolvedBy: [], unknownFacts: [], subject: null, ...given })

describe('cautions in words, of one cause', () => {
  it('one unknown reading is one line of every rule that asks for it', () => {
    const facts = someFacts('formalin', formalin(150), { water: { oxygenMgPerL: unknown() } })
    const cautions = evaluateCautions({ facts, stage: 'start' }).cautions.map((one) => ({
      ruleId: one.ruleId,
      level: one.level,
      cause: causeOf(one),
    }))
    const group = groupSaid(cautions).find(({ members }) => members.some(({ ruleId }) => ruleId === 'R01'))
    expect(group?.members.map(({ ruleId }) => ruleId)).toEqual(expect.arrayContaining(['R01', 'R31']))
  })

  it('a stop leads, whatever came first, and takes a reason of its own', () => {
    const unknownPh = cause({ unknownFacts: ['water.pH'] })
    const [group] = groupSaid([
      said({ ruleId: 'R23', cause: unknownPh }),
      said({ ruleId: 'R31', level: 'stop', cause: unknownPh }),
    ])
    expect(group?.lead.ruleId).toBe('R31')
    expect(group?.stops.map(({ ruleId }) => ruleId)).toEqual(['R31'])
    expect(group?.acknowledged.map(({ ruleId }) => ruleId)).toEqual(['R23'])
  })

  it('two orders are two causes; what was signed before causes were told stands alone', () => {
    const of = (subject: string) => cause({ resolvedBy: ['wait-between-agents'], subject })
    expect(
      groupSaid([said({ ruleId: 'R29', cause: of('TO-1') }), said({ ruleId: 'R29', cause: of('TO-2') })]),
    ).toHaveLength(2)
    expect(
      groupSaid([said({ ruleId: 'R29', cause: of('TO-1') }), said({ ruleId: 'R28', cause: of('TO-1') })]),
    ).toHaveLength(1)
    expect(groupSaid([said({ ruleId: 'R05' }), said({ ruleId: 'R05' })])).toHaveLength(2)
  })

  it('loses none and puts none under a lesser one, whatever fired', () => {
    fc.assert(
      fc.property(anyFacts, fc.constantFrom<CautionStage>('design', 'start'), (facts, stage) => {
        const cautions = evaluateCautions({ facts, stage }).cautions.map((one) => ({
          ...one,
          cause: causeOf(one),
        }))
        const groups = groupSaid(cautions)
        expect(new Set(groups.flatMap(({ members }) => members))).toEqual(new Set(cautions))
        for (const { lead, members } of groups)
          for (const { level } of members)
            expect(cautionLevels.indexOf(lead.level)).toBeLessThanOrEqual(cautionLevels.indexOf(level))
      }),
      { numRuns: 200 },
    )
  })
})
