import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { roundInjection } from '../../../shared/domain/injection/injection-volume.ts'
import { wholeSteps } from '../../../shared/domain/units/whole-steps.ts'
import { changesNeeded, singleChangeFraction } from '../../../shared/domain/water/flow/changes-needed.ts'
import { dripRate, primingVolume } from '../../../shared/domain/water/flow/drip-rate.ts'
import { concentrationAfterLoss, repeatDoseSteadyState } from '../../../shared/domain/water/flow/losses.ts'
import { minutesToFraction } from '../../../shared/domain/water/flow/wash-out.ts'
import { wellMixedConcentration } from '../../../shared/domain/water/flow/well-mixed-concentration.ts'
import { remainingAfterChanges } from '../../../shared/domain/water/remaining-after-changes.ts'
import { stepwiseSchedule } from '../../../shared/domain/water/salinity-change/stepwise.ts'
import { continuousExchangeLitres } from '../../../shared/domain/water/salinity-change/swap.ts'
import type { Result } from '../../../shared/domain/result.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

/** The same tank by small steps of Runge and Kutta, which knows nothing of exponentials. */
function integrated(start: number, inflow: number, exchange: number, loss: number, minutes: number): number {
  const steps = 400
  const h = minutes / steps
  const slope = (c: number) => exchange * (inflow - c) - loss * c
  let c = start
  for (let i = 0; i < steps; i += 1) {
    const k1 = slope(c)
    const k2 = slope(c + (h / 2) * k1)
    const k3 = slope(c + (h / 2) * k2)
    const k4 = slope(c + h * k3)
    c += (h / 6) * (k1 + 2 * k2 + 2 * k3 + k4)
  }
  return c
}

describe('a well-mixed tank', () => {
  it('comes out as by numeric integration', () => {
    fc.assert(
      fc.property(
        between(0, 100),
        between(0, 100),
        between(0, 50),
        between(0, 0.05),
        between(1, 200),
        (start, inflow, flow, loss, minutes) => {
          const input = {
            initialMgPerL: start,
            inflowMgPerL: inflow,
            flowLPerMin: flow,
            volumeLitres: 1000,
            lossPerMin: loss,
            minutes,
          }
          const found = valueOf(wellMixedConcentration(input))
          expect(found).toBeCloseTo(integrated(start, inflow, flow / 1000, loss, minutes), 5)
        },
      ),
      { numRuns: 200 },
    )
  })
  it('leaves the asked share after the time that wash-out names', () => {
    fc.assert(
      fc.property(
        between(0.001, 0.999),
        between(1, 1e6),
        between(0.1, 1e4),
        (fraction, volumeLitres, flowLPerMin) => {
          const minutes = valueOf(minutesToFraction({ fraction, volumeLitres, flowLPerMin }))
          if (minutes > 100_000_000) return
          const input = {
            initialMgPerL: 1,
            inflowMgPerL: 0,
            flowLPerMin,
            volumeLitres,
            lossPerMin: 0,
            minutes,
          }
          expect(valueOf(wellMixedConcentration(input))).toBeCloseTo(fraction, 9)
        },
      ),
    )
  })
})

describe('what is too small to divide by', () => {
  it('is refused by its name, and asks for no time where nothing is to be washed out', () => {
    const barely = { volumeLitres: 1000, flowLPerMin: 1e-320 }
    expect(minutesToFraction({ ...barely, fraction: 0.5 })).toMatchObject({
      ok: false,
      refusal: { code: 'not-finite', field: 'flowLPerMin' },
    })
    expect(valueOf(minutesToFraction({ ...barely, fraction: 1 }))).toBe(0)
    const drop = { initialMgPerL: 1, inflowMgPerL: 0, flowLPerMin: 1, lossPerMin: 0, minutes: 1 }
    expect(wellMixedConcentration({ ...drop, volumeLitres: 1e-320 })).toMatchObject({
      ok: false,
      refusal: { code: 'not-finite', field: 'volumeLitres' },
    })
  })
})

