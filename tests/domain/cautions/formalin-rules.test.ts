import { describe, expect, it } from 'vitest'
import type {
  AnimalInWater,
  CautionFacts,
  DoseTarget,
} from '../../../shared/domain/cautions/caution-facts.ts'
import { known, unknown } from '../../../shared/domain/cautions/fact.ts'
import {
  anAnimal,
  at,
  cautions,
  fired,
  firedBy,
  formalin,
  minutesAgo,
  read,
  someFacts,
} from './some-facts.ts'

// Sources: 21 CFR 529.1030 for strengths, times and pond limits (V); UF/IFAS VM-77 for the cap in warm water (V);
// expected outcomes as computed in the treatments reference, section 4.1 (C). Cases beyond it are our own reading of
// the same rules, and say so.

type Change = Parameters<typeof someFacts>[2]
const bath = (target: DoseTarget, animals: AnimalInWater[], minutes: number, change: Change = {}) =>
  someFacts('formalin', target, {
    ...change,
    order: { contactMinutes: known(minutes), contactMinutesPerDay: known(minutes), ...change?.order },
    animals: { inWater: known(animals), ...change?.animals },
  })
const trout = anAnimal('salmonid', { commonName: 'rainbow trout' })
const cichlid = anAnimal('teleost', { commonName: 'cichlid' })
const shrimp = anAnimal('penaeid-shrimp')
const warm = (celsius: number): Change => ({ water: { temperatureC: read(celsius) } })

describe('R05: the ceilings of the label', () => {
  it.each<[string, CautionFacts, string[]]>([
    [
      '200 µL/L, rainbow trout, 12 °C, 60 min',
      bath(formalin(200), [trout], 60, warm(12)),
      ['stop formalin-over-salmonid-ceiling'],
    ],
    ['200 µL/L, rainbow trout, 8 °C, 60 min', bath(formalin(200), [trout], 60, warm(8)), []],
    [
      '180 µL/L, rainbow trout, 45 min, exactly 10.0 °C',
      bath(formalin(180), [trout], 45, warm(10)),
      ['stop formalin-over-salmonid-ceiling'],
    ],
    ['170 µL/L, rainbow trout, exactly 10.0 °C', bath(formalin(170), [trout], 45, warm(10)), []],
    [
      '180 µL/L, rainbow trout, exactly 50 °F',
      bath(formalin(180), [trout], 45, warm(((50 - 32) * 5) / 9)),
      ['stop formalin-over-salmonid-ceiling'],
    ],
    ['eggs of brook trout, 1,250 µL/L', bath(formalin(1250), [{ ...trout, lifeStage: 'egg' }], 15), []],
    [
      'eggs of brook trout, 2,050 µL/L',
      bath(formalin(2050), [{ ...trout, lifeStage: 'egg' }], 15),
      ['stop formalin-over-ceiling'],
    ],
    [
      'eggs of white sturgeon, 1,550 µL/L',
      bath(formalin(1550), [anAnimal('sturgeon', { lifeStage: 'egg' })], 15),
      ['stop formalin-over-ceiling'],
    ],
    [
      'eggs of white sturgeon, 1,500 µL/L',
      bath(formalin(1500), [anAnimal('sturgeon', { lifeStage: 'egg' })], 15),
      [],
    ],
    ['penaeid shrimp, tank, 75 µL/L', bath(formalin(75), [shrimp], 210), []],
    ['penaeid shrimp, tank, 110 µL/L', bath(formalin(110), [shrimp], 210), ['stop formalin-over-ceiling']],
    // Our reading: the pond row of the label, the strictest row in mixed water, sharks as finfish.
    [
      'penaeid shrimp, pond, 30 µL/L',
      bath(formalin(30), [shrimp], 210, { order: { setting: known('pond') } }),
      ['stop formalin-over-ceiling'],
    ],
    [
      'cichlid and shrimp, 110 µL/L',
      bath(formalin(110), [cichlid, shrimp], 45),
      ['stop formalin-over-ceiling'],
    ],
    ['cichlid, 250 µL/L', bath(formalin(250), [cichlid], 45), []],
    ['shark, 251 µL/L', bath(formalin(251), [anAnimal('elasmobranch')], 45), ['stop formalin-over-ceiling']],
    ['sea star, 900 µL/L: no row of the label', bath(formalin(900), [anAnimal('echinoderm')], 15), []],
  ])('%s', (_, facts, expected) => {
    expect(firedBy('R05', facts)).toEqual(expected)
    expect(firedBy('R05', facts, 'start')).toEqual(expected)
  })
  it('judges by the warmest water of the last four hours, not the newest reading', () => {
    const facts = (hoursAgo: number) =>
      bath(formalin(180), [trout], 45, {
        water: {
          temperatureC: read(9.6, 5),
          recentTemperaturesC: known([{ value: 10.1, at: minutesAgo(hoursAgo * 60) }]),
        },
      })
    expect(firedBy('R05', facts(3))).toEqual(['stop formalin-over-salmonid-ceiling'])
    expect(firedBy('R05', facts(4.1))).toEqual([])
  })
  it('takes the stricter row where no temperature of the last hours is known', () => {
    const expected = ['stop formalin-salmonid-temperature-unknown']
    expect(firedBy('R05', bath(formalin(180), [trout], 45, { water: { temperatureC: unknown() } }))).toEqual(
      expected,
    )
    expect(
      firedBy('R05', bath(formalin(180), [trout], 45, { water: { temperatureC: read(8, 300) } })),
    ).toEqual(expected)
  })
  it('compares after exact conversion: 270 mg product/L at 1.08 g/mL is 250 µL/L, and the lot’s density counts', () => {
    const mg = (value: number): DoseTarget => ({ value, unit: 'mg/L', basis: 'product' })
    expect(firedBy('R05', bath(mg(270), [cichlid], 45))).toEqual([])
    expect(firedBy('R05', bath(mg(270.1), [cichlid], 45))).toEqual(['stop formalin-over-ceiling'])
    const heavy = { lot: { densityGPerMl: known(1.1) } }
    expect(firedBy('R05', bath(mg(270.1), [cichlid], 45, heavy))).toEqual([])
    // 250 µL/L holds 99.9 mg/L of formaldehyde (37 % w/w at 1.08 g/mL; treatments reference 2.6, C).
    const active = (value: number): DoseTarget => ({ value, unit: 'mg/L', basis: 'active' })
    expect(firedBy('R05', bath(active(99.9), [cichlid], 45))).toEqual([])
    expect(firedBy('R05', bath(active(100), [cichlid], 45))).toEqual(['stop formalin-over-ceiling'])
  })
  it('stops where nobody knows who is in the water', () => {
    expect(firedBy('R05', bath(formalin(10), [], 45, { animals: { inWater: unknown() } }))).toEqual([
      'stop inhabitants-unknown',
    ])
  })
})

