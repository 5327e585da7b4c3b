import { readFileSync } from 'node:fs'
import path from 'node:path'

/**
 * The addresses of the router below the frame, as they stand in its source: the module itself draws on styles and other
 * things that only a build has.
 */
export function routesOfTheClient(): string[] {
  const file = path.resolve(import.meta.dirname, '../../src/app/router.tsx')
  const table = /const sheetRoutes[\s\S]*?\n\]\n/.exec(readFileSync(file, 'utf8'))?.[0]
  if (!table) throw new Error('router.tsx has no table of sheets')
  return [...table.matchAll(/path: '([^'*]+)'/g)]
    .map(([, address]) => `/${address ?? ''}`)
    .filter((address) => !address.startsWith('/not-in-this-version'))
}
