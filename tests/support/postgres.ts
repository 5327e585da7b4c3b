import { createHash } from 'node:crypto'
import pg from 'pg'
import type { TestProject } from 'vitest/node'
import { Cluster } from '../../server/cli/postgres.mjs'
import { prepareDatabase } from '../../server/platform/database/prepare-database.ts'

declare module 'vitest' {
  interface ProvidedContext {
    /** Owner's address on the cluster as a whole: its database is `postgres`. */
    pgOwnerUrl: string
    /** Password of the runtime role, the same in every clone. */
    runtimePassword: string
  }
}

/**
 * Gives a project of tests a PostgreSQL cluster that holds the migrated database `tmpl`. Two projects name this
 * set-up, so it runs twice in one process: the second finds the cluster in PRATIQUE_TEST_PG and `tmpl` made.
 */
export default async function setUpPostgres(project: TestProject): Promise<() => Promise<void>> {
  let cluster: Cluster | undefined
  if (!process.env['PRATIQUE_TEST_PG']) {
    cluster = await Cluster.throwaway()
    await cluster.start()
    process.env['PRATIQUE_TEST_PG'] = cluster.url('postgres')
  }
  const pgOwnerUrl = onDatabase(process.env['PRATIQUE_TEST_PG'], 'postgres')
  const runtimePassword = createHash('sha256').update(`runtime ${pgOwnerUrl}`).digest('hex').slice(0, 32)
  await makeTemplate(pgOwnerUrl, runtimePassword)
  project.provide('pgOwnerUrl', pgOwnerUrl)
  project.provide('runtimePassword', runtimePassword)
  return async () => {
    if (!cluster) return
    delete process.env['PRATIQUE_TEST_PG']
    await cluster.stop()
  }
}

/** Made under another name and renamed when whole: whoever sees `tmpl` may clone it, since nobody connects to it. */
async function makeTemplate(pgOwnerUrl: string, runtimePassword: string): Promise<void> {
  const client = new pg.Client({ connectionString: pgOwnerUrl })
  await client.connect()
  try {
    await client.query(`SELECT pg_advisory_lock(hashtext('pratique template'))`)
    const made = await client.query(`SELECT 1 FROM pg_database WHERE datname = 'tmpl'`)
    if (made.rowCount) return
    await client.query('DROP DATABASE IF EXISTS tmpl_unfinished WITH (FORCE)')
    await client.query('CREATE DATABASE tmpl_unfinished')
    await prepareDatabase(onDatabase(pgOwnerUrl, 'tmpl_unfinished'), runtimePassword)
    await client.query('ALTER DATABASE tmpl_unfinished RENAME TO tmpl')
  } finally {
    await client.end()
  }
}

function onDatabase(serverUrl: string, database: string): string {
  const url = new URL(serverUrl)
  url.pathname = `/${database}`
  return url.href
}
