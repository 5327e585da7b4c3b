import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aParty } from '../builders/a-register.ts'
import { aBathWater, aDraft, aProduct, aSchool, bathFields, signDraft } from '../builders/an-order.ts'
import { nothingStated } from '../../shared/domain/orders/bath-order-draft.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let partyId: string
beforeAll(async () => {
  api = await startApi()
  partyId = await aParty(api, 'Point Ansel Hatchery')
})
afterAll(() => api.stop())

/** A school that was given tricaine on the first of December, and another that was in the same water. */
async function treated(n: number) {
  const tank = await aBathWater(api, `WD-${String(n)}`)
  const school = await aSchool(api, tank.id, n)
  const beside = await aSchool(api, tank.id, n + 50)
  const { id, lotId } = await aProduct(api, {
    agent: 'tricaine',
    productName: `Tricaine ${String(n)}`,
    strengthBasis: 'salt',
  })
  const draft = await aDraft(
    api,
    bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: id,
      lotId,
      basis: 'salt',
      target: { value: '75', unit: 'mg/L' },
      timing: 'timed',
      contactMinutes: 20,
      startsAt: '2026-12-01T18:00:00Z',
      stated: { ...nothingStated, waterKind: 'marine', isBuffered: true },
    }),
  )
  const signed = await signDraft(api, draft, {
    overrides: [{ ruleId: 'R19', reason: 'on show, never eaten' }],
  })
  expect(signed.status, JSON.stringify(signed.body)).toBe(201)
  const { agent } = await api.as('technician')
  await agent
    .post(`/api/orders/${draft.number}/doses/1/record`)
    .send({
      id: api.nextId(),
      kind: 'recorded',
      happenedAt: '2026-12-01T18:00:00Z',
      amount: { value: '163.61', unit: 'g' },
      lotId,
    })
    .expect(201)
  return { school, beside, number: draft.number }
}

const say = async ({ accession }: { accession: string }, answer: 'yes' | 'no') =>
  (await api.as('registrar')).agent
    .post(`/api/animals/${accession}/food-or-release`)
    .send({ id: api.nextId(), answer, reason: 'as the plan says', happenedAt: '2026-12-01T12:00:00Z' })
    .expect(201)
const leave = async ({ id }: { id: string }, kind: string, given: object = {}) =>
  (await api.as('registrar')).agent.post('/api/register/dispositions').send({
    id: api.nextId(),
    stage: 'now',
    on: '2026-12-01',
    permitUses: [],
    kind,
    ...(kind === 'release' ? { place: { locality: 'Norrell Sound' } } : { counterpartyId: partyId }),
    lines: [{ id: api.nextId(), animalId: id, count: 1 }],
    ...given,
  })

describe('animals that were given tricaine', () => {
  it('wait 21 days before they may be eaten or set free, named by the order or not', async () => {
    const { school, beside, number } = await treated(1)
    // of whom nobody said, that is asked; what is set free may be eaten whatever was said
    expect((await leave(school, 'sale')).body.code).toBe('food-or-release-not-said')
    await say(beside, 'no')
    const released = await leave(beside, 'release')
    expect(released.body).toMatchObject({ code: 'withdrawal-not-over', status: 409 })
    expect(released.body.errors[0].pointer).toBe('/lines/0/animalId')
    expect(released.body.detail.replaceAll('\u00a0', ' ')).toContain('22 Dec 2026')
    expect(released.body.detail).toContain(number)
    expect((await leave(beside, 'sale')).status).toBe(201)
    await say(school, 'yes')
    expect((await leave(school, 'sale')).body.code).toBe('withdrawal-not-over')

    api.clock.set(new Date('2026-12-21T20:00:00Z'))
    expect((await leave(school, 'release', { on: '2026-12-21' })).body.code).toBe('withdrawal-not-over')
    api.clock.set(new Date('2026-12-22T12:00:00Z'))
    expect((await leave(school, 'release', { on: '2026-12-22' })).status).toBe(201)
  })

  it('that have left all the same are recorded, and a veterinarian is asked to explain it', async () => {
    api.clock.set(new Date('2026-12-01T18:15:00Z'))
    const { school, number } = await treated(2)
    const left = await leave(school, 'release', { stage: 'already' })
    expect(left.status, JSON.stringify(left.body)).toBe(201)
    const animal = await (
      await api.as('veterinarian')
    ).agent
      .get(`/api/animals/${school.accession}`)
      .expect(200)
    expect(animal.body.discrepancies).toMatchObject([
      { kind: 'left-before-withdrawal', forRole: 'veterinarian', facts: { order: number, cause: 'release' } },
    ])
  })

  it('die without anybody being asked', async () => {
    const { school } = await treated(3)
    const died = await leave(school, 'death', { stage: 'already', counterpartyId: undefined })
    expect(died.status, JSON.stringify(died.body)).toBe(201)
  })
})
