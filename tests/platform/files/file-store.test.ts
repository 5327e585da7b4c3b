import { createHash } from 'node:crypto'
import { chmod, mkdtemp, readdir, readFile, rm, stat, writeFile } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { afterEach, beforeEach, describe, expect, it } from 'vitest'
import { createFileStore, type FileStore } from '../../../server/platform/files/file-store.ts'
import { sampleFiles } from './sample-files.ts'

let folder: string
let store: FileStore
beforeEach(async () => {
  folder = path.join(await mkdtemp(path.join(tmpdir(), 'pratique-files-')), 'files')
  store = createFileStore(folder)
})
afterEach(() => rm(path.dirname(folder), { recursive: true, force: true }))

const everything = async () =>
  (await readdir(folder, { recursive: true, withFileTypes: true })).filter((entry) => entry.isFile())

describe('kept files', () => {
  it('come back byte for byte under the SHA-256 of their content', async () => {
    const files = await sampleFiles()
    for (const content of Object.values(files)) {
      const kept = await store.keep(content)
      expect(kept).toEqual({
        sha256: createHash('sha256').update(content).digest('hex'),
        bytes: content.length,
      })
      expect(Buffer.compare(await store.read(kept.sha256), content)).toBe(0)
      expect(await store.check(kept.sha256)).toBe('sound')
    }
    expect(await everything()).toHaveLength(Object.keys(files).length)
  })

  it('lie on the disk once, however often and by however many they are brought at once', async () => {
    const { pdf } = await sampleFiles()
    const kept = await Promise.all(Array.from({ length: 12 }, () => store.keep(pdf)))
    expect(new Set(kept.map((file) => file.sha256)).size).toBe(1)
    const lying = await everything()
    expect(lying).toHaveLength(1)
    expect(
      (await stat(path.join(folder, kept[0]?.sha256.slice(0, 2) ?? '', kept[0]?.sha256 ?? ''))).mode & 0o077,
    ).toBe(0)
  })

  it('are found damaged when a byte changed, and mended by bringing them again', async () => {
    const { pdf } = await sampleFiles()
    const { sha256 } = await store.keep(pdf)
    const place = path.join(folder, sha256.slice(0, 2), sha256)
    const changed = await readFile(place)
    changed[100] = (changed[100] ?? 0) ^ 1
    await writeFile(place, changed)
    expect(await store.check(sha256)).toBe('damaged')
    await expect(store.read(sha256)).rejects.toMatchObject({ name: 'Problem', code: 'file-damaged' })
    await store.keep(pdf)
    expect(await store.check(sha256)).toBe('sound')
  })

  it('leave nothing behind when they cannot be written', async () => {
    const { text } = await sampleFiles()
    // A file where the folder of its digest should be makes the write impossible, for root as well.
    const { sha256 } = await store.keep(text)
    await rm(path.join(folder, sha256.slice(0, 2)), { recursive: true })
    await writeFile(path.join(folder, sha256.slice(0, 2)), 'in the way')
    await expect(store.keep(text)).rejects.toThrow(/ENOTDIR|EEXIST/)
    await chmod(path.join(folder, sha256.slice(0, 2)), 0o600)
    expect((await everything()).map((entry) => entry.name)).toEqual([sha256.slice(0, 2)])
  })

  it('are missing when they are', async () => {
    const sha256 = 'ab'.repeat(32)
    expect(await store.check(sha256)).toBe('missing')
    await expect(store.read(sha256)).rejects.toMatchObject({ name: 'Problem', code: 'file-gone' })
  })

  it.each(['../../etc/passwd', '', 'AB'.repeat(32), 'ab'.repeat(31), `${'ab'.repeat(31)}/.`])(
    'are never looked for at %j',
    async (name) => {
      await expect(store.read(name)).rejects.toMatchObject({ code: 'not-found' })
      await expect(Promise.resolve().then(() => store.check(name))).rejects.toMatchObject({
        code: 'not-found',
      })
    },
  )
})
