import type { ReactNode } from 'react'
import { OctagonX, RefreshCw } from 'lucide-react'
import { partWords } from '../../shared/messages/parts.ts'
import { Button } from './button.tsx'
import { EmptyHarbour } from './empty-harbour.tsx'
import { Icon } from './icon.tsx'

/** Nothing in the list: what that means, and the next act. */
export function ListEmpty({
  title,
  children,
  act,
}: {
  title: string
  children?: ReactNode
  act?: ReactNode
}) {
  return (
    <div className="list-empty">
      <EmptyHarbour />
      <h3 className="t-head">{title}</h3>
      {children ? <p>{children}</p> : null}
      {act ? <div className="row row-wrap">{act}</div> : null}
    </div>
  )
}

/**
 * The list can't be read: what failed, whether what is shown is old, what to do, and the code for whoever helps.
 *
 * @param why   what happened, in words
 * @param oldFrom when the rows below were read, in facility time; absent when nothing is shown below
 */
export function ListUnreadable({
  title,
  why,
  oldFrom,
  code,
  onRetry,
  act,
}: {
  title?: string
  why: string
  oldFrom?: string | null
  code?: string | undefined
  onRetry: () => void
  act?: ReactNode
}) {
  return (
    <div className="cannot-read" role="alert">
      <Icon of={OctagonX} size={26} />
      <div>
        <h3 className="t-head">{title ?? partWords.listNotFetched}</h3>
        <p>
          {why} {oldFrom ? partWords.rowsAreOld({ at: oldFrom }) : partWords.nothingBelow}
        </p>
        <div className="row row-wrap mt-2">
          <Button kind="primary" icon={RefreshCw} onClick={onRetry}>
            {partWords.tryAgain}
          </Button>
          {act}
        </div>
        {code ? <p className="t-note">{partWords.giveCode({ code })}</p> : null}
      </div>
    </div>
  )
}

const widths = [
  ['w-[72%]', 'w-[48%]'],
  ['w-[58%]', 'w-[61%]'],
  ['w-[80%]', 'w-[38%]'],
  ['w-[49%]', 'w-[44%]'],
] as const

/**
 * Being fetched: rows hold their place under a graduated bar, so nothing jumps when they come in. Nothing is shown for
 * the first 300 ms, and nothing spins.
 */
export function ListFetching({ what, rows = 4 }: { what: string; rows?: number }) {
  return (
    <div className="appears-late">
      <div className="row row-between">
        <span className="t-note" role="status">
          {partWords.fetching}
        </span>
      </div>
      <div className="fetching-bar" role="progressbar" aria-label={partWords.fetchingWhat({ what })} />
      <ul aria-hidden="true">
        {Array.from({ length: rows }, (_, i) => widths[i % widths.length] ?? widths[0]).map(
          ([first, second], i) => (
            <li key={i} className="skeleton">
              <span className="w-16" />
              <span className={first} />
              <span className={second} />
            </li>
          ),
        )}
      </ul>
    </div>
  )
}
