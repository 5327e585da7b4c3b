import { inStore, keptStoreName } from './device-database.ts'
import { isProblem } from './problem-error.ts'

/** Something as it was last read, with the time of that reading. */
export interface Kept<T> {
  value: T
  at: string
  /** From this device, because nobody answered just now. */
  old: boolean
}

/** Keeps something on the device; a browser that refuses to keep anything is no hindrance. */
export async function keep<T>(key: string, value: T, readAt = new Date()): Promise<Kept<T>> {
  const kept: Kept<T> = { value, at: readAt.toISOString(), old: false }
  await inStore(keptStoreName, 'readwrite', (store) => store.put(kept, key)).catch(() => undefined)
  return kept
}

/** What was kept last under a key; null when nothing was. */
export async function readKept<T>(key: string): Promise<Kept<T> | null> {
  const kept = await inStore<Kept<T> | undefined>(keptStoreName, 'readonly', (store) => store.get(key)).catch(
    () => undefined,
  )
  return kept ? { ...kept, old: true } : null
}

/**
 * Reads something that is needed at the tank, and keeps it on the device; when nobody answers, what was kept last stands
 * in, marked as old. A refusal is a refusal.
 */
export async function readOrKept<T>(key: string, read: () => Promise<T>): Promise<Kept<T>> {
  try {
    return await keep(key, await read())
  } catch (error) {
    if (!isProblem(error) || !error.noAnswer) throw error
    const kept = await readKept<T>(key)
    if (!kept) throw error
    return kept
  }
}
