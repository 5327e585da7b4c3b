import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf } from '../../../shared/contracts/contract.ts'
import { correctCounterparty, enterCounterparty } from '../../../shared/contracts/counterparties.contract.ts'
import { api } from '../../lib/api-client.ts'
import { partiesKey } from './queries.ts'

export function useEnterParty() {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (body: BodyOf<typeof enterCounterparty>) => api(enterCounterparty, { body }),
    onSuccess: () => client.invalidateQueries({ queryKey: partiesKey }),
  })
}

export function useCorrectParty(id: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (body: BodyOf<typeof correctCounterparty>) =>
      api(correctCounterparty, { params: { id }, body }),
    onSuccess: () => client.invalidateQueries({ queryKey: partiesKey }),
  })
}
