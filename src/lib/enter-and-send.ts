import type { QueryClient, QueryKey } from '@tanstack/react-query'
import { outbox } from './outbox.ts'
import type { NewItem } from './outbox.ts'

export type Fate = 'sent' | 'kept' | 'refused'

/** Nobody who has just stopped something stands and waits for a server that does not answer. */
const patienceMs = 4_000

/**
 * Keeps an entry on the device, then tries to send it with everything before it. It is safe from the first step on: when
 * sending takes long, it goes on by itself.
 *
 * @param touched what has to be read again once it is sent
 * @returns what became of it by then; kept and refused entries stay on this device
 */
export async function enterAndSend(
  client: QueryClient,
  item: NewItem,
  touched: readonly QueryKey[] = [['quarantine']],
): Promise<Fate> {
  await outbox.enter(item)
  const sending = sendIt(item).then(async () => {
    if (stateOf(item.id) === undefined)
      await Promise.all(touched.map((queryKey) => client.invalidateQueries({ queryKey })))
  })
  await Promise.race([sending, new Promise((done) => setTimeout(done, patienceMs))])
  const state = stateOf(item.id)
  return state === undefined ? 'sent' : state === 'refused' ? 'refused' : 'kept'
}

async function sendIt(item: NewItem): Promise<void> {
  await outbox.flush(item.personId)
  // a sending that was under way already may have begun before this entry was there
  if (stateOf(item.id) === 'waiting' && outbox.now().downSince === null) await outbox.flush(item.personId)
}

/** Why the server did not take an entry; undefined unless it was refused. */
export const refusalOf = (id: string): string | undefined =>
  outbox.now().items.find((one) => one.id === id)?.refusal?.says

const stateOf = (id: string) => outbox.now().items.find((one) => one.id === id)?.state
