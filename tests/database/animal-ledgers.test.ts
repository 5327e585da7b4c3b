import fc from 'fast-check'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { verifyAnimals } from '../../server/features/animals/index.ts'
import { listRunningCounts } from '../../shared/domain/ledger/list-running-counts.ts'
import { aGroup, anAnimal, aPlace, arrivalAt, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let runtime: pg.Client
let owner: pg.Client
let taxonId: string
let places: TestPlace[]
beforeAll(async () => {
  api = await startApi()
  taxonId = await aStingray(api)
  places = [await aPlace(api), await aPlace(api), await aPlace(api)]
  owner = new pg.Client({ connectionString: api.ownerUrl })
  runtime = new pg.Client({ connectionString: api.runtimeUrl })
  await owner.connect()
  await runtime.connect()
})
afterAll(async () => {
  await owner.end()
  await runtime.end()
  await api.stop()
})

const entry = (
  animalId: string,
  delta: number,
  at: string,
  kind = 'count-adjustment',
  transferId?: string,
) => ({
  text: `INSERT INTO count_entries (id, animal_id, kind, delta, transfer_id, reason, happened_at, happened_on, recorded_at)
         VALUES ($1, $2, $3, $4, $5, 'by hand', $6, '2026-11-01', now())`,
  values: [api.nextId(), animalId, kind, delta, transferId ?? null, at],
})
const place = (n: number) => places[n]?.id ?? ''

describe('the database itself', () => {
  it('keeps a count from falling below zero at any moment, also in the past', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: place(0), count: 3 })
    await expect(runtime.query(entry(school.id, -4, '2026-11-10'))).rejects.toMatchObject({
      code: '23514',
      constraint: 'ck_count_entries_running_sum',
    })
    await runtime.query(entry(school.id, -3, '2026-11-10'))
    await expect(runtime.query(entry(school.id, -1, '2026-11-05'))).rejects.toMatchObject({
      constraint: 'ck_count_entries_running_sum',
    })
    // before it came there was none to lose
    await expect(runtime.query(entry(school.id, -1, '2026-10-01'))).rejects.toMatchObject({ code: '23514' })
  })

  it('keeps it from falling below zero by striking a line out', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: place(0), count: 3 })
    await runtime.query(entry(school.id, -3, '2026-11-10'))
    const { rows } = await runtime.query<{ id: string }>(
      'SELECT id FROM count_entries WHERE animal_id = $1 AND delta > 0',
      [school.id],
    )
    await expect(
      runtime.query(
        `INSERT INTO animal_voids (id, count_entry_id, reason, recorded_at) VALUES ($1, $2, 'x', now())`,
        [api.nextId(), rows[0]?.id],
      ),
    ).rejects.toMatchObject({ constraint: 'ck_count_entries_running_sum' })
  })

  it('lets an individual be one, and only one', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: place(0) })
    await expect(runtime.query(entry(ray.id, 1, '2026-11-10'))).rejects.toMatchObject({
      constraint: 'ck_count_entries_individual',
    })
  })

  it('takes splits and merges only in balanced pairs', async () => {
    const one = await aGroup(api, { taxonId, enclosureId: place(0), count: 5 })
    const two = await aGroup(api, { taxonId, enclosureId: place(0), count: 5 })
    const pair = async (into: number, kindIn = 'split-in', at = '2026-11-10') => {
      const transferId = api.nextId()
      await runtime.query('BEGIN')
      try {
        await runtime.query(entry(one.id, -2, '2026-11-10', 'split-out', transferId))
        if (into > 0) await runtime.query(entry(two.id, into, at, kindIn, transferId))
        await runtime.query('COMMIT')
      } catch (error) {
        await runtime.query('ROLLBACK')
        throw error
      }
    }
    for (const wrong of [
      () => pair(0),
      () => pair(3),
      () => pair(2, 'merge-in'),
      () => pair(2, 'split-in', '2026-11-11'),
    ])
      await expect(wrong()).rejects.toMatchObject({ constraint: 'ck_count_entries_balanced' })
    await pair(2)
    await expect(runtime.query(entry(one.id, -1, '2026-11-10', 'split-out'))).rejects.toMatchObject({
      constraint: 'ck_count_entries_transfer',
    })
  })

  it('lets only one of two transactions take the last animals, though each fits alone', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: place(0), count: 5 })
    const other = new pg.Client({ connectionString: api.runtimeUrl })
    await other.connect()
    await runtime.query('BEGIN')
    await other.query('BEGIN')
    await runtime.query(entry(school.id, -4, '2026-11-10'))
    await other.query(entry(school.id, -4, '2026-11-10'))
    const ends = await Promise.allSettled([runtime.query('COMMIT'), other.query('COMMIT')])
    await other.end()
    expect(ends.map((end) => end.status).sort()).toEqual(['fulfilled', 'rejected'])
  })

  it('holds no animal in two enclosures at a time', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: place(0) })
    const { rows } = await runtime.query<{ id: string }>(
      `INSERT INTO moves (id, animal_id, kind, to_enclosure_id, automatic, happened_at, happened_on, recorded_at)
       VALUES ($1, $2, 'arrival', $3, false, '2026-11-12', '2026-11-12', now()) RETURNING id`,
      [api.nextId(), ray.id, place(1)],
    )
    await expect(
      runtime.query(
        `INSERT INTO stays (began_with_move_id, animal_id, enclosure_id, during)
         VALUES ($1, $2, $3, tstzrange('2026-11-12', NULL))`,
        [rows[0]?.id, ray.id, place(1)],
      ),
    ).rejects.toMatchObject({ code: '23P01', constraint: 'ex_stays_one_place' })
    await owner.query('DELETE FROM moves WHERE id = $1', [rows[0]?.id])
  })

  it.each([
    'UPDATE count_entries SET delta = 1',
    'DELETE FROM count_entries',
    'UPDATE moves SET to_enclosure_id = NULL',
    'DELETE FROM moves',
    'UPDATE weights SET weight_kg = 1',
    'DELETE FROM deaths',
    'DELETE FROM animal_voids',
    'DELETE FROM movement_locks',
    'UPDATE discrepancies SET facts = $${}$$',
    'DELETE FROM animals',
    `UPDATE animals SET accession = 'X'`,
    `UPDATE animals SET form = 'group'`,
    'DELETE FROM taxa',
    'INSERT INTO live_count_entries SELECT * FROM count_entries',
    'TRUNCATE stays',
  ])('refuses the runtime role: %s', async (sql) => {
    await expect(runtime.query(sql)).rejects.toMatchObject({ code: '42501' })
  })
})

