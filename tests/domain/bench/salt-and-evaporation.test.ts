import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

const codesOf = async (id: string, given: Record<string, string>) =>
  (await ask(id, given)).cautions.map((one) => `${one.level} ${one.code}`)

describe('salt to raise the salinity', () => {
  const litres = { by: 'per-litre', volume: '1000 L', startPerLitre: '16 g/L', targetPerLitre: '33 g/L' }
  const mass = {
    by: 'per-kilogram',
    volume: '1 m3',
    start: '16 g/kg',
    target: '33 g/kg',
    temperature: '25 degC',
  }
  it('is 17 kg for 17 g/L in a cubic metre', async () => {
    // check value sal.10: 1,000 L × (33 − 16) g/L = 17 kg (computed)
    expect((await ask('salt-mass', litres)).figures[0]).toMatchObject({
      value: 17,
      unit: 'kg',
      rounded: '17.00',
    })
  })
  it('is 17.739 kg for 17 g/kg, since the salt is part of the new kilogram', async () => {
    // check value sal.11: 17.739 kg ± 0.005 (computed, EOS-80 density)
    const { figures } = await ask('salt-mass', mass)
    expect(Math.abs(figures[0].value - 17.739)).toBeLessThanOrEqual(0.005)
  })
  it('takes practical salinities of sea water', async () => {
    // 16 and 33 on PSS-78 are 16.0754 and 33.1556 g/kg (35.16504 ÷ 35)
    const practical = { ...mass, start: '16 PSS-78', target: '33 PSS-78' }
    const same = { ...mass, start: '16.075447 g/kg', target: '33.155609 g/kg' }
    const [a, b] = [await ask('salt-mass', practical), await ask('salt-mass', same)]
    expect(a.figures[0].value / b.figures[0].value).toBeCloseTo(1, 6)
  })
  it('weighs more when it is moist', async () => {
    // check value sal.12: 17 kg at 88 % = 19.318 kg ± 0.001 (computed)
    const { figures } = await ask('salt-mass', { ...litres, purity: '88 percent_w_w' })
    expect(figures.map(({ key }) => key)).toEqual(['weighed', 'salt'])
    expect(Math.abs(figures[0].value - 19.318)).toBeLessThanOrEqual(0.001)
    const balance = await ask('salt-mass', { ...litres, purity: '88 percent_w_w', division: '50 g' })
    expect(balance.figures[0]).toMatchObject({ rounded: '19300', unit: 'g' })
    const scale = await ask('salt-mass', { ...litres, purity: '88 percent_w_w', division: '0.5 kg' })
    expect(scale.figures[0]).toMatchObject({ rounded: '19.5', unit: 'kg' })
    expect(scale.working.some((line) => line.value === scale.figures[0].value)).toBe(true)
  })
  it('comes in days at a limit', async () => {
    const days = await ask('salt-mass', { ...mass, perDay: '3 g/kg', purity: '88 percent_w_w' })
    expect(days.figures.find(({ key }) => key === 'days')).toMatchObject({ value: 6, rounded: '6' })
    expect(days.schedule?.rows).toHaveLength(6)
    const sum = days.schedule?.rows.reduce((all, row) => all + (row[3] ?? 0), 0)
    expect(sum).toBeCloseTo(days.figures[0].value, 9)
    expect(days.schedule?.rows.at(-1)?.[2]).toBe(33)
    const few = await ask('salt-mass', { ...litres, perDay: '8.5 g/L' })
    expect(few.schedule?.rows.map((row) => row[3])).toEqual([8.5, 8.5])
    const practical = { ...mass, start: '16 PSS-78', target: '19 PSS-78', perDay: '3 PSS-78' }
    expect((await ask('salt-mass', practical)).schedule?.rows).toHaveLength(1)
  })
  it('carries the error of the volume and of the purity', async () => {
    const errors = { purity: '88 percent_w_w', volumeError: '5 percent', purityTolerance: '2 percent' }
    const { range } = await ask('salt-mass', { ...litres, ...errors })
    expect(range?.low).toBeCloseTo((17 * 0.95) / 0.88 / 1.02, 9)
    expect(range?.high).toBeCloseTo((17 * 1.05) / 0.88 / 0.98, 9)
  })
  it('warns of a rise at once, and of a fast one', async () => {
    expect(await codesOf('salt-mass', litres)).toEqual(
      expect.arrayContaining(['warning at-once', 'warning pour']),
    )
    expect(await codesOf('salt-mass', { ...litres, targetPerLitre: '19 g/L' })).not.toContain(
      'warning at-once',
    )
    const days = await codesOf('salt-mass', { ...mass, perDay: '3 g/kg' })
    expect(days.join()).not.toMatch(/at-once|faster/)
    expect(await codesOf('salt-mass', { ...mass, perDay: '5 g/kg' })).toContain('warning faster-than-usual')
    expect(await codesOf('salt-mass', mass)).toContain('note sea-salt')
  })
  it.each([
    [
      'a target below the start',
      { ...litres, targetPerLitre: '10 g/L' },
      'targetPerLitre target-not-above-start',
    ],
    ['a target below the start by mass', { ...mass, target: '10 g/kg' }, 'target target-not-above-start'],
    ['a specific gravity', { ...mass, target: '1.025 g/kg' }, 'target specific-gravity-as-salinity'],
    ['two scales', { ...mass, target: '33 PSS-78' }, 'target dimensions-differ'],
    [
      'a specific gravity at the start',
      { ...mass, start: '1.015 g/kg' },
      'start specific-gravity-as-salinity',
    ],
    ['no temperature', { ...mass, temperature: '' }, 'temperature blank'],
    ['water above 40 °C', { ...mass, temperature: '77 degC' }, 'temperature above-most'],
    ['parts per thousand', { ...mass, target: '33 ppt' }, 'target parts-per-thousand'],
    ['a start beyond sea water', { ...mass, start: '60 g/kg', target: '70 g/kg' }, 'start above-most'],
    ['a limit of another scale', { ...mass, perDay: '3 PSS-78' }, 'perDay dimensions-differ'],
    ['a purity of more than all', { ...litres, purity: '120 percent_w_w' }, 'purity above-most'],
    ['a plan of years', { ...litres, perDay: '0.001 g/L' }, 'perDay below-least'],
  ])('refuses %s', (_, given, refused) => {
    expect(refusalsOf('salt-mass', given)).toEqual([refused])
  })
})

