import { infiniteQueryOptions, keepPreviousData, queryOptions } from '@tanstack/react-query'
import {
  getAnimal,
  listAnimalLog,
  listAnimals,
  listCounts,
  listInhabitants,
  listMoves,
  listWeights,
} from '../../../shared/contracts/animals.contract.ts'
import type { QueryOf } from '../../../shared/contracts/contract.ts'
import { listCasesInWater } from '../../../shared/contracts/water-cases.contract.ts'
import { api } from '../../lib/api-client.ts'

/** Everything about animals hangs below this key: whatever is recorded refreshes all of it. */
export const animalsKey = ['animals'] as const

export type AnimalListQuery = QueryOf<typeof listAnimals>

export const animalListQuery = (query: AnimalListQuery) =>
  queryOptions({
    queryKey: [...animalsKey, 'list', query],
    queryFn: ({ signal }) => api(listAnimals, { query, signal }),
    placeholderData: keepPreviousData,
  })

export const animalQuery = (accession: string) =>
  queryOptions({
    queryKey: [...animalsKey, 'one', accession],
    queryFn: ({ signal }) => api(getAnimal, { params: { accession }, signal }),
  })

export const weightsQuery = (accession: string) =>
  queryOptions({
    queryKey: [...animalsKey, 'weights', accession],
    queryFn: async ({ signal }) => (await api(listWeights, { params: { accession }, signal })).rows,
  })

export const movesQuery = (accession: string) =>
  queryOptions({
    queryKey: [...animalsKey, 'moves', accession],
    queryFn: async ({ signal }) => (await api(listMoves, { params: { accession }, signal })).rows,
  })

export const countsQuery = (accession: string) =>
  queryOptions({
    queryKey: [...animalsKey, 'counts', accession],
    queryFn: ({ signal }) => api(listCounts, { params: { accession }, signal }),
  })

/** Below the key of quarantine: what is recorded of a case refreshes it. */
export const casesInWaterQuery = (enclosureId: string) =>
  queryOptions({
    queryKey: ['quarantine', 'in-water', enclosureId],
    queryFn: async ({ signal }) =>
      (await api(listCasesInWater, { params: { id: enclosureId }, signal })).rows,
  })

const logPage = 40

export const animalLogQuery = (accession: string) =>
  infiniteQueryOptions({
    queryKey: [...animalsKey, 'log', accession],
    initialPageParam: undefined as string | undefined,
    queryFn: ({ signal, pageParam }) =>
      api(listAnimalLog, { params: { accession }, query: { cursor: pageParam, limit: logPage }, signal }),
    getNextPageParam: (last) => last.nextCursor ?? undefined,
  })

/** Who is in an enclosure now. */
export const inhabitantsQuery = (code: string, at?: string) =>
  queryOptions({
    queryKey: [...animalsKey, 'inhabitants', code, at ?? null],
    queryFn: ({ signal }) => api(listInhabitants, { params: { code }, query: { at }, signal }),
  })
