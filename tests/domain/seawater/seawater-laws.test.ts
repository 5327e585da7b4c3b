import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { freezingPoint } from '../../../shared/domain/seawater/freezing-point.ts'
import { referenceSalinity } from '../../../shared/domain/seawater/reference-salinity.ts'
import {
  conductivityRatioFromSalinity,
  salinityFromConductivity,
  salinityFromConductivityRatio,
} from '../../../shared/domain/seawater/salinity-from-conductivity.ts'
import { mgPerLitreFromMgPerKg, seawaterDensity } from '../../../shared/domain/seawater/seawater-density.ts'
import {
  salinityFromSpecificGravity,
  specificGravityFromSalinity,
} from '../../../shared/domain/seawater/specific-gravity.ts'

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const temperature = number(-2, 40)
const salinity = number(0, 42)
const pressure = number(0, 100_000)

function valueOf(result: Result<number>): number {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}

const refusalOf = (result: Result<number>) =>
  result.ok ? result.value : `${result.refusal.code} ${result.refusal.field}`

describe('sea water', () => {
  it('has the salinity back from its conductivity ratio, at every temperature and pressure', () => {
    fc.assert(
      fc.property(
        number(2.001, 41.999),
        temperature,
        pressure,
        (salinityPss78, temperatureC, gaugePressureKPa) => {
          const water = { temperatureC, gaugePressureKPa }
          const conductivityRatio = valueOf(conductivityRatioFromSalinity({ salinityPss78, ...water }))
          const back = valueOf(salinityFromConductivityRatio({ conductivityRatio, ...water }))
          expect(Math.abs(back - salinityPss78)).toBeLessThan(1e-9)
        },
      ),
    )
  })

  it('has it back below 2 as well, within the step that the scale makes at 2', () => {
    fc.assert(
      fc.property(number(0.001, 2.001), temperature, (salinityPss78, temperatureC) => {
        const water = { temperatureC, gaugePressureKPa: 0 }
        const conductivityRatio = valueOf(conductivityRatioFromSalinity({ salinityPss78, ...water }))
        const back = valueOf(salinityFromConductivityRatio({ conductivityRatio, ...water }))
        expect(Math.abs(back - salinityPss78)).toBeLessThan(salinityPss78 < 1.999 ? 1e-9 : 4e-4)
      }),
    )
  })

  it('is saltier the better it conducts, but for the step at 2', () => {
    fc.assert(
      fc.property(
        number(0.003, 40),
        number(0.001, 10),
        temperature,
        (conductivityMSPerCm, more, temperatureC) => {
          const less = salinityFromConductivity({ conductivityMSPerCm, temperatureC })
          const greater = salinityFromConductivity({
            conductivityMSPerCm: conductivityMSPerCm + more,
            temperatureC,
          })
          fc.pre(less.ok && greater.ok)
          expect(valueOf(greater)).toBeGreaterThan(valueOf(less) - 4e-4)
        },
      ),
    )
  })

  it('conducts better the warmer it is', () => {
    fc.assert(
      fc.property(number(2, 41), number(-2, 39), (salinityPss78, temperatureC) => {
        const at = (t: number) =>
          valueOf(conductivityRatioFromSalinity({ salinityPss78, temperatureC: t, gaugePressureKPa: 0 }))
        expect(at(temperatureC + 1)).toBeGreaterThan(at(temperatureC))
      }),
    )
  })

  it('reads the same from a meter as from the ratio to 42.914 mS/cm', () => {
    fc.assert(
      fc.property(number(1, 40), number(15, 40), (conductivityMSPerCm, temperatureC) => {
        const conductivityRatio = conductivityMSPerCm / 42.914
        expect(salinityFromConductivity({ conductivityMSPerCm, temperatureC })).toMatchObject(
          salinityFromConductivityRatio({ conductivityRatio, temperatureC, gaugePressureKPa: 0 }),
        )
      }),
    )
  })

  it('is denser the saltier it is', () => {
    fc.assert(
      fc.property(number(0, 41), number(0.001, 1), temperature, (salinityPss78, more, temperatureC) => {
        expect(
          valueOf(seawaterDensity({ salinityPss78: salinityPss78 + more, temperatureC })),
        ).toBeGreaterThan(valueOf(seawaterDensity({ salinityPss78, temperatureC })))
      }),
    )
  })

  it('holds by volume in proportion to what it holds by mass', () => {
    fc.assert(
      fc.property(number(0, 1000), salinity, temperature, (mgPerKg, salinityPss78, temperatureC) => {
        const water = { salinityPss78, temperatureC }
        const whole = valueOf(mgPerLitreFromMgPerKg({ mgPerKg: 1000 * mgPerKg, ...water }))
        expect(whole).toBeCloseTo(mgPerKg * valueOf(seawaterDensity(water)), 6)
      }),
    )
  })

  it('freezes colder the saltier it is and the deeper it lies', () => {
    fc.assert(
      fc.property(number(4, 39), number(0, 4900), (salinityPss78, gaugePressureKPa) => {
        const here = valueOf(freezingPoint({ salinityPss78, gaugePressureKPa }))
        expect(valueOf(freezingPoint({ salinityPss78: salinityPss78 + 1, gaugePressureKPa }))).toBeLessThan(
          here,
        )
        expect(
          valueOf(freezingPoint({ salinityPss78, gaugePressureKPa: gaugePressureKPa + 100 })),
        ).toBeLessThan(here)
      }),
    )
  })

  it('has a reference salinity in proportion, 35.16504 g/kg at 35', () => {
    fc.assert(
      fc.property(salinity, (salinityPss78) => {
        expect(valueOf(referenceSalinity({ salinityPss78 })) * 35).toBeCloseTo(35.16504 * salinityPss78, 9)
      }),
    )
  })
})

