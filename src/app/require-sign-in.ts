import type { QueryClient } from '@tanstack/react-query'
import { redirect } from 'react-router-dom'
import type { LoaderFunctionArgs } from 'react-router-dom'
import { meQuery } from '../lib/me.ts'
import { paths } from '../lib/paths.ts'

/**
 * Before a screen is drawn: somebody must be signed in, and a one-time password must have been changed. Where the person
 * wanted to go is kept in the address of sign-in.
 */
export function requireSignIn(client: QueryClient) {
  return async ({ request }: LoaderFunctionArgs) => {
    const url = new URL(request.url)
    const me = await client.ensureQueryData(meQuery)
    if (!me) throw redirect(paths.signIn(url.pathname + url.search))
    const choosing = url.pathname === paths.newPassword()
    if (me.mustChangePassword && !choosing) throw redirect(paths.newPassword())
    if (!me.mustChangePassword && choosing) throw redirect(paths.today())
    return null
  }
}

/** Who is already signed in does not sign in again. */
export function redirectSignedIn(client: QueryClient) {
  return async ({ request }: LoaderFunctionArgs) => {
    const me = await client.ensureQueryData(meQuery).catch(() => null)
    if (me) throw redirect(wantedAddress(new URL(request.url).search))
    return null
  }
}

/** The address that sign-in was asked for on the way to; only inside this application. */
export function wantedAddress(signInSearch: string): string {
  const then = new URLSearchParams(signInSearch).get('then')
  return then?.startsWith('/') && !then.startsWith('//') && !then.startsWith('/\\') ? then : paths.today()
}
