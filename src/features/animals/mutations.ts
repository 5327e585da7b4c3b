import { useMutation, useQueryClient } from '@tanstack/react-query'
import * as contracts from '../../../shared/contracts/animal-records.contract.ts'
import type { BodyOf, Contract } from '../../../shared/contracts/contract.ts'
import { api } from '../../lib/api-client.ts'
import type { CallOptions } from '../../lib/api-client.ts'
import { animalsKey } from './queries.ts'

/** Records something of an animal as its contract says, then reads everything about animals again. */
function useAnimalMutation<C extends Contract, V>(of: C, callOf: (variables: V) => CallOptions<C>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (variables: V) => api(of, callOf(variables)),
    onSuccess: () => client.invalidateQueries({ queryKey: animalsKey }),
  })
}

export const useRecordWeight = (accession: string) =>
  useAnimalMutation(contracts.recordWeight, (body: BodyOf<typeof contracts.recordWeight>) => ({
    params: { accession },
    body,
  }))

export const useMoveAnimal = (accession: string) =>
  useAnimalMutation(contracts.moveAnimal, (body: BodyOf<typeof contracts.moveAnimal>) => ({
    params: { accession },
    body,
  }))

export const useRecordDeaths = (accession: string) =>
  useAnimalMutation(contracts.recordDeaths, (body: BodyOf<typeof contracts.recordDeaths>) => ({
    params: { accession },
    body,
  }))

export const useRecordBirths = (accession: string) =>
  useAnimalMutation(contracts.recordBirths, (body: BodyOf<typeof contracts.recordBirths>) => ({
    params: { accession },
    body,
  }))

export const useStateCount = (accession: string) =>
  useAnimalMutation(contracts.stateCount, (body: BodyOf<typeof contracts.stateCount>) => ({
    params: { accession },
    body,
  }))

export const useAdjustCount = (accession: string) =>
  useAnimalMutation(contracts.adjustCount, (body: BodyOf<typeof contracts.adjustCount>) => ({
    params: { accession },
    body,
  }))

export const useSplitGroup = (accession: string) =>
  useAnimalMutation(contracts.splitGroup, (body: BodyOf<typeof contracts.splitGroup>) => ({
    params: { accession },
    body,
  }))

export const useMergeGroup = (accession: string) =>
  useAnimalMutation(contracts.mergeGroup, (body: BodyOf<typeof contracts.mergeGroup>) => ({
    params: { accession },
    body,
  }))

export const useDescribeAnimal = (accession: string) =>
  useAnimalMutation(contracts.describeAnimal, (body: BodyOf<typeof contracts.describeAnimal>) => ({
    params: { accession },
    body,
  }))

export const useAddIdentifier = (accession: string) =>
  useAnimalMutation(contracts.addIdentifier, (body: BodyOf<typeof contracts.addIdentifier>) => ({
    params: { accession },
    body,
  }))

export const useSayFoodOrRelease = (accession: string) =>
  useAnimalMutation(contracts.sayFoodOrRelease, (body: BodyOf<typeof contracts.sayFoodOrRelease>) => ({
    params: { accession },
    body,
  }))

interface Command<B> {
  recordId: string
  key: string
  body: B
}

export const useEndIdentifier = (accession: string) =>
  useAnimalMutation(
    contracts.endIdentifier,
    ({ recordId, key, body }: Command<BodyOf<typeof contracts.endIdentifier>>) => ({
      params: { accession, recordId },
      key,
      body,
    }),
  )

const strikes = {
  weight: contracts.strikeWeight,
  move: contracts.strikeMove,
  death: contracts.strikeDeath,
  count: contracts.strikeCountLine,
} as const

export type StrikeKind = keyof typeof strikes

/** Strikes a line out, whatever ledger it stands in. */
export function useStrike(accession: string) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (given: { kind: StrikeKind; recordId: string; reason: string; key: string }) =>
      api(strikes[given.kind], {
        params: { accession, recordId: given.recordId },
        key: given.key,
        body: { reason: given.reason },
      }),
    onSuccess: () => client.invalidateQueries({ queryKey: animalsKey }),
  })
}

export const useResolveDiscrepancy = () =>
  useAnimalMutation(
    contracts.resolveDiscrepancy,
    ({ recordId, key, body }: Command<BodyOf<typeof contracts.resolveDiscrepancy>>) => ({
      params: { id: recordId },
      key,
      body,
    }),
  )
