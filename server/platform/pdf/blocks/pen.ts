import type { PenBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import type { Measure, Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { px, type } from '../type-scale.ts'
import { penHeight } from './table.ts'

const gap = px(10)

/** Boxes for the pen in one row, label above, unit printed in at the lower right. */
export function measurePen(block: PenBlock, measure: Measure): Piece[] {
  const name = `boxes "${block.fields.map((field) => field.label).join(' | ')}"`
  const shares = block.fields.reduce((sum, field) => sum + (field.share ?? 1), 0)
  const free = measure.width - gap * (block.fields.length - 1)
  let left = 0
  const fields = block.fields.map((field) => {
    const width = (free * (field.share ?? 1)) / shares
    const placed = {
      left,
      width,
      label: textBox(measure.face, field.label, width, { size: type.label, tone: 'second', block: name }),
      unit: textBox(measure.face, field.unit ?? '', width - px(12), {
        size: type.body,
        tone: 'second',
        block: name,
      }),
    }
    left += width + gap
    return placed
  })
  const labelHeight = Math.max(0, ...fields.map((field) => field.label.height))
  return [
    {
      height: labelHeight + px(2) + penHeight,
      before: px(7),
      block: name,
      draw: (canvas, x, top) => {
        for (const field of fields) {
          canvas.text(field.label, x + field.left, top + labelHeight - field.label.height)
          const boxTop = top + labelHeight + px(2)
          canvas.box(x + field.left, boxTop, field.width, penHeight, { stroke: { weight: px(1) } })
          const unitTop = boxTop + penHeight - field.unit.height - px(4)
          canvas.text(field.unit, x + field.left + field.width - px(6), unitTop, 'right')
        }
      },
    },
  ]
}
