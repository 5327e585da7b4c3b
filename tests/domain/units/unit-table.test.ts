import { describe, expect, it } from 'vitest'
import { canonicalUnit, unitTable, type UnitCode } from '../../../shared/domain/units/unit-table.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { unitsOf } from '../../../shared/domain/units/units-of.ts'
import { unitNames } from '../../../shared/messages/units.ts'

const codes = Object.keys(unitTable) as UnitCode[]

describe('the table of units', () => {
  it.each(codes)('%s is named in ASCII, has whole-number factors and words', (code) => {
    expect(code).toMatch(/^[\w/-]+$/)
    const { numerator, denominator, places } = unitOf(code)
    expect(Number.isSafeInteger(numerator) && numerator > 0).toBe(true)
    expect(Number.isSafeInteger(denominator) && denominator > 0).toBe(true)
    expect(Number.isInteger(places) && places >= 0).toBe(true)
    expect(unitNames[code]).toMatch(/[a-zA-Z]{3,}/)
  })

  it('gives each dimension a canonical unit of factor 1', () => {
    for (const [dimension, code] of Object.entries(canonicalUnit)) {
      expect(unitOf(code)).toMatchObject({ dimension, numerator: 1, denominator: 1, offset: 0 })
    }
    expect(new Set(codes.map((code) => unitOf(code).dimension))).toEqual(new Set(Object.keys(canonicalUnit)))
  })

  it('never draws micrograms, microlitres or units of activity as a sign or a letter', () => {
    const symbols = codes.map((code) => unitOf(code).symbol)
    expect(symbols.filter((symbol) => /[µμ]g|\bug\b|\bIU\b|^U$|\bcc\b|ppm/.test(symbol))).toEqual([])
    expect(unitOf('ug').symbol).toBe('micrograms')
    expect(unitOf('uL/L').symbol).toBe('µL/L')
  })

  it('lists the units of a dimension in the order of the table', () => {
    expect(unitsOf('length')).toEqual(['mm', 'cm', 'm', 'in', 'ft'])
  })
})
