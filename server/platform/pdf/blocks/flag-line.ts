import type { FlagLineBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { drawFlag } from '../flags.ts'
import { rowPiece, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { px, type } from '../type-scale.ts'
import { beginning } from './paragraph.ts'

const side = px(13)

/** A flag mark and the words that carry its meaning. */
export function measureFlagLine(block: FlagLineBlock, measure: Measure): Piece[] {
  const name = `flag "${beginning(block.text)}"`
  const box = textBox(measure.face, block.text, measure.width - side - px(7), {
    size: type.body,
    block: name,
  })
  return [
    rowPiece(
      [{ box, x: side + px(7) }],
      {
        block: name,
        before: px(4),
        ground: (canvas, x, top, _height, first) => {
          if (first) drawFlag(canvas, block.flag, x, top + (box.leading - side) / 2, side)
        },
      },
      measure.pageRoom,
    ),
  ]
}
