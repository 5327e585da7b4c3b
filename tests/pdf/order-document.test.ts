import { PDFDocument, PDFName, PDFString } from 'pdf-lib'
import { beforeAll, describe, expect, it } from 'vitest'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { orderLike } from './examples/order-like.ts'
import { greyOf, infoOf, layoutOf, pageCount, textOf, wordsOf, type Word } from './support/poppler.ts'

let bytes: Uint8Array
let words: Word[]
beforeAll(async () => {
  bytes = await drawDocument(orderLike())
  words = wordsOf(bytes)
})

describe('a printed order', () => {
  it('stands on one sheet of A4 with title and language in its properties', async () => {
    expect(pageCount(bytes)).toBe(1)
    expect(infoOf(bytes)).toMatchObject({
      Title: 'Treatment order TO-0734, version 2',
      'Page size': '595.276 x 841.89 pts (A4)',
    })
    const read = await PDFDocument.load(bytes)
    expect(read.catalog.lookup(PDFName.of('Lang'), PDFString).decodeText()).toBe('en')
    expect(read.catalog.getOrCreateViewerPreferences().getDisplayDocTitle()).toBe(true)
  })

  it('gives back every word, number and sign exactly, in reading order', () => {
    const text = textOf(bytes)
    const inOrder = [
      'Harrow Point Sea Hall',
      'Treatment order: bath',
      'TO-0734, version 2. Volumes in litres, copper as free copper.',
      'Signed by Dr Ilse Marrow, 14 May 2026, 14:24:07, UTC−4',
      'QT-3',
      'Zebrasoma flavescens',
      'Step 1 of 3, from 0.00 mg/L read 14 May, 12:40',
      '0.44 g',
      'Copper sulfate pentahydrate, powder, 99 %, lot',
      'Targets step 1: 0.05, step 2: 0.1, step 3: 0.15 mg/L free',
      'Volume, 2 Mar 2026: 2,220 L ± 2 %',
      'Tank 2.40 × 1.20 × 0.68 m 1,958.4 L',
      'Displaced by bucket − 41.0 L',
      'Pipes 0.7854 × 0.057² × 14.2 m + 36.2 L',
      'Net unrounded 2,217.6 L',
      'Copper 2,217.6 L × 0.05 mg/L 110.9 mg',
      'Copper share 63.546 ÷ 249.685 25.45 %',
      'At 99 % 0.4357 g ÷ 0.99 0.44 g',
      'Before each dose, true before the first gram',
      'Oxygen at least 6 mg/L, read within 30 min Free copper read within 2 h',
      'STOP',
      'Elasmobranchs on this water system',
      'Overridden by Dr I. Marrow 14:12, reason: valve tagged and locked; a night’s wait would cost fish.',
      'WARNING',
      'NOTE Gloves, goggles and dust mask. Weigh under the hood.',
      'STOP IF',
      'Step Not before Copper read, time Amount worked out Second calculation Weighed Time, given by',
      '1, to 0.05 14 May 15:00 mg/L g g g',
      '3, to 0.15 16 May 15:00 mg/L g g g',
      'licence VL-20417, valid to 30 Sep 2026, Harrow County',
      'Signed as author of this order, 14 May 2026, 14:24:07,',
      'The text matches what was signed',
      'Decision support for licensed professionals.',
      'Record check 7C1E 40AF 92D3 0B15',
      'Printed 14 May 2026, 14:33, UTC−4, by S. Brandt. A later version may exist.',
      'Page 1 of 1',
    ]
    let from = 0
    for (const part of inOrder) {
      const at = text.indexOf(part, from)
      expect(at, `"${part}" after "${text.slice(Math.max(0, from - 40), from)}"`).toBeGreaterThanOrEqual(0)
      from = at + part.length
    }
  })

  it('keeps working lines readable as lines', () => {
    expect(layoutOf(bytes)).toMatch(
      /Tank +2\.40 × 1\.20 × 0\.68 m +1,958\.4 L +Rise +0\.05 mg\/L less 0\.00 mg\/L +0\.05 mg\/L/,
    )
  })

  it('draws the amount larger than anything else on the sheet', () => {
    const heights = words.map((word) => word.bottom - word.top)
    const amount = words.find((word) => word.text === '0.44')
    expect(amount && amount.bottom - amount.top).toBe(Math.max(...heights))
  })

  it('gives the same bytes for the same model', async () => {
    expect(Buffer.compare(Buffer.from(await drawDocument(orderLike())), Buffer.from(bytes))).toBe(0)
  })
})

describe('a printed order in greyscale', () => {
  it('tells stop, warning and note apart by hatch and edge, without colour', () => {
    const grey = greyOf(bytes)
    const cell = (word: string) => {
      const found = words.find((candidate) => candidate.text === word)
      if (!found) throw new Error(`${word} is not on the page`)
      // The level's cell is 60 pt wide and its word is in the middle of it: measure left of the word, off the edge.
      const centre = (found.left + found.right) / 2
      return {
        left: centre - 30 + 3,
        right: found.left - 5,
        top: found.top,
        bottom: found.bottom,
        middle: (found.top + found.bottom) / 2,
      }
    }
    const share = (word: string) => {
      const { left, right, top, bottom } = cell(word)
      return grey.darkShare(left, top - 1, right, bottom + 1)
    }
    expect(share('NOTE')).toBe(0)
    expect(share('WARNING')).toBeGreaterThan(0.02)
    expect(share('STOP')).toBeGreaterThan(0.15)
    expect(share('STOP')).toBeGreaterThan(1.5 * share('WARNING'))
    const edge = (word: string) => {
      const { left, middle } = cell(word)
      return grey.darkShare(left - 5, middle - 3, left, middle + 3) * 5
    }
    expect(edge('STOP')).toBeGreaterThan(1.9)
    expect(edge('WARNING')).toBeLessThan(1.7)
  })

  it('draws the flag with an outline that is black where its yellow is pale', () => {
    const grey = greyOf(bytes)
    const subject = words.find((word) => word.text === 'QT-3')
    if (!subject) throw new Error('QT-3 is not on the page')
    const row = Array.from({ length: 120 }, (_, i) => grey.at(subject.left - 30 + i / 4, subject.top + 12))
    expect(Math.min(...row)).toBeLessThan(60)
    expect(row.some((value) => value > 150 && value < 230)).toBe(true)
  })
})
