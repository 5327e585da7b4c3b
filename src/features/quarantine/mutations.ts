import { useMutation, useQueryClient } from '@tanstack/react-query'
import * as events from '../../../shared/contracts/case-events.contract.ts'
import { clearCase } from '../../../shared/contracts/clearance.contract.ts'
import type { BodyOf, Contract } from '../../../shared/contracts/contract.ts'
import {
  nameBodies,
  reviewObservation,
  voidObservation,
} from '../../../shared/contracts/observations.contract.ts'
import * as cases from '../../../shared/contracts/quarantine.contract.ts'
import { api } from '../../lib/api-client.ts'
import type { CallOptions } from '../../lib/api-client.ts'
import { newId } from '../../lib/new-id.ts'
import { quarantineKey } from './queries.ts'

/** Records something of a case as its contract says, then reads everything about quarantine again. */
function useQuarantineMutation<C extends Contract, V>(of: C, callOf: (variables: V) => CallOptions<C>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (variables: V) => api(of, callOf(variables)),
    onSuccess: async () => {
      await client.invalidateQueries({ queryKey: quarantineKey })
    },
  })
}

export const useOpenCase = () =>
  useQuarantineMutation(cases.openCase, (body: BodyOf<typeof cases.openCase>) => ({ body }))

export const useAddMember = (number: string) =>
  useQuarantineMutation(cases.addMember, (body: BodyOf<typeof cases.addMember>) => ({
    params: { number },
    body,
  }))

export const useCloseCase = (number: string) =>
  useQuarantineMutation(cases.closeCase, (body: BodyOf<typeof cases.closeCase>) => ({
    params: { number },
    body,
  }))

export const useReportEvent = (number: string) =>
  useQuarantineMutation(events.reportEvent, (body: BodyOf<typeof events.reportEvent>) => ({
    params: { number },
    body,
  }))

export const useDecideEvent = (number: string) =>
  useQuarantineMutation(events.decideEvent, (body: BodyOf<typeof events.decideEvent>) => ({
    params: { number },
    body,
  }))

export const useEnterResult = (number: string) =>
  useQuarantineMutation(events.enterResult, (body: BodyOf<typeof events.enterResult>) => ({
    params: { number },
    body,
  }))

export const useRecordStep = (number: string) =>
  useQuarantineMutation(events.recordStep, (body: BodyOf<typeof events.recordStep>) => ({
    params: { number },
    body,
  }))

export const useLockCase = (number: string) =>
  useQuarantineMutation(events.lockCase, (body: BodyOf<typeof events.lockCase>) => ({
    params: { number },
    body,
  }))

export const useLiftLock = (number: string) =>
  useQuarantineMutation(events.liftLock, (body: BodyOf<typeof events.liftLock>) => ({
    params: { number },
    body,
  }))

interface Command<B> {
  key: string
  body: B
}

export const useSignDeathCause = (number: string, deathId: string) =>
  useQuarantineMutation(
    events.signDeathCause,
    ({ key, body }: Command<BodyOf<typeof events.signDeathCause>>) => ({
      params: { number, deathId },
      key,
      body,
    }),
  )

export const useClearCase = (number: string) =>
  useQuarantineMutation(clearCase, ({ key, body }: Command<BodyOf<typeof clearCase>>) => ({
    params: { number },
    key,
    body,
  }))

/** A veterinarian has read an observation. */
export const useReviewObservation = () =>
  useQuarantineMutation(reviewObservation, (id: string) => ({ params: { id }, body: { id: newId() } }))

export const useNameBodies = (id: string) =>
  useQuarantineMutation(nameBodies, (body: BodyOf<typeof nameBodies>) => ({ params: { id }, body }))

export const useStrikeObservation = (id: string) =>
  useQuarantineMutation(voidObservation, ({ reason, key }: { reason: string; key: string }) => ({
    params: { id },
    key,
    body: { reason },
  }))
