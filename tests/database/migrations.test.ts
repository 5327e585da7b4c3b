import { randomBytes } from 'node:crypto'
import pg from 'pg'
import { expect, inject, it } from 'vitest'
import { prepareDatabase } from '../../server/platform/database/prepare-database.ts'
import { migrations } from '../../server/migrations/index.ts'

async function emptyDatabase(): Promise<string> {
  const url = new URL(inject('pgOwnerUrl'))
  const client = new pg.Client({ connectionString: url.href })
  await client.connect()
  const name = `m_${randomBytes(6).toString('hex')}`
  await client.query(`CREATE DATABASE ${name}`)
  await client.end()
  url.pathname = `/${name}`
  return url.href
}

const ask = async (url: string, sql: string) => {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query(sql)).rows as Record<string, unknown>[]
  } finally {
    await client.end()
  }
}

it('migrates an empty database once, though four processes start at the same moment', async () => {
  const url = await emptyDatabase()
  await Promise.all(Array.from({ length: 4 }, () => prepareDatabase(url, inject('runtimePassword'))))
  const done = await ask(url, 'SELECT name FROM migrations ORDER BY id')
  expect(done.map((row) => row['name'])).toEqual(migrations.map((migration) => migration.name))
})

it('refuses a database that a newer program has migrated', async () => {
  const url = await emptyDatabase()
  await prepareDatabase(url, inject('runtimePassword'))
  await ask(
    url,
    `INSERT INTO migrations (timestamp, name) VALUES (1999999999999, 'FromTheFuture1999999999999')`,
  )
  await expect(prepareDatabase(url, inject('runtimePassword'))).rejects.toThrow(/newer Pratique/)
})

it('names its migrations in order, each with a timestamp of its own', () => {
  const stamps = migrations.map((migration) => Number(/\d{13}$/.exec(migration.name)?.[0]))
  expect(stamps.every((stamp, i) => i === 0 || stamp > (stamps[i - 1] ?? 0))).toBe(true)
})
