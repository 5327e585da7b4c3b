const databaseName = 'pratique'
const version = 1

export const outboxStoreName = 'outbox'
export const keptStoreName = 'kept'

let opened: Promise<IDBDatabase> | null = null

/** The database of this browser: entries that wait to be sent, and what is kept for when there is no signal. */
function open(): Promise<IDBDatabase> {
  opened ??= new Promise<IDBDatabase>((resolve, reject) => {
    const request = indexedDB.open(databaseName, version)
    request.onupgradeneeded = () => {
      request.result.createObjectStore(outboxStoreName, { keyPath: 'id' })
      request.result.createObjectStore(keptStoreName)
    }
    request.onsuccess = () => {
      // a newer page wants to change the form of the database
      request.result.onversionchange = () => {
        request.result.close()
        opened = null
      }
      resolve(request.result)
    }
    request.onerror = () => reject(request.error ?? new Error('IndexedDB could not be opened'))
  })
  opened.catch(() => {
    opened = null
  })
  return opened
}

/** One request in a transaction of its own; settled when it is on the disk, not when it was asked for. */
export async function inStore<T>(
  name: string,
  mode: IDBTransactionMode,
  ask: (store: IDBObjectStore) => IDBRequest<T>,
): Promise<T> {
  const database = await open()
  return new Promise<T>((resolve, reject) => {
    const transaction = database.transaction(name, mode, { durability: 'strict' })
    const request = ask(transaction.objectStore(name))
    transaction.oncomplete = () => resolve(request.result)
    transaction.onerror = () => reject(transaction.error ?? new Error('IndexedDB refused'))
    transaction.onabort = () => reject(transaction.error ?? new Error('IndexedDB gave up'))
  })
}
