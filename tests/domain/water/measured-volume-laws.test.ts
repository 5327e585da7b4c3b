import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import { volumeByDilution } from '../../../shared/domain/water/volume-by-dilution.ts'
import { volumeByFilling } from '../../../shared/domain/water/volume-by-filling.ts'
import { volumeByTracer } from '../../../shared/domain/water/volume-by-tracer.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

describe('a volume by what was stirred in', () => {
  it('is the volume that it was stirred into, and that of a salt dilution', () => {
    fc.assert(
      fc.property(between(1, 1e6), between(0, 1000), between(1, 5000), (litres, before, rise) => {
        const addedMg = litres * rise
        const readings = { beforeMgPerL: before, afterMgPerL: before + rise }
        const found = volumeByTracer({ addedMg, ...readings, readingErrorMgPerL: 0, addedErrorPercent: 0 })
        expect(valueOf(found).litres / litres).toBeCloseTo(1, 9)
        expect(valueOf(found)).toMatchObject({ low: valueOf(found).litres, high: valueOf(found).litres })
        const salt = volumeByDilution({
          method: 'salt-dilution',
          saltMass: quantityOf(addedMg, 'mg'),
          salinityRise: quantityOf(valueOf(found).riseMgPerL, 'mg/L'),
          errorPercent: 0,
        })
        expect(valueOf(salt).netLitres / valueOf(found).litres).toBeCloseTo(1, 12)
      }),
    )
  })
  it('lies between what its errors make of it, which holds every volume that such readings allow', () => {
    fc.assert(
      fc.property(
        between(10, 1e5),
        between(100, 1000),
        between(0, 40),
        between(0, 20),
        between(-1, 1),
        between(-1, 1),
        between(-1, 1),
        (litres, rise, error, percent, first, second, third) => {
          // what is really there, seen through instruments that are off by no more than they say
          const addedMg = litres * rise * (1 + (third * percent) / 100)
          const found = volumeByTracer({
            addedMg: litres * rise,
            beforeMgPerL: 50 + first * error,
            afterMgPerL: 50 + (rise * addedMg) / (litres * rise) + second * error,
            readingErrorMgPerL: error,
            addedErrorPercent: percent,
          })
          if (!found.ok) return
          const { low, high } = found.value
          expect(low).toBeLessThanOrEqual(litres * (1 + 1e-9))
          expect(high).toBeGreaterThanOrEqual(litres * (1 - 1e-9))
        },
      ),
    )
  })
  it('is refused where the readings could have made the rise alone', () => {
    const small = { addedMg: 1000, beforeMgPerL: 10, afterMgPerL: 11, addedErrorPercent: 0 }
    expect(volumeByTracer({ ...small, readingErrorMgPerL: 0.5 })).toMatchObject({
      refusal: { code: 'rise-within-error' },
    })
    expect(volumeByTracer({ ...small, afterMgPerL: 10, readingErrorMgPerL: 0 })).toMatchObject({
      refusal: { code: 'reading-did-not-rise' },
    })
  })
})

describe('a volume by filling', () => {
  it('grows with flow and time, and shares its error with them', () => {
    fc.assert(
      fc.property(between(0.1, 1000), between(1, 1000), between(0, 50), (flow, minutes, errorPercent) => {
        const [a, b] = [quantityOf(flow, 'L/min'), quantityOf(minutes, 'min')]
        const found = valueOf(volumeByFilling({ flow: a, duration: b, errorPercent }))
        expect(found.netLitres / (flow * minutes)).toBeCloseTo(1, 12)
        expect(found.errorLitres / found.netLitres).toBeCloseTo(errorPercent / 100, 9)
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
  10,
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
      fc.property(any, any, any, any, any, (a, b, c, d, e) => {
        const answers: Result<unknown>[] = [
          volumeByTracer({
            addedMg: a,
            beforeMgPerL: b,
            afterMgPerL: c,
            readingErrorMgPerL: d,
            addedErrorPercent: e,
          }),
          volumeByFilling({
            flow: { value: String(a), unit: 'L/min' },
            duration: { value: String(b), unit: 'h' },
            errorPercent: c,
          }),
        ]
        for (const answer of answers) {
          const text = JSON.stringify(answer, (_, value: unknown) =>
            typeof value === 'number' && !Number.isFinite(value) ? 'no figure' : value,
          )
          if (text.includes('no figure')) expect({ a, b, c, d, e, text }).toBe('a figure')
        }
      }),
      { numRuns: 3000 },
    )
  })
})
