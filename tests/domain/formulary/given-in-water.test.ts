import { describe, expect, it } from 'vitest'
import {
  agentCodes,
  immersionAgents,
  isGivenInWater,
  systemicAgents,
} from '../../../shared/domain/formulary/agent.ts'

describe('what may be ordered into the water', () => {
  it('is every drug that is given so, whatever its lines', () => {
    for (const agent of immersionAgents) expect(isGivenInWater(agent, [])).toBe(true)
  })

  it('is no drug that is given to the animal itself, for want of a figure', () => {
    for (const agent of systemicAgents) {
      expect(isGivenInWater(agent, [])).toBe(false)
      const others = agentCodes
        .filter((one) => one !== agent)
        .map((one) => ({ agent: one, use: 'external-bacteria' }))
      expect(isGivenInWater(agent, others)).toBe(false)
    }
  })

  it('is none that a line gives a figure for by weight alone', () => {
    for (const use of ['bacteria-injection', 'bacteria-by-mouth'])
      expect(isGivenInWater('enrofloxacin', [{ agent: 'enrofloxacin', use }])).toBe(false)
  })

  it('is one of them that a line in force gives a figure for', () => {
    // enrofloxacin, 2.5 mg/L for 5 h in cuttlefish: Gore et al. 2005, marked V in the treatments reference
    expect(isGivenInWater('enrofloxacin', [{ agent: 'enrofloxacin', use: 'external-bacteria' }])).toBe(true)
  })
})
