import type {
  PenCell,
  RichText,
  TableBlock,
  TableCell,
} from '../../../../shared/domain/documents/pdf-document-model.ts'
import { leastWidths } from '../break-lines.ts'
import { PdfRenderError } from '../pdf-render-error.ts'
import { rowPiece, type Measure, type Piece, type PlacedBox, type RowLook } from '../piece.ts'
import { textBox } from '../text-box.ts'
import { colour, px, type } from '../type-scale.ts'
import { columnWidths } from '../column-widths.ts'

/** Least height of a box for the pen: the look asks for 28 px at the least. */
export const penHeight = px(30)

interface TableLayout {
  block: TableBlock
  name: string
  measure: Measure
  size: number
  widths: number[]
  boxed: boolean
  pad: number
}

/**
 * A table whose head is repeated on every page. Columns widen by themselves for a number that would not fit; when all
 * of them cannot, the type gets smaller; when even the smallest type does not do, the table is refused.
 */
export function measureTable(block: TableBlock, measure: Measure): Piece[] {
  const name = `table "${block.columns.map((column) => column.head).join(' | ')}"`
  const columns = block.columns.length
  for (const row of [...block.rows, ...(block.totals ? [block.totals] : [])])
    if (row.length !== columns)
      throw new PdfRenderError('bad-model', {
        block: name,
        cells: String(row.length),
        columns: String(columns),
      })
  const boxed = block.boxed ?? block.rows.some((row) => row.some(isPen))
  const layout = layOut(block, name, measure, boxed)
  const head = rowPiece(
    rowBoxes(
      layout,
      block.columns.map((column) => column.head),
      { size: type.label, tone: 'second' },
    ),
    {
      block: name,
      before: px(9),
      padTop: px(1),
      padBottom: px(3),
      keepWithNext: true,
      ground: (canvas, x, top, height) => {
        if (!boxed) canvas.rule(x, top + height, x + measure.width, top + height, { weight: px(1) })
      },
    },
    measure.pageRoom,
  )
  const body = block.rows.map((row, i) =>
    rowPiece(
      rowBoxes(layout, row),
      rowLook(layout, row, head, Boolean(block.totals) && i === block.rows.length - 1),
      measure.pageRoom,
    ),
  )
  if (body.length === 0)
    body.push(
      rowPiece(
        [
          {
            box: textBox(measure.face, block.emptyText, measure.width - 2 * layout.pad, {
              size: layout.size,
              tone: 'second',
              block: name,
            }),
            x: layout.pad,
          },
        ],
        { ...rowLook({ ...layout, boxed: false }, [], head, Boolean(block.totals)) },
        measure.pageRoom,
      ),
    )
  if (block.totals)
    body.push(
      rowPiece(
        rowBoxes(layout, block.totals, { bold: true }),
        {
          ...rowLook({ ...layout, boxed: false }, block.totals, head, false),
          ground: (canvas, x, top, height) => {
            canvas.rule(x, top, x + measure.width, top, { weight: px(1) })
            canvas.rule(x, top + height, x + measure.width, top + height, { weight: px(1) })
          },
        },
        measure.pageRoom,
      ),
    )
  return [head, ...body]
}

function layOut(block: TableBlock, name: string, measure: Measure, boxed: boolean): TableLayout {
  const pad = px(6)
  for (let size: number = type.body; size >= type.least - 0.01; size -= 0.5) {
    const needs = block.columns.map((column, i) => {
      const cells: [RichText, number, boolean][] = [[column.head, Math.min(size, type.label), false]]
      for (const row of block.rows) {
        const cell = row[i]
        if (cell !== undefined) cells.push([isPen(cell) ? (cell.unit ?? '') : cell, size, false])
      }
      const total = block.totals?.[i]
      if (total !== undefined) cells.push([total, size, true])
      const widths = cells.map(([text, at, bold]) =>
        leastWidths(measure.face, text, { size: at, bold, block: name }),
      )
      return {
        share: column.share,
        line: Math.max(...widths.map((width) => width.line)) + 2 * pad + 0.1,
        whole: Math.max(...widths.map((width) => width.whole)) + 2 * pad + 0.1,
        least: Math.max(...widths.map((width) => width.least)) + 2 * pad + 0.1,
      }
    })
    const widths = columnWidths(needs, measure.width)
    if (widths) return { block, name, measure, size, widths, boxed, pad }
  }
  throw new PdfRenderError('does-not-fit', { block: name, text: 'columns' })
}

function rowBoxes(
  layout: TableLayout,
  row: readonly TableCell[],
  look: { size?: number; bold?: boolean; tone?: 'second' } = {},
): PlacedBox[] {
  let left = 0
  return row.map((cell, i) => {
    const width = layout.widths[i] ?? 0
    const size = Math.min(look.size ?? layout.size, layout.size)
    const options = {
      size,
      bold: look.bold ?? false,
      block: `${layout.name}, column "${layout.block.columns[i]?.head ?? ''}"`,
    }
    const tone = isPen(cell) ? ('second' as const) : look.tone
    const text = isPen(cell) ? (cell.unit ?? '') : cell
    const box = textBox(
      layout.measure.face,
      text,
      width - 2 * layout.pad,
      tone ? { ...options, tone } : options,
    )
    const right = isPen(cell) || layout.block.columns[i]?.align === 'right'
    const placed: PlacedBox = right
      ? { box, x: left + width - layout.pad, align: 'right' }
      : { box, x: left + layout.pad }
    if (isPen(cell)) placed.down = Math.max(0, penHeight - px(8) - box.height)
    left += width
    return placed
  })
}

function rowLook(
  layout: TableLayout,
  row: readonly TableCell[],
  head: Piece,
  keepWithNext: boolean,
): RowLook {
  const { measure, widths, boxed } = layout
  return {
    block: layout.name,
    padTop: px(4),
    padBottom: px(4),
    minHeight: row.some(isPen) ? penHeight : 0,
    repeated: head,
    keepWithNext,
    ground: (canvas, x, top, height) => {
      if (!boxed) {
        canvas.rule(x, top + height, x + measure.width, top + height, {
          weight: px(0.6),
          colour: colour.hair,
        })
        return
      }
      let left = x
      for (const width of widths) {
        canvas.box(left, top, width, height, { stroke: { weight: px(1), colour: [0.4, 0.4, 0.4] } })
        left += width
      }
    },
  }
}

function isPen(cell: TableCell): cell is PenCell {
  return typeof cell === 'object' && 'pen' in cell
}
