import { describe, expect, it } from 'vitest'
import type { CautionFacts, DoseTarget } from '../../../shared/domain/cautions/caution-facts.ts'
import { known, notApplicable, unknown } from '../../../shared/domain/cautions/fact.ts'
import type { AgentCode } from '../../../shared/domain/formulary/agent.ts'
import { anAnimal, cautions, firedBy, minutesAgo, read, someFacts } from './some-facts.ts'

// Sources: as each rule names them; expected outcomes of the marked cases as computed in the treatments reference,
// section 4.1 (C). The rest is our own reading of the same rules (P).

type Change = Parameters<typeof someFacts>[2]
const mg = (value: number, basis: DoseTarget['basis'] = 'active'): DoseTarget => ({
  value,
  unit: 'mg/L',
  basis,
})
const cuso = (target: DoseTarget, kind: 'fresh' | 'brackish' | 'marine', change: Change = {}) =>
  someFacts('copper-sulfate', target, { ...change, water: { kind: known(kind), ...change?.water } })
const use = (
  agent: AgentCode,
  state: 'ordered' | 'running' | 'ended',
  from: string | null,
  until: string | null,
) => ({
  agent,
  orderNumber: 'TO-0700',
  state,
  from,
  until,
})

describe('R09: copper and those it kills', () => {
  const withAnimals = (inWater: CautionFacts['animals']['inWater'], agent: AgentCode = 'copper-sulfate') =>
    firedBy('R09', someFacts(agent, mg(0.15, 'free'), { animals: { inWater } }))
  it('a marine tank with a cleaner shrimp stops (reference case)', () => {
    const shrimp = anAnimal('crustacean', { commonName: 'cleaner shrimp' })
    expect(withAnimals(known([anAnimal('teleost'), shrimp]))).toEqual(['stop copper-invertebrates'])
  })
  it('rays elsewhere on the same water stop, and are named with their tank', () => {
    const ray = anAnimal('elasmobranch', { commonName: 'southern stingray', enclosureCode: 'QT-4' })
    const facts = someFacts('copper-sulfate', mg(0.15, 'free'), {
      animals: { inWater: known([anAnimal('teleost'), ray]) },
    })
    const told = cautions(facts).find(({ code }) => code === 'copper-elasmobranchs')
    expect(told?.params).toEqual({
      animals: [{ label: 'HP-0419', commonName: 'southern stingray', enclosureCode: 'QT-4' }],
    })
  })
  it('both, chelated copper, nobody known, fish alone', () => {
    const both = known([anAnimal('coral'), anAnimal('elasmobranch')])
    expect(withAnimals(both, 'chelated-copper')).toEqual([
      'stop copper-invertebrates',
      'stop copper-elasmobranchs',
    ])
    expect(withAnimals(unknown())).toEqual(['stop inhabitants-unknown'])
    expect(withAnimals(known([anAnimal('teleost')]))).toEqual([])
  })
})

