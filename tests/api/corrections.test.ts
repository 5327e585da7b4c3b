import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { simpleProtocolId } from '../builders/a-case.ts'
import { aGroup, anAnimal, aPlace, arrivalAt, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { acquisitionBody, anAcquisition, aPermit, newLine } from '../builders/a-register.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let taxonId: string
let kelp: TestPlace
let river: TestPlace
beforeAll(async () => {
  api = await startApi()
  taxonId = await aStingray(api)
  kelp = await aPlace(api)
  river = await aPlace(api)
})
afterAll(() => api.stop())

const monday = '2026-11-30T14:00:00Z'

describe('striking out', () => {
  const strike = async (person: Promise<TestPerson> | TestPerson, url: string, what: string, id: string) =>
    (await person).agent
      .post(`${url}/${what}/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'It was another tank' })
  const happenedAt = monday

  it('of a death is for whoever recorded it, on the same day, or for a veterinarian', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 12 })
    const { agent } = await api.as('keeper')
    const record = async () => {
      const id = api.nextId()
      await agent
        .post(`${school.url}/deaths`)
        .send({ id, kind: 'found-dead', count: 1, happenedAt })
        .expect(201)
      return id
    }
    const [slip, late, other] = [await record(), await record(), await record()]
    const refused = await strike(api.as('technician'), school.url, 'deaths', other)
    expect([refused.status, refused.body.code]).toEqual([403, 'may-not'])
    expect(refused.body.detail).toMatch(/veterinarian/)
    expect((await strike(api.as('keeper'), school.url, 'deaths', slip)).status).toBe(200)
    const today = api.clock.now()
    api.clock.set(new Date(today.getTime() + 24 * 3600_000))
    expect((await strike(api.as('keeper'), school.url, 'deaths', late)).status).toBe(403)
    expect((await strike(api.as('veterinarian'), school.url, 'deaths', late)).status).toBe(200)
    api.clock.set(today)
    expect((await agent.get(school.url)).body.count.ledger).toBe(11)
  })

  it('of a weight is for whoever recorded it, on the same day, or for a veterinarian', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const { agent } = await api.as('keeper')
    const weigh = async (value: string) => {
      const id = api.nextId()
      await agent
        .post(`${ray.url}/weights`)
        .send({ id, weight: { value, unit: 'kg' }, basis: 'measured', happenedAt })
        .expect(201)
      return id
    }
    const [slip, late] = [await weigh('11'), await weigh('12')]
    const refused = await strike(api.as('technician'), ray.url, 'weights', slip)
    expect([refused.status, refused.body.code]).toEqual([403, 'may-not'])
    expect(refused.body.detail).toMatch(/veterinarian/)
    expect((await strike(api.as('keeper'), ray.url, 'weights', slip)).status).toBe(200)
    const today = api.clock.now()
    api.clock.set(new Date(today.getTime() + 24 * 3600_000))
    expect((await strike(api.as('keeper'), ray.url, 'weights', late)).status).toBe(403)
    expect((await agent.get(ray.url)).body.newestWeight.value).toBe('12')
    expect((await strike(api.as('veterinarian'), ray.url, 'weights', late)).status).toBe(200)
    api.clock.set(today)
    expect((await agent.get(ray.url)).body.newestWeight).toBeNull()
  })

  it('of a move is for whoever recorded it, for a veterinarian, and for the registrar where it broke no rule', async () => {
    const wing = await aPlace(api, { boundary: 'Striking wing' })
    const ray = await anAnimal(api, { taxonId, enclosureId: wing.id })
    await api.composition.parts.transactions.inTransaction(
      { actor: installation, requestId: 'test' },
      async (tx) => {
        await api.composition.animals.service.lockMovement(tx, {
          animalId: ray.id,
          kind: 'boundary',
          source: { kind: 'case', id: api.nextId(), label: 'Q-014' },
          reason: 'in quarantine',
          at: arrivalAt,
        })
      },
    )
    const transfer = api.nextId()
    const vet = await api.as('veterinarian')
    await vet.agent
      .post(`${ray.url}/moves`)
      .send({
        id: transfer,
        fromEnclosureId: wing.id,
        toEnclosureId: river.id,
        documentedTransfer: 'to the river gallery, same clock',
        happenedAt,
      })
      .expect(201)
    for (const role of ['technician', 'keeper', 'registrar'] as const)
      expect((await strike(api.as(role), ray.url, 'moves', transfer)).body.code).toBe('may-not')
    expect((await strike(vet, ray.url, 'moves', transfer)).status).toBe(200)

    const free = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const plain = api.nextId()
    const { agent } = await api.as('keeper')
    await agent
      .post(`${free.url}/moves`)
      .send({ id: plain, fromEnclosureId: kelp.id, toEnclosureId: river.id, happenedAt })
      .expect(201)
    expect((await strike(api.as('technician'), free.url, 'moves', plain)).status).toBe(403)
    expect((await strike(api.as('registrar'), free.url, 'moves', plain)).status).toBe(200)
  })
})

describe('dates and lists that cannot be', () => {
  it('are refused in plain words wherever they are entered, not answered with a failure', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 12 })
    const registrar = await api.as('registrar')
    for (const year of ['0000', '0206', '1200', '9999']) {
      const happenedAt = `${year}-11-30T14:00:00Z`
      const death = { id: api.nextId(), kind: 'found-dead', count: 1, happenedAt }
      for (const reply of [
        await (await api.as('keeper')).agent.post(`${school.url}/deaths`).send(death),
        await registrar.agent.get(`/api/enclosures/${kelp.code}/inhabitants?at=${happenedAt}`),
      ]) {
        expect(reply.status, year).toBe(422)
        expect(reply.body.errors[0].detail).toBe('Check the year: it has to lie between 1900 and 2199')
      }
    }
    const adjust = (happenedAt: string) =>
      registrar.agent
        .post(`${school.url}/adjustments`)
        .send({ id: api.nextId(), delta: 3, reason: 'counted in the dark', happenedAt })
    const early = await adjust('2026-10-01T12:00:00Z')
    expect([early.status, early.body.code]).toEqual([409, 'not-here-then'])
    expect((await adjust(monday)).status).toBe(201)
  })

  it('like a birth after arrival, or ahead of today; an egg may hatch here', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const { agent } = await api.as('registrar')
    let version = 1
    const describe = async (kind: string, date: string) => {
      const reply = await agent.put(`${ray.url}/description`).send({
        expectedVersion: version,
        taxonId,
        name: null,
        sex: 'unknown',
        stage: 'juvenile',
        birth: { kind, date, approximate: false },
        happenedAt: monday,
      })
      if (reply.status === 200) version = reply.body.version as number
      return reply
    }
    for (const [kind, date] of [
      ['born', '2026-11-20'],
      ['hatched', '2027-01'],
      ['born', '1200'],
    ] as const) {
      const reply = await describe(kind, date)
      expect([reply.status, reply.body.errors[0].pointer], date).toEqual([422, '/birth/date'])
    }
    expect((await describe('hatched', '2026-11-20')).status).toBe(200)
    expect((await describe('born', '2026-11')).status).toBe(200)
  })
})

describe('an acquisition that was entered wrongly', () => {
  const line = (given: object = {}) => newLine(api, { taxonId, enclosureId: kelp.id, ...given })
  const send = async (body: object) =>
    (await api.as('registrar')).agent.post('/api/register/acquisitions').send(body)
  const pointers = (body: { errors?: { pointer: string }[] }) =>
    (body.errors ?? []).map((e) => e.pointer).sort()
  const voidIt = async (number: string) =>
    (await api.as('registrar')).agent
      .post(`/api/register/transactions/${number}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Entered for the wrong shipment' })

  it('is not voided while its animals are in a quarantine case, and is when a veterinarian struck them out of it', async () => {
    const transaction = await anAcquisition(api, { on: '2026-11-20', lines: [line({ count: 9 })] })
    const accession = transaction.lines[0]?.accession ?? ''
    const tech = await api.as('technician')
    const memberId = api.nextId()
    const opened = await tech.agent
      .post('/api/cases')
      .send({
        id: api.nextId(),
        protocolVersionId: simpleProtocolId,
        members: [{ id: memberId, accession }],
        happenedAt: '2026-11-20T14:00:00Z',
      })
      .expect(201)
    const number = opened.body.number as string
    const locks = async () =>
      (await tech.agent.get(`/api/animals/${accession}`).expect(200)).body.locks as unknown[]
    expect(await locks()).toMatchObject([{ kind: 'boundary', sourceLabel: number }])
    const reply = await voidIt(transaction.number)
    expect([reply.status, reply.body.code]).toEqual([409, 'later-records'])
    expect(reply.body.detail).toContain(number)
    await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/cases/${number}/decisions`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-12-01T14:00:00Z',
        reason: 'They were never of this batch',
        decision: { kind: 'voided', voidsEventId: memberId },
      })
      .expect(201)
    expect(await locks()).toEqual([])
    expect((await voidIt(transaction.number)).status).toBe(200)
  })

  it('refuses a line, a use of a permit or a mark that stands in the form twice', async () => {
    const permit = await aPermit(api, { quantityAllowed: 20 })
    const own = line({ count: 5 })
    const use = () => ({ id: api.nextId(), permitId: permit.id, lineId: own.id, quantity: 5 })
    const twice = await send(acquisitionBody(api, { lines: [own], permitUses: [use(), use()] }))
    expect([twice.status, pointers(twice.body)]).toEqual([422, ['/permitUses/1']])
    const lines = await send(acquisitionBody(api, { lines: [own, { ...line({ count: 2 }), id: own.id }] }))
    expect([lines.status, pointers(lines.body)]).toEqual([422, ['/lines/1/id']])
    expect(lines.body.errors[0].detail).toBe('This stands in the list twice. Leave one out.')
  })
})
