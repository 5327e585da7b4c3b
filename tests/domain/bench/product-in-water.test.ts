import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Record<string, string>) =>
  (await ask(id, given)).cautions.map((one) => `${one.level} ${one.code}`)
const lineOf = async (id: string, given: Record<string, string>, key: string) =>
  (await ask(id, given)).working.find((one) => one.key === key)?.value

const pure = { basis: 'active', form: 'solid', strength: '100 percent_w_w', strengthOf: 'active' }

describe('the make-up of a bath', () => {
  const bath = { target: '2 mg/L', volume: '1000 L', ...pure }
  const change = { ...bath, after: 'change', changed: '300 L' }
  it('doses only the water that was changed', async () => {
    // check value wc.07: 2 mg/L × 300 L = 600 mg active (computed)
    expect((await ask('make-up-dose', change)).figures[0].value).toBeCloseTo(0.6, 12)
    expect(await lineOf('make-up-dose', change, 'active-needed')).toBeCloseTo(600, 9)
  })
  it('adds what a test shows to be missing', async () => {
    // check value wc.08: (2 − 1.35) mg/L × 1,000 L = 650 mg active ± 1e-6 (computed)
    const test = { ...bath, after: 'test', measured: '1.35 mg/L' }
    expect(Math.abs(((await lineOf('make-up-dose', test, 'active-needed')) ?? 0) - 650)).toBeLessThanOrEqual(
      1e-6,
    )
  })
  it('counts what a test before the change found', async () => {
    // 1.5 mg/L thinned by 30 % is 1.05; 0.95 mg/L × 1,000 L = 950 mg, by hand
    const tested = { ...change, before: '1.5 mg/L' }
    expect(await lineOf('make-up-dose', tested, 'active-needed')).toBeCloseTo(950, 9)
  })
  it('makes up for an expected loss, of the product by volume too', async () => {
    // check value decay.01: 17.678 % of it is left after 30 h of a 12 h half-life; 82.322 % of 2 mg/L × 1,000 L
    const loss = { ...bath, after: 'half-life', halfLife: '12 h', elapsed: '30 h' }
    expect(await lineOf('make-up-dose', loss, 'active-needed')).toBeCloseTo(1646.447, 3)
    const formalin = { ...loss, target: '25 uL/L', basis: 'product', form: 'liquid' }
    expect((await ask('make-up-dose', formalin)).figures[0]).toMatchObject({ unit: 'mL', rounded: '20.58' })
  })
  it('is rounded to the balance and carries the errors of volume and strength', async () => {
    const weighed = await ask('make-up-dose', { ...change, division: '10 mg' })
    expect(weighed.figures[0]).toMatchObject({ rounded: '600', unit: 'mg' })
    const poured = await ask('make-up-dose', { ...change, changedError: '10 percent' })
    expect(poured.range?.low).toBeCloseTo(0.54, 9)
    expect(poured.range?.high).toBeCloseTo(0.66, 9)
    // only the water that was changed is dosed: the error of the whole volume moves nothing
    expect((await ask('make-up-dose', { ...change, volumeError: '10 percent' })).range).toBeNull()
    const test = { ...bath, after: 'test', measured: '1.35 mg/L', strength: '80 percent_w_w' }
    const { range } = await ask('make-up-dose', {
      ...test,
      volumeError: '10 percent',
      strengthTolerance: '5 percent',
    })
    expect(range?.low).toBeCloseTo((0.65 / 0.8) * (0.9 / 1.05), 9)
    expect(range?.high).toBeCloseTo((0.65 / 0.8) * (1.1 / 0.95), 9)
  })
  it('warns where nothing was measured', async () => {
    expect(await codesOf('make-up-dose', change)).toContain('warning taken-at-target')
    expect(await codesOf('make-up-dose', { ...change, before: '1.5 mg/L' })).not.toContain(
      'warning taken-at-target',
    )
    const loss = { ...bath, after: 'half-life', halfLife: '12 h', elapsed: '30 h' }
    expect(await codesOf('make-up-dose', loss)).toContain('warning not-measured')
  })
  it.each([
    [
      'a test above the target',
      { after: 'test', measured: '2.4 mg/L' },
      'measured reading-at-or-above-target',
    ],
    [
      'a bath that is still at its target after the change',
      { after: 'change', changed: '300 L', before: '3 mg/L' },
      'before reading-at-or-above-target',
    ],
    [
      'more changed than there is',
      { after: 'change', changed: '1200 L' },
      'changed changed-more-than-volume',
    ],
    [
      'no loss in no time',
      { after: 'half-life', halfLife: '12 h', elapsed: '0 h' },
      'elapsed not-above-zero',
    ],
    [
      'a loss too small to count',
      { after: 'half-life', halfLife: '123 d', elapsed: '0.1 min' },
      'elapsed nothing-missing',
    ],
    [
      'a test of microlitres',
      { after: 'test', measured: '1 mg/L', target: '25 uL/L', basis: 'product', form: 'liquid' },
      'measured reading-not-comparable',
    ],
    [
      'an amount below ten divisions',
      { after: 'change', changed: '300 L', division: '100 mg' },
      'division too-little-to-measure',
    ],
    ['a target of unstated basis', { after: 'change', changed: '300 L', basis: '' }, 'basis basis-missing'],
  ])('refuses %s', (_, more, refused) => {
    expect(refusalsOf('make-up-dose', { ...bath, ...more })).toContain(refused)
  })
})

