import type { PermitRow } from '../../../shared/contracts/permits.contract.ts'
import type { CsvTable } from '../../platform/csv/csv-stream.ts'

/** The list of permits as it is shown, one permit a row. Codes, not words, so that a file can be read by a program. */
export function permitsCsv(rows: readonly PermitRow[], variant: CsvTable['variant']): CsvTable {
  return {
    variant,
    header: [
      'number',
      'permit_number',
      'authority',
      'kind',
      'valid_from',
      'valid_until',
      'state',
      'quantity_allowed',
      'used',
      'remaining',
      'taxa',
      'open_marks',
      'documents',
    ],
    rows: rows.map((row) => [
      row.number,
      row.permitNumber,
      row.authority,
      row.kind,
      row.validFrom,
      row.validUntil,
      row.state,
      row.quantityAllowed,
      row.used,
      row.remaining,
      row.taxa.map((taxon) => taxon.scientificName).join('; '),
      row.openMarks,
      row.documents,
    ]),
  }
}
