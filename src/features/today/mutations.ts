import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { noteHandoverRead, writeHandover } from '../../../shared/contracts/handover.contract.ts'
import type { noteSeen } from '../../../shared/contracts/notices.contract.ts'
import type { reviewObservation } from '../../../shared/contracts/observations.contract.ts'
import type { liftOrderHold } from '../../../shared/contracts/orders.contract.ts'
import { actAddresses } from '../../../shared/contracts/today.addresses.ts'
import { api } from '../../lib/api-client.ts'

/** What was done here may stand on any other sheet too, so everything read is looked up again where it is shown. */
function useRefresh() {
  const client = useQueryClient()
  return () => client.invalidateQueries()
}

export function useMarkSeen() {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (given: { noticeId: string; id: string }) =>
      api<typeof noteSeen>(actAddresses.noteSeen, {
        params: { id: given.noticeId },
        body: { id: given.id },
      }),
    onSuccess,
  })
}

export function useMarkRead() {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (given: { observationId: string; id: string }) =>
      api<typeof reviewObservation>(actAddresses.reviewObservation, {
        params: { id: given.observationId },
        body: { id: given.id },
      }),
    onSuccess,
  })
}

export function useLiftOrder() {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (given: { number: string; reason: string; key: string }) =>
      api<typeof liftOrderHold>(actAddresses.liftOrderHold, {
        params: { number: given.number },
        body: { reason: given.reason },
        key: given.key,
      }),
    onSuccess,
  })
}

export function useWriteHandover() {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (given: { id: string; about: string; words: string }) =>
      api<typeof writeHandover>(actAddresses.writeHandover, {
        body: { id: given.id, words: given.words, ...(given.about === '' ? {} : { about: given.about }) },
      }),
    onSuccess,
  })
}

export function useMarkHandoverRead() {
  const onSuccess = useRefresh()
  return useMutation({
    mutationFn: (given: { noteId: string; id: string }) =>
      api<typeof noteHandoverRead>(actAddresses.noteHandoverRead, {
        params: { id: given.noteId },
        body: { id: given.id },
      }),
    onSuccess,
  })
}
