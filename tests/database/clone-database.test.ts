import pg from 'pg'
import { describe, expect, it } from 'vitest'
import { cloneDatabase } from '../support/database.ts'

async function rowsOf(url: string, sql: string): Promise<Record<string, unknown>[]> {
  const client = new pg.Client({ connectionString: url })
  await client.connect()
  try {
    return (await client.query<Record<string, unknown>>(sql)).rows
  } finally {
    await client.end()
  }
}

describe('cloneDatabase', () => {
  it('copies the migrated template, with its rights: the owner owns, the server only runs', async () => {
    const { ownerUrl, runtimeUrl, name } = await cloneDatabase()
    const [owner] = await rowsOf(ownerUrl, 'SELECT current_user AS person, current_database() AS name')
    expect(owner).toEqual({ person: 'pratique', name })
    const [migrations] = await rowsOf(ownerUrl, 'SELECT count(*)::int AS done FROM migrations')
    expect(migrations?.['done']).toBeGreaterThan(0)
    const [runtime] = await rowsOf(runtimeUrl, 'SELECT current_user AS person, current_database() AS name')
    expect(runtime).toEqual({ person: 'pratique_app', name })
    await expect(rowsOf(runtimeUrl, 'CREATE TABLE public.own (n int)')).rejects.toMatchObject({
      code: '42501',
    })
  })

  it('gives eight files that ask at once eight databases', async () => {
    const clones = await Promise.all(Array.from({ length: 8 }, () => cloneDatabase()))
    expect(new Set(clones.map((clone) => clone.name)).size).toBe(8)
    for (const { runtimeUrl } of clones)
      expect(await rowsOf(runtimeUrl, 'SELECT 1 AS one')).toEqual([{ one: 1 }])
  })
})
