/// <reference types="vitest/config" />
import { createHash } from 'node:crypto'
import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { defineConfig } from 'vite'
import type { Plugin } from 'vite'
import react from '@vitejs/plugin-react'
import tailwindcss from '@tailwindcss/vite'
import { calculators } from './shared/bench/calculators.ts'
import type { AnyCalculator } from './shared/bench/definition.ts'
import { say, wordOf } from './shared/bench/words.ts'

const files = (...folders: string[]) => folders.map((folder) => `tests/${folder}/**/*.test.{ts,tsx}`)
// each file has its own database, browser and folders: the server need not be loaded anew for each of them
const withPostgres = {
  globalSetup: ['tests/support/postgres.ts'],
  pool: 'forks' as const,
  isolate: false,
}

/** Nothing is painted before the script has set the person's light: a dark gallery must not flash white. */
const paintAfterTheme: Plugin = {
  name: 'paint-after-theme',
  transformIndexHtml: {
    order: 'post',
    handler: (html) => html.replace('<script type="module" crossorigin ', '$&blocking="render" '),
  },
}

/**
 * Sheets that must open where there is no signal, with the frames around them: what is written at a tank, and what is
 * read there. Any other sheet is kept from when it is first opened.
 */
const withoutSignal =
  /\/src\/app\/(shell\/(frame|hand-frame)|routes\/(today|water|enclosure|animals|animal|quarantine\/(board|case|rounds|observe|urgent|unsent)|orders\/(orders|order|sheet)))\.tsx$/

const benchFolder = fileURLToPath(new URL('shared/bench/', import.meta.url))
const benchModule = 'virtual:bench'

/**
 * The calculators of the bench in a dozen pieces, so that a sheet does not load all of them: `virtual:bench` has what a list
 * of them says, and loads one piece. A piece for each would make what they share seem wanted by every sheet.
 */
const benchInPieces: Plugin = {
  name: 'bench-in-pieces',
  resolveId: (id) => (id === benchModule || id.startsWith(`${benchModule}/`) ? `\0${id}` : null),
  load(id) {
    if (!id.startsWith(`\0${benchModule}`)) return null
    const asked = id.slice(benchModule.length + 2)
    if (asked !== '') {
      const ids = calculators.filter((of) => pieceOf(of) === asked).map((of) => of.id)
      const lines = ids.map((each, at) => {
        const { name, file } = calculatorFile(each)
        return `import { ${name} as c${String(at)} } from ${JSON.stringify(file)}`
      })
      return [...lines, `export const calculators = [${ids.map((_, at) => `c${String(at)}`).join()}]`].join(
        '\n',
      )
    }
    const entries = calculators.map((of) => {
      const words = JSON.stringify({
        name: say(of, 'name'),
        purpose: say(of, 'purpose'),
        search: wordOf(of, 'search') ?? '',
      })
      return `{ id: '${of.id}', group: '${of.group}', weekly: ${String(of.weekly ?? false)}, piece: '${pieceOf(of)}', words: defineMessages(${words}) }`
    })
    const messages = fileURLToPath(new URL('shared/messages/define-messages.ts', import.meta.url))
    return [
      `import { defineMessages } from ${JSON.stringify(messages)}`,
      `export const benchIndex = [${entries.join()}]`,
      `export const benchPieces = { ${[...new Set(calculators.map(pieceOf))].map((piece) => `'${piece}': () => import('${benchModule}/${piece}')`).join()} }`,
    ].join('\n')
  },
}

/** A piece of more would be more than a sheet may load. */
const mostInPiece = 5

/** Those of a group that people use every week, or its others, a few at a time. */
function pieceOf(of: AnyCalculator): string {
  const alike = calculators.filter(({ group, weekly }) => group === of.group && !weekly === !of.weekly)
  const pieces = Math.ceil(alike.length / mostInPiece)
  const at = Math.floor((alike.indexOf(of) * pieces) / alike.length)
  return `${of.group}-${of.weekly ? 'weekly' : 'more'}${at === 0 ? '' : `-${String(at + 1)}`}`
}

/** The file that describes a calculator, and what it is called there. */
function calculatorFile(id: string): { name: string; file: string } {
  const listed = readFileSync(`${benchFolder}calculators.ts`, 'utf8')
  for (const [, name = '', file = ''] of listed.matchAll(
    /^import { (\w+) } from '\.\/(calculators\/[^']+)'$/gm,
  )) {
    const text = readFileSync(`${benchFolder}${file}`, 'utf8')
    if (new RegExp(`^  id: '${id}',$`, 'm').test(text)) return { name, file: `${benchFolder}${file}` }
  }
  throw new Error(`no file describes the calculator ${id}`)
}

/** Writes the service worker with the list of files that those sheets are built of; the version is made of their names. */
const serviceWorker: Plugin = {
  name: 'service-worker',
  apply: 'build',
  generateBundle: {
    order: 'post',
    handler(_options, bundle) {
      const wanted = new Set<string>()
      const take = (fileName: string): void => {
        const file = bundle[fileName]
        if (wanted.has(fileName) || file?.type !== 'chunk') return
        wanted.add(fileName)
        for (const css of file.viteMetadata?.importedCss ?? []) wanted.add(css)
        file.imports.forEach(take)
        // what a sheet loads only when it is asked for; the first script would lead to every sheet there is
        if (!file.isEntry) file.dynamicImports.forEach(take)
      }
      for (const file of Object.values(bundle)) {
        if (file.type === 'asset' && /roboto-flex-latin-(wdth|400)-normal[^/]*\.woff2$/.test(file.fileName))
          wanted.add(file.fileName)
        if (file.type === 'chunk' && (file.isEntry || withoutSignal.test(file.facadeModuleId ?? '')))
          take(file.fileName)
      }
      const files = [...wanted].sort().map((name) => `/${name}`)
      const version = createHash('sha256').update(files.join('\n')).digest('hex').slice(0, 12)
      const source = readFileSync(new URL('src/service-worker.js', import.meta.url), 'utf8')
        .replace('__VERSION__', version)
        .replace('__FILES__', JSON.stringify(files))
      this.emitFile({ type: 'asset', fileName: 'service-worker.js', source })
    },
  },
}

/**
 * What all sheets but one or two want, in one piece: in pieces of their own these are dozens of requests before anything
 * is seen. With a lower count the sign-in loads what only somebody signed in needs.
 */
const wantedByEverySheet = { name: 'every-sheet', minShareCount: 47 }

export default defineConfig({
  plugins: [react(), tailwindcss(), paintAfterTheme, benchInPieces, serviceWorker],
  // Fonts stay files: the content security policy takes none from data addresses
  build: {
    outDir: 'dist/client',
    manifest: true,
    assetsInlineLimit: 0,
    rolldownOptions: { output: { codeSplitting: { groups: [wantedByEverySheet] } } },
  },
  test: {
    // a browser waits more than it works: two files at a time also on two cores
    maxWorkers: 2,
    projects: [
      {
        extends: true,
        test: {
          name: 'pure',
          environment: 'node',
          isolate: false,
          include: files('domain', 'published-values', 'contracts', 'architecture', 'pdf', 'platform'),
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      // they leave no document behind (`tests/support/react.tsx`): React need not be loaded anew for each file
      {
        extends: true,
        test: { name: 'client', environment: 'happy-dom', isolate: false, include: files('client') },
      },
      {
        extends: true,
        test: {
          name: 'postgres',
          environment: 'node',
          include: files('database', 'api'),
          ...withPostgres,
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          environment: 'node',
          include: files('browser'),
          ...withPostgres,
          testTimeout: 120_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
})
