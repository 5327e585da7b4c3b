import { describe, expect, it } from 'vitest'
import { calculatorAt } from '../../../shared/bench/calculators.ts'
import { evaluate } from '../../../shared/bench/evaluate.ts'
import { sayRefusal } from '../../../shared/bench/words.ts'
import { oxygenFloorMgPerL } from '../../../shared/domain/gases/oxygen-alarms.ts'
import { oxygen } from '../../../shared/domain/cautions/rules/r01-oxygen.ts'
import oxygenCases from '../../published-values/cases/oxygen.json' with { type: 'json' }
import { ask, bodyOf, refusalsOf } from './ask.ts'

const sea = { temperature: '25 degC', salinity: '35 PSS-78', pressureBy: 'station', pressure: '1 atm' }
const codes = (cautions: readonly { code: string; level: string }[]) =>
  cautions.map(({ code, level }) => `${level} ${code}`)
const said = (id: string, given: Record<string, string>) => {
  const of = calculatorAt(id)
  if (!of) throw new Error(id)
  const evaluation = evaluate(of, bodyOf(given))
  return evaluation.ok ? [] : evaluation.refusals.map((refusal) => sayRefusal(of, refusal))
}

describe('oxygen at saturation', () => {
  interface Row {
    id: string
    calculator: string
    inputs: { temp_C: number; salinity_pss78: number; pressure_atm?: number; pressure_mmHg?: number }
    expected: number
    tolerance: number
  }
  const rows = (oxygenCases as unknown as Row[]).filter(
    (row) => row.calculator === 'oxygen_solubility' && typeof row.expected === 'number',
  )

  it('answers every published and computed row of the equation', async () => {
    // EN 25814 / ISO 5814 table, APHA 4500-O:I (from memory) and rows computed from Benson and Krause 1984
    expect(rows.length).toBeGreaterThan(40)
    for (const { id, inputs, expected, tolerance } of rows) {
      const unit = inputs.pressure_mmHg === undefined ? 'atm' : 'mmHg'
      const given = {
        find: 'saturation',
        temperature: `${String(inputs.temp_C)} degC`,
        salinity: `${String(inputs.salinity_pss78)} PSS-78`,
        pressureBy: 'station',
        pressure: `${String(inputs.pressure_mmHg ?? inputs.pressure_atm)} ${unit}`,
      }
      const { figures } = await ask('oxygen-saturation', given)
      if (Math.abs(figures[0].value - expected) > tolerance)
        expect({ id, value: figures[0].value }).toBe(expected)
    }
  })

  it('shows three digits and names the second equation beside the first', async () => {
    // check value do.sal: 6.772 mg/L at 25 °C and 35 (computed); Garcia and Gordon 1992 × 1.42905 = 6.771 (do.gg03)
    const { figures, working } = await ask('oxygen-saturation', { ...sea, find: 'saturation' })
    expect(figures[0]).toMatchObject({
      key: 'saturation',
      unit: 'mg/L',
      rounded: '6.77',
      significantFigures: 3,
    })
    expect(figures[1]).toMatchObject({ key: 'saturation-volume', unit: 'mL/L', rounded: '4.74' })
    const valueOf = (key: string) => working.find((line) => line.key === key)?.value ?? NaN
    expect(Math.abs(valueOf('second') - 6.771)).toBeLessThanOrEqual(0.001)
    expect(Math.abs(valueOf('first-standard') - valueOf('second'))).toBeLessThan(0.003)
  })
})

