import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import { getExportFile, getHistory, listExports } from '../../../shared/contracts/exports.contract.ts'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { addressOf, api } from '../../lib/api-client.ts'

export const exportsKey = ['exports'] as const
export const historyKey = ['history'] as const

export interface PeriodGiven {
  from?: string | undefined
  until?: string | undefined
}

export const historyQuery = (accession: string, period: PeriodGiven) =>
  queryOptions({
    queryKey: [...historyKey, accession, period],
    queryFn: ({ signal }) => api(getHistory, { params: { accession }, query: period, signal }),
    placeholderData: keepPreviousData,
  })

export const exportsQuery = (query: Partial<QueryOf<typeof listExports>>) =>
  queryOptions({
    queryKey: [...exportsKey, query],
    queryFn: ({ signal }) => api(listExports, { query, signal }),
    placeholderData: keepPreviousData,
  })

/** Where the bytes of an export are fetched. */
export const exportAddress = (id: string) => addressOf(getExportFile, { id })
