import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'

describe('a number as a quantity', () => {
  it.each([
    [1e-7, '0.0000001'],
    [1.25e-9, '0.00000000125'],
    [-2.5e-8, '-0.000000025'],
    [1e21, '1000000000000000000000'],
    [0.1, '0.1'],
    [11400, '11400'],
  ])('%d is written %s', (value, text) => {
    expect(quantityOf(value, 'g')).toEqual({ value: text, unit: 'g' })
  })

  it('is the same double when it is read again', () => {
    fc.assert(
      fc.property(fc.double({ min: -1e20, max: 1e20, noNaN: true }), (value) => {
        fc.pre(value === 0 || Math.abs(value) > 1e-15)
        const read = parseQuantity(quantityOf(value, 'g'), { dimension: 'mass' })
        expect(read.ok && read.value.value).toBe(value === 0 ? 0 : value)
      }),
    )
  })

  it('is refused when it is no number', () => {
    for (const value of [NaN, Infinity, -Infinity])
      expect(parseQuantity(quantityOf(value, 'g'), { dimension: 'mass' })).toMatchObject({ ok: false })
  })
})
