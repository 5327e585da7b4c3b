import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { breakLines, leastWidths } from '../../server/platform/pdf/break-lines.ts'
import { columnWidths } from '../../server/platform/pdf/column-widths.ts'
import { PdfRenderError } from '../../server/platform/pdf/pdf-render-error.ts'
import { typeface } from '../../server/platform/pdf/typeface.ts'

const face = typeface()
const options = { size: 10, block: 'test' }
const texts = (text: string, width: number) =>
  breakLines(face, text, width, options).map((line) =>
    line.fragments.map((fragment) => fragment.text).join(''),
  )

describe('breaking lines', () => {
  it('never parts a number from its unit, at any width that holds both', () => {
    const text = 'Add 2,217.6\u00a0L at 23.4\u00a0°C, then −\u00a041.0\u00a0L and 0.44 g in 20 min'
    const { least } = leastWidths(face, text, options)
    for (let width = least; width < 200; width += 1)
      for (const line of texts(text, width)) {
        expect(line).not.toMatch(/\d$(?<!2,217\.6|20|23\.4|41\.0|0\.44)/)
        for (const quantity of [
          '2,217.6\u00a0L',
          '23.4\u00a0°C',
          '41.0\u00a0L',
          '0.44\u00a0g',
          '20\u00a0min',
        ])
          expect(line.endsWith(quantity.split('\u00a0')[0] ?? '')).toBe(false)
      }
  })

  it('loses no character and keeps every line within the width, whatever the text', () => {
    const drawable = fc.constantFrom(...'abcdefghij KLMNO 0123456789.,- /µé°±−×')
    fc.assert(
      fc.property(
        fc.string({ unit: drawable, maxLength: 120 }),
        fc.integer({ min: 60, max: 300 }),
        (text, width) => {
          let lines: ReturnType<typeof breakLines>
          try {
            lines = breakLines(face, text, width, options)
          } catch (error) {
            // Only a number longer than the line may be refused.
            expect(error).toBeInstanceOf(PdfRenderError)
            expect(leastWidths(face, text, options).least).toBeGreaterThan(width)
            return
          }
          for (const line of lines) expect(line.width).toBeLessThanOrEqual(width + 0.01)
          const drawn = lines.map((line) => line.fragments.map((fragment) => fragment.text).join('')).join('')
          const bare = (value: string) => value.replace(/[\s\u00a0]/g, '').replaceAll('µ', 'μ')
          expect(bare(drawn)).toBe(bare(text))
        },
      ),
      { numRuns: 400, seed: 20261201 },
    )
  })

  it('divides a name that is longer than the line, and shows all of it', () => {
    const name = 'Hippocampusabdominalisxreidixkuda'.repeat(6)
    const lines = texts(name, 120)
    expect(lines.length).toBeGreaterThan(5)
    expect(lines.join('')).toBe(name)
  })

  it('divides after a hyphen rather than within a part', () => {
    expect(texts('Harrow-Point-Quarantine-Wing-East', 90)[0]).toMatch(/-$/)
  })

  it('refuses a number that would have to be divided, and says which', () => {
    expect(() => texts('9,007,199,254,740,991\u00a0micrograms', 60)).toThrow(
      expect.objectContaining({ code: 'does-not-fit', params: expect.objectContaining({ block: 'test' }) }),
    )
  })

  it('keeps looks apart and their places in order', () => {
    const [line] = breakLines(face, [{ text: 'Oxygen', bold: true }, { text: ' at least' }], 200, options)
    expect(line?.fragments.map(({ text, bold }) => [text, bold])).toEqual([
      ['Oxygen', true],
      [' at least', false],
    ])
    expect(line?.fragments[1]?.x).toBeGreaterThan(30)
  })

  it('keeps an empty line and an empty text', () => {
    expect(texts('a\n\nb', 100)).toEqual(['a', '', 'b'])
    expect(texts('', 100)).toEqual([''])
  })
})

describe('column widths', () => {
  const need = (share: number, line: number, whole: number, least: number) => ({ share, line, whole, least })

  it('follow the shares when everything fits', () => {
    expect(columnWidths([need(1, 10, 10, 5), need(3, 10, 10, 5)], 200)).toEqual([50, 150])
  })

  it('widen a column whose number would not fit, at the others’ expense, and fill the sheet', () => {
    const widths = columnWidths([need(1, 80, 80, 80), need(3, 40, 40, 10)], 200) ?? []
    expect(widths[0]).toBeCloseTo(80)
    expect(widths.reduce((a, b) => a + b, 0)).toBeCloseTo(200)
  })

  it('give way on long words before they give way on numbers', () => {
    const widths =
      columnWidths([need(1, 500, 300, 20), need(1, 120, 120, 110), need(1, 70, 70, 60)], 200) ?? []
    expect(widths[1]).toBeGreaterThanOrEqual(109.999)
    expect(widths[2]).toBeGreaterThanOrEqual(59.999)
    expect(widths.reduce((a, b) => a + b, 0)).toBeLessThanOrEqual(200.001)
  })

  it('are refused when not even the numbers fit', () => {
    expect(columnWidths([need(1, 90, 90, 90), need(1, 120, 120, 120)], 200)).toBeUndefined()
  })
})
