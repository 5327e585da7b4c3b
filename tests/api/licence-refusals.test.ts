import request from 'supertest'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import type { Licence } from '../../shared/contracts/people.contract.ts'
import { pdfBytes } from '../builders/a-register.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let admin: TestPerson
let vet: TestPerson
beforeAll(async () => {
  api = await startApi()
  admin = await api.as('administrator')
  vet = await api.person({
    email: 'licensed@harrow-point.example',
    printedName: 'Dr Licensed',
    roles: ['veterinarian'],
  })
})
afterEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const body = (given: object = {}) => ({
  id: api.nextId(),
  class: 'veterinary',
  jurisdiction: 'Norrell Sound',
  number: 'VL-1',
  validFrom: '2026-01-01',
  validUntil: '2027-12-31',
  ...given,
})
const at = (rest = '') => `/api/people/${vet.id}/licences${rest}`
const licences = async () =>
  (await admin.agent.get(`/api/people/${vet.id}`).expect(200)).body.licences as Licence[]
const entered = async () => {
  const one = body()
  await admin.agent.post(at()).send(one).expect(201)
  return one
}
type Agent = TestPerson['agent']
/** Everything that changes a licence, each as it would be accepted from an administrator. */
const writes: [name: string, send: (agent: Agent, id: string) => ReturnType<Agent['post']>][] = [
  ['enter', (agent) => agent.post(at()).send(body())],
  [
    'correct',
    (agent, id) => agent.post(at(`/${id}/correction`)).send({ ...body(), reason: 'digits exchanged' }),
  ],
  [
    'end',
    (agent, id) =>
      agent
        .post(at(`/${id}/end`))
        .set('Idempotency-Key', newKey())
        .send({ endedOn: '2026-11-30', reason: 'moved' }),
  ],
  [
    'void',
    (agent, id) =>
      agent
        .post(at(`/${id}/void`))
        .set('Idempotency-Key', newKey())
        .send({ reason: 'not theirs' }),
  ],
  [
    'attach a paper to',
    (agent, id) =>
      agent
        .post(at(`/${id}/documents`))
        .field('id', api.nextId())
        .field('title', 'Licence')
        .field('kind', 'licence')
        .attach('file', pdfBytes(), { filename: 'licence.pdf' }),
  ],
]

describe.each(writes)('to %s a licence', (_, send) => {
  it('is refused to whoever is not signed in, and to every role but the administrator', async () => {
    const { id } = await entered()
    const before = await licences()
    expect((await send(request.agent(api.app), id)).status).toBe(401)
    for (const role of ['veterinarian', 'technician', 'keeper', 'registrar'] as const) {
      const reply = await send((await api.as(role)).agent, id)
      expect([role, reply.status]).toEqual([role, 403])
    }
    // nor to whose it is
    expect((await send(vet.agent, id)).status).toBe(403)
    expect(await licences()).toEqual(before)
    expect((await send(admin.agent, id)).status).toBeLessThan(300)
  })
  it('of nobody who is there is not found', async () => {
    const { id } = await entered()
    const reply = await send(
      { post: (address: string) => admin.agent.post(address.replace(vet.id, api.nextId())) } as Agent,
      id,
    )
    expect(reply.status).toBe(404)
  })
})

it('one’s own licences are read by nobody who is not signed in', async () => {
  await request(api.app).get('/api/me/licences').expect(401)
  expect((await (await api.as('keeper')).agent.get('/api/me/licences').expect(200)).body.licences).toEqual([])
})

describe('what is typed wrongly', () => {
  it.each([
    [{ class: 'surgeon' }, '/class'],
    [{ jurisdiction: '  ' }, '/jurisdiction'],
    [{ number: '' }, '/number'],
    [{ validFrom: '2026-02-30' }, '/validFrom'],
    [{ validUntil: '2025-12-31' }, '/validUntil'],
  ])('%j is refused at its field, entered or corrected', async (wrong, pointer) => {
    const { id } = await entered()
    const before = await licences()
    const replies = [
      await admin.agent.post(at()).send(body(wrong)),
      await admin.agent.post(at(`/${id}/correction`)).send({ ...body(wrong), reason: 'misread' }),
    ]
    for (const reply of replies) {
      expect([reply.status, reply.body.errors[0].pointer]).toEqual([422, pointer])
    }
    expect(await licences()).toEqual(before)
  })
  it('a correction without a reason is refused', async () => {
    const { id } = await entered()
    const reply = await admin.agent
      .post(at(`/${id}/correction`))
      .send(body())
      .expect(422)
    expect(reply.body.errors[0].pointer).toBe('/reason')
  })
})

describe('the same request sent again', () => {
  it('ends a licence once, and refuses another command under the same key', async () => {
    const { id } = await entered()
    const key = newKey()
    const end = (endedOn: string) =>
      admin.agent
        .post(at(`/${id}/end`))
        .set('Idempotency-Key', key)
        .send({ endedOn, reason: 'moved' })
    await end('2026-11-30').expect(200)
    await end('2026-11-30').expect(200)
    expect((await end('2026-11-29')).status).toBeGreaterThanOrEqual(400)
    expect((await licences()).find((one) => one.id === id)?.ended?.on).toBe('2026-11-30')
  })
  it('enters a licence once, and refuses another one under its id', async () => {
    const one = body({ number: 'VL-77' })
    await admin.agent.post(at()).send(one).expect(201)
    await admin.agent.post(at()).send(one).expect(201)
    const other = await admin.agent.post(at()).send({ ...one, class: 'controlled-substance' })
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
    expect((await licences()).filter(({ number }) => number === 'VL-77')).toHaveLength(1)
  })
})

describe('somebody who corrects what another one changed meanwhile', () => {
  it('is told, and nothing is written over it', async () => {
    const { id } = await entered()
    const correct = (number: string) =>
      admin.agent.post(at(`/${id}/correction`)).send({ ...body({ number }), reason: 'misread' })
    const [one, two] = await Promise.all([correct('VL-2'), correct('VL-3')])
    expect([one.status, two.status].sort()).toEqual([201, 409])
    expect([one, two].find(({ status }) => status === 409)?.body).toMatchObject({
      code: 'licence-changed',
      detail: expect.stringContaining('Load the person again'),
    })
    expect((await licences()).filter(({ supersedesId }) => supersedesId === id)).toHaveLength(1)
  })
})

it('the list of people tells whose licence or registration ends next', async () => {
  const soon = await api.person({
    email: 'soon@harrow-point.example',
    printedName: 'Dr Soon',
    roles: ['veterinarian'],
  })
  const add = (given: object) =>
    admin.agent.post(`/api/people/${soon.id}/licences`).send(body(given)).expect(201)
  const row = async () => (await admin.agent.get('/api/people?q=Dr Soon').expect(200)).body.rows[0]
  await add({ number: 'VL-5' })
  expect((await row()).licenceNotice).toBeNull()
  await add({ class: 'controlled-substance', number: 'CS-5', validUntil: '2026-12-26' })
  expect(await row()).toMatchObject({
    licenceState: 'valid',
    licenceNotice: { class: 'controlled-substance', number: 'CS-5', level: 'second', daysLeft: 25 },
  })
})
