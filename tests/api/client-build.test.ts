import {
  existsSync,
  mkdirSync,
  mkdtempSync,
  readFileSync,
  readdirSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { afterEach, beforeEach, expect, it } from 'vitest'
import { ensureClientBuild } from '../../server/cli/client-build.mjs'
import { projectRoot } from '../support/project-files.ts'

// The real Vite on a page of one script.

let root = ''

beforeEach(() => {
  root = mkdtempSync(path.join(os.tmpdir(), 'pratique-build-'))
  symlinkSync(path.join(projectRoot, 'node_modules'), path.join(root, 'node_modules'))
  mkdirSync(path.join(root, 'src/app'), { recursive: true })
  write('index.html', '<!doctype html><script type="module" src="/src/main.ts"></script>')
  write('vite.config.ts', `export default { build: { outDir: 'dist/client' }, logLevel: 'warn' }`)
  write('src/main.ts', `import { words } from './app/words.ts'; document.title = words`)
  write('src/app/words.ts', `export const words = 'first words'`)
})

afterEach(() => rmSync(root, { recursive: true, force: true }))

const write = (name: string, text: string) => writeFileSync(path.join(root, name), text)

function builtScript(): string {
  const assets = path.join(root, 'dist/client/assets')
  const [script = ''] = readdirSync(assets).filter((name) => name.endsWith('.js'))
  return readFileSync(path.join(assets, script), 'utf8')
}

it('builds once, and again only when what it is made of changes', async () => {
  expect(await ensureClientBuild(root)).toBe('built')
  expect(builtScript()).toContain('first words')
  expect(await ensureClientBuild(root)).toBe('up to date')
  mkdirSync(path.join(root, 'tests'))
  write('tests/other.ts', 'export {}')
  write('src/tsconfig.tsbuildinfo', '{}')
  expect(await ensureClientBuild(root)).toBe('up to date')
  write('src/app/words.ts', `export const words = 'other words'`)
  expect(await ensureClientBuild(root)).toBe('built')
  expect(builtScript()).toContain('other words')
})

it('builds again when a file only gets another name', async () => {
  await ensureClientBuild(root)
  write('src/app/phrases.ts', readFileSync(path.join(root, 'src/app/words.ts'), 'utf8'))
  rmSync(path.join(root, 'src/app/words.ts'))
  await expect(ensureClientBuild(root)).rejects.toThrow('words.ts')
})

it('builds again when what was built is gone', async () => {
  await ensureClientBuild(root)
  rmSync(path.join(root, 'dist/client'), { recursive: true })
  expect(await ensureClientBuild(root)).toBe('built')
})

it('names the fault of a build that fails, and does not take it for done', async () => {
  write('src/main.ts', `import './missing.ts'`)
  await expect(ensureClientBuild(root)).rejects.toThrow(/could not be built[^]*missing\.ts[^]*What to do: /)
  expect(existsSync(path.join(root, 'dist/.stamp'))).toBe(false)
})
