import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { listNotices } from '../../../shared/contracts/notices.contract.ts'
import { listObservations } from '../../../shared/contracts/observations.contract.ts'
import { listProtocols } from '../../../shared/contracts/protocols.contract.ts'
import { getCase, listCases } from '../../../shared/contracts/quarantine.contract.ts'
import { api } from '../../lib/api-client.ts'

/** Everything about quarantine hangs below this key: whatever is recorded refreshes all of it. */
export const quarantineKey = ['quarantine'] as const

export type BoardQuery = QueryOf<typeof listCases>

export const boardQuery = (query: BoardQuery) =>
  queryOptions({
    queryKey: [...quarantineKey, 'board', query],
    queryFn: ({ signal }) => api(listCases, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const caseQuery = (number: string) =>
  queryOptions({
    queryKey: [...quarantineKey, 'case', number],
    queryFn: ({ signal }) => api(getCase, { params: { number }, signal }),
  })

const observationsAtOnce = 60

/** Observations of one case, or of all, the newest first; older ones a page at a time. */
export const observationsQuery = (number: string | undefined) =>
  infiniteQueryOptions({
    queryKey: [...quarantineKey, 'observations', number ?? 'all'],
    initialPageParam: undefined as string | undefined,
    queryFn: ({ signal, pageParam }) =>
      api(listObservations, {
        query: { case: number, cursor: pageParam, limit: observationsAtOnce },
        signal,
      }),
    getNextPageParam: (last) => last.nextCursor ?? undefined,
    placeholderData: keepPreviousData,
  })

export const openNoticesQuery = queryOptions({
  queryKey: [...quarantineKey, 'notices', 'open'],
  queryFn: async ({ signal }) => (await api(listNotices, { query: {}, signal })).rows,
  refetchInterval: 30_000,
})

export const protocolsQuery = queryOptions({
  queryKey: [...quarantineKey, 'protocols'],
  queryFn: async ({ signal }) => (await api(listProtocols, { signal })).rows,
  staleTime: 5 * 60_000,
})
