import { frameWords } from '../../shared/messages/frame.ts'
import { paths } from '../lib/paths.ts'
import { landed } from './landed-sheets.ts'
import { sheetNames } from './sheet-names.ts'
import type { SheetName } from './sheet-names.ts'

/** The same eight sheets, in the same places, for every role; their numbers are their keys. */
export interface Sheet {
  name: SheetName
  number: number
  words: string
  to: string
  /** Addresses that belong to it, besides its own. */
  under: readonly string[]
}

const own: Record<SheetName, { to: string; under: readonly string[] }> = {
  today: { to: paths.today(), under: [] },
  quarantine: { to: paths.quarantine(), under: ['/rounds', '/unsent'] },
  animals: { to: paths.animals(), under: ['/samples'] },
  water: { to: paths.water(), under: ['/enclosures', '/systems', '/e'] },
  orders: { to: paths.orders(), under: ['/check'] },
  pharmacy: { to: paths.pharmacy(), under: [] },
  register: { to: paths.register(), under: [] },
  bench: { to: paths.bench(), under: [] },
}

/** The eight sheets with the address that the bridge leads to: a sheet that has not landed leads to a page that says so. */
export function sheets(): Sheet[] {
  return sheetNames.map((name, i) => ({
    name,
    number: i + 1,
    words: frameWords[name],
    to: landed.has(name) ? own[name].to : paths.notInThisVersion(name),
    under: own[name].under,
  }))
}

/** Which sheet an address belongs to; none for settings and the like. */
export function sheetAt(pathname: string): SheetName | undefined {
  const missing = /^\/not-in-this-version\/(\w+)$/.exec(pathname)?.[1]
  if (missing) return sheetNames.find((name) => name === missing)
  if (pathname === '/') return 'today'
  const within = (base: string) => pathname === base || pathname.startsWith(`${base}/`)
  return sheetNames.find((name) => name !== 'today' && [own[name].to, ...own[name].under].some(within))
}
