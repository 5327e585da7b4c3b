import { partWords } from '../../shared/messages/parts.ts'
import type { TableColumn } from './data-table-columns.ts'
import { SelectField } from './select-field.tsx'

interface ColumnSort {
  id: string
  desc: boolean
}

/** What a list is sorted by, as one choice: on a phone the headings that sort it are not there. */
export function TableSortChoice<Row>({
  columns,
  sorting,
  onSort,
}: {
  columns: readonly TableColumn<Row>[]
  sorting: ColumnSort | undefined
  onSort: (next: ColumnSort) => void
}) {
  const choices = columns
    .filter((column) => column.sort !== undefined)
    .flatMap(({ id, heading }) => [
      { id, desc: false, label: partWords.rising({ heading }) },
      { id, desc: true, label: partWords.falling({ heading }) },
    ])
  if (choices.length === 0) return null
  const chosen = choices.findIndex((choice) => choice.id === sorting?.id && choice.desc === sorting.desc)
  return (
    <div className="table-sort">
      <SelectField
        label={partWords.sortedBy}
        startsEmpty={false}
        options={[
          ...(chosen < 0 ? [{ value: '', label: partWords.asTheyCome }] : []),
          ...choices.map(({ label }, at) => ({ value: String(at), label })),
        ]}
        value={chosen < 0 ? '' : String(chosen)}
        onChange={(event) => {
          const choice = choices[Number(event.target.value)]
          if (event.target.value !== '' && choice) onSort(choice)
        }}
      />
    </div>
  )
}
