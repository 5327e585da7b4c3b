import express from 'express'
import type { Express, RequestHandler } from 'express'
import session from 'express-session'
import { pinoHttp } from 'pino-http'
import type { Composition } from './composition.ts'
import type { Config } from './config.ts'
import { personOf } from './features/sign-in/index.ts'
import { poolOf } from './platform/database/data-source.ts'
import { apiDocsPage } from './platform/api-docs/api-docs-page.ts'
import { mountRoutes } from './platform/http/mount-routes.ts'
import { checkOrigin } from './platform/http/origin-check.ts'
import { openApiDocument } from './platform/http/openapi.ts'
import { Problem } from './platform/http/problem.ts'
import { giveRequestId, requestIdOf } from './platform/http/request-id.ts'
import { securityHeaders } from './platform/http/security-headers.ts'
import { createSessionStore } from './platform/http/session-store.ts'
import { problemEdge, unknownRoute } from './platform/http/to-problem.ts'

const sessionHours = 8

export interface AppParts {
  config: Pick<Config, 'sessionSecret' | 'publicUrl' | 'mode'>
  composition: Composition
  /** Pages and assets: built files or the development server; absent in API tests. */
  pages?: RequestHandler
}

/** The Express application; listens to nothing. `close` stops the session store's timer. */
export function createApp({ config, composition, pages }: AppParts): { app: Express; close(): void } {
  const { parts } = composition
  const tls = config.publicUrl?.startsWith('https:') ?? false
  const app = express()
  app.disable('x-powered-by')
  // One reverse proxy in front ends TLS where there is a public https address
  if (tls) app.set('trust proxy', 1)
  app.use(giveRequestId)
  app.use(pinoHttp({ logger: parts.log, genReqId: (req) => requestIdOf(req as express.Request) }))
  if (config.mode !== 'development') app.use(securityHeaders(tls))

  const store = createSessionStore(poolOf(parts.dataSource))
  const api = express.Router()

  api.get('/health', (_req, res) => void res.json({ status: 'ok' }))
  api.get('/ready', async (_req, res) => {
    const ready = await parts.dataSource.query('SELECT 1').then(
      () => true,
      () => false,
    )
    res.status(ready ? 200 : 503).json({ status: ready ? 'ok' : 'no database' })
  })
  api.use((_req, res, next) => {
    res.setHeader('Cache-Control', 'private, no-store')
    next()
  })
  api.use(checkOrigin(config.publicUrl))
  api.use(
    session({
      name: 'pratique.sid',
      secret: config.sessionSecret,
      store,
      resave: false,
      saveUninitialized: false,
      rolling: true,
      cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', maxAge: sessionHours * 3_600_000 },
    }),
  )
  api.use(composition.authenticator.session())
  api.get('/openapi.json', (req, res) => {
    if (!personOf(req)) throw new Problem('not-signed-in')
    res.json(openApiDocument())
  })
  api.get('/docs', (req, res) => {
    if (!personOf(req)) throw new Problem('not-signed-in')
    res.type('html').send(apiDocsPage())
  })
  mountRoutes(api, composition.routes, {
    personOf,
    onRefusal: (contract, person, requestId) =>
      parts.transactions.inTransaction({ actor: person, requestId }, async (tx) =>
        tx.audit({
          action: 'permission.refuse',
          subject: { kind: 'route', id: contract.id, label: contract.summary },
          after: { action: contract.action, roles: [...person.roles] },
        }),
      ),
  })
  api.use(unknownRoute)

  app.use('/api', api)
  if (pages) app.use(pages)
  app.use(problemEdge(parts.log))
  return { app, close: () => store.close() }
}
