import { queryOptions } from '@tanstack/react-query'
import type { ReplyOf } from '../../shared/contracts/contract.ts'
import { todayAddresses } from '../../shared/contracts/today.addresses.ts'
import type { getToday } from '../../shared/contracts/today.contract.ts'
import { api } from './api-client.ts'

export type TodayReply = ReplyOf<typeof getToday>

const lookEveryMs = 60_000

/** Everything about the worklist hangs below this key. */
export const todayKey = ['today'] as const

/** The worklist of the signed-in person; the hour ruler and Today draw the same one. Looked up again every minute. */
export const todayQuery = queryOptions({
  queryKey: todayKey,
  queryFn: ({ signal }) => api<typeof getToday>(todayAddresses.getToday, { signal }),
  staleTime: 0,
  refetchInterval: lookEveryMs,
  refetchOnWindowFocus: true,
})
