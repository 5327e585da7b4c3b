import { stringify } from 'csv-stringify/sync'
import type { FileReply } from './route.ts'

/**
 * Rows as a CSV file (RFC 4180): UTF-8 with a mark for spreadsheets, CRLF, a header, and cells that a spreadsheet
 * would run as a formula made harmless.
 *
 * @param columns header and value of each column, in order
 */
export function csvReply<Row>(
  fileName: string,
  columns: readonly { header: string; value: (row: Row) => string | number | null }[],
  rows: readonly Row[],
): FileReply {
  const records = rows.map((row) => columns.map((column) => column.value(row) ?? ''))
  const text = stringify(records, {
    header: true,
    columns: columns.map((column) => column.header),
    bom: true,
    escape_formulas: true,
    record_delimiter: 'windows',
  })
  return { contentType: 'text/csv; charset=utf-8', fileName, body: Buffer.from(text, 'utf8') }
}