describe('the concentration that an amount makes', () => {
  const bath = { volume: '1 L', amount: '25 uL', basis: 'active', form: 'liquid', strengthOf: 'active' }
  const formalin = { ...bath, strength: '37 percent_w_w', density: '1.08 g/mL' }
  it('of 25 microlitres of formalin in a litre is 9.99 mg/L of formaldehyde', async () => {
    // check value bath.17: 25 µL/L × 0.3996 mg/µL = 9.99 mg/L ± 0.01 (computed)
    const { figures } = await ask('concentration-reached', formalin)
    expect(Math.abs(figures[0].value - 9.99)).toBeLessThanOrEqual(0.01)
  })
  it('of the product is µL/L, and mg/L too where its density is known', async () => {
    const product = { volume: '1000 L', amount: '25 mL', basis: 'product', form: 'liquid' }
    const byVolume = await ask('concentration-reached', product)
    expect(byVolume.figures.map(({ key, value, unit }) => [key, value, unit])).toEqual([
      ['by-volume', 25, 'uL/L'],
    ])
    const both = await ask('concentration-reached', { ...product, density: '1.08 g/mL' })
    expect(both.figures[1]).toMatchObject({ key: 'reached', unit: 'mg/L' })
    expect(both.figures[1]?.value).toBeCloseTo(27, 10)
  })
  it('of copper in its sulfate is a quarter of it, in a stock as in a tank', async () => {
    // check value cu.03: 1 mg/L of the pentahydrate holds 0.25451 mg/L of copper (computed)
    const sulfate = {
      amount: '1 mg',
      volume: '1 L',
      basis: 'free',
      form: 'solid',
      strength: '100 percent_w_w',
    }
    const share = { strengthOf: 'salt', share: '25.4513 percent' }
    expect((await ask('concentration-reached', { ...sulfate, ...share })).figures[0].value).toBeCloseTo(
      0.254513,
      8,
    )
  })
  it('says how far it is from what was wanted', async () => {
    const given = { amount: '16.5 g', volume: '7500 L', wanted: '2 mg/L', ...pure }
    const over = await ask('concentration-reached', given)
    // 16.5 g in 7,500 L is 2.2 mg/L, 10 % more than 2 (check value bath.13: 15 g make 2 mg/L)
    expect(over.figures[1]).toMatchObject({ key: 'difference', rounded: '10.00', unit: 'percent' })
    expect(await codesOf('concentration-reached', given)).toContain('warning above-wanted')
    expect(await codesOf('concentration-reached', { ...given, amount: '14 g' })).toContain(
      'note below-wanted',
    )
    const near = await codesOf('concentration-reached', { ...given, amount: '15.5 g' })
    expect(near.join()).not.toMatch(/wanted/)
  })
  it('carries the errors of volume and strength', async () => {
    const { range } = await ask('concentration-reached', {
      ...formalin,
      volumeError: '10 percent',
      strengthTolerance: '5 percent',
    })
    expect(range?.low).toBeCloseTo((9.99 * 0.95) / 1.1, 9)
    expect(range?.high).toBeCloseTo((9.99 * 1.05) / 0.9, 9)
  })
  it.each([
    [
      'a powder in millilitres',
      { amount: '5 mL', form: 'solid', strength: '98 percent_w_w' },
      'amount volume-unit-for-solid',
    ],
    ['a percentage by weight without a density', { strength: '37 percent_w_w' }, 'density density-missing'],
    ['a spoonful', { amount: '2 tsp', strength: '10 mg/mL' }, 'amount household-measure'],
    [
      'microlitres wanted of an active substance',
      { strength: '10 mg/mL', wanted: '25 uL/L' },
      'wanted dimensions-differ',
    ],
    ['no water', { strength: '10 mg/mL', volume: '0 L' }, 'volume not-above-zero'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('concentration-reached', { ...bath, ...change })).toEqual([refused])
  })
})

