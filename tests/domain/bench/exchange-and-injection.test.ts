import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

describe('wash-out', () => {
  const given = { find: 'time', volume: '1000 L', flow: '25 L/min', removed: '95 percent' }
  it('takes 119.8 minutes for 95 % of 1,000 L at 25 L/min', async () => {
    // check value wash.05: 119.829 min ± 0.002, −(V/Q) ln f (computed, against an ODE solver)
    const { figures, cautions } = await ask('wash-out', given)
    expect(Math.abs(figures[0].value - 119.829)).toBeLessThanOrEqual(0.002)
    expect(figures[1]?.value).toBeCloseTo(2.995732, 6)
    expect(cautions.map((one) => one.code)).toContain('lower-bound')
  })
  it('leaves 13.72 mg/L of 25 after an hour at 20 L/min in 2,000 L', async () => {
    // check value flow.02 (computed, against an ODE solver)
    const left = { find: 'left', volume: '2 m3', flow: '1200 L/h', initial: '25 mg/L', elapsed: '1 h' }
    const { figures, cautions } = await ask('wash-out', left)
    expect(figures[0].value).toBeCloseTo(13.72029, 4)
    expect(cautions.map((one) => one.code)).toEqual(['more-left', 'plug-flow'])
  })
  it.each([
    ['no flow', { flow: '0 L/min' }, 'flow not-above-zero'],
    ['all of it', { removed: '100 percent' }, 'removed above-most'],
    ['a flow in gallons of no country', { flow: '5 gal/min' }, 'flow gallon-not-stated'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('wash-out', { ...given, ...change })).toEqual([refused])
  })
})

describe('a change of salinity', () => {
  const given = {
    way: 'steps',
    start: '35 PSS-78',
    target: '16 PSS-78',
    replacement: '0 PSS-78',
    volume: '2000 L',
  }
  it('plans daily steps, each with its litres', async () => {
    // check values sal.08 and sal.09 at 4 a day: equal steps of 3.8 and these litres ± 0.02 (computed)
    const { figures, schedule } = await ask('salinity-change', { ...given, perDay: '4 PSS-78' })
    expect(figures[1]?.value).toBe(5)
    expect(schedule?.rows.map((row) => Number((row[2] ?? 0).toFixed(1)))).toEqual([
      31.2, 27.4, 23.6, 19.8, 16,
    ])
    for (const [at, litres] of [217.14, 243.59, 277.37, 322.03, 383.84].entries())
      expect(Math.abs((schedule?.rows[at]?.[3] ?? 0) - litres)).toBeLessThanOrEqual(0.02)
  })
  it('takes seven days from 35 to 16 at 3 a day', async () => {
    // 19 ÷ 3 = 6.33, the next whole day; litres are 2,000 × step ÷ salinity of the day, summed by hand (computed)
    const { figures } = await ask('salinity-change', { ...given, perDay: '3 PSS-78' })
    expect(figures[1]).toMatchObject({ value: 7, rounded: '7' })
    const step = 19 / 7
    const litres = [0, 1, 2, 3, 4, 5, 6].reduce((sum, day) => sum + (2000 * step) / (35 - day * step), 0)
    expect(figures[0].value).toBeCloseTo(litres, 8)
  })
  it('does not add a day for the last binary digit', async () => {
    const tenths = { start: '30.3 PSS-78', target: '30 PSS-78', perDay: '0.1 PSS-78' }
    expect((await ask('salinity-change', { ...given, ...tenths })).figures[1]?.value).toBe(3)
  })
  it('swaps at once or runs through', async () => {
    // check values sal.05 and sal.06: 1,085.71 L and 1,565.52 L ± 0.05 (computed)
    const once = await ask('salinity-change', { ...given, way: 'once' })
    const through = await ask('salinity-change', { ...given, way: 'through' })
    expect(Math.abs(once.figures[0].value - 1085.71)).toBeLessThanOrEqual(0.05)
    expect(Math.abs(through.figures[0].value - 1565.52)).toBeLessThanOrEqual(0.05)
  })
  it('reaches the salinity of the new water by swapping all of it', async () => {
    // (S1 − S2) ÷ (S1 − Sr) = 1; the last day of a plan takes the whole volume (computed)
    const all = { ...given, target: '5 PSS-78', replacement: '5 PSS-78' }
    expect((await ask('salinity-change', { ...all, way: 'once' })).figures[1]?.value).toBe(100)
    const { schedule } = await ask('salinity-change', { ...all, perDay: '4 PSS-78' })
    expect(schedule?.rows.at(-1)).toMatchObject({ 2: 5, 3: 2000 })
  })
  it('warns of a rate above common practice, up sooner than down', async () => {
    const codes = async (change: Record<string, string>) =>
      (await ask('salinity-change', { ...given, ...change })).cautions.map((one) => one.code)
    expect(await codes({ perDay: '5 PSS-78' })).toContain('faster-than-usual')
    expect(await codes({ perDay: '4 PSS-78' })).not.toContain('faster-than-usual')
    const up = { start: '16 PSS-78', target: '35 PSS-78', replacement: '40 PSS-78', perDay: '4 PSS-78' }
    expect(await codes(up)).toContain('faster-than-usual')
  })
  it.each([
    ['a specific gravity', { start: '1.026 PSS-78' }, 'start specific-gravity-as-salinity'],
    ['the least that may be one', { start: '0.99 PSS-78' }, 'start specific-gravity-as-salinity'],
    ['the most that may be one', { target: '1.05 PSS-78' }, 'target specific-gravity-as-salinity'],
    [
      'a specific gravity of the new water',
      { target: '30 PSS-78', replacement: '1.02 PSS-78' },
      'replacement specific-gravity-as-salinity',
    ],
    [
      'a flow that should reach the new water itself',
      { way: 'through', target: '5 PSS-78', replacement: '5 PSS-78' },
      'target target-beyond-replacement',
    ],
    [
      'a target beyond the replacement water',
      { target: '0 PSS-78', replacement: '5 PSS-78' },
      'target target-beyond-replacement',
    ],
    ['water that leads the other way', { target: '36 PSS-78' }, 'target target-behind-start'],
    ['parts per thousand', { start: '35 ppt' }, 'start parts-per-thousand'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('salinity-change', { ...given, way: 'once', ...change })).toEqual([refused])
  })
})

