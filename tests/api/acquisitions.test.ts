import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { acquisitionBody, anAcquisition, aParty, aPermit, newLine } from '../builders/a-register.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let taxonId: string
let tank: TestPlace
let partyId: string
beforeAll(async () => {
  api = await startApi()
  taxonId = await aStingray(api)
  tank = await aPlace(api)
  partyId = await aParty(api, 'Ledder Bay Marsh Trust')
})
afterAll(() => api.stop())

const line = (given: object = {}) => newLine(api, { taxonId, enclosureId: tank.id, ...given })
const send = async (body: object) =>
  (await api.as('registrar')).agent.post('/api/register/acquisitions').send(body)
const pointers = (body: { errors?: { pointer: string }[] }) =>
  (body.errors ?? []).map((e) => e.pointer).sort()

describe('an acquisition', () => {
  it('gives each animal and group an accession number, a place and a count', async () => {
    const school = line({ count: 24, theirNumber: 'LB-77' })
    const ray = line({
      form: 'individual',
      count: 1,
      name: 'Brine',
      sex: 'female',
      birthKind: 'born',
      birthDate: '2019-08',
    })
    const body = acquisitionBody(api, {
      kind: 'loan-in',
      counterpartyId: partyId,
      reference: 'LA-26-04',
      on: '2026-11-20',
      time: '13:25',
      loanDueOn: '2027-11-20',
      transport: {
        carrier: 'Norrell Live Freight',
        boxCount: 3,
        sealedAt: '2026-11-20T08:10:00-04:00',
        openedAt: '2026-11-20T13:25:00-04:00',
      },
      lines: [school, ray],
    })
    const reply = await send(body)
    expect(reply.status).toBe(201)
    expect(reply.body).toMatchObject({
      number: expect.stringMatching(/^TR-\d{4}$/),
      way: 'in',
      kind: 'loan-in',
      on: '2026-11-20',
      time: '13:25',
      at: '2026-11-20T17:25:00.000Z',
      counterparty: { name: 'Ledder Bay Marsh Trust' },
      reference: 'LA-26-04',
      lines: [
        { accessioned: true, count: 24, theirNumber: 'LB-77', enclosure: { code: tank.code } },
        { accessioned: true, count: 1, name: 'Brine', form: 'individual' },
      ],
      recordedBy: 'Test registrar',
      voided: null,
      may: ['register.manage', 'document.attach'],
    })
    const { agent } = await api.as('keeper')
    const animal = await agent.get(`/api/animals/${reply.body.lines[0].accession}`).expect(200)
    expect(animal.body).toMatchObject({
      id: school.animalId,
      count: { basis: 'counted', ledger: 24 },
      place: { code: tank.code },
      arrivedAt: '2026-11-20T17:25:00.000Z',
    })
    const counts = await agent.get(`/api/animals/${reply.body.lines[0].accession}/counts`)
    expect(counts.body.lines).toMatchObject([{ kind: 'loan-in', delta: 24, balance: 24 }])
  })

  it('is written in the audit trail', async () => {
    const transaction = await anAcquisition(api, { lines: [line()] })
    const admin = await api.as('administrator')
    const trail = await admin.agent.get(`/api/audit?subjectId=${transaction.id}`).expect(200)
    expect(trail.body.rows).toMatchObject([
      {
        action: 'transaction.record-acquisition',
        actorName: 'Test registrar',
        after: { kind: 'found', lines: [{ accession: transaction.lines[0]?.accession, count: 12 }] },
      },
    ])
  })

  it('is one acquisition when the same form is sent twice, also at the same moment', async () => {
    const body = acquisitionBody(api, { lines: [line({ count: 7 })] })
    const [first, second] = await Promise.all([send(body), send(body)])
    const third = await send(body)
    expect([first?.status, second?.status, third.status]).toEqual([201, 201, 201])
    expect(new Set([first?.body.number, second?.body.number, third.body.number]).size).toBe(1)
    const { agent } = await api.as('keeper')
    const counts = await agent.get(`/api/animals/${third.body.lines[0].accession}/counts`)
    expect(counts.body.lines).toMatchObject([{ delta: 7 }])
    const other = await send({ ...body, note: 'not what was sent before' })
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
  })

  it('keeps a month or a year as it was entered', async () => {
    const { agent } = await api.as('registrar')
    for (const on of ['2024', '2025-06']) {
      const transaction = await anAcquisition(api, { on, lines: [line()] })
      expect(transaction.on).toBe(on)
      const again = await agent.get(`/api/register/transactions/${transaction.number}`).expect(200)
      expect(again.body).toMatchObject({ on, time: null })
    }
  })

  it('keeps an estimate between its two figures', async () => {
    const transaction = await anAcquisition(api, {
      lines: [line({ count: 350, estimate: { low: 300, high: 400 } })],
    })
    expect(transaction.lines[0]).toMatchObject({ count: 350, estimate: { low: 300, high: 400 } })
    const { agent } = await api.as('keeper')
    const animal = await agent.get(`/api/animals/${transaction.lines[0]?.accession ?? ''}`)
    expect(animal.body.count).toMatchObject({ basis: 'estimated', ledger: 350, low: 300, high: 400 })
  })

  it('says the date alone, on the page, in the list, the log and the history, where no time was entered', async () => {
    const { agent } = await api.as('registrar')
    for (const [on, time] of [['2026-11-20'], ['2026-10'], ['2026-11-20', '00:00']]) {
      const known = time === undefined ? on : null
      const came = await anAcquisition(api, {
        on,
        time,
        lines: [line({ count: 9, estimate: { low: 8, high: 10 } })],
      })
      const at = `/api/animals/${came.lines[0]?.accession ?? ''}`
      const read = async (path: string) => (await agent.get(path).expect(200)).body
      expect(await read(at)).toMatchObject({ sinceKnownOn: known, arrivedKnownOn: known })
      expect((await read(`${at}/moves`)).rows).toMatchObject([{ kind: 'arrival', knownOn: known }])
      expect((await read(`${at}/counts`)).lines).toMatchObject([{ delta: 9, knownOn: known }])
      const log = (await read(`${at}/log`)).rows as { kind: string; knownOn: string | null }[]
      expect(log.map((row) => row.kind).sort()).toEqual(['count', 'description', 'move', 'statement'])
      expect(log.map((row) => row.knownOn)).toEqual(log.map(() => known))
      const { events } = await read(`${at}/history`)
      expect(events).toMatchObject([
        { kind: 'found', on, exact: known === null },
        { kind: 'estimated', on, exact: known === null },
      ])
    }
  })

  it('adds to a group that is already here', async () => {
    const first = await anAcquisition(api, { on: '2026-10-01', lines: [line({ count: 10 })] })
    const animalId = first.lines[0]?.animalId
    const more = await anAcquisition(api, {
      kind: 'birth-or-hatch',
      on: '2026-11-01',
      lines: [{ record: 'existing', id: api.nextId(), animalId, count: 4 }],
    })
    expect(more.lines).toMatchObject([{ accession: first.lines[0]?.accession, accessioned: false, count: 4 }])
    const { agent } = await api.as('keeper')
    const animal = await agent.get(`/api/animals/${first.lines[0]?.accession ?? ''}`)
    expect(animal.body.count.ledger).toBe(14)
  })

  it('enters a new party together with the animals', async () => {
    const newCounterparty = {
      id: api.nextId(),
      name: 'Point Ansel Hatchery',
      kind: 'dealer',
      registration: 'NS-H-12',
    }
    const transaction = await anAcquisition(api, { kind: 'purchase', newCounterparty, lines: [line()] })
    expect(transaction.counterparty).toEqual({ id: newCounterparty.id, name: 'Point Ansel Hatchery' })
    const taken = await send(
      acquisitionBody(api, {
        kind: 'purchase',
        newCounterparty: { ...newCounterparty, id: api.nextId() },
        lines: [line()],
      }),
    )
    expect([taken.status, taken.body.code]).toEqual([409, 'name-already-used'])
  })
})

