import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { concentrationAfterLoss, repeatDoseSteadyState } from '../../../shared/domain/water/flow/losses.ts'
import { doseCourse, halfLifeOfReadings } from '../../../shared/domain/water/flow/repeated-doses.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

describe('a course of doses', () => {
  it('climbs to the peak that the closed form names, and never above it', () => {
    fc.assert(
      fc.property(
        between(0.01, 10),
        between(10, 80),
        between(1, 100),
        between(1, 96),
        (dose, change, half, interval) => {
          const course = valueOf(
            doseCourse({
              doseMgPerL: dose,
              initialMgPerL: 0,
              changePercent: change,
              halfLifeHours: half,
              intervalHours: interval,
              doses: 100,
            }),
          )
          const steady = valueOf(
            repeatDoseSteadyState({
              doseMgPerL: dose,
              changeFraction: change / 100,
              lossPerHour: Math.LN2 / half,
              intervalHours: interval,
            }),
          )
          expect((course.steady?.peakMgPerL ?? 0) / steady.peakMgPerL).toBeCloseTo(1, 9)
          const climbed = (course.steps.at(-1)?.afterMgPerL ?? 0) / steady.peakMgPerL
          expect(climbed).toBeCloseTo(1 - (course.keptPercent / 100) ** 100, 9)
          for (const step of course.steps)
            expect(step.afterMgPerL).toBeLessThanOrEqual(steady.peakMgPerL * (1 + 1e-9))
        },
      ),
    )
  })
  it('adds up where nothing is lost, and has no end then', () => {
    const none = { doseMgPerL: 2, initialMgPerL: 1, changePercent: 0, intervalHours: 24, doses: 5 }
    const course = valueOf(doseCourse(none))
    expect(course.steps.map((step) => step.afterMgPerL)).toEqual([3, 5, 7, 9, 11])
    expect(course.steady).toBeUndefined()
    const whole = valueOf(doseCourse({ ...none, changePercent: 100 }))
    expect(whole.steps.map((step) => step.afterMgPerL)).toEqual([3, 2, 2, 2, 2])
    expect(doseCourse({ ...none, doses: 2.5 })).toMatchObject({ refusal: { code: 'doses-not-whole' } })
  })
})

describe('the half-life of two readings', () => {
  it('leads from the first to the second', () => {
    fc.assert(
      fc.property(
        between(0.1, 1000),
        between(0.01, 0.99),
        between(0.1, 1000),
        (firstMgPerL, share, hours) => {
          const secondMgPerL = firstMgPerL * share
          const halfLifeHours = valueOf(halfLifeOfReadings({ firstMgPerL, secondMgPerL, hours }))
          const again = valueOf(concentrationAfterLoss({ initialMgPerL: firstMgPerL, halfLifeHours, hours }))
          expect(again / secondMgPerL).toBeCloseTo(1, 9)
        },
      ),
    )
    const same = { firstMgPerL: 2, secondMgPerL: 2, hours: 1 }
    expect(halfLifeOfReadings(same)).toMatchObject({ refusal: { code: 'reading-did-not-fall' } })
  })
})

const nonsense = [
  NaN,
  Infinity,
  -1,
  0,
  1,
  3,
  100,
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
      fc.property(any, any, any, any, any, any, (a, b, c, d, e, f) => {
        const answers: Result<unknown>[] = [
          doseCourse({
            doseMgPerL: a,
            initialMgPerL: b,
            changePercent: c,
            halfLifeHours: d,
            intervalHours: e,
            doses: f,
          }),
          doseCourse({ doseMgPerL: a, initialMgPerL: b, changePercent: c, intervalHours: e, doses: f }),
          halfLifeOfReadings({ firstMgPerL: a, secondMgPerL: b, hours: c }),
        ]
        for (const answer of answers) {
          const text = JSON.stringify(answer, (_, value: unknown) =>
            typeof value === 'number' && (!Number.isFinite(value) || Object.is(value, -0))
              ? 'no figure'
              : value,
          )
          if (text.includes('no figure')) expect({ a, b, c, d, e, f, text }).toBe('a figure')
        }
      }),
      { numRuns: 5000 },
    )
  })
})
