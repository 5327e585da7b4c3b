import type { ReactNode } from 'react'
import { useQuery } from '@tanstack/react-query'
import { Navigate, useLocation } from 'react-router-dom'
import { MeContext, meQuery } from '../lib/me.ts'
import { paths } from '../lib/paths.ts'

/** Screens for somebody who is signed in. When the session ends, wherever that is noticed, it leads to sign-in and back. */
export function WithMe({ children }: { children: ReactNode }) {
  const { data: me } = useQuery(meQuery)
  const { pathname, search } = useLocation()
  if (!me) return <Navigate to={paths.signIn(pathname + search)} replace />
  return <MeContext value={me}>{children}</MeContext>
}
