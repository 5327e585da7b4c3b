import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { Result } from '../../../shared/domain/result.ts'
import {
  practicalOfReference,
  referenceSalinity,
} from '../../../shared/domain/seawater/reference-salinity.ts'
import { evaporationTopUp } from '../../../shared/domain/water/salinity-change/evaporation.ts'
import {
  saltMassByBalance,
  saltMassSimple,
  saltMassWithMoisture,
  saltSteps,
  saltWaterMass,
} from '../../../shared/domain/water/salinity-change/salt-mass.ts'

const valueOf = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(`${result.refusal.code} ${result.refusal.field ?? ''}`)
  return result.value
}
const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

describe('salt', () => {
  it('added to the water makes the salinity that it was weighed for', () => {
    fc.assert(
      fc.property(
        between(10, 1e6),
        between(2, 30),
        between(30, 60),
        between(0, 40),
        (litres, start, target, t) => {
          const water = { systemLitres: litres, startGPerKg: start, temperatureC: t }
          const salt = valueOf(saltMassByBalance({ ...water, targetGPerKg: target }))
          const { waterKg } = valueOf(saltWaterMass(water))
          expect((1000 * ((waterKg * start) / 1000 + salt)) / (waterKg + salt)).toBeCloseTo(target, 9)
        },
      ),
    )
  })
  it('by mass is more than by litres, where the water is heavier than a kilogram a litre', () => {
    fc.assert(
      fc.property(between(2, 30), between(31, 42), between(0, 30), (start, target, temperatureC) => {
        const systemLitres = 1000
        const mass = saltMassByBalance({
          systemLitres,
          startGPerKg: start,
          targetGPerKg: target,
          temperatureC,
        })
        const simple = saltMassSimple({ systemLitres, startGPerL: start, targetGPerL: target })
        expect(valueOf(mass)).toBeGreaterThan(valueOf(simple))
      }),
    )
  })
  it('in days adds up to the salt at once, no rise above its limit', () => {
    fc.assert(
      fc.property(between(2, 30), between(31, 42), between(0.3, 5), (start, target, mostPerDay) => {
        const saltTo = (to: number) =>
          saltMassByBalance({ systemLitres: 2000, startGPerKg: start, targetGPerKg: to, temperatureC: 25 })
        const steps = valueOf(saltSteps({ start, target, mostPerDay, unit: 'g/kg' }, saltTo))
        const sum = steps.reduce((whole, step) => whole + step.saltKg, 0)
        expect(sum).toBeCloseTo(valueOf(saltTo(target)), 8)
        expect(steps.at(-1)?.to).toBe(target)
        for (const { from, to, saltKg } of steps) {
          expect(to - from).toBeLessThanOrEqual(mostPerDay * (1 + 1e-8))
          expect(saltKg).toBeGreaterThan(0)
        }
      }),
    )
  })
  it('that is moist weighs more, and none is needed where nothing has to rise', () => {
    expect(valueOf(saltMassWithMoisture({ anhydrousKg: 17, purityPercent: 100 }))).toBe(17)
    fc.assert(
      fc.property(between(0.1, 1000), between(50, 99), (anhydrousKg, purityPercent) => {
        const weighed = valueOf(saltMassWithMoisture({ anhydrousKg, purityPercent }))
        expect((weighed * purityPercent) / 100).toBeCloseTo(anhydrousKg, 9)
      }),
    )
    expect(valueOf(saltMassSimple({ systemLitres: 1, startGPerL: 3, targetGPerL: 3 }))).toBe(0)
    expect(
      valueOf(saltSteps({ start: 3, target: 3, mostPerDay: 1, unit: 'g/L' }, () => ({ ok: true, value: 0 }))),
    ).toEqual([])
  })
})

describe('what evaporated', () => {
  it('put back as fresh water brings the salinity back', () => {
    fc.assert(
      fc.property(
        between(10, 1e6),
        between(20, 40),
        between(0, 20),
        (systemLitres, targetSalinity, risen) => {
          const readingSalinity = targetSalinity + risen
          const litres = valueOf(evaporationTopUp({ systemLitres, readingSalinity, targetSalinity }))
          expect((readingSalinity * systemLitres) / (systemLitres + litres)).toBeCloseTo(targetSalinity, 9)
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
  3,
  35,
  1.025,
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
  it('is refused by its name or gives a finite figure', () => {
    const any = fc.constantFrom(...nonsense)
    fc.assert(
      fc.property(any, any, any, any, (a, b, c, d) => {
        const answers: Result<unknown>[] = [
          saltMassSimple({ systemLitres: a, startGPerL: b, targetGPerL: c }),
          saltMassByBalance({ systemLitres: a, startGPerKg: b, targetGPerKg: c, temperatureC: d }),
          saltMassWithMoisture({ anhydrousKg: a, purityPercent: b }),
          saltSteps({ start: a, target: b, mostPerDay: c, unit: 'g/L' }, (to) =>
            saltMassSimple({ systemLitres: d, startGPerL: a, targetGPerL: to }),
          ),
          evaporationTopUp({ systemLitres: a, readingSalinity: b, targetSalinity: c }),
        ]
        for (const answer of answers) {
          if (!answer.ok) expect(answer.refusal.field).toBeTruthy()
          const text = JSON.stringify(answer, (_, value: unknown) =>
            typeof value === 'number' && (!Number.isFinite(value) || Object.is(value, -0))
              ? 'no figure'
              : value,
          )
          if (text.includes('no figure')) expect({ a, b, c, d, text }).toBe('a figure')
        }
      }),
      { numRuns: 3000 },
    )
  })
})

describe('the two scales of salinity', () => {
  it('lead to each other and back', () => {
    fc.assert(
      fc.property(between(0, 42), (salinityPss78) => {
        const salinityGPerKg = valueOf(referenceSalinity({ salinityPss78 }))
        expect(valueOf(practicalOfReference({ salinityGPerKg }))).toBeCloseTo(salinityPss78, 12)
      }),
    )
    expect(practicalOfReference({ salinityGPerKg: 43 })).toMatchObject({ refusal: { code: 'above-most' } })
  })
})
