import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { sayRefusal } from '../../../shared/bench/words.ts'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Readonly<Record<string, string>>) =>
  (await ask(id, given)).cautions.map((one) => one.code)

describe('contact time', () => {
  const chamber = { contact: 'flow', volume: '500 L', flow: '100 L/min' }
  const given = { find: 'ct', residual: '0.4 mg/L', ...chamber, baffling: 'plug-flow' }
  it('is 2 mg·min/L for 0.4 mg/L in 500 L at 100 L/min of plug flow', async () => {
    // check value lss.04: 2 ± 1e-9 (computed)
    const { figures, range } = await ask('contact-time', { ...given, volumeError: '10 percent' })
    expect(figures[0]).toMatchObject({ key: 'ct', unit: 'mg_min/L' })
    expect(figures[0].value).toBeCloseTo(2, 9)
    expect(figures[1]).toMatchObject({ key: 'minutes', value: 5, unit: 'min' })
    expect(range?.low).toBeCloseTo(1.8, 9)
  })
  it('counts half of the stay in an average chamber, and says that the factor is from memory', async () => {
    // check value lss.05: 1 ± 1e-9 (computed; factors of the US EPA guidance, from memory)
    const { figures, cautions } = await ask('contact-time', { ...given, baffling: 'average' })
    expect(figures[0].value).toBeCloseTo(1, 9)
    expect(cautions.map((one) => one.code)).toContain('factor-from-memory')
    const own = { ...given, baffling: 'own', factor: '0.5 ratio' }
    expect((await ask('contact-time', own)).figures[0].value).toBeCloseTo(1, 9)
    expect(await codesOf('contact-time', own)).not.toContain('factor-from-memory')
  })
  it('is turned round to the residual and to the minutes', async () => {
    // lss.05 turned round by hand: 1 ÷ 2.5 min = 0.4 mg/L, 1 ÷ 0.4 mg/L = 2.5 min (computed)
    const wanted = { target: '1 mg_min/L' }
    const residual = { find: 'residual', ...wanted, ...chamber, baffling: 'average' }
    expect((await ask('contact-time', residual)).figures[0].value).toBeCloseTo(0.4, 9)
    const minutes = { find: 'minutes', ...wanted, residual: '0.4 mg/L' }
    expect((await ask('contact-time', minutes)).figures[0]).toMatchObject({ key: 'minutes', value: 2.5 })
  })
  it('takes a bucket by the clock', async () => {
    // 200 mg/L for 10 minutes: 2,000 mg·min/L (by hand)
    const bucket = { find: 'ct', residual: '200 mg/L', contact: 'still', time: '10 min' }
    expect((await ask('contact-time', bucket)).figures[0].value).toBe(2000)
  })
  it.each([
    ['no flow', { flow: '0 L/min' }, 'flow not-above-zero'],
    ['a negative residual', { residual: '-0.1 mg/L' }, 'residual below-least'],
    ['a factor that no chamber has', { baffling: 'own', factor: '1.2 ratio' }, 'factor above-most'],
    ['a chamber of no kind', { baffling: '' }, 'baffling not-chosen'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('contact-time', { ...given, ...change })).toEqual([refused])
  })
  it('takes no minutes of a residual of nothing', () => {
    const none = { find: 'minutes', target: '1 mg_min/L', residual: '0 mg/L' }
    expect(refusalsOf('contact-time', none)).toEqual(['residual not-above-zero'])
  })
})

describe('an ozone dose', () => {
  const given = { find: 'dose', ozone: '20 g/h', flow: '40 m3/h' }
  it('is 0.5 mg/L for 20 g/h in 40 m³/h', async () => {
    // check value lss.06: 0.5 mg/L ± 1e-9 (computed)
    const { figures, cautions } = await ask('ozone-dose', given)
    expect(figures[0].value).toBeCloseTo(0.5, 9)
    const warnings = cautions.filter(({ level }) => level === 'warning').map(({ code }) => code)
    expect(warnings).toEqual(expect.arrayContaining(['sea-water', 'under-treatment']))
    const slow = { ...given, ozone: '20000 mg/h', flow: '666.6666667 L/min' }
    expect((await ask('ozone-dose', slow)).figures[0].value).toBeCloseTo(0.5, 6)
  })
  it('is turned round to what the generator has to make', async () => {
    const output = { find: 'output', dose: '0.5 mg/L', flow: '40 m3/h' }
    expect((await ask('ozone-dose', output)).figures[0]).toMatchObject({
      key: 'ozone',
      unit: 'g/h',
      value: 20,
    })
  })
  it.each([
    ['no flow', { flow: '0 m3/h' }, 'flow not-above-zero'],
    ['less than no ozone', { ozone: '-1 g/h' }, 'ozone below-least'],
    ['a dose of no amount', { find: 'output', dose: '' }, 'dose blank'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('ozone-dose', { ...given, ...change })).toEqual([refused])
  })
  it('doubts a dose of 20 mg/L', async () => {
    const strong = { find: 'output', dose: '20 mg/L', flow: '40 m3/h' }
    expect(await codesOf('ozone-dose', strong)).toContain('not-plausible')
  })
})

