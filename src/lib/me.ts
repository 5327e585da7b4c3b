import { createContext, useContext } from 'react'
import { queryOptions } from '@tanstack/react-query'
import type { QueryClient } from '@tanstack/react-query'
import { signInAddresses } from '../../shared/contracts/sign-in.addresses.ts'
import type { getMe, Me } from '../../shared/contracts/sign-in.contract.ts'
import { api } from './api-client.ts'
import { isProblem } from './problem-error.ts'
import { meKey } from './query-client.ts'

/** Who is signed in; `null` for nobody. */
export const meQuery = queryOptions({
  queryKey: meKey,
  queryFn: async ({ signal }): Promise<Me | null> => {
    try {
      return await api<typeof getMe>(signInAddresses.getMe, { signal })
    } catch (error) {
      if (isProblem(error, 'not-signed-in')) return null
      throw error
    }
  },
  staleTime: 60_000,
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

/** Somebody else is there now, or nobody: who that is, and nothing that was read under the one before. */
export function changePerson(client: QueryClient, me: Me | null): void {
  client.setQueryData(meKey, me)
  client.removeQueries({ predicate: (query) => query.queryKey[0] !== meKey[0] })
  client.getMutationCache().clear()
}
