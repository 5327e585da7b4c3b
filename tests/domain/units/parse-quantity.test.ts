import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findUnit } from '../../../shared/domain/units/find-unit.ts'
import { parseNumber } from '../../../shared/domain/units/parse-number.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { parseQuantityText } from '../../../shared/domain/units/parse-quantity-text.ts'
import type { Dimension } from '../../../shared/domain/units/unit-table.ts'

describe('a typed number', () => {
  it.each([
    ['0.68', 0.68, '0.68'],
    ['0,68', 0.68, '0.68'],
    [' 2.40 ', 2.4, '2.40'],
    ['.5', 0.5, '0.5'],
    [',5', 0.5, '0.5'],
    ['5.', 5, '5'],
    ['007', 7, '7'],
    ['+3', 3, '3'],
    ['-1.5', -1.5, '-1.5'],
    ['−1,5', -1.5, '-1.5'],
    ['-0', 0, '0'],
    ['-0.00', 0, '0.00'],
    ['0,125', 0.125, '0.125'],
    ['0.10', 0.1, '0.10'],
    ['11400', 11400, '11400'],
    ['1.250', 1.25, '1.250'],
    ['12,5', 12.5, '12.5'],
    ['1234,567', 1234.567, '1234.567'],
  ])('%j is %d, kept as %s', (typed, value, text) => {
    expect(parseNumber(typed)).toEqual({ ok: true, value: { value, text } })
  })

  it.each([
    ['', 'blank'],
    ['   ', 'blank'],
    ['1.2.3', 'two-separators'],
    ['1,234.5', 'two-separators'],
    ['1.234,5', 'two-separators'],
    ['11,400', 'thousands-or-decimal'],
    ['-1,250', 'thousands-or-decimal'],
    ['1e3', 'not-a-number'],
    ['NaN', 'not-a-number'],
    ['Infinity', 'not-a-number'],
    ['0x10', 'not-a-number'],
    ['12 m', 'not-a-number'],
    ['1 000', 'not-a-number'],
    ['١٢', 'not-a-number'],
    ['.', 'not-a-number'],
    ['-', 'not-a-number'],
    ['--2', 'not-a-number'],
    ['½', 'not-a-number'],
    ['9'.repeat(41), 'too-long'],
    ['2.40 m * 1.20 m * 0.68 m + 1.10 m * 0.60 m * 0.40 m', 'not-a-number'],
  ])('%j is refused as %s', (typed, code) => {
    expect(parseNumber(typed, 'depth')).toMatchObject({ ok: false, refusal: { code, field: 'depth' } })
  })

  it('is refused when it is no text, and never comes out as NaN', () => {
    for (const typed of [5, NaN, null, undefined, {}, [], ['5'], true])
      expect(parseNumber(typed)).toMatchObject({ ok: false, refusal: { code: 'not-a-number' } })
    fc.assert(
      fc.property(fc.string({ maxLength: 60 }), (typed) => {
        const result = parseNumber(typed)
        if (result.ok) expect(Number.isFinite(result.value.value)).toBe(true)
      }),
      { numRuns: 2000 },
    )
  })

  it('says both readings of a comma before three digits', () => {
    expect(parseNumber('11,400')).toMatchObject({
      refusal: { params: { grouped: '11400', decimal: '11.400' } },
    })
  })
})

describe('a typed unit', () => {
  it.each([
    ['mg/L', 'mg/L'],
    ['mg/l', 'mg/L'],
    ['µL/L', 'uL/L'],
    ['μL/L', 'uL/L'],
    ['mcg', 'ug'],
    ['µg', 'ug'],
    ['m³', 'm3'],
    ['°C', 'degC'],
    ['° C', 'degC'],
    ['Litres', 'L'],
    ['US  gal', 'gal_us'],
    ['gal(US)', 'gal_us'],
    ['imperial gallons', 'gal_imp'],
    ['min.', 'min'],
    ['PSU', 'PSS-78'],
  ])('%s is %s', (typed, code) => {
    expect(findUnit(typed)).toEqual({ ok: true, value: code })
  })

  it.each([
    ['ppm', 'bare-ppm'],
    ['ppb', 'bare-ppm'],
    ['Parts per million', 'bare-ppm'],
    ['ppt', 'parts-per-thousand'],
    ['‰', 'parts-per-thousand'],
    ['gal', 'gallon-not-stated'],
    ['Gallons', 'gallon-not-stated'],
    ['gpm', 'gallon-not-stated'],
    ['fl oz', 'fluid-ounce-not-stated'],
    ['tons', 'ton-not-stated'],
    ['cc', 'write-millilitres'],
    ['IU', 'spell-units'],
    ['U', 'spell-units'],
    ['drops', 'household-measure'],
    ['tsp', 'household-measure'],
    ['ML', 'unknown-unit'],
    ['Mg', 'unknown-unit'],
    ['M', 'unknown-unit'],
    ['constructor', 'unknown-unit'],
    ['', 'unit-missing'],
  ])('%s is refused as %s', (typed, code) => {
    expect(findUnit(typed)).toMatchObject({ ok: false, refusal: { code } })
  })

  it('takes a bare gallon only where the facility says which, and never in a flow', () => {
    expect(findUnit('gal', { gallon: 'us' })).toEqual({ ok: true, value: 'gal_us' })
    expect(findUnit('gallons', { gallon: 'imperial' })).toEqual({ ok: true, value: 'gal_imp' })
    expect(findUnit('gpm', { gallon: 'us' })).toMatchObject({ ok: false })
  })

  it('asks of what a percentage is, unless the field is a percentage', () => {
    expect(findUnit('%', { dimension: 'massFraction' })).toMatchObject({
      refusal: { code: 'percent-not-stated' },
    })
    expect(findUnit('%', { dimension: 'massConcentration' })).toMatchObject({ ok: false })
    expect(findUnit('%', { dimension: 'percentage' })).toEqual({ ok: true, value: 'percent' })
    expect(findUnit('% w/w', { dimension: 'massFraction' })).toEqual({ ok: true, value: 'percent_w_w' })
  })

  it('reads the same letters by what the field is about', () => {
    expect(findUnit('mg/kg', { dimension: 'massFraction' })).toEqual({ ok: true, value: 'mg/kg_w_w' })
    expect(findUnit('mg/kg', { dimension: 'bodyDose' })).toEqual({ ok: true, value: 'mg/kg' })
    expect(findUnit('g/mL', { dimension: 'massConcentration' })).toEqual({ ok: true, value: 'g/mL_w_v' })
    expect(findUnit('°C', { dimension: 'temperatureDifference' })).toEqual({ ok: true, value: 'delta_degC' })
  })
})

