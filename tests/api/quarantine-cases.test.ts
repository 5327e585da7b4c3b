import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish, simpleProtocolId } from '../builders/a-case.ts'
import { aGroup, aTaxon } from '../builders/a-collection.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => void (api = await startApi()))
afterAll(() => api.stop())

// The fixed day of the tests is 2026-12-01 in Halifax, where days begin at 04:00 UTC.

describe('a quarantine case', () => {
  it('begins with the last of the batch and counts calendar days of the facility', async () => {
    const one = await aCase(api, { at: '2026-11-11T03:30:00Z' })
    const { agent } = await api.as('keeper')
    const { body } = await agent.get(one.url).expect(200)
    expect(body).toMatchObject({
      number: one.number,
      status: 'in-quarantine',
      day0On: '2026-11-10',
      dayNumber: 21,
      requiredDays: 30,
      earliestClearanceOn: '2026-12-10',
      pausedDays: 0,
      quarantineKind: 'fish',
      enclosures: [one.enclosure.code],
      animals: { low: 8, high: 8 },
      protocol: { code: 'QP-30', version: 1, confirmed: false },
      readyToClear: false,
    })
    expect(body.unmet.map((unmet: { code: string }) => unmet.code)).toEqual([
      'length-not-reached',
      'negatives-missing',
    ])
    expect(body.reasons[0]).toMatchObject({ code: 'started', params: { day0On: '2026-11-10' } })
    expect(body.legs[0].steps.map((step: { key: string; state: string }) => [step.key, step.state])).toEqual([
      ['count-in', 'overdue'],
      ['observe', 'overdue'],
      ['sample-1', 'overdue'],
      ['sample-2', 'to-come'],
      ['decide', 'to-come'],
    ])
    const asOf = await agent.get(`${one.url}?asOf=2026-11-20T14:00:00Z`).expect(200)
    expect(asOf.body).toMatchObject({ dayNumber: 10, day0On: '2026-11-10' })
  })

  it('has no clock while the batch is open', async () => {
    const one = await aCase(api, { close: false })
    const { agent } = await api.as('veterinarian')
    const { body } = await agent.get(one.url).expect(200)
    expect(body).toMatchObject({ status: 'open', day0On: null, earliestClearanceOn: null, dayNumber: null })
    expect(body.lastEntryOn).toBe('2026-11-10')
  })

  it('is opened once, whoever sends it how often, and leaves its mark in the audit trail', async () => {
    const enclosure = await anEnclosure(api, 'C-TWICE', { boundary: 'Wing' })
    const animal = await aGroup(api, {
      taxonId: await aFish(api),
      enclosureId: enclosure.id,
      count: 3,
      happenedAt: '2026-11-10T14:00:00Z',
    })
    const { agent } = await api.as('technician')
    const body = {
      id: api.nextId(),
      protocolVersionId: simpleProtocolId,
      members: [{ id: api.nextId(), accession: animal.accession }],
      happenedAt: '2026-11-10T15:00:00Z',
    }
    const first = await agent.post('/api/cases').send(body).expect(201)
    const again = await agent.post('/api/cases').send(body).expect(201)
    expect(again.body.number).toBe(first.body.number)
    await agent
      .post('/api/cases')
      .send({ ...body, name: 'Other animals' })
      .expect(409)
    const admin = await api.as('administrator')
    const trail = await admin.agent.get(`/api/audit?subjectKind=case&subjectId=${body.id}`).expect(200)
    const actions = trail.body.rows.map((row: { action: string }) => row.action)
    expect(actions.filter((action: string) => action === 'case.open')).toHaveLength(1)

    const other = await agent
      .post('/api/cases')
      .send({ ...body, id: api.nextId(), members: [{ id: api.nextId(), accession: animal.accession }] })
      .expect(409)
    expect(other.body.code).toBe('already-in-a-case')
    expect(other.body.detail).toContain(first.body.number)
  })

  it('refuses a mixed batch, unknown animals, unknown protocols, the future and bad input, each plainly', async () => {
    const enclosure = await anEnclosure(api, 'C-BAD', { boundary: 'Wing' })
    const fish = await aGroup(api, { taxonId: await aFish(api), enclosureId: enclosure.id, count: 3 })
    const frogs = await aTaxon(api, {
      scientificName: 'Rana mixta',
      commonName: 'Mixed frog',
      group: 'amphibian',
    })
    const frog = await aGroup(api, { taxonId: frogs, enclosureId: enclosure.id, count: 2 })
    const { agent } = await api.as('technician')
    const send = (change: object) =>
      agent.post('/api/cases').send({
        id: api.nextId(),
        protocolVersionId: simpleProtocolId,
        members: [{ id: api.nextId(), accession: fish.accession }],
        happenedAt: '2026-11-10T15:00:00Z',
        ...change,
      })
    const mixed = await send({
      members: [fish, frog].map(({ accession }) => ({ id: api.nextId(), accession })),
    })
    expect([mixed.status, mixed.body.code]).toEqual([422, 'kinds-differ'])
    const unknown = await send({ members: [{ id: api.nextId(), accession: 'A-9999' }] })
    expect([unknown.status, unknown.body.errors[0].pointer]).toEqual([422, '/members/0/accession'])
    expect((await send({ protocolVersionId: api.nextId() })).status).toBe(422)
    expect((await send({ happenedAt: '2026-12-01T18:26:00Z' })).body.code).toBe('in-the-future')
    expect((await send({ members: [] })).status).toBe(422)
    expect((await send({ surprise: 1 })).body.errors[0].pointer).toBe('/surprise')
    const malformed = await agent.post('/api/cases').set('content-type', 'application/json').send('{"id":')
    expect([malformed.status, malformed.body.code]).toEqual([400, 'malformed-json'])
    const nested = '['.repeat(20_000) + ']'.repeat(20_000)
    const deep = await agent.post('/api/cases').set('content-type', 'application/json').send(nested)
    expect([deep.status, deep.body.code]).toEqual([422, 'bad-input'])
    expect((await agent.get('/api/cases/Q-999')).status).toBe(404)
    const board = await agent.get('/api/cases?q=C-BAD').expect(200)
    expect(board.body.total).toBe(0)
  })

  it('keeps its animals inside their boundary, and lets nothing move while it is held', async () => {
    const one = await aCase(api)
    const { agent: keeper } = await api.as('keeper')
    const outside = await anEnclosure(api, 'OUT-1')
    const inside = await anEnclosure(api, 'IN-1', { boundary: 'Wing' })
    const move = (to: { id: string }, from: { id: string } = one.enclosure) =>
      keeper.post(`/api/animals/${one.animal.accession}/moves`).send({
        id: api.nextId(),
        fromEnclosureId: from.id,
        toEnclosureId: to.id,
        happenedAt: '2026-12-01T18:00:00Z',
      })
    expect((await move(outside)).body.code).toBe('documented-transfer-needed')
    const hold = { id: api.nextId(), happenedAt: '2026-12-01T17:00:00Z', origin: 'online', device: 'test' }
    const held = await keeper.post(`${one.url}/holds`).send(hold).expect(201)
    expect(held.body).toMatchObject({ status: 'locked', held: true, earliestClearanceOn: null })
    expect(held.body.unmet.map((unmet: { code: string }) => unmet.code)).toContain('held')
    expect((await move(inside)).body.code).toBe('movement-locked')
    expect((await keeper.post(`${one.url}/lifts`).send({})).status).toBe(403)
    const vet = await api.as('veterinarian')
    const lifted = await vet.agent
      .post(`${one.url}/lifts`)
      .send({
        id: api.nextId(),
        happenedAt: '2026-12-01T18:10:00Z',
        lockEventId: hold.id,
        reason: 'Looked at',
      })
      .expect(201)
    expect(lifted.body).toMatchObject({ status: 'in-quarantine', held: false })
    const again = await vet.agent.post(`${one.url}/lifts`).send({
      id: api.nextId(),
      happenedAt: '2026-12-01T18:11:00Z',
      lockEventId: hold.id,
      reason: 'Again',
    })
    expect([again.status, again.body.code]).toEqual([409, 'not-locked'])
    await keeper
      .post(`/api/animals/${one.animal.accession}/moves`)
      .send({
        id: api.nextId(),
        fromEnclosureId: one.enclosure.id,
        toEnclosureId: inside.id,
        happenedAt: '2026-12-01T18:12:00Z',
      })
      .expect(201)
  })

  it('shows the board with every case on one list, by clearance, and counts what is due', async () => {
    const { agent } = await api.as('keeper')
    const { body } = await agent.get('/api/cases?limit=200').expect(200)
    expect(body.rows.length).toBe(body.total)
    expect(body.tally.running).toBe(body.total)
    const dates = body.rows.map(
      (row: { earliestClearanceOn: string | null }) => row.earliestClearanceOn ?? '9',
    )
    expect(dates).toEqual([...dates].sort())
    const held = await agent.get('/api/cases?view=held').expect(200)
    expect(held.body.total).toBe(body.tally.held)
    const page = await agent.get('/api/cases?limit=2').expect(200)
    expect(page.body.rows).toHaveLength(2)
    const next = await agent.get(`/api/cases?limit=2&cursor=${String(page.body.nextCursor)}`).expect(200)
    expect(next.body.rows[0].id).toBe(body.rows[2].id)
  })
})

