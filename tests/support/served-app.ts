import express from 'express'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import path from 'node:path'
import { ensureClientBuild } from '../../server/cli/client-build.mjs'
import { builtPages } from '../../server/pages.ts'
import { startApi } from './api.ts'
import type { TestApi } from './api.ts'
import { tickingClock } from './test-time.ts'

export interface ServedApp extends TestApi {
  /** Address of the running application, API and pages, on a free port of this machine. */
  url: string
}

const root = path.resolve(import.meta.dirname, '../..')

/**
 * The whole application as a browser meets it: the test server of `startApi` with the built client in front of it, with
 * a clock that goes, as that of the page does. The client is built once, if it is not.
 *
 * @param given.pagesFolder another build of the client than the ordinary one
 * @param given.demo        with the practice scenario, see `startApi`
 */
export async function startServedApp(
  given: { pagesFolder?: string; demo?: boolean } = {},
): Promise<ServedApp> {
  const { pagesFolder, demo } = given
  if (pagesFolder === undefined) await ensureClientBuild(root)
  const api = await startApi({ clock: tickingClock(), demo })
  const pages = builtPages(pagesFolder ?? path.join(root, 'dist', 'client'))
  const outer = express()
  outer.disable('x-powered-by')
  outer.use(api.app)
  outer.use(pages.handler)
  const server = createServer(outer)
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.address() as AddressInfo
  return {
    ...api,
    url: `http://127.0.0.1:${String(port)}`,
    async stop() {
      server.closeAllConnections()
      await new Promise((resolve) => server.close(resolve))
      await pages.close()
      await api.stop()
    },
  }
}