describe('specific gravity', () => {
  it('gives the salinity back that it was computed from', () => {
    fc.assert(
      fc.property(
        number(1.051, 41.9),
        temperature,
        number(0, 40),
        (salinityPss78, waterTemperatureC, ref) => {
          const at = { waterTemperatureC, referenceTemperatureC: ref }
          const specificGravity = valueOf(specificGravityFromSalinity({ salinityPss78, ...at }))
          fc.pre(specificGravity >= 0.995 && specificGravity <= 1.035)
          const back = valueOf(salinityFromSpecificGravity({ specificGravity, ...at }))
          expect(Math.abs(back - salinityPss78)).toBeLessThan(1e-8)
        },
      ),
    )
  })

  it('comes back from both ends of the scale', () => {
    const at = { waterTemperatureC: 25, referenceTemperatureC: 25 }
    for (const salinityPss78 of [0, 42]) {
      const specificGravity = valueOf(specificGravityFromSalinity({ salinityPss78, ...at }))
      expect(valueOf(salinityFromSpecificGravity({ specificGravity, ...at }))).toBeCloseTo(salinityPss78, 8)
    }
  })

  it('says another salinity against another reference: 1.025 is 33.2, 32.9 or 37.2', () => {
    const of = (waterTemperatureC: number, referenceTemperatureC: number) =>
      valueOf(
        salinityFromSpecificGravity({ specificGravity: 1.025, waterTemperatureC, referenceTemperatureC }),
      )
    expect([of(25, 25), of(20, 20), of(25, 4)].map((s) => s.toFixed(1))).toEqual(['33.2', '32.9', '37.2'])
  })

  it('recognises a salinity in its place, and itself in the place of a salinity', () => {
    const at = { waterTemperatureC: 25, referenceTemperatureC: 25 }
    const gravity = (specificGravity: number) =>
      refusalOf(salinityFromSpecificGravity({ specificGravity, ...at }))
    expect([2, 25, 42].map(gravity)).toEqual(
      Array.from({ length: 3 }, () => 'salinity-as-specific-gravity specificGravity'),
    )
    expect([1.036, 1.2, 43].map(gravity)).toEqual(
      Array.from({ length: 3 }, () => 'above-most specificGravity'),
    )
    expect(gravity(0.994)).toBe('below-least specificGravity')
    expect(gravity(0.996)).toBe('lighter-than-fresh-water specificGravity')
    expect(gravity(1.0349)).toBe('salinity-above-scale specificGravity')
    const of = (salinityPss78: number) => refusalOf(specificGravityFromSalinity({ salinityPss78, ...at }))
    // 0.99 to 1.05, check value sal.refuse2 (computed); 1.0 may be either
    expect([0.99, 0.995, 1, 1.001, 1.025, 1.035, 1.05].map(of)).toEqual(
      Array.from({ length: 7 }, () => 'specific-gravity-as-salinity salinityPss78'),
    )
    expect([0.98, 1.06].every((s) => typeof of(s) === 'number')).toBe(true)
  })
})

