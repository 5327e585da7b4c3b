import type {
  SignatureEntry,
  SignaturesBlock,
  Span,
} from '../../../../shared/domain/documents/pdf-document-model.ts'
import { rowPiece, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'

const side = px(12)
/** Between the two lines of the double edge. */
const outline = px(3)

/** Signatures two by two inside a double ink edge, the sign of what may be signed. */
export function measureSignatures(block: SignaturesBlock, measure: Measure): Piece[] {
  const pieces: Piece[] = []
  for (let i = 0; i < block.entries.length; i += 2) {
    const row = block.entries.slice(i, i + 2)
    const width = measure.width / row.length
    const name = `signature "${row[0]?.name ?? ''}"`
    const broken = row.map((entry) => entry.check === 'broken')
    pieces.push(
      rowPiece(
        row.map((entry, column) => ({
          box: textBox(measure.face, signatureText(entry), width - 2 * side, {
            size: type.label,
            block: name,
          }),
          x: column * width + side,
        })),
        {
          block: name,
          before: i === 0 ? px(9) : px(3),
          padTop: outline + px(7),
          padBottom: outline + px(8),
          ground: (canvas, x, top, height) => {
            const inner = [top + outline, height - 2 * outline] as const
            canvas.box(x, inner[0], measure.width, inner[1], { stroke: { weight: px(1) } })
            canvas.box(x - outline, top, measure.width + 2 * outline, height, { stroke: { weight: px(1) } })
            if (row.length === 2)
              canvas.rule(x + width, inner[0], x + width, inner[0] + inner[1], { weight: px(1) })
            broken.forEach((isBroken, column) => {
              if (isBroken)
                canvas.box(x + column * width + px(3), inner[0] + px(3), width - px(6), inner[1] - px(6), {
                  stroke: { weight: px(3), colour: colour.magenta },
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

function signatureText(entry: SignatureEntry): Span[] {
  const licence = [entry.licence, entry.jurisdiction].filter((part) => part !== undefined).join(', ')
  return [
    { text: entry.name, bold: true },
    { text: `, ${entry.role}` },
    ...(licence ? [{ text: `\n${licence}` }] : []),
    ...(entry.registration === undefined ? [] : [{ text: `\n${entry.registration}` }]),
    { text: `\n${entry.meaning}, ${entry.signedAt}\n` },
    {
      text: entry.checkWords,
      bold: entry.check === 'broken',
      ...(entry.check === 'intact' ? { tone: 'second' as const } : {}),
    },
  ]
}