describe('npm run verify', () => {
  it('finds a stay, a description and a transfer that do not follow from their ledgers', async () => {
    const { dataSource } = api.composition.parts
    expect((await verifyAnimals(dataSource)).faults).toEqual([])
    const ray = await anAnimal(api, { taxonId, enclosureId: place(0) })
    await owner.query(`UPDATE stays SET enclosure_id = $2 WHERE animal_id = $1`, [ray.id, place(1)])
    await owner.query(`UPDATE animals SET sex = 'male' WHERE id = $1`, [ray.id])
    const { faults } = await verifyAnimals(dataSource)
    expect(faults.map((fault) => [fault.at, fault.what])).toEqual([
      [ray.accession, 'stays'],
      [ray.accession, 'description'],
    ])
    await owner.query(`UPDATE stays SET enclosure_id = $2 WHERE animal_id = $1`, [ray.id, place(0)])
    await owner.query(`UPDATE animals SET sex = 'unknown' WHERE id = $1`, [ray.id])
  })
})

type Step = {
  do: 'die' | 'hatch' | 'adjust' | 'split' | 'merge' | 'move'
  who: number
  other: number
  n: number
  minute: number
}

const step = fc.record({
  do: fc.constantFrom<Step['do']>('die', 'hatch', 'adjust', 'split', 'merge', 'move'),
  who: fc.nat(5),
  other: fc.nat(5),
  n: fc.integer({ min: 1, max: 6 }),
  minute: fc.nat(500),
})