describe('an acquisition that cannot be taken', () => {
  it.each([
    ['tomorrow', { on: '2026-12-02' }, '/on'],
    ['next year', { on: '2027' }, '/on'],
    ['later today', { on: '2026-12-01', time: '15:00' }, '/time'],
    ['boxes opened tomorrow', { transport: { openedAt: '2026-12-02T09:00:00Z' } }, '/transport/openedAt'],
  ])('lies in the future: %s', async (_, given, pointer) => {
    const reply = await send(acquisitionBody(api, { ...given, lines: [line()] }))
    expect([reply.status, reply.body.code]).toEqual([422, 'in-the-future'])
    expect(pointers(reply.body)).toEqual([pointer])
  })

  it('is told everything that is wrong with it at once', async () => {
    const same = line()
    const reply = await send(
      acquisitionBody(api, {
        kind: 'purchase',
        on: '2026-11',
        time: '10:00',
        loanDueOn: '2027-01-01',
        place: { latitude: 44.6, on: '2026-12' },
        transport: { sealedAt: '2026-11-20T10:00:00Z', openedAt: '2026-11-20T09:00:00Z' },
        lines: [
          same,
          { ...line(), animalId: same.animalId },
          line({ form: 'individual', count: 2 }),
          line({ count: 10, estimate: { low: 20, high: 30 }, birthDate: '2026-12-24' }),
        ],
        permitUses: [{ id: api.nextId(), permitId: api.nextId(), lineId: api.nextId(), quantity: 1 }],
      }),
    )
    expect([reply.status, reply.body.code]).toEqual([422, 'bad-input'])
    expect(pointers(reply.body)).toEqual([
      '/counterpartyId',
      '/lines/1/animalId',
      '/lines/2/count',
      '/lines/3/estimate',
      '/loanDueOn',
      '/permitUses/0/lineId',
      '/place/latitude',
      '/time',
      '/transport/openedAt',
    ])
  })

  it('has the wrong shape', async () => {
    const reply = await send({
      id: 'x',
      kind: 'raffle',
      stage: 'maybe',
      on: '14.3.2026',
      permitUses: [],
      lines: [line({ count: 0 }), line({ count: 1.5 }), { ...line(), record: 'other' }],
      colour: 'blue',
    })
    expect(reply.status).toBe(422)
    expect(pointers(reply.body)).toEqual([
      '/colour',
      '/id',
      '/kind',
      '/lines/0/count',
      '/lines/1/count',
      '/lines/2/record',
      '/on',
      '/stage',
    ])
    const { agent } = await api.as('registrar')
    const malformed = await agent
      .post('/api/register/acquisitions')
      .set('Content-Type', 'application/json')
      .send('{"id": ')
    expect([malformed.status, malformed.body.code]).toEqual([400, 'malformed-json'])
  })

  it('names a taxon, an enclosure, a party, a group or a permit that is not there; nothing is half written', async () => {
    const unknown = api.nextId()
    const { agent } = await api.as('registrar')
    const before = await agent.get('/api/register/transactions?limit=1')
    const lineWith = (given: object) => acquisitionBody(api, { lines: [line(), line(given)] })
    const cases: [object, string][] = [
      [lineWith({ taxonId: unknown }), '/lines/1/taxonId'],
      [lineWith({ enclosureId: unknown }), '/lines/1/enclosureId'],
      [
        acquisitionBody(api, { kind: 'purchase', counterpartyId: unknown, lines: [line()] }),
        '/counterpartyId',
      ],
      [
        acquisitionBody(api, {
          lines: [{ record: 'existing', id: api.nextId(), animalId: unknown, count: 1 }],
        }),
        '/lines/0/animalId',
      ],
    ]
    const own = line()
    cases.push([
      acquisitionBody(api, {
        lines: [own],
        permitUses: [{ id: api.nextId(), permitId: unknown, lineId: own.id, quantity: 1 }],
      }),
      '/permitUses/0/permitId',
    ])
    for (const [body, pointer] of cases) {
      const reply = await send(body)
      expect([reply.status, reply.body.code, ...pointers(reply.body)]).toEqual([404, 'not-found', pointer])
    }
    const after = await agent.get('/api/register/transactions?limit=1')
    expect(after.body.total).toBe(before.body.total)
    expect((await agent.get(`/api/animals/${own.animalId}`)).status).toBe(404)
  })

  it('adds to an individual', async () => {
    const one = await anAcquisition(api, { lines: [line({ form: 'individual', count: 1 })] })
    const reply = await send(
      acquisitionBody(api, {
        lines: [{ record: 'existing', id: api.nextId(), animalId: one.lines[0]?.animalId, count: 1 }],
      }),
    )
    expect([reply.status, reply.body.code]).toEqual([409, 'not-a-group'])
  })
})

