import type { GridBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { rowPiece, type Measure, type Piece, type PlacedBox } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { px, type } from '../type-scale.ts'

/** Pairs of label and value; the label column is as wide as its widest label, at most two fifths. */
export function measureGrid(block: GridBlock, measure: Measure): Piece[] {
  const columns = block.columns ?? 1
  const gutter = px(26)
  const width = (measure.width - gutter * (columns - 1)) / columns
  const labels = block.entries.map((entry) =>
    textBox(measure.face, entry.label, width * 0.4, {
      size: type.body,
      tone: 'second',
      block: `grid "${entry.label}"`,
    }),
  )
  const labelWidth = Math.max(0, ...labels.map((label) => label.width)) + px(14)
  const pairs = block.entries.map((entry, i): PlacedBox[] => {
    const label = labels[i]
    const value = textBox(measure.face, entry.value, width - labelWidth, {
      size: type.body,
      block: `grid "${entry.label}"`,
    })
    const left = (i % columns) * (width + gutter)
    return [...(label ? [{ box: label, x: left }] : []), { box: value, x: left + labelWidth }]
  })
  const pieces: Piece[] = []
  for (let i = 0; i < pairs.length; i += columns)
    pieces.push(
      rowPiece(
        pairs.slice(i, i + columns).flat(),
        { block: `grid "${block.entries[i]?.label ?? ''}"`, before: i === 0 ? px(4) : px(3) },
        measure.pageRoom,
      ),
    )
  return pieces
}
