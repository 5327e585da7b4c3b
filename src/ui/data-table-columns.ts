import type { ReactNode } from 'react'
import {
  createColumnHelper,
  createPaginatedRowModel,
  createSortedRowModel,
  rowPaginationFeature,
  rowSortingFeature,
  sortFns,
  tableFeatures,
} from '@tanstack/react-table'

/** One column of a list. */
export interface TableColumn<Row> {
  id: string
  /** Heading; units stand here or in a column of their own. */
  heading: string
  cell: (row: Row) => ReactNode
  /** Numbers stand at the right. */
  number?: boolean
  /** What a list held in memory sorts by; with sorting on the server, `true` says the server can. */
  sort?: true | ((row: Row) => string | number)
  className?: string
  /**
   * On a phone a row is a card: its first column and those marked `head` stand on the first line, the others below it,
   * each with its heading before it; `short` ones two to a line. An empty cell takes no room there.
   */
  narrow?: 'head' | 'short'
}

export const features = tableFeatures({
  rowSortingFeature,
  rowPaginationFeature,
  sortedRowModel: createSortedRowModel(),
  paginatedRowModel: createPaginatedRowModel(),
  sortFns,
})
export type Features = typeof features

/** Our columns in the table's own form. Its accessor serves sorting only; cells draw from the whole row. */
export function toTableColumns<Row extends object>(columns: readonly TableColumn<Row>[]) {
  const helper = createColumnHelper<Features, Row>()
  return helper.columns(
    columns.map((column) =>
      helper.accessor((row: Row) => (typeof column.sort === 'function' ? column.sort(row) : ''), {
        id: column.id,
        header: column.heading,
        enableSorting: column.sort !== undefined,
        sortFn: 'alphanumeric',
        cell: ({ row }) => column.cell(row.original),
      }),
    ),
  )
}
