import { describe, expect, it } from 'vitest'
import { sayRefusal } from '../../../shared/bench/words.ts'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Readonly<Record<string, string>>) =>
  (await ask(id, given)).cautions.map((one) => one.code)

/** Every word that a refusal can be said in is there. */
function expectWords(id: string, codes: readonly string[]): void {
  const of = calculatorAt(id)
  if (!of) throw new Error(`no calculator ${id}`)
  for (const code of codes) expect(sayRefusal(of, { code })).toMatch(/ .*\.$/)
}

describe('medicated feed', () => {
  const given = { find: 'strength', feed: 'dry', dose: '75 mg/kg', rate: '1 percent', additive: 'active' }
  const batch = { ...given, find: 'batch', batch: '500 kg' }
  it('holds 7,500 mg in a kilogram for 75 mg/kg at 1 % a day', async () => {
    // check value feed.04: 7,500 mg/kg ± 1e-6 (computed); grams in a short ton × 0.90718474
    const { figures } = await ask('medicated-feed', given)
    expect(figures[0]).toMatchObject({ key: 'strength', unit: 'mg/kg_w_w' })
    expect(Math.abs(figures[0].value - 7500)).toBeLessThanOrEqual(1e-6)
    expect(figures[1]).toMatchObject({ key: 'short-ton', unit: 'g/ton_us', significantFigures: 4 })
    expect(figures[1]?.value).toBeCloseTo(6803.8856, 3)
  })
  it('prints 1,816 g in a short ton for 10 mg/kg at 0.5 %', async () => {
    // check value feed.07: 1,816 ± 3, 21 CFR 558.261, from memory; exact 1,814.4
    const feed = { ...given, dose: '10 mg/kg', rate: '0.5 percent' }
    expect(Math.abs(((await ask('medicated-feed', feed)).figures[1]?.value ?? 0) - 1816)).toBeLessThanOrEqual(
      3,
    )
  })
  it('takes 5 kg of a 10 % premix for a tonne of 500 g', async () => {
    // check value feed.08: 5 kg ± 1e-9 (published, in-feed medication example); 10 mg/kg at 2 % is feed.05
    const premix = { dose: '10 mg/kg', rate: '2 percent', additive: 'premix', premix: '10 percent_w_w' }
    const tonne = await ask('medicated-feed', { ...given, ...premix })
    const perTonne = tonne.figures.find(({ key }) => key === 'per-tonne')
    expect(perTonne).toMatchObject({ unit: 'kg', value: 5 })
    const mixed = await ask('medicated-feed', { ...batch, ...premix, premix: '100 mg/g_w_w' })
    expect(mixed.figures[0]).toMatchObject({ key: 'premix', unit: 'kg', rounded: '2.500' })
    expect(mixed.figures[1]).toMatchObject({ key: 'drug-in-it', unit: 'g', value: 250 })
  })
  it('weighs 0.8 g into 400 g of gel, which last four kilograms of fish for four days', async () => {
    // check values feed.09 and feed.10: 800 mg ± 1e-6 and 4 days ± 1e-9 (computed)
    const gel = { ...batch, feed: 'gel', dose: '50 mg/kg', rate: '2.5 percent', batch: '400 g' }
    const { figures, cautions } = await ask('medicated-feed', { ...gel, biomass: '4 kg' })
    expect(figures[0]).toMatchObject({ key: 'drug', unit: 'g' })
    expect(figures[0].value).toBeCloseTo(0.8, 9)
    expect(figures.find(({ key }) => key === 'days')?.value).toBeCloseTo(4, 9)
    expect(cautions.find(({ code }) => code === 'as-fed')?.level).toBe('warning')
    expect(await codesOf('medicated-feed', batch)).not.toContain('as-fed')
  })
  it('gives a group of 90 kg 6,750 mg in 0.9 kg of feed a day, and carries the error of its weight', async () => {
    // check values feed.02 and feed.03 (published, fish farmers' association page)
    const day = { find: 'day', feed: 'dry', dose: '75 mg/kg', rate: '1 percent', biomass: '90 kg' }
    const { figures, range } = await ask('medicated-feed', { ...day, biomassError: '10 percent' })
    expect(figures[0]).toMatchObject({ key: 'drug-day', unit: 'mg', significantFigures: 2 })
    expect(figures[0].value).toBeCloseTo(6750, 9)
    expect(figures[1]).toMatchObject({ key: 'feed-day', unit: 'kg', value: 0.9 })
    expect(range?.low).toBeCloseTo(6075, 6)
    expect(range?.high).toBeCloseTo(7425, 6)
  })
  it('says what a group has taken by what it ate', async () => {
    // feed.02 to feed.04 turned round: 0.45 kg, half of 0.9 kg, of 7,500 mg/kg by 90 kg is half of 75 mg/kg (by hand)
    const ate = { find: 'taken', feed: 'dry', fed: '7500 mg/kg_w_w', eaten: '0.45 kg', biomass: '90 kg' }
    const { figures, range } = await ask('medicated-feed', { ...ate, biomassError: '10 percent' })
    expect(figures[0]).toMatchObject({ key: 'taken', unit: 'mg/kg', value: 37.5 })
    expect(range?.high).toBeCloseTo(37.5 / 0.9, 9)
    const ton = await ask('medicated-feed', { ...ate, fed: '0.75 percent_w_w', eaten: '450 g' })
    expect(ton.figures[0].value).toBeCloseTo(37.5, 9)
    expect(refusalsOf('medicated-feed', { ...ate, biomass: '' })).toEqual(['biomass blank'])
    expect(refusalsOf('medicated-feed', { ...ate, eaten: '-1 kg' })).toEqual(['eaten below-least'])
  })
  it('reads a dose in micrograms and a batch in pounds', async () => {
    const small = { ...batch, dose: '75 ug/kg', batch: '100 lb' }
    expect((await ask('medicated-feed', small)).figures[0].value).toBeCloseTo(0.340194, 6)
  })
  it.each([
    ['no feeding rate', { rate: '0 percent' }, 'rate not-above-zero'],
    ['no group for a day', { find: 'day' }, 'biomass blank'],
    ['more drug than feed', { dose: '500 mg/kg', rate: '0.01 percent' }, 'rate more-drug-than-feed'],
    [
      'a feed stronger than its premix',
      { additive: 'premix', premix: '0.5 percent_w_w' },
      'premix target-above-premix',
    ],
    ['a bare percentage of a premix', { additive: 'premix', premix: '10 %' }, 'premix percent-not-stated'],
    ['a feed of no kind', { feed: '' }, 'feed not-chosen'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('medicated-feed', { ...given, ...change })).toEqual([refused])
  })
  it('doubts a rate of 30 % a day, and says that sick animals eat less', async () => {
    const codes = await codesOf('medicated-feed', { ...given, rate: '30 percent' })
    expect(codes).toEqual(expect.arrayContaining(['not-plausible', 'sick-eat-less', 'authority']))
  })
  it('has words for its refusals', () => {
    expectWords('medicated-feed', ['more-drug-than-feed', 'target-above-premix'])
  })
})