describe('protocols', () => {
  it('are a project default until a licensed veterinarian confirms them; a length too short is refused', async () => {
    const tech = await api.as('technician')
    const listed = await tech.agent.get('/api/protocols').expect(200)
    const [simple] = listed.body.rows
    expect(simple).toMatchObject({ code: 'QP-30', state: 'default', mark: 'P', current: true })
    const propose = (requiredDays: number, id = api.nextId()) =>
      tech.agent.post('/api/protocols').send({
        id,
        code: 'QP-30',
        name: 'Simple quarantine, longer',
        content: { ...simple.content, policy: { ...simple.content.policy, requiredDays } },
        source: 'Agreed in the house',
        mark: 'P',
        reason: 'Two weeks more for wild fish',
      })
    const short = await propose(20)
    expect([short.status, short.body.errors[0].code]).toEqual([422, 'length-too-short'])
    const longer = await propose(44)
    expect(longer.body).toMatchObject({ version: 2, state: 'proposed', current: false })
    const confirm = (agent: typeof tech.agent) =>
      agent
        .post('/api/protocols/QP-30/versions/2/confirmation')
        .set('Idempotency-Key', newKey())
        .send({ reason: 'As discussed' })
    const unlicensed = await api.person({
      email: 'vet-without@harrow-point.example',
      printedName: 'Without',
      roles: ['veterinarian'],
    })
    expect((await confirm(unlicensed.agent)).body.code).toBe('licence-not-valid')
    const vet = await api.as('veterinarian')
    expect((await confirm(vet.agent)).body).toMatchObject({ state: 'confirmed', current: true })
    expect((await confirm(vet.agent)).body.code).toBe('already-confirmed')

    const one = await aCase(api)
    const changed = await vet.agent.post(`${one.url}/decisions`).send({
      id: api.nextId(),
      happenedAt: '2026-11-20T14:00:00Z',
      reason: 'Wild caught',
      decision: { kind: 'protocol-changed', protocolVersionId: longer.body.id },
    })
    expect(changed.body).toMatchObject({
      requiredDays: 44,
      earliestClearanceOn: '2026-12-24',
      protocol: { version: 2, confirmed: true },
    })
  })
})
