import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aCase } from '../builders/a-case.ts'
import { aBathWater, aSchool } from '../builders/an-order.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { anObservation } from '../builders/an-observation.ts'
import type { ObservationBody } from '../builders/an-observation.ts'
import type { TodayLogLine } from '../../shared/contracts/today.contract.ts'
import { sayLogLine, sayWork } from '../../shared/messages/say-today.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

let api: TestApi
let house: FormalinHouse
let owner: pg.Client
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
})
beforeEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

const observe = async (code: string, said: Partial<ObservationBody>) => {
  const body = anObservation(api, code, said)
  const reply = await (await api.as('keeper')).agent.post('/api/observations').send(body)
  expect([reply.status, reply.body.unwell, reply.body.handled]).toEqual([201, body.unwell, body.handled])
  return body.id
}

interface Step {
  ruleId: string
  state: string
  help: string | null
  place: string | null
  resolve: string[]
}
/** The condition on the sheet, and what the rule finds now. */
async function stands(number: string) {
  const sheet = (await house.technician.agent.get(house.doseAt(number)).expect(200)).body
  const step = (sheet.steps as Step[]).find(({ ruleId }) => ruleId === 'R41')
  const found = (sheet.cautions as { ruleId: string; code: string }[])
    .filter(({ ruleId }) => ruleId === 'R41')
    .map(({ code }) => code)
  return { step, found }
}
const unsaid = ['animals-unwell-unknown', 'animals-handled-unknown']

async function aBath(): Promise<{ bath: BathTank; number: string }> {
  const bath = await house.tankWithSchool()
  return { bath, number: await house.signedBath(bath) }
}

