import { describe, expect, it } from 'vitest'
import { findUnsafeWriting } from '../../../shared/domain/quantities/find-unsafe-writing.ts'
import { parseQuantity } from '../../../shared/domain/units/parse-quantity.ts'
import { parseQuantityText } from '../../../shared/domain/units/parse-quantity-text.ts'
import { isNumberRefusalCode, sayNumberRefusal } from '../../../shared/messages/say-number-refusal.ts'

const depth = { dimension: 'length', above: 0, max: 15, field: 'depth' } as const

function said(typed: string): string {
  const result = parseQuantityText(typed, depth, 'm')
  return result.ok ? 'taken' : sayNumberRefusal(result.refusal)
}

describe('a refused number', () => {
  it.each([
    ['', 'Type the depth of the water in metres, for example 0.68.'],
    [
      '0.6.8',
      'Type the depth of the water with one decimal point and nothing between the thousands, for example 0.68.',
    ],
    ['1,250', 'The depth of the water can be read in two ways. Type 1250 or 1.250.'],
    ['0', 'Type the depth of the water as more than zero, for example 0.68.'],
    ['68 m', 'The depth of the water has to be at most 15 m. Check the number and its unit.'],
    [
      '68 fathoms',
      '“fathoms” is not a unit known here. Choose a unit for the depth of the water from the list.',
    ],
    [
      'deep',
      'The depth of the water is not a number. Type digits with at most one decimal point, for example 0.68.',
    ],
  ])('%j is answered with what to do', (typed, sentence) => {
    expect(said(typed)).toBe(sentence)
  })

  it('is named by the label of the screen, or by the last part of a path', () => {
    const blank = parseQuantity({ value: '', unit: 'm' }, { ...depth, field: 'sumps.1.width' })
    if (blank.ok) throw new Error('taken')
    expect(sayNumberRefusal(blank.refusal)).toBe('Type the width in metres, for example 1.20.')
    expect(sayNumberRefusal(blank.refusal, 'the width of the second sump')).toContain('the second sump')
  })

  it('says a limit of a plain number without a unit', () => {
    const refusal = { code: 'above-most', field: 'b', params: { limit: '4', unit: 'ratio' } } as const
    expect(sayNumberRefusal(refusal, 'the exponent')).toBe(
      'The exponent has to be at most 4. Check the number.',
    )
    const least = { ...refusal, code: 'below-least' } as const
    expect(sayNumberRefusal(least, 'the exponent')).toBe(
      'The exponent has to be at least 4. Check the number.',
    )
  })

  it('gives every sentence as safe writing that ends in a full stop', () => {
    const codes = [
      ...['blank', 'not-a-number', 'two-separators', 'thousands-or-decimal', 'too-long', 'unit-missing'],
      ...['unknown-unit', 'bare-ppm', 'parts-per-thousand', 'gallon-not-stated', 'fluid-ounce-not-stated'],
      ...['ton-not-stated', 'percent-not-stated', 'write-millilitres', 'spell-units', 'household-measure'],
      ...[
        'not-finite',
        'dimensions-differ',
        'below-absolute-zero',
        'not-above-zero',
        'below-least',
        'above-most',
      ],
    ]
    for (const code of codes) {
      if (!isNumberRefusalCode(code)) throw new Error(`no sentence for ${code}`)
      const sentence = sayNumberRefusal({ code, field: 'nothing-known', params: { unit: 'mg/L' } })
      expect(sentence).toMatch(/^[“A-Z].*\.$/s)
      expect(findUnsafeWriting(sentence, 'prose')).toEqual([])
    }
  })
})
