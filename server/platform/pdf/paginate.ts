import type { Piece } from './piece.ts'
import { PdfRenderError } from './pdf-render-error.ts'

export interface Placed {
  piece: Piece
  /** From the top of the page's room. */
  top: number
}

/**
 * Distributes pieces over pages in order. `roomOn(page)` is the height free for them on a page, counted from 0.
 * What keeps with the next piece moves to the next page with it; a table's head is repeated; what is taller than a
 * page is divided or taken apart, and refused if it can be neither.
 */
export function paginate(pieces: readonly Piece[], roomOn: (page: number) => number): Placed[][] {
  const queue = [...pieces].reverse()
  const pages: Placed[][] = [[]]
  let used = 0
  const place = (piece: Piece): void => {
    const page = pages.at(-1)
    const top = page?.length ? used + piece.before : used
    page?.push({ piece, top })
    used = top + piece.height
  }
  const turn = (): void => {
    pages.push([])
    used = 0
  }
  for (let piece = queue.pop(); piece; piece = queue.pop()) {
    const onPage = pages.at(-1)?.length ?? 0
    if (piece.breakBefore && onPage) {
      turn()
      queue.push({ ...piece, breakBefore: false })
      continue
    }
    const full = roomOn(Math.max(1, pages.length - 1))
    const repeated = onPage === 0 && piece.repeated ? piece.repeated.height : 0
    const room = roomOn(pages.length - 1) - used - (onPage ? piece.before : 0) - repeated
    if (heldHeight(piece, queue, full) <= room + 0.01 || (onPage === 0 && piece.height <= room + 0.01)) {
      if (repeated && piece.repeated) place(piece.repeated)
      place(piece)
      continue
    }
    if (piece.parts && piece.height > full) {
      queue.push(...[...piece.parts].reverse())
      continue
    }
    const halves = piece.split?.(room)
    if (halves) {
      if (repeated && piece.repeated) place(piece.repeated)
      place(halves[0])
      queue.push(halves[1])
      turn()
      continue
    }
    if (onPage === 0)
      throw new PdfRenderError('does-not-fit', { block: piece.block, text: 'taller than a page' })
    queue.push(piece)
    turn()
  }
  return pages
}

/**
 * The height that must be free to place a piece. A chain that no page could hold is broken where the page ends, and only
 * the next piece is still kept: otherwise each of its links would begin a page of its own.
 */
function heldHeight(piece: Piece, rest: readonly Piece[], full: number): number {
  const chain = chainHeight(piece, rest)
  const next = rest.at(-1)
  if (chain <= full || !next) return chain
  return Math.min(chain, piece.height + next.before + next.height)
}

/** The height that must be free to place a piece with all it keeps with; the last one counts whole. */
function chainHeight(piece: Piece, rest: readonly Piece[]): number {
  let height = piece.height
  let last = piece
  for (let i = rest.length - 1; i >= 0 && last.keepWithNext; i--) {
    const next = rest[i]
    if (!next) break
    const least = next.split ? Math.min(next.height, 40) : next.parts && next.height > 400 ? 40 : next.height
    height += next.before + (next.keepWithNext ? next.height : least)
    last = next
  }
  return height
}
