import type { AmountBlock, RichText } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { leastWidths } from '../break-lines.ts'
import { together, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { px, type } from '../type-scale.ts'
import { beginning } from './paragraph.ts'

/** Between number and unit: wide enough to be read as a space when the text is taken out of the file. */
const gap = px(12)

/** The dose in the largest type, made smaller only when the number would not fit its column. */
export function measureAmount(block: AmountBlock, measure: Measure): Piece[] {
  const name = `amount "${block.value} ${block.unit}"`
  const { face, width } = measure
  const natural =
    leastWidths(face, block.value, { size: type.dose, bold: true, block: name }).line +
    leastWidths(face, block.unit, { size: type.doseUnit, block: name }).line +
    gap
  const scale = Math.min(1, width / (natural + px(1)))
  const value = textBox(face, block.value, width, {
    size: type.dose * scale,
    bold: true,
    leading: px(60) * scale,
    block: name,
  })
  const unit = textBox(face, block.unit, width, { size: type.doseUnit * scale, block: name })
  const large: Piece = {
    height: value.height + px(2),
    before: 0,
    block: name,
    draw: (canvas, x, top) => {
      canvas.text(value, x, top)
      // Both stand on one baseline: unit size and value size differ by their descents.
      const content = face.ascent + face.descent
      const baseline = top + (value.leading - content * value.size) / 2 + face.ascent * value.size
      const [line] = unit.lines
      if (line) canvas.line(line, x + value.width + gap * scale, baseline, unit.size)
    },
  }
  const plain = (text: RichText, size: number, before: number): Piece => {
    const box = textBox(face, text, width, { size, block: `${name}, "${beginning(text)}"` })
    return { height: box.height, before, block: name, draw: (canvas, x, top) => canvas.text(box, x, top) }
  }
  const limits = block.limits === undefined ? undefined : plain(block.limits, type.body, px(5))
  const whole = together([
    ...(block.above === undefined ? [] : [plain(block.above, type.label, 0)]),
    large,
    ...block.lines.map((line) => plain(line, type.body, 0)),
    ...(limits
      ? [
          {
            ...limits,
            height: limits.height + px(5),
            draw: (...[canvas, x, top]: Parameters<Piece['draw']>) => {
              canvas.rule(x, top, x + width, top, { weight: px(0.75), colour: [0.6, 0.6, 0.6] })
              limits.draw(canvas, x, top + px(5))
            },
          },
        ]
      : []),
  ])
  return [{ ...whole, before: px(5) }]
}