describe('oxygen measured', () => {
  it.each([
    // check values do.sat01 to do.sat04 ± 0.02 (computed from Benson and Krause 1984)
    ['7 mg/L', '25 degC', '0 PSS-78', '1 atm', 84.71],
    ['6 mg/L', '25 degC', '35 PSS-78', '1 atm', 88.6],
    ['5.5 mg/L', '20 degC', '0 PSS-78', '0.886974 atm', 68.4],
    ['9.0924 mg/L', '20 degC', '0 PSS-78', '1013.25 hPa', 100],
  ])(
    '%s at %s, salinity %s and %s is a percentage',
    async (oxygen, temperature, salinity, pressure, percent) => {
      const given = { find: 'percent', temperature, salinity, oxygen, pressureBy: 'station', pressure }
      const { figures } = await ask('oxygen-saturation', given)
      expect(figures[0]).toMatchObject({ key: 'percent', unit: 'percent' })
      expect(Math.abs(figures[0].value - percent)).toBeLessThanOrEqual(0.02)
    },
  )

  it('takes millilitres of the gas, and carries the error of the reading', async () => {
    const given = { ...sea, find: 'percent', oxygen: '4.2 mL/L', oxygenError: '5 percent' }
    const { figures, range } = await ask('oxygen-saturation', given)
    // 4.2 mL/L × 1.42905 mg/mL = 6.002 mg/L, of 6.772 mg/L (worked by hand)
    expect(figures[0].value).toBeCloseTo((100 * 4.2 * 1.42905) / 6.772, 1)
    expect(range?.low).toBeCloseTo(figures[0].value * 0.95, 8)
    expect(range?.high).toBeCloseTo(figures[0].value * 1.05, 8)
    expect(figures[0].significantFigures).toBe(2)
  })

  it('gives milligrams for a percentage', async () => {
    // check value do.inv01: 5.575 mg/L ± 0.001 at 80 %, 24 °C, 33 (computed)
    const given = { ...sea, find: 'concentration', temperature: '24 degC', salinity: '33 PSS-78' }
    const { figures } = await ask('oxygen-saturation', { ...given, percent: '80 percent' })
    expect(figures[0]).toMatchObject({ key: 'concentration', unit: 'mg/L' })
    expect(Math.abs(figures[0].value - 5.575)).toBeLessThanOrEqual(0.001)
  })

  it('says the percentage at one atmosphere beside the local one', async () => {
    const high = { find: 'percent', temperature: '20 degC', salinity: '0 PSS-78', oxygen: '7 mg/L' }
    const { figures } = await ask('oxygen-saturation', {
      ...high,
      pressureBy: 'altitude',
      altitude: '1500 m',
    })
    const shown = Object.fromEntries(figures.map(({ key, value }) => [key, value]))
    // 7 of 9.092 mg/L, APHA table 4500-O:I from memory
    expect(shown['percent-standard']).toBeCloseTo((100 * 7) / 9.092, 1)
    expect(shown.percent ?? 0).toBeGreaterThan(90)
    // check value baro.04: 84.556 kPa ± 0.005 (computed, standard atmosphere)
    expect(Math.abs((shown['air-pressure'] ?? 0) - 84.556)).toBeLessThanOrEqual(0.005)
  })
})

describe('the air pressure', () => {
  const fresh = { find: 'saturation', temperature: '20 degC', salinity: '0 PSS-78' }
  it('of a weather report is brought back to the altitude', async () => {
    const report = { pressureBy: 'sea-level', seaLevel: '1013.25 hPa', altitude: '1500 m' }
    const { figures, cautions } = await ask('oxygen-saturation', { ...fresh, ...report })
    const byAltitude = await ask('oxygen-saturation', {
      ...fresh,
      pressureBy: 'altitude',
      altitude: '1500 m',
    })
    expect(figures[0].value).toBeCloseTo(byAltitude.figures[0].value, 10)
    expect(codes(cautions)).toContain('note pressure-scaled')
    expect(codes(byAltitude.cautions)).toContain('warning pressure-from-altitude')
  })
  it('is one atmosphere only where that is said', async () => {
    const { figures, cautions } = await ask('oxygen-saturation', { ...fresh, pressureBy: 'standard' })
    expect(figures[0].value).toBeCloseTo(9.092, 3)
    expect(codes(cautions)).toContain('warning one-atmosphere')
  })
  it('is doubted where it does not belong to the altitude', async () => {
    const given = { ...fresh, pressureBy: 'station', pressure: '1013 hPa', stationAltitude: '500 m' }
    const { cautions } = await ask('oxygen-saturation', given)
    expect(codes(cautions)).toContain('warning pressure-not-usual')
    expect(cautions.find((one) => one.code === 'pressure-not-usual')?.params).toMatchObject({
      usual: '954.6\u00a0hPa',
    })
    const right = await ask('oxygen-saturation', { ...given, pressure: '955 hPa' })
    expect(codes(right.cautions)).not.toContain('warning pressure-not-usual')
  })
  it('is doubted where hectopascals stand for millimetres', async () => {
    const { cautions } = await ask('oxygen-saturation', {
      ...fresh,
      pressureBy: 'station',
      pressure: '760 hPa',
    })
    expect(codes(cautions)).toContain('warning not-plausible')
  })
})

describe('oxygen is warned of', () => {
  const of = async (oxygen: string) =>
    codes((await ask('oxygen-saturation', { ...sea, find: 'percent', oxygen })).cautions)
  it('above 110 %, and below the floor of a bath', async () => {
    expect(await of('7.5 mg/L')).toContain('warning supersaturated')
    expect(await of('7.4 mg/L')).not.toContain('warning supersaturated')
    expect(await of('4.9 mg/L')).toContain('warning low')
    expect(await of('5 mg/L')).not.toContain('warning low')
    const given = { ...sea, find: 'concentration' }
    const [low, high] = ['70 percent', '115 percent']
    expect(codes((await ask('oxygen-saturation', { ...given, percent: low })).cautions)).toContain(
      'warning low',
    )
    expect(codes((await ask('oxygen-saturation', { ...given, percent: high })).cautions)).toContain(
      'warning supersaturated',
    )
  })
  it('by the floor that the rule before a bath has', () => {
    expect(oxygen.parameters.oxygenFloorMgPerL?.default).toBe(oxygenFloorMgPerL)
  })
})

