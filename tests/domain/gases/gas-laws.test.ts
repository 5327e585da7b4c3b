import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { garciaGordonOxygen } from '../../../shared/domain/gases/garcia-gordon-oxygen.ts'
import { gasLimits, standardAtmosphereKPa } from '../../../shared/domain/gases/gas-limits.ts'
import { oxygenFromPercent, oxygenPercentSaturation } from '../../../shared/domain/gases/oxygen-saturation.ts'
import { oxygenSolubility, type WaterUnderAir } from '../../../shared/domain/gases/oxygen-solubility.ts'
import { airPressureUnits, readAirPressure } from '../../../shared/domain/gases/read-air-pressure.ts'
import { standardPressure } from '../../../shared/domain/gases/standard-pressure.ts'
import type { Result } from '../../../shared/domain/result.ts'
import { convert } from '../../../shared/domain/units/convert.ts'

function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}
const saturated = (water: WaterUnderAir) => valueOf(oxygenSolubility(water)).mgPerL

/** Figures as meters show them: tenths of a degree, tenths of salinity, tenths of a kilopascal. */
const tenths = (least: number, most: number) =>
  fc.integer({ min: Math.ceil(least * 10), max: Math.floor(most * 10) }).map((value) => value / 10)
const waters = fc.record({
  temperatureC: tenths(0, 40),
  salinityPss78: tenths(0, 40),
  pressureKPa: tenths(50.7, 111.4),
})

describe('laws of dissolved oxygen', () => {
  it('falls as the water gets warmer or saltier and as the pressure falls', () => {
    fc.assert(
      fc.property(waters, (water) => {
        const { temperatureC, salinityPss78, pressureKPa } = water
        fc.pre(temperatureC < 40 && salinityPss78 < 40 && pressureKPa > 50.8)
        const here = saturated(water)
        expect(saturated({ ...water, temperatureC: temperatureC + 0.1 })).toBeLessThan(here)
        expect(saturated({ ...water, salinityPss78: salinityPss78 + 0.1 })).toBeLessThan(here)
        expect(saturated({ ...water, pressureKPa: pressureKPa - 0.1 })).toBeLessThan(here)
      }),
    )
  })

  it('falls with altitude, through the standard pressure', () => {
    fc.assert(
      fc.property(fc.integer({ min: -500, max: 5400 }), tenths(0, 40), (altitudeM, temperatureC) => {
        const at = (metres: number) =>
          saturated({
            temperatureC,
            salinityPss78: 0,
            pressureKPa: valueOf(standardPressure({ altitudeM: metres })),
          })
        expect(at(altitudeM + 1)).toBeLessThan(at(altitudeM))
      }),
    )
  })

  it('is the product of its three steps, and the factors are 1 in fresh water at one atmosphere', () => {
    fc.assert(
      fc.property(waters, (water) => {
        const { mgPerL, freshWaterMgPerL, salinityFactor, pressure } = valueOf(oxygenSolubility(water))
        expect(mgPerL).toBe(freshWaterMgPerL * salinityFactor * pressure.factor)
        const plain = valueOf(
          oxygenSolubility({ ...water, salinityPss78: 0, pressureKPa: standardAtmosphereKPa }),
        )
        expect([plain.salinityFactor, plain.pressure.factor]).toEqual([1, 1])
        expect(plain.mgPerL).toBe(freshWaterMgPerL)
      }),
    )
  })

  it('comes back from percent, which is 100 at saturation', () => {
    fc.assert(
      fc.property(waters, tenths(0, 300), (water, saturationPercent) => {
        const { mgPerL } = valueOf(oxygenFromPercent({ ...water, saturationPercent }))
        fc.pre(mgPerL <= 45)
        const { percent } = valueOf(oxygenPercentSaturation({ ...water, oxygenMgPerL: mgPerL }))
        expect(Math.abs(percent - saturationPercent)).toBeLessThanOrEqual(1e-12 * saturationPercent)
        const full = valueOf(oxygenPercentSaturation({ ...water, oxygenMgPerL: saturated(water) }))
        expect(full.percent).toBeCloseTo(100, 10)
      }),
    )
  })

  it('is within 0.003 mg/L of the refit of Garcia and Gordon, over every degree and salinity', () => {
    const differences: number[] = []
    for (let temperatureC = 0; temperatureC <= 40; temperatureC += 1)
      for (let salinityPss78 = 0; salinityPss78 <= 40; salinityPss78 += 1) {
        const water = { temperatureC, salinityPss78 }
        const first = saturated({ ...water, pressureKPa: standardAtmosphereKPa })
        differences.push(Math.abs(valueOf(garciaGordonOxygen(water)).mgPerL - first))
      }
    expect(Math.max(...differences)).toBeLessThan(0.003)
    // the bound is no wider than it has to be
    expect(Math.max(...differences)).toBeGreaterThan(0.0027)
  })

  it('has a standard pressure that falls all the way, above and below the sea', () => {
    expect(valueOf(standardPressure({ altitudeM: 0 }))).toBe(standardAtmosphereKPa)
    expect(valueOf(standardPressure({ altitudeM: -500 }))).toBeCloseTo(107.478, 2)
    expect(valueOf(standardPressure({ altitudeM: 11_000 }))).toBeCloseTo(22.63, 1)
    for (const [altitudeM, code] of [
      [-500.1, 'below-least'],
      [11_000.1, 'above-most'],
    ] as const)
      expect(standardPressure({ altitudeM })).toMatchObject({ refusal: { code, field: 'altitudeM' } })
  })
})

