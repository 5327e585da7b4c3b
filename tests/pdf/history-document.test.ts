import { beforeAll, describe, expect, it } from 'vitest'
import type { DocumentBlock, PdfDocumentModel } from '../../shared/domain/documents/pdf-document-model.ts'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { historyLike } from './examples/history-like.ts'
import { infoOf, nfkc, pageCount, pageTexts, textOf } from './support/poppler.ts'

let bytes: Uint8Array
let pages: number
let texts: string[]
beforeAll(async () => {
  bytes = await drawDocument(historyLike(400))
  pages = pageCount(bytes)
  texts = pageTexts(bytes)
})

describe('a history of many pages', () => {
  it('has Letter pages enough for a table of ten and more', () => {
    expect(pages).toBeGreaterThanOrEqual(10)
    expect(infoOf(bytes)['Page size']).toBe('612 x 792 pts (letter)')
  })

  it('says on every page what it is, whose, its record check, who printed it and when, and page n of m', () => {
    for (let page = 1; page <= pages; page++) {
      const text = texts[page - 1]
      for (const part of [
        'Harrow Point Sea Hall',
        'Acquisition history',
        'HP-0388',
        page === 1 ? 'Diamondback\nterrapin' : 'Diamondback terrapin',
        'Record check A04C 77E2 19BD 5F30',
        'Printed 14 May 2026, 14:20, UTC−4, by J. Pell.',
        `Page ${page} of ${pages}`,
      ])
        expect(text, `page ${page}`).toContain(part)
    }
  })

  it('repeats the head of the table on every page the table goes on', () => {
    expect(texts).toHaveLength(pages)
    for (const [i, text] of texts.entries())
      expect(text.split('No. Date What happened Change Count').length - 1, `page ${i + 1}`).toBe(1)
  })

  it('prints every row once and in order, and keeps the sum with the last row', () => {
    const text = textOf(bytes)
    const rows = [...text.matchAll(/^(\d+) 2026-\d\d-11 (?:Counted|Entry)/gm)].map((match) =>
      Number(match[1]),
    )
    expect(rows).toEqual(Array.from({ length: 400 }, (_, i) => i + 1))
    const last = textOf(bytes, pages)
    expect(last).toMatch(
      /400 2026-04-11 Counted by Zoé Ångström-Łukasiewicz, lagoon side \+ 2 201\nSum of the ledger \+ 2 201/,
    )
  })

  it('extracts letters beyond English and signs exactly', () => {
    const text = nfkc(textOf(bytes))
    expect(text).toContain('Counted by Zoé Ångström-Łukasiewicz, lagoon side + 2')
    expect(text).toContain('23.4 °C ± 0.2 °C')
    expect(text).toContain('Malaclemys terrapin, female')
  })

  it('reads the course event by event: date, what, papers', () => {
    const text = textOf(bytes, 1)
    const order = [
      '14 Mar 2026',
      'Received at Harrow Point Sea Hall',
      '2 Nov 2023',
      'Transferred to',
      '9 Aug 2019',
      'Hatched at',
    ]
    const course = text.slice(text.indexOf('4 entries'))
    const places = order.map((part) => course.indexOf(part))
    expect(places).toEqual([...places].sort((a, b) => a - b))
    expect(Math.min(...places)).toBeGreaterThan(0)
  })

  it('says what a drawing shows in words', () => {
    expect(textOf(bytes).replaceAll('\n', ' ')).toContain(
      'Restarted on 25 April because a fourth ray entered the same water.',
    )
  })
})

describe('an empty history', () => {
  it('says that there is nothing, under the table’s head', async () => {
    const empty = historyLike(0)
    const text = textOf(await drawDocument(empty))
    expect(text).toContain('No. Date What happened Change Count\nNo entries in this period.')
  })

  it('draws a document without any block', async () => {
    const nothing = await drawDocument(historyLike(0, { blocks: [] }))
    expect(pageCount(nothing)).toBe(1)
    expect(textOf(nothing)).toContain('Page 1 of 1')
  })
})

