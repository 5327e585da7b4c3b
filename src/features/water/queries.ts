import { keepPreviousData, queryOptions } from '@tanstack/react-query'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { getWaterMap } from '../../../shared/contracts/water-map.contract.ts'
import { listVolumes } from '../../../shared/contracts/water-volumes.contract.ts'
import { getWaterOfEnclosure, listReadings, listWater } from '../../../shared/contracts/water.contract.ts'
import type { ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { api } from '../../lib/api-client.ts'

/** Everything about water hangs below this key: whatever is recorded refreshes all of it. */
export const waterKey = ['water'] as const

export type WaterListQuery = QueryOf<typeof listWater>
export type ReadingListQuery = QueryOf<typeof listReadings>

export const waterListQuery = (query: WaterListQuery) =>
  queryOptions({
    queryKey: [...waterKey, 'list', query],
    queryFn: ({ signal }) => api(listWater, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const enclosureWaterQuery = (code: string, asOf?: string) =>
  queryOptions({
    queryKey: [...waterKey, 'enclosure', code, asOf ?? null],
    queryFn: ({ signal }) => api(getWaterOfEnclosure, { params: { code }, query: { asOf }, signal }),
  })

export const readingListQuery = (code: string, query: ReadingListQuery) =>
  queryOptions({
    queryKey: [...waterKey, 'readings', code, query],
    queryFn: ({ signal }) => api(listReadings, { params: { code }, query, signal }),
    placeholderData: keepPreviousData,
  })

const pageSize = 200
const mostPages = 10

/** All readings of an enclosure from an instant on, for drawing; a denser record than 2,000 is cut at its old end. */
export const readingSeriesQuery = (code: string, from: string) =>
  queryOptions({
    queryKey: [...waterKey, 'series', code, from],
    queryFn: async ({ signal }) => {
      const rows: ReadingRow[] = []
      let cursor: string | undefined
      for (let page = 0; page < mostPages; page++) {
        const query = { from, limit: pageSize, cursor }
        const reply = await api(listReadings, { params: { code }, query, signal })
        rows.push(...reply.rows)
        if (reply.nextCursor === null) break
        cursor = reply.nextCursor
      }
      return rows
    },
    staleTime: 60_000,
  })

export const volumesQuery = (code: string) =>
  queryOptions({
    queryKey: [...waterKey, 'volumes', code],
    queryFn: async ({ signal }) => (await api(listVolumes, { params: { code }, signal })).volumes,
  })

export const waterMapQuery = () =>
  queryOptions({
    queryKey: [...waterKey, 'map'],
    queryFn: ({ signal }) => api(getWaterMap, { query: {}, signal }),
  })
