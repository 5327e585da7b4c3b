import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aGroup, anAnimal, aPlace, arrivalAt, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

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
const later = '2026-12-01T10:00:00Z'

const auditOf = async (accession: string) => {
  const admin = await api.as('administrator')
  const trail = await admin.agent.get(`/api/audit?subjectKind=animal&q=${accession}&limit=50`).expect(200)
  return (trail.body.rows as { action: string; subjectLabel: string }[])
    .filter((row) => row.subjectLabel === accession)
    .map((row) => row.action)
}

describe('weights', () => {
  const weigh = async (url: string, body: object, role: 'keeper' | 'registrar' = 'keeper') =>
    (await api.as(role)).agent.post(`${url}/weights`).send({
      id: api.nextId(),
      weight: { value: '41.6', unit: 'kg' },
      basis: 'measured',
      happenedAt: monday,
      ...body,
    })

  it('keeps the digits as typed beside the kilograms', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const reply = await weigh(ray.url, { weight: { value: '41.60', unit: 'kg' }, method: 'in a sling' })
    expect(reply.status).toBe(201)
    expect(reply.body).toMatchObject({
      value: '41.60',
      unit: 'kg',
      weightKg: 41.6,
      doubt: null,
      happenedOn: '2026-11-30',
    })
    const sheet = await (await api.as('veterinarian')).agent.get(ray.url).expect(200)
    expect(sheet.body.newestWeight).toMatchObject({ value: '41.60', weightKg: 41.6 })
    expect(await auditOf(ray.accession)).toContain('animal.weigh')
  })

  it('asks a tenfold weight back, saves nothing, and keeps it with a reason', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    await weigh(ray.url, {})
    for (const value of ['416', '1000', '4.16']) {
      const refused = await weigh(ray.url, { weight: { value, unit: 'kg' }, happenedAt: later })
      expect(refused.status).toBe(422)
      expect(refused.body).toMatchObject({
        code: 'weight-needs-confirmation',
        errors: [{ pointer: '/weight' }],
      })
      expect(refused.body.detail).toContain(`${value}\u00a0kg`)
      expect(refused.body.detail).toMatch(/Check the number and its unit/)
    }
    const before = await (await api.as('keeper')).agent.get(`${ray.url}/weights`).expect(200)
    expect(before.body.rows).toHaveLength(1)
    const kept = await weigh(ray.url, {
      weight: { value: '416', unit: 'kg' },
      happenedAt: later,
      confirmedReason: 'weighed twice, crate included',
    })
    expect(kept.status).toBe(201)
    expect(kept.body).toMatchObject({
      doubt: 'unlike-the-last',
      confirmedReason: 'weighed twice, crate included',
    })
  })

  it('refuses the future, nothing, less than nothing, and a unit that is no mass, all in plain words', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const cases: [object, string, string][] = [
      [{ happenedAt: '2026-12-01T18:26:00Z' }, 'in-the-future', '/happenedAt'],
      [{ weight: { value: '0', unit: 'kg' } }, 'bad-input', '/weight'],
      [{ weight: { value: '-2', unit: 'kg' } }, 'bad-input', '/weight'],
      [{ weight: { value: 'heavy', unit: 'kg' } }, 'bad-input', '/weight'],
      [{ weight: { value: '2', unit: 'L' } }, 'bad-input', '/weight'],
      [{ weight: { value: '2', unit: 'stone' } }, 'bad-input', '/weight'],
      [{ animalsWeighed: 3 }, 'bad-input', '/animalsWeighed'],
      [{ animalsWeighed: 0 }, 'bad-input', '/animalsWeighed'],
    ]
    for (const [body, code, pointer] of cases) {
      const reply = await weigh(ray.url, body)
      expect(reply.status, JSON.stringify(body)).toBe(422)
      expect(reply.body.code).toBe(code)
      expect(reply.body.errors.map((error: { pointer: string }) => error.pointer)).toContain(pointer)
    }
    expect((await weigh(ray.url, { happenedAt: '2026-12-01T18:24:00Z' })).status).toBe(201)
  })

  it('takes the same form twice as one weight, other content under its id not at all, and refuses other roles', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const id = api.nextId()
    const [first, second] = await Promise.all([weigh(ray.url, { id }), weigh(ray.url, { id })])
    expect([first.status, second.status]).toEqual([201, 201])
    expect((await weigh(ray.url, { id, weight: { value: '42', unit: 'kg' } })).body.code).toBe(
      'id-already-used',
    )
    const list = await (await api.as('keeper')).agent.get(`${ray.url}/weights`).expect(200)
    expect(list.body.rows).toHaveLength(1)
    expect((await weigh(ray.url, {}, 'registrar')).status).toBe(403)
    expect((await weigh('/api/animals/A-9999', {})).status).toBe(404)
  })

  it('gives the mean of animals weighed together, and strikes a wrong weight out without losing it', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: kelp.id, count: 12 })
    const { agent } = await api.as('keeper')
    const reply = await weigh(school.url, { weight: { value: '125', unit: 'kg' }, animalsWeighed: 5 })
    expect(reply.body).toMatchObject({ weightKg: 25, animalsWeighed: 5 })
    const strike = (key: string) =>
      agent
        .post(`${school.url}/weights/${String(reply.body.id)}/void`)
        .set('Idempotency-Key', key)
        .send({ reason: 'scale was not tared' })
    const after = await strike(newKey()).expect(200)
    expect(after.body.newestWeight).toBeNull()
    await strike(newKey()).expect(200)
    const list = await agent.get(`${school.url}/weights`).expect(200)
    expect(list.body.rows).toMatchObject([
      { weightKg: 25, struck: { reason: 'scale was not tared', by: 'Test keeper' } },
    ])
  })
})

