import type { Contract } from '../../shared/contracts/contract.ts'
import { api } from './api-client.ts'
import type { CallOptions } from './api-client.ts'
import { deviceStore } from './outbox-store.ts'
import type { OutboxItem, OutboxStore } from './outbox-store.ts'
import { isProblem } from './problem-error.ts'

export type NewItem = Pick<
  OutboxItem,
  'id' | 'personId' | 'madeAt' | 'kind' | 'label' | 'address' | 'params' | 'body'
>

/** What is known of the outbox now. */
export interface OutboxNow {
  /** Every entry of every person on this device, in the order in which they were made. */
  items: readonly OutboxItem[]
  /** Since when nobody answers; null while somebody does. */
  downSince: string | null
  /** Entries are on the disk of this device; false when the browser refuses to keep anything. */
  durable: boolean
}

/** Problems after which the same entry may be taken later as it is; everything else is a refusal of this entry. */
const passing = new Set([
  'different-person',
  'not-signed-in',
  'password-change-required',
  'not-understood',
  'too-many-requests',
  'busy',
])

/** After this an entry is no longer sent as it happens. */
const lateAfterMs = 30_000

/** The same entry, saying of itself that it was kept on the device first. */
const asLater = (item: OutboxItem): OutboxItem =>
  'origin' in item.body ? { ...item, body: { ...item.body, origin: 'outbox' } } : item

/**
 * The outbox: entries are kept on the device first and sent then, in order, at once or when there is a signal again. An
 * entry leaves it only when the server has taken it, or when a person strikes it out.
 */
export function createOutbox(parts: {
  store: OutboxStore
  send: (item: OutboxItem) => Promise<unknown>
  now?: () => string
  /** Keeps two windows from sending at the same time. */
  alone?: (work: () => Promise<void>) => Promise<void>
}) {
  const { store, send, now = () => new Date().toISOString(), alone = (work) => work() } = parts
  let state: OutboxNow = { items: [], downSince: null, durable: true }
  /** Entries that could not be kept on the disk live as long as the page. */
  const loose = new Map<string, OutboxItem>()
  const listeners = new Set<() => void>()
  const running = new Map<string, Promise<void>>()

  function tell(change: Partial<OutboxNow>): void {
    state = { ...state, ...change }
    for (const listener of listeners) listener()
  }

  const byTime = (a: OutboxItem, b: OutboxItem) =>
    a.madeAt < b.madeAt ? -1 : a.madeAt > b.madeAt ? 1 : a.id < b.id ? -1 : 1

  async function read(): Promise<OutboxItem[]> {
    const onDisk = await store.all().catch(() => [])
    const all = new Map([...onDisk, ...loose.values()].map((item) => [item.id, item]))
    const items = [...all.values()].sort(byTime)
    tell({ items, durable: loose.size === 0 })
    return items
  }

  async function write(item: OutboxItem): Promise<void> {
    try {
      await store.put(item)
      loose.delete(item.id)
    } catch {
      loose.set(item.id, item)
    }
    await read()
  }

  async function drop(id: string): Promise<void> {
    loose.delete(id)
    await store.remove(id).catch(() => undefined)
    await read()
  }

  const isLate = (item: OutboxItem) =>
    new Date(now()).getTime() - new Date(item.madeAt).getTime() > lateAfterMs

  /** Sends one; true when the next may follow. */
  async function sendOne(item: OutboxItem): Promise<boolean> {
    try {
      await send(isLate(item) ? asLater(item) : item)
    } catch (error) {
      if (!isProblem(error)) throw error
      if (error.noAnswer || error.status >= 500 || passing.has(error.code)) {
        await write({ ...asLater(item), tries: item.tries + 1 })
        if (error.noAnswer || error.status >= 500) tell({ downSince: state.downSince ?? now() })
        return false
      }
      await write({ ...item, state: 'refused', refusal: { code: error.code, says: error.says } })
      tell({ downSince: null })
      return true
    }
    tell({ downSince: null })
    await drop(item.id)
    return true
  }

  async function sendAll(personId: string): Promise<void> {
    for (;;) {
      const next = (await read()).find((item) => item.personId === personId && item.state === 'waiting')
      if (!next || !(await sendOne(next))) return
    }
  }

  return {
    now: (): OutboxNow => state,
    subscribe(listener: () => void): () => void {
      listeners.add(listener)
      return () => listeners.delete(listener)
    },
    /** Reads what waits on this device. */
    read: async (): Promise<void> => void (await read()),
    /** Keeps a new entry. It is safe once this is done; sending is another matter. */
    enter: (item: NewItem): Promise<void> =>
      write({ ...item, state: 'waiting', tries: 0, refusal: null, struckReason: null }),
    /** Sends what waits for a person, the earliest first, until one can't be sent. One sending of theirs at a time. */
    flush(personId: string): Promise<void> {
      const under = running.get(personId)
      if (under) return under
      const sending = alone(() => sendAll(personId)).finally(() => running.delete(personId))
      running.set(personId, sending)
      return sending
    },
    /** A refused entry, mended: it waits again, with the same id. */
    async mend(id: string, body: OutboxItem['body']): Promise<void> {
      const item = state.items.find((one) => one.id === id)
      if (item) await write({ ...item, body, state: 'waiting', tries: 0, refusal: null })
    },
    /** Struck out by a person: it is not sent, and stays readable on this device with the reason. */
    async strike(id: string, reason: string): Promise<void> {
      const item = state.items.find((one) => one.id === id)
      if (item) await write({ ...item, state: 'struck', struckReason: reason })
    },
    /** The signal went or came, as the browser says. */
    signal(up: boolean): void {
      tell({ downSince: up ? null : (state.downSince ?? now()) })
    },
  }
}

export type Outbox = ReturnType<typeof createOutbox>

/** The outbox of this browser. */
export const outbox = createOutbox({
  store: deviceStore,
  send: ({ address, params, body, personId }) =>
    api<Contract>(address, {
      params,
      body,
      patienceMs: 8_000,
      writtenBy: personId,
    } as unknown as CallOptions<Contract>),
  alone: async (work) => {
    // absent on addresses without TLS; what is sent twice is kept once all the same
    const locks = navigator.locks as LockManager | null | undefined
    if (locks) await locks.request('pratique-outbox', work)
    else await work()
  },
})