describe('the unit of an air pressure', () => {
  it('comes out the same whatever unit the barometer is in', () => {
    fc.assert(
      fc.property(tenths(50.7, 111.4), fc.constantFrom(...airPressureUnits), (kPa, unit) => {
        const pressure = valueOf(convert(kPa, 'kPa', unit))
        expect(valueOf(readAirPressure({ pressure, unit }))).toBeCloseTo(kPa, 10)
      }),
    )
  })

  it('takes both ends of the range of the equation', () => {
    for (const pressure of [0.5, 1, 1.1]) {
      const pressureKPa = valueOf(readAirPressure({ pressure, unit: 'atm' }))
      expect(oxygenSolubility({ temperatureC: 20, salinityPss78: 0, pressureKPa }).ok).toBe(true)
    }
  })

  it.each([
    [760, 'atm', 'mmHg'],
    [760, 'kPa', 'mmHg'],
    [101.3, 'mmHg', 'kPa'],
    [1013, 'mmHg', 'hPa'],
    [29.92, 'mmHg', 'inHg'],
    [14.7, 'kPa', 'psi'],
    [1, 'kPa', 'atm'],
  ] as const)('takes %s %s for a wrong unit: it would be an air pressure in %s', (pressure, unit, other) => {
    expect(readAirPressure({ pressure, unit })).toEqual({
      ok: false,
      refusal: { code: 'pressure-looks-like-other-unit', field: 'pressure', params: { unit, other } },
    })
  })

  it.each([
    [0.3, 'atm', 'below-least'],
    [-101.3, 'kPa', 'below-least'],
    [5000, 'kPa', 'above-most'],
    [1e308, 'atm', 'not-finite'],
  ] as const)('refuses %s %s, which no unit makes an air pressure, as %s', (pressure, unit, code) => {
    expect(readAirPressure({ pressure, unit })).toMatchObject({ refusal: { code, field: 'pressure' } })
  })

  it('knows no other unit', () => {
    const unit = 'furlong' as 'kPa'
    expect(readAirPressure({ pressure: 1, unit })).toMatchObject({
      refusal: { code: 'unknown-pressure-unit', field: 'unit' },
    })
  })
})

describe('hostile input', () => {
  const hostile = fc.oneof(
    fc.double(),
    fc.constantFrom<unknown>(NaN, Infinity, -Infinity, '20', undefined, null, {}, [], 1e308, -1e308),
  ) as fc.Arbitrary<number>

  it('has a finite answer or a refusal that names an argument', () => {
    const figures = (value: unknown): number[] =>
      typeof value === 'number' ? [value] : Object.values(value as object).flatMap(figures)
    fc.assert(
      fc.property(hostile, hostile, hostile, hostile, (a, b, c, d) => {
        const water = { temperatureC: a, salinityPss78: b, pressureKPa: c }
        const answers: Result<unknown>[] = [
          oxygenSolubility(water),
          oxygenPercentSaturation({ ...water, oxygenMgPerL: d }),
          oxygenFromPercent({ ...water, saturationPercent: d }),
          garciaGordonOxygen(water),
          standardPressure({ altitudeM: a }),
          readAirPressure({ pressure: a, unit: 'kPa' }),
        ]
        for (const answer of answers)
          if (answer.ok) expect(figures(answer.value).every(Number.isFinite)).toBe(true)
          else expect(answer.refusal.field).toBeTruthy()
      }),
    )
  })

  it('refuses just outside every limit, naming the argument', () => {
    const inside = { temperatureC: 20, salinityPss78: 0, pressureKPa: standardAtmosphereKPa }
    for (const [field, least, most] of [
      ['temperatureC', gasLimits.leastTemperatureC, gasLimits.mostTemperatureC],
      ['salinityPss78', gasLimits.leastSalinityPss78, gasLimits.mostSalinityPss78],
      ['pressureKPa', gasLimits.leastPressureKPa, gasLimits.mostPressureKPa],
    ] as const) {
      for (const value of [least, most]) expect(oxygenSolubility({ ...inside, [field]: value }).ok).toBe(true)
      expect(oxygenSolubility({ ...inside, [field]: least - 1e-6 })).toMatchObject({
        refusal: { code: 'below-least', field },
      })
      expect(oxygenSolubility({ ...inside, [field]: most + 1e-6 })).toMatchObject({
        refusal: { code: 'above-most', field },
      })
    }
  })
})
