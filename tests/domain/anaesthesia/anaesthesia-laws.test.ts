import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import {
  concentrationOfDilution,
  exactBathConcentration,
  nominalBathConcentration,
} from '../../../shared/domain/anaesthesia/bath-concentration.ts'
import { bufferMass } from '../../../shared/domain/anaesthesia/buffer-mass.ts'
import { stockMass } from '../../../shared/domain/anaesthesia/stock-mass.ts'
import { stockVolumeInBath, stockVolumeOnTop } from '../../../shared/domain/anaesthesia/stock-volume.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const baths = fc.record({
  targetMgPerL: between(1, 1000),
  litres: between(0.1, 10_000),
  stockGPerL: between(2, 100),
})

describe('laws of a tricaine bath', () => {
  it('comes back from the stock on top of the water to the target', () => {
    fc.assert(
      fc.property(baths, ({ targetMgPerL, litres, stockGPerL }) => {
        const stockMl = valueOf(stockVolumeOnTop({ targetMgPerL, waterLitres: litres, stockGPerL }))
        const mixed = { stockMgPerMl: stockGPerL, stockMl, waterMl: litres * 1000 }
        expectNear(valueOf(exactBathConcentration(mixed)), targetMgPerL, 1e-11)
      }),
    )
  })

  it('comes back from the stock in the finished bath to the target, the rest being water', () => {
    fc.assert(
      fc.property(baths, ({ targetMgPerL, litres, stockGPerL }) => {
        const stockMl = valueOf(stockVolumeInBath({ targetMgPerL, bathLitres: litres, stockGPerL }))
        const mixed = { stockMgPerMl: stockGPerL, stockMl, waterMl: litres * 1000 - stockMl }
        fc.pre(mixed.waterMl > 1)
        expectNear(valueOf(exactBathConcentration(mixed)), targetMgPerL, 1e-9)
      }),
    )
  })

  it('takes more stock on top of the water than in the finished bath', () => {
    fc.assert(
      fc.property(baths, ({ targetMgPerL, litres, stockGPerL }) => {
        const onTop = valueOf(stockVolumeOnTop({ targetMgPerL, waterLitres: litres, stockGPerL }))
        expect(onTop).toBeGreaterThan(
          valueOf(stockVolumeInBath({ targetMgPerL, bathLitres: litres, stockGPerL })),
        )
      }),
    )
  })

  it('is weaker than the recipe says by just the volume of the stock, and never as strong as the stock', () => {
    const mixes = fc.record({
      stockMgPerMl: between(0.1, 100),
      stockMl: between(0.1, 10_000),
      waterMl: between(1, 100_000),
    })
    fc.assert(
      fc.property(mixes, (mix) => {
        const exact = valueOf(exactBathConcentration(mix))
        expectNear(valueOf(nominalBathConcentration(mix)), exact * (1 + mix.stockMl / mix.waterMl))
        expect(exact).toBeLessThan(mix.stockMgPerMl * 1000)
      }),
    )
  })

  it('puts into a finished bath just what its target says', () => {
    fc.assert(
      fc.property(baths, ({ targetMgPerL, litres, stockGPerL }) => {
        const stockMl = valueOf(stockVolumeInBath({ targetMgPerL, bathLitres: litres, stockGPerL }))
        expectNear(valueOf(stockMass({ stockGPerL, stockMl })) * 1000, targetMgPerL * litres)
      }),
    )
    expect(refusalOf(stockMass({ stockGPerL: 10, stockMl: 0 }))).toEqual(['not-above-zero', 'stockMl'])
  })

  it('buffers twice as much with twice as much', () => {
    fc.assert(
      fc.property(between(0.1, 10_000), between(0.1, 5), (tricaineG, bicarbonateRatio) => {
        const mass = valueOf(bufferMass({ tricaineG, bicarbonateRatio }))
        expectNear(mass / tricaineG, bicarbonateRatio)
        expectNear(valueOf(bufferMass({ tricaineG: 2 * tricaineG, bicarbonateRatio })), 2 * mass)
      }),
    )
  })

  it('a dilution of 1 to n holds a gram in n millilitres', () => {
    fc.assert(
      fc.property(between(10, 100_000), (dilutionParts) => {
        expectNear((valueOf(concentrationOfDilution({ dilutionParts })) * dilutionParts) / 1000, 1000)
      }),
    )
  })

  it('refuses a target that is not below the stock, and a stock without buffer', () => {
    const bath = { targetMgPerL: 10_000, stockGPerL: 10 }
    const refused = ['target-not-below-stock', 'targetMgPerL']
    expect(refusalOf(stockVolumeInBath({ ...bath, bathLitres: 10 }))).toEqual(refused)
    expect(refusalOf(stockVolumeOnTop({ ...bath, waterLitres: 10 }))).toEqual(refused)
    const buffer = (bicarbonateRatio: number) => refusalOf(bufferMass({ tricaineG: 10, bicarbonateRatio }))
    expect(buffer(0)).toEqual(['unbuffered-stock', 'bicarbonateRatio'])
    expect(buffer(-1)).toEqual(['below-least', 'bicarbonateRatio'])
    expect(refusalOf(concentrationOfDilution({ dilutionParts: 9 }))[0]).toBe('below-least')
  })

  it('answers nonsense with a refusal or a finite number', () => {
    const mix = ['stockMgPerMl', 'stockMl', 'waterMl']
    expectTotal([
      [stockVolumeInBath, ['targetMgPerL', 'bathLitres', 'stockGPerL']],
      [stockVolumeOnTop, ['targetMgPerL', 'waterLitres', 'stockGPerL']],
      [stockMass, ['stockGPerL', 'stockMl']],
      [bufferMass, ['tricaineG', 'bicarbonateRatio']],
      [nominalBathConcentration, mix],
      [exactBathConcentration, mix],
      [concentrationOfDilution, ['dilutionParts']],
    ])
  })
})
