import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import {
  discontinueOrder,
  draftOrder,
  liftOrderHold,
  reviseDraft,
  signOrder,
} from '../../../shared/contracts/orders.contract.ts'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { api } from '../../lib/api-client.ts'
import { orderQuery, ordersKey } from './queries.ts'

/** Keeps the order as the server answered, and reads lists again. */
function useKeepOrder() {
  const client = useQueryClient()
  return async (order: Order) => {
    client.setQueryData(orderQuery(order.number).queryKey, order)
    await client.invalidateQueries({
      queryKey: ordersKey,
      predicate: (query) => query.queryKey[1] !== 'preview',
    })
  }
}

export function useDraftOrder() {
  const onSuccess = useKeepOrder()
  return useMutation({
    mutationFn: (body: { id: string; fields: BathOrderFields }) => api(draftOrder, { body }),
    onSuccess,
  })
}

export function useReviseDraft() {
  const onSuccess = useKeepOrder()
  return useMutation({
    mutationFn: ({ number, ...body }: { number: string } & BodyOf<typeof reviseDraft>) =>
      api(reviseDraft, { params: { number }, body }),
    onSuccess,
  })
}

export function useSignOrder() {
  const onSuccess = useKeepOrder()
  return useMutation({
    mutationFn: ({ number, key, ...body }: { number: string; key: string } & BodyOf<typeof signOrder>) =>
      api(signOrder, { params: { number }, body, key, patienceMs: 30_000 }),
    onSuccess,
  })
}

interface WithReason {
  reason: string
  key: string
}

export function useLiftHold(number: string) {
  const onSuccess = useKeepOrder()
  return useMutation({
    mutationFn: ({ reason, key }: WithReason) =>
      api(liftOrderHold, { params: { number }, body: { reason }, key }),
    onSuccess,
  })
}

export function useDiscontinue(number: string) {
  const onSuccess = useKeepOrder()
  return useMutation({
    mutationFn: ({ reason, key }: WithReason) =>
      api(discontinueOrder, { params: { number }, body: { reason }, key }),
    onSuccess,
  })
}
