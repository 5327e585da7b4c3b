import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import path from 'node:path'
import { createApp } from './app.ts'
import { compose } from './composition.ts'
import type { Config } from './config.ts'
import { entities } from './entities.ts'
import { builtPages, developmentPages } from './pages.ts'
import type { Pages } from './pages.ts'
import { seedDemo } from './demo/seed-demo.ts'
import type { Clock } from './platform/clock.ts'
import { connectRuntime, poolOf } from './platform/database/data-source.ts'
import { prepareDatabase, runtimeUrlOf } from './platform/database/prepare-database.ts'
import { startJobs } from './platform/jobs/jobs.ts'
import { createLog } from './platform/log.ts'

export interface RunningServer {
  url: string
  stop(): Promise<void>
}

const root = path.resolve(import.meta.dirname, '..')

/** Migrates as the owner, connects as the runtime role, and listens. Also what browser tests start. */
export async function startServer(config: Config, clock: Clock): Promise<RunningServer> {
  const log = createLog(config.logLevel)
  await prepareDatabase(config.ownerDatabaseUrl, config.runtimePassword)
  const dataSource = await connectRuntime(
    runtimeUrlOf(config.ownerDatabaseUrl, config.runtimePassword),
    entities,
  )
  if (config.demo) await seedDemo({ dataSource, clock, log, dataFolder: config.dataFolder })
  const { demo, dataFolder, smtpUrl } = config
  const composition = compose({
    dataSource,
    clock,
    log,
    demo,
    dataFolder,
    smtpUrl,
    publicUrl: config.publicUrl ?? `http://${config.host}:${String(config.port)}`,
  })

  await composition.formulary.service.loadDefaults()

  const server = createServer()
  const pages: Pages =
    config.mode === 'development'
      ? await developmentPages(root, server)
      : builtPages(path.join(root, 'dist', 'client'))
  const { app, close } = createApp({ config, composition, pages: pages.handler })
  server.on('request', app)
  const jobs = await startJobs(poolOf(dataSource), composition.jobs, log)
  await new Promise<void>((resolve, reject) => {
    server.once('error', reject)
    server.listen(config.port, config.host, resolve)
  })
  const { port } = server.address() as AddressInfo
  const host = config.host.includes(':') ? `[${config.host}]` : config.host

  return {
    url: config.publicUrl ?? `http://${host}:${String(port)}`,
    async stop() {
      const ended = new Promise((resolve) => server.close(resolve))
      server.closeIdleConnections()
      const hurry = setTimeout(() => server.closeAllConnections(), 5_000)
      await pages.close()
      await ended
      clearTimeout(hurry)
      close()
      await jobs.stop()
      await composition.close()
      await dataSource.destroy()
    },
  }
}
