import { animalWords as words } from '../../../shared/messages/animal-sheet.ts'
import { Button } from '../../ui/button.tsx'
import type { TableColumn } from '../../ui/data-table-columns.ts'
import type { ToStrike } from './strike-dialog.tsx'

/**
 * The column with the way to strike a row out; no column where that may not be done.
 *
 * @param lineOf the row as it is struck out; null where it cannot be
 */
export function strikeColumn<Row>(
  onStrike: ((line: ToStrike) => void) | undefined,
  lineOf: (row: Row) => ToStrike | null,
): TableColumn<Row>[] {
  if (!onStrike) return []
  return [
    {
      id: 'strike',
      heading: '',
      cell: (row) => {
        const line = lineOf(row)
        return line ? (
          <Button kind="plain" size="small" onClick={() => onStrike(line)}>
            {words.strike}
            <span className="visually-hidden"> {line.what}</span>
          </Button>
        ) : null
      },
    },
  ]
}
