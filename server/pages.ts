import express from 'express'
import type { RequestHandler } from 'express'
import { existsSync, readFileSync } from 'node:fs'
import type { Server } from 'node:http'
import path from 'node:path'

export interface Pages {
  handler: RequestHandler
  close(): Promise<void>
}

/** The built client: hashed assets for a year, the page itself always asked for again. */
export function builtPages(folder: string): Pages {
  const page = path.join(folder, 'index.html')
  if (!existsSync(page)) throw new Error(`The client is not built: ${page} is missing. Run npm start.`)
  const router = express.Router()
  router.use('/assets', express.static(path.join(folder, 'assets'), { immutable: true, maxAge: '1y' }))
  router.use('/assets', (_req, res) => void res.status(404).type('text/plain').send('No such file'))
  router.use(express.static(folder, { index: false, maxAge: 0 }))
  router.get('/{*rest}', (_req, res) => {
    res.setHeader('Cache-Control', 'no-cache')
    res.type('html').send(readFileSync(page))
  })
  return { handler: router, close: async () => undefined }
}

/** The development server with hot reload, in the same process. */
export async function developmentPages(root: string, hmr: Server): Promise<Pages> {
  const { createServer } = await import('vite')
  const vite = await createServer({
    root,
    server: { middlewareMode: true, hmr: { server: hmr } },
    appType: 'custom',
  })
  const router = express.Router()
  router.use(vite.middlewares)
  router.get('/{*rest}', async (req, res) => {
    const html = await vite.transformIndexHtml(
      req.originalUrl,
      readFileSync(path.join(root, 'index.html'), 'utf8'),
    )
    res.type('html').send(html)
  })
  return { handler: router, close: () => vite.close() }
}
