import type { ReactNode } from 'react'
import type { UseQueryResult } from '@tanstack/react-query'
import { sayTime } from '../../../../shared/messages/say-date.ts'
import { useMe } from '../../../lib/me.ts'
import { isProblem } from '../../../lib/problem-error.ts'
import { ListFetching, ListUnreadable } from '../../../ui/list-states.tsx'
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
  const { data, error } = query
  const unreadable = isProblem(error) ? (
    <ListUnreadable
      title={error.title}
      why={error.detail ?? ''}
      code={error.requestId}
      oldFrom={data === undefined ? null : sayTime(new Date(query.dataUpdatedAt).toISOString(), zone)}
      onRetry={() => void query.refetch()}
    />
  ) : null
  if (data !== undefined) return children(data, unreadable)
  return (
    <Sheet recipe="plain">
      <Area className="pane">{unreadable ?? <ListFetching what={what} />}</Area>
    </Sheet>
  )
}
