import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { sayRefusal } from '../../../shared/bench/words.ts'
import cases from '../../published-values/cases/salinity-and-density.json' with { type: 'json' }
import { ask, bodyOf, refusalsOf } from './ask.ts'

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
const within = ({ id, expected, tolerance }: Row, value: number) => {
  if (Math.abs(value - expected) > tolerance) expect({ id, value }).toBe(expected)
}
const codes = (cautions: readonly { code: string }[]) => cautions.map((one) => one.code)
const sentence = (id: string, given: Record<string, string>) => {
  const of = calculatorAt(id)
  if (!of) throw new Error(id)
  const evaluation = evaluate(of, bodyOf(given))
  return evaluation.ok ? '' : evaluation.refusals.map((refusal) => sayRefusal(of, refusal)).join(' ')
}
/** The rows of 1983 give temperatures of 1968; the bench takes those of a thermometer of today. */
const t90 = (t68: number) => `${(t68 / 1.00024).toFixed(12)} degC`

describe('salinity from conductivity', () => {
  const id = 'salinity-from-conductivity'
  const meter = { measured: 'uncompensated', conductivity: '53.071 mS/cm', temperature: '25 degC' }

  it('answers every computed row of a meter', async () => {
    // check values cond.01 to cond.13 (computed; agree with the library of TEOS-10)
    const rows = rowsOf('salinity_from_conductivity')
    expect(rows.length).toBe(13)
    for (const row of rows) {
      const conductivity = `${String(row.inputs.conductivity_mS_per_cm)} mS/cm`
      const temperature = `${String(row.inputs.temp_t90_C)} degC`
      within(row, (await ask(id, { ...meter, conductivity, temperature })).figures[0].value)
    }
  })

  it('answers the published rows of a ratio at the surface', async () => {
    // Fofonoff and Millard 1983, UNESCO Technical Papers in Marine Science 44, p. 9 and table p. 13
    const rows = rowsOf('salinity_from_conductivity_ratio').filter((row) => row.inputs.pressure_dbar === 0)
    expect(rows.length).toBeGreaterThan(5)
    for (const row of rows) {
      const ratio = `${String(row.inputs.conductivity_ratio_R)} ratio`
      const given = { measured: 'ratio', ratio, temperature: t90(row.inputs.temp_t68_C ?? NaN) }
      within(row, (await ask(id, given)).figures[0].value)
    }
  })

  it('shows four digits, grams in a kilogram beside them, and the same from each unit', async () => {
    const { figures } = await ask(id, meter)
    expect(figures[0]).toMatchObject({
      key: 'salinity',
      unit: 'PSS-78',
      rounded: '35.00',
      significantFigures: 4,
    })
    // check value sref.01: 35.16504 g/kg (computed, TEOS-10)
    expect(figures[1]).toMatchObject({ key: 'reference', unit: 'g/kg', rounded: '35.17' })
    for (const conductivity of ['53071 uS/cm', '5.3071 S/m'])
      expect((await ask(id, { ...meter, conductivity })).figures[0].value).toBeCloseTo(figures[0].value, 10)
    expect((await ask(id, { ...meter, temperature: '77 degF' })).figures[0].value).toBeCloseTo(
      figures[0].value,
      10,
    )
  })

  it('takes a compensated reading at the temperature that the meter compensates to, and says it is approximate', async () => {
    const given = { measured: 'compensated-25', conductivity: '53.071 mS/cm' }
    const { figures, cautions } = await ask(id, given)
    expect(figures[0]).toMatchObject({ rounded: '35.0', significantFigures: 3 })
    expect(codes(cautions)).toContain('compensated')
    expect(codes((await ask(id, meter)).cautions)).not.toContain('compensated')
    // check value cond.09: 50 mS/cm at 20 °C is 36.7131 (computed)
    const at20 = await ask(id, { measured: 'compensated-20', conductivity: '50 mS/cm' })
    expect(at20.figures[0].value).toBeCloseTo(36.7131, 3)
  })

  it('carries the error of the meter', async () => {
    const { figures, range } = await ask(id, { ...meter, conductivityError: '1 percent' })
    expect(range?.low).toBeLessThan(34.7)
    expect(range?.high).toBeGreaterThan(35.3)
    expect(figures[0].significantFigures).toBe(3)
  })

  it('warns where the scale is stretched or nominal', async () => {
    expect(codes((await ask(id, { ...meter, temperature: '36 degC' })).cautions)).toContain('extrapolated')
    expect(codes((await ask(id, meter)).cautions)).not.toContain('extrapolated')
    const thin = await ask(id, { ...meter, conductivity: '1 mS/cm' })
    expect(codes(thin.cautions)).toContain('below-two')
    expect(codes(thin.cautions)).toContain('sea-water-only')
  })

  it.each([
    ['a meter that may compensate', { measured: '' }, 'measured compensation-not-said'],
    ['no conductivity', { conductivity: '0 mS/cm' }, 'conductivity not-above-zero'],
    ['pure water', { conductivity: '1 uS/cm' }, 'conductivity salinity-below-scale'],
    ['microsiemens typed as milli', { conductivity: '53071 mS/cm' }, 'conductivity salinity-above-scale'],
    ['hot water', { temperature: '41 degC' }, 'temperature above-most'],
    ['kelvin in a field of degrees', { temperature: '298 degC' }, 'temperature above-most'],
    ['a ratio below zero', { measured: 'ratio', ratio: '-0.1 ratio' }, 'ratio not-above-zero'],
    ['a ratio above the scale', { measured: 'ratio', ratio: '2 ratio' }, 'ratio salinity-above-scale'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf(id, { ...meter, ...change })).toEqual([refused])
  })

  it('says what to do', () => {
    expect(sentence(id, { ...meter, measured: '' })).toMatch(/compensates/)
    expect(sentence(id, { ...meter, conductivity: '1 uS/cm' })).toMatch(
      /^This water conducts too little for a salinity to be named\./,
    )
    expect(sentence(id, { ...meter, conductivity: '70 mS/cm' })).toMatch(/42/)
  })
})

