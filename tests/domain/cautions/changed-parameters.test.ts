import { describe, expect, it } from 'vitest'
import fc from 'fast-check'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import type { CautionSettings } from '../../../shared/domain/cautions/caution-rule.ts'
import { changedParameters } from '../../../shared/domain/cautions/changed-parameters.ts'
import { oxygen } from '../../../shared/domain/cautions/rules/r01-oxygen.ts'
import { staleReadings } from '../../../shared/domain/cautions/rules/r31-stale-readings.ts'
import { anyFacts } from './any-facts.ts'
import { formalin, someFacts } from './some-facts.ts'

const by = {
  confirmedBy: 'Test veterinarian',
  confirmedOn: '2026-12-01',
  reason: 'checked here',
  jurisdiction: 'Norrell Sound',
}
const floor = (value: number): CautionSettings => ({ R01: { oxygenFloorMgPerL: { value, ...by } } })
const facts = someFacts('formalin', formalin(150))
const changed = (then: CautionSettings, now: CautionSettings, rule = oxygen) =>
  changedParameters(rule, { facts, stage: 'start', then, now })

describe('thresholds that were changed since a signature', () => {
  it('are told with both values, and which way they went', () => {
    expect(changed(floor(4), floor(6))).toMatchObject([
      { then: { key: 'oxygenFloorMgPerL', value: 4 }, now: { value: 6 }, isStricter: true },
    ])
    expect(changed(floor(6), floor(4))).toMatchObject([{ isStricter: false }])
    // nothing was confirmed at the signature: the project default held
    expect(changed({}, floor(6))).toMatchObject([{ then: { value: 5, confirmed: null }, isStricter: true }])
    const age = { R01: { oxygenMaxAgeMinutes: { value: 10, ...by } } }
    expect(changed({}, age)).toMatchObject([{ now: { value: 10 }, isStricter: true }])
  })

  it('are none where the value is the same, whoever confirmed it anew', () => {
    expect(changed(floor(5), {})).toEqual([])
    expect(
      changed({ R01: { oxygenFloorMgPerL: { value: 6, ...by, confirmedBy: 'Another' } } }, floor(6)),
    ).toEqual([])
  })

  it('are none of an order that they have nothing to do with', () => {
    const copper = { R31: { copperHours: { value: 6, ...by } } }
    expect(changed({}, copper, staleReadings)).toEqual([])
    const minutes = { R31: { oxygenMinutes: { value: 6, ...by } } }
    expect(changed({}, minutes, staleReadings)).toHaveLength(1)
  })

  it('are none between equal settings, whatever the rule and the facts', () => {
    fc.assert(
      fc.property(anyFacts, fc.constantFrom(...cautionRules), (any, rule) => {
        expect(
          changedParameters(rule, { facts: any, stage: 'start', then: floor(6), now: floor(6) }),
        ).toEqual([])
      }),
      { numRuns: 100 },
    )
  })
})
