import { formatReading } from '../../shared/domain/quantities/format-reading.ts'
import { partsPageWords as words } from '../../shared/messages/parts-page.ts'
import { Button } from '../ui/button.tsx'
import { DataTable } from '../ui/data-table.tsx'
import type { TableColumn } from '../ui/data-table-columns.ts'
import { ListEmpty, ListFetching, ListUnreadable } from '../ui/list-states.tsx'
import { Quantity } from '../ui/quantity.tsx'
import { PartGroup } from './part-group.tsx'

interface SampleReading {
  id: number
  time: string
  where: string
  what: string
  value: string
  late: string | null
}

const minutes = (i: number) => (i * 7) % 1440
const clock = (minute: number) =>
  `${String(Math.floor(minute / 60)).padStart(2, '0')}:${String(minute % 60).padStart(2, '0')}`

/** As many rows as a list can have in memory. */
const many: SampleReading[] = Array.from({ length: 10_000 }, (_, i) => ({
  id: i + 1,
  time: clock(minutes(i)),
  where: `QT-${(i % 9) + 1}`,
  what: i % 2 === 0 ? 'oxygen' : 'free copper',
  value: (((i * 37) % 900) / 100).toFixed(2),
  late: i === 1 ? '2 days' : null,
}))

const columns: TableColumn<SampleReading>[] = [
  {
    id: 'time',
    heading: words.time,
    cell: (row) => <a href={`#${row.id}`}>{row.time}</a>,
    sort: (row) => row.time,
  },
  { id: 'where', heading: words.where, cell: (row) => row.where, sort: (row) => row.where },
  { id: 'what', heading: words.what, cell: (row) => row.what },
  {
    id: 'value',
    heading: words.value,
    number: true,
    cell: (row) => <Quantity of={formatReading({ value: row.value, unit: 'mg/L' })} />,
    sort: (row) => Number(row.value),
  },
]

const shared = { label: words.table, columns, rowKey: (row: SampleReading) => String(row.id) }
const nothing = () => undefined

export function ListParts() {
  return (
    <PartGroup heading={words.lists}>
      <DataTable
        {...shared}
        rows={many}
        paging={{ kind: 'local', size: 5 }}
        lateBy={(row) => row.late}
        selected={(row) => row.id === 3}
      />
      <DataTable {...shared} rows={many.slice(0, 1)} density="close" />
      <DataTable
        {...shared}
        rows={[]}
        instead={
          <ListEmpty title={words.emptyTitle} act={<Button kind="primary">{words.writeOrder}</Button>}>
            {words.emptyBody}
          </ListEmpty>
        }
      />
      <DataTable
        {...shared}
        rows={many.slice(4, 6)}
        old
        above={<ListUnreadable why={words.unreadable} oldFrom="14:06" code="E-5021" onRetry={nothing} />}
      />
      <ListFetching what={words.orders} rows={3} />
    </PartGroup>
  )
}
