import { describe, expect, it, vi } from 'vitest'
import { DataTable } from '../../../src/ui/data-table.tsx'
import type { DataTableProps } from '../../../src/ui/data-table.tsx'
import type { TableColumn } from '../../../src/ui/data-table-columns.ts'
import { ListEmpty, ListUnreadable } from '../../../src/ui/list-states.tsx'
import { click, draw, drawsComponents, focus, named, one, press } from '../../support/react.tsx'

drawsComponents()

interface Row {
  id: string
  name: string
  grams: number
}
const columns: TableColumn<Row>[] = [
  {
    id: 'name',
    heading: 'Name',
    cell: (row) => <a href={`#${row.id}`}>{row.name}</a>,
    sort: (row) => row.name,
  },
  { id: 'grams', heading: 'Weight, g', number: true, cell: (row) => row.grams, sort: (row) => row.grams },
  { id: 'note', heading: 'Note', cell: () => '' },
]
const rows = (count: number): Row[] =>
  Array.from({ length: count }, (_, i) => ({
    id: String(i),
    name: `HP-${String(i).padStart(5, '0')}`,
    grams: (i * 7) % 100,
  }))

const table = (more: Partial<DataTableProps<Row>> = {}) => (
  <DataTable label="Animals" columns={columns} rows={rows(3)} rowKey={(row) => row.id} {...more} />
)
const names = (place: HTMLElement) =>
  [...place.querySelectorAll('tbody tr')].map((row) => row.firstElementChild?.textContent)

describe('a list', () => {
  it('is a named table that says how many rows there are', async () => {
    const { place, again } = await draw(table())
    expect(one(place, 'table').getAttribute('aria-label')).toBe('Animals')
    expect(place.textContent).toContain('1 to 3 of 3')
    await again(table({ rows: rows(1) }))
    expect(place.textContent).toContain('1 row')
  })

  it('shows 10,000 rows by pages and never more than a page in the document', async () => {
    const { place } = await draw(table({ rows: rows(10_000), paging: { kind: 'local', size: 50 } }))
    expect(place.querySelectorAll('tbody tr')).toHaveLength(50)
    expect(place.textContent).toContain('1 to 50 of 10,000')
    await click(named(place, 'Next page'))
    expect(names(place)[0]).toBe('HP-00050')
    expect(place.textContent).toContain('51 to 100 of 10,000')
    await click(named(place, 'Page before'))
    expect(names(place)[0]).toBe('HP-00000')
  })

  it('sorts rows in memory by a press on the heading, numbers as numbers, and says so', async () => {
    const { place } = await draw(
      table({ rows: [3, 100, 20].map((grams, i) => ({ id: String(i), name: `n${i}`, grams })) }),
    )
    const heading = named(place, 'Weight, g')
    expect(heading.closest('th')?.getAttribute('aria-sort')).toBeNull()
    await click(heading)
    expect(names(place)).toEqual(['n0', 'n2', 'n1'])
    expect(heading.closest('th')?.getAttribute('aria-sort')).toBe('ascending')
    await click(heading)
    expect(names(place)).toEqual(['n1', 'n2', 'n0'])
    expect(heading.closest('th')?.getAttribute('aria-sort')).toBe('descending')
  })

  it('asks outside to sort, and leaves the order to the server', async () => {
    const onSort = vi.fn()
    const { place, again } = await draw(table({ sort: { column: 'name', direction: 'asc' }, onSort }))
    await click(named(place, 'Name'))
    expect(onSort).toHaveBeenLastCalledWith({ column: 'name', direction: 'desc' })
    await click(named(place, 'Weight, g'))
    expect(onSort).toHaveBeenLastCalledWith({ column: 'grams', direction: 'asc' })
    await again(table({ rows: rows(3).reverse(), sort: { column: 'name', direction: 'desc' }, onSort }))
    expect(names(place)).toEqual(['HP-00002', 'HP-00001', 'HP-00000'])
  })

  it('pages from the server by its own callbacks', async () => {
    const onNext = vi.fn()
    const { place } = await draw(table({ paging: { kind: 'server', from: 51, total: 120, onNext } }))
    expect(place.textContent).toContain('51 to 53 of 120')
    await click(named(place, 'Next page'))
    expect(onNext).toHaveBeenCalledOnce()
    expect((named(place, 'Page before') as HTMLButtonElement).disabled).toBe(true)
  })

  it('has no sort button on a column that can’t be sorted by', async () => {
    const { place } = await draw(table())
    expect(place.querySelectorAll('thead button')).toHaveLength(2)
  })

  it('goes from row to row with the arrows, Home and End', async () => {
    const { place } = await draw(table())
    const links = [...place.querySelectorAll<HTMLElement>('tbody a')]
    await focus(links[0]!)
    await press('ArrowDown')
    expect(document.activeElement).toBe(links[1])
    await press('End')
    expect(document.activeElement).toBe(links[2])
    expect((await press('ArrowDown')).defaultPrevented).toBe(false)
    await press('Home')
    expect(document.activeElement).toBe(links[0])
  })

  it('marks a late row with words, not with colour alone', async () => {
    const { place } = await draw(table({ lateBy: (row) => (row.id === '1' ? '2 days' : null) }))
    expect(one(place, 'tr.is-late').textContent).toContain('late by 2 days')
  })

  it('gives its place to what there is to say when there are no rows', async () => {
    const { place, again } = await draw(table({ rows: [], instead: <ListEmpty title="No animals here" /> }))
    expect(place.querySelector('tbody')).toBeNull()
    expect(place.textContent).toContain('No animals here')
    const onRetry = vi.fn()
    await again(
      table({
        old: true,
        above: <ListUnreadable why="No answer." oldFrom="14:06" code="E-1" onRetry={onRetry} />,
      }),
    )
    expect(one(place, '[role="alert"]').textContent).toContain('from 14:06')
    expect(place.querySelectorAll('tr.is-old')).toHaveLength(3)
    await click(named(place, 'Try again'))
    expect(onRetry).toHaveBeenCalledOnce()
  })
})
