import { describe, expect, it } from 'vitest'
import type { DoseTarget } from '../../../shared/domain/cautions/caution-facts.ts'
import { known } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { at, firedBy, someFacts } from './some-facts.ts'

const mg = (value: number, basis: DoseTarget['basis'] = 'active'): DoseTarget => ({
  value,
  unit: 'mg/L',
  basis,
})

describe('R29, R48: what is in the water already, and when', () => {
  const hours = (n: number) => new Date(Date.parse(at) + n * 3_600_000).toISOString()
  const withOther = (agent: AgentCode, other: AgentCode, from: number, until: number | null) =>
    firedBy(
      'R29',
      someFacts(agent, mg(2), {
        order: { startsAt: known(at), endsAt: known(hours(1)) },
        history: {
          agentUses: known([
            {
              agent: other,
              orderNumber: 'TO-0750',
              state: 'running',
              from: hours(from),
              until: until === null ? null : hours(until),
            },
          ]),
        },
      }),
    )
  it.each<[string, AgentCode, AgentCode, number, number | null, string[]]>([
    [
      'the same drug, not out of the water',
      'praziquantel',
      'praziquantel',
      -48,
      null,
      ['stop same-agent-together'],
    ],
    ['the same drug, out of it', 'praziquantel', 'praziquantel', -48, -1, []],
    ['two oxidants within a day', 'hydrogen-peroxide', 'chloramine-t', -10, -9, ['stop agents-not-together']],
    ['formalin with chloramine-T', 'formalin', 'chloramine-t', 0, 1, ['stop agents-not-together']],
    ['the same two, two days apart', 'formalin', 'chloramine-t', -50, -49, []],
    ['any other in the water', 'praziquantel', 'sodium-chloride', -48, null, ['warning agent-in-water']],
    ['any other of the day', 'praziquantel', 'sodium-chloride', 5, 6, ['note agent-same-day']],
    ['formalin and permanganate are R08’s matter', 'formalin', 'potassium-permanganate', 0, 1, []],
  ])('R29: %s', (_, agent, other, from, until, expected) =>
    expect(withOther(agent, other, from, until)).toEqual(expected),
  )
  const plan = (startsIn: number, givenDoses = 0, lastGiven: number | null = null) =>
    firedBy(
      'R48',
      someFacts('praziquantel', mg(2), {
        order: {
          startsAt: known(hours(startsIn)),
          spacing: known({
            intervalHours: 24,
            lastGivenAt: lastGiven === null ? null : hours(lastGiven),
            givenDoses,
            plannedDoses: 3,
            readingDriven: false,
          }),
        },
      }),
    )
  it('R48: a start whose window has closed, one far ahead, and doses that count already', () => {
    expect(plan(-6)).toEqual([])
    expect(plan(-6.1)).toEqual(['warning start-past'])
    expect(plan(90 * 24)).toEqual([])
    expect(plan(90 * 24 + 1)).toEqual(['warning start-far'])
    expect(plan(-30, 1, -29)).toEqual(['note doses-carried'])
    expect(plan(2, 1, -29)).toEqual(['warning plan-counts-given'])
  })
})
