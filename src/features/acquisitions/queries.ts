import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import {
  getTransaction,
  listTransactions,
  listTransactionsCsv,
} from '../../../shared/contracts/acquisitions.contract.ts'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import type { ListState } from '../../lib/list-state.ts'
import { addressOf, api } from '../../lib/api-client.ts'

export const transactionsKey = ['transactions'] as const

export type TransactionsAsked = Partial<QueryOf<typeof listTransactions>>

/** What the address asks of the list of transactions. */
export function transactionsAsked(list: Pick<ListState, 'get' | 'cursor'>): TransactionsAsked {
  return {
    q: list.get('q'),
    way: list.get('way') as TransactionsAsked['way'],
    kind: list.get('kind') as TransactionsAsked['kind'],
    voided: list.get('voided') as TransactionsAsked['voided'],
    open: list.get('open') === 'yes' ? 'yes' : undefined,
    from: list.get('since'),
    until: list.get('until'),
    sort: list.get('sort') as TransactionsAsked['sort'],
    direction: list.get('direction') as TransactionsAsked['direction'],
    cursor: list.cursor,
  }
}

export const transactionsQuery = (query: TransactionsAsked) =>
  queryOptions({
    queryKey: [...transactionsKey, 'list', query],
    queryFn: ({ signal }) => api(listTransactions, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const transactionQuery = (number: string) =>
  queryOptions({
    queryKey: [...transactionsKey, number],
    queryFn: ({ signal }) => api(getTransaction, { params: { number }, signal }),
  })

/** The file of the list as it is shown: the same search, filters and sort, every page. */
export function transactionsCsvAddress(asked: TransactionsAsked, guarded: boolean): string {
  const { cursor: _cursor, limit: _limit, ...shown } = asked
  return addressOf(listTransactionsCsv, {}, { ...shown, guarded: guarded ? 'yes' : undefined })
}