describe('R04: the times of the label', () => {
  it.each<[string, CautionFacts, string[]]>([
    ['eggs of brook trout, 15 min', bath(formalin(1250), [{ ...trout, lifeStage: 'egg' }], 15), []],
    [
      'eggs of brook trout, 16 min',
      bath(formalin(1250), [{ ...trout, lifeStage: 'egg' }], 16),
      ['stop formalin-too-long'],
    ],
    ['penaeid shrimp, 3 h 30', bath(formalin(75), [shrimp], 210), []],
    ['penaeid shrimp, 4 h 05', bath(formalin(75), [shrimp], 245), ['stop formalin-too-long']],
    ['finfish, 60 min', bath(formalin(200), [cichlid], 60), []],
    // Our reading of the same rule.
    [
      'finfish, 61 min at 26 µL/L',
      bath(formalin(26), [cichlid], 61),
      ['stop formalin-too-long-for-strength'],
    ],
    ['finfish, 61 min at 25 µL/L', bath(formalin(25), [cichlid], 61), []],
    [
      'finfish, indefinite at 26 µL/L',
      bath(formalin(26), [cichlid], 0, { order: { timing: known('indefinite') } }),
      ['stop formalin-indefinite'],
    ],
    [
      'finfish, indefinite at 25 µL/L',
      bath(formalin(25), [cichlid], 0, { order: { timing: known('indefinite') } }),
      [],
    ],
    [
      'eggs, indefinite',
      bath(formalin(20), [{ ...trout, lifeStage: 'egg' }], 0, { order: { timing: known('indefinite') } }),
      ['stop formalin-indefinite-not-allowed'],
    ],
    [
      'finfish, time not stated',
      bath(formalin(200), [cichlid], 0, { order: { contactMinutes: unknown() } }),
      ['stop formalin-time-unknown'],
    ],
    [
      'nobody known, 16 min',
      bath(formalin(20), [], 16, { animals: { inWater: unknown() } }),
      ['stop formalin-too-long'],
    ],
    [
      'two baths of 2 h 05 in a day for shrimp',
      bath(formalin(75), [shrimp], 125, { order: { contactMinutesPerDay: known(250) } }),
      ['stop formalin-too-long'],
    ],
  ])('%s', (_, facts, expected) => expect(firedBy('R04', facts)).toEqual(expected))
  it('is not judged in ponds', () => {
    expect(firedBy('R04', bath(formalin(25), [cichlid], 600, { order: { setting: known('pond') } }))).toEqual(
      [],
    )
  })
})

