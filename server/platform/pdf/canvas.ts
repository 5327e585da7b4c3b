import * as pdf from 'pdf-lib'
import type { TextLine } from './break-lines.ts'
import type { EmbeddedFont } from './embedded-font.ts'
import type { TextBox } from './text-box.ts'
import { colour, type Colour } from './type-scale.ts'
import { boldOutline, boldTracking, type Typeface } from './typeface.ts'

export interface Stroke {
  weight: number
  colour?: Colour
  dash?: readonly number[]
}

/** Slant of the face for scientific names, as a browser slants it: 12 degrees. */
const slant = Math.tan((12 * Math.PI) / 180)

/** One page, drawn on in points from the top left corner downward. */
export class Canvas {
  readonly #page: pdf.PDFPage
  readonly #height: number
  readonly #face: Typeface
  readonly #font: EmbeddedFont
  readonly #fontKey: pdf.PDFName

  constructor(page: pdf.PDFPage, face: Typeface, font: EmbeddedFont) {
    this.#page = page
    this.#height = page.getHeight()
    this.#face = face
    this.#font = font
    this.#fontKey = page.node.newFontDictionary('F', font.font.ref)
  }

  /** Draws a measured box with its first line's top at `top`; `x` is the left edge, or the right one when aligned so. */
  text(box: TextBox, x: number, top: number, align: 'left' | 'right' = 'left'): void {
    const content = (this.#face.ascent + this.#face.descent) * box.size
    let baseline = top + (box.leading - content) / 2 + this.#face.ascent * box.size
    for (const line of box.lines) {
      this.line(line, align === 'left' ? x : x - line.width, baseline, box.size)
      baseline += box.leading
    }
  }

  /** Draws one line on a baseline. */
  line(line: TextLine, x: number, baseline: number, size: number): void {
    for (const fragment of line.fragments) {
      const fill =
        fragment.tone === 'ink' ? colour.ink : fragment.tone === 'paper' ? colour.paper : colour.second
      this.#page.pushOperators(
        pdf.pushGraphicsState(),
        ...(fragment.bold ? [pdf.setLineWidth(size * boldOutline), strokeColour(fill)] : []),
        fillColour(fill),
        pdf.beginText(),
        pdf.setFontAndSize(this.#fontKey.asString().slice(1), size),
        pdf.setCharacterSpacing(fragment.bold ? size * boldTracking : 0),
        pdf.setTextRenderingMode(
          fragment.bold ? pdf.TextRenderingMode.FillAndOutline : pdf.TextRenderingMode.Fill,
        ),
        pdf.setTextMatrix(1, 0, fragment.italic ? slant : 0, 1, x + fragment.x, this.#height - baseline),
        pdf.showText(pdf.PDFHexString.of(this.#font.encode(fragment.text))),
        pdf.endText(),
        pdf.popGraphicsState(),
      )
    }
  }

  rule(x1: number, y1: number, x2: number, y2: number, stroke: Stroke): void {
    this.path(
      [
        [x1, y1],
        [x2, y2],
      ],
      { stroke },
    )
  }

  box(x: number, top: number, width: number, height: number, look: { stroke?: Stroke; fill?: Colour }): void {
    this.#shape(look, [pdf.rectangle(x, this.#height - top - height, width, height)])
  }

  /** Straight lines from point to point. */
  path(points: readonly (readonly [number, number])[], look: { stroke?: Stroke; fill?: Colour }): void {
    this.#shape(
      look,
      points.map(([x, y], i) =>
        i === 0 ? pdf.moveTo(x, this.#height - y) : pdf.lineTo(x, this.#height - y),
      ),
    )
  }

  circle(x: number, y: number, radius: number, look: { stroke?: Stroke; fill?: Colour }): void {
    this.#shape(look, arcs(x, this.#height - y, radius, 0, 4))
  }

  /** Part of a circle, counter-clockwise from `startDegrees` (0 = to the right). */
  arc(
    x: number,
    y: number,
    radius: number,
    startDegrees: number,
    sweepDegrees: number,
    stroke: Stroke,
  ): void {
    this.#shape({ stroke }, arcs(x, this.#height - y, radius, startDegrees / 90, sweepDegrees / 90))
  }

  /** Slanted lines across a rectangle: `pitch` apart, drawn as vectors so that a printer cannot leave them out. */
  hatch(x: number, top: number, width: number, height: number, pitch: number, stroke: Stroke): void {
    const bottom = this.#height - top - height
    const step = pitch * Math.SQRT2
    const lines: pdf.PDFOperator[] = []
    for (let along = step / 2; along < width + height; along += step)
      lines.push(pdf.moveTo(x + along - height, bottom), pdf.lineTo(x + along, bottom + height))
    this.#page.pushOperators(
      pdf.pushGraphicsState(),
      pdf.rectangle(x, bottom, width, height),
      pdf.clip(),
      pdf.endPath(),
      ...strokeOperators(stroke),
      ...lines,
      pdf.stroke(),
      pdf.popGraphicsState(),
    )
  }

  #shape(look: { stroke?: Stroke; fill?: Colour }, operators: pdf.PDFOperator[]): void {
    const paint =
      look.fill && look.stroke
        ? pdf.fillAndStroke()
        : look.fill
          ? pdf.fill()
          : look.stroke
            ? pdf.stroke()
            : null
    if (!paint) return
    this.#page.pushOperators(
      pdf.pushGraphicsState(),
      ...(look.fill ? [fillColour(look.fill)] : []),
      ...(look.stroke ? strokeOperators(look.stroke) : []),
      ...operators,
      paint,
      pdf.popGraphicsState(),
    )
  }
}

function strokeOperators(stroke: Stroke): pdf.PDFOperator[] {
  return [
    pdf.setLineWidth(stroke.weight),
    strokeColour(stroke.colour ?? colour.ink),
    ...(stroke.dash ? [pdf.setDashPattern([...stroke.dash], 0)] : []),
  ]
}

/** Greys are written as grey, so that black text uses black ink only. */
function fillColour([red, green, blue]: Colour): pdf.PDFOperator {
  return red === green && green === blue
    ? pdf.setFillingGrayscaleColor(red)
    : pdf.setFillingRgbColor(red, green, blue)
}

function strokeColour([red, green, blue]: Colour): pdf.PDFOperator {
  return red === green && green === blue
    ? pdf.setStrokingGrayscaleColor(red)
    : pdf.setStrokingRgbColor(red, green, blue)
}

/** Bézier curves for `quarters` quarter circles from angle `start` (in quarters), y upward. */
function arcs(x: number, y: number, radius: number, start: number, quarters: number): pdf.PDFOperator[] {
  const pieces = Math.ceil(quarters)
  const step = ((quarters / pieces) * Math.PI) / 2
  const reach = (4 / 3) * Math.tan(step / 4) * radius
  const at = (angle: number): [number, number] => [x + radius * Math.cos(angle), y + radius * Math.sin(angle)]
  let angle = (start * Math.PI) / 2
  const operators = [pdf.moveTo(...at(angle))]
  for (let i = 0; i < pieces; i++) {
    const [x1, y1] = at(angle)
    const [x2, y2] = at(angle + step)
    operators.push(
      pdf.appendBezierCurve(
        x1 - reach * Math.sin(angle),
        y1 + reach * Math.cos(angle),
        x2 + reach * Math.sin(angle + step),
        y2 - reach * Math.cos(angle + step),
        x2,
        y2,
      ),
    )
    angle += step
  }
  return operators
}