describe('an injection', () => {
  const given = { dose: '10 mg/kg', weight: '1.35 kg', strength: '22.7 mg/mL', graduation: '0.01 mL' }
  it('gives 0.59 mL of 22.7 mg/mL at 10 mg/kg for 1.35 kg, and what the rounding makes of it', async () => {
    // 13.5 mg ÷ 22.7 mg/mL = 0.594714 mL; to 0.01 mL 0.59, −0.79 % (worked by hand)
    const { figures } = await ask('injection', given)
    expect(figures[0]).toMatchObject({ rounded: '0.59', unit: 'mL' })
    expect(figures[1]?.value).toBeCloseTo(0.594714, 6)
    expect(figures[3]?.value).toBeCloseTo(-0.7926, 3)
  })
  it('offers a dilution below 20 graduations, and warns of an error above 5 %', async () => {
    // check values inj.02, injr.02, inje.02: 0.03744 mL, 0.04 mL, 6.82 % (computed)
    const { figures, cautions } = await ask('injection', { ...given, weight: '85 g' })
    expect(figures[0].rounded).toBe('0.04')
    expect(Math.abs((figures[3]?.value ?? 0) - 6.82)).toBeLessThanOrEqual(0.02)
    expect(cautions.find((one) => one.code === 'dilute')?.params).toMatchObject({ parts: 6 })
    expect(cautions.map((one) => one.code)).toContain('rounding')
  })
  it('says no error where the volume is a whole number of steps, whatever its binary form', async () => {
    // check value inj.04: 0.96 mL (computed); in binary 0.4 × 12 ÷ 5 is not 0.96
    const whole = { dose: '0.4 mg/kg', weight: '12 kg', strength: '5 mg/mL' }
    for (const change of [whole, { ...whole, weight: '11.1 kg', dose: '0.3 mg/kg', strength: '3.7 mg/mL' }]) {
      const { figures, cautions } = await ask('injection', { ...given, ...change })
      expect(figures[3]).toMatchObject({ key: 'error', value: 0, rounded: '0' })
      expect(cautions.map((one) => one.code)).not.toContain('rounding')
    }
  })
  it('rounds halves up in decimal', async () => {
    const half = { dose: '1 mg/kg', weight: '1.005 kg', strength: '1 mg/mL' }
    expect((await ask('injection', { ...given, ...half })).figures[0].rounded).toBe('1.01')
  })
  it.each([
    ['no weight', { weight: '0 kg' }, 'weight not-above-zero'],
    ['no strength', { strength: '0 mg/mL' }, 'strength not-above-zero'],
    ['a volume below half a graduation', { weight: '0.5 g' }, 'graduation below-half-graduation'],
    ['cc for a graduation', { graduation: '0.01 cc' }, 'graduation write-millilitres'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('injection', { ...given, ...change })).toEqual([refused])
  })
})
