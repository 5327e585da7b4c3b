import { createHash } from 'node:crypto'
import { existsSync, lstatSync, readFileSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { Advice, runCommand, tail } from './run-command.mjs'

/**
 * Brings node_modules in step with package-lock.json, which costs nothing when it is already. The mark is written
 * last, so an installation that was cut off is done again.
 *
 * @param {string} root
 * @param {{ say?: (line: string) => void, signal?: AbortSignal }} [options]
 * @returns {Promise<'as locked' | 'installed' | 'linked'>}
 */
export async function ensureDependencies(root, { say = () => {}, signal } = {}) {
  const modules = path.join(root, 'node_modules')
  // A link leads to the modules of another checkout: to empty that folder from here would break it there.
  if (existsSync(modules) && lstatSync(modules).isSymbolicLink()) return 'linked'
  const mark = path.join(modules, '.pratique-lock')
  const wanted = createHash('sha256')
    .update(readFileSync(path.join(root, 'package-lock.json')))
    .digest('hex')
  if (existsSync(mark) && readFileSync(mark, 'utf8') === wanted) return 'as locked'
  say('installing what package-lock.json lists (about a minute)')
  // with NODE_ENV=production npm would leave out vite, which builds the client
  const env = { ...process.env, NODE_ENV: '' }
  const { code, output } = await runCommand('npm', ['ci', '--include=dev', '--no-audit', '--no-fund'], {
    cwd: root,
    env,
    signal,
  })
  if (code !== 0)
    throw new Advice(
      `npm ci failed:\n${tail(output, 20)}`,
      'see that the package registry can be reached, then start again',
    )
  writeFileSync(mark, wanted)
  return 'installed'
}
