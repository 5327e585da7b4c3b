import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { sayCaution } from '../../../shared/bench/words.ts'
import { copperMarineLevel } from '../../../shared/domain/cautions/rules/r12-copper-marine-level.ts'
import { injectionSites, injectionVolumeRange } from '../../../shared/domain/injection/injection-volume.ts'
import { ask, refusalsOf } from './ask.ts'

type Body = Readonly<Record<string, string>>

/** Codes of the warnings of an answer. */
const warningsOf = async (id: string, given: Body) =>
  (await ask(id, given)).cautions.filter(({ level }) => level === 'warning').map(({ code }) => code)

/** A caution of an answer in words. */
async function said(id: string, given: Body, code: string): Promise<string> {
  const of = calculatorAt(id)
  const caution = (await ask(id, given)).cautions.find((one) => one.code === code)
  return of && caution ? sayCaution(of, caution) : ''
}

describe('copper sulfate by a target of the compound', () => {
  const given = { product: 'pentahydrate', targetOf: 'compound', target: '1 mg/L', volume: '1000 L' }
  it('takes the copper that a test found off the target, as the compound', async () => {
    // 1 − 0.1 × 249.685/63.546 = 0.607080 mg/L of the compound, 0.60708 g in 1,000 L (by hand; IUPAC abridged weights)
    const { figures, working } = await ask('copper-sulfate', { ...given, measured: '0.1 mg/L' })
    expect(figures[0].value).toBeCloseTo(0.60708, 5)
    expect(working.map(({ code }) => code)).toContain('reading-as-compound')
    const micrograms = await ask('copper-sulfate', { ...given, measured: '100 ug/L' })
    expect(micrograms.figures[0].value).toBeCloseTo(0.60708, 5)
    expect((await ask('copper-sulfate', given)).figures[0].value).toBeCloseTo(1, 9)
  })
  it('adds nothing to copper that is at the target or above it', async () => {
    // 0.2 mg/L of the compound is 0.050901 mg/L of copper
    const low = { ...given, target: '0.2 mg/L' }
    for (const measured of ['0.3 mg/L', '0.051 mg/L', '51 ug/L'])
      expect(refusalsOf('copper-sulfate', { ...low, measured })).toEqual([
        'measured reading-at-or-above-target',
      ])
    const below = await ask('copper-sulfate', { ...low, measured: '0.05 mg/L' })
    expect(below.figures[0].value).toBeCloseTo(0.2 - (0.05 * 249.685) / 63.546, 9)
  })
  it('takes a reading of no copper', async () => {
    expect((await ask('copper-sulfate', { ...given, measured: '0 mg/L' })).figures[0].value).toBeCloseTo(1, 9)
  })
})

describe('a target of free copper', () => {
  const given = { product: 'pentahydrate', targetOf: 'copper', volume: '1000 L' }
  it('is doubted above what marine systems are kept at', async () => {
    for (const target of ['2 mg/L', '0.21 mg/L', '2000 ug/L'])
      expect(await warningsOf('copper-sulfate', { ...given, target })).toContain('above-usual')
    for (const target of ['0.2 mg/L', '200 ug/L', '0.2 g/m3', '0.15 mg/L'])
      expect(await warningsOf('copper-sulfate', { ...given, target })).not.toContain('above-usual')
    const words = await said('copper-sulfate', { ...given, target: '2 mg/L' }, 'above-usual')
    const { lowMgPerL: low, highMgPerL: high } = copperMarineLevel.parameters
    expect([low?.default, high?.default]).toEqual([0.15, 0.2])
    expect(words).toMatch(/0\.15 to 0\.2 mg\/L.*from memory.*decimal/)
  })
  it('is another matter where the target is of the compound', async () => {
    const compound = { ...given, targetOf: 'compound', target: '2 mg/L' }
    expect(await warningsOf('copper-sulfate', compound)).not.toContain('above-usual')
  })
})

describe('a change of salinity without steps', () => {
  const given = { start: '35 PSS-78', target: '16 PSS-78', replacement: '0 PSS-78', volume: '2000 L' }
  it.each(['once', 'through'])('is doubted where it is more than usual in a day: %s', async (way) => {
    const warnings = (change: Body = {}) => warningsOf('salinity-change', { ...given, way, ...change })
    expect(await warnings()).toContain('within-a-day')
    expect(await warnings({ target: '31 PSS-78' })).not.toContain('within-a-day')
    expect(await warnings({ start: '30.3 PSS-78', target: '26.3 PSS-78' })).not.toContain('within-a-day')
    expect(await warnings({ target: '30.9 PSS-78' })).toContain('within-a-day')
    const up = { start: '30 PSS-78', replacement: '40 PSS-78' }
    expect(await warnings({ ...up, target: '33 PSS-78' })).not.toContain('within-a-day')
    expect(await warnings({ ...up, target: '33.5 PSS-78' })).toContain('within-a-day')
    const words = await said('salinity-change', { ...given, way }, 'within-a-day')
    expect(words).toMatch(/4 a day, no source/)
  })
  it('says how the water of a dip has to be', async () => {
    for (const way of ['once', 'through']) {
      expect(await warningsOf('salinity-change', { ...given, way })).toContain('dip')
      const words = await said('salinity-change', { ...given, way }, 'dip')
      expect(words).toMatch(/±1 °C.*±0\.2.*dechlorinate.*aerate.*from memory/)
    }
    const salty = { way: 'once', target: '34 PSS-78', replacement: '20 PSS-78' }
    expect(await warningsOf('salinity-change', { ...given, ...salty })).not.toContain('dip')
  })
  it('is not said of daily steps', async () => {
    const warnings = await warningsOf('salinity-change', { ...given, way: 'steps', perDay: '3 PSS-78' })
    expect(warnings).toEqual(['order'])
  })
})

