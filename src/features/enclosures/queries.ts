import { queryOptions } from '@tanstack/react-query'
import { getEnclosure } from '../../../shared/contracts/enclosures.contract.ts'
import { api } from '../../lib/api-client.ts'

export const enclosureKey = ['enclosures'] as const

export const enclosureQuery = (code: string) =>
  queryOptions({
    queryKey: [...enclosureKey, code],
    queryFn: ({ signal }) => api(getEnclosure, { params: { code }, signal }),
  })
