import type { CsvTable } from '../../platform/csv/csv-stream.ts'
import type { TransactionListRow } from './transaction-list.reads.ts'
import type { LineReadRow } from './transactions.reads.ts'

/** The list of transactions as it is shown, one line of a transaction a row. Voided ones are marked, not left out. */
export function transactionsCsv(
  rows: readonly TransactionListRow[],
  lines: readonly LineReadRow[],
  variant: CsvTable['variant'],
): CsvTable {
  return {
    variant,
    header: [
      'transaction',
      'way',
      'kind',
      'date',
      'counterparty',
      'reference',
      'accession',
      'scientific_name',
      'common_name',
      'count',
      'their_number',
      'permits',
      'documents',
      'voided',
      'recorded_at',
    ],
    rows: rows.flatMap((row) =>
      lines
        .filter((line) => line.transaction_id === row.id)
        .map((line) => [
          row.number,
          row.way,
          row.kind,
          row.happened_text,
          row.counterparty_name,
          row.reference,
          line.accession,
          line.scientific_name,
          line.common_name,
          line.count,
          line.their_number,
          Number(row.permits),
          Number(row.documents),
          row.voided ? 'yes' : 'no',
          row.recorded_at.toISOString(),
        ]),
    ),
  }
}
