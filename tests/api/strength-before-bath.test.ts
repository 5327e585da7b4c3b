import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { anObservation } from '../builders/an-observation.ts'
import type { ObservationBody } from '../builders/an-observation.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

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

async function look({ tank }: BathTank, said: Partial<ObservationBody>): Promise<string> {
  const keeper = await api.as('keeper')
  const body = anObservation(api, tank.code, said)
  const kept = await keeper.agent.post('/api/observations').send(body).expect(201)
  const { happenedAt: _at, ...words } = said
  expect(kept.body).toMatchObject(words)
  return body.id
}

async function stepOf(number: string) {
  const sheet = await house.technician.agent.get(house.doseAt(number)).expect(200)
  const { state, help, place } = sheet.body.steps.find((one: { ruleId: string }) => one.ruleId === 'R41')
  const cautions = sheet.body.cautions
    .filter((one: { ruleId: string }) => one.ruleId === 'R41')
    .map(({ text }: { text: string }) => text.replaceAll('\u00a0', ' '))
  return { state, help, place, cautions }
}

describe('how the animals are before a bath', () => {
  it('is asked for at the sheet, met by a look that says both, and open again when that look is struck out', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    expect(await stepOf(number)).toMatchObject({ state: 'unknown', place: 'animals' })
    // all well says neither
    await look(bath, { lookedAt: true, feeding: 'all', breathing: 'normal', foundDead: 0 })
    expect((await stepOf(number)).state).toBe('unknown')
    const id = await look(bath, { unwell: 0, handled: false })
    expect(await stepOf(number)).toMatchObject({ state: 'met', cautions: [] })
    const keeper = await api.as('keeper')
    await keeper.agent
      .post(`/api/observations/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'wrong tank' })
      .expect(200)
    expect((await stepOf(number)).state).toBe('unknown')
  })

  it('warns over the share that is too much, and of handling within a day, in figures of the ledger', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await look(bath, { unwell: 1, handled: true })
    expect(await stepOf(number)).toMatchObject({
      state: 'unmet',
      cautions: [
        '7.2 % of the animals are moribund or not eating, more than 5 %.',
        'The animals were handled within the last 24 hours.',
      ],
    })
    // a record says what stood against it at its own time
    const recorded = await house.record(number).expect(201)
    const codes = recorded.body.recorded[0].exceptions.map(({ code }: { code: string }) => code)
    expect(codes).toEqual(expect.arrayContaining(['animals-unwell', 'animals-handled']))
  })

  it('counts for a day, and not once its row was changed in the database', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath, { startsAt: '2026-12-02T19:00:00Z' })
    const id = await look(bath, { unwell: 0, handled: false, happenedAt: '2026-12-01T18:00:00Z' })
    expect((await stepOf(number)).state).toBe('met')
    const change = (unwell: number) =>
      owner.query(`UPDATE observations SET unwell_count = $2 WHERE id = $1`, [id, unwell])
    await owner.query(`ALTER TABLE observations DISABLE TRIGGER USER`)
    await change(1)
    expect((await stepOf(number)).state).toBe('unknown')
    await change(0)
    expect((await stepOf(number)).state).toBe('met')
    api.clock.set(new Date('2026-12-02T18:00:01Z'))
    expect((await stepOf(number)).state).toBe('unknown')
  })

  it('is kept from an entry that waited on a device since before it could be said', async () => {
    const bath = await house.tankWithSchool()
    const keeper = await api.as('keeper')
    const {
      unwell: _unwell,
      handled: _handled,
      ...old
    } = anObservation(api, bath.tank.code, { feeding: 'all' })
    const kept = await keeper.agent.post('/api/observations').send(old).expect(201)
    expect(kept.body).toMatchObject({ unwell: null, handled: null })
    await keeper.agent
      .post('/api/observations')
      .send({ ...old, unwell: 2 })
      .expect(409)
    const bad = await keeper.agent
      .post('/api/observations')
      .send(anObservation(api, bath.tank.code, { unwell: -1, handled: 'no' as never }))
    expect([bad.status, bad.body.errors.map(({ pointer }: { pointer: string }) => pointer).sort()]).toEqual([
      422,
      ['/handled', '/unwell'],
    ])
  })

  it('is not for a registrar to say, who may flag what they saw', async () => {
    const bath = await house.tankWithSchool()
    const registrar = await api.as('registrar')
    const said = { unwell: 1, forVeterinarian: true, words: 'one lies down' }
    const reply = await registrar.agent
      .post('/api/observations')
      .send(anObservation(api, bath.tank.code, said))
    expect(reply.body.code).toBe('may-not')
  })
})
