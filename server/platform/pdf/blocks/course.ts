import type { CourseBlock, CourseStop } from '../../../../shared/domain/documents/pdf-document-model.ts'
import type { Canvas } from '../canvas.ts'
import { rowPiece, type Measure, type Piece, type PlacedBox } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'

const fixRoom = px(34)

/** Events along a course drawn downward: date, fix, what happened, papers at the right. */
export function measureCourse(block: CourseBlock, measure: Measure): Piece[] {
  const { face, width } = measure
  if (block.stops.length === 0)
    return [
      rowPiece(
        [
          {
            box: textBox(face, block.emptyText, width, { size: type.body, tone: 'second', block: 'course' }),
            x: 0,
          },
        ],
        { block: 'course', before: px(4) },
        measure.pageRoom,
      ),
    ]
  const name = (stop: CourseStop) => `course "${stop.when}, ${stop.title}"`
  const dates = block.stops.map((stop) =>
    textBox(face, stop.when, width * 0.24, { size: type.body, block: name(stop) }),
  )
  const dateWidth = Math.max(...dates.map((date) => date.width)) + px(6)
  const asideWidth = block.stops.some((stop) => stop.aside !== undefined) ? width * 0.26 : 0
  const textLeft = dateWidth + fixRoom
  const textWidth = width - textLeft - (asideWidth ? asideWidth + px(14) : 0)
  return block.stops.map((stop, i) => {
    const title = textBox(face, stop.title, textWidth, { size: type.body, bold: true, block: name(stop) })
    const boxes: PlacedBox[] = [{ box: title, x: textLeft }]
    const date = dates[i]
    if (date) boxes.unshift({ box: date, x: 0 })
    if (stop.text !== undefined)
      boxes.push({
        box: textBox(face, stop.text, textWidth, { size: type.label, tone: 'second', block: name(stop) }),
        x: textLeft,
        down: title.height,
      })
    if (stop.aside !== undefined)
      boxes.push({
        box: textBox(face, stop.aside, asideWidth, { size: type.label, block: name(stop) }),
        x: width - asideWidth,
      })
    const last = i === block.stops.length - 1
    return rowPiece(
      boxes,
      {
        block: name(stop),
        before: i === 0 ? px(5) : 0,
        padTop: px(3),
        padBottom: px(12),
        ground: (canvas, x, top, height, first) => {
          const centre = top + px(3) + title.leading / 2
          const along = x + dateWidth + px(14)
          if (!last || !first)
            drawCourse(canvas, along, first ? centre : top, last ? centre : top + height, stop.state)
          if (i > 0 && first) drawCourse(canvas, along, top, centre, block.stops[i - 1]?.state ?? 'made')
          if (first) drawFix(canvas, along, centre, stop.state)
        },
      },
      measure.pageRoom,
    )
  })
}

function drawCourse(canvas: Canvas, x: number, from: number, to: number, state: CourseStop['state']): void {
  if (to > from)
    canvas.rule(x, from, x, to, {
      weight: px(1.6),
      ...(state === 'made' ? {} : { dash: [px(4), px(3)] }),
    })
}

function drawFix(canvas: Canvas, x: number, y: number, state: CourseStop['state']): void {
  if (state === 'made') {
    canvas.circle(x, y, px(5.5), { fill: colour.ink })
    canvas.circle(x, y, px(1.7), { fill: colour.paper })
    return
  }
  const dash = state === 'doubtful' ? { dash: [px(3), px(2)] } : {}
  canvas.circle(x, y, px(5), { fill: colour.paper, stroke: { weight: px(1.6), ...dash } })
}
