import type { PdfDocumentModel, RichText } from '../../../shared/domain/documents/pdf-document-model.ts'
import { drawBrandMark } from './brand-mark.ts'
import { leastWidths } from './break-lines.ts'
import type { Canvas } from './canvas.ts'
import { drawFlag } from './flags.ts'
import type { PageGeometry } from './page-geometry.ts'
import { textBox, type TextBox } from './text-box.ts'
import { colour, padding, px, type } from './type-scale.ts'
import type { Typeface } from './typeface.ts'

/** A measured strip across the sheet at its inner edge. */
export interface Strip {
  height: number
  draw(canvas: Canvas, left: number, top: number): void
}

const block = 'page head'

/** "Treatment order: bath, TO-0734, version 2": the same words on every page. */
function reference(model: PdfDocumentModel): string {
  return [model.head.number, model.head.version].filter((part) => part !== undefined).join(', ')
}

/** The title block of the first page: document at the left, whom or what it is about, the mark. */
export function cartouche(model: PdfDocumentModel, face: Typeface, geometry: PageGeometry): Strip {
  const { head, signers } = model
  const width = geometry.inner.width
  const markWidth = px(62)
  const subjectWidth = head.subject ? px(228) : 0
  const flagWidth = head.subject?.flag ? px(30) : 0
  const titleWidth = width - markWidth - subjectWidth - padding - px(14)
  const left = stack([
    textBox(face, head.facility, titleWidth, { size: px(12.5), block }),
    textBox(face, head.name, titleWidth, { size: type.title, bold: true, leading: type.title * 1.18, block }),
    ...[[reference(model), head.source ?? ''].filter((part) => part !== '').join('. '), ...signers]
      .filter((line) => line !== '')
      .map((line) => textBox(face, line, titleWidth, { size: type.label, tone: 'second', block })),
  ])
  const subjectText = subjectWidth - px(26) - flagWidth
  const subject = head.subject
    ? stack([
        nameBox(head.subject.name, subjectText, face),
        ...(head.subject.lines ?? []).map((line: RichText) =>
          textBox(face, line, subjectText, { size: type.body, block }),
        ),
      ])
    : undefined
  const height = Math.max(left.height, subject?.height ?? 0, px(56)) + px(22)
  return {
    height,
    draw: (canvas, x, top) => {
      const line = { weight: px(1) }
      left.draw(canvas, x + padding, top + px(11))
      const markLeft = x + width - markWidth
      if (head.subject && subject) {
        const subjectLeft = markLeft - subjectWidth
        canvas.rule(subjectLeft, top, subjectLeft, top + height, line)
        if (head.subject.flag) drawFlag(canvas, head.subject.flag, subjectLeft + px(14), top + px(13), px(20))
        subject.draw(canvas, subjectLeft + px(14) + flagWidth, top + px(11))
      }
      canvas.rule(markLeft, top, markLeft, top + height, line)
      drawBrandMark(canvas, markLeft + px(13), top + px(13), px(36))
      canvas.rule(x, top + height, x + width, top + height, line)
    },
  }
}

/** The subject's name as large as its longest word allows, so that a name is not torn for the sake of its size. */
function nameBox(name: string, width: number, face: Typeface): TextBox {
  const longestWord = leastWidths(face, name, { size: type.subject, bold: true, block }).whole
  const size = Math.max(type.strong, Math.min(type.subject, (type.subject * width) / (longestWord + 0.1)))
  return textBox(face, name, width, { size, bold: true, leading: size * 1.12, block })
}

/** The head of every page after the first: document, number, version, signers, and the subject at the right. */
export function runningHead(model: PdfDocumentModel, face: Typeface, geometry: PageGeometry): Strip {
  const { head, signers } = model
  const width = geometry.textWidth
  const subjectWidth = head.subject ? width * 0.32 : 0
  const name = [head.name, reference(model)].filter((part) => part !== '').join(', ')
  const left = stack([
    textBox(face, name, width - subjectWidth - px(10), { size: type.body, bold: true, block }),
    ...signers.map((line) =>
      textBox(face, line, width - subjectWidth - px(10), { size: type.label, tone: 'second', block }),
    ),
  ])
  const flagRoom = head.subject?.flag ? px(20) : 0
  const subject = head.subject
    ? textBox(face, head.subject.name, subjectWidth - flagRoom, { size: type.body, bold: true, block })
    : undefined
  const facility = textBox(face, head.facility, Math.max(subjectWidth, width * 0.32), {
    size: type.label,
    tone: 'second',
    block,
  })
  const height = Math.max(left.height, (subject?.height ?? 0) + facility.height) + px(14)
  return {
    height,
    draw: (canvas, x, top) => {
      left.draw(canvas, x + padding, top + px(7))
      const right = x + padding + width
      if (subject) {
        canvas.text(subject, right, top + px(7), 'right')
        if (head.subject?.flag)
          drawFlag(canvas, head.subject.flag, right - subject.width - px(20), top + px(8), px(13))
      }
      canvas.text(facility, right, top + px(7) + (subject?.height ?? 0), 'right')
      canvas.rule(x, top + height, x + geometry.inner.width, top + height, { weight: px(1) })
    },
  }
}

/** A state that no page may hide, white on ink across the sheet, with an edge for printers that save on ink. */
export function noticeStrip(notice: string, face: Typeface, geometry: PageGeometry): Strip {
  const box = textBox(face, notice, geometry.textWidth, {
    size: type.strong,
    bold: true,
    tone: 'paper',
    block: 'notice',
  })
  const height = box.height + px(12)
  return {
    height,
    draw: (canvas, x, top) => {
      canvas.box(x, top, geometry.inner.width, height, { fill: colour.ink })
      canvas.text(box, x + padding, top + px(6))
    },
  }
}

function stack(boxes: readonly TextBox[]): Strip {
  return {
    height: boxes.reduce((height, box) => height + box.height, 0),
    draw: (canvas, left, top) => {
      let y = top
      for (const box of boxes) {
        canvas.text(box, left, y)
        y += box.height
      }
    },
  }
}
