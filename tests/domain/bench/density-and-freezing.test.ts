import { describe, expect, it } from 'vitest'
import cases from '../../published-values/cases/salinity-and-density.json' with { type: 'json' }
import { ask, refusalsOf } from './ask.ts'

interface Row {
  id: string
  calculator: string
  inputs: Record<string, number>
  expected: number
  tolerance: number
}
const rowsOf = (calculator: string) =>
  (cases as unknown as Row[]).filter(
    (row) => row.calculator === calculator && typeof row.expected === 'number',
  )
/** The rows of 1983 give temperatures of 1968; the bench takes those of a thermometer of today. */
const t90 = (t68: number) => `${(t68 / 1.00024).toFixed(12)} degC`
const codes = (cautions: readonly { code: string }[]) => cautions.map((one) => one.code)

describe('the density of sea water', () => {
  const id = 'seawater-density'
  const water = { salinity: '35 PSS-78', temperature: '25 degC' }

  it('answers every published row', async () => {
    // Fofonoff and Millard 1983, UNESCO Technical Papers in Marine Science 44, p. 19 and table p. 23
    const rows = rowsOf('seawater_density_1atm')
    expect(rows.length).toBe(16)
    for (const { id: row, inputs, expected, tolerance } of rows) {
      const salinity = `${String(inputs.salinity_pss78)} PSS-78`
      const { figures } = await ask(id, { salinity, temperature: t90(inputs.temp_t68_C ?? NaN) })
      if (Math.abs(figures[0].value - expected) > tolerance)
        expect({ row, value: figures[0].value }).toBe(expected)
    }
  })

  it('shows six digits, and the salt by mass and by volume', async () => {
    const { figures, cautions } = await ask(id, water)
    expect(figures[0]).toMatchObject({ key: 'density', unit: 'kg/m3', rounded: '1023.34' })
    // 35.16504 g/kg (TEOS-10) × 1.02334 kg/L = 35.99 g/L, worked by hand
    expect(figures[1]).toMatchObject({ key: 'reference', unit: 'g/kg', rounded: '35.17' })
    expect(figures[2]).toMatchObject({ key: 'salt', unit: 'g/L', rounded: '35.99' })
    expect(codes(cautions)).toContain('three-figures')
  })

  it('gives the kilograms of a tank, with the range of its volume', async () => {
    const { figures, range, cautions } = await ask(id, {
      ...water,
      volume: '11400 L',
      volumeError: '2 percent',
    })
    // 11.4 m³ × 1,023.34 kg/m³ (dens.04 at 25 °C of 1968 is 1,023.34306, published)
    expect(figures[0]).toMatchObject({ key: 'mass', unit: 'kg', rounded: '11700', significantFigures: 3 })
    expect(figures[0].value).toBeCloseTo(11_666.09, 1)
    expect(figures[1]?.key).toBe('density')
    expect(range?.low).toBeCloseTo(figures[0].value * 0.98, 6)
    expect(range?.high).toBeCloseTo(figures[0].value * 1.02, 6)
    expect(codes(cautions)).toContain('water-only')
    const gallons = await ask(id, {
      ...water,
      salinity: '0 PSS-78',
      temperature: '4 degC',
      volume: '100 gal_us',
    })
    expect(gallons.figures[0].value).toBeCloseTo(378.53, 1)
  })

  it.each([
    ['a specific gravity', { salinity: '1.025 PSS-78' }, 'salinity specific-gravity-as-salinity'],
    ['brine', { salinity: '43 PSS-78' }, 'salinity above-most'],
    ['ice', { temperature: '-3 degC' }, 'temperature below-least'],
    ['hot water', { temperature: '41 degC' }, 'temperature above-most'],
    ['no water', { volume: '0 L' }, 'volume not-above-zero'],
    ['gallons of no country', { volume: '100 gal' }, 'volume gallon-not-stated'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf(id, { ...water, ...change })).toEqual([refused])
  })
})

describe('the freezing point', () => {
  const id = 'freezing-point'

  it('is the published one', async () => {
    // check value freeze.02: −1.922 °C ± 0.0005 on the scale of 1968, UNESCO Technical Papers in Marine Science 44, p. 30
    const { figures } = await ask(id, { salinity: '35 PSS-78' })
    expect(Math.abs(figures[0].value * 1.00024 - -1.922)).toBeLessThanOrEqual(0.0005)
    expect(figures[0]).toMatchObject({ key: 'freezing', unit: 'degC', rounded: '-1.92' })
  })

  it('warns of a surface that would ice up, or nearly', async () => {
    const of = async (coldest: string) => ask(id, { salinity: '35 PSS-78', coldest })
    const iced = await of('-2 degC')
    expect(codes(iced.cautions)).toContain('would-freeze')
    expect(iced.figures[1]).toMatchObject({ key: 'margin', unit: 'delta_degC' })
    expect(iced.figures[1]?.value).toBeCloseTo(-2 + 1.9215, 3)
    expect(codes((await of('-1.2 degC')).cautions)).toContain('near-freezing')
    const clear = codes((await of('2 degC')).cautions)
    expect(clear).not.toContain('would-freeze')
    expect(clear).not.toContain('near-freezing')
    const fahrenheit = await of('28 degF')
    expect(codes(fahrenheit.cautions)).toContain('would-freeze')
  })

  it('says that animals freeze before the water does', async () => {
    expect((await ask(id, { salinity: '35 PSS-78' })).cautions).toContainEqual({
      code: 'animals',
      level: 'warning',
    })
  })

  it.each([
    ['fresh water', { salinity: '3.9 PSS-78' }, 'salinity below-least'],
    ['brine', { salinity: '41 PSS-78' }, 'salinity above-most'],
    ['a specific gravity', { salinity: '1.025 PSS-78' }, 'salinity specific-gravity-as-salinity'],
    ['kelvin in a field of degrees', { coldest: '271 degC' }, 'coldest above-most'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf(id, { salinity: '35 PSS-78', ...change })).toEqual([refused])
  })
})
