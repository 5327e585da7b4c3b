import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
afterAll(() => api.stop())

type Role = 'veterinarian' | 'technician' | 'keeper' | 'registrar'
const event = (given: object = {}) => ({
  id: api.nextId(),
  doseKey: '1',
  seen: 'Three fish gasp at the surface',
  affectedCount: 3,
  happenedAt: '2026-12-01T18:15:00Z',
  ...given,
})
const record = async (number: string, body: object, role: Role = 'keeper') =>
  (await api.as(role)).agent.post(`/api/orders/${number}/adverse-events`).send(body)
const review = async (number: string, eventId: string, given: object = {}, role: Role = 'veterinarian') =>
  (await api.as(role)).agent
    .post(`/api/orders/${number}/adverse-events/${eventId}/review`)
    .send({ id: api.nextId(), finding: 'Oxygen had fallen; aerated, go on', ...given })
async function atDose(number: string) {
  const sheet = (await house.technician.agent.get(house.doseAt(number)).expect(200)).body
  return {
    mayStart: sheet.mayStart as boolean,
    found: (sheet.cautions as { ruleId: string; code: string; level: string }[]).filter(
      ({ ruleId }) => ruleId === 'R46',
    ),
    why: (sheet.why as string[]).join(' '),
  }
}

describe('an adverse event', () => {
  it('holds the order until a veterinarian has reviewed it, and nothing overrides that', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    expect((await atDose(number)).found).toEqual([])
    const seen = event()
    const reply = await record(number, seen)
    expect([reply.status, reply.body.rows]).toMatchObject([
      201,
      [{ id: seen.id, doseKey: '1', affectedCount: 3, recordedBy: 'Test keeper', review: null }],
    ])
    const held = await atDose(number)
    expect(held.found).toMatchObject([{ code: 'adverse-event-open', level: 'stop' }])
    expect(held.mayStart).toBe(false)
    expect(held.why).toContain('Three fish gasp at the surface')
    // lifting a hold of the order does not lift this
    const { agent } = await api.as('veterinarian')
    await agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:16:00Z' })
      .expect(201)
    await agent
      .post(`/api/orders/${number}/hold-lift`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'they breathe quietly again' })
      .expect(200)
    expect((await atDose(number)).found).toHaveLength(1)

    // a second one: both have to be reviewed
    const second = event({ seen: 'One fish lies on its side', happenedAt: '2026-12-01T18:17:00Z' })
    await record(number, second, 'technician')
    expect((await review(number, seen.id)).status).toBe(201)
    expect((await atDose(number)).found).toHaveLength(1)
    const done = await review(number, second.id)
    expect(done.body.rows[0].review).toMatchObject({
      finding: 'Oxygen had fallen; aerated, go on',
      by: 'Test veterinarian',
    })
    expect((await atDose(number)).found).toEqual([])
    const trail = await (await api.as('administrator')).agent.get('/api/audit?q=adverse-event').expect(200)
    expect(trail.body.rows.map(({ action }: { action: string }) => action)).toEqual([
      'order.review-adverse-event',
      'order.review-adverse-event',
      'order.record-adverse-event',
      'order.record-adverse-event',
    ])
  })

  it('is recorded whatever the state of the order and the clock of the device, and once', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/orders/${number}/discontinuation`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'no longer needed' })
      .expect(200)
    const ahead = event({ doseKey: null, affectedCount: null, happenedAt: '2026-12-01T23:00:00Z' })
    const reply = await record(number, ahead)
    expect([reply.status, reply.body.rows.length]).toEqual([201, 1])
    expect(Date.parse(reply.body.rows[0].happenedAt)).toBeLessThan(Date.parse('2026-12-01T23:00:00Z'))
    expect((await record(number, ahead)).body.rows).toHaveLength(1)
    expect((await record(number, { ...ahead, seen: 'something else' })).body.code).toBe('id-already-used')
  })

  it('is recorded at the tank, reviewed by a veterinarian, once, of this order', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    const other = await house.signedBath(await house.tankWithSchool())
    expect((await record(number, event(), 'registrar')).body.code).toBe('may-not')
    for (const bad of [{ seen: '' }, { seen: 'x' }, { affectedCount: -1 }, { affectedCount: 1.5 }])
      expect((await record(number, event(bad))).body.code, JSON.stringify(bad)).toBe('bad-input')
    expect((await record('TO-9999', event())).body.code).toBe('not-found')
    const seen = event()
    await record(number, seen)
    for (const role of ['technician', 'keeper'] as const)
      expect((await review(number, seen.id, {}, role)).body.code, role).toBe('may-not')
    expect((await review(number, seen.id, { finding: '' })).body.code).toBe('bad-input')
    expect((await review(other, seen.id)).body.code).toBe('not-found')
    const said = { id: api.nextId() }
    expect((await review(number, seen.id, said)).status).toBe(201)
    expect((await review(number, seen.id, said)).status).toBe(201)
    expect((await review(number, seen.id)).body.code).toBe('already-resolved')
  })
})