describe('how the animals bear a bath', () => {
  it('is unknown until somebody looks, met by an observation, and held again when too many are unwell', async () => {
    const { bath, number } = await aBath()
    const before = await stands(number)
    expect(before.found).toEqual(unsaid)
    expect(before.step).toMatchObject({ state: 'unknown', place: 'animals' })
    expect(before.step?.help).toMatch(/share of moribund.* handled within the last 24/)
    expect(before.step?.resolve.join(' ')).toContain('record how many')

    // all well says neither
    await observe(bath.tank.code, { lookedAt: true, feeding: 'all', breathing: 'normal', foundDead: 0 })
    expect((await stands(number)).found).toEqual(unsaid)
    await observe(bath.tank.code, { unwell: 0, happenedAt: '2026-12-01T18:01:00Z' })
    expect((await stands(number)).found).toEqual(['animals-handled-unknown'])
    await observe(bath.tank.code, { handled: false, happenedAt: '2026-12-01T18:02:00Z' })
    expect(await stands(number)).toMatchObject({ found: [], step: { state: 'met' } })

    // 1 of 14 is 7 percent
    const worse = await observe(bath.tank.code, { unwell: 1, happenedAt: '2026-12-01T18:10:00Z' })
    const held = await stands(number)
    expect([held.found, held.step?.state]).toEqual([['animals-unwell'], 'unmet'])
    expect(held.step?.help?.replaceAll('\u00a0', ' ')).toContain('7.2 % of the animals')

    // struck out, it counts no more, and the look before it stands
    await (
      await api.as('keeper')
    ).agent
      .post(`/api/observations/${worse}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'that was the tank beside it' })
      .expect(200)
    expect((await stands(number)).found).toEqual([])

    await observe(bath.tank.code, { handled: true, happenedAt: '2026-12-01T18:12:00Z' })
    expect((await stands(number)).found).toEqual(['animals-handled'])
    api.clock.set(new Date('2026-12-02T18:11:00Z'))
    expect((await stands(number)).found).toEqual(['animals-unwell-unknown', 'animals-handled'])
  })

  it('is said of more animals than the ledger has, kept, and counts as all of them', async () => {
    const { bath, number } = await aBath()
    await observe(bath.tank.code, { unwell: 40, handled: false })
    const { step } = await stands(number)
    expect(step?.help?.replaceAll('\u00a0', ' ')).toContain('100 % of the animals')
  })

  it('is asked of every enclosure of the water that holds animals', async () => {
    const beside = await anEnclosure(api, 'QT-K')
    await aSchool(api, beside.id, 69)
    const joined = await aBathWater(api, 'QT-J', [beside])
    const number = await house.signedBath({ tank: joined, school: await aSchool(api, joined.id, 70) })
    await observe(joined.code, { unwell: 0, handled: false })
    expect((await stands(number)).found).toEqual(unsaid)
    await observe(beside.code, { unwell: 1, handled: false })
    expect((await stands(number)).found).toEqual([])
  })

  it('is answered against every look by a weight or a move of the last day', async () => {
    const { bath, number } = await aBath()
    await observe(bath.tank.code, { unwell: 0, handled: false })
    const weigh = async (basis: 'measured' | 'estimated') => {
      const reply = await house.technician.agent.post(`/api/animals/${bath.school.accession}/weights`).send({
        id: api.nextId(),
        weight: { value: '120', unit: 'g' },
        basis,
        happenedAt: '2026-12-01T12:00:00Z',
      })
      expect([reply.status, reply.body.errors]).toEqual([201, undefined])
    }
    await weigh('estimated')
    expect((await stands(number)).found).toEqual([])
    await weigh('measured')
    expect((await stands(number)).found).toEqual(['animals-handled'])

    const other = await aBath()
    const moved = await aSchool(api, (await aBathWater(api, 'QT-M')).id, 71)
    await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/animals/${moved.accession}/moves`)
      .send({
        id: api.nextId(),
        fromEnclosureId: (await api.composition.animals.questions.animalByAccession(moved.accession, testDay))
          ?.enclosureId,
        toEnclosureId: other.bath.tank.id,
        happenedAt: '2026-12-01T17:00:00Z',
        reason: 'joins them',
      })
      .expect(201)
    await observe(other.bath.tank.code, { unwell: 0, handled: false })
    expect((await stands(other.number)).found).toEqual(['animals-handled'])
  })

  it('is answered against every look by a sample of their case', async () => {
    const { tank } = await house.tankWithSchool()
    const batch = await aCase(api, { enclosure: tank })
    const number = await house.signedBath({ tank, school: batch.animal })
    await observe(tank.code, { unwell: 0, handled: false })
    const { agent } = await api.as('technician')
    const step = (stepKey: string) =>
      agent
        .post(`${batch.url}/steps`)
        .send({ id: api.nextId(), happenedAt: '2026-12-01T15:00:00Z', stepKey, outcome: 'done' })
        .expect(201)
    await step('count-in')
    expect((await stands(number)).found).toEqual([])
    await step('sample-1')
    expect((await stands(number)).found).toEqual(['animals-handled'])
  })

  it('of animals brought to a treatment vessel is told by the looks where they came from; bringing them is the bath’s own', async () => {
    const tub = await aBathWater(api, 'TV-1')
    await api.composition.parts.dataSource.query(
      `UPDATE enclosures SET treatment_vessel = true, fill_mark = 'blue line', fill_mark_entered_value = 2000,
              fill_mark_entered_unit = 'L', fill_mark_litres = 2000 WHERE id = $1`,
      [tub.id],
    )
    const home = await house.tankWithSchool()
    const number = await house.signedBath({ tank: tub, school: home.school })
    // the empty vessel says nothing of those who are to come
    expect((await stands(number)).found).toEqual(unsaid)
    const weak = await observe(home.tank.code, {
      unwell: 4,
      handled: true,
      happenedAt: '2026-12-01T13:00:00Z',
    })
    expect((await stands(number)).found).toEqual(['animals-unwell', 'animals-handled'])
    await (
      await api.as('keeper')
    ).agent
      .post(`/api/observations/${weak}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'seen at another tank' })
      .expect(200)
    await observe(home.tank.code, { unwell: 0, handled: false, happenedAt: '2026-12-01T14:00:00Z' })
    const { agent } = await api.as('veterinarian')
    await agent
      .post(`/api/animals/${home.school.accession}/moves`)
      .send({
        id: api.nextId(),
        fromEnclosureId: home.tank.id,
        toEnclosureId: tub.id,
        happenedAt: '2026-12-01T18:10:00Z',
        reason: 'for their bath',
      })
      .expect(201)
    expect(await stands(number)).toMatchObject({ found: [], step: { state: 'met' } })
    // nor does the way home and back for the next one
    const move = (fromEnclosureId: string, toEnclosureId: string, happenedAt: string) =>
      agent
        .post(`/api/animals/${home.school.accession}/moves`)
        .send({ id: api.nextId(), fromEnclosureId, toEnclosureId, happenedAt, reason: 'after their bath' })
        .expect(201)
    await move(tub.id, home.tank.id, '2026-12-01T18:11:00Z')
    await move(home.tank.id, tub.id, '2026-12-01T18:11:30Z')
    expect(await stands(number)).toMatchObject({ found: [], step: { state: 'met' } })

    // part of a group, taken out of it for the bath, was looked at with the group
    const big = await house.tankWithSchool()
    await observe(big.tank.code, { unwell: 0, handled: false, happenedAt: '2026-12-01T14:00:00Z' })
    const part = api.nextId()
    await agent
      .post(`/api/animals/${big.school.accession}/splits`)
      .send({
        id: part,
        form: 'group',
        count: 5,
        toEnclosureId: tub.id,
        happenedAt: '2026-12-01T18:12:00Z',
        reason: 'for their bath',
      })
      .expect(201)
    expect((await stands(number)).found).toEqual([])
  })

  it('counts for a day, and not once its row was changed in the database', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath, { startsAt: '2026-12-02T19:00:00Z' })
    const id = await observe(bath.tank.code, {
      unwell: 0,
      handled: false,
      happenedAt: '2026-12-01T18:00:00Z',
    })
    expect((await stands(number)).step?.state).toBe('met')
    const change = (unwell: number) =>
      owner.query(`UPDATE observations SET unwell_count = $2 WHERE id = $1`, [id, unwell])
    await owner.query(`ALTER TABLE observations DISABLE TRIGGER USER`)
    await change(1)
    expect((await stands(number)).step?.state).toBe('unknown')
    await change(0)
    expect((await stands(number)).step?.state).toBe('met')
    api.clock.set(new Date('2026-12-02T18:00:01Z'))
    expect((await stands(number)).step?.state).toBe('unknown')
  })

  it('is said in the log and in the trail, and an older form says neither', async () => {
    const { bath } = await aBath()
    const id = await observe(bath.tank.code, { unwell: 2, handled: true })
    const [entry] = await api.composition.parts.dataSource.query(
      `SELECT text FROM audit_entries WHERE action = 'observation.record' AND text LIKE '%' || $1 || '%'`,
      [id],
    )
    expect(entry.text.replaceAll('\u00a0', ' ')).toContain(
      '2 animals moribund or not eating. Handled in the last 24 h',
    )
    const { agent } = await api.as('keeper')
    const log = await agent.get(`/api/observations?enclosure=${bath.tank.code}`).expect(200)
    expect(log.body.rows[0]).toMatchObject({ id, unwell: 2, handled: true })
    const today = (await agent.get('/api/today').expect(200)).body
    const line = (today.log as TodayLogLine[]).find((one) => one.id === id)
    const said = line && sayLogLine(line, testDay.toISOString(), 'UTC').replaceAll('\u00a0', ' ')
    expect(said).toBe('2 animals moribund or not eating. Handled in the last 24 h')
    await observe(bath.tank.code, { unwell: 4, forVeterinarian: true })
    const [flagged] = await worklistOf(api).itemsOf('veterinarian', 'observation-flagged', bath.tank.code)
    const note = flagged && sayWork(flagged, testDay.toISOString(), 'UTC').note.replaceAll('\u00a0', ' ')
    expect(note).toContain('4 animals moribund or not eating')
    const same = anObservation(api, bath.tank.code, { id, unwell: 3, handled: true })
    expect((await agent.post('/api/observations').send(same)).body.code).toBe('id-already-used')

    const older: Partial<ObservationBody> = anObservation(api, bath.tank.code, { feeding: 'all' })
    delete older.unwell
    delete older.handled
    const taken = await agent.post('/api/observations').send(older).expect(201)
    expect(taken.body).toMatchObject({ unwell: null, handled: null })
    for (const wrong of [{ unwell: -1 }, { unwell: 1.5 }, { handled: 'no' }])
      await agent
        .post('/api/observations')
        .send({ ...anObservation(api, bath.tank.code), ...wrong })
        .expect(422)
    const registrar = await api.as('registrar')
    const flag = anObservation(api, bath.tank.code, { words: 'odd', forVeterinarian: true, handled: false })
    expect((await registrar.agent.post('/api/observations').send(flag)).status).toBe(403)
  })
})
