import { describe, expect, it } from 'vitest'
import type { DocumentBlock } from '../../shared/domain/documents/pdf-document-model.ts'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { historyLike } from './examples/history-like.ts'
import { nfkc, textOf } from './support/poppler.ts'

const draw = (...blocks: DocumentBlock[]) => drawDocument(historyLike(0, { blocks }))

describe('a character the font lacks', () => {
  it.each<[string, DocumentBlock, string]>([
    ['heading', { kind: 'heading', text: 'Weight ✓' }, 'heading "Weight ✓"'],
    ['paragraph', { kind: 'paragraph', text: 'NO₃ 5 mg/L' }, 'paragraph "NO₃ 5 mg/L"'],
    ['grid', { kind: 'grid', entries: [{ label: 'Sex', value: '♀' }] }, 'grid "Sex"'],
    ['amount', { kind: 'amount', value: '0.44', unit: '㎎', lines: [] }, 'amount "0.44 ㎎"'],
    ['caution', { kind: 'caution', level: 'stop', title: 'Oxygen', lines: ['⚠'] }, 'caution "Oxygen"'],
    [
      'working',
      { kind: 'working', lines: [{ what: 'Rise', formula: '1 ⋅ 2', result: '2 g' }] },
      'working "Rise"',
    ],
    ['conditions', { kind: 'conditions', items: ['Valve ☐'] }, 'condition "Valve ☐"'],
    [
      'table',
      { kind: 'table', columns: [{ head: 'Name', share: 1 }], rows: [['鯛']], emptyText: '' },
      'table "Name"',
    ],
    [
      'drawing',
      {
        kind: 'drawing',
        width: 9,
        height: 9,
        alt: 'course',
        marks: [{ mark: 'text', at: [0, 5], text: '⚓', size: 5 }],
      },
      'drawing "course"',
    ],
  ])('is refused in a %s, naming the character and the block', async (_kind, block, name) => {
    await expect(draw(block)).rejects.toMatchObject({
      code: 'missing-glyph',
      params: { block: name, character: expect.stringMatching(/^.+ \(U\+[0-9A-F]{4,5}\)$/u) },
    })
  })

  it('is refused in the furniture of the page as well', async () => {
    await expect(
      drawDocument(
        historyLike(0, { printed: { by: '木村', at: '1 May 2026', atIso: '2026-05-01T00:00:00Z' } }),
      ),
    ).rejects.toMatchObject({
      code: 'missing-glyph',
      params: { block: 'page foot', character: '木 (U+6728)' },
    })
  })
})

describe('characters that must come out right', () => {
  it.each([
    '0.5\u00a0µg/L and 0.5\u00a0μg/L',
    '23.4\u00a0°C ± 0.2\u00a0°C',
    'Zoé, Señor Núñez, Jürgen Groß, Łódź, Čáslav, Ångström, Ørsted, Nyköping, İzmir, Kőszeg',
    'π × 0.4² × 1.2 ≈ 0.6\u00a0m³',
    '− 41.0\u00a0L, – to — and …',
    'at least ≥, at most ≤, ‰, €, £, ½, α β Ω, →',
    '“quoted” ‘single’ ‹a› «b» • · †',
    'office, difficult, flow, waffle, AVATAR To',
    'decomposed: e\u0301 a\u0308 n\u0303',
    'hyphen\u2011kept, soft\u00adhyphen, thin\u2009space, narrow\u202fspace',
  ])('%j', async (text) => {
    const drawn = nfkc(textOf(await draw({ kind: 'paragraph', text }))).replace(/\s+/g, ' ')
    const wanted = nfkc(text).replaceAll('\u00ad', '').replaceAll('\u2010', '-').replace(/\s+/g, ' ')
    expect(drawn).toContain(wanted)
  })
})
