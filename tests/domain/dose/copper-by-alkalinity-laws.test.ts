import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { computeBathDose } from '../../../shared/domain/dose/compute-bath-dose.ts'
import { copperByAlkalinity, copperSulfatePounds } from '../../../shared/domain/dose/copper-by-alkalinity.ts'
import { copperInPentahydrate } from '../../../shared/domain/dose/copper.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const fresh = (alkalinityMgPerLCaCO3: number) => ({ alkalinityMgPerLCaCO3, salinityPss78: 0 })

describe('laws of copper sulfate by alkalinity', () => {
  it('is a hundredth of the alkalinity up to 250 mg/L, and 2.5 mg/L from there on', () => {
    fc.assert(
      fc.property(between(50, 250), (alkalinity) => {
        const { copperSulfateMgPerL, capped } = valueOf(copperByAlkalinity(fresh(alkalinity)))
        expectNear(copperSulfateMgPerL * 100, alkalinity)
        expect(capped).toBe(false)
      }),
    )
    fc.assert(
      fc.property(between(250.001, 5000), (alkalinity) => {
        const rule = valueOf(copperByAlkalinity(fresh(alkalinity)))
        expect(rule).toMatchObject({ copperSulfateMgPerL: 2.5, countedMgPerLCaCO3: 250, capped: true })
      }),
    )
  })

  it('holds the copper that the bath of the order would reckon the same sulfate from', () => {
    fc.assert(
      fc.property(between(50, 1000), (alkalinity) => {
        const { copperMgPerL, copperSulfateMgPerL } = valueOf(copperByAlkalinity(fresh(alkalinity)))
        const dose = computeBathDose({
          target: { concentration: quantityOf(copperMgPerL, 'mg/L'), basis: 'free' },
          netLitres: 1000,
          product: {
            form: 'solid',
            strength: quantityOf(100, 'percent_w_w'),
            strengthBasis: 'salt',
            share: copperInPentahydrate,
          },
        })
        expectNear(valueOf(dose).amount, copperSulfateMgPerL, 1e-9)
      }),
    )
  })

  it('doubles in pounds with the acre-feet, 2.72 lb for 1 mg/L in one', () => {
    fc.assert(
      fc.property(between(50, 500), between(0.01, 500), (alkalinity, volumeAcreFt) => {
        const pounds = (volume: number) =>
          valueOf(copperSulfatePounds({ ...fresh(alkalinity), volumeAcreFt: volume }))
        expectNear(pounds(2 * volumeAcreFt), 2 * pounds(volumeAcreFt))
        expect(pounds(1) / valueOf(copperByAlkalinity(fresh(alkalinity))).copperSulfateMgPerL).toBeCloseTo(
          2.7194,
          4,
        )
      }),
    )
  })

  it('refuses soft water with the limit and the cap, and water that is not fresh', () => {
    expect(copperByAlkalinity(fresh(49.9))).toEqual({
      ok: false,
      refusal: {
        code: 'alkalinity-too-low-for-copper',
        field: 'alkalinityMgPerLCaCO3',
        params: { limit: '50', cap: '250', unit: 'mg/L_CaCO3' },
      },
    })
    const salt = (salinityPss78: number) => refusalOf(copperByAlkalinity({ ...fresh(120), salinityPss78 }))
    expect([0.49, 0.5, 33].map(salt)).toEqual([
      ['answered', undefined],
      ['copper-rule-fresh-water-only', 'salinityPss78'],
      ['copper-rule-fresh-water-only', 'salinityPss78'],
    ])
    const unknown = undefined as unknown as number
    expect(salt(unknown)).toEqual(['not-finite', 'salinityPss78'])
  })

  it('answers nonsense with a refusal or a finite number', () => {
    const water = ['alkalinityMgPerLCaCO3', 'salinityPss78']
    expectTotal([
      [copperByAlkalinity, water],
      [copperSulfatePounds, [...water, 'volumeAcreFt']],
    ])
  })
})
