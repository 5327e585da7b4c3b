import type { FingerprintBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { rowPiece, type Measure, type Piece, type PlacedBox } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'

/** The whole fingerprint, to be compared group by group. */
export function measureFingerprint(block: FingerprintBlock, measure: Measure): Piece[] {
  const { face, width } = measure
  // Groups may go over to the next line here; only the short form stays on one.
  const groups = block.fingerprint.replaceAll('\u00a0', ' ')
  const label = textBox(face, block.label, width, { size: type.label, tone: 'second', block: 'fingerprint' })
  const digits = textBox(face, groups, width, { size: type.body, bold: true, block: 'fingerprint' })
  const boxes: PlacedBox[] = [
    { box: label, x: 0 },
    { box: digits, x: 0, down: label.height },
  ]
  if (block.lookUp !== undefined)
    boxes.push({
      box: textBox(face, block.lookUp, width, { size: type.label, tone: 'second', block: 'fingerprint' }),
      x: 0,
      down: label.height + digits.height,
    })
  const ground: NonNullable<Parameters<typeof rowPiece>[1]['ground']> = (canvas, x, top) =>
    canvas.rule(x, top, x + width, top, { weight: px(0.6), colour: colour.hair })
  return [rowPiece(boxes, { block: 'fingerprint', before: px(10), padTop: px(5), ground }, measure.pageRoom)]
}
