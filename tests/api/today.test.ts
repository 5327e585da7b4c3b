import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { TodayWork } from '../../shared/contracts/today.contract.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import { aCase } from '../builders/a-case.ts'
import { aGroup, aPlace, aTaxon } from '../builders/a-collection.ts'
import { anObservation } from '../builders/an-observation.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import { anEnclosure, aTankAndSumpSheet } from '../builders/a-water.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { anAcquisition, aParty, aPermit, newLine } from '../builders/a-register.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let second: TestPerson
beforeAll(async () => {
  api = await startApi()
  second = await api.person({
    email: 'tech2@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

async function todayOf(who: Role | TestPerson) {
  const { agent } = typeof who === 'string' ? await api.as(who) : who
  return (await agent.get('/api/today').expect(200)).body as {
    at: string
    on: string
    items: TodayWork[]
    log: { kind: string; by: string; params: Record<string, unknown> }[]
  }
}
const itemsOf = async (who: Role | TestPerson, kind: TodayWork['kind'], about?: string) =>
  (await todayOf(who)).items.filter(
    (item) => item.kind === kind && (about === undefined || Object.values(item.params).includes(about)),
  )
/** Which roles have an item of a kind about something on their worklist. */
async function rolesThatSee(kind: TodayWork['kind'], about: string): Promise<Role[]> {
  const all: Role[] = ['veterinarian', 'technician', 'keeper', 'registrar', 'administrator']
  const seen = await Promise.all(all.map((role) => itemsOf(role, kind, about)))
  return all.filter((_, i) => (seen[i] ?? []).length > 0)
}

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

  it('come, are due from their hour and late after their window, for who gives them and nobody else', async () => {
    const number = await aSigned()
    const state = async () => (await itemsOf('technician', 'dose', number)).map((item) => item.state)
    expect(await state()).toEqual(['coming'])
    expect(await rolesThatSee('dose', number)).toEqual(['veterinarian', 'technician'])
    api.clock.set(new Date('2026-12-01T19:00:00Z'))
    expect(await state()).toEqual(['due'])
    const [due] = await itemsOf('technician', 'dose', number)
    expect(due).toMatchObject({
      dueAt: '2026-12-01T19:00:00.000Z',
      latestAt: '2026-12-02T01:00:00.000Z',
      params: { number, key: '1', enclosure: 'QT-3', amount: '218\u00a0mL' },
    })
    api.clock.set(new Date('2026-12-02T01:00:01Z'))
    expect(await state()).toEqual(['late'])
    // After its only window the order has not been carried out, and whoever knows what happened may say so
    expect(await rolesThatSee('order-not-carried-out', number)).toEqual([
      'veterinarian',
      'technician',
      'keeper',
    ])
  })

  it('several late ones of an order are one item, the first', async () => {
    const number = await aSigned({ doses: 3, intervalHours: 24, startsAt: '2026-12-01T19:00:00Z' })
    api.clock.set(new Date('2026-12-03T12:00:00Z'))
    const items = await itemsOf('technician', 'dose', number)
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
    expect(await itemsOf(second, 'second-calculation', number)).toEqual([])
    await tech.agent
      .post(`${at}/first-calculation`)
      .send({ id: api.nextId(), lotId: formalin.lotId })
      .expect(201)
    expect(await itemsOf('technician', 'second-calculation', number)).toEqual([])
    expect(await itemsOf('technician', 'dose', number)).toHaveLength(1)
    const [wanted] = await itemsOf(second, 'second-calculation', number)
    expect(wanted).toMatchObject({ state: 'waiting', params: { by: 'Test technician', key: '1' } })
    const blind = (await todayOf(second)).items.filter((item) => item.params['number'] === number)
    expect(JSON.stringify(blind)).not.toContain('218')
    expect(await rolesThatSee('second-calculation', number)).toEqual(['veterinarian', 'keeper'])
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
    expect(await itemsOf(second, 'second-calculation', number)).toEqual([])

    const doseId = api.nextId()
    await tech.agent
      .post(`${at}/give`)
      .send({ id: doseId, lotId: formalin.lotId, amount: { value: '218', unit: 'mL' } })
      .expect(201)
    const [bath] = await itemsOf('keeper', 'bath-running', number)
    expect(bath).toMatchObject({
      state: 'running',
      at: '2026-12-01T18:20:00.000Z',
      dueAt: '2026-12-01T19:05:00.000Z',
      params: { doseId },
      acts: ['stop-bath'],
    })
    expect(await rolesThatSee('bath-running', number)).toEqual(['veterinarian', 'technician', 'keeper'])
    api.clock.set(new Date('2026-12-01T19:05:01Z'))
    expect((await itemsOf('keeper', 'bath-running', number))[0]?.state).toBe('late')
    await tech.agent
      .post(`/api/doses/${doseId}/stop`)
      .send({ id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T19:05:00Z', seen: 'all upright' })
      .expect(201)
    expect(await itemsOf('keeper', 'bath-running', number)).toEqual([])
    const { items, log } = await todayOf('technician')
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
    expect((await itemsOf('technician', 'dose', number))[0]).toMatchObject({
      state: 'waiting',
      params: { held: 1 },
    })
    expect(await rolesThatSee('order-held', number)).toEqual(['veterinarian'])
    expect((await itemsOf('veterinarian', 'order-held', number))[0]).toMatchObject({
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
    expect(await itemsOf('veterinarian', 'order-held', number)).toEqual([])
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
    expect(await rolesThatSee('dose-exceptions', number)).toEqual(['veterinarian'])
    api.clock.set(new Date('2026-12-04T18:20:01Z'))
    expect(await itemsOf('veterinarian', 'dose-exceptions', number)).toEqual([])
  })

  it('drafts and proposals wait for a veterinarian', async () => {
    const draft = await aDraft(api, fields())
    const proposal = await aDraft(api, fields(), await api.as('technician'))
    expect(await rolesThatSee('order-draft', draft.number)).toEqual(['veterinarian'])
    expect(await rolesThatSee('order-proposed', proposal.number)).toEqual(['veterinarian'])
    expect((await itemsOf('veterinarian', 'order-proposed', proposal.number))[0]).toMatchObject({
      state: 'waiting',
      params: { by: 'Test technician', enclosure: 'QT-3', problem: 'Monogeneans on gill mount' },
    })
  })
})

describe('quarantine on the worklist', () => {
  it('wants a look every day, shows when the last was, and is late when a day went by without', async () => {
    const one = await aCase(api, { at: '2026-11-30T14:00:00Z' })
    const look = async (happenedAt: string) => {
      api.clock.set(new Date(happenedAt))
      await (
        await api.as('keeper')
      ).agent
        .post('/api/observations')
        .send(anObservation(api, one.enclosure.code, { happenedAt, lookedAt: true, feeding: 'all' }))
        .expect(201)
    }
    const item = async (at: string) => {
      api.clock.set(new Date(at))
      return (await itemsOf('keeper', 'observation', one.number))[0]
    }
    await look('2026-11-30T15:00:00Z')
    expect(await item('2026-12-01T18:20:00Z')).toMatchObject({
      state: 'due',
      dueOn: '2026-12-01',
      params: { lastAt: '2026-11-30T15:00:00.000Z', lastBy: 'Test keeper', enclosure: one.enclosure.code },
    })
    expect(await rolesThatSee('observation', one.number)).toEqual(['veterinarian', 'technician', 'keeper'])
    await look('2026-12-01T18:30:00Z')
    expect(await item('2026-12-01T18:40:00Z')).toMatchObject({
      state: 'done',
      at: '2026-12-01T18:30:00.000Z',
    })
    // The day turns at midnight of the facility, 04:00Z
    expect(await item('2026-12-02T03:59:00Z')).toMatchObject({ state: 'done' })
    expect(await item('2026-12-02T04:00:00Z')).toMatchObject({ state: 'due', dueOn: '2026-12-02' })
    expect(await item('2026-12-04T12:00:00Z')).toMatchObject({ state: 'late', latestOn: '2026-12-02' })
  })

  it('lists samples in their windows and clearance when nothing stands against it', async () => {
    const one = await aCase(api, { at: '2026-10-20T14:00:00Z' })
    const samples = await itemsOf('technician', 'sample', one.number)
    expect(samples.length).toBeGreaterThan(0)
    for (const item of samples) expect(item).toMatchObject({ state: 'late' })
    const steps = (await (await api.as('technician')).agent.get(one.url).expect(200)).body.legs.at(-1)
      .steps as {
      key: string
      kind: string
      untilOn: string
    }[]
    const first = steps.find(({ kind }) => kind === 'sample')
    expect(samples.map((item) => [item.params['key'], item.latestOn])).toContainEqual([
      first?.key,
      first?.untilOn,
    ])
    await (
      await api.as('technician')
    ).agent
      .post(`${one.url}/steps`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:00:00Z', stepKey: first?.key, outcome: 'done' })
      .expect(201)
    const after = await itemsOf('technician', 'sample', one.number)
    expect(after.find((item) => item.params['key'] === first?.key)).toMatchObject({
      state: 'done',
      params: { by: 'Test technician' },
    })
    const board = (await (await api.as('veterinarian')).agent.get('/api/cases?view=ready').expect(200)).body
      .rows as { number: string }[]
    const ready = (await itemsOf('veterinarian', 'case-ready')).map((item) => item.params['case'])
    expect(ready.sort()).toEqual(board.map(({ number }) => number).sort())
  })

  it('shows a held case to the veterinarian, and one whose batch is still coming in to who opened it', async () => {
    const one = await aCase(api, { close: false })
    expect(await rolesThatSee('case-to-close', one.number)).toEqual(['veterinarian', 'technician'])
    expect(await itemsOf('keeper', 'observation', one.number)).toMatchObject([{ state: 'due' }])
    await (
      await api.as('keeper')
    ).agent
      .post(`${one.url}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:00:00Z', origin: 'online', device: 'test' })
      .expect(201)
    expect(await rolesThatSee('case-held', one.number)).toEqual(['veterinarian'])
  })

  it('shows an urgent call to everybody who may answer it until somebody has seen it', async () => {
    const one = await aCase(api)
    const noticeId = api.nextId()
    await (
      await api.as('keeper')
    ).agent
      .post('/api/observations')
      .send(
        anObservation(api, one.enclosure.code, { noticeId, urgent: true, words: 'Two lie on the floor.' }),
      )
      .expect(201)
    expect(await rolesThatSee('urgent-call', noticeId)).toEqual([
      'veterinarian',
      'technician',
      'keeper',
      'registrar',
    ])
    const { items } = await todayOf('registrar')
    expect(items[0]).toMatchObject({
      kind: 'urgent-call',
      state: 'late',
      params: { words: 'Two lie on the floor.', fate: 'sending', by: 'Test keeper' },
      acts: ['mark-seen'],
    })
    await (
      await api.as('registrar')
    ).agent
      .post(`/api/notices/${noticeId}/seen`)
      .send({ id: api.nextId() })
      .expect(201)
    expect(await rolesThatSee('urgent-call', noticeId)).toEqual([])
  })

  it('keeps what was marked for the veterinarian until one has read it', async () => {
    const one = await aCase(api)
    const id = api.nextId()
    await (
      await api.as('registrar')
    ).agent
      .post('/api/observations')
      .send(anObservation(api, one.enclosure.code, { id, forVeterinarian: true, words: 'One hides.' }))
      .expect(201)
    expect(await rolesThatSee('observation-flagged', id)).toEqual(['veterinarian'])
    expect((await itemsOf('veterinarian', 'observation-flagged', id))[0]?.acts).toEqual(['mark-read'])
    await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/observations/${id}/reviews`)
      .send({ id: api.nextId() })
      .expect(201)
    expect(await itemsOf('veterinarian', 'observation-flagged', id)).toEqual([])
    expect((await todayOf('keeper')).log.some((line) => line.params['words'] === 'One hides.')).toBe(true)
  })
})

describe('water on the worklist', () => {
  it('asks another person to confirm a volume', async () => {
    const tank = await anEnclosure(api, 'KH-9')
    const id = api.nextId()
    await (
      await api.as('technician')
    ).agent
      .post('/api/enclosures/KH-9/volumes')
      .send({
        id,
        happenedAt: '2026-11-30T14:00:00Z',
        waterBodyIds: [tank.waterBodyId],
        sheet: { ...aTankAndSumpSheet, parts: aTankAndSumpSheet.parts.slice(0, 1) },
      })
      .expect(201)
    expect(await itemsOf('technician', 'volume-to-confirm', 'KH-9')).toEqual([])
    expect(await itemsOf(second, 'volume-to-confirm', 'KH-9')).toMatchObject([
      { state: 'waiting', params: { by: 'Test technician' } },
    ])
    expect(await rolesThatSee('volume-to-confirm', 'KH-9')).toEqual(['veterinarian'])
    await second.agent
      .post(`/api/volumes/${id}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
      .expect(200)
    expect(await itemsOf('veterinarian', 'volume-to-confirm', 'KH-9')).toEqual([])
  })
})

describe('the registrar’s worklist', () => {
  it('names what does not fit, transactions without papers and permits that end', async () => {
    const taxonId = await aTaxon(api, {
      scientificName: 'Chromis registrata',
      commonName: 'Kept chromis',
      group: 'teleost',
    })
    const tank = await aPlace(api)
    const school = await aGroup(api, { taxonId, enclosureId: tank.id, count: 2 })
    await (
      await api.as('keeper')
    ).agent
      .post(`/api/animals/${school.accession}/deaths`)
      .send({ id: api.nextId(), kind: 'found-dead', count: 3, happenedAt: '2026-12-01T18:00:00Z' })
      .expect(201)
    expect(await rolesThatSee('discrepancy-registrar', school.accession)).toEqual(['registrar'])

    const { number } = await anAcquisition(api, {
      counterpartyId: await aParty(api, 'Norrell Reef Lab'),
      lines: [newLine(api, { taxonId, enclosureId: tank.id, count: 4 })],
    })
    expect(await rolesThatSee('transaction-papers', number)).toEqual(['registrar'])
    expect((await itemsOf('registrar', 'transaction-papers', number))[0]?.params).toMatchObject({
      party: 'Norrell Reef Lab',
      way: 'in',
    })
    const permit = await aPermit(api, { taxonIds: [taxonId], validUntil: '2026-12-20' })
    expect(await rolesThatSee('permit-runs-out', permit.number)).toEqual(['registrar'])
    expect((await itemsOf('registrar', 'permit-runs-out', permit.number))[0]).toMatchObject({
      latestOn: '2026-12-20',
      params: { days: 19 },
    })
  })
})

describe('people on the worklist', () => {
  it('names veterinarians without a licence, accounts never used and settings nobody confirmed', async () => {
    const vet2 = await api.person({
      email: 'vet2@harrow-point.example',
      printedName: 'Dr Second',
      roles: ['veterinarian'],
    })
    expect(await rolesThatSee('account-without-licence', 'Dr Second')).toEqual(['administrator'])
    // who has a licence is not named
    expect(await itemsOf('administrator', 'account-without-licence', 'Test veterinarian')).toEqual([])
    expect((await itemsOf(vet2, 'own-licence'))[0]).toMatchObject({ state: 'waiting', params: {} })
    expect(await itemsOf('veterinarian', 'own-licence')).toEqual([])
    await (
      await api.as('administrator')
    ).agent
      .post('/api/people')
      .send({
        id: api.nextId(),
        email: 'new@harrow-point.example',
        printedName: 'Newly Entered',
        roles: ['keeper'],
      })
      .expect(201)
    expect(await rolesThatSee('account-without-sign-in', 'Newly Entered')).toEqual(['administrator'])
    expect(await itemsOf('administrator', 'account-without-sign-in', 'Dr Second')).toEqual([])
    expect(await itemsOf('administrator', 'settings-default')).toMatchObject([{ state: 'waiting' }])
    const { items, log } = await todayOf('administrator')
    expect(new Set(items.map(({ kind }) => kind))).toEqual(
      new Set(['account-without-licence', 'account-without-sign-in', 'settings-default']),
    )
    expect(log).toEqual([])
  })

  it('gives somebody with several roles the work of all of them', async () => {
    const both = await api.person({
      email: 'both@harrow-point.example',
      printedName: 'Both',
      roles: ['keeper', 'registrar'],
    })
    const kinds = new Set((await todayOf(both)).items.map(({ kind }) => kind))
    for (const kind of ['observation', 'discrepancy-registrar', 'transaction-papers'] as const)
      expect([...kinds]).toContain(kind)
    expect([...kinds]).not.toContain('volume-to-confirm')
  })
})
