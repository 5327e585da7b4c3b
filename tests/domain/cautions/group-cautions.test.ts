import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import type { CautionStage } from '../../../shared/domain/cautions/caution-rule.ts'
import { cautionLevels } from '../../../shared/domain/cautions/caution-rule.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { unknown } from '../../../shared/domain/cautions/fact.ts'
import { groupCautions } from '../../../shared/domain/cautions/group-cautions.ts'
import type { WithCause } from '../../../shared/domain/cautions/group-cautions.ts'
import { anyFacts } from './any-facts.ts'
import { formalin, someFacts } from './some-facts.ts'

const caution = (given: Partial<WithCause>): WithCause => ({
  level: 'warning',
  overridable: true,
  resolvedBy: ['look'],
  unknownFacts: [],
  ...given,
})

describe('cautions of one cause', () => {
  it('oxygen that is not known fires more than one rule, and is one line', () => {
    const facts = someFacts('formalin', formalin(150), { water: { oxygenMgPerL: unknown() } })
    const { cautions } = evaluateCautions({ facts, stage: 'start' })
    const group = groupCautions(cautions).find(({ members }) =>
      members.some(({ code }) => code === 'oxygen-unknown'),
    )
    expect(group?.members.map(({ ruleId }) => ruleId)).toEqual(expect.arrayContaining(['R01', 'R31']))
  })

  it('animals that are not known are one line, and no stop hides behind a note', () => {
    const facts = someFacts('formalin', formalin(150), { animals: { inWater: unknown() } })
    const groups = groupCautions(evaluateCautions({ facts, stage: 'design' }).cautions)
    const touched = groups.filter(({ members }) =>
      members.some(({ unknownFacts }) => unknownFacts.includes('animals.inWater')),
    )
    expect(touched).toHaveLength(1)
    const mixed = groupCautions([
      caution({ level: 'note', unknownFacts: ['water.pH'] }),
      caution({ level: 'stop', unknownFacts: ['water.pH'] }),
    ])
    expect(mixed).toHaveLength(1)
    expect(mixed[0]?.level).toBe('stop')
  })

  it('the same remedy for another subject is another line; a known fact is no unknown one', () => {
    expect(groupCautions([caution({ subject: 'A-1' }), caution({ subject: 'A-2' })])).toHaveLength(2)
    expect(groupCautions([caution({ subject: 'A-1' }), caution({ subject: 'A-1' })])).toHaveLength(1)
    expect(groupCautions([caution({}), caution({ unknownFacts: ['water.pH'] })])).toHaveLength(2)
  })

  it('one that shares a fact with two lines joins them, in whatever order they come', () => {
    const [a, b, both] = [
      caution({ unknownFacts: ['water.pH'] }),
      caution({ unknownFacts: ['water.temperatureC'] }),
      caution({ unknownFacts: ['water.pH', 'water.temperatureC'] }),
    ] as const
    for (const order of [
      [a, b, both],
      [both, a, b],
      [a, both, b],
    ])
      expect(groupCautions(order)).toHaveLength(1)
  })

  it('loses nothing, softens nothing, and puts the gravest on top, whatever fired', () => {
    fc.assert(
      fc.property(anyFacts, fc.constantFrom<CautionStage>('design', 'start'), (facts, stage) => {
        const { cautions } = evaluateCautions({ facts, stage })
        const groups = groupCautions(cautions)
        const all = groups.flatMap(({ members }) => members)
        expect(all).toHaveLength(cautions.length)
        expect(new Set(all)).toEqual(new Set(cautions))
        for (const { lead, level, members, acknowledged, stops } of groups) {
          const worst = Math.min(...members.map((one) => cautionLevels.indexOf(one.level)))
          expect(cautionLevels.indexOf(level)).toBe(worst)
          expect(lead).toBe(members[0])
          expect([...acknowledged, ...stops].every((one) => members.includes(one))).toBe(true)
          expect(acknowledged.every((one) => one.level === 'warning')).toBe(true)
          expect(stops).toHaveLength(members.filter((one) => one.level === 'stop').length)
        }
        const levels = groups.map(({ level }) => cautionLevels.indexOf(level))
        expect(levels).toEqual([...levels].sort((a, b) => a - b))
      }),
      { numRuns: 300 },
    )
  })
})
