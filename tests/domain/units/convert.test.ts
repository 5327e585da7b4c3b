import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { convert } from '../../../shared/domain/units/convert.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'

const codes = Object.keys(unitTable) as UnitCode[]
const pairs = codes.flatMap((from) =>
  codes
    .filter((to) => unitOf(from).dimension === unitOf(to).dimension)
    .map((to): [UnitCode, UnitCode] => [from, to]),
)
const pair = fc.constantFrom(...pairs)
const ordinary = fc.double({ min: -1e9, max: 1e9, noNaN: true })

function value(result: ReturnType<typeof convert>): number {
  if (!result.ok) throw new Error(result.refusal.code)
  return result.value
}

describe('conversion', () => {
  // Exact by definition: 1 in = 2.54 cm, 1 lb = 0.45359237 kg, 1 US gal = 231 cubic inches (NIST SP 811)
  it.each<[number, UnitCode, UnitCode, number]>([
    [1, 'gal_us', 'L', 3.785411784],
    [1, 'gal_imp', 'L', 4.54609],
    [231, 'in3', 'gal_us', 1],
    [128, 'floz_us', 'gal_us', 1],
    [3, 'tsp_us', 'tbsp_us', 1],
    [16, 'oz_av', 'lb', 1],
    [12, 'in', 'ft', 1],
    [1728, 'in3', 'ft3', 1],
    [2500, 'mg', 'g', 2.5],
    [2.5, 'g', 'mg', 2500],
    [0.1, 'g', 'mg', 100],
    [0.3, 'mg', 'ug', 300],
    [77, 'degF', 'degC', 25],
    [-40, 'degF', 'degC', -40],
    [9, 'delta_degF', 'delta_degC', 5],
    [0, 'degC', 'K', 273.15],
    [10, 'percent_w_v', 'mg/mL', 100],
    [1, 'mL/L', 'uL/L', 1000],
    [3, 'percent_w_w', 'g/kg_w_w', 30],
    [90, 'min', 'h', 1.5],
    [24, 'per_d', 'per_h', 1],
  ])('%d %s is, in %s, exactly %d', (given, from, to, expected) => {
    expect(value(convert(given, from, to))).toBe(expected)
  })

  it('comes back to where it started', () => {
    fc.assert(
      fc.property(pair, ordinary, ([from, to], given) => {
        const there = convert(given, from, to)
        fc.pre(there.ok)
        const back = value(convert(value(there), to, from))
        // an offset of 273.15 costs the digits below it
        expect(Math.abs(back - given)).toBeLessThanOrEqual(1e-13 * Math.max(Math.abs(given), 500))
      }),
      { numRuns: 2000 },
    )
  })

  it('keeps order: what is more in one unit is not less in another', () => {
    fc.assert(
      fc.property(pair, ordinary, ordinary, ([from, to], a, b) => {
        const [low, high] = [convert(Math.min(a, b), from, to), convert(Math.max(a, b), from, to)]
        fc.pre(low.ok && high.ok)
        expect(value(low)).toBeLessThanOrEqual(value(high))
      }),
    )
  })

  it('scales: twice as much is twice as much in every unit without an offset', () => {
    fc.assert(
      fc.property(pair, ordinary, ([from, to], given) => {
        fc.pre(unitOf(from).dimension !== 'temperature')
        const single = value(convert(given, from, to))
        expect(value(convert(2 * given, from, to))).toBeCloseTo(
          2 * single,
          9 - Math.ceil(Math.log10(1 + Math.abs(single))),
        )
      }),
    )
  })

  it('goes by any way round: through a third unit it is the same', () => {
    fc.assert(
      fc.property(
        pair,
        fc.nat(),
        fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
        ([from, to], pick, given) => {
          const same = codes.filter((code) => unitOf(code).dimension === unitOf(from).dimension)
          const by = same[pick % same.length] ?? from
          const direct = value(convert(given, from, to))
          const around = value(convert(value(convert(given, from, by)), by, to))
          expect(Math.abs(around - direct)).toBeLessThanOrEqual(1e-12 * Math.max(Math.abs(direct), 500))
        },
      ),
    )
  })

  it('refuses other dimensions, bases of salinity, and differences as temperatures', () => {
    for (const [from, to] of [
      ['mg/L', 'kg'],
      ['PSS-78', 'g/kg'],
      ['degC', 'delta_degC'],
      ['mg/L', 'uL/L'],
      ['mg/kg', 'mg/kg_w_w'],
      ['g/mL', 'g/mL_w_v'],
    ] as [UnitCode, UnitCode][])
      expect(convert(1, from, to)).toEqual({
        ok: false,
        refusal: { code: 'dimensions-differ', field: 'to', params: { from, to } },
      })
  })

  it('refuses what is colder than absolute zero', () => {
    expect(convert(-500, 'degF', 'degC')).toMatchObject({
      ok: false,
      refusal: { code: 'below-absolute-zero' },
    })
    expect(convert(-273.15, 'degC', 'K')).toMatchObject({ ok: true })
    expect(convert(-0.001, 'K', 'degC')).toMatchObject({ ok: false })
  })

  it('refuses, and never answers NaN, whatever it is handed', () => {
    const hostile = [NaN, Infinity, -Infinity, '1', null, undefined, {}, [], true, 1n] as unknown as number[]
    for (const given of hostile)
      expect(convert(given, 'g', 'mg')).toMatchObject({ ok: false, refusal: { code: 'not-finite' } })
    expect(convert(1e308, 'kg', 'mg')).toMatchObject({ ok: false, refusal: { code: 'not-finite' } })
    for (const name of ['constructor', '__proto__', 'toString', '', 'MG'] as unknown as UnitCode[])
      expect(convert(1, name, 'mg')).toMatchObject({
        ok: false,
        refusal: { code: 'unknown-unit', field: 'from' },
      })
    expect(value(convert(5e-324, 'kg', 'kg'))).toBe(5e-324)
  })
})
