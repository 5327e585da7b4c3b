import { describe, expect, it } from 'vitest'
import { agentCodes, isGivenByWeight, systemicAgents } from '../../../shared/domain/formulary/agent.ts'
import { routesByWeight } from '../../../shared/domain/orders/order-route.ts'

describe('what may be ordered by the weight of an animal', () => {
  it('is every drug that is given to the animal itself, on any route', () => {
    for (const agent of systemicAgents)
      for (const route of routesByWeight) expect(isGivenByWeight(agent, route)).toBe(true)
  })

  it('is by mouth also a drug of the water that such a dose is known of, and never by needle or on the skin', () => {
    // praziquantel 70 mg/kg, metronidazole 50 mg/kg, fenbendazole 75 mg/kg by mouth: treatments reference, marked V
    const byMouth = agentCodes.filter(
      (agent) => !systemicAgents.some((one) => one === agent) && isGivenByWeight(agent, 'by-mouth'),
    )
    expect(byMouth).toEqual(['praziquantel', 'metronidazole', 'oxytetracycline', 'fenbendazole'])
    for (const agent of byMouth)
      for (const route of ['injection', 'on-skin'] as const) expect(isGivenByWeight(agent, route)).toBe(false)
  })

  it('is nothing that burns or poisons', () => {
    for (const agent of [
      'formalin',
      'copper-sulfate',
      'potassium-permanganate',
      'hydrogen-peroxide',
    ] as const)
      for (const route of routesByWeight) expect(isGivenByWeight(agent, route)).toBe(false)
  })
})
