import { createHash, randomBytes } from 'node:crypto'
import { createReadStream } from 'node:fs'
import { mkdir, open, readFile, rename, rm } from 'node:fs/promises'
import path from 'node:path'
import { pipeline } from 'node:stream/promises'
import { fileWords } from '../../../shared/messages/files.ts'
import { Problem } from '../http/problem.ts'

export interface KeptFile {
  /** Names the content for ever: 64 lower-case hexadecimal digits. */
  sha256: string
  bytes: number
}

/** Attachments on the local disk, each under the SHA-256 of its content; the same content is kept once. */
export interface FileStore {
  /** Writes the whole file or nothing, and returns only when it is on the disk. */
  keep(content: Uint8Array): Promise<KeptFile>
  /**
   * The whole of a kept file, read and compared with the SHA-256 it is named after: nothing else is ever given out.
   *
   * @throws Problem not-found for a name that no file has, file-gone when it is no longer on the disk, file-damaged when
   *         its content is not what was kept
   */
  read(sha256: string): Promise<Uint8Array>
  /** Whether a kept file still has the content it is named after; `missing` when it is gone. */
  check(sha256: string): Promise<'sound' | 'damaged' | 'missing'>
}

const hashOf = (content: Uint8Array): string => createHash('sha256').update(content).digest('hex')

/** Opens the store in a folder, which is made with the first file. */
export function createFileStore(folder: string): FileStore {
  const placeOf = (sha256: string): string => {
    if (!/^[0-9a-f]{64}$/.test(sha256)) throw new Problem('not-found', { detail: fileWords.notKept })
    return path.join(folder, sha256.slice(0, 2), sha256)
  }
  const check: FileStore['check'] = async (sha256) => {
    const hash = createHash('sha256')
    try {
      await pipeline(createReadStream(placeOf(sha256)), hash)
    } catch (error) {
      if (isMissing(error)) return 'missing'
      throw error
    }
    return hash.digest('hex') === sha256 ? 'sound' : 'damaged'
  }
  return {
    check,
    keep: async (content) => {
      const sha256 = hashOf(content)
      const place = placeOf(sha256)
      // A damaged copy is written anew by the next person who brings the same content.
      if ((await check(sha256)) !== 'sound') await writeWhole(folder, place, content)
      return { sha256, bytes: content.byteLength }
    },
    read: async (sha256) => {
      const place = placeOf(sha256)
      const content = await readFile(place).catch((error: unknown) => {
        if (isMissing(error)) throw new Problem('file-gone', { detail: fileWords.gone })
        throw error
      })
      if (hashOf(content) !== sha256) throw new Problem('file-damaged', { detail: fileWords.damaged })
      return content
    },
  }
}

/** Under another name first, flushed, then renamed: whoever reads sees nothing or all of it, also after a power cut. */
async function writeWhole(folder: string, place: string, content: Uint8Array): Promise<void> {
  const incoming = path.join(folder, 'incoming')
  await mkdir(incoming, { recursive: true, mode: 0o700 })
  await mkdir(path.dirname(place), { recursive: true, mode: 0o700 })
  const waiting = path.join(incoming, randomBytes(12).toString('hex'))
  try {
    const file = await open(waiting, 'wx', 0o600)
    try {
      await file.writeFile(content)
      await file.sync()
    } finally {
      await file.close()
    }
    await rename(waiting, place)
  } catch (error) {
    await rm(waiting, { force: true })
    throw error
  }
  await flushFolder(path.dirname(place))
}

async function flushFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

function isMissing(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ENOENT'
}
