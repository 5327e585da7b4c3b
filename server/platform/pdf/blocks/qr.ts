import { create } from 'qrcode'
import type { QrBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { together, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'

const pointsPerMm = 72 / 25.4
/** Light modules all round, without which a reader does not find the code. */
const quiet = 4

/** A square code drawn as vector; runs of dark modules are one box, so that no hairlines show between them. */
export function measureQr(block: QrBlock, measure: Measure): Piece[] {
  const { modules } = create(block.text, { errorCorrectionLevel: 'M' })
  const side = Math.min(measure.width, block.sideMm * pointsPerMm)
  const module = side / (modules.size + 2 * quiet)
  const caption = textBox(measure.face, block.caption, measure.width, {
    size: type.label,
    block: `code "${block.text}"`,
  })
  return [
    together([
      {
        height: side,
        before: px(8),
        block: `code "${block.text}"`,
        draw: (canvas, x, top) => {
          for (let row = 0; row < modules.size; row++)
            for (let column = 0; column < modules.size; column++) {
              if (!modules.get(row, column) || (column > 0 && modules.get(row, column - 1))) continue
              let run = 1
              while (column + run < modules.size && modules.get(row, column + run)) run++
              canvas.box(
                x + (column + quiet) * module,
                top + (row + quiet) * module,
                run * module,
                module * 1.02,
                { fill: colour.ink },
              )
            }
        },
      },
      {
        height: caption.height,
        before: px(4),
        block: `code "${block.text}"`,
        draw: (canvas, x, top) => canvas.text(caption, x, top),
      },
    ]),
  ]
}
