import type { FileStore } from './file-store.ts'
import type { FileOnRecord } from './serve-kept.ts'

/** A file that the disk no longer holds as it is on record. */
export interface FileFault {
  at: string
  what: 'damaged' | 'missing'
  detail: string
}

/** Reads every file on record again and compares it with the SHA-256 under which it was kept; each content once. */
export async function verifyFiles(
  files: FileStore,
  onRecord: readonly FileOnRecord[],
): Promise<{ files: number; faults: FileFault[] }> {
  const states = new Map<string, Awaited<ReturnType<FileStore['check']>>>()
  const faults: FileFault[] = []
  for (const { id, sha256, label } of onRecord) {
    const state = states.get(sha256) ?? (await files.check(sha256))
    states.set(sha256, state)
    if (state !== 'sound') faults.push({ at: label, what: state, detail: `file ${sha256} of record ${id}` })
  }
  return { files: onRecord.length, faults }
}
