import type { BodyOf } from '../../shared/contracts/contract.ts'
import type { stopBath } from '../../shared/contracts/doses.contract.ts'
import type { holdOrder } from '../../shared/contracts/orders.contract.ts'
import { actAddresses } from '../../shared/contracts/today.addresses.ts'
import { useOutbox } from './use-outbox.ts'
import type { NewItem } from './outbox.ts'
import type { OutboxItem } from './outbox-store.ts'

/** Stopping a bath and holding an order, as entries of the outbox: neither waits for a signal. */
export const stopEntries = {
  stopBath: (personId: string, label: string, doseId: string, body: BodyOf<typeof stopBath>): NewItem => ({
    id: body.id,
    personId,
    madeAt: body.happenedAt,
    kind: 'bath-stop',
    label,
    address: actAddresses.stopBath,
    params: { doseId },
    body,
  }),

  holdOrder: (personId: string, number: string, body: BodyOf<typeof holdOrder>): NewItem => ({
    id: body.id,
    personId,
    madeAt: body.happenedAt,
    kind: 'order-hold',
    label: number,
    address: actAddresses.holdOrder,
    params: { number },
    body,
  }),
}

/** The newest stop of a bath or hold of an order that is on this device and not with the server. */
export function useUnsent(of: { doseId: string | null } | { number: string }): OutboxItem | null {
  const { waiting, refused } = useOutbox()
  const kind = 'number' in of ? 'order-hold' : 'bath-stop'
  const named = 'number' in of ? of.number : of.doseId
  const own = [...waiting, ...refused].filter(
    (item) => item.kind === kind && (item.params['number'] ?? item.params['doseId']) === named,
  )
  return own.at(-1) ?? null
}