describe('whatever happens to groups', () => {
  it('makes and loses no animal but by birth, death and adjustment, and ends where the ledgers say', async () => {
    const keeper = await api.as('keeper')
    const registrar = await api.as('registrar')
    await fc.assert(
      fc.asyncProperty(fc.array(step, { minLength: 4, maxLength: 14 }), async (steps) => {
        const founder = await aGroup(api, { taxonId, enclosureId: place(0), count: 20 })
        const ours = [founder.accession]
        let expected = 20
        for (const one of steps) {
          const url = `/api/animals/${ours[one.who % ours.length] ?? ''}`
          const happenedAt = new Date(Date.parse(arrivalAt) + (one.minute + 1) * 60_000).toISOString()
          const id = api.nextId()
          const to = place(one.other % 3)
          const { n } = one
          const send = async (who: typeof keeper, tail: string, body: object) => {
            const reply = await who.agent.post(`${url}/${tail}`).send({ id, happenedAt, ...body })
            expect(reply.status, JSON.stringify(reply.body)).toBeLessThan(500)
            return reply
          }
          if (one.do === 'die') {
            const reply = await send(keeper, 'deaths', { kind: 'found-dead', count: n })
            expected -= Number(reply.body.postedCount)
          } else if (one.do === 'hatch') {
            if ((await send(keeper, 'births', { count: n })).status === 201) expected += n
          } else if (one.do === 'adjust') {
            const delta = one.other % 2 === 0 ? n : -n
            const reply = await send(registrar, 'adjustments', { delta, reason: 'property' })
            if (reply.status === 201) expected += delta
          } else if (one.do === 'split') {
            const reply = await send(keeper, 'splits', { form: 'group', count: n, toEnclosureId: to })
            if (reply.status === 201) ours.push(String(reply.body.into.accession))
          } else if (one.do === 'merge') {
            await send(keeper, 'merges', { into: ours[one.other % ours.length] ?? '', count: n })
          } else {
            const sheet = await keeper.agent.get(url).expect(200)
            await send(keeper, 'moves', { fromEnclosureId: sheet.body.place?.id ?? to, toEnclosureId: to })
          }
        }
        const rows = await api.composition.parts.dataSource.query<{ ledger: number }[]>(
          `SELECT coalesce(sum(e.delta), 0)::int AS ledger FROM animals a JOIN live_count_entries e ON e.animal_id = a.id
            WHERE a.accession = ANY ($1)`,
          [ours],
        )
        expect(rows[0]?.ledger).toBe(expected)
        expect((await verifyAnimals(api.composition.parts.dataSource)).faults).toEqual([])
      }),
      { numRuns: 15 },
    )
  }, 120_000)

  it('reads the same running sum in the database and in the pure rules', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: place(0), count: 9 })
    for (const [delta, at] of [
      [-4, '2026-11-08T00:00:00Z'],
      [6, '2026-11-08T00:00:00Z'],
      [-9, '2026-11-09T00:00:00Z'],
      [1, '2026-11-07T00:00:00Z'],
    ] as const)
      await runtime.query(entry(school.id, delta, at))
    const reply = await (await api.as('keeper')).agent.get(`${school.url}/counts`).expect(200)
    type Line = { id: string; kind: 'count-adjustment'; delta: number; balance: number; happenedAt: string }
    const lines = reply.body.lines as Line[]
    const worked = listRunningCounts(
      lines.map((line) => ({
        entryId: line.id,
        animalId: school.id,
        kind: line.kind,
        delta: line.delta,
        at: line.happenedAt,
        recordedAt: line.happenedAt,
        transferId: null,
      })),
    )
    if (!worked.ok) throw new Error(worked.refusal.code)
    expect(worked.value.map((one) => one.balance)).toEqual(lines.map((line) => line.balance).reverse())
    expect(lines[0]?.balance).toBe(3)
  })
})
