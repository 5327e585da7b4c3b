import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { changeCourse } from '../../../shared/domain/water/flow/change-course.ts'
import { dripConcentration, dripRate, dripTotal } from '../../../shared/domain/water/flow/drip-rate.ts'
import { remainingAfterChanges } from '../../../shared/domain/water/remaining-after-changes.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

describe('the course of water changes', () => {
  it('ends where the closed form does, each row going on from the one before', () => {
    fc.assert(
      fc.property(
        between(0, 100),
        between(0, 100),
        between(0, 1),
        fc.integer({ min: 1, max: 60 }),
        (initialMgPerL, replacementMgPerL, changeFraction, changes) => {
          const input = { initialMgPerL, replacementMgPerL, changeFraction, changes }
          const course = valueOf(changeCourse(input))
          expect(course.at(-1)?.afterMgPerL).toBeCloseTo(valueOf(remainingAfterChanges(input)), 8)
          for (const [at, step] of course.entries())
            if (at > 0) expect(step.beforeMgPerL).toBe(course[at - 1]?.afterMgPerL)
        },
      ),
    )
  })
  it('with a loss leaves a power of both shares in clean water', () => {
    fc.assert(
      fc.property(
        between(0.01, 100),
        between(0.01, 0.9),
        between(1, 100),
        between(1, 100),
        (initialMgPerL, changeFraction, halfLifeHours, intervalHours) => {
          const course = valueOf(
            changeCourse({
              initialMgPerL,
              replacementMgPerL: 0,
              changeFraction,
              changes: 5,
              loss: { halfLifeHours, intervalHours },
            }),
          )
          const expected =
            initialMgPerL * (1 - changeFraction) ** 5 * 2 ** ((-4 * intervalHours) / halfLifeHours)
          expect((course.at(-1)?.afterMgPerL ?? 0) / expected).toBeCloseTo(1, 9)
        },
      ),
    )
  })
  it('takes a whole number of changes, and 200 at most', () => {
    const input = { initialMgPerL: 1, replacementMgPerL: 0, changeFraction: 0.5 }
    expect(changeCourse({ ...input, changes: 0 })).toEqual({ ok: true, value: [] })
    expect(changeCourse({ ...input, changes: 1.5 })).toMatchObject({ refusal: { code: 'changes-not-whole' } })
    expect(changeCourse({ ...input, changes: 201 })).toMatchObject({ refusal: { code: 'above-most' } })
  })
})

describe('a drip', () => {
  it('makes the concentration that it was reckoned for, and takes its rate over the time', () => {
    fc.assert(
      fc.property(between(0.1, 1e4), between(0.01, 900), between(1, 1000), (flow, target, stockMgPerMl) => {
        const dripMlPerMin = valueOf(dripRate({ inflowLPerMin: flow, targetMgPerL: target, stockMgPerMl }))
        const made = valueOf(dripConcentration({ inflowLPerMin: flow, dripMlPerMin, stockMgPerMl }))
        expect(made / target).toBeCloseTo(1, 9)
        const total = valueOf(dripTotal({ dripMlPerMin, minutes: 60, primingMl: 7, stockMgPerMl }))
        expect(total.stockMl).toBeCloseTo(dripMlPerMin * 60 + 7, 6)
        // what goes in with the stock goes out with the water, once the tank is at its target
        const out = (flow + dripMlPerMin / 1000) * 60 * target
        expect((total.drugMg - 7 * stockMgPerMl) / out).toBeCloseTo(1, 9)
      }),
    )
  })
})

const nonsense = [
  NaN,
  Infinity,
  -1,
  0,
  1,
  3,
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
          changeCourse({
            initialMgPerL: a,
            replacementMgPerL: b,
            changeFraction: c,
            changes: d,
            loss: { halfLifeHours: a, intervalHours: b },
          }),
          dripConcentration({ inflowLPerMin: a, dripMlPerMin: b, stockMgPerMl: c }),
          dripTotal({ dripMlPerMin: a, minutes: b, primingMl: c, stockMgPerMl: d }),
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
      { numRuns: 2000 },
    )
  })
})
