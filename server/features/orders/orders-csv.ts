import type { OrderRow } from '../../../shared/contracts/orders.contract.ts'

/** The list of orders as it is shown, one order a row. Codes, not words, so that a program can read the file. */
export const ordersCsvColumns: readonly {
  header: string
  value: (row: OrderRow) => string | number | null
}[] = [
  { header: 'number', value: (row) => row.number },
  { header: 'version', value: (row) => row.versionNo },
  { header: 'state', value: (row) => row.phase },
  { header: 'enclosure', value: (row) => row.enclosureCode },
  { header: 'enclosure_name', value: (row) => row.enclosureName },
  { header: 'drug', value: (row) => row.agent },
  { header: 'problem', value: (row) => row.problem },
  { header: 'target', value: (row) => row.targetText },
  { header: 'amount', value: (row) => row.amountText },
  { header: 'first_dose_at', value: (row) => row.startsAt },
  { header: 'doses', value: (row) => row.doses },
  { header: 'doses_given', value: (row) => row.dosesGiven },
  { header: 'next_due_at', value: (row) => row.nextDueAt },
  { header: 'signed_by', value: (row) => row.signedBy },
  { header: 'signed_at', value: (row) => row.signedAt },
  { header: 'record', value: (row) => row.record },
]
