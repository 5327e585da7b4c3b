import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import pg from 'pg'
import { tableKinds } from '../../server/platform/database/table-kinds.ts'
import { cloneDatabase } from '../support/database.ts'

let runtime: pg.Client
let owner: pg.Client
beforeAll(async () => {
  const database = await cloneDatabase()
  runtime = new pg.Client({ connectionString: database.runtimeUrl })
  owner = new pg.Client({ connectionString: database.ownerUrl })
  await runtime.connect()
  await owner.connect()
})
afterAll(async () => {
  await runtime.end()
  await owner.end()
})

interface Rights {
  name: string
  select: boolean
  insert: boolean
  update: boolean
  update_some: boolean
  delete: boolean
  truncate: boolean
}

const readRights = async () =>
  (
    await owner.query<Rights>(`
      SELECT c.relname AS name,
             has_table_privilege('pratique_app', c.oid, 'SELECT') AS select,
             has_table_privilege('pratique_app', c.oid, 'INSERT') AS insert,
             has_table_privilege('pratique_app', c.oid, 'UPDATE') AS update,
             has_any_column_privilege('pratique_app', c.oid, 'UPDATE') AS update_some,
             has_table_privilege('pratique_app', c.oid, 'DELETE') AS delete,
             has_table_privilege('pratique_app', c.oid, 'TRUNCATE') AS truncate
        FROM pg_class c JOIN pg_namespace n ON n.oid = c.relnamespace
       WHERE n.nspname = 'public' AND c.relkind = 'r' ORDER BY c.relname`)
  ).rows

describe('rights of the runtime role', () => {
  it('fit the declared kind of every table', async () => {
    const rights = await readRights()
    expect(rights.map((row) => row.name).sort()).toEqual(Object.keys(tableKinds).sort())
    for (const row of rights) {
      const kind = tableKinds[row.name]
      const changes = kind !== 'ledger' && kind !== 'sealed'
      expect.soft(row.select, `${row.name} can be read`).toBe(true)
      expect.soft(row.update_some, `${row.name} (${String(kind)}) update`).toBe(changes)
      expect.soft(row.truncate, `${row.name} truncate`).toBe(false)
      if (!changes || kind === 'draft')
        expect.soft(row.delete, `${row.name} (${String(kind)}) delete`).toBe(false)
    }
  })

  it.each([
    [`UPDATE audit_entries SET text = ''`],
    [`DELETE FROM audit_entries`],
    [`TRUNCATE audit_entries`],
    [`UPDATE licences SET valid_until = '2099-01-01'`],
    [`ALTER TABLE people ADD COLUMN x text`],
    [`DROP TABLE licences`],
    [`CREATE TABLE mine (id int)`],
    [`ALTER TABLE people DISABLE TRIGGER ALL`],
    [`SET ROLE pratique`],
    [`SET session_replication_role = replica`],
  ])('refuses %s', async (sql) => {
    await expect(runtime.query(sql)).rejects.toMatchObject({ code: '42501' })
  })
})
