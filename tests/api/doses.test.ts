import { afterAll, beforeAll, beforeEach, describe, expect, it, vi } from 'vitest'
import { aTankAndSumpSheet } from '../builders/a-water.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let tank: BuiltEnclosure & { sumpId: string }
let school: { id: string }
let formalin: { id: string; lotId: string }
let second: TestPerson
beforeAll(async () => {
  api = await startApi()
  tank = await aBathWater(api, 'QT-3')
  school = await aSchool(api, tank.id, 1)
  formalin = await aProduct(api, {
    agent: 'formalin',
    productName: 'Formalin 37 %',
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    density: { value: '1.08', unit: 'g/mL' },
  })
  second = await api.person({
    email: 'tech2@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const freshWater = () =>
  readingsNow(api, tank.waterBodyId, {
    'dissolved-oxygen': ['6.9', 'mg/L'],
    temperature: ['20.4', 'degC'],
    salinity: ['33.1', 'PSS-78'],
    ph: ['8.1', 'pH'],
    alkalinity: ['2.4', 'meq/L'],
  })

/** A formalin bath of 45 min at 100 µL/L, a hazard: 218.14 mL for 2,181.4 L. */
async function aSignedBath(given: object = {}): Promise<string> {
  const draft = await aDraft(
    api,
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
      startsAt: '2026-12-01T18:20:00Z',
      ...given,
    }),
  )
  const signed = await signDraft(api, draft)
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  return draft.number
}

const at = (number: string, rest = '') => `/api/orders/${number}/doses/1${rest}`
const amount = { value: '218', unit: 'mL' }
const secondBody = (given: object = {}) => ({
  id: api.nextId(),
  enclosureRead: 'qt 3', // a phone's space for the hyphen
  markRead: '0.68 m',
  lotRead: 'PZ-0317',
  strengthRead: { value: '37', unit: 'percent_w_w' },
  amount: { value: '219', unit: 'mL' },
  ...given,
})

async function calculated(number: string) {
  const tech = await api.as('technician')
  await tech.agent
    .post(at(number, '/first-calculation'))
    .send({ id: api.nextId(), lotId: formalin.lotId })
    .expect(201)
  await second.agent.post(at(number, '/second-calculation')).send(secondBody()).expect(201)
}

describe('a dose', () => {
  it('waits for fresh water tests and a second person, and says so', async () => {
    const number = await aSignedBath()
    const tech = await api.as('technician')
    const sheet = await tech.agent.get(at(number)).expect(200)
    expect(sheet.body).toMatchObject({ state: 'due', mayStart: false, secondNeeded: true, amountNow: amount })
    const unmet = sheet.body.steps.filter((step: { state: string }) => step.state !== 'met')
    expect(unmet.map((step: { ruleId: string }) => step.ruleId)).toContain('R01')
    const refused = await tech.agent
      .post(at(number, '/give'))
      .send({ id: api.nextId(), lotId: formalin.lotId, amount })
      .expect(409)
    expect(refused.body.code).toBe('dose-not-possible')
    expect(refused.body.why.length).toBeGreaterThan(1)
  })

  it('gives the first amount to nobody who calculates a second time before it is stored', async () => {
    const number = await aSignedBath()
    await freshWater()
    const tech = await api.as('technician')
    expect((await second.agent.post(at(number, '/second-calculation')).send(secondBody())).body.code).toBe(
      'first-calculation-missing',
    )
    await tech.agent
      .post(at(number, '/first-calculation'))
      .send({ id: api.nextId(), lotId: formalin.lotId })
      .expect(201)
    const blind = await second.agent.get(`${at(number)}?blind=yes`).expect(200)
    expect(JSON.stringify(blind.body)).not.toMatch(/\b218\b/)
    const own = await tech.agent.post(at(number, '/second-calculation')).send(secondBody())
    expect(own.body.code).toBe('another-person-needed')
    const wrong = await second.agent
      .post(at(number, '/second-calculation'))
      .send(secondBody({ amount: { value: '2180', unit: 'mL' } }))
      .expect(201)
    expect(wrong.body.second).toMatchObject({
      agrees: false,
      differs: ['amount'],
      amountText: '2,180\u00a0mL',
    })
    // still blind: both begin again from the label
    expect(wrong.body.blind).toBe(true)
    expect(wrong.body.second.differencePercent).toBeNull()
    expect(JSON.stringify(wrong.body).replaceAll('2,180', '')).not.toMatch(/218/)
    expect(wrong.body.mayStart).toBe(false)
    // neither counts any more: without a new first calculation there is no other try
    const tryOn = await second.agent.post(at(number, '/second-calculation')).send(secondBody())
    expect([tryOn.status, tryOn.body.code]).toEqual([409, 'calculations-begin-again'])
    const again = async (given: object = {}) => {
      api.clock.set(new Date(api.clock.now().getTime() + 1_000))
      await tech.agent
        .post(at(number, '/first-calculation'))
        .send({ id: api.nextId(), lotId: formalin.lotId })
        .expect(201)
      return second.agent.post(at(number, '/second-calculation')).send(secondBody(given)).expect(201)
    }
    const elsewhere = await again({ enclosureRead: 'QT-8' })
    expect(elsewhere.body.second).toMatchObject({ agrees: false, differs: ['enclosure'] })
    const label = await again({ strengthRead: { value: '10', unit: 'percent_w_w' }, lotRead: 'PZ-0371' })
    expect(label.body.second.differs).toEqual(['lot', 'strength'])
    const right = await again()
    expect(right.body.second).toMatchObject({ agrees: true, amountText: '219\u00a0mL' })
    expect(right.body.first.amountText).toBe('218\u00a0mL')
    expect(right.body.why).toEqual([])
  })

  it('is given once everything is met, runs, and ends at its time; the same request again changes nothing', async () => {
    const number = await aSignedBath()
    await freshWater()
    await calculated(number)
    const tech = await api.as('technician')
    const id = api.nextId()
    const give = (body: object = {}) =>
      tech.agent.post(at(number, '/give')).send({ id, lotId: formalin.lotId, amount, ...body })
    const tenfold = await give({ id: api.nextId(), amount: { value: '2.18', unit: 'L' } })
    expect(tenfold.body).toMatchObject({ code: 'dose-not-possible' })
    const given = await give().expect(201)
    expect(given.body).toMatchObject({
      state: 'running',
      recorded: [{ kind: 'given', amountText: '218\u00a0mL', exceptions: [] }],
    })
    await give().expect(201)
    const twice = await give({ id: api.nextId() })
    expect(twice.body.code).toBe('dose-not-possible')
    const ended = await tech.agent
      .post(`/api/doses/${id}/stop`)
      .send({ id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T18:20:00Z' })
      .expect(201)
    expect(ended.body).toMatchObject({ state: 'done', recorded: [{ stop: { cause: 'time-up' } }] })
    const order = await tech.agent.get(`/api/orders/${number}`).expect(200)
    expect(order.body).toMatchObject({ phase: 'completed', dosesGiven: 1 })
  })

  it('is worked out and given by veterinarian and technician only; a keeper is told who may', async () => {
    const number = await aSignedBath()
    const keeper = await api.as('keeper')
    const sheet = await keeper.agent.get(at(number)).expect(200)
    expect(sheet.body.may).toEqual(['dose.record', 'dose.calculate-second', 'bath.stop', 'order.hold'])
    const work = await keeper.agent
      .post(at(number, '/first-calculation'))
      .send({ id: api.nextId(), lotId: formalin.lotId })
    expect(work.body).toMatchObject({ code: 'may-not' })
    expect(work.body.detail).toMatch(/veterinarian.*technician/i)
    const give = await keeper.agent
      .post(at(number, '/give'))
      .send({ id: api.nextId(), lotId: formalin.lotId, amount })
    expect(give.body.code).toBe('may-not')
  })

  it('is worked out again when the volume has moved since the two calculations', async () => {
    const pool = await aBathWater(api, 'QT-7')
    const fish = await aSchool(api, pool.id, 7)
    const number = await aSignedBath({
      enclosureId: pool.id,
      animalIds: [fish.id],
      allowedVolumeDriftPercent: 50,
    })
    const tech = await api.as('technician')
    const lot = { id: api.nextId(), lotId: formalin.lotId }
    await tech.agent.post(at(number, '/first-calculation')).send(lot).expect(201)
    await second.agent
      .post(at(number, '/second-calculation'))
      .send(secondBody({ enclosureRead: 'QT-7' }))
      .expect(201)
    const outdated = 'has changed since the second calculation'
    const before = await tech.agent.get(at(number)).expect(200)
    expect(before.body.why.join(' ')).not.toContain(outdated)
    const id = api.nextId()
    await tech.agent
      .post('/api/enclosures/QT-7/volumes')
      .send({
        id,
        happenedAt: '2026-12-01T18:00:00Z',
        waterBodyIds: [pool.waterBodyId, pool.sumpId],
        sheet: {
          ...aTankAndSumpSheet,
          displacement: { by: 'volume', volume: { value: '141', unit: 'L' }, errorPercent: 5 },
        },
      })
      .expect(201)
    await second.agent
      .post(`/api/volumes/${id}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
      .expect(200)
    const after = await tech.agent.get(at(number)).expect(200)
    expect(after.body.amountNow.value).not.toBe('218')
    expect(after.body.why.join(' ')).toContain(outdated)
  })

  it('stands in the calendar of its order, by the server’s own time', async () => {
    const number = await aSignedBath({ doses: 3, intervalHours: 24, startsAt: '2026-12-01T18:20:00Z' })
    const keeper = await api.as('keeper')
    const { body } = await keeper.agent.get(at(number)).expect(200)
    expect(body.now).toBe('2026-12-01T18:20:00.000Z')
    expect(body.calendar.map((dose: { state: string }) => dose.state)).toEqual(['due', 'coming', 'coming'])
  })

  it('is stopped by a keeper at once, with what was seen', async () => {
    const number = await aSignedBath()
    await freshWater()
    await calculated(number)
    const tech = await api.as('technician')
    const id = api.nextId()
    await tech.agent.post(at(number, '/give')).send({ id, lotId: formalin.lotId, amount }).expect(201)
    const keeper = await api.as('keeper')
    const stop = {
      id: api.nextId(),
      cause: 'stopped',
      // of a phone whose clock goes half an hour ahead: stopping is not refused
      happenedAt: '2026-12-01T18:50:00Z',
      seen: 'two on their side',
      rescue: 'flushed',
    }
    const stopped = await keeper.agent.post(`/api/doses/${id}/stop`).send(stop).expect(201)
    expect(stopped.body.recorded[0].stop).toMatchObject({
      cause: 'stopped',
      seen: 'two on their side',
      by: 'Test keeper',
      at: api.clock.now().toISOString(),
    })
    await keeper.agent.post(`/api/doses/${id}/stop`).send(stop).expect(201)
    const registrar = await api.as('registrar')
    await registrar.agent.post(`/api/doses/${id}/stop`).send(stop).expect(403)
  })

  it('is not given while the order is held, but what happened is recorded all the same', async () => {
    const number = await aSignedBath()
    await freshWater()
    await calculated(number)
    const keeper = await api.as('keeper')
    await keeper.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:15:00Z' })
      .expect(201)
    const tech = await api.as('technician')
    const refused = await tech.agent
      .post(at(number, '/give'))
      .send({ id: api.nextId(), lotId: formalin.lotId, amount })
      .expect(409)
    expect(refused.body.detail).toContain('held')
    const recorded = await keeper.agent
      .post(at(number, '/record'))
      .send({
        id: api.nextId(),
        kind: 'recorded',
        happenedAt: '2026-12-01T18:18:00Z',
        amount,
        lotId: formalin.lotId,
      })
      .expect(201)
    const codes = recorded.body.recorded[0].exceptions.map((exception: { code: string }) => exception.code)
    expect(codes).toContain('while-held')
  })

  it('of a bath done before its order was typed in is recorded, marked, and nothing is falsified', async () => {
    // The bath ran at 10:20 facility time; the order is signed at 14:20 and the dose entered after it.
    const number = await aSignedBath({ startsAt: '2026-12-01T14:20:00Z' })
    const tech = await api.as('technician')
    const body = {
      id: api.nextId(),
      kind: 'recorded',
      happenedAt: '2026-12-01T14:20:00Z',
      amount: { value: '220', unit: 'mL' },
      lotId: null,
    }
    const first = await tech.agent.post(at(number, '/record')).send(body).expect(201)
    expect(first.body.recorded[0]).toMatchObject({
      happenedAt: '2026-12-01T14:20:00.000Z',
      amountText: '220\u00a0mL',
    })
    expect(new Date(first.body.recorded[0].recordedAt).getTime()).toBeGreaterThan(Date.parse(body.happenedAt))
    const codes = first.body.recorded[0].exceptions.map((exception: { code: string }) => exception.code)
    expect(codes).toContain('signed-after')
    expect(codes.length).toBeGreaterThan(1)
    const other = await second.agent
      .post(at(number, '/record'))
      .send({ ...body, id: api.nextId() })
      .expect(201)
    expect(other.body.recorded.map((record: { twice: boolean }) => record.twice)).toEqual([true, true])
  })

  it('refuses only shapes: a future time, an amount of nothing, bare ppm', async () => {
    const number = await aSignedBath()
    const tech = await api.as('technician')
    const record = (given: object) =>
      tech.agent.post(at(number, '/record')).send({
        id: api.nextId(),
        kind: 'recorded',
        happenedAt: '2026-12-01T18:00:00Z',
        amount,
        lotId: null,
        ...given,
      })
    expect((await record({ happenedAt: '2026-12-01T18:26:00Z' })).body.code).toBe('in-the-future')
    expect((await record({ amount: { value: '0', unit: 'mL' } })).status).toBe(422)
    expect((await record({ amount: null })).status).toBe(422)
    expect((await record({ amount: { value: '25', unit: 'ppm' } })).body.errors[0].code).toBe('bare-ppm')
    const withheld = await record({ kind: 'withheld', amount: null, note: 'not eating' })
    expect(withheld.status).toBe(201)
    await tech.agent.get(`/api/orders/${number}/doses/2`).expect(404)
  })

  it('is found with one question to the database, however many orders there are', async () => {
    const { dataSource } = api.composition.parts
    const asked = vi.spyOn(dataSource, 'query')
    const due = () => api.composition.administrations.queries.due({ until: '2027-01-01T00:00:00Z' })
    const before = await due()
    const questions = asked.mock.calls.length
    await aSignedBath()
    await aSignedBath()
    asked.mockClear()
    expect((await due()).length).toBe(before.length + 2)
    expect(asked.mock.calls.length).toBe(questions)
    // the orders, their records, which of them are alike, and who knows what
    expect(questions).toBe(4)
    asked.mockRestore()
  })

  it('is on the worklist while it is due, late or running', async () => {
    const number = await aSignedBath()
    const { agent } = await api.as('technician')
    const mine = async () =>
      ((await agent.get('/api/due-doses').expect(200)).body.rows as { number: string; state: string }[]).find(
        (row) => row.number === number,
      )
    expect(await mine()).toMatchObject({ state: 'due', enclosureCode: 'QT-3', amountText: null })
    api.clock.set(new Date('2026-12-02T01:00:00Z'))
    expect(await mine()).toMatchObject({ state: 'late' })
  })
})
