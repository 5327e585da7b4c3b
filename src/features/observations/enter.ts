import type { QueryClient } from '@tanstack/react-query'
import { outbox } from '../../lib/outbox.ts'
import type { NewItem } from '../../lib/outbox.ts'

export type Fate = 'sent' | 'kept' | 'refused'

/**
 * Keeps an entry on the device, then tries to send it with everything before it.
 *
 * @returns what became of it by then; kept and refused entries stay on this device
 */
export async function enterAndSend(client: QueryClient, item: NewItem): Promise<Fate> {
  await outbox.enter(item)
  await outbox.flush(item.personId)
  // a sending that was under way already may have begun before this entry was there
  if (stateOf(item.id) === 'waiting' && outbox.now().downSince === null) await outbox.flush(item.personId)
  const state = stateOf(item.id)
  if (state === undefined) await client.invalidateQueries({ queryKey: ['quarantine'] })
  return state === undefined ? 'sent' : state === 'refused' ? 'refused' : 'kept'
}

/** Why the server did not take an entry; undefined unless it was refused. */
export const refusalOf = (id: string): string | undefined =>
  outbox.now().items.find((one) => one.id === id)?.refusal?.says

const stateOf = (id: string) => outbox.now().items.find((one) => one.id === id)?.state
