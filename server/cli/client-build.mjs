import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { packageProgram } from './project.mjs'
import { Advice, runCommand, tail } from './run-command.mjs'

const sources = [
  'src',
  'shared',
  'public',
  'index.html',
  'vite.config.ts',
  'tailwind.config.ts',
  'package-lock.json',
]

/**
 * Builds the client into dist/client unless it is there and its sources are the same as then.
 *
 * @param {string} root
 * @param {{ say?: (line: string) => void, signal?: AbortSignal }} [options]
 * @returns {Promise<'up to date' | 'built'>}
 */
export async function ensureClientBuild(root, { say = () => {}, signal } = {}) {
  const stamp = path.join(root, 'dist/.stamp')
  const wanted = hashOf(root)
  const there = existsSync(path.join(root, 'dist/client/index.html'))
  if (there && existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return 'up to date'
  say('building the client')
  rmSync(stamp, { force: true }) // a build that is cut off is not taken for a whole one
  const env = { ...process.env, NODE_ENV: 'production' }
  const args = [packageProgram('vite/bin/vite.js'), 'build']
  const { code, output } = await runCommand(process.execPath, args, { cwd: root, env, signal })
  if (code !== 0)
    throw new Advice(`The client could not be built:\n${tail(output, 30)}`, 'mend what vite names above')
  mkdirSync(path.dirname(stamp), { recursive: true })
  writeFileSync(stamp, wanted)
  return 'built'
}

/** @param {string} root */
function hashOf(root) {
  const hash = createHash('sha256')
  for (const source of sources) {
    const at = path.join(root, source)
    if (!existsSync(at)) continue
    for (const file of filesIn(at)) {
      const bytes = readFileSync(file)
      hash.update(`${path.relative(root, file)} ${bytes.length}\n`).update(bytes)
    }
  }
  return hash.digest('hex')
}

/** @param {string} at @returns {string[]} */
function filesIn(at) {
  if (!statSync(at).isDirectory()) return [at]
  return readdirSync(at, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && !entry.name.endsWith('.tsbuildinfo'))
    .map((entry) => path.join(entry.parentPath, entry.name))
    .sort()
}
