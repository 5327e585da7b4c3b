import type { ReactNode } from 'react'
import type { UseQueryResult } from '@tanstack/react-query'
import { partWords } from '../../shared/messages/parts.ts'
import { Button } from '../ui/button.tsx'
import type { DataTableProps, TableSort } from '../ui/data-table.tsx'
import { ListEmpty, ListFetching } from '../ui/list-states.tsx'
import type { ListState } from './list-state.ts'
import { unreadable } from './query-standing.tsx'

export interface ServerPage<Row> {
  rows: Row[]
  total: number
  nextCursor: string | null
}

/** The sort that the address asks for; what it leaves out is as the server does it. */
function sortOf(list: ListState, usual: TableSort | null): TableSort | null {
  const column = list.get('sort') ?? usual?.column
  if (column === undefined) return null
  const asked = (['asc', 'desc'] as const).find((one) => one === list.get('direction'))
  return { column, direction: asked ?? (column === usual?.column ? usual.direction : 'asc') }
}

/**
 * What a table needs of a list that the server searches, sorts and pages: rows, sort, pages, and what stands in their
 * place while they are fetched, cannot be read, or are none: with the way back to all of them where a search or filter
 * is set. Rows of an earlier reading stay, marked as old.
 */
export function listProps<Row extends object>(given: {
  query: UseQueryResult<ServerPage<Row>>
  list: ListState
  zone: string
  /** What is fetched, for readers: "transactions". */
  what: string
  /** What it means that there is nothing at all, and the next act. */
  empty: { title: string; body?: string; act?: ReactNode }
  /** What else to do where the search or filters match nothing. */
  noMatch?: string
  /** How the server sorts when nothing is said; null where it sorts one way only. */
  usualSort: TableSort | null
}): Pick<DataTableProps<Row>, 'rows' | 'sort' | 'onSort' | 'paging' | 'instead' | 'above' | 'old'> {
  const { query, list, empty } = given
  const page = query.data
  const sort = sortOf(list, given.usualSort)
  const old = query.isError && page !== undefined
  const above = unreadable(query, given.zone)
  const shared = {
    rows: page?.rows ?? [],
    sort,
    onSort: (next: TableSort) => list.set({ sort: next.column, direction: next.direction }),
    old,
  }
  if (!page) return { ...shared, instead: above ?? <ListFetching what={given.what} /> }
  if (page.rows.length === 0)
    return {
      ...shared,
      above,
      instead: list.narrowed ? (
        <ListEmpty
          title={partWords.noneMatch}
          act={<Button onClick={list.showAll}>{partWords.showAll}</Button>}
        >
          {given.noMatch ?? partWords.noneMatchBody}
        </ListEmpty>
      ) : (
        <ListEmpty title={empty.title} act={empty.act}>
          {empty.body}
        </ListEmpty>
      ),
    }
  return {
    ...shared,
    above,
    paging: {
      kind: 'server',
      from: list.from,
      total: page.total,
      onBefore: list.before,
      onNext: page.nextCursor === null ? undefined : () => list.next(page.nextCursor ?? '', page.rows.length),
    },
  }
}
