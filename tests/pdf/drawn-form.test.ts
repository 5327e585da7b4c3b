import { describe, expect, it } from 'vitest'
import { drawnForm, glueQuantities } from '../../server/platform/pdf/drawn-form.ts'
import { spellUndrawable, undrawableCharacters } from '../../server/platform/pdf/typeface.ts'
import { nfkc } from './support/poppler.ts'

describe('the drawn form of a text', () => {
  it.each(['5 µg', 'Zoé', 'Zoe\u0301', '250 µL/L', 'a\u2011b', '23.4\u00a0°C', 'Ångström'])(
    'is %j under NFKC',
    (text) => {
      expect(nfkc(drawnForm(text)).replaceAll('\u2010', '-')).toBe(nfkc(text).replaceAll('\u2010', '-'))
    },
  )

  it('draws the micro sign upright', () => {
    expect(drawnForm('\u00b5g')).toBe('\u03bcg')
  })

  it('leaves out characters nobody can see, and nothing else', () => {
    expect(drawnForm('QT\u200b-3\u202e \ufeffok\u2066')).toBe('QT-3 ok')
  })

  it('reads every line end as one', () => {
    expect(drawnForm('a\r\nb\rc\u2028d')).toBe('a\nb\nc\nd')
  })
})

describe('quantities typed with a plain space', () => {
  it.each([
    ['give 2 mg/L daily', 'give 2\u00a0mg/L daily'],
    ['at 23.4 °C and 35 ‰', 'at 23.4\u00a0°C and 35\u00a0‰'],
    ['every 12 h for 21 days', 'every 12\u00a0h for 21\u00a0days'],
    ['− 41.0 L', '−\u00a041.0\u00a0L'],
    ['± 2 %', '±\u00a02\u00a0%'],
    ['5 μg/kg', '5\u00a0μg/kg'],
    ['0.3 m³', '0.3\u00a0m³'],
  ])('%j stay on one line', (typed, glued) => {
    expect(glueQuantities(typed)).toBe(glued)
  })

  it.each(['14 animals', 'step 2 made', '3 Landing nets', 'tank 4 has fish'])('%j may break', (text) => {
    expect(glueQuantities(text)).toBe(text)
  })
})

describe('characters the font lacks', () => {
  it('are named, each once', () => {
    expect(undrawableCharacters('fish 🐟 🐟 and 鯛, µ ° é − × ± ≤ ok')).toEqual(['🐟', '鯛'])
  })

  it('include a mark that did not join its letter', () => {
    expect(undrawableCharacters('x\u0301')).toEqual(['\u0301'])
  })

  it('are spelled out where a document has to come out in any case', () => {
    expect(spellUndrawable('seen 🐟 at 5 µm')).toBe('seen [U+1F41F] at 5 μm')
  })
})