describe('a transaction that was entered wrongly', () => {
  const url = (number: string) => `/api/register/transactions/${number}`
  const voidIt = async (number: string, key = newKey()) =>
    (await api.as('registrar')).agent
      .post(`${url(number)}/void`)
      .set('Idempotency-Key', key)
      .send({ reason: 'Entered for the wrong shipment' })

  it('is voided with its ledger lines, stays readable, and is never edited', async () => {
    const transaction = await anAcquisition(api, { lines: [line({ count: 9 })] })
    const key = newKey()
    const reply = await voidIt(transaction.number, key)
    expect(reply.status).toBe(200)
    expect(reply.body.voided).toMatchObject({
      reason: 'Entered for the wrong shipment',
      by: 'Test registrar',
    })
    expect((await voidIt(transaction.number, key)).status).toBe(200)
    expect((await voidIt(transaction.number)).body.code).toBe('already-voided')
    const { agent } = await api.as('registrar')
    const accession = transaction.lines[0]?.accession ?? ''
    const animal = await agent.get(`/api/animals/${accession}`).expect(200)
    expect(animal.body).toMatchObject({ place: null, count: { ledger: 0 } })
    const counts = await agent.get(`/api/animals/${accession}/counts`)
    expect(counts.body.lines).toMatchObject([
      { delta: 9, struck: { reason: 'Entered for the wrong shipment' } },
    ])
    expect((await agent.put(url(transaction.number)).send({})).status).toBe(404)
  })

  it('is not voided while more is recorded of its animals', async () => {
    const transaction = await anAcquisition(api, { on: '2026-10-01', lines: [line({ count: 9 })] })
    const accession = transaction.lines[0]?.accession ?? ''
    const keeper = await api.as('keeper')
    const death = api.nextId()
    await keeper.agent
      .post(`/api/animals/${accession}/deaths`)
      .send({ id: death, kind: 'found-dead', count: 1, happenedAt: '2026-11-02T12:00:00Z' })
      .expect(201)
    const reply = await voidIt(transaction.number)
    expect([reply.status, reply.body.code]).toEqual([409, 'later-records'])
    expect(reply.body.detail).toContain(accession)
    await keeper.agent
      .post(`/api/animals/${accession}/deaths/${death}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Counted in the wrong tank' })
      .expect(200)
    expect((await voidIt(transaction.number)).status).toBe(200)
  })

  it('gives the permit its animals back', async () => {
    const permit = await aPermit(api, { quantityAllowed: 20 })
    const own = line({ count: 15 })
    const transaction = await anAcquisition(api, {
      stage: 'now',
      on: '2026-12-01',
      lines: [own],
      permitUses: [{ id: api.nextId(), permitId: permit.id, lineId: own.id, quantity: 15 }],
    })
    const { agent } = await api.as('registrar')
    const permitUrl = `/api/register/permits/${permit.number}`
    expect((await agent.get(permitUrl)).body).toMatchObject({ used: 15, remaining: 5 })
    await voidIt(transaction.number)
    expect((await agent.get(permitUrl)).body).toMatchObject({
      used: 0,
      remaining: 20,
      uses: [{ quantity: 15, voided: true }],
    })
  })

  it('is unknown', async () => {
    expect((await voidIt('TR-9999')).status).toBe(404)
  })
})
