import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import { documentWords } from '../../../shared/messages/documents.ts'
import type { Strip } from './page-head.ts'
import type { PageGeometry } from './page-geometry.ts'
import { textBox } from './text-box.ts'
import { colour, padding, px, type } from './type-scale.ts'
import type { Typeface } from './typeface.ts'

/** The foot of every page: record check, who printed and when, page n of m. */
export function pageFoot(
  model: PdfDocumentModel,
  face: Typeface,
  geometry: PageGeometry,
): { height: number; on(page: number, pages: number): Strip } {
  const width = geometry.textWidth
  const options = { size: type.footer, tone: 'second' as const, block: 'page foot' }
  const check = model.recordCheck
    ? textBox(face, documentWords.recordCheck({ fingerprint: model.recordCheck }), width * 0.34, options)
    : undefined
  const printed = [
    documentWords.printed({ at: model.printed.at, by: model.printed.by }),
    model.printed.note ?? '',
  ]
    .filter((part) => part !== '')
    .join(' ')
  const page = (number: number, pages: number) =>
    textBox(face, documentWords.page({ page: number, pages }), width * 0.2, { ...options, tone: 'ink' })
  // Measured as if for 99 pages, so that the height does not depend on the paging; the gap takes a third digit.
  const widest = page(88, 88)
  const middleLeft = check ? check.width + px(20) : 0
  const middle = textBox(face, printed, width - middleLeft - widest.width - px(20), options)
  const height = Math.max(middle.height, check?.height ?? 0, widest.height) + px(12)
  return {
    height,
    on: (number, pages) => ({
      height,
      draw: (canvas, x, top) => {
        canvas.rule(x, top, x + geometry.inner.width, top, { weight: px(0.75), colour: colour.hair })
        const left = x + padding
        if (check) canvas.text(check, left, top + px(6))
        canvas.text(middle, left + middleLeft, top + px(6))
        canvas.text(page(number, pages), left + width, top + px(6), 'right')
      },
    }),
  }
}
