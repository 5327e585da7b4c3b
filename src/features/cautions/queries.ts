import { queryOptions } from '@tanstack/react-query'
import { listCautionRules } from '../../../shared/contracts/caution-rules.contract.ts'
import { api } from '../../lib/api-client.ts'

export const cautionRulesKey = ['caution-rules'] as const

/** Every rule as this facility has it: few enough to be held here. */
export const cautionRulesQuery = queryOptions({
  queryKey: cautionRulesKey,
  queryFn: async ({ signal }) => (await api(listCautionRules, { signal })).rules,
})
