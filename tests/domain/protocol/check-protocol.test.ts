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

  // Lengths of the quarantine reference, section 1.4: computed there with 14 days after the last masking step (C; the
  // days and windows are project defaults, P).
  const course = (key: string, day: number, untilDay: number, more = {}) => ({
    ...treat(day),
    key,
    untilDay,
    ...more,
  })
  const sample = (key: string, day: number, testKey: string) => ({
    ...treat(day),
    kind: 'sample' as const,
    key,
    testKey,
  })
  it.each([
    ['copper counted to its last day, day 25', [course('copper', 2, 25)], 39],
    [
      'last bath left to fade for 2 days',
      [course('copper', 2, 25), course('a', 28, 28), course('b', 36, 36, { fadingDays: 2 })],
      52,
    ],
    [
      'chloroquine and two baths left to fade',
      [course('cq', 2, 23), course('b', 32, 32, { fadingDays: 2 })],
      48,
    ],
    ['three baths 10 days apart left to fade', [course('c', 25, 25, { fadingDays: 2 })], 41],
    [
      'third faecal on day 35, second swab by day 33',
      [sample('f', 35, 'faecal'), sample('s', 33, 'swab')],
      35,
    ],
    ['feed course to day 16', [course('bath', 3, 10), course('feed', 7, 16)], 30],
    ['a treatment that masks nothing', [course('fluids', 20, 20, { masks: false })], 20],
    ['a window of its own', [course('bath', 20, 20, { maskingWindowDays: 21 })], 41],
  ])('%s: %#', (_, steps, needed) => {
    expect(shortestLengthDays(protocol({ steps }))).toBe(needed)
  })

  const two = {
    criterionId: 'c',
    kind: 'negatives' as const,
    testKey: 'x',
    count: 2,
    daysApart: 14,
    daysAfterMasking: 10,
  }
  it.each([
    ['two planned samples far enough apart', [sample('a', 14, 'x'), sample('b', 28, 'x')], 28],
    [
      'the second too soon, the third not',
      [sample('a', 14, 'x'), sample('b', 27, 'x'), sample('c', 30, 'x')],
      30,
    ],
    [
      'only the last has to lie behind the treatment',
      [course('t', 20, 20), sample('a', 14, 'x'), sample('b', 29, 'x'), sample('c', 31, 'x')],
      34,
    ],
    ['one planned: another is needed 14 days on', [sample('a', 14, 'x')], 28],
    [
      'enough of them, but all too soon after the treatment',
      [course('t', 25, 25), sample('a', 14, 'x'), sample('b', 28, 'x')],
      39,
    ],
    ['none planned', [], 14],
  ])('negatives: %s', (_, steps, needed) => {
    const content = protocol({ steps, policy: { ...defaultClockPolicy, criteria: [two] } })
    expect(shortestLengthDays(content)).toBe(needed)
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