describe('texts of any length', () => {
  const draw = (blocks: DocumentBlock[], changes: Partial<PdfDocumentModel> = {}) =>
    drawDocument(historyLike(0, { blocks, ...changes }))
  const flat = (text: string) => text.replace(/\s/g, '')

  it('wraps extremely long names everywhere and shows the whole of each', async () => {
    const name = 'Wolfeschlegelsteinhausenbergerdorff-Ångström de la Fuente y Łukasiewicz '.repeat(4).trim()
    const long = 'x'.repeat(300)
    const bytes = await draw(
      [
        { kind: 'heading', text: name, aside: long },
        {
          kind: 'grid',
          columns: 2,
          entries: [
            { label: name, value: long },
            { label: 'a', value: name },
          ],
        },
        {
          kind: 'table',
          columns: [
            { head: name, share: 1 },
            { head: 'n', share: 1, align: 'right' },
            { head: long, share: 1 },
          ],
          rows: [[long, '1,234.5 mg/L', name]],
          emptyText: '',
        },
        { kind: 'caution', level: 'stop', title: name, lines: [long] },
        { kind: 'conditions', columns: 2, items: [name, long] },
        { kind: 'working', lines: [{ what: name, formula: long, result: '0.44 g' }] },
        {
          kind: 'signatures',
          entries: [{ name, role: long, meaning: name, signedAt: long, check: 'broken', checkWords: name }],
        },
        {
          kind: 'course',
          emptyText: '',
          stops: [{ when: '1 May 2026', title: name, text: long, aside: name, state: 'made' }],
        },
      ],
      {
        signers: [name, long],
        head: { facility: name, name: long, subject: { name, flag: 'L', lines: [long] } },
      },
    )
    const text = flat(textOf(bytes))
    // Columns side by side are drawn one cell after another, so every text is whole in the drawn order; the 17th
    // counts the page heads, whose names stand once on each page.
    expect(text.split(flat(name)).length - 1).toBeGreaterThanOrEqual(12)
    expect(text.split(long).length - 1).toBeGreaterThanOrEqual(9)
    expect(text).toContain('1,234.5mg/L')
    expect(text).toContain('0.44g')
  })

  it('goes on over pages with one paragraph, one caution or one cell of any length', async () => {
    const words = (mark: string) => Array.from({ length: 4000 }, (_, i) => `${mark}${i}`).join(' ')
    const bytes = await draw([
      { kind: 'paragraph', text: words('p') },
      { kind: 'caution', level: 'warning', title: 'Long', lines: [words('c')] },
      {
        kind: 'table',
        columns: [
          { head: 'A', share: 1 },
          { head: 'B', share: 1 },
        ],
        rows: [[words('t'), 'short']],
        emptyText: '',
      },
      {
        kind: 'columns',
        columns: [
          { share: 1, blocks: [{ kind: 'paragraph', text: words('l') }] },
          { share: 1, blocks: [] },
        ],
      },
      {
        kind: 'group',
        blocks: [
          { kind: 'heading', text: 'Kept' },
          { kind: 'paragraph', text: words('g') },
        ],
      },
    ])
    const text = ` ${textOf(bytes).replace(/\s+/g, ' ')} `
    for (const mark of 'pctlg')
      for (const i of [0, 1, 777, 2500, 3999]) expect(text).toContain(` ${mark}${i} `)
  })

  it('refuses a table in which not even the numbers fit, and names it', async () => {
    const columns = Array.from({ length: 12 }, (_, i) => ({ head: `c${i}`, share: 1 }))
    await expect(
      draw([{ kind: 'table', columns, rows: [columns.map(() => '123,456,789.25 mg/L')], emptyText: '' }]),
    ).rejects.toMatchObject({ code: 'does-not-fit', params: { block: expect.stringContaining('c0 | c1') } })
  })

  it('makes the type of a wide table smaller before it refuses', async () => {
    const columns = Array.from({ length: 9 }, (_, i) => ({ head: `c${i}`, share: 1 }))
    const text = textOf(
      await draw([{ kind: 'table', columns, rows: [columns.map(() => '12,345.5 L')], emptyText: '' }]),
    )
    expect(text.split('12,345.5 L').length - 1).toBe(9)
  })

  it('refuses a row that has not as many cells as there are columns', async () => {
    await expect(
      draw([{ kind: 'table', columns: [{ head: 'A', share: 1 }], rows: [['1', '2']], emptyText: '' }]),
    ).rejects.toMatchObject({ code: 'bad-model' })
  })
})
