import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import pg from 'pg'
import request from 'supertest'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { createApp } from '../../server/app.ts'
import { compose } from '../../server/composition.ts'
import { entities } from '../../server/entities.ts'
import { connectRuntime } from '../../server/platform/database/data-source.ts'
import { createLog } from '../../server/platform/log.ts'
import { aClearableCase } from '../builders/a-clearance.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

let api: TestApi
let owner: pg.Client
/** An order that runs, and a draft to be signed. */
let signed: string
let draft: Awaited<ReturnType<typeof aDraft>>
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  const tank = await aBathWater(api, 'QT-3')
  const school = await aSchool(api, tank.id, 1)
  const product = await aProduct(api, {})
  await readingsNow(api, tank.waterBodyId, {
    'dissolved-oxygen': ['6.9', 'mg/L'],
    temperature: ['23.4', 'degC'],
    salinity: ['33.1', 'PSS-78'],
    ph: ['8.1', 'pH'],
    alkalinity: ['2.4', 'meq/L'],
  })
  const fields = bathFields({
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: product.id,
    lotId: product.lotId,
  })
  const other = await aDraft(api, fields)
  expect((await signDraft(api, other)).status).toBe(201)
  signed = other.number
  draft = await aDraft(api, fields)
})
afterEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

/** The server as another process, or as the same one after a restart, would be: on the same database, nothing in memory. */
async function anotherInstance() {
  const dataSource = await connectRuntime(api.runtimeUrl, entities, 4)
  const dataFolder = await mkdtemp(path.join(tmpdir(), 'pratique-test-'))
  const log = createLog('silent')
  const composition = compose({ dataSource, clock: api.clock, log, dataFolder, demo: false, smtpUrl: null })
  const { app, close } = createApp({
    config: { sessionSecret: 'x'.repeat(40), publicUrl: null, mode: 'test' },
    composition,
  })
  return {
    app,
    composition,
    async stop() {
      close()
      await composition.close()
      await dataSource.destroy()
      await rm(dataFolder, { recursive: true, force: true })
    },
  }
}

async function aVet(name: string): Promise<TestPerson> {
  const vet = await api.person({
    email: `${name}@harrow-point.example`,
    printedName: `Dr ${name}`,
    roles: ['veterinarian'],
  })
  await (
    await api.as('administrator')
  ).agent
    .post(`/api/people/${vet.id}/licences`)
    .send({
      id: api.nextId(),
      class: 'veterinary',
      jurisdiction: 'Norrell Sound',
      number: `VL-${name}`,
      validFrom: '2026-01-01',
      validUntil: '2027-12-31',
    })
    .expect(201)
  return vet
}

const signOrder = (agent: TestPerson['agent'], typed: string) =>
  agent
    .post(`/api/orders/${draft.number}/signature`)
    .set('Idempotency-Key', newKey())
    .send({ password: typed, expectedVersion: draft.version, read: [], overrides: [] })
const clearCase = (agent: TestPerson['agent'], url: string, typed: string) =>
  agent.post(`${url}/clearance`).set('Idempotency-Key', newKey()).send({ password: typed, expectedUnmet: [] })
const locks = async (person: TestPerson) =>
  (
    await owner.query(
      `SELECT seq, text FROM audit_entries WHERE action = 'signing.lock' AND subject_id = $1`,
      [person.id],
    )
  ).rows

