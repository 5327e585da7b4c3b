import { Readable, pipeline } from 'node:stream'
import { stringify } from 'csv-stringify'
import { guardCell } from './guard-cell.ts'

/** `null` is an empty field. Dates are written as ISO 8601 text by the caller; numbers with a decimal point. */
export type CsvCell = string | number | null
export type CsvRow = readonly CsvCell[]

export interface CsvTable {
  header: readonly string[]
  rows: Iterable<CsvRow> | AsyncIterable<CsvRow>
  /**
   * `literal` is the record: every cell as it is, UTF-8 without a mark, for machines.
   * `guarded` is for people with a spreadsheet: formula signs guarded by an apostrophe, and a byte order mark, without
   * which spreadsheets read UTF-8 as something else.
   */
  variant: 'literal' | 'guarded'
}

/**
 * Rows as CSV of RFC 4180: header first, comma, CRLF after every line, quotes where a field has a comma, a quote, CR
 * or LF. Rows are taken one by one as the reader takes them; a reader that goes away ends the source.
 * A row of another length than the header is a bug and ends the stream with an error, so that no file looks whole.
 */
export function csvStream(table: CsvTable): Readable {
  const guarded = table.variant === 'guarded'
  const lines = stringify({
    bom: guarded,
    record_delimiter: '\r\n',
    // The record delimiter alone would let a lone CR or LF stand unquoted, which readers take for a line end.
    quoted_match: /[\r\n]/,
    // A single empty field would be an empty line, which readers skip.
    quoted_empty: table.header.length === 1,
  })
  pipeline(Readable.from(records(table, guarded), { objectMode: true }), lines, () => undefined)
  return lines
}

async function* records({ header, rows }: CsvTable, guarded: boolean): AsyncGenerator<string[]> {
  const write = (cell: CsvCell): string => {
    if (typeof cell === 'number' && !Number.isFinite(cell))
      throw new Error(`${cell} cannot stand in a CSV file`)
    const text = cell === null ? '' : String(cell)
    return guarded ? guardCell(text) : text
  }
  yield header.map(write)
  let count = 0
  for await (const row of rows) {
    count++
    if (row.length !== header.length)
      throw new Error(`CSV row ${count} has ${row.length} cells under a header of ${header.length}`)
    yield row.map(write)
  }
}
