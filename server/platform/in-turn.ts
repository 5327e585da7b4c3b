/** Runs what is asked under one key one after another, in the order in which it was asked. */
export function createTurns() {
  const last = new Map<string, Promise<unknown>>()
  return async function inTurn<T>(key: string, work: () => Promise<T>): Promise<T> {
    const mine = (last.get(key) ?? Promise.resolve()).then(work)
    const settled = mine.catch(() => undefined)
    last.set(key, settled)
    try {
      return await mine
    } finally {
      if (last.get(key) === settled) last.delete(key)
    }
  }
}