describe('R10, R11: copper in fresh water', () => {
  const alkalinity = (value: number, minutes = 10): Change => ({
    water: { alkalinityMgPerLCaCO3: read(value, minutes) },
  })
  it.each<[string, CautionFacts, string[]]>([
    [
      'alkalinity 48 (reference case)',
      cuso(mg(0.4, 'salt'), 'fresh', alkalinity(48)),
      ['stop alkalinity-low'],
    ],
    ['alkalinity 50', cuso(mg(0.5, 'salt'), 'fresh', alkalinity(50)), []],
    [
      'unknown',
      cuso(mg(0.5, 'salt'), 'fresh', { water: { alkalinityMgPerLCaCO3: unknown() } }),
      ['stop alkalinity-unknown'],
    ],
    ['25 h old', cuso(mg(0.5, 'salt'), 'fresh', alkalinity(120, 25 * 60)), ['stop alkalinity-old']],
    ['sea water', cuso(mg(0.15, 'free'), 'marine', alkalinity(10)), []],
  ])('R10: %s', (_, facts, expected) => expect(firedBy('R10', facts)).toEqual(expected))
  it.each<[string, CautionFacts, string[]]>([
    [
      'alkalinity 300, 2.6 mg/L (reference case)',
      cuso(mg(2.6, 'salt'), 'fresh', alkalinity(300)),
      ['stop copper-over-cap'],
    ],
    ['alkalinity 300, 2.5 mg/L', cuso(mg(2.5, 'salt'), 'fresh', alkalinity(300)), []],
    [
      'alkalinity 120, 1.21 mg/L',
      cuso(mg(1.21, 'salt'), 'fresh', alkalinity(120)),
      ['stop copper-over-alkalinity'],
    ],
    ['alkalinity 120, 1.2 mg/L', cuso(mg(1.2, 'salt'), 'fresh', alkalinity(120)), []],
    // 1.2 mg/L of pentahydrate is 0.305 mg/L of copper (treatments reference 2.6, C).
    [
      'alkalinity 120, 0.306 mg/L of copper',
      cuso(mg(0.306, 'free'), 'fresh', alkalinity(120)),
      ['stop copper-over-alkalinity'],
    ],
    ['alkalinity 120, 0.305 mg/L of copper', cuso(mg(0.305, 'free'), 'fresh', alkalinity(120)), []],
    [
      'alkalinity unknown, 2.4: the cap still holds',
      cuso(mg(2.4, 'salt'), 'fresh', { water: { alkalinityMgPerLCaCO3: unknown() } }),
      [],
    ],
    [
      'water of unknown kind is judged as fresh',
      someFacts('copper-sulfate', mg(2.6, 'salt'), { water: { kind: unknown() } }),
      ['stop copper-over-cap'],
    ],
  ])('R11: %s', (_, facts, expected) => expect(firedBy('R11', facts)).toEqual(expected))
})

describe('R12, R13: copper in sea water', () => {
  const course = (level: number, copperCourse: 'not-started' | 'ramp' | 'hold') =>
    cuso(mg(0.15, 'free'), 'marine', {
      order: { copperCourse: known(copperCourse) },
      water: { kind: known('marine'), freeCopperMgPerL: read(level) },
    })
  it.each<[string, CautionFacts, string[]]>([
    ['ramp, step 2 of 3, reading 0.08 (reference case)', course(0.08, 'ramp'), []],
    ['after the last step, 0.14 (reference case)', course(0.14, 'hold'), ['warning copper-low']],
    ['0.15', course(0.15, 'hold'), []],
    ['0.20', course(0.2, 'hold'), []],
    ['0.21', course(0.21, 'hold'), ['warning copper-high']],
    ['0.25', course(0.25, 'hold'), ['warning copper-high']],
    ['0.26', course(0.26, 'ramp'), ['stop copper-very-high']],
  ])('R12: %s', (_, facts, expected) => {
    expect(firedBy('R12', facts)).toEqual(expected)
    expect(firedBy('R12', facts, 'start')).toEqual(expected)
  })
  it('R12: no reading within 24 h stops the next addition, but not the writing of a new order', () => {
    const none = (copperCourse: 'not-started' | 'ramp') =>
      cuso(mg(0.15, 'free'), 'marine', {
        order: { copperCourse: known(copperCourse) },
        water: { kind: known('marine'), freeCopperMgPerL: read(0.1, 25 * 60) },
      })
    expect(firedBy('R12', none('ramp'))).toEqual(['stop copper-reading-missing'])
    expect(firedBy('R12', none('not-started'))).toEqual([])
    expect(firedBy('R12', none('not-started'), 'start')).toEqual(['stop copper-reading-missing'])
  })
  it('a chelated target of 2.0 typed into an ionic course stops by R12 and R13 (reference case)', () => {
    const facts = cuso(mg(2, 'total'), 'marine')
    expect(firedBy('R12', facts)).toEqual(['stop copper-target-high'])
    expect(firedBy('R13', facts)).toEqual(['stop copper-forms-mixed'])
    expect(firedBy('R12', cuso(mg(2, 'free'), 'marine'))).toEqual(['stop copper-target-high'])
  })
  it('R13: the other form in the same water, and reducers with chelated copper', () => {
    const chelated = (change: Change) =>
      firedBy('R13', someFacts('chelated-copper', mg(1.5, 'total'), change))
    expect(chelated({})).toEqual([])
    expect(
      chelated({ history: { agentUses: known([use('copper-sulfate', 'running', null, null)]) } }),
    ).toEqual(['stop copper-forms-mixed'])
    expect(
      chelated({ history: { agentUses: known([use('copper-sulfate', 'ended', null, minutesAgo(60))]) } }),
    ).toEqual([])
    expect(chelated({ history: { reducerInUse: known(true) } })).toEqual(['stop copper-reducer'])
    expect(chelated({ history: { reducerInUse: unknown() } })).toEqual(['stop copper-reducer-unknown'])
    expect(chelated({ history: { agentUses: unknown() } })).toEqual(['stop agent-history-unknown'])
  })
})