describe('water changes', () => {
  it('are as many as it takes, and one fewer is not enough', () => {
    fc.assert(
      fc.property(
        between(10, 100),
        between(0, 4),
        between(5, 9),
        between(0.05, 0.9),
        (initialMgPerL, replacementMgPerL, targetMgPerL, changeFraction) => {
          const changes = valueOf(
            changesNeeded({ initialMgPerL, targetMgPerL, replacementMgPerL, changeFraction }),
          )
          const after = (n: number) =>
            valueOf(remainingAfterChanges({ initialMgPerL, replacementMgPerL, changeFraction, changes: n }))
          expect(after(changes)).toBeLessThanOrEqual(targetMgPerL * (1 + 1e-6))
          if (changes > 0) expect(after(changes - 1)).toBeGreaterThan(targetMgPerL * (1 - 1e-6))
        },
      ),
    )
  })
  it('are one when the single share is changed, also at the last binary digit', () => {
    fc.assert(
      fc.property(between(10, 100), between(5, 9), (initialMgPerL, targetMgPerL) => {
        const input = { initialMgPerL, targetMgPerL, replacementMgPerL: 0 }
        const changeFraction = valueOf(singleChangeFraction(input))
        expect(valueOf(changesNeeded({ ...input, changeFraction }))).toBe(1)
      }),
    )
    expect([0.3 / 0.1, 3, 2.4, 3.001].map(wholeSteps)).toEqual([3, 3, 3, 4])
  })
  it('are one when all of it is changed, however little of the new water is wanted, and none at the start', () => {
    const whole = { initialMgPerL: 80, replacementMgPerL: 5, changeFraction: 1 }
    for (const targetMgPerL of [5, 20, 79.9])
      expect(valueOf(changesNeeded({ ...whole, targetMgPerL }))).toBe(1)
    expect(valueOf(singleChangeFraction({ ...whole, targetMgPerL: 5 }))).toBe(1)
    for (const changeFraction of [1e-17, 0.3, 1])
      expect(valueOf(changesNeeded({ ...whole, targetMgPerL: 80, changeFraction }))).toBe(0)
    const less = changesNeeded({ ...whole, targetMgPerL: 5, changeFraction: 0.999_999 })
    expect(less).toMatchObject({ ok: false, refusal: { code: 'target-beyond-replacement' } })
    const more = changesNeeded({ ...whole, targetMgPerL: 20, changeFraction: 1.000_001 })
    expect(more).toMatchObject({ ok: false, refusal: { code: 'above-most', field: 'changeFraction' } })
  })
  it('are counted also where one of them is less than the last binary digit of all', () => {
    const input = { initialMgPerL: 80, targetMgPerL: 20, replacementMgPerL: 0, changeFraction: 1e-17 }
    expect(valueOf(changesNeeded(input)) / (Math.log(4) / 1e-17)).toBeCloseTo(1, 8)
  })
  it('bring the salinity down the plan to its end, salt accounted for', () => {
    fc.assert(
      fc.property(
        between(20, 40),
        between(5, 15),
        between(0, 4),
        between(0.5, 6),
        (startSalinity, targetSalinity, replacementSalinity, mostPerDay) => {
          const volumeLitres = 2000
          const plan = valueOf(
            stepwiseSchedule({
              startSalinity,
              targetSalinity,
              replacementSalinity,
              mostPerDay,
              volumeLitres,
            }),
          )
          let salt = startSalinity * volumeLitres
          for (const { swapLitres } of plan) salt += swapLitres * (replacementSalinity - salt / volumeLitres)
          expect(salt / volumeLitres).toBeCloseTo(targetSalinity, 8)
          for (const { fromSalinity, toSalinity } of plan)
            expect(fromSalinity - toSalinity).toBeLessThanOrEqual(mostPerDay * (1 + 1e-8))
        },
      ),
    )
  })
})

