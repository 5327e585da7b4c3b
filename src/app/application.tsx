import { useState } from 'react'
import { RouterProvider } from 'react-router-dom'
import { createQueryClient } from '../lib/query-client.ts'
import { Providers } from './providers.tsx'
import { createRouter } from './router.tsx'

/** The whole client: one store of server state, one router. */
export function Application() {
  const [client] = useState(createQueryClient)
  const [router] = useState(() => createRouter(client))
  return (
    <Providers client={client}>
      <RouterProvider router={router} />
    </Providers>
  )
}