describe('a bath by volume', () => {
  const given = { target: '25 uL/L', basis: 'product', volume: '1000 L', form: 'liquid' }
  it('says what formalin does to water and animals', async () => {
    for (const target of ['25 uL/L', '0.025 mL/L', '25 mL/m3', '0.0025 percent_v_v'])
      expect(await warningsOf('bath-dose', { ...given, target })).toContain('formalin')
    expect(await said('bath-dose', given, 'formalin')).toMatch(
      /oxygen.*warm, soft or acid.*white precipitate.*[Aa]erate.*flush/,
    )
    const weighed = { ...given, target: '25 mg/L', density: '1.08 g/mL' }
    expect(await warningsOf('bath-dose', weighed)).not.toContain('formalin')
  })
  it('says it of a make-up dose too', async () => {
    const change = { ...given, after: 'change', changed: '500 L' }
    expect(await warningsOf('make-up-dose', change)).toEqual([
      'taken-at-target',
      'formalin',
      'formalin-people',
    ])
    const strong = await warningsOf('make-up-dose', { ...change, target: '2.5 mL/L' })
    expect(strong).toEqual(['taken-at-target', 'above-labels', 'formalin', 'formalin-people'])
    expect(await said('make-up-dose', change, 'formalin')).toMatch(/white precipitate/)
  })
  it('is doubted above the highest figure of a label', async () => {
    for (const target of ['2001 uL/L', '25 mL/L', '0.25 percent_v_v'])
      expect(await warningsOf('bath-dose', { ...given, target })).toContain('above-labels')
    for (const target of ['2000 uL/L', '2 mL/L', '0.2 percent_v_v'])
      expect(await warningsOf('bath-dose', { ...given, target })).not.toContain('above-labels')
    expect(await said('bath-dose', { ...given, target: '25 mL/L' }, 'above-labels')).toMatch(
      /2,000 µL\/L.*eggs/,
    )
  })
  it('doubts a strength above 1,000 mg/mL', async () => {
    const active = { ...given, target: '75 mg/L', basis: 'active', strengthOf: 'active' }
    for (const strength of ['1001 mg/mL', '101 percent_w_v', '1.1 g/mL_w_v'])
      expect(await warningsOf('bath-dose', { ...active, strength })).toContain('not-plausible')
    for (const strength of ['1000 mg/mL', '100 percent_w_v', '396.1 mg/mL'])
      expect(await warningsOf('bath-dose', { ...active, strength })).not.toContain('not-plausible')
  })
})

