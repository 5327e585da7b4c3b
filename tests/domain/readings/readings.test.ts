import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkRange } from '../../../shared/domain/readings/check-range.ts'
import { checkReading } from '../../../shared/domain/readings/check-reading.ts'
import { judgeReading } from '../../../shared/domain/readings/judge-reading.ts'
import { parameterOf, readingParameters } from '../../../shared/domain/readings/parameters.ts'
import { canonicalUnitsOf } from '../../../shared/domain/readings/read-parameter-value.ts'
import type { WaterRange } from '../../../shared/domain/readings/water-range.ts'

const oxygen: WaterRange = { unit: 'mg/L', outerLow: 4.5, innerLow: 5.5, innerHigh: 9, outerHigh: null }
const at = (value: number, below = false, unit = 'mg/L') => judgeReading({ value, unit, below }, oxygen)

describe('the judgement of a reading', () => {
  // The worked example of the water alerts (project rule, no outside source): oxygen 5.5 inner, 4.5 outer mg/L
  it.each([
    [5.6, 'inside', null],
    [5.5, 'inside', null],
    [5.4, 'inner', 'low'],
    [4.5, 'inner', 'low'],
    [4.4, 'outer', 'low'],
    [9, 'inside', null],
    [9.01, 'inner', 'high'],
    [30, 'inner', 'high'],
  ])('%d mg/L is %s', (value, level, side) => {
    expect(at(value)).toMatchObject({ level, side })
  })

  it('says nothing where nothing is wanted, and cannot tell across scales of salinity', () => {
    expect(judgeReading({ value: 5, unit: 'mg/L', below: false }, null).level).toBe('no-range')
    expect(at(33, false, 'PSS-78').level).toBe('unknown')
  })

  it('takes "below" as at most that: low when even the mark is low, never certainly high', () => {
    const copper: WaterRange = {
      unit: 'mg/L',
      outerLow: null,
      innerLow: null,
      innerHigh: 0.02,
      outerHigh: 0.05,
    }
    expect(judgeReading({ value: 0.02, unit: 'mg/L', below: true }, copper).level).toBe('inside')
    expect(judgeReading({ value: 0.1, unit: 'mg/L', below: true }, copper).level).toBe('unknown')
    expect(at(4.5, true).level).toBe('outer')
    expect(at(5, true).level).toBe('unknown')
  })

  it('never calls a higher value of a one-sided range better', () => {
    const limits = { unit: 'mg/L' as const, outerLow: null, innerLow: null, innerHigh: 1, outerHigh: 2 }
    const rank = { inside: 0, inner: 1, outer: 2, 'no-range': -1, unknown: -1 }
    fc.assert(
      fc.property(
        fc.double({ min: 0, max: 5, noNaN: true }),
        fc.double({ min: 0, max: 5, noNaN: true }),
        (a, b) => {
          const [low, high] = a < b ? [a, b] : [b, a]
          const of = (value: number) =>
            rank[judgeReading({ value, unit: 'mg/L', below: false }, limits).level]
          expect(of(low)).toBeLessThanOrEqual(of(high))
        },
      ),
    )
  })
})

describe('a reading', () => {
  const read = (
    parameter: Parameters<typeof checkReading>[0]['parameter'],
    value: unknown,
    unit: unknown,
    more = {},
  ) => checkReading({ parameter, value: { value, unit }, ...more })

  it('keeps practical salinity and g/kg apart, each in its own canonical unit', () => {
    const practical = read('salinity', '33.1', 'PSS-78')
    const absolute = read('salinity', '33.1', 'g/kg')
    expect(practical.ok && practical.value.canonicalUnit).toBe('PSS-78')
    expect(absolute.ok && absolute.value.canonicalUnit).toBe('g/kg')
    expect(canonicalUnitsOf('salinity')).toEqual(['PSS-78', 'g/kg'])
  })

  it('converts alkalinity in mg/L as calcium carbonate', () => {
    // 100.086 g/mol ÷ 2 a milliequivalent (IUPAC weights): 128 mg/L is 2.5578 meq/L
    const value = read('alkalinity', '128', 'mg/L_CaCO3')
    expect(value.ok && value.value.canonicalValue).toBeCloseTo(2.557_8, 4)
  })

  it.each([
    ['ph', '8.1', 'pH', {}, 'ph-scale-missing', 'scale'],
    ['ph', '8.1', 'pH', { scale: 'best' }, 'ph-scale-missing', 'scale'],
    ['salinity', '33', 'PSS-78', { scale: 'nbs' }, 'scale-only-for-ph', 'scale'],
    ['temperature', '12', 'degC', { below: true }, 'cannot-be-below', 'below'],
    ['nitrate-n', '10', 'ppm', {}, 'bare-ppm', 'value'],
    ['salinity', '35', 'ppt', {}, 'parts-per-thousand', 'value'],
    ['salinity', '35', 'mg/L', {}, 'dimensions-differ', 'value'],
    ['specific-gravity', '1025', 'SG', {}, 'above-most', 'value'],
  ] as const)('of %s as %s %s %o is refused', (parameter, value, unit, more, code, field) => {
    const result = read(parameter, value, unit, more)
    expect(result.ok ? null : result.refusal).toMatchObject({ code, field })
  })

  it('has limits in order for every parameter', () => {
    for (const parameter of readingParameters) {
      const { least, most } = parameterOf(parameter)
      expect(least, parameter).toBeLessThan(most)
    }
  })
})

describe('a range', () => {
  it('converts all limits by one unit and keeps what was typed', () => {
    const result = checkRange('temperature', {
      unit: 'degF',
      innerLow: '75.2',
      innerHigh: '80.6',
      outerHigh: '',
    })
    expect(result.ok && result.value.range.innerLow).toBeCloseTo(24, 9)
    expect(result.ok && result.value.range.innerHigh).toBeCloseTo(27, 9)
    expect(result.ok && result.value).toMatchObject({
      enteredUnit: 'degF',
      entered: { innerLow: '75.2', outerHigh: null },
    })
  })

  it('lets an outer limit equal the inner one beside it, and no more', () => {
    expect(checkRange('temperature', { unit: 'degC', outerLow: '10', innerLow: '10' }).ok).toBe(true)
    const equal = checkRange('temperature', { unit: 'degC', innerLow: '10', innerHigh: '10' })
    expect(equal.ok ? null : equal.refusal).toMatchObject({ code: 'range-out-of-order', field: 'innerHigh' })
    const across = checkRange('temperature', { unit: 'degC', outerLow: '12', outerHigh: '11' })
    expect(across.ok ? null : across.refusal.field).toBe('outerHigh')
  })

  it('is refused without any limit', () => {
    const result = checkRange('temperature', { unit: 'degC', innerLow: ' ' })
    expect(result.ok ? null : result.refusal.code).toBe('range-empty')
  })
})
