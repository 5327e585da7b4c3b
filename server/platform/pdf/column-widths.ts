export interface ColumnNeed {
  /** Wanted part of the width, relative to the others. */
  share: number
  /** Width that needs no second line. */
  line: number
  /** Width that keeps every word whole. */
  whole: number
  /** Width below which a number would part from its unit. */
  least: number
}

/**
 * Widths of a table's columns: the wanted shares where they do, wider where a word or a number needs it at the expense
 * of those with room to spare. Undefined when not even every number fits.
 */
export function columnWidths(needs: readonly ColumnNeed[], width: number): number[] | undefined {
  const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0)
  const shares = sum(needs.map((need) => need.share))
  // A very long word does not push the numbers away: it asks for no more than two fifths of the sheet.
  const floors = needs.map((need) => Math.max(need.least, Math.min(need.whole, width * 0.4)))
  const leasts = needs.map((need) => need.least)
  if (sum(leasts) > width) return undefined
  const wanted = needs.map((need) => (width * need.share) / shares)
  const lines = needs.map((need) => need.line)
  if (sum(lines) <= width) return spread(wanted, lines, width)
  return sum(floors) <= width ? spread(wanted, floors, width) : spread(floors, leasts, width)
}

/** Raises what lies below its floor and takes the difference from what lies above, in proportion to the spare room. */
function spread(wanted: readonly number[], floors: readonly number[], width: number): number[] {
  const raised = wanted.map((value, i) => Math.max(value, floors[i] ?? 0))
  const excess = raised.reduce((sum, value) => sum + value, 0) - width
  const spare = raised.map((value, i) => value - (floors[i] ?? 0))
  const allSpare = spare.reduce((sum, value) => sum + value, 0)
  if (excess <= 0 || allSpare <= 0) return raised
  return raised.map((value, i) => value - (excess * (spare[i] ?? 0)) / allSpare)
}
