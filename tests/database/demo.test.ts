import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { compose } from '../../server/composition.ts'
import type { Composition } from '../../server/composition.ts'
import { seedDemo } from '../../server/demo/seed-demo.ts'
import { entities } from '../../server/entities.ts'
import { verifyChain } from '../../server/platform/audit/verify-chain.ts'
import { settableClock } from '../../server/platform/clock.ts'
import { connectRuntime } from '../../server/platform/database/data-source.ts'
import { createLog } from '../../server/platform/log.ts'
import { cloneDatabase } from '../support/database.ts'
import { testDay } from '../support/api.ts'

let dataSource: DataSource
let composition: Composition
let dataFolder: string
beforeAll(async () => {
  const database = await cloneDatabase()
  dataSource = await connectRuntime(database.runtimeUrl, entities, 8)
  dataFolder = await mkdtemp(path.join(tmpdir(), 'pratique-demo-'))
  const outside = { dataSource, clock: settableClock(testDay), log: createLog('silent'), dataFolder }
  expect(await seedDemo(outside)).toBe(true)
  // A second start finds people there and loads nothing
  expect(await seedDemo(outside)).toBe(false)
  composition = compose({ ...outside, demo: true })
}, 300_000)
afterAll(async () => {
  await composition.close()
  await dataSource.destroy()
  await rm(dataFolder, { recursive: true, force: true })
})

const count = async (table: string) =>
  Number(((await dataSource.query(`SELECT count(*) AS n FROM ${table}`)) as { n: string }[])[0]?.n)

describe('the practice scenario', () => {
  it('is large enough to show the work: places, waters, animals, taxa, readings, weights', async () => {
    expect(await count('enclosures')).toBeGreaterThanOrEqual(12)
    expect(await count('animals')).toBeGreaterThanOrEqual(60)
    expect(await count('taxa')).toBeGreaterThanOrEqual(20)
    expect(await count('readings')).toBeGreaterThan(90 * 6)
    expect(await count('weights')).toBeGreaterThan(60)
  })

  it('has orders in every state', async () => {
    const { rows } = await composition.orders.queries.list({ limit: 50 })
    expect(rows.length).toBeGreaterThanOrEqual(8)
    const phases = new Set(rows.map((row) => row.phase))
    for (const phase of [
      'draft',
      'proposed',
      'not-started',
      'in-progress',
      'held',
      'completed',
      'expired',
      'discontinued',
    ])
      expect(phases, phase).toContain(phase)
  })

  it('holds in its audit chain', async () => {
    expect((await verifyChain(dataSource)).brokenAt).toBeNull()
  })
})
