import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { freezingMargin, freezingPoint } from '../../../shared/domain/seawater/freezing-point.ts'
import { referenceSalinity, saltGPerLitre } from '../../../shared/domain/seawater/reference-salinity.ts'
import { seawaterDensity } from '../../../shared/domain/seawater/seawater-density.ts'
import { waterMass } from '../../../shared/domain/seawater/water-mass.ts'

const number = (min: number, max: number) => fc.double({ min, max, noNaN: true })

function valueOf<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field}`)
  return result.value
}
const refusalOf = (result: Result<unknown>) =>
  result.ok ? 'answered' : `${result.refusal.field} ${result.refusal.code}`

describe('the mass of a water', () => {
  it('is its volume times its density, and twice as much for twice the volume', () => {
    fc.assert(
      fc.property(
        number(0.001, 1e7),
        number(0, 42),
        number(-2, 40),
        (volumeLitres, salinityPss78, temperatureC) => {
          const water = { salinityPss78, temperatureC }
          const kg = valueOf(waterMass({ volumeLitres, ...water }))
          expect(Math.abs(kg - (volumeLitres * valueOf(seawaterDensity(water))) / 1000)).toBeLessThanOrEqual(
            1e-12 * kg,
          )
          expect(valueOf(waterMass({ volumeLitres: 2 * volumeLitres, ...water }))).toBe(2 * kg)
        },
      ),
    )
  })
  it('is refused for no volume and for one past all numbers', () => {
    const water = { salinityPss78: 35, temperatureC: 25 }
    expect(refusalOf(waterMass({ volumeLitres: 0, ...water }))).toBe('volumeLitres not-above-zero')
    expect(refusalOf(waterMass({ volumeLitres: NaN, ...water }))).toBe('volumeLitres not-finite')
    expect(refusalOf(waterMass({ volumeLitres: 1.79e308, ...water }))).toBe('volumeLitres not-finite')
    expect(refusalOf(waterMass({ volumeLitres: 1, salinityPss78: 43, temperatureC: 25 }))).toBe(
      'salinityPss78 above-most',
    )
  })
})

describe('salt by volume', () => {
  it('is salt by mass times the density', () => {
    // 35.16504 g/kg × 1.02334 kg/L = 35.99 g/L at 25 °C (computed)
    expect(valueOf(saltGPerLitre({ salinityPss78: 35, temperatureC: 25 }))).toBeCloseTo(35.99, 2)
    fc.assert(
      fc.property(number(0, 42), number(-2, 40), (salinityPss78, temperatureC) => {
        const byMass = valueOf(referenceSalinity({ salinityPss78 }))
        const density = valueOf(seawaterDensity({ salinityPss78, temperatureC }))
        expect(valueOf(saltGPerLitre({ salinityPss78, temperatureC }))).toBeCloseTo(
          (byMass * density) / 1000,
          10,
        )
      }),
    )
  })
  it('is refused as the density is', () => {
    expect(refusalOf(saltGPerLitre({ salinityPss78: 43, temperatureC: 25 }))).toBe('salinityPss78 above-most')
    expect(refusalOf(saltGPerLitre({ salinityPss78: 35, temperatureC: NaN }))).toBe('temperatureC not-finite')
  })
})

describe('the margin to freezing', () => {
  it('is none at the freezing point, and grows degree by degree', () => {
    fc.assert(
      fc.property(number(4, 40), number(0, 30), (salinityPss78, aboveC) => {
        const water = { salinityPss78, gaugePressureKPa: 0 }
        const freezing = valueOf(freezingPoint(water))
        expect(valueOf(freezingMargin({ ...water, coldestC: freezing }))).toBe(0)
        expect(valueOf(freezingMargin({ ...water, coldestC: freezing + aboveC }))).toBeCloseTo(aboveC, 10)
      }),
    )
  })
  it('is refused for what is no temperature of a chiller', () => {
    const water = { salinityPss78: 35, gaugePressureKPa: 0 }
    expect(refusalOf(freezingMargin({ ...water, coldestC: 271 }))).toBe('coldestC above-most')
    expect(refusalOf(freezingMargin({ ...water, coldestC: -81 }))).toBe('coldestC below-least')
    expect(refusalOf(freezingMargin({ ...water, coldestC: NaN }))).toBe('coldestC not-finite')
  })
})
