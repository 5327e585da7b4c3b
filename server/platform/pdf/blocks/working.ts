import type { WorkingBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { leastWidths } from '../break-lines.ts'
import { rowPiece, type Measure, type Piece, type PlacedBox } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'

const gap = px(8)

/** The working: what, formula, result at the right; hairlines between, the last line bold between ink rules. */
export function measureWorking(block: WorkingBlock, measure: Measure): Piece[] {
  const { face, width } = measure
  const options = (i: number) => ({
    size: type.body,
    bold: block.lines[i]?.total ?? false,
    block: `working "${block.lines[i]?.what ?? ''}"`,
  })
  const widest = (share: number, texts: string[]): number =>
    Math.min(width * share, Math.max(0, ...texts.map((text, i) => leastWidths(face, text, options(i)).line)))
  const resultWidth =
    widest(
      0.5,
      block.lines.map((line) => line.result),
    ) + 0.1
  const whatWidth = Math.max(
    px(66),
    widest(
      0.36,
      block.lines.map((line) => line.what),
    ),
  )
  const formulaWidth = width - resultWidth - whatWidth - 2 * gap
  return block.lines.map((line, i) => {
    const formula = textBox(face, line.formula, formulaWidth, {
      ...options(i),
      tone: line.total ? 'ink' : 'second',
    })
    const boxes: PlacedBox[] = [
      { box: textBox(face, line.what, whatWidth, options(i)), x: 0 },
      { box: formula, x: whatWidth + gap },
      { box: textBox(face, line.result, resultWidth, options(i)), x: width, align: 'right' },
    ]
    if (line.note !== undefined)
      boxes.push({
        box: textBox(face, line.note, formulaWidth, {
          ...options(i),
          bold: false,
          size: type.label,
          tone: 'second',
        }),
        x: whatWidth + gap,
        down: formula.height,
      })
    const ink = line.total || i === 0
    return rowPiece(
      boxes,
      {
        block: options(i).block,
        before: i === 0 ? px(2) : 0,
        padTop: px(2),
        padBottom: px(2),
        keepWithNext: i < block.lines.length - 1,
        ground: (canvas, x, top, height, first) => {
          if (first)
            canvas.rule(x, top, x + width, top, {
              weight: ink ? px(1) : px(0.6),
              colour: ink ? colour.ink : colour.hair,
            })
          if (i === block.lines.length - 1)
            canvas.rule(x, top + height, x + width, top + height, { weight: px(1) })
        },
      },
      measure.pageRoom,
    )
  })
}
