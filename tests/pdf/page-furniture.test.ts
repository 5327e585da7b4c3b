import { afterEach, describe, expect, it } from 'vitest'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { setMessageLocale } from '../../shared/messages/define-messages.ts'
import { documentWords } from '../../shared/messages/documents.ts'
import type { FlagLetter } from '../../shared/domain/documents/pdf-document-model.ts'
import { historyLike } from './examples/history-like.ts'
import { orderLike } from './examples/order-like.ts'
import { greyOf, pageCount, pageTexts, textOf, wordsOf } from './support/poppler.ts'

afterEach(() => setMessageLocale('en'))

describe('page furniture', () => {
  it('names both signers with their times on every page of a long order', async () => {
    const signers = [
      'Signed by Dr Ilse Marrow, 14 May 2026, 14:24:07, UTC−4',
      'Override signed by Dr Ilse Marrow, 14 May 2026, 14:12:40, UTC−4',
    ]
    const blocks = [...orderLike().blocks, ...orderLike().blocks, ...orderLike().blocks]
    const bytes = await drawDocument(orderLike({ signers, blocks }))
    const pages = pageCount(bytes)
    expect(pages).toBeGreaterThanOrEqual(3)
    for (let page = 1; page <= pages; page++) {
      const text = textOf(bytes, page)
      for (const part of [
        'Treatment order: bath',
        'TO-0734, version 2',
        ...signers,
        'QT-3',
        `Page ${page} of ${pages}`,
      ])
        expect(text, `page ${page}`).toContain(part)
    }
  })

  it('shows a state that matters on every page, white on ink', async () => {
    const notice = documentWords.recordBroken
    const bytes = await drawDocument(historyLike(60, { notice }))
    const pages = pageCount(bytes)
    expect(pages).toBeGreaterThan(1)
    for (let page = 1; page <= pages; page++) {
      expect(textOf(bytes, page)).toContain(notice)
      const word = wordsOf(bytes, page).find(({ text }) => text === 'failed:')
      if (!word) throw new Error('the notice is not on the page')
      expect(
        greyOf(bytes, page).darkShare(word.left - 60, word.top - 3, word.right + 200, word.bottom + 3),
      ).toBeGreaterThan(0.6)
    }
  })

  it('breaks a page where the document asks for it, and never makes an empty one', async () => {
    const paragraph = (text: string) => ({ kind: 'paragraph' as const, text })
    const bytes = await drawDocument(
      historyLike(0, {
        blocks: [
          { kind: 'page-break' },
          paragraph('first'),
          { kind: 'page-break' },
          { kind: 'page-break' },
          paragraph('second'),
          { kind: 'page-break' },
        ],
      }),
    )
    expect(pageCount(bytes)).toBe(2)
    expect(textOf(bytes, 1)).toContain('first')
    expect(textOf(bytes, 2)).toContain('second')
  })

  it('keeps a heading with what follows, and a group on one page', async () => {
    for (let rows = 30; rows < 44; rows++) {
      const filler = Array.from({ length: rows }, (_, i) => ({
        kind: 'paragraph' as const,
        text: `line ${i}`,
      }))
      const bytes = await drawDocument(
        historyLike(0, {
          blocks: [
            ...filler,
            { kind: 'heading', text: 'Kept heading' },
            {
              kind: 'table',
              columns: [{ head: 'Column', share: 1 }],
              rows: [['First row'], ['Second row']],
              emptyText: '',
            },
            {
              kind: 'group',
              blocks: [
                { kind: 'paragraph', text: 'group begin' },
                { kind: 'paragraph', text: 'group end' },
              ],
            },
          ],
        }),
      )
      const pages = pageTexts(bytes)
      const pageOf = (text: string) => pages.findIndex((page) => page.includes(text))
      expect(pageOf('First row'), `${rows} lines`).toBe(pageOf('Kept heading'))
      expect(pageOf('group end')).toBe(pageOf('group begin'))
    }
  })

  it('lets a working that no page could hold go on from page to page, its heading with its first line', async () => {
    const lines = Array.from({ length: 120 }, (_, i) => ({
      what: `Step ${String(i + 1)}.`,
      formula: '1 + 1',
      result: String(i),
    }))
    const bytes = await drawDocument(
      historyLike(0, {
        blocks: [
          { kind: 'heading', text: 'Kept heading' },
          { kind: 'working', lines },
        ],
      }),
    )
    const pages = pageTexts(bytes)
    expect(pages.length).toBeLessThanOrEqual(5)
    const pageOf = (text: string) => pages.findIndex((page) => page.includes(text))
    expect(pageOf('Step 1.')).toBe(pageOf('Kept heading'))
    expect([...textOf(bytes).matchAll(/^Step (\d+)\./gm)].map((match) => Number(match[1]))).toEqual(
      lines.map((_, i) => i + 1),
    )
  })

  it('prints boxes for the pen at least 21 pt (28 px) high, with their unit in them', async () => {
    const bytes = await drawDocument(
      historyLike(0, {
        blocks: [
          {
            kind: 'pen',
            fields: [
              { label: 'Weighed', unit: 'g' },
              { label: 'Time, by', share: 2 },
            ],
          },
        ],
      }),
    )
    const words = wordsOf(bytes)
    const label = words.find(({ text }) => text === 'Weighed')
    const unit = words.find(({ text }) => text === 'g')
    if (!label || !unit) throw new Error('label or unit missing')
    const grey = greyOf(bytes)
    const dark = Array.from({ length: 240 }, (_, i) => label.bottom - 2 + i / 4).filter(
      (y) => grey.at(label.left + 40, y) < 100,
    )
    const [top, bottom] = [Math.min(...dark), Math.max(...dark)]
    expect(bottom - top).toBeGreaterThanOrEqual(21)
    expect(unit.top).toBeGreaterThan(top)
    expect(unit.bottom).toBeLessThan(bottom + 1)
  })

  it.each<[FlagLetter, string]>([
    ['Q', 'In quarantine, Q-115'],
    ['L', 'Held'],
    ['C', 'Cleared 3 Jun 2024'],
    ['N', 'Not cleared'],
  ])('draws flag %s beside its words, with a dark outline all round', async (flag, text) => {
    const bytes = await drawDocument(historyLike(0, { blocks: [{ kind: 'flag-line', flag, text }] }))
    expect(textOf(bytes)).toContain(text)
    const first = wordsOf(bytes).find((word) => word.text === text.split(' ')[0] && word.left < 80)
    if (!first) throw new Error('the words are not on the page')
    const grey = greyOf(bytes)
    const middle = (first.top + first.bottom) / 2
    const left = Array.from({ length: 40 }, (_, i) => grey.at(first.left - 20 + i / 4, middle - 3))
    expect(Math.min(...left)).toBeLessThan(90)
  })

  it('draws a square code large enough to be read, with a quiet edge', async () => {
    const bytes = await drawDocument(
      historyLike(0, {
        blocks: [{ kind: 'qr', text: 'https://pratique.example/e/QT-3', sideMm: 40, caption: 'Tank QT-3' }],
      }),
    )
    const caption = wordsOf(bytes).find(({ text }) => text === 'Tank')
    if (!caption) throw new Error('the caption is not on the page')
    const side = (40 / 25.4) * 72
    const bottom = caption.top - 3
    const share = greyOf(bytes).darkShare(caption.left, bottom - side, caption.left + side, bottom)
    expect(share).toBeGreaterThan(0.2)
    expect(share).toBeLessThan(0.6)
  })

  it.each(['pseudo', 'pseudo-rtl'] as const)('survives longer words in the %s locale', async (locale) => {
    setMessageLocale(locale)
    const bytes = await drawDocument(orderLike())
    const text = textOf(bytes)
    expect(text).toContain('[Páágé 1 of')
    expect(text).toContain('[WÁRNÍNG')
    expect(text).toContain('[Rééçórd çhééçk 7C1E 40AF 92D3 0B15')
  })
})
