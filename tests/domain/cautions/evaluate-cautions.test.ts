import { describe, expect, it } from 'vitest'
import {
  type CautionSettings,
  cautionRuleIds,
  ruleParameterKeys,
  startRuleIds,
} from '../../../shared/domain/cautions/caution-rule.ts'
import { cautionRules } from '../../../shared/domain/cautions/caution-rules.ts'
import { evaluateCautions } from '../../../shared/domain/cautions/evaluate-cautions.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import { listCautionRules } from '../../../shared/domain/cautions/list-caution-rules.ts'
import { listExceptions } from '../../../shared/domain/cautions/list-exceptions.ts'
import { sources } from '../../../shared/domain/sources.ts'
import { sayCaution, sayCondition } from '../../../shared/messages/say-caution.ts'
import { aLine, anAnimal, fired, firedBy, formalin, minutesAgo, read, someFacts } from './some-facts.ts'

const plain = (text: string) => text.replaceAll('\u00a0', ' ')

describe('design and start', () => {
  const tomorrow = someFacts('formalin', formalin(150), {
    water: { oxygenMgPerL: unknown(), temperatureC: unknown() },
    lifeSupport: { carbon: known('on') },
    animals: { inWater: known([anAnimal('teleost')]) },
  })
  it('an order signed today for tomorrow, oxygen unknown and carbon on: R01, R14, R31 are conditions (reference case)', () => {
    const { cautions, conditions } = evaluateCautions({ facts: tomorrow, stage: 'design' })
    expect(cautions.map(({ ruleId }) => ruleId)).not.toEqual(expect.arrayContaining(['R01']))
    for (const id of ['R01', 'R14', 'R31'])
      expect(
        cautions.some(({ ruleId }) => ruleId === id),
        id,
      ).toBe(false)
    const asked = conditions.filter(({ ruleId }) => ['R01', 'R14', 'R31'].includes(ruleId))
    expect(asked.map(({ ruleId, state, level }) => [ruleId, state, level])).toEqual([
      ['R01', 'unknown', 'stop'],
      ['R14', 'unmet', 'stop'],
      ['R31', 'unknown', 'stop'],
    ])
    expect(asked.map((condition) => plain(sayCondition(condition, 'Europe/Lisbon')))).toEqual([
      'Oxygen at least 5 mg/L, read within 30 minutes',
      'Carbon and resin off',
      'Water tested: oxygen within 30 minutes, temperature within 4 hours',
    ])
  })
  it('the same facts before the dose fire, and there are no conditions', () => {
    const { cautions, conditions } = evaluateCautions({ facts: tomorrow, stage: 'start' })
    expect(conditions).toEqual([])
    const ids = new Set(cautions.map(({ ruleId }) => ruleId))
    for (const id of ['R01', 'R14', 'R31'] as const) expect(ids.has(id), id).toBe(true)
  })
  it('a rule of the design is judged again at the start only if a fact it uses has changed', () => {
    const signed = someFacts(
      'praziquantel',
      { value: 20, unit: 'mg/L', basis: 'active' },
      {
        order: { defaultRange: known(aLine(2, { low: 2 })) },
      },
    )
    expect(firedBy('R26', signed)).toEqual(['stop far-over-default'])
    const at = (factsAtSigning?: typeof signed) =>
      evaluateCautions({
        facts: signed,
        stage: 'start',
        ...(factsAtSigning ? { factsAtSigning } : {}),
      }).cautions.map(({ ruleId }) => ruleId)
    expect(at()).not.toContain('R26')
    expect(at(signed)).not.toContain('R26')
    const then = {
      ...signed,
      order: { ...signed.order, target: known({ value: 2, unit: 'mg/L', basis: 'active' } as const) },
    }
    expect(at(then)).toContain('R26')
  })
  it('a bath given at 10:20 and entered at 13:05, last oxygen at 09:30: exceptions, and nothing is refused (reference case)', () => {
    const given = someFacts('formalin', formalin(150), {
      water: { oxygenMgPerL: read(7, 50), temperatureC: read(18, 50) },
    })
    const exceptions = listExceptions(given)
    expect(exceptions.map(({ ruleId, code }) => [ruleId, code])).toEqual([
      ['R01', 'oxygen-old'],
      ['R31', 'test-old'],
    ])
  })
  it('a note is no exception', () => {
    const first = someFacts('formalin', formalin(150), { order: { dosesGiven: known(0) } })
    expect(listExceptions(first)).toEqual([])
    expect(fired(first, 'start')).toEqual(['R39 note second-calculation'])
  })
})

