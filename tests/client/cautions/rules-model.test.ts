import { describe, expect, it } from 'vitest'
import type { ParameterVersion } from '../../../shared/contracts/caution-rules.contract.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import { presentRules } from '../../../server/features/cautions/rules.present.ts'
import {
  matchingRules,
  needsJurisdiction,
  waitingCount,
  waitingOf,
} from '../../../src/features/cautions/rules-model.ts'
import { sayLimits, sayMark } from '../../../src/features/cautions/threshold-text.ts'

const proposedRow = {
  id: '019aaaaa-0000-7000-8000-000000000001',
  rule_id: 'R01',
  parameter_key: 'oxygenFloorMgPerL',
  entered_value: '6',
  entered_unit: 'mg/L',
  reason: 'the meters here read low',
  proposed_at: new Date('2026-12-01T12:00:00Z'),
  proposed_by_name: 'Test technician',
  confirmed_at: null,
  confirmed_on: null,
  confirmed_by_name: null,
  confirmed_reason: null,
  jurisdiction: null,
}
const loosened = {
  R04: {
    finfishMinutes: {
      value: 70,
      confirmedBy: 'Test veterinarian',
      confirmedOn: '2026-12-01',
      reason: 'as the other label has it',
      jurisdiction: 'Norrell Sound',
    },
  },
}
const rules = presentRules({}, [])
const idsOf = (found: readonly { ruleId: string }[]) => found.map(({ ruleId }) => ruleId)

describe('the rules searched', () => {
  it('are all there without a search, in the order of their numbers', () => {
    expect(idsOf(matchingRules(rules, {}))).toEqual(cautionRules.map(({ id }) => id))
  })

  it('are found by every typed word: number, finding, remedy, source and threshold', () => {
    expect(idsOf(matchingRules(rules, { q: 'r05' }))).toEqual(['R05'])
    expect(idsOf(matchingRules(rules, { q: 'OXYGEN old' }))).toContain('R01')
    expect(idsOf(matchingRules(rules, { q: 'read oxygen now' }))).toContain('R02')
    expect(idsOf(matchingRules(rules, { q: '529.1030' }))).toContain('R03')
    expect(idsOf(matchingRules(rules, { q: 'lowest oxygen' }))).toContain('R01')
    expect(matchingRules(rules, { q: 'nothing like this' })).toEqual([])
  })

  it('are filtered by level, by when they are judged, and by whether they can be overridden', () => {
    const start = idsOf(matchingRules(rules, { when: 'start' }))
    expect(start).toEqual(expect.arrayContaining(['R01', 'R02', 'R31']))
    expect(start).not.toContain('R03')
    expect(idsOf(matchingRules(rules, { override: 'no' }))).toEqual(
      cautionRules.filter(({ overridable }) => !overridable).map(({ id }) => id),
    )
    for (const { levels } of matchingRules(rules, { level: 'note' })) expect(levels).toContain('note')
  })

  it('are filtered by how their thresholds stand', () => {
    expect(matchingRules(rules, { standing: 'waiting' })).toEqual([])
    const waiting = presentRules({}, [proposedRow])
    expect(idsOf(matchingRules(waiting, { standing: 'waiting' }))).toEqual(['R01'])
    expect(waiting.map(waitingCount).filter((count) => count > 0)).toEqual([1])
    const loose = presentRules(loosened, [])
    expect(idsOf(matchingRules(loose, { standing: 'loosened' }))).toEqual(['R04'])
    expect(idsOf(matchingRules(loose, { standing: 'confirmed' }))).toEqual(['R04'])
    expect(idsOf(matchingRules(loose, { standing: 'default' }))).toContain('R01')
  })
})

describe('a threshold', () => {
  it('has one value that waits, and none once it is confirmed', () => {
    const [parameter] = presentRules({}, [proposedRow])[0]?.parameters ?? []
    expect(parameter && waitingOf(parameter)).toMatchObject({ value: '6', proposedBy: 'Test technician' })
    const confirmed = { ...proposedRow, confirmed_at: new Date('2026-12-01T13:00:00Z') }
    const [after] = presentRules({}, [confirmed])[0]?.parameters ?? []
    expect(after && waitingOf(after)).toBeUndefined()
  })

  it('asks for a jurisdiction only where what was read at its source is loosened', () => {
    const version = (loosens: boolean) => ({ loosens }) as ParameterVersion
    expect(needsJurisdiction({ legal: true }, version(true))).toBe(true)
    expect(needsJurisdiction({ legal: true }, version(false))).toBe(false)
    expect(needsJurisdiction({ legal: false }, version(true))).toBe(false)
  })

  it('says its limits with units, and every mark with its meaning', () => {
    const [floor] = rules[0]?.parameters ?? []
    expect(floor && sayLimits(floor)).toEqual({ least: '0.5\u00a0mg/L', most: '50\u00a0mg/L' })
    for (const { sources, parameters } of rules)
      for (const { mark } of [...sources, ...parameters]) expect(sayMark(mark)).toMatch(/^(V|V2|C|M|P): ./)
  })
})
