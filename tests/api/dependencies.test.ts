import { existsSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { ensureDependencies } from '../../server/cli/dependencies.mjs'

// Real npm on a package whose only dependency is a folder beside it, so that it needs no network.

let root = ''

beforeEach(() => {
  root = mkdtempSync(path.join(os.tmpdir(), 'pratique-dependencies-'))
  mkdirSync(path.join(root, 'part'))
  write('part/package.json', { name: 'part', version: '1.0.0' })
  write('package.json', { name: 'small', version: '1.0.0', dependencies: { part: 'file:part' } })
  write('package-lock.json', lock('1.0.0'))
})

afterEach(() => rmSync(root, { recursive: true, force: true }))

const write = (name: string, content: object) => writeFileSync(path.join(root, name), JSON.stringify(content))
const lock = (version: string) => ({
  name: 'small',
  version,
  lockfileVersion: 3,
  requires: true,
  packages: {
    '': { name: 'small', version, dependencies: { part: 'file:part' } },
    part: { version: '1.0.0' },
    'node_modules/part': { resolved: 'part', link: true },
  },
})
const mark = () => path.join(root, 'node_modules/.pratique-lock')

it('installs once, and again only when the lock file changes', async () => {
  expect(await ensureDependencies(root)).toBe('installed')
  expect(existsSync(path.join(root, 'node_modules/part/package.json'))).toBe(true)
  expect(await ensureDependencies(root)).toBe('as locked')
  write('package-lock.json', lock('1.0.1'))
  expect(await ensureDependencies(root)).toBe('installed')
})

it('installs again after an installation that was cut off', async () => {
  await ensureDependencies(root)
  rmSync(mark())
  expect(await ensureDependencies(root)).toBe('installed')
})

it('leaves a linked folder alone: it belongs to another checkout', async () => {
  const elsewhere = path.join(root, 'elsewhere')
  mkdirSync(elsewhere)
  writeFileSync(path.join(elsewhere, 'kept'), '')
  symlinkSync(elsewhere, path.join(root, 'node_modules'))
  expect(await ensureDependencies(root)).toBe('linked')
  expect(existsSync(path.join(elsewhere, 'kept'))).toBe(true)
})

it('says what to do when npm refuses, and sets no mark', async () => {
  write('package.json', { name: 'small', version: '1.0.0', dependencies: { 'not-in-the-lock': '1.0.0' } })
  await expect(ensureDependencies(root)).rejects.toThrow(/npm ci failed:[^]*What to do: /)
  expect(existsSync(mark())).toBe(false)
})