describe('five wrong passwords in a row while signing', () => {
  it('lock signing whatever is signed, across processes and a restart, and say so', async () => {
    const vet = await aVet('across')
    const one = await aClearableCase(api)
    const second = await anotherInstance()
    const there = request.agent(second.app)
    await there.post('/api/sign-in').send({ email: vet.email, password }).expect(200)

    for (const wrong of [
      () => signOrder(vet.agent, 'wrong'),
      () => clearCase(vet.agent, one.url, 'wrong'),
      () => signOrder(there, 'wrong'),
      () => clearCase(there, one.url, 'wrong'),
    ])
      expect((await wrong()).body).toMatchObject({ code: 'password-wrong' })
    expect((await vet.agent.get('/api/me')).body.signingLockedUntil).toBeNull()
    const fifth = await signOrder(vet.agent, 'wrong')
    expect(fifth.body).toMatchObject({
      code: 'password-wrong',
      detail: expect.stringMatching(/locked for you for 15 min.*hold and stop/),
    })

    for (const agent of [vet.agent, there]) {
      const locked = await signOrder(agent, password)
      expect([locked.status, locked.body.code, locked.headers['retry-after']]).toEqual([
        429,
        'sign-in-locked',
        '900',
      ])
      expect(locked.body.detail).toMatch(/15 min.*hold and stop/)
    }
    await second.stop()

    const restarted = await anotherInstance()
    const after = request.agent(restarted.app)
    await after.post('/api/sign-in').send({ email: vet.email, password }).expect(200)
    expect((await clearCase(after, one.url, password)).body.code).toBe('sign-in-locked')
    expect((await after.get('/api/me')).body.signingLockedUntil).toBe('2026-12-01T18:35:00.000Z')
    await restarted.stop()

    expect(await locks(vet)).toHaveLength(1)
    expect((await locks(vet))[0].text).toContain('2026-12-01T18:35:00.000Z')
    api.clock.set(new Date('2026-12-01T18:34:59Z'))
    expect((await signOrder(vet.agent, password)).body.code).toBe('sign-in-locked')
    // over: the same password is looked at again, and what refuses now is not the lock
    api.clock.set(new Date('2026-12-01T18:35:00Z'))
    expect((await signOrder(vet.agent, 'wrong')).body.code).toBe('password-wrong')
    expect((await signOrder(vet.agent, password)).body.code).not.toBe('sign-in-locked')
  })

  it('count however long lies between them, until a right one', async () => {
    const vet = await aVet('slow')
    const at = (minutes: number) => api.clock.set(new Date(testDay.getTime() + minutes * 60_000))
    for (const minutes of [0, 20, 40, 60]) {
      at(minutes)
      expect((await signOrder(vet.agent, 'wrong')).body.code).toBe('password-wrong')
    }
    await signOrder(vet.agent, password)
    for (const minutes of [80, 100, 120, 140]) {
      at(minutes)
      await signOrder(vet.agent, 'wrong')
    }
    expect(await locks(vet)).toHaveLength(0)
    at(160)
    await signOrder(vet.agent, 'wrong')
    expect(await locks(vet)).toHaveLength(1)
    expect((await signOrder(vet.agent, password)).body.code).toBe('sign-in-locked')
  })

  it('are no more tries when many are sent at once to two processes', async () => {
    const vet = await aVet('atonce')
    const second = await anotherInstance()
    const there = request.agent(second.app)
    await there.post('/api/sign-in').send({ email: vet.email, password }).expect(200)
    const answers = await Promise.all(
      [...Array<null>(12)].map((_, i) => signOrder(i % 2 ? there : vet.agent, 'wrong')),
    )
    await second.stop()
    const codes = answers.map(({ body }) => body.code as string)
    expect(codes.filter((code) => code === 'password-wrong').length).toBeLessThanOrEqual(5)
    expect(new Set(codes)).toEqual(new Set(['password-wrong', 'sign-in-locked']))
    expect(await locks(vet)).toHaveLength(1)
  })

  it('never lock holding and stopping, nor writing; confirming waits too', async () => {
    const vet = await aVet('holds')
    const one = await aClearableCase(api)
    for (let i = 0; i < 5; i++) await signOrder(vet.agent, 'wrong')
    expect((await signOrder(vet.agent, password)).body.code).toBe('sign-in-locked')

    const now = { happenedAt: testDay.toISOString() }
    await vet.agent
      .post(`/api/orders/${signed}/holds`)
      .send({ id: api.nextId(), ...now })
      .expect(201)
    await vet.agent
      .post(`${one.url}/holds`)
      .send({ id: api.nextId(), ...now, origin: 'online', device: 'phone' })
      .expect(201)
    const { lines } = (await vet.agent.get('/api/formulary').expect(200)).body
    const confirming = await vet.agent
      .post(`/api/dose-lines/${String(lines[0].id)}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
    expect(confirming.body.code).toBe('sign-in-locked')
    // the other veterinarian signs
    expect((await signDraft(api, draft)).body.code).not.toBe('sign-in-locked')
  })

  it('are shown to the administrator, on the person and on Today', async () => {
    const vet = await aVet('shown')
    for (let i = 0; i < 5; i++) await signOrder(vet.agent, 'wrong')
    const { agent } = await api.as('administrator')
    expect((await agent.get(`/api/people/${vet.id}`).expect(200)).body.signingLockedUntil).toBe(
      '2026-12-01T18:35:00.000Z',
    )
    const worklist = worklistOf(api)
    const item = async () => (await worklist.itemsOf('administrator', 'signing-locked', 'Dr shown'))[0]
    expect(await item()).toMatchObject({ params: { personId: vet.id, count: 5, running: 1 } })
    api.clock.set(new Date('2026-12-01T18:40:00Z'))
    expect((await item())?.params.running).toBeUndefined()
    expect((await agent.get(`/api/people/${vet.id}`)).body.signingLockedUntil).toBeNull()
    const trail = (await agent.get('/api/audit?q=signing.lock').expect(200)).body
    expect(trail.total).toBeGreaterThan(0)
  })
})
