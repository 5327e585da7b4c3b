import type { ReactNode } from 'react'
import type { UseQueryResult } from '@tanstack/react-query'
import { sayTime } from '../../shared/messages/say-date.ts'
import { ListFetching, ListUnreadable } from '../ui/list-states.tsx'
import { useMe } from './me.ts'
import { isProblem } from './problem-error.ts'
import type { ProblemError } from './problem-error.ts'

interface UnreadableWords {
  /** Another heading than "could not be fetched", by what went wrong. */
  titleOf?: ((problem: ProblemError) => string | undefined) | undefined
  act?: ReactNode
}

/** That something could not be read, whether what is shown is older, and the way to try again; null where it could. */
export function unreadable(
  query: UseQueryResult<unknown>,
  zone: string,
  { titleOf, act }: UnreadableWords = {},
): ReactNode {
  const { data, error } = query
  if (!isProblem(error)) return null
  const title = titleOf?.(error)
  return (
    <ListUnreadable
      title={title}
      why={title === error.title ? (error.detail ?? '') : error.says}
      code={error.requestId}
      oldFrom={data === undefined ? null : sayTime(new Date(query.dataUpdatedAt).toISOString(), zone)}
      onRetry={() => void query.refetch()}
      act={act}
    />
  )
}

/** What stands above an answer, or in its place: that it is being fetched, or cannot be read. Nothing once it is there. */
export function QueryStanding({
  query,
  what,
  rows,
  ...words
}: UnreadableWords & {
  query: UseQueryResult<unknown>
  /** What is fetched, for readers: "the weights". */
  what: string
  rows?: number
}) {
  const { zone } = useMe().facility
  if (query.isPending) return <ListFetching what={what} rows={rows} />
  return unreadable(query, zone, words)
}