describe('conductivity from salinity', () => {
  const id = 'conductivity-from-salinity'

  it('answers the published rows of a ratio at the surface', async () => {
    // Fofonoff and Millard 1983, UNESCO Technical Papers in Marine Science 44, table p. 14
    const rows = rowsOf('conductivity_ratio_from_salinity').filter((row) => row.inputs.pressure_dbar === 0)
    expect(rows.length).toBe(8)
    for (const row of rows) {
      const salinity = `${String(row.inputs.salinity_pss78)} PSS-78`
      const { figures } = await ask(id, { salinity, temperature: t90(row.inputs.temp_t68_C ?? NaN) })
      within(row, figures.find(({ key }) => key === 'ratio')?.value ?? NaN)
    }
  })

  it('is 53.07 mS/cm for 35 at 25 °C, and what a compensating meter shows at any temperature', async () => {
    // check value cond.10: 53.071 mS/cm (computed; the library of TEOS-10 has 53.071033)
    const { figures } = await ask(id, { salinity: '35 PSS-78', temperature: '25 degC' })
    expect(figures[0]).toMatchObject({ key: 'conductivity', unit: 'mS/cm', rounded: '53.07' })
    expect(Math.abs(figures[0].value - 53.071033)).toBeLessThan(1e-5)
    const cool = await ask(id, { salinity: '35 PSS-78', temperature: '15 degC' })
    expect(cool.figures[0].value).toBeCloseTo(42.914, 1)
    expect(cool.figures[1]).toMatchObject({ key: 'compensated', rounded: '53.1', significantFigures: 3 })
  })

  it('goes back to the salinity', async () => {
    for (const salinity of ['0.5', '1.9', '2.1', '12', '35', '41.9']) {
      const { figures } = await ask(id, { salinity: `${salinity} PSS-78`, temperature: '18 degC' })
      const conductivity = `${String(figures[0].value)} mS/cm`
      const back = await ask('salinity-from-conductivity', {
        measured: 'uncompensated',
        conductivity,
        temperature: '18 degC',
      })
      expect(back.figures[0].value).toBeCloseTo(Number(salinity), 6)
    }
  })

  it('warns where the scale is stretched or nominal', async () => {
    const warm = await ask(id, { salinity: '1.5 PSS-78', temperature: '38 degC' })
    expect(codes(warm.cautions)).toEqual(
      expect.arrayContaining(['extrapolated', 'below-two', 'sea-water-only']),
    )
  })

  it.each([
    ['a specific gravity', { salinity: '1.026 PSS-78' }, 'salinity specific-gravity-as-salinity'],
    ['pure water', { salinity: '0 PSS-78' }, 'salinity below-least'],
    ['brine', { salinity: '43 PSS-78' }, 'salinity above-most'],
    ['parts per thousand', { salinity: '35 ppt' }, 'salinity parts-per-thousand'],
    ['ice', { temperature: '-3 degC' }, 'temperature below-least'],
  ])('refuses %s', (_, change, refused) => {
    expect(refusalsOf(id, { salinity: '35 PSS-78', temperature: '25 degC', ...change })).toEqual([refused])
  })
})
