import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { sayCaution, sayRefusal } from '../../../shared/bench/words.ts'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Readonly<Record<string, string>>) =>
  (await ask(id, given)).cautions.map((one) => one.code)

/** The cautions of an answer that can hurt, said in words. */
async function warningsOf(id: string, given: Readonly<Record<string, string>>): Promise<string[]> {
  const of = calculatorAt(id)
  const { cautions } = await ask(id, given)
  return cautions.filter(({ level }) => level === 'warning').map((one) => (of ? sayCaution(of, one) : ''))
}

/** Every word that a refusal can be said in is there. */
function expectWords(id: string, codes: readonly string[]): void {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  for (const code of codes) expect(sayRefusal(of, { code })).toMatch(/ .*\.$/)
}

describe('a tricaine bath', () => {
  const given = {
    ...{ find: 'stock', plane: 'surgery', target: '100 mg/L', filling: 'filled-up', volume: '10 L' },
    ...{ strength: '10 g/L', bottle: 'dated', buffer: 'now', ratio: '2 ratio' },
  }
  it('takes 100 mL of 10 g/L for a finished bath of 10 L at 100 mg/L, with its powder and buffer', async () => {
    // check values tri.01 and tri.03: 100 mL ± 1e-9, two parts of bicarbonate to one (computed; common practice)
    const { figures, cautions } = await ask('tricaine-bath', given)
    expect(figures.map(({ key, value, unit }) => [key, value, unit])).toEqual([
      ['stock', 100, 'mL'],
      ['tricaine', 1, 'g'],
      ['buffer', 2, 'g'],
    ])
    const codes = cautions.map((one) => one.code)
    expect(codes).toEqual(
      expect.arrayContaining(['plane-surgery', 'finished-bath', 'licensed', 'food-fish', 'buffer-practice']),
    )
    expect((await warningsOf('tricaine-bath', given)).join(' ')).toMatch(/Watch.*pH|pH.*Watch/s)
  })
  it('takes 101.01 mL on top of 10 L', async () => {
    // check value tri.02: 101.01 mL ± 0.002 (computed)
    const { figures, cautions } = await ask('tricaine-bath', { ...given, filling: 'on-top' })
    expect(Math.abs(figures[0].value - 101.01)).toBeLessThanOrEqual(0.002)
    expect(cautions.map((one) => one.code)).toContain('water-before')
  })
  it('carries the errors of volume and stock', async () => {
    const errors = { volumeError: '5 percent', strengthTolerance: '10 percent' }
    const { range } = await ask('tricaine-bath', { ...given, ...errors })
    expect(range?.low).toBeCloseTo((100 * 0.95) / 1.1, 9)
    expect(range?.high).toBeCloseTo((100 * 1.05) / 0.9, 9)
  })
  it('finds 161.23 mg/L where a recipe says 168', async () => {
    // check values tri.04 (published, a university's guideline) and tri.05 (computed): 168 and 161.23 ± 0.01
    const reached = {
      ...{ find: 'reached', plane: 'sedation', volume: '100 mL', poured: '4.2 mL', bottle: 'dated' },
      strength: '4 mg/mL',
    }
    const { figures } = await ask('tricaine-bath', reached)
    expect(figures[0].key).toBe('reached')
    expect(Math.abs(figures[0].value - 161.23)).toBeLessThanOrEqual(0.01)
    expect(figures[1]?.key).toBe('nominal')
    expect(Math.abs((figures[1]?.value ?? 0) - 168)).toBeLessThanOrEqual(0.01)
  })
  it('makes a bottle of stock with its buffer', async () => {
    // check value tri.03: 10 g of tricaine and 20 g of bicarbonate ± 1e-9 (common practice)
    const make = { find: 'make', strength: '1 percent_w_v', made: '1 L', buffer: 'now', ratio: '2 ratio' }
    const { figures, cautions } = await ask('tricaine-bath', make)
    expect(figures.map(({ key, value }) => [key, value])).toEqual([
      ['powder', 10],
      ['buffer', 20],
    ])
    expect(cautions.map((one) => one.code)).toContain('powder')
    const elsewhere = await ask('tricaine-bath', { ...make, buffer: 'other', ratio: '' })
    expect(elsewhere.figures).toHaveLength(1)
    expect(elsewhere.cautions.find(({ code }) => code === 'buffer-other')?.level).toBe('warning')
  })
  it('reads a dilution of 1 to 20,000 as 50 mg/L', async () => {
    // check values tri.07 and tri.08: 50 and 1,000 mg/L ± 1e-9 (label range, from memory)
    const asked = { find: 'dilution', parts: '20000 ratio' }
    expect((await ask('tricaine-bath', asked)).figures[0].value).toBeCloseTo(50, 9)
    expect((await ask('tricaine-bath', { ...asked, parts: '1000 ratio' })).figures[0].value).toBeCloseTo(
      1000,
      9,
    )
  })
  it('says with a warning that a bath kills', async () => {
    const warnings = await warningsOf('tricaine-bath', { ...given, plane: 'euthanasia', target: '500 mg/L' })
    expect(warnings.join(' ')).toMatch(/kill/)
    expect(warnings.join(' ')).not.toMatch(/breathing/)
    expect(await codesOf('tricaine-bath', { ...given, target: '2000 mg/L' })).toContain('not-plausible')
  })
  it.each([
    ['a target at the stock', { target: '10 g/L' }, 'target target-not-below-stock'],
    [
      'a target above the stock on top',
      { target: '12 g/L', filling: 'on-top' },
      'target target-not-below-stock',
    ],
    ['no buffer', { buffer: 'none' }, 'buffer unbuffered-stock'],
    ['a buffer of nothing', { ratio: '0 ratio' }, 'ratio unbuffered-stock'],
    ['a stock without a date', { bottle: 'undated' }, 'bottle undated-stock'],
    ['a depth that nobody chose', { plane: '' }, 'plane plane-not-stated'],
    ['no target', { target: '0 mg/L' }, 'target not-above-zero'],
    ['a negative stock', { strength: '-1 g/L' }, 'strength not-above-zero'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('tricaine-bath', { ...given, ...change })).toEqual([refused])
  })
  it('has words for its refusals', () => {
    expectWords('tricaine-bath', [
      ...['target-not-below-stock', 'unbuffered-stock', 'undated-stock', 'plane-not-stated'],
    ])
  })
})

