import type { ParagraphBlock, RichText } from '../../../../shared/domain/documents/pdf-document-model.ts'
import type { Measure, Piece } from '../piece.ts'
import { splitBox, textBox, type TextBox } from '../text-box.ts'
import { px, type } from '../type-scale.ts'

/** Running text; over a page's end at least two lines stay on each side. */
export function measureParagraph(block: ParagraphBlock, measure: Measure): Piece[] {
  const name = `paragraph "${beginning(block.text)}"`
  const size = block.size === 'small' ? type.label : type.body
  const tone = block.size === 'small' ? ('second' as const) : ('ink' as const)
  return [
    paragraphPiece(
      textBox(measure.face, block.text, measure.width, { size, tone, block: name }),
      name,
      px(4),
    ),
  ]
}

function paragraphPiece(box: TextBox, name: string, before: number): Piece {
  return {
    height: box.height,
    before,
    block: name,
    draw: (canvas, x, top) => canvas.text(box, x, top),
    split: (room) => {
      const fitting = Math.min(Math.floor(room / box.leading), box.lines.length - 2)
      if (fitting < 2) return undefined
      const [head, rest] = splitBox(box, fitting)
      return [paragraphPiece(head, name, before), paragraphPiece(rest, name, 0)]
    },
  }
}

/** The first words of a text, to name a block in an error. */
export function beginning(text: RichText): string {
  const plain = typeof text === 'string' ? text : text.map((span) => span.text).join('')
  return plain.length <= 40 ? plain : `${plain.slice(0, 40)}…`
}
