import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { find } from '../../../shared/contracts/find.contract.ts'
import { todayAddresses } from '../../../shared/contracts/today.addresses.ts'
import { api } from '../../lib/api-client.ts'

/** What a text is found in; what was found before stays while more of it is typed. */
export const findQuery = (text: string) =>
  queryOptions({
    queryKey: ['find', text],
    queryFn: ({ signal }) => api<typeof find>(todayAddresses.find, { query: { q: text }, signal }),
    placeholderData: keepPreviousData,
  })