describe('a stock solution', () => {
  const make = { find: 'make', stockStrength: '10 g/L', stockVolume: '500 mL', ...pure }
  it('takes 5 g for half a litre of 10 g/L, and more of a weaker product', async () => {
    expect((await ask('stock-solution', make)).figures[0].value).toBeCloseTo(5, 12)
    const weak = await ask('stock-solution', { ...make, strength: '80 percent_w_w', division: '0.01 g' })
    expect(weak.figures[0]).toMatchObject({ rounded: '6.25', unit: 'g' })
  })
  it('takes a liquid by its strength, and a strong stock', async () => {
    // 250 g/L × 0.2 L ÷ 396.1 mg/mL (21 CFR 529.1150: 396.1 mg hydrogen peroxide in each mL) = 126.23 mL
    const liquid = {
      ...make,
      form: 'liquid',
      strength: '396.1 mg/mL',
      stockStrength: '250 g/L',
      stockVolume: '0.2 L',
    }
    expect((await ask('stock-solution', liquid)).figures[0]).toMatchObject({ rounded: '126.2', unit: 'mL' })
  })
  it('goes into a bath that is filled up afterwards, or on top of the water', async () => {
    // check values tri.01 and tri.02: 100 mg/L in 10 L from 10 g/L: 100 mL, on top 101.01 mL ± 0.002 (computed)
    const use = { find: 'use', stockStrength: '10 g/L', basis: 'active', target: '100 mg/L', volume: '10 L' }
    expect((await ask('stock-solution', { ...use, way: 'filled-up' })).figures[0].value).toBeCloseTo(100, 9)
    const onTop = await ask('stock-solution', { ...use, way: 'on-top', division: '1 mL' })
    expect(onTop.figures[0]).toMatchObject({ rounded: '101', unit: 'mL' })
    expect(onTop.working.at(-1)?.value).toBeCloseTo(101.0101, 3)
  })
  it('is priming for a bath with flow, by the same arithmetic', async () => {
    // check value drip.03: 25 mg/L in 2,000 L from 100 mg/mL = 500 mL (computed)
    const use = {
      find: 'use',
      stockStrength: '100 mg/mL',
      basis: 'active',
      target: '25 mg/L',
      volume: '2000 L',
    }
    expect((await ask('stock-solution', { ...use, way: 'filled-up' })).figures[0].value).toBeCloseTo(500, 9)
  })
  it('is labelled, must dissolve, and says which way its own volume counts', async () => {
    expect(await codesOf('stock-solution', make)).toEqual(
      expect.arrayContaining(['warning dissolves', 'warning label', 'note fill-up']),
    )
    const use = { find: 'use', stockStrength: '10 g/L', basis: 'active', target: '100 mg/L', volume: '10 L' }
    expect(await codesOf('stock-solution', { ...use, way: 'filled-up' })).toContain('note own-volume')
    const strong = { ...use, way: 'on-top', target: '2000 mg/L' }
    expect(await codesOf('stock-solution', strong)).toContain('warning raises-level')
  })
  it.each([
    [
      'a target at the strength of the stock',
      { find: 'use', way: 'on-top', target: '10 g/L', volume: '10 L' },
      'target target-not-below-stock',
    ],
    ['no stock', { stockVolume: '0 mL' }, 'stockVolume not-above-zero'],
    [
      'a liquid stock stronger than its product',
      { form: 'liquid', strength: '5 mg/mL' },
      'stockStrength target-above-strength',
    ],
    ['a strength of unstated basis', { basis: '' }, 'basis basis-missing'],
    ['too little to weigh', { division: '1 g' }, 'division too-little-to-measure'],
    ['a stock stronger than any', { stockStrength: '1.2 g/mL_w_v' }, 'stockStrength above-most'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('stock-solution', { ...make, ...change })).toContain(refused)
  })
})