describe('a strength of tricaine against what it is meant for', () => {
  const bath = {
    ...{ find: 'stock', filling: 'filled-up', volume: '10 L', strength: '10 g/L', bottle: 'dated' },
    ...{ buffer: 'now', ratio: '2 ratio' },
  }
  // 21 CFR 529.2503: fish 15 to 330 mg/L; sedation 50 to 75 mg/L is from memory
  it.each([
    ['sedation', '500 mg/L', 'above-label'],
    ['sedation', '100 mg/L', 'deep-for-sedation'],
    ['sedation', '75 mg/L', undefined],
    ['surgery', '100 mg/L', undefined],
    ['surgery', '331 mg/L', 'above-label'],
    ['surgery', '10 mg/L', 'below-label'],
    ['euthanasia', '100 mg/L', 'may-recover'],
    ['euthanasia', '500 mg/L', undefined],
  ])('%s at %s: %s', async (plane, target, code) => {
    const doubts = ['above-label', 'deep-for-sedation', 'below-label', 'may-recover']
    const { cautions } = await ask('tricaine-bath', { ...bath, plane, target })
    const found = cautions.filter((one) => doubts.includes(one.code))
    expect(found.map((one) => one.code)).toEqual(code === undefined ? [] : [code])
    for (const { level } of found) expect(level).toBe('warning')
  })
})