describe('what evaporated', () => {
  const given = { volume: '2000 L', reading: '36.2 PSS-78', target: '35 PSS-78' }
  it('is 68.6 L of 2,000 L that went from 35 to 36.2', async () => {
    // check value sal.13: 68.57 L ± 0.5 (computed, V (S − St) ÷ St)
    const { figures } = await ask('evaporation', given)
    expect(Math.abs(figures[0].value - 68.57)).toBeLessThanOrEqual(0.5)
    expect(figures[1]).toMatchObject({ key: 'restored', value: expect.closeTo(2068.5714, 3) })
  })
  it('is nothing where nothing rose, and carries the error of the volume', async () => {
    expect((await ask('evaporation', { ...given, reading: '35 PSS-78' })).figures[0].value).toBe(0)
    const { range } = await ask('evaporation', { ...given, volumeError: '10 percent' })
    expect(range?.high).toBeCloseTo(75.43, 2)
  })
  it('warns of a fast fall, and that salt may have come otherwise', async () => {
    expect(await codesOf('evaporation', given)).toEqual(['note otherwise', 'note chlorine'])
    expect(await codesOf('evaporation', { ...given, reading: '40 PSS-78' })).toContain('warning fast')
  })
  it.each([
    ['a salinity that fell', { reading: '34 PSS-78' }, 'reading salinity-not-risen'],
    ['a specific gravity', { reading: '1.027 PSS-78' }, 'reading specific-gravity-as-salinity'],
    ['two scales', { reading: '36.2 g/kg' }, 'target dimensions-differ'],
    ['fresh water', { target: '0 PSS-78' }, 'target not-above-zero'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('evaporation', { ...given, ...change })).toEqual([refused])
  })
})
