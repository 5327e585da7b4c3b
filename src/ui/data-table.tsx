import { useMemo, useRef, useState } from 'react'
import type { KeyboardEvent, ReactNode } from 'react'
import { useTable } from '@tanstack/react-table'
import type { SortingState } from '@tanstack/react-table'
import { ArrowDown, ArrowUp, ChevronsUpDown } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { classNames } from './class-names.ts'
import { features, toTableColumns } from './data-table-columns.ts'
import type { TableColumn } from './data-table-columns.ts'
import { Icon } from './icon.tsx'
import { TableFoot } from './table-foot.tsx'
import { TableSortChoice } from './table-sort-choice.tsx'

export interface TableSort {
  column: string
  direction: 'asc' | 'desc'
}

/** Where the pages come from: cut here from rows in memory, or asked for from the server by cursor. */
export type TablePaging =
  | { kind: 'local'; size: number }
  | {
      kind: 'server'
      /** Number of the first row shown, from 1. */
      from: number
      total: number
      onBefore?: (() => void) | undefined
      onNext?: (() => void) | undefined
    }

export interface DataTableProps<Row extends object> {
  /** Name of the table for readers. */
  label: string
  columns: readonly TableColumn<Row>[]
  rows: readonly Row[]
  rowKey: (row: Row) => string
  /** Given together: sorting is done outside, by the server. Left out: rows in memory are sorted here. */
  sort?: TableSort | null
  onSort?: (next: TableSort) => void
  paging?: TablePaging
  /** How late a row is, in words ("2 days"); puts the magenta bar and "late by" on it. */
  lateBy?: (row: Row) => string | null
  selected?: (row: Row) => boolean
  /** Rows from an earlier reading, shown because the newer could not be fetched. */
  old?: boolean
  density?: 'usual' | 'roomy' | 'close'
  /** What stands in place of the rows: empty, being fetched, can't be read. */
  instead?: ReactNode
  /** What stands above the rows that are kept, such as "can't be read". */
  above?: ReactNode
}

/**
 * A list. The head sticks; below 900 px the first column too, and on a phone a row is a card of labelled lines (the
 * roles are said outright, because the style takes the table's own display away there). Arrow keys go from row to row
 * along one column.
 */