describe('the weight of a group', () => {
  const given = { count: '5000 ratio', meanWeight: '10 g' }
  it('is 90 kg for 5,000 of 10 g after 40 kg of feed at 1', async () => {
    // check value feed.01: 90 kg ± 1e-9 (published, fish farmers' association page)
    const fed = await ask('group-biomass', { ...given, feedGiven: '40 kg', feedConversion: '1 ratio' })
    expect(fed.figures[0]).toMatchObject({ key: 'biomass', unit: 'kg', value: 90 })
    expect(fed.cautions.find(({ code }) => code === 'growth-guessed')?.level).toBe('warning')
  })
  it('divides the feed by its conversion', async () => {
    const fed = await ask('group-biomass', { ...given, feedGiven: '60 kg', feedConversion: '1.5 ratio' })
    expect(fed.figures.map(({ value }) => value)).toEqual([90, 50, 40])
  })
  it('is 13.356 kg for 42 of 318 g, with no word of growth', async () => {
    // check value feed.11 (computed)
    const { figures, cautions } = await ask('group-biomass', { count: '42 ratio', meanWeight: '318 g' })
    expect(figures[0].value).toBeCloseTo(13.356, 9)
    expect(cautions.map((one) => one.code)).not.toContain('growth-guessed')
  })
  it('has a range by both errors', async () => {
    const errors = { countError: '10 percent', meanWeightError: '5 percent' }
    const { range, figures } = await ask('group-biomass', { ...given, ...errors })
    expect(range?.low).toBeCloseTo(50 * 0.9 * 0.95, 9)
    expect(range?.high).toBeCloseTo(50 * 1.1 * 1.05, 9)
    expect(figures[0].rounded).toBe('50')
    const grown = { ...given, ...errors, feedGiven: '40 kg', feedConversion: '1 ratio' }
    expect((await ask('group-biomass', grown)).range?.low).toBeCloseTo(50 * 0.9 * 0.95 + 40, 9)
  })
  it.each([
    ['half an animal', { count: '2.5 ratio' }, 'count not-whole'],
    ['feed without its conversion', { feedGiven: '40 kg' }, 'feedConversion blank'],
    ['a conversion without feed', { feedConversion: '1.2 ratio' }, 'feedGiven blank'],
    ['no weight', { meanWeight: '0 g' }, 'meanWeight not-above-zero'],
    [
      'a conversion of nothing',
      { feedGiven: '40 kg', feedConversion: '0 ratio' },
      'feedConversion below-least',
    ],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('group-biomass', { ...given, ...change })).toEqual([refused])
  })
  it('doubts a conversion below 0.5', async () => {
    const change = { feedGiven: '40 kg', feedConversion: '0.2 ratio' }
    expect(await codesOf('group-biomass', { ...given, ...change })).toContain('not-plausible')
  })
})