describe('R06: warm water', () => {
  it.each<[string, CautionFacts, string[]]>([
    [
      '200 µL/L (216 mg product/L), cichlid, 26 °C',
      bath(formalin(200), [cichlid], 45, warm(26)),
      ['warning formalin-in-warm-water'],
    ],
    [
      '140 µL/L (151.2 mg product/L), cichlid, 24 °C',
      bath(formalin(140), [cichlid], 45, warm(24)),
      ['warning formalin-in-warm-water'],
    ],
    ['138 µL/L (149.0 mg product/L), cichlid, 24 °C', bath(formalin(138), [cichlid], 45, warm(24)), []],
    ['200 µL/L at exactly 21 °C', bath(formalin(200), [cichlid], 45, warm(21)), []],
    [
      '200 µL/L, temperature unknown',
      bath(formalin(200), [cichlid], 45, { water: { temperatureC: unknown() } }),
      ['warning formalin-temperature-unknown'],
    ],
    ['shrimp alone', bath(formalin(90), [shrimp], 45, warm(26)), []],
  ])('%s', (_, facts, expected) => expect(firedBy('R06', facts)).toEqual(expected))
})

describe('R02: oxygen that formalin takes', () => {
  const left = (target: DoseTarget, change: Change = {}) =>
    bath(target, [cichlid], 0, { ...change, order: { timing: known('indefinite'), ...change?.order } })
  it('25 µL/L indefinite takes 5.4 of 7.8 mg/L: warning while aerated and logged, else stop', () => {
    const facts = left(formalin(25))
    expect(firedBy('R02', facts)).toEqual(['warning oxygen-would-fall'])
    const told = cautions(facts).find(({ ruleId }) => ruleId === 'R02')
    if (told?.code !== 'oxygen-would-fall') throw new Error('R02 did not fire')
    expect(told.params.takes.value).toBeCloseTo(5.4, 9)
    expect(told.params.predicted.value).toBeCloseTo(2.4, 9)
    expect(firedBy('R02', left(formalin(25), { lifeSupport: { aeration: known('off') } }))).toEqual([
      'stop oxygen-would-fall',
    ])
    expect(firedBy('R02', left(formalin(25), { water: { oxygenIsLogged: unknown() } }))).toEqual([
      'stop oxygen-would-fall',
    ])
  })
  it('passes where enough is left, and is silent for a timed bath', () => {
    expect(firedBy('R02', left(formalin(12)))).toEqual([])
    expect(firedBy('R02', bath(formalin(200), [cichlid], 45))).toEqual([])
  })
  it('wants a fresher reading before the dose than at signing', () => {
    const facts = left(formalin(12), { water: { oxygenMgPerL: read(7.8, 600) } })
    expect(firedBy('R02', facts)).toEqual([])
    expect(firedBy('R02', facts, 'start')).toEqual(['warning oxygen-fall-unknown'])
  })
})

describe('R01, R07: before the first drop', () => {
  it.each<[string, Change, string[]]>([
    ['oxygen 5.0', { water: { oxygenMgPerL: read(5) } }, []],
    ['oxygen 4.9', { water: { oxygenMgPerL: read(4.9) } }, ['stop oxygen-low']],
    ['30 min old', { water: { oxygenMgPerL: read(7, 30) } }, []],
    ['31 min old', { water: { oxygenMgPerL: read(7, 31) } }, ['stop oxygen-old']],
    ['unknown', { water: { oxygenMgPerL: unknown() } }, ['stop oxygen-unknown']],
  ])('R01: %s', (_, change, expected) =>
    expect(firedBy('R01', bath(formalin(200), [cichlid], 45, change), 'start')).toEqual(expected),
  )
  it('R07: stops for a fault, and until somebody has looked', () => {
    const of = (storageFault: CautionFacts['lot']['storageFault']) =>
      firedBy('R07', bath(formalin(200), [cichlid], 45, { lot: { storageFault } }), 'start')
    expect([of(known(true)), of(unknown()), of(known(false))]).toEqual([
      ['stop formalin-storage-fault'],
      ['stop formalin-storage-unknown'],
      [],
    ])
  })
})

