import { mkdtemp } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { build } from 'vite'

/** A build of the client with what is only for building and testing: the page of parts, longer words. Remove it after. */
export async function buildWithParts(): Promise<string> {
  const folder = await mkdtemp(path.join(tmpdir(), 'pratique-parts-'))
  process.env.VITE_PARTS = '1'
  const root = path.resolve(import.meta.dirname, '../..')
  await build({ root, logLevel: 'error', build: { outDir: folder, emptyOutDir: true } })
  delete process.env.VITE_PARTS
  return folder
}