describe('length and weight', () => {
  const table = { coefficientUnits: 'g-cm', a: '0.0124 ratio', b: '3.05 ratio' }
  const given = {
    ...{ find: 'weight', ...table },
    ...{ tableLength: 'total', lengthType: 'total', length: '35 cm' },
  }
  it('takes 35 cm for 635.1 g', async () => {
    // check value lw.02: 635.081 g ± 0.002, a L^b (computed)
    const { figures, cautions } = await ask('length-weight', given)
    expect(Math.abs(figures[0].value - 635.081)).toBeLessThanOrEqual(0.002)
    expect(figures[0]).toMatchObject({ unit: 'g', rounded: '635' })
    expect(cautions.find(({ code }) => code === 'scales')?.level).toBe('warning')
    expect((await ask('length-weight', { ...given, length: '350 mm' })).figures[0].value).toBeCloseTo(
      635.081,
      2,
    )
  })
  it('turns it round, and says which length it is', async () => {
    // check value lw.04: 35.015 cm ± 0.002 (computed)
    const asked = { find: 'length', ...table, tableLength: 'fork', weight: '635.9 g' }
    const { figures } = await ask('length-weight', asked)
    expect(figures[0]).toMatchObject({ key: 'length-fork', unit: 'cm' })
    expect(Math.abs(figures[0].value - 35.015)).toBeLessThanOrEqual(0.002)
  })
  it('reads a table in millimetres', async () => {
    // check value lw.09: 0.0124 g/cm^3.05 is 1.10515e-5 g/mm^3.05 (computed)
    const mm = { ...given, coefficientUnits: 'g-mm', a: '0.0000110515 ratio' }
    expect((await ask('length-weight', mm)).figures[0].value).toBeCloseTo(635.08, 1)
    const wrong = { ...given, a: '0.0000110515 ratio' }
    expect(await codesOf('length-weight', wrong)).toContain('coefficient-unusual')
    expect(await codesOf('length-weight', given)).not.toContain('coefficient-unusual')
  })
  it.each(['kg-cm', 'kg-m', 'g-m', 'lb-in'])('reads a table in %s, borne out by mathjs', async (units) => {
    expect(
      (await ask('length-weight', { ...given, coefficientUnits: units })).figures[0].value,
    ).toBeGreaterThan(0)
  })
  it('finds the condition of Fulton and of Le Cren', async () => {
    // check values lw.06 and lw.07: 1.25948 ± 1e-5 and 0.9448 ± 1e-4 (computed; Le Cren 1951)
    const fulton = { find: 'fulton', lengthType: 'total', length: '35 cm', weight: '540 g' }
    const { figures } = await ask('length-weight', fulton)
    expect(Math.abs(figures[0].value - 1.25948)).toBeLessThanOrEqual(1e-5)
    const relative = await ask('length-weight', { ...given, find: 'relative', weight: '600 g' })
    expect(Math.abs(relative.figures[0].value - 0.9448)).toBeLessThanOrEqual(1e-4)
    expect(relative.figures[1]).toMatchObject({ key: 'expected', unit: 'g' })
  })
  it('takes a table in pounds and inches to K', async () => {
    // check value lw.08: 1.1224 ± 0.0002 of C = 4055e-7, a typical trout from memory
    const english = { find: 'english', english: '0.0004055 ratio' }
    expect(Math.abs((await ask('length-weight', english)).figures[0].value - 1.1224)).toBeLessThanOrEqual(
      0.0002,
    )
  })
  it('carries the error of a length, which b multiplies', async () => {
    const { range, figures } = await ask('length-weight', { ...given, lengthError: '2 percent' })
    expect((range?.high ?? 0) / figures[0].value).toBeCloseTo(1.02 ** 3.05, 9)
    expect(figures[0].rounded).toBe('640')
  })
  it('warns of an exponent outside 2.5 to 3.5', async () => {
    expect(await codesOf('length-weight', { ...given, b: '3.6 ratio' })).toContain('exponent')
    expect(await codesOf('length-weight', { ...given, b: '3.5 ratio' })).not.toContain('exponent')
  })
  it.each([
    ['no length', { length: '0 cm' }, 'length not-above-zero'],
    ['an exponent of 5', { b: '5 ratio' }, 'b above-most'],
    ['a coefficient of nothing', { a: '0 ratio' }, 'a not-above-zero'],
    [
      'a table of another unit than it says',
      { coefficientUnits: 'kg-cm', a: '2 ratio' },
      'a coefficient-too-large',
    ],
    ['a length of no kind', { lengthType: '' }, 'lengthType length-type-not-stated'],
    ['a table of another length', { tableLength: 'fork' }, 'lengthType length-type-differs'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('length-weight', { ...given, ...change })).toEqual([refused])
  })
  it('has words for its refusals', () => {
    expectWords('length-weight', ['length-type-not-stated', 'length-type-differs', 'coefficient-too-large'])
  })
})
