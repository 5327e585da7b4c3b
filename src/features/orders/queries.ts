import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { getBathSheet } from '../../../shared/contracts/doses.contract.ts'
import {
  getOrder,
  listOrders,
  listOrdersCsv,
  previewOrder,
  printOrder,
  printOrderLabel,
} from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { previewWeightOrder } from '../../../shared/contracts/weight-orders.contract.ts'
import type { WeightOrderFields } from '../../../shared/contracts/weight-orders.contract.ts'
import { addressOf, api } from '../../lib/api-client.ts'

export const ordersKey = ['orders'] as const
export const previewsKey = [...ordersKey, 'preview'] as const

export type OrdersAsked = Partial<QueryOf<typeof listOrders>>

export const ordersQuery = (query: OrdersAsked) =>
  queryOptions({
    queryKey: [...ordersKey, 'list', query],
    queryFn: ({ signal }) => api(listOrders, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const orderQuery = (number: string) =>
  queryOptions({
    queryKey: [...ordersKey, 'one', number],
    queryFn: ({ signal }) => api(getOrder, { params: { number }, signal }),
  })

/** The same with its amount, for whoever will not be the second person; the server remembers who asked. */
export const showAmount = (number: string) =>
  api(getOrder, { params: { number }, query: { amounts: 'yes' as const } })

/** One planned dose judged by the water as it is now: where the recomputed amount comes from. */
export const doseNowQuery = (number: string, key: string) =>
  queryOptions({
    queryKey: [...ordersKey, 'now', number, key],
    queryFn: ({ signal }) => api(getBathSheet, { params: { number, key }, query: {}, signal }),
  })

/** An order worked out and judged as it is being written; nothing is kept. */
export const previewQuery = (fields: BathOrderFields | null, order: string | undefined) =>
  queryOptions({
    queryKey: [...previewsKey, fields, order],
    queryFn: ({ signal }) => {
      if (!fields) throw new Error('Nothing to judge yet')
      return api(previewOrder, { body: fields, query: order === undefined ? {} : { order }, signal })
    },
    enabled: fields !== null,
    placeholderData: keepPreviousData,
    staleTime: 15_000,
  })

/** A dose by weight worked out and judged; nothing is kept. */
export const weightPreviewQuery = (fields: WeightOrderFields | null) =>
  queryOptions({
    queryKey: [...previewsKey, 'by-weight', fields],
    queryFn: ({ signal }) => {
      if (!fields) throw new Error('Nothing to judge yet')
      return api(previewWeightOrder, { body: fields, signal })
    },
    enabled: fields !== null,
    placeholderData: keepPreviousData,
    staleTime: 15_000,
  })

/** The file of the list as it is shown: the same search, filters and sort, every page. */
export function ordersCsvAddress(asked: OrdersAsked): string {
  const { cursor: _cursor, limit: _limit, ...shown } = asked
  return addressOf(listOrdersCsv, {}, shown)
}

export const labelAddress = (number: string): string => addressOf(printOrderLabel, { number })

export const printAddress = (number: string, version: number): string =>
  addressOf(printOrder, { number }, { version })
