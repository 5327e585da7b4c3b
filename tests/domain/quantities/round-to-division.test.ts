import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { roundToDivision } from '../../../shared/domain/quantities/round-to-division.ts'

describe('rounding to a balance', () => {
  it.each<[number | string, string, string]>([
    [0.4401, '0.01', '0.44'],
    [0.4401, '0.001', '0.440'],
    // the double nearest 1.005 is 1.00499999999999989, and toFixed gives 1.00
    [1.005, '0.01', '1.01'],
    [2.675, '0.01', '2.68'],
    [0.125, '0.01', '0.13'],
    [0.5, '1', '1'],
    [1.5, '1', '2'],
    [2.5, '1', '3'],
    [1.15 * 100, '1', '115'],
    [4.35 * 100, '5', '435'],
    [12.4, '0.5', '12.5'],
    [12.25, '0.5', '12.5'],
    [12.2499, '0.5', '12.0'],
    [125, '5', '125'],
    [122.5, '5', '125'],
    [-1.005, '0.01', '-1.01'],
    ['0.435', '0.01', '0.44'],
    [0, '0.01', '0.00'],
    [1e-9, '0.01', '0.00'],
    [3.7, '0.25', '3.75'],
    [17670, '1', '17670'],
    [1e15, '1', '1000000000000000'],
  ])('%j read to %s is %s', (value, division, expected) => {
    expect(roundToDivision(value, division)).toEqual({ ok: true, value: expected })
  })

  it('is off by at most half a division, and is a whole number of divisions', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 10_000_000 }),
        fc.constantFrom('0.001', '0.01', '0.02', '0.05', '0.1', '0.2', '0.5', '1', '2', '5', '10'),
        (thousandths, division) => {
          const value = thousandths / 1000
          const result = roundToDivision(value, division)
          if (!result.ok) throw new Error(result.refusal.code)
          const rounded = Math.round(Number(result.value) * 1000)
          const step = Math.round(Number(division) * 1000)
          expect(rounded % step).toBe(0)
          // in whole thousandths the rule can be said exactly
          expect(rounded).toBe(Math.floor((2 * thousandths + step) / (2 * step)) * step)
        },
      ),
      { numRuns: 2000 },
    )
  })

  it('refuses what is no number, and a division that is none', () => {
    for (const value of [NaN, Infinity, -Infinity, '', 'x', null, undefined, {}] as number[])
      expect(roundToDivision(value, '0.01')).toMatchObject({ ok: false, refusal: { code: 'not-finite' } })
    for (const division of ['0', '-1', '', 'fine', '0.00', 'NaN'])
      expect(roundToDivision(1, division)).toMatchObject({
        ok: false,
        refusal: { code: 'division-not-positive' },
      })
  })
})
