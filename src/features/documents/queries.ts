import { queryOptions } from '@tanstack/react-query'
import { checkFingerprint, getDocumentFile } from '../../../shared/contracts/documents.contract.ts'
import { addressOf, api } from '../../lib/api-client.ts'

/** Where the bytes of a paper are fetched. */
export const paperAddress = (id: string) => addressOf(getDocumentFile, { id })

export const checkQuery = (fingerprint: string) =>
  queryOptions({
    queryKey: ['checks', fingerprint],
    queryFn: ({ signal }) => api(checkFingerprint, { params: { fingerprint }, signal }),
    staleTime: 0,
  })
