import type { ReactNode } from 'react'
import type { UseQueryResult } from '@tanstack/react-query'
import { sayTime } from '../../shared/messages/say-date.ts'
import type { DataTableProps, TableSort } from '../ui/data-table.tsx'
import { ListEmpty, ListFetching, ListUnreadable } from '../ui/list-states.tsx'
import type { ListState } from './list-state.ts'
import { isProblem } from './problem-error.ts'

export interface ServerPage<Row> {
  rows: Row[]
  total: number
  nextCursor: string | null
}

/**
 * What a table needs of a list that the server searches, sorts and pages: rows, sort, pages, and what stands in their
 * place while they are fetched, cannot be read, or are none. Rows of an earlier reading stay, marked as old.
 */
export function listProps<Row extends object>(given: {
  query: UseQueryResult<ServerPage<Row>>
  list: ListState
  zone: string
  /** What is fetched, for readers: "transactions". */
  what: string
  empty: { title: string; body: string; act?: ReactNode }
  /** How the server sorts when nothing is said. */
  usualSort: TableSort
}): Pick<DataTableProps<Row>, 'rows' | 'sort' | 'onSort' | 'paging' | 'instead' | 'above' | 'old'> {
  const { query, list, empty } = given
  const page = query.data
  const column = list.get('sort')
  const sort: TableSort = column
    ? { column, direction: list.get('direction') === 'desc' ? 'desc' : 'asc' }
    : given.usualSort
  const old = query.isError && page !== undefined
  const unreadable = isProblem(query.error) ? (
    <ListUnreadable
      why={query.error.says}
      code={query.error.requestId}
      oldFrom={page ? sayTime(new Date(query.dataUpdatedAt).toISOString(), given.zone) : null}
      onRetry={() => void query.refetch()}
    />
  ) : null
  const shared = {
    rows: page?.rows ?? [],
    sort,
    onSort: (next: TableSort) => list.set({ sort: next.column, direction: next.direction }),
    old,
  }
  if (!page) return { ...shared, instead: unreadable ?? <ListFetching what={given.what} /> }
  if (page.rows.length === 0)
    return {
      ...shared,
      above: unreadable,
      instead: (
        <ListEmpty title={empty.title} act={empty.act}>
          {empty.body}
        </ListEmpty>
      ),
    }
  return {
    ...shared,
    above: unreadable,
    paging: {
      kind: 'server',
      from: list.from,
      total: page.total,
      onBefore: list.before,
      onNext: page.nextCursor === null ? undefined : () => list.next(page.nextCursor ?? '', page.rows.length),
    },
  }
}
