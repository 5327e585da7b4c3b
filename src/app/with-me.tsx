import { useEffect } from 'react'
import type { ReactNode } from 'react'
import { useQuery, useQueryClient } from '@tanstack/react-query'
import { Navigate, useLocation } from 'react-router-dom'
import { MeContext, meQuery, personKey } from '../lib/me.ts'
import { paths } from '../lib/paths.ts'
import { meKey } from '../lib/query-client.ts'
import { OtherPerson } from './other-person.tsx'
import { SignInAgain } from './sign-in-again.tsx'

/**
 * Screens for somebody who is signed in. Signing out leads to sign-in; a session that ended elsewhere is asked for in
 * place, so that nothing typed is lost.
 */
export function WithMe({ children }: { children: ReactNode }) {
  const { data: me } = useQuery(meQuery)
  const { pathname, search } = useLocation()
  useOtherWindows()
  if (!me) return <Navigate to={paths.signIn(pathname + search)} replace />
  return (
    <MeContext value={me}>
      {children}
      <OtherPerson />
      <SignInAgain />
    </MeContext>
  )
}

/** Asks anew who is signed in as soon as another window of this browser signs somebody in or out. */
function useOtherWindows(): void {
  const client = useQueryClient()
  useEffect(() => {
    const changed = (event: StorageEvent) => {
      if (event.key === personKey) void client.invalidateQueries({ queryKey: meKey })
    }
    window.addEventListener('storage', changed)
    return () => window.removeEventListener('storage', changed)
  }, [client])
}
