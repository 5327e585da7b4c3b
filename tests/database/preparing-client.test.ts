import { afterAll, beforeAll, expect, it } from 'vitest'
import type pg from 'pg'
import { PreparingClient } from '../../server/platform/database/preparing-client.ts'
import { cloneDatabase } from '../support/database.ts'

let client: pg.Client
beforeAll(async () => {
  client = new PreparingClient({ connectionString: (await cloneDatabase()).runtimeUrl })
  await client.connect()
})
afterAll(() => client.end())

const kept = async () =>
  (
    await client.query<{ statement: string }>({
      text: `SELECT statement FROM pg_prepared_statements ORDER BY prepare_time`,
    })
  ).rows.map(({ statement }) => statement)

it('plans a read once and answers each time by what was asked', async () => {
  const double = 'SELECT 2 * $1::int AS twice'
  for (const [asked, twice] of [
    [4, 8],
    [5, 10],
  ])
    expect((await client.query<{ twice: number }>(double, [asked])).rows).toEqual([{ twice }])
  await client.query('SELECT 1 AS one')
  await client.query('SELECT 1 AS one')
  expect(await kept()).toEqual([double, 'SELECT 1 AS one'])
})

it('sends as they come what writes and what is several texts', async () => {
  const before = await kept()
  await client.query('CREATE TEMPORARY TABLE fed (grams int)')
  await client.query('INSERT INTO fed VALUES ($1)', [3])
  await client.query('SELECT 1; SELECT 2')
  expect(await kept()).toEqual(before)
})

it('says a refused read as the database does, and the next one is answered', async () => {
  const parts = 'SELECT 1 / $1::int AS part'
  await expect(client.query(parts, [0])).rejects.toMatchObject({ code: '22012' })
  expect((await client.query<{ part: number }>(parts, [1])).rows).toEqual([{ part: 1 }])
})

it('keeps no more texts than its bound', async () => {
  for (let column = 0; column < 520; column += 1) await client.query(`SELECT 1 AS c${column.toString()}`)
  expect((await kept()).length).toBe(500)
  expect((await client.query<{ c519: number }>('SELECT 1 AS c519')).rows).toEqual([{ c519: 1 }])
})