describe('moves', () => {
  const move = async (url: string, body: object, role: 'keeper' | 'veterinarian' = 'keeper') =>
    (await api.as(role)).agent.post(`${url}/moves`).send({
      id: api.nextId(),
      fromEnclosureId: kelp.id,
      toEnclosureId: river.id,
      happenedAt: monday,
      ...body,
    })

  it('takes the animal along, and shows who was where on any day', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const reply = await move(ray.url, { reason: 'bigger pool' })
    expect(reply.status).toBe(201)
    expect(reply.body.place).toMatchObject({ code: river.code })
    const { agent } = await api.as('technician')
    const inAt = async (place: TestPlace, at?: string) => {
      const rows = await agent
        .get(`/api/enclosures/${place.code}/inhabitants`)
        .query(at ? { at } : {})
        .expect(200)
      return (rows.body.rows as { accession: string }[]).map((row) => row.accession)
    }
    expect(await inAt(kelp, '2026-11-15T00:00:00Z')).toContain(ray.accession)
    expect(await inAt(river, '2026-11-15T00:00:00Z')).not.toContain(ray.accession)
    expect(await inAt(kelp)).not.toContain(ray.accession)
    expect(await inAt(river)).toContain(ray.accession)
    expect(await inAt(kelp, '2026-10-31T00:00:00Z')).not.toContain(ray.accession)
    expect(await auditOf(ray.accession)).toContain('animal.move')
  })

  it('by a phone whose clock is fast has happened as soon as it is written down, for every reader, and not before', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const { agent } = await api.as('keeper')
    const now = api.clock.now()
    const fast = new Date(now.getTime() + 4 * 60_000).toISOString()
    expect((await move(ray.url, { happenedAt: fast })).status).toBe(201)
    await agent
      .post(`${ray.url}/weights`)
      .send({ id: api.nextId(), weight: { value: '40', unit: 'kg' }, basis: 'measured', happenedAt: fast })
      .expect(201)
    const readers = async (at: Date) => {
      const { questions, queries } = api.composition.animals
      const [known] = await questions.animalsById([ray.id], at)
      const inRiver = (await questions.animalsIn([river.id], at)).some(({ animalId }) => animalId === ray.id)
      const listed = (await queries.inhabitants(river.code, at)).some(({ id }) => id === ray.id)
      return [known?.enclosureCode, inRiver, listed, known?.newestWeight?.value]
    }
    expect(await readers(now)).toEqual([river.code, true, true, '40'])
    expect((await agent.get(ray.url)).body).toMatchObject({
      place: { code: river.code },
      newestWeight: { value: '40' },
    })
    expect(await readers(new Date(now.getTime() - 1000))).toEqual([kelp.code, false, false, undefined])
  })

  it('refuses to take an animal out of an enclosure it is not in, and says where it is', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const reply = await move(ray.url, { fromEnclosureId: river.id, toEnclosureId: kelp.id })
    expect(reply.status).toBe(409)
    expect(reply.body).toMatchObject({
      code: 'not-in-that-enclosure',
      errors: [{ pointer: '/fromEnclosureId' }],
    })
    expect(reply.body.detail).toBe(
      `At 2026-11-30 10:00 ${ray.accession} was in ${kelp.code}, not in ${river.code}. Move it from ${kelp.code}, or correct the time.`,
    )
    const before = await move(ray.url, { happenedAt: '2026-10-01T00:00:00Z' })
    expect(before.body.detail).toMatch(/was not in the house/)
  })

  it('refuses what later moves contradict, two at one moment, the place it is in, and unknown or closed places', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const closed = await aPlace(api, { inUseUntil: '2026-11-20T00:00:00Z' })
    const third = await aPlace(api)
    await move(ray.url, {})
    const cases: [object, number, string][] = [
      [{ toEnclosureId: third.id, happenedAt: '2026-11-10T00:00:00Z' }, 409, 'contradicts-another-move'],
      [{ fromEnclosureId: river.id, toEnclosureId: third.id }, 409, 'contradicts-another-move'],
      [{ fromEnclosureId: river.id, toEnclosureId: river.id, happenedAt: later }, 422, 'bad-input'],
      [{ fromEnclosureId: river.id, toEnclosureId: api.nextId(), happenedAt: later }, 404, 'not-found'],
      [{ fromEnclosureId: api.nextId(), happenedAt: later }, 404, 'not-found'],
      [
        { fromEnclosureId: river.id, toEnclosureId: closed.id, happenedAt: later },
        409,
        'enclosure-not-in-use',
      ],
      [
        { fromEnclosureId: river.id, toEnclosureId: third.id, happenedAt: '2026-12-02T00:00:00Z' },
        422,
        'in-the-future',
      ],
    ]
    for (const [body, status, code] of cases) {
      const reply = await move(ray.url, body)
      expect([reply.status, reply.body.code], JSON.stringify(body)).toEqual([status, code])
    }
    const moves = await (await api.as('keeper')).agent.get(`${ray.url}/moves`).expect(200)
    expect(moves.body.rows).toHaveLength(2)
  })

  it('moves once when the same form arrives twice at once, and only one of two people who move it apart', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const third = await aPlace(api)
    const id = api.nextId()
    const same = await Promise.all([move(ray.url, { id }), move(ray.url, { id })])
    expect(same.map((reply) => reply.status)).toEqual([201, 201])
    const apart = await Promise.all([
      move(ray.url, { fromEnclosureId: river.id, toEnclosureId: third.id, happenedAt: later }),
      move(ray.url, {
        fromEnclosureId: river.id,
        toEnclosureId: kelp.id,
        happenedAt: '2026-12-01T10:01:00Z',
      }),
    ])
    expect(apart.map((reply) => reply.status).sort()).toEqual([201, 409])
  })

  it('strikes out a move that did not happen; not one that a later move rests on, nor an arrival', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: kelp.id })
    const third = await aPlace(api)
    const first = api.nextId()
    const second = api.nextId()
    await move(ray.url, { id: first })
    await move(ray.url, { id: second, fromEnclosureId: river.id, toEnclosureId: third.id, happenedAt: later })
    const { agent } = await api.as('keeper')
    const strike = (id: string) =>
      agent
        .post(`${ray.url}/moves/${id}/void`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'another ray' })
    expect((await strike(first)).body.code).toBe('contradicts-another-move')
    expect((await strike(second)).body.place).toMatchObject({ code: river.code })
    expect((await strike(first)).body.place).toMatchObject({ code: kelp.code })
    const moves = await agent.get(`${ray.url}/moves`).expect(200)
    const arrival = moves.body.rows.find((row: { kind: string }) => row.kind === 'arrival')
    expect((await strike(arrival.id)).body.code).toBe('part-of-another-record')
    expect(moves.body.rows.filter((row: { struck: unknown }) => row.struck)).toHaveLength(2)
  })
})