describe('R14, R15, R16: life support', () => {
  const on = (agent: AgentCode, lifeSupport: Partial<CautionFacts['lifeSupport']>, rule: string) =>
    firedBy(rule, someFacts(agent, mg(2), { lifeSupport }), 'start')
  it('R14: carbon has to be recorded off, where there is any', () => {
    expect(on('praziquantel', { carbon: known('on') }, 'R14')).toEqual(['stop carbon-on'])
    expect(on('praziquantel', { carbon: unknown() }, 'R14')).toEqual(['stop carbon-unknown'])
    expect(on('praziquantel', { carbon: notApplicable() }, 'R14')).toEqual([])
    expect(on('praziquantel', { carbon: known('off') }, 'R14')).toEqual([])
  })
  it('R15: ozone for all that it harms, ultraviolet light for those that it harms', () => {
    expect(on('formalin', { ozone: known('on'), uv: known('on') }, 'R15')).toEqual(['stop ozone-on'])
    expect(on('praziquantel', { ozone: known('on'), uv: known('on') }, 'R15')).toEqual([
      'stop ozone-on',
      'stop uv-on',
    ])
    expect(on('praziquantel', { ozone: unknown(), uv: unknown() }, 'R15')).toEqual([
      'stop ozone-unknown',
      'stop uv-unknown',
    ])
    expect(on('copper-sulfate', { ozone: known('on'), uv: known('on') }, 'R15')).toEqual([])
  })
  it('R16: a running fractionator is a warning, with formalin and chloramine-T a stop', () => {
    expect(on('praziquantel', { foamFractionator: known('on') }, 'R16')).toEqual(['warning fractionator-on'])
    expect(on('chloramine-t', { foamFractionator: known('on') }, 'R16')).toEqual(['stop fractionator-on'])
    expect(on('formalin', { foamFractionator: unknown() }, 'R16')).toEqual(['stop fractionator-unknown'])
    expect(on('formalin', { foamFractionator: notApplicable() }, 'R16')).toEqual([])
  })
})