export function DataTable<Row extends object>(props: DataTableProps<Row>) {
  const { columns, rows, paging, sort, onSort } = props
  const [ownSort, setOwnSort] = useState<SortingState>([])
  const [page, setPage] = useState(0)
  const size = paging?.kind === 'local' ? paging.size : Math.max(rows.length, 1)
  const lastPage = Math.max(0, Math.ceil(rows.length / size) - 1)
  const shownPage = Math.min(page, lastPage)
  const sorting: SortingState = onSort
    ? sort
      ? [{ id: sort.column, desc: sort.direction === 'desc' }]
      : []
    : ownSort
  const tableColumns = useMemo(() => toTableColumns(columns), [columns])
  const data = useMemo(() => [...rows], [rows])
  const table = useTable({
    features,
    columns: tableColumns,
    data,
    getRowId: props.rowKey,
    manualSorting: onSort !== undefined,
    enableSortingRemoval: false,
    state: { sorting, pagination: { pageIndex: shownPage, pageSize: size } },
    onSortingChange: (update) => {
      const [next] = typeof update === 'function' ? update(sorting) : update
      if (onSort && next) onSort({ column: next.id, direction: next.desc ? 'desc' : 'asc' })
      else setOwnSort(next ? [next] : [])
      setPage(0)
    },
  })
  const body = useRef<HTMLTableSectionElement>(null)
  const byId = new Map(columns.map((column) => [column.id, column]))

  const onKeyDown = (event: KeyboardEvent) => {
    const to = rowInReach(event.key, event.target as HTMLElement, body.current)
    if (!to) return
    event.preventDefault()
    to.focus()
  }

  return (
    <div>
      {props.above}
      {props.instead || rows.length < 2 ? null : (
        <TableSortChoice
          columns={columns}
          sorting={sorting[0]}
          onSort={(next) => table.getColumn(next.id)?.toggleSorting(next.desc)}
        />
      )}
      <div className="table-scroll">
        <table
          role="table"
          className={classNames(
            'data-table',
            props.density && props.density !== 'usual' && `is-${props.density}`,
          )}
          aria-label={props.label}
        >
          <thead role="rowgroup">
            <tr role="row">
              {table.getFlatHeaders().map((header) => {
                const column = byId.get(header.column.id)
                const sorted = header.column.getIsSorted()
                return (
                  <th
                    key={header.id}
                    role="columnheader"
                    scope="col"
                    className={classNames(column?.number && 'is-number', column?.className)}
                    aria-sort={sorted === 'asc' ? 'ascending' : sorted === 'desc' ? 'descending' : undefined}
                  >
                    {header.column.getCanSort() ? (
                      <button type="button" onClick={() => header.column.toggleSorting(sorted === 'asc')}>
                        <table.FlexRender header={header} />
                        <Icon
                          of={sorted === 'asc' ? ArrowUp : sorted === 'desc' ? ArrowDown : ChevronsUpDown}
                        />
                      </button>
                    ) : (
                      <table.FlexRender header={header} />
                    )}
                  </th>
                )
              })}
            </tr>
          </thead>
          {props.instead ? null : (
            <tbody role="rowgroup" ref={body} onKeyDown={onKeyDown}>
              {table.getRowModel().rows.map((row) => {
                const late = props.lateBy?.(row.original) ?? null
                return (
                  <tr
                    key={row.id}
                    role="row"
                    className={classNames(
                      late !== null && 'is-late',
                      props.selected?.(row.original) && 'is-selected',
                      props.old && 'is-old',
                    )}
                  >
                    {row.getAllCells().map((cell, i) => {
                      const column = byId.get(cell.column.id)
                      return (
                        <td
                          key={cell.id}
                          role="cell"
                          data-label={i === 0 ? undefined : column?.heading}
                          className={classNames(
                            column?.number && 'is-number',
                            (i === 0 || column?.narrow === 'head') && 'is-head',
                            column?.narrow === 'short' && 'is-short',
                            column?.className,
                          )}
                        >
                          <table.FlexRender cell={cell} />
                          {i === 0 && late !== null ? (
                            <span className="late-words">{partWords.late({ by: late })}</span>
                          ) : null}
                        </td>
                      )
                    })}
                  </tr>
                )
              })}
            </tbody>
          )}
        </table>
      </div>
      {props.instead}
      {props.instead ? null : (
        <TableFoot
          label={props.label}
          {...footOf(paging, rows.length, shownPage, size)}
          onBefore={
            paging?.kind === 'server'
              ? paging.onBefore
              : shownPage > 0
                ? () => setPage(shownPage - 1)
                : undefined
          }
          onNext={
            paging?.kind === 'server'
              ? paging.onNext
              : shownPage < lastPage
                ? () => setPage(shownPage + 1)
                : undefined
          }
        />
      )}
    </div>
  )
}

function footOf(paging: TablePaging | undefined, count: number, page: number, size: number) {
  if (paging?.kind === 'server')
    return { from: paging.from, to: paging.from + count - 1, total: paging.total }
  return { from: page * size + 1, to: Math.min(count, (page + 1) * size), total: count }
}

/** The control of another row that an arrow, Home or End leads to: the same one in the row, where there is one. */
function rowInReach(
  key: string,
  from: HTMLElement,
  body: HTMLTableSectionElement | null,
): HTMLElement | null {
  if (!body || !['ArrowDown', 'ArrowUp', 'Home', 'End'].includes(key)) return null
  if (from.matches('input, select, textarea')) return null
  const controls = (row: Element) => [...row.querySelectorAll<HTMLElement>('a, button')]
  const rows = [...body.querySelectorAll('tr')].filter((row) => controls(row).length > 0)
  const at = rows.findIndex((row) => row.contains(from))
  if (at < 0) return null
  const to = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: rows.length - 1 }[key] ?? at
  const row = rows[to]
  const own = rows[at]
  if (!row || !own) return null
  const inRow = controls(row)
  return inRow[Math.min(controls(own).indexOf(from), inRow.length - 1)] ?? null
}