describe('accession', () => {
  it('draws a number once, however often the acquisition is sent', async () => {
    const id = api.nextId()
    const first = await anAnimal(api, { id, taxonId, enclosureId: kelp.id, name: 'Wren' })
    const again = await anAnimal(api, { id, taxonId, enclosureId: kelp.id, name: 'Wren' })
    expect(again.accession).toBe(first.accession)
    const sheet = await (await api.as('registrar')).agent.get(first.url).expect(200)
    expect(sheet.body).toMatchObject({
      name: 'Wren',
      count: { basis: 'counted', ledger: 1 },
      place: { code: kelp.code },
      arrivedAt: new Date(arrivalAt).toISOString(),
    })
  })

  it('refuses two individuals under one number, unknown taxa and places, and leaves nothing behind', async () => {
    const before = await (await api.as('registrar')).agent.get('/api/animals?state=all&limit=1').expect(200)
    await expect(anAnimal(api, { taxonId, enclosureId: kelp.id, count: 2 })).rejects.toMatchObject({
      code: 'bad-input',
    })
    await expect(anAnimal(api, { taxonId: api.nextId(), enclosureId: kelp.id })).rejects.toMatchObject({
      code: 'not-found',
    })
    await expect(anAnimal(api, { taxonId, enclosureId: api.nextId() })).rejects.toMatchObject({
      code: 'not-found',
    })
    const after = await (await api.as('registrar')).agent.get('/api/animals?state=all&limit=1').expect(200)
    expect(after.body.total).toBe(before.body.total)
  })
})
