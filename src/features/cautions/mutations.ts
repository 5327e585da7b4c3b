import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf, ParamsOf } from '../../../shared/contracts/contract.ts'
import {
  confirmRuleParameter,
  proposeRuleParameter,
} from '../../../shared/contracts/caution-rules.contract.ts'
import { api } from '../../lib/api-client.ts'
import { cautionRulesKey } from './queries.ts'

/** The rules are read again after a refusal too: most say that somebody else was there first. */
function useReadAgain() {
  const client = useQueryClient()
  return () => client.invalidateQueries({ queryKey: cautionRulesKey })
}

export function usePropose(params: ParamsOf<typeof proposeRuleParameter>) {
  const onSettled = useReadAgain()
  return useMutation({
    mutationFn: (body: BodyOf<typeof proposeRuleParameter>) => api(proposeRuleParameter, { params, body }),
    onSettled,
  })
}

export function useConfirm(params: ParamsOf<typeof confirmRuleParameter>) {
  const onSettled = useReadAgain()
  return useMutation({
    mutationFn: ({ key, ...body }: BodyOf<typeof confirmRuleParameter> & { key: string }) =>
      api(confirmRuleParameter, { params, body, key }),
    onSettled,
  })
}