describe('what has no answer', () => {
  it('names the number at fault', () => {
    const meter = (conductivityMSPerCm: number, temperatureC: number) =>
      refusalOf(salinityFromConductivity({ conductivityMSPerCm, temperatureC }))
    expect(meter(0, 25)).toBe('not-above-zero conductivityMSPerCm')
    expect(meter(0.001, 25)).toBe('salinity-below-scale conductivityMSPerCm')
    expect(meter(70, 25)).toBe('salinity-above-scale conductivityMSPerCm')
    expect(meter(50, -2.1)).toBe('below-least temperatureC')
    expect(meter(50, 40.1)).toBe('above-most temperatureC')
    expect(refusalOf(seawaterDensity({ salinityPss78: 42.1, temperatureC: 25 }))).toBe(
      'above-most salinityPss78',
    )
    expect(refusalOf(freezingPoint({ salinityPss78: 3.9, gaugePressureKPa: 0 }))).toBe(
      'below-least salinityPss78',
    )
    expect(refusalOf(freezingPoint({ salinityPss78: 35, gaugePressureKPa: 5001 }))).toBe(
      'above-most gaugePressureKPa',
    )
  })

  it('is refused, never answered with no number and never thrown, whatever is handed in', () => {
    const hostile = fc.oneof(
      fc.double(),
      fc.constantFrom(0, -0, NaN, Infinity, -Infinity, Number.MIN_VALUE, Number.MAX_VALUE, 1.025, 35),
      fc.constantFrom<unknown>('35', '', null, undefined, true, {}, [35]) as fc.Arbitrary<number>,
    )
    fc.assert(
      fc.property(hostile, hostile, hostile, (x, y, z) => {
        const results: Result<number>[] = [
          salinityFromConductivityRatio({ conductivityRatio: x, temperatureC: y, gaugePressureKPa: z }),
          salinityFromConductivity({ conductivityMSPerCm: x, temperatureC: y }),
          conductivityRatioFromSalinity({ salinityPss78: x, temperatureC: y, gaugePressureKPa: z }),
          seawaterDensity({ salinityPss78: x, temperatureC: y }),
          mgPerLitreFromMgPerKg({ mgPerKg: x, salinityPss78: y, temperatureC: z }),
          specificGravityFromSalinity({ salinityPss78: x, waterTemperatureC: y, referenceTemperatureC: z }),
          salinityFromSpecificGravity({ specificGravity: x, waterTemperatureC: y, referenceTemperatureC: z }),
          freezingPoint({ salinityPss78: x, gaugePressureKPa: y }),
          referenceSalinity({ salinityPss78: x }),
        ]
        for (const result of results) {
          if (result.ok) expect(Number.isFinite(result.value)).toBe(true)
          else expect(result.refusal.field).toBeTruthy()
        }
      }),
    )
  })
})