describe('copper by alkalinity', () => {
  const given = {
    ...{ product: 'pentahydrate', water: 'fresh', alkalinity: '120 mg/L_CaCO3', volume: '1000 L' },
  }
  const figureOf = async (given: Readonly<Record<string, string>>, key: string) =>
    (await ask('copper-by-alkalinity', given)).figures.find((one) => one.key === key)
  it('is a hundredth of the alkalinity', async () => {
    // check values cu.05 and cu.06: 1.2 and 1.5 mg/L ± 1e-9 (published, McNevin 2003)
    expect((await figureOf(given, 'sulfate'))?.value).toBeCloseTo(1.2, 9)
    const hard = { ...given, alkalinity: '150 mg/L_CaCO3' }
    expect((await figureOf(hard, 'sulfate'))?.value).toBeCloseTo(1.5, 9)
    // check value cu.07: 0.3818 mg/L ± 0.0001 of copper in it (computed)
    expect(Math.abs(((await figureOf(hard, 'copper'))?.value ?? 0) - 0.3818)).toBeLessThanOrEqual(0.0001)
  })
  it('weighs 2.72 lb for an acre-foot at 100 mg/L', async () => {
    // check value cu.08: 2.72 lb ± 0.01 (computed)
    const pond = { ...given, alkalinity: '100 mg/L_CaCO3', volume: '1 acre_ft' }
    expect(Math.abs(((await figureOf(pond, 'pounds'))?.value ?? 0) - 2.72)).toBeLessThanOrEqual(0.01)
    const { figures } = await ask('copper-by-alkalinity', pond)
    expect(figures[0]).toMatchObject({ key: 'amount', unit: 'g' })
    expect(figures[0].value).toBeCloseTo(1233.48, 1)
  })
  it('reads meq/L and dKH', async () => {
    // check values alk.03 and alk.05: 2 meq/L are 100.09 and 6.724 dKH are 120 mg/L as CaCO3 (computed)
    expect((await figureOf({ ...given, alkalinity: '2 meq/L' }, 'sulfate'))?.value).toBeCloseTo(1.00086, 5)
    expect((await figureOf({ ...given, alkalinity: '6.724 dKH' }, 'sulfate'))?.value).toBeCloseTo(1.2, 3)
  })
  it('counts no more than 250 mg/L, with a caution', async () => {
    const hard = { ...given, alkalinity: '400 mg/L_CaCO3' }
    expect((await figureOf(hard, 'sulfate'))?.value).toBeCloseTo(2.5, 9)
    expect(await codesOf('copper-by-alkalinity', hard)).toContain('capped')
    expect(await codesOf('copper-by-alkalinity', { ...given, alkalinity: '250 mg/L_CaCO3' })).not.toContain(
      'capped',
    )
  })
  it('carries the error of the volume, rounds to the balance and warns of invertebrates', async () => {
    const errors = { ...given, volumeError: '10 percent', division: '0.1 g' }
    const { figures, range, cautions } = await ask('copper-by-alkalinity', errors)
    expect(figures[0].rounded).toBe('1.2')
    expect(range?.high).toBeCloseTo(1.32, 9)
    expect(cautions.find(({ code }) => code === 'invertebrates')?.level).toBe('warning')
  })
  it('takes 50 mg/L as typed, to the last digit', async () => {
    expect((await figureOf({ ...given, alkalinity: '50 mg/L_CaCO3' }, 'sulfate'))?.value).toBeCloseTo(0.5, 9)
  })
  it.each([
    ['soft water', { alkalinity: '40 mg/L_CaCO3' }, 'alkalinity alkalinity-too-low-for-copper'],
    ['salt water', { water: 'salt' }, 'water copper-rule-fresh-water-only'],
    ['brackish water by its reading', { salinity: '33 PSS-78' }, 'salinity copper-rule-fresh-water-only'],
    ['a chelated product', { product: 'chelated' }, 'product alkalinity-rule-chelated-product'],
    ['a water of no kind', { water: '' }, 'water not-chosen'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('copper-by-alkalinity', { ...given, ...change })).toEqual([refused])
  })
  it('has words for its refusals', () => {
    const of = calculatorAt('copper-by-alkalinity')
    if (!of) throw new Error('no calculator')
    for (const code of ['alkalinity-too-low-for-copper', 'copper-rule-fresh-water-only'])
      expect(sayRefusal(of, { code, params: { limit: '50', cap: '250' } })).toMatch(/\.$/)
    expect(sayRefusal(of, { code: 'alkalinity-rule-chelated-product' })).toMatch(/label/)
  })
})
