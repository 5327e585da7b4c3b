import type {
  CautionBlock,
  CautionLevel,
  Span,
} from '../../../../shared/domain/documents/pdf-document-model.ts'
import { documentWords } from '../../../../shared/messages/documents.ts'
import { leastWidths } from '../break-lines.ts'
import type { Canvas } from '../canvas.ts'
import { rowPiece, type Measure, type Piece } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'
import { beginning } from './paragraph.ts'

/** How each level is told apart without colour: by its word, the weight of its edge and the pitch of its hatch. */
const looks = {
  stop: { edge: px(3), hatch: { pitch: px(7), weight: px(1.6) } },
  'stop-if': { edge: px(3), hatch: { pitch: px(7), weight: px(1.6) } },
  warning: { edge: px(1.5), hatch: { pitch: px(11), weight: px(1) } },
  note: { edge: px(1.5), dash: [px(5), px(3)] },
} as const satisfies Record<
  CautionLevel,
  { edge: number; hatch?: { pitch: number; weight: number }; dash?: readonly number[] }
>

function wordOf(level: CautionLevel): string {
  return level === 'stop-if' ? documentWords.stopIf : documentWords[level]
}

/** A caution in its edged block, the word of its level in the left cell. Never divided while a page can hold it. */
export function measureCaution(block: CautionBlock, measure: Measure): Piece[] {
  const look = looks[block.level]
  const name = `caution "${block.title ?? beginning(block.lines[0] ?? '')}"`
  const wordOptions = { size: px(12), bold: true, block: name }
  const wordWidth = leastWidths(measure.face, wordOf(block.level), wordOptions).whole
  const cell = Math.max(px(80), wordWidth + px(24))
  const word = textBox(measure.face, wordOf(block.level), cell - px(12), wordOptions)
  const content = textBox(measure.face, cautionText(block), measure.width - cell - px(22), {
    size: type.body,
    block: name,
  })
  return [
    rowPiece(
      [{ box: content, x: cell + px(11) }],
      {
        block: name,
        before: px(5),
        padTop: px(4.5),
        padBottom: px(5),
        minHeight: word.height + px(10),
        ground: (canvas, x, top, height) => {
          drawEdge(canvas, x, top, measure.width, height, cell, look)
          const wordTop = top + (height - word.height) / 2
          canvas.box(
            x + (cell - word.width) / 2 - px(4),
            wordTop - px(1),
            word.width + px(8),
            word.height + px(2),
            {
              fill: colour.paper,
            },
          )
          canvas.text(word, x + (cell - word.width) / 2, wordTop)
        },
      },
      measure.pageRoom,
    ),
  ]
}

function drawEdge(
  canvas: Canvas,
  x: number,
  top: number,
  width: number,
  height: number,
  cell: number,
  look: (typeof looks)[CautionLevel],
): void {
  const inset = look.edge / 2
  const edge = { weight: look.edge, colour: colour.magenta, ...('dash' in look ? { dash: look.dash } : {}) }
  if ('hatch' in look)
    canvas.hatch(x + inset, top + inset, cell - inset, height - look.edge, look.hatch.pitch, {
      weight: look.hatch.weight,
      colour: colour.magenta,
    })
  canvas.box(x + inset, top + inset, width - look.edge, height - look.edge, { stroke: edge })
  canvas.rule(x + cell, top, x + cell, top + height, { weight: look.edge, colour: colour.magenta })
}

/** Title, text and the override, each on its own line; the title and the beginning of the override are bold. */
function cautionText(block: CautionBlock): Span[] {
  const parts: (readonly Span[])[] = []
  if (block.title !== undefined) parts.push([{ text: block.title, bold: true }])
  for (const line of [...block.lines, ...(block.override === undefined ? [] : [block.override])])
    parts.push(typeof line === 'string' ? [{ text: line }] : line)
  return parts.flatMap((part, i) => (i === 0 ? part : [{ text: '\n' }, ...part]))
}
