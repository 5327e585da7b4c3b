import { MutationCache, QueryCache, QueryClient } from '@tanstack/react-query'
import { pagePerson } from './page-person.ts'
import { isProblem } from './problem-error.ts'

/** The key under which the client keeps who is signed in. */
export const meKey = ['me'] as const

/** Server state lives here and nowhere else. */
export function createQueryClient(): QueryClient {
  const client: QueryClient = new QueryClient({
    queryCache: new QueryCache({ onError: noticeSession }),
    mutationCache: new MutationCache({ onError: noticeSession }),
    defaultOptions: {
      // asked even when the browser thinks there is no network: an answer or a plain failure, never a silent wait
      queries: {
        networkMode: 'always',
        staleTime: 15_000,
        retry: (failures, error) => failures < 2 && mayHeal(error),
        retryDelay: (attempt) => Math.min(4000, 500 * 2 ** attempt),
        throwOnError: false,
      },
      mutations: { networkMode: 'always', retry: false },
    },
  })
  function noticeSession(error: unknown): void {
    // a page with somebody's text on it asks for their password in place: src/app/sign-in-again.tsx
    if (isProblem(error, 'not-signed-in') && pagePerson.now().id === null) client.setQueryData(meKey, null)
    // roles may have been withdrawn since this page was drawn
    if (isProblem(error, 'password-change-required', 'may-not'))
      void client.invalidateQueries({ queryKey: meKey })
  }
  return client
}

/** Whether the same request may succeed by itself a moment later. A refusal will not. */
function mayHeal(error: unknown): boolean {
  return isProblem(error) && (error.noAnswer || error.status === 503)
}
