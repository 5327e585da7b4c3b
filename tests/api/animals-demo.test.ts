import { afterAll, beforeAll, expect, it } from 'vitest'
import { seedAnimals, seedTaxa } from '../../server/demo/animals.ts'
import type { SeededAnimal } from '../../server/demo/animals.ts'
import { demoAnimals } from '../../server/demo/animals-data.ts'
import { seedPeople } from '../../server/demo/people.ts'
import { verifyAnimals } from '../../server/features/animals/index.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let seeded: SeededAnimal[]
beforeAll(async () => {
  api = await startApi()
  const { composition, clock } = api
  const people = await seedPeople(composition)
  // the places alone: the readings of the water are tested by themselves
  const enclosureIds = new Map<string, string>()
  for (const { enclosure } of demoAnimals)
    if (!enclosureIds.has(enclosure)) enclosureIds.set(enclosure, (await anEnclosure(api, enclosure)).id)
  const taxa = await seedTaxa(composition, people)
  seeded = await seedAnimals(composition, { clock, now: testDay, people, enclosureIds, taxa })
}, 120_000)
afterAll(() => api.stop())

it('fills the house: at least 60 animals and groups of at least 20 taxa, in at least 12 enclosures', async () => {
  const { agent } = await api.as('technician')
  const list = await agent.get('/api/animals?limit=200').expect(200)
  const rows = list.body.rows as {
    taxon: { id: string }
    place: { code: string }
    newestWeight: object | null
  }[]
  expect(rows.length).toBeGreaterThanOrEqual(60)
  expect(new Set(rows.map((row) => row.taxon.id)).size).toBeGreaterThanOrEqual(20)
  expect(new Set(rows.map((row) => row.place.code)).size).toBeGreaterThanOrEqual(12)
  expect(rows.filter((row) => row.newestWeight !== null).length).toBeGreaterThanOrEqual(50)
  expect(seeded).toHaveLength(demoAnimals.length)
  expect(seeded.every((one) => one.accession.startsWith('HP-'))).toBe(true)
})

it('has 90 days of weights, none of them doubted but those of young animals without a band of their own', async () => {
  const { agent } = await api.as('technician')
  const octopus = seeded.find((one) => one.batch === 'octopus')
  const weights = await agent.get(`/api/animals/${octopus?.accession ?? ''}/weights`).expect(200)
  expect(weights.body.rows.length).toBeGreaterThanOrEqual(12)
  expect(weights.body.rows.at(-1).happenedOn).toBe('2026-09-03')
  const doubted: { n: number }[] = await api.composition.parts.dataSource.query(
    `SELECT count(*)::int AS n FROM weights w JOIN animals a ON a.id = w.animal_id
      WHERE w.doubt IS NOT NULL AND a.stage <> 'juvenile'`,
  )
  expect(doubted[0]?.n).toBe(0)
})

it('shows what happens: deaths, an estimate, a split, and one discrepancy that waits', async () => {
  const { agent } = await api.as('veterinarian')
  const open = await agent.get('/api/discrepancies').expect(200)
  expect(open.body.rows).toMatchObject([
    { kind: 'more-than-counted', forRole: 'registrar', facts: { seen: 6, posted: 5, excess: 1 } },
  ])
  const trout = seeded.find((one) => one.scientificName === 'Oncorhynchus mykiss')
  const sheet = await agent.get(`/api/animals/${trout?.accession ?? ''}`).expect(200)
  expect(sheet.body).toMatchObject({ count: { ledger: 19 } })
  expect(sheet.body.splitInto).toHaveLength(1)
  expect((await verifyAnimals(api.composition.parts.dataSource)).faults).toEqual([])
})
