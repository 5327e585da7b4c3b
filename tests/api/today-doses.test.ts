import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

let api: TestApi
let second: TestPerson
let worklist: ReturnType<typeof worklistOf>
beforeAll(async () => {
  api = await startApi()
  worklist = worklistOf(api)
  second = await api.person({
    email: 'tech2@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

describe('doses on the worklist', () => {
  let tank: BuiltEnclosure
  let formalin: { id: string; lotId: string }
  let school: { id: string }
  beforeAll(async () => {
    tank = await aBathWater(api, 'QT-3')
    school = await aSchool(api, tank.id, 1)
    formalin = await aProduct(api, {
      agent: 'formalin',
      productName: 'Formalin 37 %',
      form: 'liquid',
      strength: { value: '37', unit: 'percent_w_w' },
      density: { value: '1.08', unit: 'g/mL' },
    })
  })

  const fields = (given: object = {}) =>
    bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: formalin.id,
      lotId: formalin.lotId,
      target: { value: '100', unit: 'uL/L' },
      basis: 'product',
      timing: 'timed',
      contactMinutes: 45,
      division: { value: '1', unit: 'mL' },
      startsAt: '2026-12-01T19:00:00Z',
      ...given,
    })
  async function aSigned(given: object = {}): Promise<string> {
    const draft = await aDraft(api, fields(given))
    const signed = await signDraft(api, draft)
    if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
    return draft.number
  }

  it('come, and are due from their hour, for who gives them and nobody else; past the last window the order is late', async () => {
    const number = await aSigned()
    const state = async () => (await worklist.itemsOf('technician', 'dose', number)).map((item) => item.state)
    expect(await state()).toEqual(['coming'])
    expect(await worklist.rolesThatSee('dose', number)).toEqual(['veterinarian', 'technician'])
    api.clock.set(new Date('2026-12-01T19:00:00Z'))
    expect(await state()).toEqual(['due'])
    const [due] = await worklist.itemsOf('technician', 'dose', number)
    expect(due).toMatchObject({
      dueAt: '2026-12-01T19:00:00.000Z',
      latestAt: '2026-12-02T01:00:00.000Z',
      params: { number, key: '1', enclosure: 'QT-3' },
    })
    // formalin asks for a second calculation, and whoever makes it is told nothing beforehand
    expect(due?.params).not.toHaveProperty('amount')
    api.clock.set(new Date('2026-12-02T01:00:01Z'))
    expect(await state()).toEqual([])
    expect((await worklist.itemsOf('technician', 'order-not-carried-out', number))[0]).toMatchObject({
      state: 'late',
      latestAt: '2026-12-02T01:00:00.000Z',
      params: { given: 0, doses: 1 },
    })
    // After its only window the order has not been carried out, and whoever knows what happened may say so
    expect(await worklist.rolesThatSee('order-not-carried-out', number)).toEqual([
      'veterinarian',
      'technician',
      'keeper',
    ])
  })

  it('of an order that is not what was signed are listed so, without a figure', async () => {
    const number = await aSigned()
    const [before] = await worklist.itemsOf('technician', 'dose', number)
    expect(before?.params).not.toHaveProperty('broken')
    const owner = new pg.Client({ connectionString: api.ownerUrl })
    await owner.connect()
    await owner.query(
      `UPDATE signed_texts SET text = replace(text, '218', '2180')
        WHERE subject_id = (SELECT id FROM orders WHERE number = $1)`,
      [number],
    )
    await owner.end()
    const [after] = await worklist.itemsOf('technician', 'dose', number)
    expect(after?.params).toMatchObject({ number, key: '1', broken: 1 })
    expect(after?.params).not.toHaveProperty('amount')
  })

  it('several late ones of an order are one item, the first', async () => {
    const number = await aSigned({ doses: 3, intervalHours: 24, startsAt: '2026-12-01T19:00:00Z' })
    api.clock.set(new Date('2026-12-03T12:00:00Z'))
    const items = await worklist.itemsOf('technician', 'dose', number)
    expect(items.map(({ state, params }) => [state, params['key']])).toEqual([
      ['late', '1'],
      ['coming', '3'],
    ])
  })

  it('want a second calculation from somebody else, who is shown no amount; then run, with a stop for the keeper', async () => {
    const number = await aSigned({ startsAt: '2026-12-01T18:20:00Z' })
    await readingsNow(api, tank.waterBodyId, {
      'dissolved-oxygen': ['6.9', 'mg/L'],
      temperature: ['20.4', 'degC'],
      salinity: ['33.1', 'PSS-78'],
      ph: ['8.1', 'pH'],
      alkalinity: ['2.4', 'meq/L'],
    })
    const tech = await api.as('technician')
    const at = `/api/orders/${number}/doses/1`
    expect(await worklist.itemsOf(second, 'second-calculation', number)).toEqual([])
    await tech.agent
      .post(`${at}/first-calculation`)
      .send({ id: api.nextId(), lotId: formalin.lotId })
      .expect(201)
    expect(await worklist.itemsOf('technician', 'second-calculation', number)).toEqual([])
    expect(await worklist.itemsOf('technician', 'dose', number)).toHaveLength(1)
    const [wanted] = await worklist.itemsOf(second, 'second-calculation', number)
    expect(wanted).toMatchObject({ state: 'waiting', params: { by: 'Test technician', key: '1' } })
    const blind = (await worklist.todayOf(second)).items.filter((item) => item.params['number'] === number)
    expect(JSON.stringify(blind)).not.toContain('218')
    expect(await worklist.rolesThatSee('second-calculation', number)).toEqual(['veterinarian', 'keeper'])
    await second.agent
      .post(`${at}/second-calculation`)
      .send({
        id: api.nextId(),
        enclosureRead: 'QT-3',
        markRead: '0.68 m',
        lotRead: 'PZ-0317',
        strengthRead: { value: '37', unit: 'percent_w_w' },
        amount: { value: '219', unit: 'mL' },
      })
      .expect(201)
    expect(await worklist.itemsOf(second, 'second-calculation', number)).toEqual([])

    const doseId = api.nextId()
    await tech.agent
      .post(`${at}/give`)
      .send({ id: doseId, lotId: formalin.lotId, amount: { value: '218', unit: 'mL' } })
      .expect(201)
    const [bath] = await worklist.itemsOf('keeper', 'bath-running', number)
    expect(bath).toMatchObject({
      state: 'running',
      at: '2026-12-01T18:20:00.000Z',
      dueAt: '2026-12-01T19:05:00.000Z',
      params: { doseId },
      acts: ['stop-bath'],
    })
    expect(await worklist.rolesThatSee('bath-running', number)).toEqual([
      'veterinarian',
      'technician',
      'keeper',
    ])
    api.clock.set(new Date('2026-12-01T19:05:01Z'))
    expect((await worklist.itemsOf('keeper', 'bath-running', number))[0]?.state).toBe('late')
    await tech.agent
      .post(`/api/doses/${doseId}/stop`)
      .send({ id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T19:05:00Z', seen: 'all upright' })
      .expect(201)
    expect(await worklist.itemsOf('keeper', 'bath-running', number)).toEqual([])
    const { items, log } = await worklist.todayOf('technician')
    expect(items.filter((item) => item.params['number'] === number)).toMatchObject([
      { kind: 'dose', state: 'done', at: '2026-12-01T18:20:00.000Z' },
    ])
    expect(log.filter((line) => line.params['number'] === number)).toMatchObject([
      { kind: 'bath-ended', by: 'Test technician', params: { seen: 'all upright' } },
      { kind: 'dose', params: { amount: '218\u00a0mL', record: 'given' } },
    ])
  })

  it('of a held order wait; the hold stands for the veterinarian with who made it and why', async () => {
    const number = await aSigned()
    const keeper = await api.as('keeper')
    await keeper.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:10:00Z', reason: 'gasping at the surface' })
      .expect(201)
    expect((await worklist.itemsOf('technician', 'dose', number))[0]).toMatchObject({
      state: 'waiting',
      params: { held: 1 },
    })
    expect(await worklist.rolesThatSee('order-held', number)).toEqual(['veterinarian'])
    expect((await worklist.itemsOf('veterinarian', 'order-held', number))[0]).toMatchObject({
      at: '2026-12-01T18:10:00.000Z',
      params: { by: 'Test keeper', reason: 'gasping at the surface' },
      acts: ['lift-order'],
    })
    const vet = await api.as('veterinarian')
    await vet.agent
      .post(`/api/orders/${number}/hold-lift`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'oxygen is back' })
      .expect(200)
    expect(await worklist.itemsOf('veterinarian', 'order-held', number)).toEqual([])
  })

  it('recorded against a rule are shown to the veterinarian for three days', async () => {
    const number = await aSigned({ startsAt: '2026-12-01T18:20:00Z' })
    await (
      await api.as('keeper')
    ).agent
      .post(`/api/orders/${number}/doses/1/record`)
      .send({
        id: api.nextId(),
        kind: 'recorded',
        happenedAt: '2026-12-01T18:00:00Z',
        amount: { value: '500', unit: 'mL' },
        lotId: formalin.lotId,
      })
      .expect(201)
    expect(await worklist.rolesThatSee('dose-exceptions', number)).toEqual(['veterinarian'])
    api.clock.set(new Date('2026-12-04T18:20:01Z'))
    expect(await worklist.itemsOf('veterinarian', 'dose-exceptions', number)).toEqual([])
  })

  it('stopped before the time was over are shown to the veterinarian, with what was seen', async () => {
    api.clock.set(new Date('2026-12-01T18:20:00Z'))
    const number = await aSigned({ startsAt: '2026-12-01T18:20:00Z' })
    const keeper = await api.as('keeper')
    const doseId = api.nextId()
    await keeper.agent
      .post(`/api/orders/${number}/doses/1/record`)
      .send({
        id: doseId,
        kind: 'recorded',
        happenedAt: '2026-12-01T18:10:00Z',
        amount: { value: '218', unit: 'mL' },
        lotId: formalin.lotId,
      })
      .expect(201)
    await keeper.agent
      .post(`/api/doses/${doseId}/stop`)
      .send({
        id: api.nextId(),
        cause: 'stopped',
        happenedAt: '2026-12-01T18:15:00Z',
        seen: 'two on their side',
      })
      .expect(201)
    const items = await worklist.itemsOf('veterinarian', 'dose-exceptions', number)
    expect(items).toContainEqual(
      expect.objectContaining({
        at: '2026-12-01T18:15:00.000Z',
        params: expect.objectContaining({ seen: 'two on their side', by: 'Test keeper', stopped: 1 }),
      }),
    )
    const { agent } = await api.as('veterinarian')
    const { calendar } = (await agent.get(`/api/orders/${number}`).expect(200)).body
    expect(calendar[0]).toMatchObject({
      recorded: 'recorded',
      records: [{ kind: 'recorded', stoppedAt: '2026-12-01T18:15:00.000Z' }],
    })
  })

  it('drafts and proposals wait for a veterinarian', async () => {
    const draft = await aDraft(api, fields())
    const proposal = await aDraft(api, fields(), await api.as('technician'))
    expect(await worklist.rolesThatSee('order-draft', draft.number)).toEqual(['veterinarian'])
    expect(await worklist.rolesThatSee('order-proposed', proposal.number)).toEqual(['veterinarian'])
    expect((await worklist.itemsOf('veterinarian', 'order-proposed', proposal.number))[0]).toMatchObject({
      state: 'waiting',
      params: { by: 'Test technician', enclosure: 'QT-3', problem: 'Monogeneans on gill mount' },
    })
  })
})
