import { afterAll, beforeAll, expect, it } from 'vitest'
import { seedPeople } from '../../server/demo/people.ts'
import { seedWater } from '../../server/demo/water.ts'
import type { DemoWaterIds } from '../../server/demo/water.ts'
import { startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let ids: DemoWaterIds
beforeAll(async () => {
  api = await startApi()
  const people = await seedPeople(api.composition)
  ids = await seedWater(api.composition, { clock: api.clock, now: testDay, people })
}, 60_000)
afterAll(() => api.stop())

const facts = async (code: string, at = testDay) => {
  const found = await api.composition.water.questions.connectedWaterAt(ids.enclosureIds.get(code) ?? '', at)
  if (!found) throw new Error(`${code} has no water`)
  return found
}

it('fills the house: enclosures in several waters, each with its volume, ranges and newest readings', async () => {
  const { agent } = await api.as('technician')
  const list = await agent.get('/api/water?limit=100').expect(200)
  const rows = list.body.rows as { code: string; volumeState: string; lastReadingAt: string | null }[]
  expect(rows.length).toBeGreaterThanOrEqual(12)
  const map = (await agent.get('/api/water-map').expect(200)).body
  expect(map.waters.length).toBeGreaterThanOrEqual(12)
  for (const code of ['QT-1', 'QT-2', 'QT-3', 'QT-4', 'QT-5', 'QT-6', 'KH-1', 'RG-2', 'TT-1'])
    expect(rows.find((row) => row.code === code)?.volumeState, code).toBe('usable')
  expect(rows.find((row) => row.code === 'JR-1')?.volumeState).toBe('to-confirm')
  expect(rows.filter((row) => row.lastReadingAt !== null).length).toBeGreaterThanOrEqual(12)
})

it('has a volume in the quarantine wing that can be worked out by hand', async () => {
  // QT-1: 2.40 × 1.20 × 0.68 + 1.10 × 0.60 × 0.40 m, 14.2 m of 57 mm pipe, 41 L displaced (mensuration, by hand)
  const pipe = (Math.PI / 4) * 0.057 ** 2 * 14.2 * 1000
  const { volume } = await facts('QT-1')
  expect(volume?.netVolumeLitres).toBeCloseTo(1958.4 + 264 + pipe - 41, 6)
  expect(volume).toMatchObject({ confirmed: true, holdsForThisValveState: true, method: 'geometry' })
  // usable on every day of the history that is shown
  const early = await facts('QT-1', new Date(testDay.getTime() - 89 * 86_400_000))
  expect(early.volume).toMatchObject({ confirmed: true, holdsForThisValveState: true })
})

it('has 90 days of readings, the same on every machine, within what instruments show', async () => {
  const { agent } = await api.as('technician')
  const list = await agent
    .get('/api/enclosures/QT-1/readings?parameter=temperature&direction=asc&limit=200')
    .expect(200)
  expect(list.body.total).toBe(91)
  expect(list.body.rows[0].happenedOn).toBe('2026-09-02')
  expect(list.body.rows.slice(0, 3).map((row: { value: { value: string } }) => row.value.value))
    .toMatchInlineSnapshot(`
    [
      "25.4",
      "25.5",
      "25.5",
    ]
  `)
  const latest = (await facts('QT-6')).latestReadings.find((row) => row.parameter === 'total-ammonia-n')
  expect(latest?.judgement).toMatchObject({ level: 'inner', side: 'high' })
})

it('shows what is off, and what was done to the water', async () => {
  const one = await facts('QT-1')
  expect(one.lifeSupport.filter((unit) => unit.on === false).map((unit) => unit.code)).toEqual([
    'AC-1',
    'UV-1',
  ])
  const { agent } = await api.as('technician')
  const { events } = (await agent.get('/api/enclosures/QT-1/water').expect(200)).body
  expect(events.length).toBeGreaterThanOrEqual(5)
})

it('joins two quarantine systems when their cross-connection is opened', async () => {
  const { agent } = await api.as('technician')
  const id = ids.connectionIds.get('V-X34') ?? ''
  const open = { id: api.nextId(), open: true, happenedAt: testDay.toISOString() }
  await agent.post(`/api/connections/${id}/states`).send(open).expect(201)
  const joined = await facts('QT-3')
  expect(joined.enclosures.map((one) => one.code)).toEqual(['QT-3', 'QT-4'])
  expect(joined.volume).toMatchObject({ confirmed: true, holdsForThisValveState: false })
})
