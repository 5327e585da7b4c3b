import type { HeadingBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { rowPiece, type Measure, type Piece, type PlacedBox } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { px, type } from '../type-scale.ts'

/** A heading stays with what follows; its aside stands at the right end, or under it when there is no room. */
export function measureHeading(block: HeadingBlock, measure: Measure): Piece[] {
  const name = `heading "${block.text}"`
  const asideWidth = block.aside === undefined ? 0 : measure.width * 0.4
  const boxes: PlacedBox[] = [
    {
      box: textBox(measure.face, block.text, measure.width - asideWidth, {
        size: type.heading,
        bold: true,
        block: name,
      }),
      x: 0,
    },
  ]
  if (block.aside !== undefined)
    boxes.push({
      box: textBox(measure.face, block.aside, asideWidth - px(8), {
        size: type.label,
        tone: 'second',
        block: name,
      }),
      x: measure.width,
      align: 'right',
      down: px(1.5),
    })
  return [
    rowPiece(boxes, { block: name, before: px(9), padBottom: px(2), keepWithNext: true }, measure.pageRoom),
  ]
}
