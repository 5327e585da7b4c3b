import type { PdfDocumentModel } from '../../../shared/domain/documents/pdf-document-model.ts'
import type { Canvas } from './canvas.ts'
import { splitBox, type TextBox } from './text-box.ts'
import type { Typeface } from './typeface.ts'

/** A measured part of a document that is placed whole, or divided where it says so. Measures in points. */
export interface Piece {
  height: number
  /** Room above it, left out at the top of a page. */
  before: number
  draw(canvas: Canvas, x: number, top: number): void
  /** Names the block in an error. */
  block: string
  /** Stands on the same page as the piece after it. */
  keepWithNext?: boolean
  /** Divides it so that the first part is at most `room` high; undefined when nothing useful fits. */
  split?(room: number): [Piece, Piece] | undefined
  /** What a piece too tall for a page falls apart into. */
  parts?: readonly Piece[]
  /** Drawn again when this piece begins a page (a table's head). */
  repeated?: Piece
  /** Begins a new page. */
  breakBefore?: boolean
}

/** What every block needs to be measured. */
export interface Measure {
  face: Typeface
  /** Width of the text column. */
  width: number
  /** Room on a page after the first, for deciding what may be divided at all. */
  pageRoom: number
  model: PdfDocumentModel
}

/** Text boxes side by side with a common top, and what is drawn round them. */
export interface RowLook {
  block: string
  before?: number
  padTop?: number
  padBottom?: number
  minHeight?: number
  /** Drawn before the text. */
  ground?(canvas: Canvas, x: number, top: number, height: number, first: boolean): void
  keepWithNext?: boolean
  repeated?: Piece
}

export interface PlacedBox {
  box: TextBox
  /** From the row's left edge; the right end of the text when aligned right. */
  x: number
  align?: 'left' | 'right'
  /** Moves the box down within the row. */
  down?: number
}

/** A row of text boxes. One taller than half a page may be divided between lines. */
export function rowPiece(boxes: readonly PlacedBox[], look: RowLook, pageRoom: number, first = true): Piece {
  const padTop = look.padTop ?? 0
  const padBottom = look.padBottom ?? 0
  const content = Math.max(0, ...boxes.map(({ box, down = 0 }) => down + box.height))
  const height = Math.max(look.minHeight ?? 0, padTop + content + padBottom)
  const piece: Piece = {
    height,
    before: look.before ?? 0,
    block: look.block,
    keepWithNext: look.keepWithNext ?? false,
    draw: (canvas, x, top) => {
      look.ground?.(canvas, x, top, height, first)
      for (const { box, x: at, align, down = 0 } of boxes)
        canvas.text(box, x + at, top + padTop + down, align)
    },
  }
  if (look.repeated) piece.repeated = look.repeated
  if (height > pageRoom / 2)
    piece.split = (room) => {
      const free = room - padTop - padBottom
      const halves = boxes.map((placed) => {
        const lines = Math.max(0, Math.floor((free - (placed.down ?? 0)) / placed.box.leading))
        const [head, rest] = splitBox(placed.box, lines)
        const down = Math.max(
          0,
          (placed.down ?? 0) - Math.floor(free / placed.box.leading) * placed.box.leading,
        )
        return { head: { ...placed, box: head }, rest: { ...placed, box: rest, down } }
      })
      const [heads, rests] = [halves.map((half) => half.head), halves.map((half) => half.rest)]
      if (!heads.some(({ box }) => box.lines.length > 1)) return undefined
      return [
        rowPiece(heads, { ...look, keepWithNext: false }, pageRoom, first),
        rowPiece(rests, { ...look, before: 0 }, pageRoom, false),
      ]
    }
  return piece
}

/** Several pieces as one that stays together; too tall for a page, it falls apart again. */
export function together(pieces: readonly Piece[]): Piece {
  const [head] = pieces
  let height = 0
  const tops = pieces.map((piece, i) => {
    const top = height + (i === 0 ? 0 : piece.before)
    height = top + piece.height
    return top
  })
  return {
    height,
    before: head?.before ?? 0,
    block: head?.block ?? 'group',
    keepWithNext: pieces.at(-1)?.keepWithNext ?? false,
    draw: (canvas, x, top) => pieces.forEach((piece, i) => piece.draw(canvas, x, top + (tops[i] ?? 0))),
    parts: pieces,
  }
}
