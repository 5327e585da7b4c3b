import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => void (api = await startApi()))
afterAll(() => api.stop())

const personBody = (id: string, email = `${id}@harrow-point.example`) => ({
  id,
  email,
  printedName: 'Sam Hollow',
  roles: ['keeper'],
})

describe('people', () => {
  it('enters a person once: the same request again changes nothing, other content is refused', async () => {
    const admin = await api.as('administrator')
    const id = api.nextId()
    const first = await admin.agent.post('/api/people').send(personBody(id)).expect(201)
    expect(first.body.oneTimePassword).not.toBeNull()
    const again = await admin.agent.post('/api/people').send(personBody(id)).expect(201)
    expect(again.body).toMatchObject({ id, version: 1, oneTimePassword: null })
    const other = await admin.agent
      .post('/api/people')
      .send({ ...personBody(id), printedName: 'Another' })
      .expect(409)
    expect(other.body.code).toBe('id-already-used')
  })

  it('refuses an e-mail that is in use, also when two arrive at once', async () => {
    const admin = await api.as('administrator')
    const send = () =>
      admin.agent.post('/api/people').send(personBody(api.nextId(), 'twice@harrow-point.example'))
    const replies = await Promise.all([send(), send(), send()])
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409, 409])
    expect(replies.find((reply) => reply.status === 409)?.body.code).toBe('email-already-used')
  })

  it('tells every fault of a form at once', async () => {
    const admin = await api.as('administrator')
    const reply = await admin.agent
      .post('/api/people')
      .send({ id: 'x', email: 'not an e-mail', printedName: '', roles: [], shoeSize: 43 })
      .expect(422)
    expect(reply.body.errors.map((error: { pointer: string }) => error.pointer).sort()).toEqual([
      '/email',
      '/id',
      '/printedName',
      '/roles',
      '/shoeSize',
    ])
  })

  it('keeps a stale correction from overwriting a newer one', async () => {
    const admin = await api.as('administrator')
    const id = api.nextId()
    await admin.agent.post('/api/people').send(personBody(id)).expect(201)
    const correct = (printedName: string) =>
      admin.agent
        .put(`/api/people/${id}`)
        .send({ ...personBody(id), id: undefined, printedName, active: true, expectedVersion: 1 })
    await correct('Sam Hollow-Pike').expect(200)
    const stale = await correct('Samuel Hollow').expect(409)
    expect(stale.body).toMatchObject({ code: 'stale-version', current_version: 2 })
    const now = await admin.agent.get(`/api/people/${id}`).expect(200)
    expect(now.body).toMatchObject({ printedName: 'Sam Hollow-Pike', version: 2 })
  })

  it('ends the sessions of an account that is closed', async () => {
    const admin = await api.as('administrator')
    const leaver = await api.person({
      email: 'leaver@harrow-point.example',
      printedName: 'Lea',
      roles: ['keeper'],
    })
    const row = await admin.agent.get(`/api/people/${leaver.id}`)
    await admin.agent
      .put(`/api/people/${leaver.id}`)
      .send({
        email: leaver.email,
        printedName: 'Lea',
        roles: ['keeper'],
        active: false,
        expectedVersion: row.body.version,
      })
      .expect(200)
    await leaver.agent.get('/api/me').expect(401)
  })

  it('keeps the last administrator', async () => {
    const admin = await api.as('administrator')
    const row = await admin.agent.get(`/api/people/${admin.id}`)
    const reply = await admin.agent
      .put(`/api/people/${admin.id}`)
      .send({
        email: admin.email,
        printedName: 'Test administrator',
        roles: ['keeper'],
        active: true,
        expectedVersion: row.body.version,
      })
      .expect(409)
    expect(reply.body.code).toBe('last-administrator')
  })

  it('issues a one-time password once for a key, and ends the sessions of that person', async () => {
    const admin = await api.as('administrator')
    const someone = await api.person({
      email: 'lost@harrow-point.example',
      printedName: 'Lost',
      roles: ['keeper'],
    })
    const key = newKey()
    const issue = (k: string) =>
      admin.agent.post(`/api/people/${someone.id}/one-time-password`).set('Idempotency-Key', k).send()
    const first = await issue(key).expect(200)
    expect(first.body.oneTimePassword).toMatch(/-/)
    expect((await issue(key).expect(200)).body.oneTimePassword).toBeNull()
    await someone.agent.get('/api/me').expect(401)
    const missing = await admin.agent.post(`/api/people/${someone.id}/one-time-password`).send().expect(422)
    expect(missing.body.code).toBe('idempotency-key-missing')
    const elsewhere = await admin.agent
      .post(`/api/people/${admin.id}/one-time-password`)
      .set('Idempotency-Key', key)
      .send()
      .expect(409)
    expect(elsewhere.body.code).toBe('idempotency-key-reused')
  })

  it('lists with search, role, order and pages', async () => {
    const admin = await api.as('administrator')
    for (let i = 0; i < 7; i++)
      await api.composition.people.service.enterPerson(
        { actor: { personId: null, printedName: 'test', roles: [] }, requestId: 't' },
        {
          id: api.nextId(),
          email: `page${String(i)}@paging.example`,
          printedName: `Page ${String(i)}`,
          roles: ['registrar'],
        },
      )
    const first = await admin.agent
      .get('/api/people?q=paging.example&limit=3&sort=email&direction=desc')
      .expect(200)
    expect(first.body.total).toBe(7)
    expect(first.body.rows.map((row: { email: string }) => row.email[4])).toEqual(['6', '5', '4'])
    const second = await admin.agent
      .get(
        `/api/people?q=paging.example&limit=3&sort=email&direction=desc&cursor=${first.body.nextCursor as string}`,
      )
      .expect(200)
    expect(second.body.rows[0].email).toBe('page3@paging.example')
    expect((await admin.agent.get('/api/people?q=100%25_').expect(200)).body.total).toBe(0)
    await admin.agent.get('/api/people?cursor=%21%21').expect(422)
    await admin.agent.get('/api/people?limit=100000').expect(422)
  })

  it('answers 404 for a person who is not there', async () => {
    const admin = await api.as('administrator')
    expect((await admin.agent.get(`/api/people/${api.nextId()}`).expect(404)).body.code).toBe('not-found')
  })
})

