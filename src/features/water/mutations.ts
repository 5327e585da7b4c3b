import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf, Contract } from '../../../shared/contracts/contract.ts'
import * as map from '../../../shared/contracts/water-map.contract.ts'
import * as volumes from '../../../shared/contracts/water-volumes.contract.ts'
import * as water from '../../../shared/contracts/water.contract.ts'
import { api } from '../../lib/api-client.ts'
import type { CallOptions } from '../../lib/api-client.ts'
import { waterKey } from './queries.ts'

/** A change of the water: sends it as its contract says, then reads everything about water again. */
function useWaterMutation<C extends Contract, V>(of: C, callOf: (variables: V) => CallOptions<C>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (variables: V) => api(of, callOf(variables)),
    onSuccess: () => client.invalidateQueries({ queryKey: waterKey }),
  })
}

export const useRecordReadings = () =>
  useWaterMutation(water.recordReadings, (body: BodyOf<typeof water.recordReadings>) => ({ body }))

export const useSetRange = (code: string) =>
  useWaterMutation(water.setRange, (body: BodyOf<typeof water.setRange>) => ({ params: { code }, body }))

export const useRecordWaterEvent = () =>
  useWaterMutation(water.recordWaterEvent, (body: BodyOf<typeof water.recordWaterEvent>) => ({ body }))

export type VoidableKind = (typeof water.waterRecordKinds)[number]

export const useVoidRecord = () =>
  useWaterMutation(
    water.voidWaterRecord,
    (given: { kind: VoidableKind; id: string; reason: string; key: string }) => ({
      params: { kind: given.kind, id: given.id },
      body: { reason: given.reason },
      key: given.key,
    }),
  )

export const useRecordConnectionState = () =>
  useWaterMutation(
    map.recordConnectionState,
    ({ connectionId, ...body }: BodyOf<typeof map.recordConnectionState> & { connectionId: string }) => ({
      params: { id: connectionId },
      body,
    }),
  )

export const useRecordLifeSupportState = () =>
  useWaterMutation(
    map.recordLifeSupportState,
    ({ unitId, ...body }: BodyOf<typeof map.recordLifeSupportState> & { unitId: string }) => ({
      params: { id: unitId },
      body,
    }),
  )

export const useEnterConnection = () =>
  useWaterMutation(map.enterConnection, (body: BodyOf<typeof map.enterConnection>) => ({ body }))

export const useEnterLifeSupport = () =>
  useWaterMutation(map.enterLifeSupport, (body: BodyOf<typeof map.enterLifeSupport>) => ({ body }))

export const useCorrectConnection = () =>
  useWaterMutation(
    map.correctConnection,
    ({ connectionId, ...body }: BodyOf<typeof map.correctConnection> & { connectionId: string }) => ({
      params: { id: connectionId },
      body,
    }),
  )

export const useRecordIsolation = () =>
  useWaterMutation(map.recordIsolation, (body: BodyOf<typeof map.recordIsolation>) => ({ body }))

export const useRecordIsolationTest = () =>
  useWaterMutation(
    map.recordIsolationTest,
    ({ isolationId, ...body }: BodyOf<typeof map.recordIsolationTest> & { isolationId: string }) => ({
      params: { id: isolationId },
      body,
    }),
  )

export const useEndIsolation = () =>
  useWaterMutation(
    map.endIsolation,
    ({ isolationId, ...body }: BodyOf<typeof map.endIsolation> & { isolationId: string }) => ({
      params: { id: isolationId },
      body,
    }),
  )

export const useDetermineVolume = (code: string) =>
  useWaterMutation(volumes.determineVolume, (body: BodyOf<typeof volumes.determineVolume>) => ({
    params: { code },
    body,
  }))

export const useConfirmVolume = () =>
  useWaterMutation(
    volumes.confirmVolume,
    ({ id, key, ...body }: { id: string; key: string } & BodyOf<typeof volumes.confirmVolume>) => ({
      params: { id },
      body,
      key,
    }),
  )

export const useVoidVolume = () =>
  useWaterMutation(volumes.voidVolume, (given: { id: string; reason: string; key: string }) => ({
    params: { id: given.id },
    body: { reason: given.reason },
    key: given.key,
  }))