describe('an injection for more than one site', () => {
  // 29 mL: 20 mg/kg, 145 kg, 100 mg/mL (check value inj.05, computed)
  const given = { dose: '20 mg/kg', weight: '145 kg', strength: '100 mg/mL' }
  it('is divided above the largest volume of one site', async () => {
    const { figures, working } = await ask('injection', { ...given, mostPerSite: '10 mL' })
    expect(figures[0]).toMatchObject({ key: 'volume', value: 29 })
    expect(figures.find(({ key }) => key === 'sites')).toMatchObject({ value: 3, rounded: '3' })
    expect(figures.find(({ key }) => key === 'each')?.value).toBeCloseTo(29 / 3, 9)
    expect(working.map(({ key }) => key)).toEqual(['drug', 'volume', 'sites', 'each'])
    expect(await warningsOf('injection', { ...given, mostPerSite: '10 mL' })).toContain('divide')
    expect(await said('injection', { ...given, mostPerSite: '10 mL' }, 'divide')).toMatch(/3 sites/)
  })
  it('goes by what the syringe takes', async () => {
    // 1.005 mL is taken as 1.01 mL
    const half = { dose: '1 mg/kg', weight: '1.005 kg', strength: '1 mg/mL', graduation: '0.01 mL' }
    const divided = await ask('injection', { ...half, mostPerSite: '1005 uL' })
    expect(divided.figures.find(({ key }) => key === 'sites')?.value).toBe(2)
    expect(divided.figures.find(({ key }) => key === 'each')?.value).toBeCloseTo(0.505, 9)
    const steps = { ...half, graduation: '10 uL' }
    expect((await ask('injection', { ...steps, mostPerSite: '0.5 mL' })).figures.at(-1)?.value).toBeCloseTo(
      1.01 / 3,
      9,
    )
  })
  it('stays in one site up to that volume, and where none was stated', async () => {
    for (const mostPerSite of ['29 mL', '30 mL', '']) {
      const { figures } = await ask('injection', { ...given, mostPerSite })
      expect(figures.map(({ key }) => key)).not.toContain('sites')
      expect(await warningsOf('injection', { ...given, mostPerSite })).not.toContain('divide')
    }
  })
  it('counts no site for the last binary digit', async () => {
    // 0.4 × 12 ÷ 5 = 0.96 mL, twice 0.48 and thrice 0.32
    const whole = { dose: '0.4 mg/kg', weight: '12 kg', strength: '5 mg/mL' }
    for (const [mostPerSite, sites] of [
      ['0.48 mL', 2],
      ['0.32 mL', 3],
    ] as const)
      expect(
        (await ask('injection', { ...whole, mostPerSite })).figures.find(({ key }) => key === 'sites')?.value,
      ).toBe(sites)
  })
  it.each([
    ['a site that takes nothing', { mostPerSite: '0 mL' }, 'mostPerSite not-above-zero'],
    ['a strength in mg/L', { strength: '100 mg/L' }, 'strength strength-of-a-water'],
    ['a strength in µg/L', { strength: '100 ug/L' }, 'strength strength-of-a-water'],
    ['a strength in g/m³', { strength: '100 g/m3' }, 'strength strength-of-a-water'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('injection', { ...given, ...change })).toEqual([refused])
  })
  it('says what the errors of weight and strength make of it, in the unit of the syringe', async () => {
    // 29 × 1.1 ÷ 0.95 = 33.578947 and 29 × 0.9 ÷ 1.05 = 24.857143 mL (by hand)
    const errors = { weightError: '10 percent', strengthTolerance: '5 percent' }
    const { range, cautions } = await ask('injection', { ...given, ...errors })
    expect(range?.low).toBeCloseTo(24.857143, 6)
    expect(range?.high).toBeCloseTo(33.578947, 6)
    expect(cautions.map(({ code }) => code)).not.toContain('range-not-known')
    const steps = await ask('injection', { ...given, ...errors, graduation: '100 uL' })
    expect(steps.range?.high).toBeCloseTo(33_578.947, 3)
    const exact = { ...given, weightError: '0 percent' }
    expect((await ask('injection', exact)).range).toBeNull()
  })
  it('takes the strengths of labels', async () => {
    for (const strength of ['100 mg/mL', '100 g/L', '10 percent_w_v', '0.1 g/mL_w_v'])
      expect((await ask('injection', { ...given, strength })).figures[0].value).toBeCloseTo(29, 9)
  })
})

describe('the sites of an injection', () => {
  it('are the fewest of which none gets more than it may', () => {
    for (const [volume, most, sites] of [
      [29, 10, 3],
      [30, 10, 3],
      [30.001, 10, 4],
      [5, 10, 1],
      [0.1 + 0.2, 0.3, 1],
    ] as const)
      expect(injectionSites(volume, most)).toEqual({ ok: true, value: sites })
  })
  it('are refused of figures that mean nothing', () => {
    for (const [volume, most] of [
      [0, 1],
      [1, 0],
      [NaN, 1],
      [1, Infinity],
      [1e300, 1e-300],
    ] as const)
      expect(injectionSites(volume, most).ok).toBe(false)
    expect(injectionVolumeRange(1, { weightPercent: 91, strengthPercent: 0 }).ok).toBe(false)
    expect(injectionVolumeRange(NaN, { weightPercent: 1, strengthPercent: 0 }).ok).toBe(false)
  })
})

describe('a displaced share of nothing', () => {
  it('is one that nobody measured', async () => {
    const given = { shape: 'rectangular', length: '120 cm', width: '50 cm', depth: '45 cm' }
    for (const displaced of ['0 percent', '0.0 percent']) {
      const { figures, cautions } = await ask('tank-volume', { ...given, displaced })
      expect(figures[0].value).toBeCloseTo(270, 9)
      expect(cautions[0]).toMatchObject({ code: 'displacement-not-measured', level: 'warning' })
      expect(cautions.map(({ code }) => code)).not.toContain('displacement-guessed')
    }
    const guessed = await ask('tank-volume', { ...given, displaced: '12 percent' })
    expect(guessed.cautions[0]?.code).toBe('displacement-guessed')
  })
})

describe('a contact time of ozone', () => {
  it('warns of sea water and of a system under treatment', async () => {
    const bucket = { find: 'ct', residual: '0.4 mg/L', contact: 'still', time: '10 min' }
    const minutes = { find: 'minutes', residual: '0.4 mg/L', target: '1 mg_min/L' }
    for (const given of [bucket, minutes]) {
      expect(await warningsOf('contact-time', given)).toEqual(
        expect.arrayContaining(['ozone-in-sea-water', 'under-treatment']),
      )
      expect(await said('contact-time', given, 'ozone-in-sea-water')).toMatch(
        /bromine and bromate.*from memory.*total residual oxidants/,
      )
      expect(await said('contact-time', given, 'under-treatment')).toMatch(/oxidant.*drug treatment/)
    }
    expect((await ask('contact-time', bucket)).sources).toContain('ozone-practice')
  })
})