describe('settings of the facility', () => {
  const propose = async (key: string, value: string) => {
    const id = api.nextId()
    const { agent } = await api.as('administrator')
    return { id, reply: await agent.post(`/api/settings/${key}/proposals`).send({ id, value }) }
  }
  const confirm = async (key: string, id: string) => {
    const { agent } = await api.as('administrator')
    return agent.post(`/api/settings/${key}/proposals/${id}/confirmation`).set('Idempotency-Key', newKey())
  }

  it('takes no value that would stop work later, and says what to write', async () => {
    const form = (await propose('numbers.accession', 'HP-')).reply
    expect(form.status).toBe(422)
    expect(form.body.errors).toEqual([
      {
        pointer: '/value',
        code: 'no-running-number',
        detail: expect.stringContaining('HP-{0000}') as string,
      },
    ])
    const list = (await propose('notices.on-call', 'Duty desk | ext. 41, everybody')).reply
    expect(list.status).toBe(422)
    expect(list.body.detail).toMatch(/^“everybody”: Give each person a telephone number/)
  })

  it('confirms only the newest proposal, once', async () => {
    const older = await propose('facility.name', 'Older Hall')
    const newer = await propose('facility.name', 'Newer Hall')
    const stale = await confirm('facility.name', older.id)
    expect(stale.status).toBe(409)
    expect(stale.body.code).toBe('stale-version')
    expect(stale.body.detail).toContain('“Newer Hall” by Test administrator')
    expect((await confirm('facility.name', newer.id)).body).toMatchObject({ value: 'Newer Hall' })
    expect((await confirm('facility.name', older.id)).body.code).toBe('stale-version')
    expect((await confirm('facility.name', newer.id)).body.code).toBe('already-confirmed')
    await api.setSetting('facility.name', 'Harrow Point Sea Hall')
  })
})

