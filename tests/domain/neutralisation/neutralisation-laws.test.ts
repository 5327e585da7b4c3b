import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { ammoniaFromChloramine } from '../../../shared/domain/neutralisation/ammonia-from-chloramine.ts'
import { bleachVolume } from '../../../shared/domain/neutralisation/bleach-volume.ts'
import { thiosulfateNeeded } from '../../../shared/domain/neutralisation/thiosulfate-needed.ts'
import {
  practicalThiosulfateRatio,
  stoichiometricThiosulfateRatio,
} from '../../../shared/domain/neutralisation/thiosulfate-ratio.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const ratio = (form: 'pentahydrate' | 'anhydrous') =>
  valueOf(stoichiometricThiosulfateRatio({ form, product: 'tetrathionate' }))

describe('laws of neutralisation', () => {
  it('needs two thiosulfates for a chlorine, whichever form is weighed', () => {
    // grams per mole of each by hand: 248.172, 158.097 and 70.90
    expectNear(ratio('pentahydrate') / 248.172, 2 / 70.9)
    expectNear(ratio('anhydrous') / 158.097, 2 / 70.9)
    expect(ratio('anhydrous') / ratio('pentahydrate')).toBeCloseTo(0.637, 3)
  })

  it('never needs less by practice than by the equation, but for the rounding of 7.0', () => {
    for (const form of ['pentahydrate', 'anhydrous'] as const)
      for (const chlorinatedWater of ['spent-disinfectant', 'tap-water'] as const) {
        const { least, most } = valueOf(practicalThiosulfateRatio({ form, chlorinatedWater }))
        expect(least).toBeLessThanOrEqual(most)
        expect(least).toBeGreaterThan(ratio(form) * 0.999)
      }
    const of = (chlorinatedWater: 'spent-disinfectant' | 'tap-water') =>
      valueOf(practicalThiosulfateRatio({ form: 'pentahydrate', chlorinatedWater }))
    expect([of('spent-disinfectant'), of('tap-water')]).toEqual([
      { least: 7, most: 7.4 },
      { least: 10, most: 10 },
    ])
  })

  it('takes away the chlorine of a solution that bleach has made, mole by mole', () => {
    const solutions = fc.record({
      targetChlorineMgPerL: between(0.1, 5000),
      volumeLitres: between(0.1, 100_000),
      availableChlorinePercentWv: between(1, 15),
    })
    fc.assert(
      fc.property(solutions, (solution) => {
        const millilitres = valueOf(bleachVolume(solution))
        const chlorineMg = millilitres * solution.availableChlorinePercentWv * 10
        expectNear(chlorineMg, solution.targetChlorineMgPerL * solution.volumeLitres)
        const grams = valueOf(
          thiosulfateNeeded({
            chlorineMgPerL: solution.targetChlorineMgPerL,
            volumeLitres: solution.volumeLitres,
            ratioMgPerMg: ratio('pentahydrate'),
          }),
        )
        expectNear(grams / 248.172, (2 * chlorineMg) / 1000 / 70.9)
      }),
    )
  })

  it('needs nothing where there is no chlorine, and twice as much for twice the water', () => {
    fc.assert(
      fc.property(between(0.01, 1000), between(1, 100_000), (chlorineMgPerL, volumeLitres) => {
        const needed = (chlorine: number, litres: number) =>
          valueOf(thiosulfateNeeded({ chlorineMgPerL: chlorine, volumeLitres: litres, ratioMgPerMg: 7 }))
        expect(needed(0, volumeLitres)).toBe(0)
        expectNear(needed(chlorineMgPerL, 2 * volumeLitres), 2 * needed(chlorineMgPerL, volumeLitres))
      }),
    )
  })

  it('frees one nitrogen for a chlorine', () => {
    fc.assert(
      fc.property(between(0.01, 100), (monochloramineMgCl2PerL) => {
        const nitrogen = valueOf(ammoniaFromChloramine({ monochloramineMgCl2PerL }))
        expectNear(nitrogen / 14.007, monochloramineMgCl2PerL / 70.9)
      }),
    )
  })

  it('refuses a form, a product or a water that was not named, and a solution stronger than its bleach', () => {
    const form = 'pentahydrate'
    for (const unsaid of [undefined, null, '', 'crystals'] as unknown as 'anhydrous'[]) {
      const first = stoichiometricThiosulfateRatio({ form: unsaid, product: 'tetrathionate' })
      const second = practicalThiosulfateRatio({ form: unsaid, chlorinatedWater: 'tap-water' })
      for (const each of [first, second])
        expect(refusalOf(each)).toEqual(['thiosulfate-form-not-stated', 'form'])
    }
    const sulfate = 'sulfate' as 'tetrathionate'
    expect(refusalOf(stoichiometricThiosulfateRatio({ form, product: sulfate }))).toEqual([
      'only-tetrathionate-plans-a-dose',
      'product',
    ])
    const pond = 'pond' as 'tap-water'
    expect(refusalOf(practicalThiosulfateRatio({ form, chlorinatedWater: pond }))).toEqual([
      'chlorinated-water-not-stated',
      'chlorinatedWater',
    ])
    const strong = { targetChlorineMgPerL: 60_000, volumeLitres: 1, availableChlorinePercentWv: 5.25 }
    expect(refusalOf(bleachVolume(strong))).toEqual(['target-above-bleach', 'targetChlorineMgPerL'])
    expect(refusalOf(bleachVolume({ ...strong, targetChlorineMgPerL: 0 }))[0]).toBe('not-above-zero')
  })

  it('answers nonsense with a refusal or a finite number', () => {
    expectTotal([
      [stoichiometricThiosulfateRatio, ['form', 'product']],
      [practicalThiosulfateRatio, ['form', 'chlorinatedWater']],
      [thiosulfateNeeded, ['chlorineMgPerL', 'volumeLitres', 'ratioMgPerMg']],
      [bleachVolume, ['targetChlorineMgPerL', 'volumeLitres', 'availableChlorinePercentWv']],
      [ammoniaFromChloramine, ['monochloramineMgCl2PerL']],
    ])
  })
})
