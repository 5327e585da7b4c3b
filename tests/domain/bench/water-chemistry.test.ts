import { describe, expect, it } from 'vitest'
import { ask, refusalsOf } from './ask.ts'

describe('un-ionised ammonia', () => {
  const fresh = { total: '1 mg/L', totalOf: 'n', ph: '8 pH', temperature: '24 degC', salinity: '0 PSS-78' }
  const sea = { ...fresh, ph: '8.2 pH', temperature: '25 degC', salinity: '35 PSS-78', calibration: 'nbs' }
  it('is 0.0502 mg/L of 1 mg/L at pH 8 and 24 °C in fresh water, without asking for the scale', async () => {
    // check value uia.fw15: UF/IFAS FA16 figure 3, worked example, ± 0.00006 (published)
    const { figures, sources } = await ask('un-ionised-ammonia', fresh)
    expect(Math.abs(figures[0].value - 0.0502)).toBeLessThanOrEqual(0.00006)
    expect(sources).toContain('emerson-1975')
  })
  it('takes the constant of the scale that the meter was calibrated on', async () => {
    // NBS table at pH 8.2, 25 °C, S 35: 0.06798 ± 0.1 % (computed); total scale at pH 8, 25 °C, S 35: 0.0556 (published example)
    const nbs = await ask('un-ionised-ammonia', sea)
    expect(nbs.figures[1]?.value).toBeCloseTo(6.798, 2)
    const total = await ask('un-ionised-ammonia', { ...sea, ph: '8 pH', calibration: 'total' })
    expect(Math.abs((total.figures[1]?.value ?? 0) - 5.56)).toBeLessThanOrEqual(0.006)
  })
  it('counts a test that reads as NH3 or NH4 as nitrogen first', async () => {
    // 17.031/14.007 = 1.2159 and 18.039/14.007 = 1.2879 (check values nh3conv.01, nh3conv.03, computed)
    const of = async (totalOf: string) =>
      (await ask('un-ionised-ammonia', { ...fresh, totalOf })).figures[0].value
    const [n, nh3, nh4] = [await of('n'), await of('nh3'), await of('nh4')]
    expect(n / nh3).toBeCloseTo(1.2159, 3)
    expect(n / nh4).toBeCloseTo(1.2879, 3)
  })
  it('gives both scales where the calibration is not known, and says to act on the higher', async () => {
    // pH 8, 25 °C, S 35: 0.0440 on the free and 0.0556 on the total scale (published examples uia.cw07, uia.cw03)
    const { figures, cautions } = await ask('un-ionised-ammonia', {
      ...sea,
      ph: '8 pH',
      calibration: 'unknown',
    })
    expect(figures.map(({ key }) => key)).toEqual(['cautious', 'nh3-n', 'share', 'nh3'])
    expect(Math.abs(figures[0].value - 0.0556)).toBeLessThanOrEqual(0.00006)
    expect(Math.abs((figures[1]?.value ?? 0) - 0.044)).toBeLessThanOrEqual(0.00006)
    expect(cautions.find((one) => one.code === 'scale-not-known')?.level).toBe('warning')
    const inFresh = await ask('un-ionised-ammonia', { ...fresh, calibration: 'unknown' })
    expect(inFresh.figures).toHaveLength(3)
    expect(inFresh.cautions.map((one) => one.code)).not.toContain('scale-not-known')
  })
  it.each([
    ['a pH of no stated scale in sea water', { calibration: '' }, 'calibration ph-scale-not-stated'],
    ['a test that does not say what it counts', { totalOf: '' }, 'totalOf ammonia-basis-not-stated'],
    ['kelvin in a field of Celsius', { temperature: '298.15 degC' }, 'temperature above-most'],
    ['a pH of 15', { ph: '15 pH' }, 'ph above-most'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('un-ionised-ammonia', { ...sea, ...change })).toEqual([refused])
  })
})

describe('ammonia counted as another form', () => {
  it.each([
    // 17.031/14.007, its inverse and 18.039/14.007, ± 0.0002 (check values nh3conv.01 to nh3conv.03, computed)
    ['n', 'nh3', 1.2159],
    ['nh3', 'n', 0.8224],
    ['n', 'nh4', 1.2879],
  ])('of 1 mg/L as %s is as %s %d', async (of, as, expected) => {
    const { figures } = await ask('ammonia-forms', { reading: '1000 ug/L', of, as })
    expect(Math.abs(figures[0].value - expected)).toBeLessThanOrEqual(0.0002)
  })
  it('asks what the test counts', () => {
    expect(refusalsOf('ammonia-forms', { reading: '1 mg/L', as: 'n' })).toEqual([
      'of ammonia-basis-not-stated',
    ])
  })
})

describe('specific gravity', () => {
  const given = { find: 'salinity', gravity: '1.025 SG', temperature: '25 degC', reference: '25 degC' }
  it.each([
    // check values sginv.06 and sginv.08: EOS-80 inverted by bisection, ± 0.02 (computed)
    [given, 33.19],
    [{ ...given, temperature: '20 degC', reference: '20 degC' }, 32.9],
  ])('of %o is that salinity', async (question, salinity) => {
    const { figures } = await ask('specific-gravity', question)
    expect(Math.abs(figures[0].value - salinity)).toBeLessThanOrEqual(0.02)
  })
  it('goes the other way: 35 at 25/25 °C shows 1.0264', async () => {
    // check value sg.*: 1.02637 ± 0.00002 (computed)
    const back = { find: 'gravity', salinity: '35 PSS-78', temperature: '77 degF', reference: '25 degC' }
    expect(Math.abs((await ask('specific-gravity', back)).figures[0].value - 1.02637)).toBeLessThanOrEqual(
      0.00002,
    )
  })
  it('of 1.000 at the reference temperature is salinity 0, and nothing near it', async () => {
    expect((await ask('specific-gravity', { ...given, gravity: '1.000 SG' })).figures[0].value).toBe(0)
  })
  it('asks of a refractometer whether it compensates for temperature', async () => {
    const cold = { ...given, instrument: 'seawater', temperature: '10 degC' }
    const { cautions } = await ask('specific-gravity', cold)
    expect(cautions.find((one) => one.code === 'compensated')?.level).toBe('warning')
    const hydrometer = await ask('specific-gravity', { ...cold, instrument: 'hydrometer' })
    expect(hydrometer.cautions.map((one) => one.code)).not.toContain('compensated')
  })
  it('warns of a scale for brine', async () => {
    const { cautions } = await ask('specific-gravity', { ...given, instrument: 'brine' })
    expect(cautions.map((one) => one.code)).toContain('brine')
  })
  it.each([
    ['no reference temperature', { reference: '' }, 'reference reference-temperature-not-stated'],
    ['a salinity typed as gravity', { gravity: '25 SG' }, 'gravity salinity-as-specific-gravity'],
    [
      'a salinity typed as gravity, in brackish water',
      { gravity: '2 SG' },
      'gravity salinity-as-specific-gravity',
    ],
    ['more than the scale', { gravity: '1.2 SG' }, 'gravity above-most'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf('specific-gravity', { ...given, ...change })).toEqual([refused])
  })
  it('refuses a gravity typed as salinity', () => {
    const back = { find: 'gravity', salinity: '1.025 PSS-78', temperature: '25 degC', reference: '25 degC' }
    expect(refusalsOf('specific-gravity', back)).toEqual(['salinity specific-gravity-as-salinity'])
  })
})
