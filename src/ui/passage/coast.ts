/** One row of the board as far as the coast goes: its upper edge, its height, and where the shore stands. */
export interface CoastRow {
  top: number
  height: number
  shoreX: number
}

/**
 * The coast through all rows: straight inside a row, an S curve from 62 % of one row to 34 % of the next. Rows sorted by
 * clearance give one coastline.
 *
 * @param offset px to seaward, for the contour lines
 */
export function coastPath(rows: readonly CoastRow[], offset = 0): string {
  const first = rows[0]
  if (!first) return ''
  const n = (value: number) => Math.round(value * 10) / 10
  let path = `M${n(first.shoreX - offset)} ${n(first.top)}`
  rows.forEach((row, i) => {
    const next = rows[i + 1]
    const x = n(row.shoreX - offset)
    if (!next) {
      path += `V${n(row.top + row.height)}`
      return
    }
    const leaves = row.top + row.height * 0.62
    path += `V${n(leaves)}C${x} ${n(leaves + row.height * 0.5)} ${n(next.shoreX - offset)} ${n(leaves + row.height * 0.18)} ${n(next.shoreX - offset)} ${n(next.top + next.height * 0.34)}`
  })
  return path
}

/** The coast closed to the right edge, for the land tint. */
export function landPath(rows: readonly CoastRow[], width: number): string {
  const first = rows[0]
  return first ? `${coastPath(rows)}H${Math.max(width, 0)}V${first.top}Z` : ''
}
