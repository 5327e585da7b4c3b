import { holdCase } from '../../../shared/contracts/case-events.contract.ts'
import type { BodyOf, Contract } from '../../../shared/contracts/contract.ts'
import { noteTelephoned } from '../../../shared/contracts/notices.contract.ts'
import { recordObservation } from '../../../shared/contracts/observations.contract.ts'
import type { Address } from '../../lib/api-client.ts'
import { newId } from '../../lib/new-id.ts'
import type { NewItem } from '../../lib/outbox.ts'
import { thisDevice } from '../../lib/this-device.ts'
import type { ObservationBody } from './observation-draft.ts'

const addressOf = ({ id, method, path, idempotent }: Contract): Address => ({ id, method, path, idempotent })

/** What can be entered at the tank without a signal, as entries of the outbox. */
export const entries = {
  observation: (personId: string, label: string, body: ObservationBody): NewItem => ({
    id: body.id,
    personId,
    madeAt: body.happenedAt,
    kind: 'observation',
    label,
    address: addressOf(recordObservation),
    params: {},
    body,
  }),

  hold(personId: string, number: string, reason: string | undefined): NewItem {
    const body: BodyOf<typeof holdCase> = {
      id: newId(),
      happenedAt: new Date().toISOString(),
      origin: navigator.onLine ? 'online' : 'outbox',
      device: thisDevice(),
      ...(reason === undefined ? {} : { reason }),
    }
    return {
      id: body.id,
      personId,
      madeAt: body.happenedAt,
      kind: 'hold',
      label: number,
      address: addressOf(holdCase),
      params: { number },
      body,
    }
  },

  telephoned(personId: string, label: string, noticeId: string, whom: string | undefined): NewItem {
    const body: BodyOf<typeof noteTelephoned> = {
      id: newId(),
      happenedAt: new Date().toISOString(),
      ...(whom === undefined ? {} : { whom }),
    }
    return {
      id: body.id,
      personId,
      madeAt: body.happenedAt,
      kind: 'telephoned',
      label,
      address: addressOf(noteTelephoned),
      params: { id: noticeId },
      body,
    }
  },
}
