import { describe, expect, it } from 'vitest'
import type { CautionFacts } from '../../../shared/domain/cautions/caution-facts.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import { evaluateCautions, routesOf } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, notApplicable } from '../../../shared/domain/cautions/fact.ts'
import { immersionAgents, systemicAgents } from '../../../shared/domain/formulary/agent.ts'
import { someFacts } from './some-facts.ts'

const line = {
  low: 5,
  high: 10,
  unit: 'mg/kg',
  basis: 'base',
  longestContactMinutes: null,
  water: 'both',
  stays: false,
} as const

const injected = (value: number): CautionFacts => {
  const facts = someFacts('enrofloxacin', { value, unit: 'mg/kg', basis: 'base' })
  return {
    ...facts,
    route: 'injection',
    order: { ...facts.order, defaultRange: known(line), agentRanges: known([line]) },
    volume: { determination: notApplicable() },
    lifeSupport: { ...facts.lifeSupport, carbon: known('on'), ozone: known('on') },
  }
}

describe('the route of a treatment', () => {
  it('asks rules of the water of an immersion alone', () => {
    const bath: CautionFacts = { ...injected(10), route: 'immersion', agent: 'praziquantel' }
    const ids = (facts: CautionFacts) =>
      evaluateCautions({ facts, stage: 'start' }).cautions.map(({ ruleId }) => ruleId)
    expect(ids(bath)).toContain('R14')
    expect(ids(injected(10))).not.toContain('R14')
    expect(ids(injected(10))).not.toContain('R15')
  })

  it('judges a dose for a weight by its line as it does a concentration', () => {
    const levels = (value: number) =>
      evaluateCautions({ facts: injected(value), stage: 'design' }).cautions.map(
        ({ ruleId, level }) => `${ruleId} ${level}`,
      )
    expect(levels(10)).toEqual([])
    expect(levels(11)).toEqual(['R26 warning'])
    expect(levels(21)).toEqual(['R26 stop'])
    expect(levels(2)).toEqual(['R26 warning'])
    expect(levels(101)).toEqual(['R26 stop', 'R47 stop'])
  })

  it('never compares a dose for a weight with a concentration in water', () => {
    const facts = injected(50)
    const inWater = { ...line, high: 2.5, unit: 'mg/L' } as const
    const answer = evaluateCautions({
      facts: {
        ...facts,
        order: { ...facts.order, defaultRange: known(inWater), agentRanges: known([inWater]) },
      },
      stage: 'design',
    })
    expect(answer.cautions.map(({ code }) => code)).toEqual(['default-not-comparable'])
  })

  it('takes facts that were signed before there were routes as those of an immersion', () => {
    const { route: _, ...signed } = someFacts('praziquantel', { value: 2, unit: 'mg/L', basis: 'active' })
    const now = someFacts('praziquantel', { value: 2, unit: 'mg/L', basis: 'active' })
    const answer = evaluateCautions({ facts: now, stage: 'start', factsAtSigning: signed as typeof now })
    expect(answer.cautions).toEqual([])
  })

  it('has rules for every route, and an agent is of one kind', () => {
    for (const route of ['injection', 'by-mouth', 'in-feed', 'on-skin'] as const)
      expect(cautionRules.filter((rule) => routesOf(rule).includes(route)).length).toBeGreaterThan(5)
    expect(immersionAgents.filter((one) => (systemicAgents as readonly string[]).includes(one))).toEqual([])
  })
})
