import { useState } from 'react'
import type { QueryClient } from '@tanstack/react-query'
import { RouterProvider } from 'react-router-dom'
import { Providers } from './providers.tsx'
import { createRouter } from './router.tsx'

/** The whole client: one store of server state, one router. */
export function Application({ client }: { client: QueryClient }) {
  const [router] = useState(() => createRouter(client))
  return (
    <Providers client={client}>
      <RouterProvider router={router} />
    </Providers>
  )
}