describe('the answer', () => {
  const facts = someFacts('formalin', formalin(300), {
    water: { temperatureC: read(26), oxygenMgPerL: read(4, 3) },
    lifeSupport: { foamFractionator: known('on'), carbon: known('on') },
    order: {
      dosesGiven: known(0),
      contactMinutes: known(60),
      defaultRange: known(aLine(250, { unit: 'uL/L', basis: 'product' })),
    },
  })
  it('puts stops before warnings before notes, and equals in the order of the rules', () => {
    expect(fired(facts, 'start')).toEqual([
      'R01 stop oxygen-low',
      'R05 stop formalin-over-ceiling',
      'R14 stop carbon-on',
      'R16 stop fractionator-on',
      'R06 warning formalin-in-warm-water',
      'R39 note second-calculation',
    ])
  })
  it('carries rule, stage, thresholds, sources and the weakest mark', () => {
    const told = evaluateCautions({ facts, stage: 'start' }).cautions.find(({ ruleId }) => ruleId === 'R05')
    expect(told).toMatchObject({
      ruleId: 'R05',
      stage: 'start',
      overridable: true,
      mark: 'P',
      resolvedBy: ['lower-target'],
      unknownFacts: [],
      effects: [],
    })
    expect(told?.sources.map(({ source }) => source)).toEqual(['cfr-529-1030', 'project-default'])
    expect(told?.settings.find(({ key }) => key === 'finfishUlPerL')).toMatchObject({
      value: 250,
      isLoosened: false,
      confirmed: null,
    })
  })
  it('is said plainly', () => {
    const said = evaluateCautions({ facts, stage: 'start' }).cautions.map((one) =>
      plain(sayCaution(one, 'Europe/Lisbon').text),
    )
    expect(said.slice(0, 2)).toEqual([
      'Oxygen is 4 mg/L. A bath needs at least 5 mg/L.',
      '300 µL/L of product is above the 250 µL/L of the label for finfish.',
    ])
  })
  it('keeps the digits of the instrument', () => {
    const precise = someFacts('formalin', formalin(150), {
      water: { oxygenMgPerL: known(4.8, minutesAgo(5), 'meter', '4.80') },
    })
    const told = evaluateCautions({ facts: precise, stage: 'start' }).cautions[0]
    expect(told && plain(sayCaution(told, 'Europe/Lisbon').text)).toBe(
      'Oxygen is 4.80 mg/L. A bath needs at least 5 mg/L.',
    )
  })
})

describe('a facility’s own thresholds', () => {
  const by = {
    confirmedBy: 'Dr Ilse Marrow',
    confirmedOn: '2026-02-01',
    reason: 'house rule',
    jurisdiction: 'Nova Scotia',
  }
  const facts = someFacts('formalin', formalin(150), { water: { oxygenMgPerL: read(5.5) } })
  it('may be tighter: oxygen at least 6', () => {
    const settings: CautionSettings = { R01: { oxygenFloorMgPerL: { value: 6, ...by } } }
    expect(fired(facts, 'start', settings)).toEqual(['R01 stop oxygen-low'])
    expect(fired(facts, 'start')).toEqual([])
  })
  it('are marked where they are looser, with whoever confirmed them', () => {
    const settings: CautionSettings = { R01: { oxygenFloorMgPerL: { value: 4, ...by } } }
    const low = someFacts('formalin', formalin(150), { water: { oxygenMgPerL: read(3.9) } })
    const told = evaluateCautions({ facts: low, stage: 'start', settings }).cautions[0]
    expect(told?.settings.find(({ key }) => key === 'oxygenFloorMgPerL')).toMatchObject({
      value: 4,
      default: 5,
      isLoosened: true,
      confirmed: by,
    })
  })
  it('are not used when they are no numbers', () => {
    const settings: CautionSettings = { R01: { oxygenFloorMgPerL: { value: Number.NaN, ...by } } }
    expect(
      fired(someFacts('formalin', formalin(150), { water: { oxygenMgPerL: read(4.9) } }), 'start', settings),
    ).toEqual(['R01 stop oxygen-low'])
  })
})

describe('the list of rules', () => {
  it('holds each rule once, in the order of its number', () => {
    expect(listCautionRules().map(({ ruleId }) => ruleId)).toEqual([...cautionRuleIds])
  })
  it('names the rules that only a dose is judged by', () => {
    expect(cautionRules.filter(({ when }) => when === 'start').map(({ id }) => id)).toEqual([...startRuleIds])
    for (const rule of cautionRules) expect(rule.condition !== undefined, rule.id).toBe(rule.when === 'start')
  })
  it('says which can never be overridden: R08, R27 and R37 of those built (treatments reference, section 4), and R47 of ours', () => {
    expect(cautionRules.filter(({ overridable }) => !overridable).map(({ id }) => id)).toEqual([
      'R08',
      'R27',
      'R37',
      'R47',
    ])
  })
  it('rests every rule and threshold on a known source, never with a better mark than the source has', () => {
    const rank = ['V', 'C', 'V2', 'M', 'P']
    for (const rule of cautionRules)
      for (const { source, mark } of [...rule.sources, ...Object.values(rule.parameters)])
        expect(rank.indexOf(mark), `${rule.id} ${source}`).toBeGreaterThanOrEqual(
          rank.indexOf(sources[source].mark),
        )
    expect(cautionRules.every(({ sources: list }) => list.length > 0)).toBe(true)
  })
  it('uses every threshold name that has words', () => {
    const used = new Set(cautionRules.flatMap(({ parameters }) => Object.keys(parameters)))
    expect([...used].sort()).toEqual([...ruleParameterKeys].sort())
  })
})
