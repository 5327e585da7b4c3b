import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { confirmDoseLine, noteLotEvent } from '../../../shared/contracts/formulary.contract.ts'
import { api } from '../../lib/api-client.ts'
import { formularyKey } from './queries.ts'

function useReadAgain() {
  const client = useQueryClient()
  return () => client.invalidateQueries({ queryKey: formularyKey })
}

export function useConfirmLine(id: string) {
  const onSuccess = useReadAgain()
  return useMutation({
    mutationFn: ({ reason, key }: { reason: string; key: string }) =>
      api(confirmDoseLine, { params: { id }, body: { reason }, key }),
    onSuccess,
  })
}

export function useNoteLot(lotId: string) {
  const onSuccess = useReadAgain()
  return useMutation({
    mutationFn: (body: BodyOf<typeof noteLotEvent>) => api(noteLotEvent, { params: { lotId }, body }),
    onSuccess,
  })
}
