import { act } from 'react'
import { QueryClient, QueryClientProvider, useQuery } from '@tanstack/react-query'
import { useLocation } from 'react-router-dom'
import { beforeEach, describe, expect, it } from 'vitest'
import { listProps } from '../../../src/lib/list-props.tsx'
import { useListState } from '../../../src/lib/list-state.ts'
import { SearchField } from '../../../src/lib/search-field.tsx'
import { DataTable } from '../../../src/ui/data-table.tsx'
import type { TableColumn } from '../../../src/ui/data-table-columns.ts'
import { Filters } from '../../../src/ui/filters.tsx'
import { SelectField } from '../../../src/ui/select-field.tsx'
import { choose, click, draw, drawsComponents, named, one, type } from '../../support/react.tsx'

drawsComponents()

interface Tank {
  code: string
  litres: number
}
const tanks: Tank[] = [
  { code: 'QT-1', litres: 900 },
  { code: 'QT-2', litres: 400 },
]
const columns: TableColumn<Tank>[] = [
  { id: 'code', heading: 'Code', sort: true, cell: (row) => row.code },
  { id: 'litres', heading: 'Litres', sort: true, number: true, cell: (row) => row.litres },
]
let client: QueryClient
beforeEach(() => {
  client = new QueryClient()
})

/** A list as a feature wires it, over two tanks; the kind "pool" has none. */
function Tanks() {
  const list = useListState()
  const [q, kind] = [list.get('q'), list.get('kind')]
  const query = useQuery({
    queryKey: [q, kind],
    queryFn: async () => {
      const rows = tanks.filter((tank) => kind !== 'pool' && tank.code.includes(q ?? ''))
      return { rows, total: rows.length, nextCursor: null }
    },
  })
  return (
    <>
      <output>{useLocation().search}</output>
      <SearchField label="Find" list={list} />
      <Filters {...list.filters}>
        <SelectField
          label="Kind"
          options={[{ value: 'pool', label: 'Pool' }]}
          onChange={(event) => list.set({ kind: event.target.value })}
        />
      </Filters>
      <DataTable
        label="Tanks"
        columns={columns}
        rowKey={(row) => row.code}
        {...listProps({
          query,
          list,
          zone: 'America/Halifax',
          what: 'tanks',
          empty: { title: 'No tanks yet' },
          usualSort: { column: 'code', direction: 'asc' },
        })}
      />
    </>
  )
}

async function tanksAt(address: string): Promise<HTMLElement> {
  const { place } = await draw(
    <QueryClientProvider client={client}>
      <Tanks />
    </QueryClientProvider>,
    address,
  )
  await settled()
  return place
}
const settled = (ms = 20) => act(() => new Promise((resolve) => setTimeout(resolve, ms)))
const address = (place: HTMLElement) => one(place, 'output').textContent
const codes = (place: HTMLElement) =>
  [...place.querySelectorAll('tbody tr')].map((row) => row.firstElementChild?.textContent)

describe('a list whose state stands in the address', () => {
  it('begins at the search in its address, and searches once the typing pauses', async () => {
    const place = await tanksAt('/?q=QT-2&cursor=abc')
    const field = one<HTMLInputElement>(place, 'input[type="search"]')
    expect([field.value, codes(place)]).toEqual(['QT-2', ['QT-2']])
    await type(field, 'QT')
    expect(address(place)).toBe('?q=QT-2&cursor=abc')
    await settled(350)
    expect(address(place)).toBe('?q=QT')
    await settled()
    expect(codes(place)).toEqual(['QT-1', 'QT-2'])
  })

  it('searches at once on Enter', async () => {
    const place = await tanksAt('/')
    await type(one<HTMLInputElement>(place, 'input[type="search"]'), ' QT-1 ')
    // what the browser does with Enter in the only field of a form
    const submit = new Event('submit', { bubbles: true, cancelable: true })
    await act(async () => void one(place, 'form').dispatchEvent(submit))
    expect(submit.defaultPrevented).toBe(true)
    expect(address(place)).toBe('?q=QT-1')
  })

  it('says how many filters are in use, and takes them and the search away together', async () => {
    const place = await tanksAt('/?sort=litres&q=QT')
    expect(one(place, 'summary').textContent).toBe('Filters')
    await choose(one<HTMLSelectElement>(place, 'details select'), 'pool')
    await settled()
    expect(address(place)).toBe('?sort=litres&q=QT&kind=pool')
    expect(one(place, 'summary').textContent).toBe('Filters, 1 in use')
    expect(place.querySelector('tbody')).toBeNull()
    expect(place.textContent).toContain('Nothing matches')
    await click(named(one(place, '.list-empty'), 'Show all'))
    await settled()
    expect(address(place)).toBe('?sort=litres')
    expect(one<HTMLInputElement>(place, 'input[type="search"]').value).toBe('')
    expect(codes(place)).toHaveLength(2)
  })

  it('says that there is nothing at all only where nothing is left out', async () => {
    tanks.length = 0
    try {
      expect((await tanksAt('/?sort=litres')).textContent).toContain('No tanks yet')
    } finally {
      tanks.push({ code: 'QT-1', litres: 900 }, { code: 'QT-2', litres: 400 })
    }
  })

  it('is sorted as the address says, else as the server does it, and by a choice where headings are away', async () => {
    const place = await tanksAt('/?direction=desc')
    const sorted = one<HTMLSelectElement>(place, '.table-sort select')
    expect(sorted.selectedOptions[0]?.textContent).toBe('Code, falling')
    const wanted = [...sorted.options].find((option) => option.textContent === 'Litres, falling')
    await choose(sorted, wanted?.value ?? '')
    expect(address(place)).toBe('?direction=desc&sort=litres')
    expect(named(place, 'Litres').closest('th')?.getAttribute('aria-sort')).toBe('descending')
  })
})