describe('licences', () => {
  const licence = (validFrom: string, validUntil: string) => ({
    id: api.nextId(),
    class: 'veterinary',
    jurisdiction: 'Norrell Sound',
    number: 'VL-1',
    validFrom,
    validUntil,
  })

  it('counts both days of the period, at the facility', async () => {
    const admin = await api.as('administrator')
    const vet = await api.person({
      email: 'edge@harrow-point.example',
      printedName: 'Edge',
      roles: ['veterinarian'],
    })
    await admin.agent
      .post(`/api/people/${vet.id}/licences`)
      .send(licence('2026-12-01', '2026-12-01'))
      .expect(201)
    const may = async () => (await vet.agent.get('/api/me').expect(200)).body.mayPractise as boolean
    const day = api.clock.now()
    // 23:59 and 00:00 at the facility, UTC−4 in December
    const at = async (instant: string) => {
      api.clock.set(new Date(instant))
      return may()
    }
    expect(await at('2026-12-01T03:59:59Z')).toBe(false)
    expect(await at('2026-12-01T04:00:00Z')).toBe(true)
    expect(await at('2026-12-02T03:59:59Z')).toBe(true)
    expect(await at('2026-12-02T04:00:00Z')).toBe(false)
    api.clock.set(day)
  })

  it('does not count a licence of a jurisdiction that the facility does not accept', async () => {
    const admin = await api.as('administrator')
    const vet = await api.person({
      email: 'far@harrow-point.example',
      printedName: 'Far',
      roles: ['veterinarian'],
    })
    const reply = await admin.agent
      .post(`/api/people/${vet.id}/licences`)
      .send({ ...licence('2026-01-01', '2027-01-01'), jurisdiction: 'Elsewhere' })
      .expect(201)
    expect(reply.body.licences[0].state).toBe('not-accepted-here')
    expect((await vet.agent.get('/api/me')).body.mayPractise).toBe(false)
  })

  it('refuses a period that ends before it begins, and an impossible date', async () => {
    const admin = await api.as('administrator')
    const post = (from: string, until: string) =>
      admin.agent.post(`/api/people/${admin.id}/licences`).send(licence(from, until))
    expect((await post('2026-05-02', '2026-05-01').expect(422)).body.code).toBe('period-reversed')
    expect((await post('2026-02-30', '2026-05-01').expect(422)).body.code).toBe('bad-input')
  })

  it('voids a licence with a reason and keeps it readable', async () => {
    const admin = await api.as('administrator')
    const vet = await api.person({
      email: 'void@harrow-point.example',
      printedName: 'Void',
      roles: ['veterinarian'],
    })
    const entered = licence('2026-01-01', '2027-01-01')
    await admin.agent.post(`/api/people/${vet.id}/licences`).send(entered).expect(201)
    const voided = await admin.agent
      .post(`/api/people/${vet.id}/licences/${entered.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'number mistyped' })
      .expect(200)
    expect(voided.body.licences[0]).toMatchObject({
      state: 'void',
      voidedReason: 'number mistyped',
      number: 'VL-1',
    })
    expect((await vet.agent.get('/api/me')).body.mayPractise).toBe(false)
  })

  it('voids no licence under a key that was sent with another reason', async () => {
    const admin = await api.as('administrator')
    const entered = licence('2026-01-01', '2027-01-01')
    await admin.agent.post(`/api/people/${admin.id}/licences`).send(entered).expect(201)
    const key = newKey()
    const voidIt = (reason: string) =>
      admin.agent
        .post(`/api/people/${admin.id}/licences/${entered.id}/void`)
        .set('Idempotency-Key', key)
        .send({ reason })
    await voidIt('number mistyped').expect(200)
    await voidIt('number mistyped').expect(200)
    expect((await voidIt('another reason').expect(409)).body.code).toBe('idempotency-key-reused')
  })
})
