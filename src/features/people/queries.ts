import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { getPerson, listPeople } from '../../../shared/contracts/people.contract.ts'
import { api } from '../../lib/api-client.ts'

/** Everything about people hangs below this key. */
export const peopleKey = ['people'] as const
export type PeopleQuery = QueryOf<typeof listPeople>

export const peopleListQuery = (query: PeopleQuery) =>
  queryOptions({
    queryKey: [...peopleKey, 'list', query],
    queryFn: ({ signal }) => api(listPeople, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const personQuery = (id: string) =>
  queryOptions({
    queryKey: [...peopleKey, 'one', id],
    queryFn: ({ signal }) => api(getPerson, { params: { id }, signal }),
  })