describe('repeated doses', () => {
  it('peak and trough differ by one dose', () => {
    fc.assert(
      fc.property(
        between(0.01, 10),
        between(0.01, 0.9),
        between(0, 0.5),
        between(1, 96),
        (doseMgPerL, changeFraction, lossPerHour, intervalHours) => {
          const { peakMgPerL, troughMgPerL } = valueOf(
            repeatDoseSteadyState({ doseMgPerL, changeFraction, lossPerHour, intervalHours }),
          )
          expect(peakMgPerL - troughMgPerL).toBeCloseTo(doseMgPerL, 8)
        },
      ),
    )
    const nothing = { doseMgPerL: 1, changeFraction: 0, lossPerHour: 0, intervalHours: 24 }
    expect(repeatDoseSteadyState(nothing)).toMatchObject({ ok: false, refusal: { code: 'nothing-is-lost' } })
  })
})

describe('a syringe', () => {
  it('is never more than half a graduation off', () => {
    fc.assert(
      fc.property(
        between(0.01, 60),
        fc.constantFrom('0.01', '0.02', '0.05', '0.1', '0.2', '1'),
        (volumeMl, graduation) => {
          const rounded = roundInjection(volumeMl, graduation)
          if (!rounded.ok) {
            expect(volumeMl).toBeLessThan(Number(graduation) / 2)
            return
          }
          expect(Math.abs(rounded.value.millilitres - volumeMl)).toBeLessThanOrEqual(
            Number(graduation) / 2 + 1e-9,
          )
        },
      ),
    )
  })
})

const nonsense = [
  NaN,
  Infinity,
  -Infinity,
  -1,
  0,
  1,
  1e308,
  1e-17,
  1e-320,
  5e-324,
  undefined,
  null,
  'ten',
  {},
] as unknown as number[]

describe('nonsense', () => {
  it('is refused or gives a finite figure', () => {
    const any = fc.constantFrom(...nonsense)
    fc.assert(
      fc.property(any, any, any, any, (a, b, c, d) => {
        const answers: Result<unknown>[] = [
          wellMixedConcentration({
            initialMgPerL: a,
            inflowMgPerL: b,
            flowLPerMin: c,
            volumeLitres: d,
            lossPerMin: a,
            minutes: b,
          }),
          minutesToFraction({ fraction: a, volumeLitres: b, flowLPerMin: c }),
          changesNeeded({ initialMgPerL: a, targetMgPerL: b, replacementMgPerL: c, changeFraction: d }),
          singleChangeFraction({ initialMgPerL: a, targetMgPerL: b, replacementMgPerL: c }),
          remainingAfterChanges({
            initialMgPerL: a,
            replacementMgPerL: b,
            changeFraction: c,
            changes: d,
          }),
          repeatDoseSteadyState({ doseMgPerL: a, changeFraction: b, lossPerHour: c, intervalHours: d }),
          concentrationAfterLoss({ initialMgPerL: a, halfLifeHours: b, hours: c }),
          dripRate({ inflowLPerMin: a, targetMgPerL: b, stockMgPerMl: c }),
          primingVolume({ volumeLitres: a, targetMgPerL: b, stockMgPerMl: c }),
          continuousExchangeLitres({
            startSalinity: a,
            targetSalinity: b,
            replacementSalinity: c,
            volumeLitres: d,
          }),
          stepwiseSchedule({
            startSalinity: a,
            targetSalinity: b,
            replacementSalinity: c,
            mostPerDay: d,
            volumeLitres: a,
          }),
          roundInjection(a, String(b)),
        ]
        for (const answer of answers) {
          const text = JSON.stringify(answer, (_, value: unknown) =>
            typeof value === 'number' && (!Number.isFinite(value) || Object.is(value, -0))
              ? 'no figure'
              : value,
          )
          if (text.includes('no figure')) expect({ a, b, c, d, text }).toBe('a figure')
        }
      }),
      { numRuns: 4000 },
    )
  })
})
