import { describe, expect, it } from 'vitest'
import { checkProtocol, shortestLengthDays } from '../../../shared/domain/protocol/check-protocol.ts'
import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import { defaultClockPolicy } from '../../../shared/domain/quarantine/clock-policy.ts'

const protocol = (change: Partial<ProtocolContent> = {}): ProtocolContent => ({
  policy: defaultClockPolicy,
  steps: [{ key: 'a', kind: 'husbandry', day: 0, untilDay: 0, daily: false, name: 'A', short: 'a' }],
  criterionNames: {},
  testNames: {},
  ...change,
})
const treat = (day: number) => ({
  key: `t${String(day)}`,
  kind: 'treat' as const,
  day,
  untilDay: day,
  daily: false,
  name: 'Bath',
  short: 'bath',
})

describe('whether a protocol can meet its own length', () => {
  // Copper to day 25 and two baths 8 days apart end on day 36; 14 days after that is day 50. Computed for the template
  // of copper-tolerant marine teleosts in the quarantine reference (mark C; windows P).
  it.each([
    [[28, 36], 50],
    [[28, 38], 52],
    [[24, 32], 46],
    [[5, 15, 25], 39],
  ] as const)('masking baths on days %j need %i days', (days, needed) => {
    const content = protocol({ steps: days.map(treat) })
    expect(shortestLengthDays(content)).toBe(needed)
    const short = checkProtocol({ ...content, policy: { ...defaultClockPolicy, requiredDays: needed - 1 } })
    expect(short).toMatchObject({
      ok: false,
      refusal: { code: 'length-too-short', params: { neededDays: needed } },
    })
    expect(checkProtocol({ ...content, policy: { ...defaultClockPolicy, requiredDays: needed } }).ok).toBe(
      true,
    )
  })

  it('counts negatives by their distance from the first sample', () => {
    const criterion = {
      criterionId: 'c',
      kind: 'negatives' as const,
      testKey: 'x',
      count: 3,
      daysApart: 14,
      daysAfterMasking: 10,
    }
    const steps = [{ ...treat(7), kind: 'sample' as const, key: 's', testKey: 'x' }]
    const content = protocol({
      steps,
      policy: { ...defaultClockPolicy, criteria: [criterion] },
      criterionNames: { c: 'Three negatives' },
      testNames: { x: 'faecal' },
    })
    expect(shortestLengthDays(content)).toBe(35)
  })

  it('refuses windows that end before they begin, keys used twice and things without a name', () => {
    const [first] = protocol().steps
    if (!first) throw new Error('no step')
    const refusal = (change: Partial<ProtocolContent>) => {
      const checked = checkProtocol(protocol(change))
      return checked.ok ? null : checked.refusal.code
    }
    expect(refusal({ steps: [{ ...first, day: 3, untilDay: 2 }] })).toBe('window-reversed')
    expect(refusal({ steps: [first, first] })).toBe('step-key-twice')
    expect(refusal({ steps: [{ ...first, testKey: 'x' }] })).toBe('test-without-name')
    const criteria = [{ criterionId: 'fed', kind: 'declared' as const }]
    expect(refusal({ policy: { ...defaultClockPolicy, criteria } })).toBe('criterion-without-name')
  })
})
