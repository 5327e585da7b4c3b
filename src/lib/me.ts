import { createContext, useContext } from 'react'
import { queryOptions } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import { signInAddresses } from '../../shared/contracts/sign-in.addresses.ts'
import type { getMe, Me } from '../../shared/contracts/sign-in.contract.ts'
import { api } from './api-client.ts'
import { pagePerson } from './page-person.ts'
import { isProblem } from './problem-error.ts'
import { meKey } from './query-client.ts'

/** Where other windows of this browser see who is signed in. */
export const personKey = 'pratique.person'

/** The person who was signed in when the server last answered; storage can be refused, then nobody is known without it. */
function keptPerson(): Me | null {
  try {
    const text = localStorage.getItem(personKey)
    return text === null ? null : (JSON.parse(text) as Me)
  } catch {
    return null
  }
}

function keepPerson(me: Me | null): void {
  try {
    if (me) localStorage.setItem(personKey, JSON.stringify(me))
    else localStorage.removeItem(personKey)
  } catch {
    // not kept, see above
  }
}

/** Who is signed in; `null` for nobody. */
export const meQuery = queryOptions({
  queryKey: meKey,
  queryFn: async ({ signal, client }): Promise<Me | null> => {
    const before = client.getQueryData<Me | null>(meKey)
    try {
      const me = await api<typeof getMe>(signInAddresses.getMe, { signal })
      keepPerson(me)
      // the page stays that of whoever opened it, and is told: see src/app/other-person.tsx
      if (before && before.id !== me.id) {
        pagePerson.differs(me.printedName)
        return before
      }
      pagePerson.drawnFor(me.id)
      return me
    } catch (error) {
      if (isProblem(error, 'not-signed-in')) {
        keepPerson(null)
        // the page stays that of whoever opened it, and asks for their password: see src/app/sign-in-again.tsx
        if (before) return before
        pagePerson.drawnFor(null)
        return null
      }
      // no signal: whoever was signed in still is, for what is kept on this device; the server decides when it answers
      const last = isProblem(error) && error.noAnswer ? (before ?? keptPerson()) : null
      if (last) {
        if (pagePerson.now().id === null) pagePerson.drawnFor(last.id)
        return last
      }
      throw error
    }
  },
  staleTime: 60_000,
  // another window of this browser may have signed somebody else in
  refetchOnWindowFocus: 'always',
  networkMode: 'always',
})

/** Set by the application around every screen that needs somebody to be signed in. */
export const MeContext = createContext<Me | null>(null)

/**
 * The person who is signed in. It is read from around the screen, not from the store: when a session ends, the screen is
 * taken away as a whole, and no part of it has to draw itself for nobody.
 */
export function useMe(): Me {
  const me = useContext(MeContext)
  if (!me) throw new Error('useMe needs somebody to be signed in')
  return me
}

/** The person of this page is signed in again: it goes on where it was, and everything on it is read anew. */
export function comeBack(client: QueryClient, me: Me): void {
  client.setQueryData(meKey, me)
  keepPerson(me)
  pagePerson.drawnFor(me.id)
  void client.invalidateQueries({ predicate: (query) => query.queryKey[0] !== meKey[0] })
}

/** Somebody else is there now, or nobody: who that is, and nothing that was read under the one before. */
export function changePerson(client: QueryClient, me: Me | null): void {
  client.setQueryData(meKey, me)
  keepPerson(me)
  pagePerson.drawnFor(me?.id ?? null)
  client.removeQueries({ predicate: (query) => query.queryKey[0] !== meKey[0] })
  client.getMutationCache().clear()
}
