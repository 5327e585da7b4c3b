import type {
  DrawingBlock,
  DrawingMark,
  Point,
} from '../../../../shared/domain/documents/pdf-document-model.ts'
import type { Canvas } from '../canvas.ts'
import { drawFlag } from '../flags.ts'
import { together, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'

/** A line drawing scaled to the column, with what it shows in words beneath. */
export function measureDrawing(block: DrawingBlock, measure: Measure): Piece[] {
  const name = `drawing "${block.alt}"`
  const scale = measure.width / block.width
  const marks = block.marks.map((mark) => prepare(mark, scale, measure, name))
  const words = textBox(measure.face, block.alt, measure.width, {
    size: type.label,
    tone: 'second',
    block: name,
  })
  return [
    together([
      {
        height: block.height * scale,
        before: px(6),
        block: name,
        draw: (canvas, x, top) => marks.forEach((draw) => draw(canvas, x, top)),
      },
      {
        height: words.height,
        before: px(3),
        block: name,
        draw: (canvas, x, top) => canvas.text(words, x, top),
      },
    ]),
  ]
}

/** Measures a mark now, so that text with a missing glyph is refused before anything is drawn. */
function prepare(mark: DrawingMark, scale: number, measure: Measure, block: string): Piece['draw'] {
  const placed = (point: Point, x: number, top: number): [number, number] => [
    x + point[0] * scale,
    top + point[1] * scale,
  ]
  const weight = 'weight' in mark && mark.weight !== undefined ? mark.weight * scale : px(1)
  switch (mark.mark) {
    case 'line': {
      const stroke = {
        weight,
        colour: mark.tone === 'hair' ? colour.hair : colour.ink,
        ...(mark.dash ? { dash: mark.dash.map((length) => length * scale) } : {}),
      }
      return (canvas, x, top) => canvas.rule(...placed(mark.from, x, top), ...placed(mark.to, x, top), stroke)
    }
    case 'circle':
      return (canvas, x, top) =>
        canvas.circle(...placed(mark.at, x, top), mark.radius * scale, filledOrOpen(mark.filled, weight))
    case 'box':
      return (canvas, x, top) =>
        canvas.box(
          ...placed(mark.at, x, top),
          mark.width * scale,
          mark.height * scale,
          filledOrOpen(mark.filled, weight),
        )
    case 'cross':
      return (canvas, x, top) => drawCross(canvas, ...placed(mark.at, x, top), mark.arm * scale, weight)
    case 'flag':
      return (canvas, x, top) => drawFlag(canvas, mark.flag, ...placed(mark.at, x, top), mark.side * scale)
    case 'text': {
      const size = mark.size * scale
      const box = textBox(measure.face, mark.text, Infinity, { size, bold: mark.bold ?? false, block })
      const back = mark.anchor === 'middle' ? box.width / 2 : mark.anchor === 'end' ? box.width : 0
      return (canvas, x, top) => {
        const [left, baseline] = placed(mark.at, x, top)
        const [line] = box.lines
        if (line) canvas.line(line, left - back, baseline, size)
      }
    }
  }
}

function filledOrOpen(filled: boolean | undefined, weight: number) {
  return filled ? { fill: colour.ink } : { fill: colour.paper, stroke: { weight } }
}

function drawCross(canvas: Canvas, x: number, y: number, arm: number, weight: number): void {
  canvas.rule(x - arm, y - arm, x + arm, y + arm, { weight })
  canvas.rule(x - arm, y + arm, x + arm, y - arm, { weight })
}