describe('R03: ponds', () => {
  const pond = (change: Change = {}) =>
    bath(formalin(20), [cichlid], 0, {
      ...change,
      order: { setting: known('pond'), timing: known('indefinite') },
    })
  it.each<[string, Change, string[]]>([
    ['27 °C', warm(27), []],
    ['27.1 °C', warm(27.1), ['stop pond-warm']],
    ['no temperature', { water: { temperatureC: unknown() } }, ['stop pond-temperature-unknown']],
    ['bloom', { water: { hasBloom: known(true) } }, ['stop pond-bloom']],
    ['bloom not told', { water: { hasBloom: unknown() } }, ['stop pond-bloom-unknown']],
    [
      'striped bass',
      { animals: { inWater: known([anAnimal('teleost', { scientificName: 'Morone saxatilis' })]) } },
      ['stop pond-striped-bass'],
    ],
    ['nobody known', { animals: { inWater: unknown() } }, ['stop inhabitants-unknown']],
  ])('%s', (_, change, expected) => {
    const facts = pond(change)
    const inWater = change?.animals?.inWater ?? facts.animals.inWater
    expect(firedBy('R03', { ...facts, animals: { ...facts.animals, inWater } })).toEqual(expected)
  })
})

describe('R08: formalin and permanganate', () => {
  const ended = (hoursBefore: number) =>
    known([
      {
        agent: 'formalin' as const,
        orderNumber: 'TO-0700',
        state: 'ended' as const,
        from: minutesAgo(hoursBefore * 60 + 60),
        until: minutesAgo(hoursBefore * 60),
      },
    ])
  const kmno = (agentUses: CautionFacts['history']['agentUses']) =>
    someFacts(
      'potassium-permanganate',
      { value: 2, unit: 'mg/L', basis: 'active' },
      { history: { agentUses } },
    )
  it('71 h after formalin is a stop that nobody overrides; 73 h passes', () => {
    expect(firedBy('R08', kmno(ended(71)))).toEqual(['stop formalin-and-permanganate'])
    expect(firedBy('R08', kmno(ended(71)), 'start')).toEqual(['stop formalin-and-permanganate'])
    expect(cautions(kmno(ended(71))).find(({ ruleId }) => ruleId === 'R08')?.overridable).toBe(false)
    expect(firedBy('R08', kmno(ended(73)))).toEqual([])
    expect(firedBy('R08', kmno(ended(72)))).toEqual([])
  })
  it('stops while the other runs, is ordered without a day, or history is unknown', () => {
    const running = known([
      {
        agent: 'formalin' as const,
        orderNumber: 'TO-0700',
        state: 'running' as const,
        from: minutesAgo(60),
        until: null,
      },
    ])
    const ordered = known([
      {
        agent: 'formalin' as const,
        orderNumber: 'TO-0700',
        state: 'ordered' as const,
        from: null,
        until: null,
      },
    ])
    expect(firedBy('R08', kmno(running))).toEqual(['stop formalin-and-permanganate-together'])
    expect(firedBy('R08', kmno(ordered))).toEqual(['stop formalin-and-permanganate-together'])
    expect(firedBy('R08', kmno(unknown()))).toEqual(['stop agent-history-unknown'])
  })
  it('looks ahead as well: permanganate planned 48 h after this bath', () => {
    const from = new Date(Date.parse(at) + 48 * 3_600_000).toISOString()
    const planned = known([
      {
        agent: 'potassium-permanganate' as const,
        orderNumber: 'TO-0750',
        state: 'ordered' as const,
        from,
        until: null,
      },
    ])
    expect(firedBy('R08', bath(formalin(200), [cichlid], 45, { history: { agentUses: planned } }))).toEqual([
      'stop formalin-and-permanganate',
    ])
    const later = new Date(Date.parse(at) + 74 * 3_600_000).toISOString()
    const far = known([
      {
        agent: 'potassium-permanganate' as const,
        orderNumber: 'TO-0750',
        state: 'ordered' as const,
        from: later,
        until: null,
      },
    ])
    expect(firedBy('R08', bath(formalin(200), [cichlid], 45, { history: { agentUses: far } }))).toEqual([])
  })
})

describe('a quiet bath', () => {
  it('fires nothing at signing, and only the second calculation is not asked again before a later dose', () => {
    const facts = bath(formalin(150), [cichlid], 45)
    expect(fired(facts)).toEqual([])
    expect(fired(facts, 'start')).toEqual([])
  })
})
