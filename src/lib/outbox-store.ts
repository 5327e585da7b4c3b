import type { Address } from './api-client.ts'
import { inStore, outboxStoreName } from './device-database.ts'

/** One entry made on this device that the server does not have yet, or did not take. */
export interface OutboxItem {
  /** Id of the record, made at the tap: sent twice, it is kept once. */
  id: string
  /** Only this person's session sends it. */
  personId: string
  madeAt: string
  /** What it is, for its list: `observation`, `hold`, `telephoned`. */
  kind: string
  /** Where it belongs, in words, as it was said on screen. */
  label: string
  address: Address
  params: Readonly<Record<string, string>>
  body: Readonly<Record<string, unknown>>
  state: 'waiting' | 'refused' | 'struck'
  /** How often sending it was tried in vain. */
  tries: number
  refusal: { code: string; says: string } | null
  struckReason: string | null
}

/** Where entries are kept. */
export interface OutboxStore {
  all: () => Promise<OutboxItem[]>
  put: (item: OutboxItem) => Promise<void>
  remove: (id: string) => Promise<void>
}

/** Entries in the database of the browser: they survive a reload, a crash and an empty battery. */
export const deviceStore: OutboxStore = {
  all: () => inStore<OutboxItem[]>(outboxStoreName, 'readonly', (store) => store.getAll()),
  put: async (item) => {
    await inStore(outboxStoreName, 'readwrite', (store) => store.put(item))
  },
  remove: async (id) => {
    await inStore(outboxStoreName, 'readwrite', (store) => store.delete(id))
  },
}
