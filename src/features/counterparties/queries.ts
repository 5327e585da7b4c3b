import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { listCounterparties } from '../../../shared/contracts/counterparties.contract.ts'
import { api } from '../../lib/api-client.ts'

export const partiesKey = ['counterparties'] as const

export const partiesQuery = (query: Partial<QueryOf<typeof listCounterparties>>) =>
  queryOptions({
    queryKey: [...partiesKey, query],
    queryFn: ({ signal }) => api(listCounterparties, { query, signal }),
    placeholderData: keepPreviousData,
  })