describe('a typed quantity', () => {
  const depth = { dimension: 'length', above: 0, max: 15, field: 'depth' } as const

  it('is the canonical number and what was entered', () => {
    expect(parseQuantity({ value: '68,0', unit: 'cm' }, depth)).toEqual({
      ok: true,
      value: { value: 0.68, unit: 'm', entered: { value: '68.0', unit: 'cm' } },
    })
  })

  it.each([
    [{ value: '0', unit: 'm' }, 'not-above-zero', { limit: '0', unit: 'm' }],
    [{ value: '-1', unit: 'm' }, 'not-above-zero', { limit: '0', unit: 'm' }],
    [{ value: '1600', unit: 'cm' }, 'above-most', { limit: '1500', unit: 'cm' }],
    [{ value: '60', unit: 'ft' }, 'above-most', { limit: '49.2126', unit: 'ft' }],
    [{ value: '', unit: 'm' }, 'blank', { unit: 'm' }],
    [{ value: '1', unit: '' }, 'unit-missing', { unit: 'm' }],
    [{ value: '1', unit: 'kg' }, 'dimensions-differ', { from: 'kg', to: 'm' }],
    [{ value: '1', unit: 'ppm' }, 'bare-ppm', { unit: 'm', typed: 'ppm' }],
  ])('%j is refused as %s', (entered, code, params) => {
    expect(parseQuantity(entered, depth)).toEqual({ ok: false, refusal: { code, field: 'depth', params } })
  })

  it('refuses below a least value in the unit typed', () => {
    expect(
      parseQuantity({ value: '10', unit: 'degF' }, { dimension: 'temperature', min: -2, max: 45 }),
    ).toMatchObject({
      refusal: { code: 'below-least', params: { limit: '28.4', unit: 'degF' } },
    })
  })

  it('refuses nothing at all, and shapes that are no quantity', () => {
    for (const entered of [null, undefined, {}, { value: 5 }, { value: {}, unit: {} }] as never[])
      expect(parseQuantity(entered, depth)).toMatchObject({ ok: false, refusal: { field: 'depth' } })
  })

  it('reads number and unit from one text', () => {
    const volume = { dimension: 'volume', above: 0 } as const
    expect(parseQuantityText('38 US gal', volume)).toMatchObject({
      value: { entered: { value: '38', unit: 'gal_us' } },
    })
    expect(parseQuantityText('0,5m3', volume)).toMatchObject({ value: { value: 500 } })
    expect(parseQuantityText('12', volume, 'L')).toMatchObject({ value: { value: 12 } })
    expect(parseQuantityText('12', volume)).toMatchObject({ refusal: { code: 'unit-missing' } })
    expect(parseQuantityText('38 gal', volume)).toMatchObject({ refusal: { code: 'gallon-not-stated' } })
    expect(parseQuantityText('deep', volume)).toMatchObject({ refusal: { code: 'not-a-number' } })
    expect(parseQuantityText('', volume, 'L')).toMatchObject({ refusal: { code: 'blank' } })
  })

  it('answers with a finite number inside its limits or a refusal that names the field, for any text', () => {
    const dimensions: Dimension[] = ['volume', 'mass', 'massConcentration', 'temperature']
    fc.assert(
      fc.property(fc.string(), fc.string(), fc.constantFrom(...dimensions), (value, unit, dimension) => {
        const result = parseQuantity({ value, unit }, { dimension, min: -10, max: 10, field: 'f' })
        if (result.ok) expect(Math.abs(result.value.value)).toBeLessThanOrEqual(10)
        else expect(result.refusal.field).toBe('f')
      }),
    )
  })

  it('takes a value exactly on a limit in whatever unit it is typed', () => {
    // 28.4 °F is −2 °C and 104 °F is 40 °C; converted, the first comes out a binary digit colder
    const water = { dimension: 'temperature', min: -2, max: 40 } as const
    for (const [value, celsius] of [
      ['28.4', -2],
      ['104', 40],
    ] as const)
      expect(parseQuantity({ value, unit: 'degF' }, water)).toMatchObject({
        ok: true,
        value: { value: celsius },
      })
    expect(parseQuantity({ value: '28.39', unit: 'degF' }, water)).toMatchObject({
      refusal: { code: 'below-least' },
    })
    expect(parseQuantity({ value: '104.000001', unit: 'degF' }, water)).toMatchObject({
      refusal: { code: 'above-most' },
    })
  })
})
