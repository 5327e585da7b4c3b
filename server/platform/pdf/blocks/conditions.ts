import type { ConditionsBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { rowPiece, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'
import { beginning } from './paragraph.ts'

const ringRoom = px(22)

/** Conditions with an open ring each, in one or two columns, hairlines between. */
export function measureConditions(block: ConditionsBlock, measure: Measure): Piece[] {
  const columns = block.columns ?? 1
  const gutter = px(26)
  const width = (measure.width - gutter * (columns - 1)) / columns
  const boxes = block.items.map((item) =>
    textBox(measure.face, item, width - ringRoom, {
      size: type.body,
      block: `condition "${beginning(item)}"`,
    }),
  )
  const pieces: Piece[] = []
  for (let i = 0; i < boxes.length; i += columns) {
    const row = boxes.slice(i, i + columns)
    pieces.push(
      rowPiece(
        row.map((box, column) => ({ box, x: column * (width + gutter) + ringRoom })),
        {
          block: `condition "${beginning(block.items[i] ?? '')}"`,
          before: i === 0 ? px(2) : 0,
          padTop: px(3),
          padBottom: px(3),
          ground: (canvas, x, top, height, first) => {
            if (i === 0 && first) canvas.rule(x, top, x + measure.width, top, { weight: px(1) })
            row.forEach((box, column) => {
              const left = x + column * (width + gutter)
              canvas.rule(left, top + height, left + width, top + height, {
                weight: px(0.6),
                colour: colour.hair,
              })
              if (first)
                canvas.circle(left + px(8), top + px(3) + box.leading / 2, px(5), {
                  stroke: { weight: px(1.5) },
                })
            })
          },
        },
        measure.pageRoom,
      ),
    )
  }
  return pieces
}
