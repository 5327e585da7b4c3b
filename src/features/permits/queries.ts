import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { getPermit, listPermits, listPermitsCsv } from '../../../shared/contracts/permits.contract.ts'
import { addressOf, api } from '../../lib/api-client.ts'

export const permitsKey = ['permits'] as const

export type PermitsAsked = Partial<QueryOf<typeof listPermits>>

export const permitsQuery = (query: PermitsAsked) =>
  queryOptions({
    queryKey: [...permitsKey, 'list', query],
    queryFn: ({ signal }) => api(listPermits, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const permitQuery = (number: string) =>
  queryOptions({
    queryKey: [...permitsKey, number],
    queryFn: ({ signal }) => api(getPermit, { params: { number }, signal }),
  })

/** The file of the list as it is shown: the same search, filters and sort, every page. */
export function permitsCsvAddress(asked: PermitsAsked, guarded: boolean): string {
  const { cursor: _cursor, limit: _limit, ...shown } = asked
  return addressOf(listPermitsCsv, {}, { ...shown, guarded: guarded ? 'yes' : undefined })
}
