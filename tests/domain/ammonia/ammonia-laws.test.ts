import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { freeScalePk, totalScalePk } from '../../../shared/domain/ammonia/ammonium-pk.ts'
import {
  ammoniaBases,
  ammoniaCountedAs,
  type AmmoniaBasis,
} from '../../../shared/domain/ammonia/nitrogen-forms.ts'
import {
  unionisedAmmonia,
  unionisedConcentration,
  unionisedShare,
  type AmmoniaWater,
} from '../../../shared/domain/ammonia/unionised-ammonia.ts'

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
    // measured: free −0.017…+0.111 %; total +1.36…+4.24 % at pH 4, less the more of it is un-ionised
    for (let ph = 4; ph <= 11; ph += 1)
      for (let temperatureC = 0; temperatureC <= 40; temperatureC += 1) {
        const fresh = fractionOf({ ph, temperatureC, salinityPss78: 0.4999 })
        const apart = (calibration: 'nbs' | 'total') =>
          fractionOf({ ph, temperatureC, salinityPss78: 0.5, calibration }) / fresh - 1
        expect(apart('nbs')).toBeGreaterThan(-0.00018)
        expect(apart('nbs')).toBeLessThan(0.00112)
        expect(apart('total')).toBeGreaterThan(ph > 8 ? 0 : 0.0134)
        expect(apart('total')).toBeLessThan(ph > 8 ? 0.017 : 0.0425)
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
        expect(freeScalePk({ temperatureC, salinityPss78 }).ok).toBe(false)
        expect(totalScalePk({ temperatureC, salinityPss78 }).ok).toBe(false)
        expect(unionisedShare({ ph, pk: temperatureC }).ok).toBe(false)
        const fresh = { ph: 8, temperatureC: 20, salinityPss78: 0 }
        expect(unionisedConcentration({ ...fresh, totalNMgPerL: ph }).ok).toBe(false)
        expect(ammoniaCountedAs({ mgPerL: ph, of: 'n', as: 'nh3' }).ok).toBe(false)
      }),
    )
  })

  it('is that of the free scale where nobody knows the calibration, and no more than that of the total one', () => {
    fc.assert(
      fc.property(between(4, 11), between(-2, 40), between(0.5, 40), (ph, temperatureC, salinityPss78) => {
        const of = (calibration: 'nbs' | 'total' | 'unknown') =>
          fractionOf({ ph, temperatureC, salinityPss78, calibration })
        expect(of('unknown')).toBe(of('nbs'))
        expect(of('total')).toBeGreaterThanOrEqual(of('nbs'))
      }),
    )
  })
})

describe('ammonia counted as another form', () => {
  it('comes back, and has the nitrogen of the form', () => {
    const basis = fc.constantFrom(...ammoniaBases)
    const valueOf = (mgPerL: number, of: AmmoniaBasis, as: AmmoniaBasis) => {
      const found = ammoniaCountedAs({ mgPerL, of, as })
      if (!found.ok) throw new Error(found.refusal.code)
      return found.value
    }
    fc.assert(
      fc.property(between(0, 700), basis, basis, (mgPerL, of, as) => {
        expect(valueOf(valueOf(mgPerL, of, as), as, of)).toBeCloseTo(mgPerL, 9)
      }),
    )
    expect(['n', 'nh3', 'nh4'].map((as) => valueOf(1, 'n', as as AmmoniaBasis).toFixed(4))).toEqual([
      '1.0000',
      '1.2159',
      '1.2879',
    ])
  })

  it('is refused where a form is not said', () => {
    const asked = { mgPerL: 1, of: '' as AmmoniaBasis, as: 'n' } as const
    expect(ammoniaCountedAs(asked)).toMatchObject({
      refusal: { code: 'ammonia-basis-not-stated', field: 'of' },
    })
    expect(ammoniaCountedAs({ ...asked, of: 'n', as: 'TAN' as AmmoniaBasis })).toMatchObject({
      refusal: { code: 'ammonia-basis-not-stated', field: 'as' },
    })
  })
})
