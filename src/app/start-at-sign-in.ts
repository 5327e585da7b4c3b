import type { QueryClient } from '@tanstack/react-query'
import { meQuery } from '../lib/me.ts'
import { paths } from '../lib/paths.ts'

const open = [paths.signIn(), paths.parts()]

/**
 * Asked once, before there is a router: nobody who is signed out begins at a sheet. The router would send them to sign-in
 * all the same, but only after it fetched the sheet that they may not see.
 */
export async function startAtSignIn(client: QueryClient): Promise<void> {
  const { pathname, search } = window.location
  if (open.some((address) => pathname.startsWith(address))) return
  // where nobody answers the router says so
  const me = await client.ensureQueryData(meQuery).catch(() => undefined)
  if (me === null) window.history.replaceState(null, '', paths.signIn(pathname + search))
}
