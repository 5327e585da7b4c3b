import { queryOptions, useQuery } from '@tanstack/react-query'
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

/** The person who is signed in. Only below the frame of the application, where somebody is. */
export function useMe(): Me {
  const { data } = useQuery(meQuery)
  if (!data) throw new Error('useMe needs somebody to be signed in')
  return data
}
