import { queryOptions } from '@tanstack/react-query'
import { getFormulary } from '../../../shared/contracts/formulary.contract.ts'
import { api } from '../../lib/api-client.ts'

export const formularyKey = ['formulary'] as const

/** Dose lines in force and products with their lots: few enough to be held here. */
export const formularyQuery = queryOptions({
  queryKey: formularyKey,
  queryFn: ({ signal }) => api(getFormulary, { signal }),
  staleTime: 60_000,
})
