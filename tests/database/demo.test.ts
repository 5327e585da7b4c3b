import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import type { DataSource } from 'typeorm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { compose } from '../../server/composition.ts'
import type { Composition } from '../../server/composition.ts'
import { seedDemo } from '../../server/demo/seed-demo.ts'
import { verifyAnimals } from '../../server/features/animals/index.ts'
import { verifyRows } from '../../server/platform/audit/verify-rows.ts'
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

  it('has doses that were given by the rules: no stop stands against one of them', async () => {
    const { rows } = await composition.orders.queries.list({ limit: 50 })
    expect(rows.filter(({ dosesGiven }) => dosesGiven > 0).length).toBeGreaterThanOrEqual(3)
    expect(rows.filter(({ dosesIrregular }) => dosesIrregular > 0)).toEqual([])
  })

  it('has cases in different states, each with a date that can be worked out by hand', async () => {
    const { rows, tally } = await composition.quarantine.queries.board({ view: 'all', limit: 50 })
    const told = (name: string) => {
      const row = rows.find((one) => one.name === name)
      if (!row) throw new Error(`there is no case ${name}`)
      const { status, day0On, pausedDays, earliestClearanceOn, readyToClear, held, endedOn } = row
      return {
        status,
        day0On,
        pausedDays,
        earliestClearanceOn,
        readyToClear,
        held,
        endedOn,
        legs: row.legs.length,
      }
    }
    const running = {
      status: 'in-quarantine',
      pausedDays: 0,
      readyToClear: false,
      held: false,
      endedOn: null,
      legs: 1,
    }
    // The day of loading is 1 Dec 2026. Days in brackets: day 0, then day 0 + the protocol's length.
    // [26 Sep] cleared 36 days later
    expect(told('Lumpfish')).toMatchObject({ status: 'cleared', day0On: '2026-09-26', endedOn: '2026-11-01' })
    // [24 Oct + 60]
    expect(told('Axolotls and poison frogs')).toEqual({
      ...running,
      day0On: '2026-10-24',
      earliestClearanceOn: '2026-12-23',
    })
    // [29 Oct + 30], both samples negative
    expect(told('Lined seahorses')).toEqual({
      ...running,
      day0On: '2026-10-29',
      earliestClearanceOn: '2026-11-28',
      readyToClear: true,
    })
    // [19 Nov, the day the lionfish joined, + 50]; the net reported on 24 Nov was struck out
    expect(told('Reef shipment')).toEqual({
      ...running,
      day0On: '2026-11-19',
      earliestClearanceOn: '2027-01-08',
      legs: 2,
    })
    // [10 Nov + 45]; the death of 18 Nov is explained
    expect(told('Young sturgeon')).toEqual({
      ...running,
      day0On: '2026-11-10',
      earliestClearanceOn: '2026-12-25',
    })
    // [12 Nov + 40 + 2]: 27 h 10 min without a pump are two days begun
    expect(told('Stingrays')).toEqual({
      ...running,
      day0On: '2026-11-12',
      pausedDays: 2,
      earliestClearanceOn: '2026-12-24',
    })
    expect(told('Codling')).toMatchObject({ status: 'locked', held: true, earliestClearanceOn: null })
    expect(tally).toMatchObject({ all: 7, running: 6, ended: 1, ready: 1, held: 1 })
  })

  it('tells what happened in its cases: explained and unexplained deaths, additions, samples, extensions', async () => {
    const { rows } = await composition.quarantine.queries.board({ view: 'all', limit: 50 })
    const of = async (name: string) =>
      composition.quarantine.queries.caseById(rows.find((one) => one.name === name)?.id ?? '', [
        'veterinarian',
      ])
    const reef = await of('Reef shipment')
    expect(reef.deaths.map(({ on, finding }) => [on, finding])).toEqual([
      ['2026-11-26', 'unexplained'],
      ['2026-11-08', 'unexplained'],
    ])
    expect(reef.extensions.filter(({ kind }) => kind === 'death')).toMatchObject([
      { untilOn: '2026-12-10', state: 'standing' },
    ])
    const codes = reef.reasons.map(({ code }) => code)
    for (const code of ['transport-death', 'restarted-animals', 'extended-death', 'extended-masking-running'])
      expect(codes, code).toContain(code)
    expect(reef.openDiscrepancies).toBe(0)
    expect(reef.forVeterinarian).toBe(1)

    const sturgeon = await of('Young sturgeon')
    expect(sturgeon.deaths).toMatchObject([
      { finding: 'explained-not-transmissible', signature: { state: 'intact' } },
    ])
    expect(sturgeon.extensions.filter(({ kind }) => kind === 'death')).toMatchObject([{ state: 'withdrawn' }])
    const amphibians = await of('Axolotls and poison frogs')
    expect(amphibians.criteria).toMatchObject([
      { criterionId: 'two-pcr', count: 1, wanted: 2 },
      { criterionId: 'three-faecals', met: true },
    ])
    expect((await of('Lumpfish')).clearance).toMatchObject({ against: 0, signature: { state: 'intact' } })
  })

  it('has a certificate that can be looked up, and a call that was seen beside one that waits', async () => {
    const [print] = (await dataSource.query(
      `SELECT fingerprint FROM document_prints WHERE kind = 'clearance'`,
    )) as { fingerprint: string }[]
    expect(print?.fingerprint).toMatch(/^[0-9a-f]{64}$/)
    const acts = (await dataSource.query(
      `SELECT n.words, count(a.id)::int AS acts FROM notices n LEFT JOIN notice_acts a ON a.notice_id = n.id
        GROUP BY n.id ORDER BY n.happened_at`,
    )) as { acts: number }[]
    expect(acts.map((row) => row.acts)).toEqual([1, 0])
  })

  it('was looked at on every one of its days, and the missed ones show', async () => {
    const days = (await dataSource.query(
      `SELECT count(DISTINCT happened_on)::int AS n, count(*)::int AS all FROM observations`,
    )) as { n: number; all: number }[]
    expect(days[0]?.n).toBeGreaterThanOrEqual(85)
    expect(days[0]?.all).toBeGreaterThan(250)
  })

  it('has a register: every animal came by a transaction, permits are used up, papers are on file', async () => {
    expect(await count('counterparties')).toBeGreaterThanOrEqual(8)
    const bare = (await dataSource.query(
      `SELECT a.accession FROM animals a WHERE a.split_from_id IS NULL
          AND NOT EXISTS (SELECT 1 FROM transaction_lines l WHERE l.animal_id = a.id AND l.accessioned)`,
    )) as { accession: string }[]
    expect(bare).toEqual([])
    expect(await count('documents')).toBeGreaterThanOrEqual(10)
    const { rows } = await composition.permits.queries.permits({ offset: 0, limit: 50 })
    const left = Object.fromEntries(rows.map((row) => [row.permitNumber, [row.state, row.remaining]]))
    expect(left).toEqual({
      'NSF-C-041': ['runs-out', 10],
      'VM-EX-0733': ['valid', 0],
      'NR-519': ['valid', -2],
      'GH-EX-0088': ['valid', 7],
      'IH-26644': ['runs-out', null],
      'NSW-H-12': ['expired', 10],
    })
    expect((await verifyAnimals(dataSource)).faults).toEqual([])
    const kept = await verifyRows(dataSource)
    expect(kept.faults).toEqual([])
    expect(kept.rows).toBeGreaterThan(1000)
  })

  it('holds in its audit chain', async () => {
    expect((await verifyChain(dataSource)).brokenAt).toBeNull()
  })
})
