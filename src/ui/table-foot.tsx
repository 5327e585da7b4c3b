import { partWords } from '../../shared/messages/parts.ts'
import { Button } from './button.tsx'

/** Says which rows are shown of how many; with pages, goes to the one before and after. */
export function TableFoot({
  label,
  from,
  to,
  total,
  onBefore,
  onNext,
}: {
  label: string
  from: number
  to: number
  total: number
  onBefore: (() => void) | undefined
  onNext: (() => void) | undefined
}) {
  if (total === 0) return null
  const n = (value: number) => value.toLocaleString('en-GB')
  return (
    <nav className="table-foot" aria-label={partWords.pagesOf({ table: label })}>
      <span role="status">
        {total === 1 ? partWords.oneRow : partWords.rowsShown({ from: n(from), to: n(to), total: n(total) })}
      </span>
      {onBefore || onNext ? (
        <span className="row">
          <Button size="small" disabled={!onBefore} onClick={onBefore}>
            {partWords.pageBefore}
          </Button>
          <Button size="small" disabled={!onNext} onClick={onNext}>
            {partWords.nextPage}
          </Button>
        </span>
      ) : null}
    </nav>
  )
}
