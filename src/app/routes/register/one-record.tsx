import type { ReactNode } from 'react'
import type { UseQueryResult } from '@tanstack/react-query'
import { useMe } from '../../../lib/me.ts'
import type { ProblemError } from '../../../lib/problem-error.ts'
import { QueryStanding, unreadable } from '../../../lib/query-standing.tsx'
import { Area, Sheet } from '../../../ui/sheet.tsx'

/** What stands on the sheet of one record while it is fetched or when it cannot be read; else the record. */
export function OneRecord<T>({
  query,
  what,
  children,
}: {
  query: UseQueryResult<T>
  what: string
  children: (record: T, above: ReactNode) => ReactNode
}) {
  const { zone } = useMe().facility
  const { data } = query
  const titleOf = (problem: ProblemError) => problem.title
  if (data !== undefined) return children(data, unreadable(query, zone, { titleOf }))
  return (
    <Sheet recipe="plain">
      <Area className="pane">
        <QueryStanding query={query} what={what} titleOf={titleOf} />
      </Area>
    </Sheet>
  )
}