describe('dechlorination', () => {
  it('gives its range in the unit of the result, also where grams become kilograms', async () => {
    // 200 mg/L × 700 L × 7.4 = 1,036 g, ± 5 % of the volume: 0.984…1.088 kg (by hand)
    const { figures, range } = await ask('dechlorination', {
      water: 'spent-disinfectant',
      form: 'pentahydrate',
      chlorine: '200 mg/L',
      volume: '700 L',
      volumeError: '5 percent',
    })
    expect(figures[0]).toMatchObject({ unit: 'kg', rounded: '1.04' })
    expect(range?.low).toBeCloseTo(0.9842, 4)
    expect(range?.high).toBeCloseTo(1.0878, 4)
  })
  const given = {
    water: 'spent-disinfectant',
    form: 'pentahydrate',
    chlorine: '200 mg/L',
    volume: '1 gal_us',
  }
  it('takes 5.6 g for a gallon of 200 mg/L', async () => {
    // check value dechl.04: 5.6 g ± 0.05 (published, Piper et al. 1982, p. 283)
    const { figures } = await ask('dechlorination', given)
    expect(figures[0]).toMatchObject({ key: 'amount', unit: 'g' })
    expect(Math.abs(figures[0].value - 5.6)).toBeLessThanOrEqual(0.05)
  })
  it('gives both ends of the practice, and the equation beside', async () => {
    // check values dechl.05 (1,400 g at 7) and dechl.01 (7.001 ± 0.002 mg/mg) (computed)
    const { figures } = await ask('dechlorination', { ...given, volume: '1000 L' })
    expect(figures.map(({ key }) => key)).toEqual(['amount', 'least', 'equation'])
    expect(figures[0]).toMatchObject({ unit: 'kg', value: 1.48 })
    expect(figures[1]?.value).toBeCloseTo(1.4, 9)
    expect(Math.abs((figures[2]?.value ?? 0) - 1.4002)).toBeLessThanOrEqual(0.0004)
  })
  it('takes 0.637 of the anhydrous salt', async () => {
    // check value dechl.02: 4.460 against 7.001 mg for a milligram (computed)
    const anhydrous = await ask('dechlorination', { ...given, form: 'anhydrous' })
    const crystals = await ask('dechlorination', given)
    expect(anhydrous.figures[0].value / crystals.figures[0].value).toBeCloseTo(0.637, 3)
  })
  const tap = { ...given, water: 'tap-water', chlorine: '2 mg/L', volume: '500 L' }
  it('takes ten times the chlorine for tap water', async () => {
    // check value dechl.06: 10 g ± 1e-9 (common practice)
    const { figures, cautions } = await ask('dechlorination', tap)
    expect(figures[0].value).toBeCloseTo(10, 9)
    expect(figures.map(({ key }) => key)).toEqual(['amount', 'equation'])
    expect(cautions.map((one) => one.code)).toContain('chloramine-asked')
    expect(cautions.find(({ code }) => code === 'measured-zero')?.level).toBe('warning')
  })
  it('says what ammonia chloramine leaves, with a warning', async () => {
    // check value dechl.08: 0.593 mg/L ± 0.001 of N from 3 mg/L (computed)
    const chloramine = { ...tap, chlorine: '3 mg/L', chloramine: '3 mg/L' }
    const { figures, cautions } = await ask('dechlorination', chloramine)
    const ammonia = figures.find(({ key }) => key === 'ammonia')
    expect(Math.abs((ammonia?.value ?? 0) - 0.593)).toBeLessThanOrEqual(0.001)
    expect(cautions.find(({ code }) => code === 'ammonia-left')?.level).toBe('warning')
    expect(cautions.map((one) => one.code)).not.toContain('chloramine-asked')
  })
  it('carries the errors of the test and the volume, and needs nothing for no chlorine', async () => {
    const { range } = await ask('dechlorination', {
      ...tap,
      chlorineError: '10 percent',
      volumeError: '5 percent',
    })
    expect(range?.high).toBeCloseTo(10 * 1.1 * 1.05, 9)
    expect((await ask('dechlorination', { ...tap, chlorine: '0 mg/L' })).figures[0].value).toBe(0)
  })
  it.each([
    ['a form that is not said', { form: '' }, 'form thiosulfate-form-not-stated'],
    ['a water that is not said', { water: '' }, 'water chlorinated-water-not-stated'],
    ['a negative reading', { chlorine: '-1 mg/L' }, 'chlorine below-least'],
    ['no reading', { chlorine: '' }, 'chlorine blank'],
    ['more chloramine than chlorine', { chloramine: '4 mg/L' }, 'chloramine chloramine-above-chlorine'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('dechlorination', { ...tap, ...change })).toEqual([refused])
  })
  it('has words for its refusals', () => {
    expectWords('dechlorination', [
      ...['thiosulfate-form-not-stated', 'chlorinated-water-not-stated', 'chloramine-above-chlorine'],
    ])
  })
})

describe('a bleach solution', () => {
  const given = { target: '200 mg/L', volume: '100 L', strength: '5.25 percent_w_v' }
  it('takes 380.95 mL of 5.25 % for 100 L at 200 mg/L', async () => {
    // check value dechl.07: 380.95 mL ± 0.01 (computed)
    const { figures } = await ask('bleach-solution', given)
    expect(Math.abs(figures[0].value - 380.95)).toBeLessThanOrEqual(0.01)
    expect((await ask('bleach-solution', { ...given, division: '10 mL' })).figures[0].rounded).toBe('380')
    const warnings = await warningsOf('bleach-solution', given)
    expect(warnings.join(' ')).toMatch(/acid, ammonia/)
  })
  it('carries the tolerance of the bleach', async () => {
    const { range } = await ask('bleach-solution', { ...given, strengthTolerance: '20 percent' })
    expect(range?.high).toBeCloseTo(380.952381 / 0.8, 5)
  })
  it('doubts a bleach of 0.5 %', async () => {
    expect(await codesOf('bleach-solution', { ...given, strength: '0.5 percent_w_v' })).toContain(
      'not-plausible',
    )
  })
  it.each([
    ['a solution stronger than its bleach', { target: '60 g/L' }, 'target target-above-bleach'],
    ['a bare percentage', { strength: '5.25 %' }, 'strength percent-not-stated'],
    ['a bleach of 30 %', { strength: '30 percent_w_v' }, 'strength above-most'],
    ['too little to measure', { division: '1 L' }, 'division too-little-to-measure'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('bleach-solution', { ...given, ...change })).toEqual([refused])
  })
  it('has words for its refusals', () => {
    expectWords('bleach-solution', ['target-above-bleach'])
  })
})
