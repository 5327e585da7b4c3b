import { useMutation, useQueryClient } from '@tanstack/react-query'
import type { BodyOf, Contract, ParamsOf } from '../../../shared/contracts/contract.ts'
import * as doses from '../../../shared/contracts/doses.contract.ts'
import { noteLotEvent } from '../../../shared/contracts/formulary.contract.ts'
import { api } from '../../lib/api-client.ts'
import type { CallOptions } from '../../lib/api-client.ts'
import { ordersKey } from '../orders/index.ts'
import { dosesKey } from './queries.ts'

/** An act at the tank: sends it as its contract says, then reads the sheet and the orders again. */
function useTankAct<C extends Contract, V>(of: C, callOf: (variables: V) => CallOptions<C>) {
  const client = useQueryClient()
  return useMutation({
    mutationFn: (variables: V) => api(of, callOf(variables)),
    onSuccess: async () => {
      await Promise.all([
        client.invalidateQueries({ queryKey: dosesKey }),
        client.invalidateQueries({ queryKey: ordersKey, refetchType: 'none' }),
      ])
    },
  })
}

interface DoseAddress {
  number: string
  key: string
}

export const useCalculateFirst = (params: DoseAddress) =>
  useTankAct(doses.calculateFirst, (body: BodyOf<typeof doses.calculateFirst>) => ({ params, body }))

export const useCalculateSecond = (params: DoseAddress) =>
  useTankAct(doses.calculateSecond, (body: BodyOf<typeof doses.calculateSecond>) => ({ params, body }))

export const useGiveDose = (params: DoseAddress) =>
  useTankAct(doses.giveDose, (body: BodyOf<typeof doses.giveDose>) => ({ params, body }))

export const useRecordDose = (params: DoseAddress) =>
  useTankAct(doses.recordDose, (body: BodyOf<typeof doses.recordDose>) => ({ params, body }))

export const useStopBath = () =>
  useTankAct(doses.stopBath, ({ doseId, ...body }: BodyOf<typeof doses.stopBath> & { doseId: string }) => ({
    params: { doseId },
    body,
  }))

export const useOverrideStop = (params: DoseAddress) =>
  useTankAct(
    doses.overrideDoseStop,
    ({ commandKey, ...body }: BodyOf<typeof doses.overrideDoseStop> & { commandKey: string }) => ({
      params,
      body,
      key: commandKey,
    }),
  )

export const useStrikeRecord = () =>
  useTankAct(
    doses.strikeDoseRecord,
    ({
      key,
      reason,
      ...params
    }: ParamsOf<typeof doses.strikeDoseRecord> & { key: string; reason: string }) => ({
      params,
      body: { reason },
      key,
    }),
  )

export const useNoteLot = () =>
  useTankAct(noteLotEvent, ({ lotId, ...body }: BodyOf<typeof noteLotEvent> & { lotId: string }) => ({
    params: { lotId },
    body,
  }))
