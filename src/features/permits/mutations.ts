import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { enterPermit, explainPermitUse, voidPermit } from '../../../shared/contracts/permits.contract.ts'
import { api } from '../../lib/api-client.ts'
import { permitsKey } from './queries.ts'

function useReadAgain() {
  const client = useQueryClient()
  return () => client.invalidateQueries({ queryKey: permitsKey })
}

export function useEnterPermit() {
  const onSuccess = useReadAgain()
  return useMutation({
    mutationFn: (body: BodyOf<typeof enterPermit>) => api(enterPermit, { body }),
    onSuccess,
  })
}

export function useVoidPermit(number: string) {
  const onSuccess = useReadAgain()
  return useMutation({
    mutationFn: ({ reason, key }: { reason: string; key: string }) =>
      api(voidPermit, { params: { number }, body: { reason }, key }),
    onSuccess,
  })
}

export function useExplainUse(number: string) {
  const onSuccess = useReadAgain()
  return useMutation({
    mutationFn: ({ useId, reason, key }: { useId: string; reason: string; key: string }) =>
      api(explainPermitUse, { params: { number, useId }, body: { reason }, key }),
    onSuccess,
  })
}
