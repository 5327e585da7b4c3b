import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import {
  correctEnclosure,
  enterEnclosure,
  enterWaterBody,
} from '../../../shared/contracts/enclosures.contract.ts'
import { api } from '../../lib/api-client.ts'

/** Places are part of almost every screen about animals and water, so everything read from them is read again. */
function useReadPlacesAgain() {
  const client = useQueryClient()
  return () => client.invalidateQueries({ predicate: ({ queryKey }) => queryKey[0] !== 'me' })
}

export function useEnterEnclosure() {
  const onSuccess = useReadPlacesAgain()
  return useMutation({
    mutationFn: (body: BodyOf<typeof enterEnclosure>) => api(enterEnclosure, { body }),
    onSuccess,
  })
}

export function useCorrectEnclosure(code: string) {
  const onSuccess = useReadPlacesAgain()
  return useMutation({
    mutationFn: (body: BodyOf<typeof correctEnclosure>) => api(correctEnclosure, { params: { code }, body }),
    onSuccess,
  })
}

export function useEnterWaterBody() {
  const onSuccess = useReadPlacesAgain()
  return useMutation({
    mutationFn: (body: BodyOf<typeof enterWaterBody>) => api(enterWaterBody, { body }),
    onSuccess,
  })
}