describe('R17, R22, R23, R24: single drugs', () => {
  it('R17: chloroquine', () => {
    const cq = (change: Change) => firedBy('R17', someFacts('chloroquine', mg(10, 'salt'), change))
    expect(cq({})).toEqual([])
    expect(cq({ animals: { inWater: known([anAnimal('coral')]) } })).toEqual([
      'stop chloroquine-invertebrates',
    ])
    expect(cq({ animals: { inWater: unknown() } })).toEqual(['stop inhabitants-unknown'])
    expect(cq({ water: { hasPlantsOrAlgae: known(true) } })).toEqual(['warning chloroquine-algae'])
    expect(cq({ lifeSupport: { lights: known('full') } })).toEqual(['warning chloroquine-lights'])
    expect(cq({ water: { hasPlantsOrAlgae: unknown() }, lifeSupport: { lights: unknown() } })).toEqual([
      'warning chloroquine-algae-unknown',
      'warning chloroquine-lights-unknown',
    ])
  })
  it('R22: hydrogen peroxide (21 CFR 529.1150)', () => {
    const h2o2 = (animal: Parameters<typeof anAnimal>[1], change: Change = {}) =>
      firedBy(
        'R22',
        someFacts('hydrogen-peroxide', mg(75), {
          animals: { inWater: known([anAnimal('teleost', animal)]) },
          ...change,
        }),
      )
    expect(h2o2({ scientificName: 'Esox lucius' })).toEqual(['stop peroxide-excluded'])
    expect(h2o2({ scientificName: 'Polyodon spathula', lifeStage: 'fry' })).toEqual([
      'stop peroxide-excluded',
    ])
    expect(h2o2({ scientificName: 'Scaphirhynchus albus', lifeStage: 'fry' })).toEqual([
      'stop peroxide-excluded',
    ])
    expect(h2o2({ scientificName: 'Scaphirhynchus albus', lifeStage: 'adult' })).toEqual([])
    expect(h2o2({ scientificName: 'Esox lucius', lifeStage: 'egg', dailyTemperatureUnits: 20 })).toEqual([])
    expect(h2o2({ scientificName: 'Sander vitreus' })).toEqual(['warning peroxide-walleye'])
    expect(h2o2({ lifeStage: 'egg', dailyTemperatureUnits: 70 })).toEqual(['warning peroxide-eggs'])
    expect(h2o2({ lifeStage: 'egg', dailyTemperatureUnits: 141 })).toEqual([])
    expect(h2o2({ lifeStage: 'egg' })).toEqual(['warning peroxide-eggs-age-unknown'])
    expect(h2o2({}, { water: { temperatureC: read(20.1) } })).toEqual(['warning peroxide-warm'])
    expect(h2o2({}, { water: { temperatureC: unknown() } })).toEqual(['warning peroxide-temperature-unknown'])
    expect(
      firedBy('R22', someFacts('hydrogen-peroxide', mg(75), { animals: { inWater: unknown() } })),
    ).toEqual(['stop inhabitants-unknown'])
  })
  it('R23: chloramine-T in acid, soft water', () => {
    const clt = (water: Partial<CautionFacts['water']>) =>
      firedBy('R23', someFacts('chloramine-t', mg(12, 'salt'), { water }))
    expect(clt({ pH: read(6.5), alkalinityMgPerLCaCO3: read(50) })).toEqual([])
    expect(clt({ pH: read(6.4), alkalinityMgPerLCaCO3: read(49) })).toEqual([
      'warning chloramine-acid',
      'warning chloramine-soft',
    ])
    expect(clt({ pH: unknown(), alkalinityMgPerLCaCO3: unknown() })).toEqual([
      'warning chloramine-unknown',
      'warning chloramine-unknown',
    ])
  })
  it('R24: the fourth 2 mg/L of permanganate stops (reference case)', () => {
    const kmno = (change: Change) => firedBy('R24', someFacts('potassium-permanganate', mg(2), change))
    expect(kmno({ history: { givenInLast24hMgPerL: known(4) } })).toEqual([])
    expect(kmno({ history: { givenInLast24hMgPerL: known(6) } })).toEqual(['stop permanganate-total'])
    expect(kmno({ history: { givenInLast24hMgPerL: unknown() } })).toEqual([
      'stop permanganate-total-unknown',
    ])
    expect(kmno({ water: { pH: read(8.6), hardnessMgPerLCaCO3: read(251) } })).toEqual([
      'warning permanganate-alkaline',
      'warning permanganate-hard',
    ])
    const days = (n: number) =>
      known([use('potassium-permanganate', 'ended', minutesAgo(n * 1440 + 60), minutesAgo(n * 1440))])
    expect(kmno({ history: { agentUses: days(6) } })).toEqual(['warning permanganate-repeated'])
    expect(kmno({ history: { agentUses: days(7) } })).toEqual([])
    expect(kmno({ history: { agentUses: unknown() } })).toEqual(['warning agent-history-unknown'])
    expect(kmno({ water: { pH: unknown(), hardnessMgPerLCaCO3: unknown() } })).toHaveLength(2)
  })
})
