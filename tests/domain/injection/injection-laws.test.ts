import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { injectedDose } from '../../../shared/domain/injection/injected-dose.ts'
import {
  dilutionFor,
  injectionVolume,
  leastGraduations,
  roundInjection,
} from '../../../shared/domain/injection/injection-volume.ts'
import { between, expectNear, expectTotal, refusalOf, valueOf } from '../../support/engine-laws.ts'

const injections = fc.record({
  doseMgPerKg: between(0.01, 1000),
  weightKg: between(0.001, 1000),
  strengthMgPerMl: between(0.1, 500),
})

describe('laws of an injection', () => {
  it('comes back from the volume to the dose', () => {
    fc.assert(
      fc.property(injections, (input) => {
        fc.pre((input.doseMgPerKg * input.weightKg) / input.strengthMgPerMl < 1_000_000)
        expectNear(
          valueOf(injectedDose({ ...input, volumeMl: valueOf(injectionVolume(input)) })),
          input.doseMgPerKg,
        )
      }),
    )
  })

  it('doubles with the dose and with the weight, and halves with the strength', () => {
    fc.assert(
      fc.property(injections, (input) => {
        const volume = valueOf(injectionVolume(input))
        const { doseMgPerKg, weightKg, strengthMgPerMl } = input
        expectNear(valueOf(injectionVolume({ ...input, doseMgPerKg: 2 * doseMgPerKg })), 2 * volume)
        expectNear(valueOf(injectionVolume({ ...input, weightKg: 2 * weightKg })), 2 * volume)
        expectNear(valueOf(injectionVolume({ ...input, strengthMgPerMl: 2 * strengthMgPerMl })), volume / 2)
      }),
    )
  })

  it('rounds halves up in decimal, also where the binary number lies below the half', () => {
    const texts = [0.125, 0.135, 1.005, 0.005].map((volume) => valueOf(roundInjection(volume, '0.01')).text)
    expect(texts).toEqual(['0.13', '0.14', '1.01', '0.01'])
    expect(valueOf(roundInjection(0.125, '0.05')).text).toBe('0.15')
  })

  it('says of the rounding what it makes of the dose', () => {
    fc.assert(
      fc.property(between(0.01, 50), (volumeMl) => {
        const { millilitres, errorPercent } = valueOf(roundInjection(volumeMl, '0.01'))
        expectNear(volumeMl * (1 + errorPercent / 100), millilitres, 1e-9)
      }),
    )
  })

  it('refuses what rounds to nothing, and names a dilution that makes it 20 graduations and no larger one than it takes', () => {
    expect(refusalOf(roundInjection(0.0049, '0.01'))).toEqual(['below-half-graduation', 'graduationMl'])
    fc.assert(
      fc.property(
        between(0.0001, 5),
        fc.constantFrom(0.01, 0.02, 0.05, 0.1, 0.2, 1),
        (volumeMl, graduation) => {
          const parts = valueOf(dilutionFor(volumeMl, graduation))
          const least = leastGraduations * graduation
          expect(parts * volumeMl).toBeGreaterThanOrEqual(least * (1 - 1e-6))
          if (parts > 1) expect((parts - 1) * volumeMl).toBeLessThan(least)
        },
      ),
    )
    expect(valueOf(dilutionFor(0.2, 0.01))).toBe(1)
    expect(valueOf(dilutionFor(0.1, 0.01))).toBe(2)
  })

  it('answers nonsense with a refusal or a finite number', () => {
    expectTotal([
      [injectionVolume, ['doseMgPerKg', 'weightKg', 'strengthMgPerMl']],
      [injectedDose, ['volumeMl', 'strengthMgPerMl', 'weightKg']],
      [
        (input: { volumeMl: number; graduationMl: number }) =>
          dilutionFor(input.volumeMl, input.graduationMl),
        ['volumeMl', 'graduationMl'],
      ],
      [
        (input: { volumeMl: number; graduationMl: string }) =>
          roundInjection(input.volumeMl, input.graduationMl),
        ['volumeMl', 'graduationMl'],
      ],
    ])
  })

  it('refuses a volume beyond any number', () => {
    const beyond = { doseMgPerKg: 1000, weightKg: 1000, strengthMgPerMl: 5e-324 }
    expect(refusalOf(injectionVolume(beyond))).toEqual(['not-finite', 'strengthMgPerMl'])
  })
})
