import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { unionisedAmmonia, type AmmoniaWater } from '../../../shared/domain/ammonia/unionised-ammonia.ts'

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })
const fractionOf = (water: AmmoniaWater): number => {
  const found = unionisedAmmonia(water)
  if (!found.ok) throw new Error(found.refusal.code)
  return found.value.fraction
}
const scale = fc.constantFrom('nbs' as const, 'total' as const)

describe('the un-ionised share', () => {
  it('rises with pH and with temperature, in every water', () => {
    fc.assert(
      fc.property(
        between(4, 10.9),
        between(0, 39.5),
        between(0, 40),
        scale,
        (ph, temperatureC, salinityPss78, calibration) => {
          const water = { ph, temperatureC, salinityPss78, calibration }
          const here = fractionOf(water)
          expect(here).toBeGreaterThan(0)
          expect(here).toBeLessThan(1)
          expect(fractionOf({ ...water, ph: ph + 0.1 })).toBeGreaterThan(here)
          expect(fractionOf({ ...water, temperatureC: temperatureC + 0.5 })).toBeGreaterThan(here)
        },
      ),
    )
  })

  it('goes from fresh to brackish water without a step that matters', () => {
    for (let temperatureC = 0; temperatureC <= 40; temperatureC += 1) {
      const fresh = fractionOf({ ph: 8, temperatureC, salinityPss78: 0.4999 })
      const free = fractionOf({ ph: 8, temperatureC, salinityPss78: 0.5, calibration: 'nbs' }) / fresh - 1
      const total = fractionOf({ ph: 8, temperatureC, salinityPss78: 0.5, calibration: 'total' }) / fresh - 1
      expect(free).toBeGreaterThan(-0.0005)
      expect(free).toBeLessThan(0.0015)
      expect(total).toBeGreaterThan(0.01)
      expect(total).toBeLessThan(0.045)
    }
  })

  it('is refused in salt water where the scale of the pH is not stated, and not asked for in fresh', () => {
    expect(unionisedAmmonia({ ph: 8.1, temperatureC: 25, salinityPss78: 35 })).toMatchObject({
      refusal: { code: 'ph-scale-not-stated', field: 'calibration' },
    })
    expect(unionisedAmmonia({ ph: 8.1, temperatureC: 25, salinityPss78: 0 }).ok).toBe(true)
  })

  it('refuses nonsense by name', () => {
    const any = fc.constantFrom(
      NaN,
      Infinity,
      -Infinity,
      -1,
      1e308,
      undefined,
      null,
      '7',
      {},
    ) as fc.Arbitrary<number>
    fc.assert(
      fc.property(any, any, any, (ph, temperatureC, salinityPss78) => {
        const found = unionisedAmmonia({ ph, temperatureC, salinityPss78, calibration: 'nbs' })
        expect(found.ok).toBe(false)
      }),
    )
  })
})