describe('oxygen is refused', () => {
  const given = { ...sea, find: 'percent', oxygen: '6 mg/L' }
  it.each([
    // check values do.refuse1 and do.refuse2
    ['below 0 °C', { temperature: '-5 degC' }, 'temperature below-least'],
    [
      'millimetres in a field of atmospheres',
      { pressure: '760 atm' },
      'pressure pressure-looks-like-other-unit',
    ],
    ['a pressure of unstated origin', { pressureBy: '' }, 'pressureBy pressure-not-said'],
    ['no pressure at all', { pressure: '' }, 'pressure blank'],
    ['brine', { salinity: '41 PSS-78' }, 'salinity above-most'],
    ['a specific gravity', { salinity: '1.025 PSS-78' }, 'salinity specific-gravity-as-salinity'],
    ['more oxygen than any water', { oxygen: '46 mg/L' }, 'oxygen above-most'],
    ['more millilitres than any water', { oxygen: '32 mL/L' }, 'oxygen above-most'],
    ['less than none', { oxygen: '-1 mg/L' }, 'oxygen below-least'],
    ['parts per million', { oxygen: '6 ppm' }, 'oxygen bare-ppm'],
    ['air too thin', { pressureBy: 'altitude', altitude: '6000 m' }, 'altitude air-too-thin'],
    [
      'a station pressure as one of a weather report',
      { pressureBy: 'sea-level', seaLevel: '840 hPa', altitude: '1500 m' },
      'seaLevel below-least',
    ],
    [
      'a weather report in the wrong unit',
      { pressureBy: 'sea-level', seaLevel: '1013 mmHg', altitude: '0 m' },
      'seaLevel pressure-looks-like-other-unit',
    ],
  ])('for %s', (_, change, refused) => {
    expect(refusalsOf('oxygen-saturation', { ...given, ...change })).toEqual([refused])
  })
  it('in sentences that say what to do', () => {
    expect(said('oxygen-saturation', { ...given, pressure: '760 atm' })).toEqual([
      'This is no air pressure in atm; in mmHg it would be one. Choose its unit.',
    ])
    expect(said('oxygen-saturation', { ...given, pressureBy: '' })[0]).toMatch(/weather report/)
  })
})

describe('barometric pressure', () => {
  it.each([
    // check values baro.01 to baro.05 ± 0.005 kPa (computed, ICAO and US Standard Atmosphere 1976)
    ['0 m', 101.325],
    ['500 m', 95.461],
    ['1000 m', 89.875],
    ['1500 m', 84.556],
    ['2000 m', 79.495],
    ['6561.679790026247 ft', 79.495],
  ])('is by the standard at %s %f kPa', async (altitude, kPa) => {
    const { figures, cautions } = await ask('barometric-pressure', { find: 'standard', altitude })
    expect(Math.abs(figures[0].value - kPa)).toBeLessThanOrEqual(0.005)
    expect(figures.map(({ unit }) => unit)).toEqual(['kPa', 'hPa', 'mmHg', 'inHg'])
    expect(codes(cautions)).toContain('note pressure-from-altitude')
  })
  it('comes from a weather report, and goes back to it', async () => {
    const report = { find: 'station', seaLevel: '30.1 inHg', altitude: '1200 ft' }
    const { figures } = await ask('barometric-pressure', report)
    // 101.930 kPa × (1 − 2.25577E−5 × 365.76 m)^5.25588 (worked by hand)
    const station = 101.9303 * (1 - 2.25577e-5 * 365.76) ** 5.25588
    expect(figures[0].value).toBeCloseTo(station, 3)
    expect(figures[0].significantFigures).toBe(4)
    const back = { find: 'sea-level', station: `${String(figures[0].value)} kPa`, altitude: '1200 ft' }
    expect((await ask('barometric-pressure', back)).figures[3]?.value).toBeCloseTo(30.1, 8)
  })
  it.each([
    ['too high an altitude', { find: 'standard', altitude: '12000 m' }, 'altitude above-most'],
    ['no altitude', { find: 'standard' }, 'altitude blank'],
    [
      'a reading that is reduced already',
      { find: 'sea-level', station: '1013 hPa', altitude: '1500 m' },
      'station pressure-not-of-altitude',
    ],
    [
      'a weather report in another unit',
      { find: 'station', seaLevel: '29.92 hPa', altitude: '0 m' },
      'seaLevel pressure-looks-like-other-unit',
    ],
  ])('refuses %s', (_, given, refused) => {
    expect(refusalsOf('barometric-pressure', given)).toEqual([refused])
  })
})
