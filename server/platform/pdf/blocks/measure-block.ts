import type { DocumentBlock } from '../../../../shared/domain/documents/pdf-document-model.ts'
import { together, type Measure, type Piece } from '../piece.ts'
import { padding, px } from '../type-scale.ts'
import { measureAmount } from './amount.ts'
import { measureCaution } from './caution.ts'
import { measureConditions } from './conditions.ts'
import { measureCourse } from './course.ts'
import { measureDrawing } from './drawing.ts'
import { measureFingerprint } from './fingerprint.ts'
import { measureFlagLine } from './flag-line.ts'
import { measureGrid } from './grid.ts'
import { measureHeading } from './heading.ts'
import { measureParagraph } from './paragraph.ts'
import { measurePen } from './pen.ts'
import { measureQr } from './qr.ts'
import { measureSignatures } from './signatures.ts'
import { measureTable } from './table.ts'
import { measureWorking } from './working.ts'

/** Measures blocks for a column; page breaks become a property of the piece after them. */
export function measureBlocks(blocks: readonly DocumentBlock[], measure: Measure): Piece[] {
  const pieces: Piece[] = []
  let breakBefore = false
  let previous: DocumentBlock['kind'] | undefined
  for (const block of blocks) {
    if (block.kind === 'page-break') {
      breakBefore = true
      continue
    }
    const [head, ...rest] = measureBlock(block, measure)
    if (!head) continue
    // A heading brings its own room; anything else needs some before the head of a table.
    const before = block.kind === 'table' && previous === 'heading' ? 0 : head.before
    pieces.push({ ...head, before, ...(breakBefore ? { breakBefore } : {}) }, ...rest)
    breakBefore = false
    previous = block.kind
  }
  return pieces
}

function measureBlock(block: Exclude<DocumentBlock, { kind: 'page-break' }>, measure: Measure): Piece[] {
  switch (block.kind) {
    case 'heading':
      return measureHeading(block, measure)
    case 'paragraph':
      return measureParagraph(block, measure)
    case 'grid':
      return measureGrid(block, measure)
    case 'amount':
      return measureAmount(block, measure)
    case 'table':
      return measureTable(block, measure)
    case 'working':
      return measureWorking(block, measure)
    case 'conditions':
      return measureConditions(block, measure)
    case 'caution':
      return measureCaution(block, measure)
    case 'signatures':
      return measureSignatures(block, measure)
    case 'pen':
      return measurePen(block, measure)
    case 'course':
      return measureCourse(block, measure)
    case 'drawing':
      return measureDrawing(block, measure)
    case 'flag-line':
      return measureFlagLine(block, measure)
    case 'fingerprint':
      return measureFingerprint(block, measure)
    case 'qr':
      return measureQr(block, measure)
    case 'group':
      return block.blocks.length === 0 ? [] : [together(measureBlocks(block.blocks, measure))]
    case 'columns':
      return [sideBySide(block, measure)]
    case 'rule':
      return [edgeRule(measure)]
  }
}

const gutter = px(26)

function sideBySide(block: Extract<DocumentBlock, { kind: 'columns' }>, measure: Measure): Piece {
  const shares = block.columns.reduce((sum, column) => sum + column.share, 0)
  const free = measure.width - gutter * (block.columns.length - 1)
  let x = 0
  const columns = block.columns.map((column) => {
    const width = (free * column.share) / shares
    const placed = { x, piece: together(measureBlocks(column.blocks, { ...measure, width })) }
    x += width + gutter
    return placed
  })
  const height = Math.max(0, ...columns.map(({ piece }) => piece.height))
  return {
    height,
    before: Math.max(0, ...columns.map(({ piece }) => piece.before)),
    block: 'columns',
    draw: (canvas, left, top) => {
      for (const { x: at, piece } of columns) {
        if (block.divided && at > 0)
          canvas.rule(left + at - gutter / 2, top, left + at - gutter / 2, top + height, { weight: px(0.75) })
        piece.draw(canvas, left + at, top)
      }
    },
    // Taller than a page: one under another, over the full width, where each block may be divided by itself.
    parts:
      measure.width > 0 && height > measure.pageRoom
        ? block.columns.flatMap((c) => measureBlocks(c.blocks, measure))
        : [],
  }
}

function edgeRule(measure: Measure): Piece {
  return {
    height: px(1),
    before: px(9),
    block: 'rule',
    draw: (canvas, x, top) =>
      canvas.rule(x - padding, top + px(0.5), x + measure.width + padding, top + px(0.5), { weight: px(1) }),
  }
}
