import { inStore, keptStoreName } from './device-database.ts'
import { isProblem } from './problem-error.ts'

/** Something as it was last read, with the time of that reading. */
export interface Kept<T> {
  value: T
  at: string
  /** From this device, because nobody answered just now. */
  old: boolean
}

/**
 * Reads something that is needed at the tank, and keeps it on the device; when nobody answers, what was kept last stands
 * in, marked as old. A refusal is a refusal.
 */
export async function readOrKept<T>(key: string, read: () => Promise<T>): Promise<Kept<T>> {
  try {
    const value = await read()
    const kept: Kept<T> = { value, at: new Date().toISOString(), old: false }
    await inStore(keptStoreName, 'readwrite', (store) => store.put(kept, key)).catch(() => undefined)
    return kept
  } catch (error) {
    if (!isProblem(error) || !error.noAnswer) throw error
    const kept = await inStore<Kept<T> | undefined>(keptStoreName, 'readonly', (store) =>
      store.get(key),
    ).catch(() => undefined)
    if (!kept) throw error
    return { ...kept, old: true }
  }
}
