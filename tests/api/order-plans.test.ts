import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  shownCautions,
  signDraft,
} from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let tank: BuiltEnclosure & { sumpId: string }
let school: { id: string; accession: string }
let prazi: { id: string; lotId: string }
beforeAll(async () => {
  api = await startApi()
  tank = await aBathWater(api, 'QT-3')
  school = await aSchool(api, tank.id, 1)
  prazi = await aProduct(api, {})
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const praziFields = (given: object = {}) =>
  bathFields({
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: prazi.id,
    lotId: prazi.lotId,
    ...given,
  })
const rulesOf = async (number: string) =>
  (await shownCautions(api, number)).map(({ ruleId, code, level }) => `${ruleId} ${level} ${code}`)
const record = async (number: string, key: string, happenedAt: string) => {
  const { agent } = await api.as('technician')
  const id = api.nextId()
  await agent
    .post(`/api/orders/${number}/doses/${key}/record`)
    .send({
      id,
      kind: 'recorded',
      happenedAt,
      amount: { value: '4.36', unit: 'g' },
      lotId: prazi.lotId,
    })
    .expect(201)
  return id
}

describe('the plan of an order', () => {
  it('stops the same drug twice in one connected water, until the first is out of it', async () => {
    const first = await aDraft(api, praziFields())
    expect((await signDraft(api, first)).status).toBe(201)
    // the sump is joined to the tank: another order for the same water
    const second = await aDraft(api, praziFields())
    expect(await rulesOf(second.number)).toContain('R29 stop same-agent-together')
    const { agent } = await api.as('veterinarian')
    const read = (await shownCautions(api, second.number))
      .filter(({ level }) => level === 'warning')
      .map(({ ruleId, code, text }) => ({ ruleId, code, text }))
    const refused = await agent
      .post(`/api/orders/${second.number}/signature`)
      .set('Idempotency-Key', newKey())
      .send({ password, expectedVersion: second.version, read, overrides: [] })
    expect(refused.body).toMatchObject({ code: 'caution-stops', cautions: [{ ruleId: 'R29' }] })
    // given, and taken out of the water again
    const doseId = await record(first.number, '1', '2026-12-01T18:15:00Z')
    expect(await rulesOf(second.number)).toContain('R29 stop same-agent-together')
    const tech = await api.as('technician')
    await tech.agent
      .post(`/api/doses/${doseId}/stop`)
      .send({ id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T18:19:00Z', rescue: 'carbon on' })
      .expect(201)
    // out of the water, and still twice in a day
    const after = (await rulesOf(second.number)).filter((rule) => rule.startsWith('R29'))
    expect(after).toEqual(['R29 warning same-agent-same-day'])
  })

  it('counts what earlier versions gave, and says so; doses are given in their order', async () => {
    const water = await aBathWater(api, 'QT-6')
    const fish = await aSchool(api, water.id, 6)
    await readingsNow(api, water.waterBodyId, {
      'dissolved-oxygen': ['6.9', 'mg/L'],
      temperature: ['23.4', 'degC'],
    })
    const course = {
      enclosureId: water.id,
      animalIds: [fish.id],
      doses: 3,
      intervalHours: 24,
      startsAt: '2026-12-01T18:00:00Z',
    }
    const draft = await aDraft(api, praziFields(course))
    expect(await rulesOf(draft.number)).not.toContain('R48')
    expect((await signDraft(api, draft)).status).toBe(201)
    const tech = await api.as('technician')
    const sheet = await tech.agent.get(`/api/orders/${draft.number}/doses/2`).expect(200)
    expect(sheet.body.why.join()).toContain('Dose 1 comes before this one')
    await record(draft.number, '1', '2026-12-01T18:10:00Z')
    const then = await tech.agent.get(`/api/orders/${draft.number}/doses/2`).expect(200)
    expect(then.body.why.join()).not.toContain('comes before')
    // amended: the next dose is the second, a day after the first
    const { agent } = await api.as('veterinarian')
    const revise = async (given: object) => {
      const { version } = (await agent.get(`/api/orders/${draft.number}`)).body
      await agent
        .put(`/api/orders/${draft.number}/draft`)
        .send({ expectedVersion: version, fields: praziFields({ ...course, ...given }) })
        .expect(200)
      return rulesOf(draft.number)
    }
    const carried = await revise({ doses: 4 })
    expect(carried).toContain('R48 note doses-carried')
    expect(carried.filter((one) => one.startsWith('R28') || one.startsWith('R29'))).toEqual([])
    // a plan that looks like one of new doses
    const later = await revise({ startsAt: '2026-12-02T18:00:00Z', doses: 2 })
    expect(later).toContain('R48 warning plan-counts-given')
    expect(later).toContain('R28 warning dose-late')
    // and one whose next dose would come hours after the last
    expect(await revise({ intervalHours: 6 })).not.toContain('R28 stop dose-very-early')
    expect(await revise({ startsAt: '2026-12-01T06:00:00Z', intervalHours: 13 })).toContain(
      'R28 stop dose-very-early',
    )
  })

  it('adds up the doses that stay in the water, and holds the next while too much is in it', async () => {
    const water = await aBathWater(api, 'QT-12')
    const fish = await aSchool(api, water.id, 12)
    await readingsNow(api, water.waterBodyId, {
      'dissolved-oxygen': ['6.9', 'mg/L'],
      temperature: ['23.4', 'degC'],
      salinity: ['33.1', 'PSS-78'],
    })
    const draft = await aDraft(
      api,
      praziFields({
        enclosureId: water.id,
        animalIds: [fish.id],
        doses: 3,
        intervalHours: 24,
        startsAt: '2026-11-29T18:00:00Z',
      }),
    )
    const shown = await shownCautions(api, draft.number)
    expect(shown.find(({ ruleId }) => ruleId === 'R50')).toMatchObject({
      level: 'warning',
      code: 'doses-add-up',
      text: expect.stringContaining('the last makes up to 6'),
    })
    expect((await signDraft(api, draft)).status).toBe(201)
    const sheet = async (key: string) => {
      const { agent } = await api.as('technician')
      const { body } = await agent.get(`/api/orders/${draft.number}/doses/${key}`).expect(200)
      const found = body.cautions.find(({ ruleId }: { ruleId: string }) => ruleId === 'R50')
      return { found: found && `${found.level} ${found.code}`, why: body.why.join(' ') }
    }
    expect((await sheet('1')).found).toBeUndefined()
    const first = await record(draft.number, '1', '2026-11-29T18:10:00Z')
    expect((await sheet('2')).found).toBe('warning dose-on-dose')
    await record(draft.number, '2', '2026-11-30T18:10:00Z')
    const third = await sheet('3')
    expect(third.found).toBe('stop dose-on-dose')
    expect(third.why).toContain('2\u00a0doses of this order are in the water')
    const tech = await api.as('technician')
    const endFirst = (happenedAt: string) =>
      tech.agent
        .post(`/api/doses/${first}/stop`)
        .send({ id: api.nextId(), cause: 'time-up', happenedAt, rescue: 'half changed' })
        .expect(201)
    // ends of a time before the dose take nothing out of the water, and make no more doses of it
    await endFirst('2026-11-29T17:00:00Z')
    await endFirst('2026-11-29T17:30:00Z')
    const stillIn = await sheet('3')
    expect(stillIn.found).toBe('stop dose-on-dose')
    expect(stillIn.why).toContain('2\u00a0doses of this order are in the water')
    await endFirst('2026-11-30T12:00:00Z')
    expect(await sheet('3')).toMatchObject({ found: 'warning dose-on-dose' })
    expect((await sheet('3')).why).not.toContain('nobody recorded the agent as out')
  })

  it('refuses a plan over years, and asks about a long one', async () => {
    const { agent } = await api.as('veterinarian')
    const of = (doses: number, intervalHours: number) =>
      agent.post('/api/order-previews').send(praziFields({ doses, intervalHours }))
    expect((await of(60, 36)).body.cautions.map(({ code }: { code: string }) => code)).not.toContain(
      'plan-long',
    )
    expect((await of(60, 48)).body.cautions.map(({ code }: { code: string }) => code)).toContain('plan-long')
    const refused = await of(60, 2160)
    expect([refused.status, refused.body.code]).toEqual([422, 'bad-input'])
    expect(refused.body.errors[0]).toMatchObject({ pointer: '/fields/doses', code: 'plan-beyond-reason' })
    expect(refused.body.detail).toBe(
      'From the first dose to the last it would be more than 2\u00a0years. Check the number of doses and the hours between them.',
    )
  })

  it('takes no dose from years before it was signed', async () => {
    const draft = await aDraft(api, praziFields())
    expect((await signDraft(api, draft)).status).toBe(201)
    const { agent } = await api.as('technician')
    const send = (happenedAt: string) =>
      agent.post(`/api/orders/${draft.number}/doses/1/record`).send({
        id: api.nextId(),
        kind: 'recorded',
        happenedAt,
        amount: { value: '4.36', unit: 'g' },
        lotId: prazi.lotId,
      })
    const refused = await send('1999-12-01T18:00:00Z')
    expect([refused.status, refused.body.code]).toEqual([422, 'bad-input'])
    expect(refused.body.errors[0]).toMatchObject({ pointer: '/happenedAt', code: 'before-its-order' })
    expect(refused.body.detail).toContain('Check the year')
    // before its order, but of this year: it happened, and it is kept and marked
    const kept = await send('2026-11-30T18:00:00Z')
    expect(kept.status).toBe(201)
    expect(JSON.stringify(kept.body.recorded)).toContain('signed-after')
  })

  it('asks about a start in the past or far ahead, and refuses a year that cannot be meant', async () => {
    const of = async (startsAt: string) => {
      const { agent } = await api.as('veterinarian')
      return agent.post('/api/order-previews').send(praziFields({ startsAt }))
    }
    const codes = async (startsAt: string) =>
      (await of(startsAt)).body.cautions.map(({ code }: { code: string }) => code)
    expect(await codes('2026-12-01T10:00:00Z')).toContain('start-past')
    expect(await codes('2026-12-01T14:00:00Z')).not.toContain('start-past')
    expect(await codes('2027-06-01T14:00:00Z')).toContain('start-far')
    for (const [year, pointer, words] of [
      ['9999', '/startsAt', 'Check the year: it has to lie between 1900 and 2199'],
      ['2012', '/fields/startsAt', 'Check the year, and type the date again.'],
    ]) {
      const refused = await of(`${year}-12-01T14:00:00Z`)
      expect([refused.status, refused.body.code]).toEqual([422, 'bad-input'])
      expect(refused.body.errors[0]).toMatchObject({ pointer })
      expect(refused.body.detail).toContain(words)
    }
  })

  it('for a treatment vessel names animals before they are brought; the dose waits until they are in it', async () => {
    const tub = await aBathWater(api, 'TV-1')
    const { agent } = await api.as('veterinarian')
    const home = await aBathWater(api, 'QT-7')
    const ray = await aSchool(api, home.id, 7)
    const fields = praziFields({ enclosureId: tub.id, animalIds: [ray.id] })
    // an ordinary tank: who is not in it is not treated in it
    const elsewhere = await aDraft(api, fields)
    expect((await signDraft(api, elsewhere)).body.code).toBe('order-incomplete')
    const technician = await api.as('technician')
    await api.composition.parts.dataSource.query(
      `UPDATE enclosures SET treatment_vessel = true, fill_mark = 'blue line', fill_mark_entered_value = 2000,
              fill_mark_entered_unit = 'L', fill_mark_litres = 2000 WHERE id = $1`,
      [tub.id],
    )
    const shown = (await agent.post('/api/order-previews').send(fields).expect(200)).body
    expect(shown.water).toMatchObject({
      vessel: true,
      animals: [{ accession: ray.accession, treated: true, enclosureCode: 'QT-7' }],
    })
    // who is to come is judged as an inhabitant
    expect(shown.cautions).toContainEqual(expect.objectContaining({ ruleId: 'R42', code: 'first-use' }))
    const signed = await signDraft(api, elsewhere)
    expect(signed.status).toBe(201)
    const sheet = await technician.agent.get(`/api/orders/${elsewhere.number}/doses/1`).expect(200)
    expect(sheet.body.mayStart).toBe(false)
    expect(sheet.body.why.join()).toContain(ray.accession)
  })

  it('is not written over by a technician, who proposes', async () => {
    const draft = await aDraft(api, praziFields({ problem: 'as the veterinarian wrote it' }))
    const { agent } = await api.as('technician')
    const refused = await agent
      .put(`/api/orders/${draft.number}/draft`)
      .send({ expectedVersion: draft.version, fields: praziFields({ problem: 'mine' }) })
    expect([refused.status, refused.body.code]).toEqual([403, 'may-not'])
    expect(refused.body.detail).toContain('proposal of your own')
    const own = await aDraft(api, praziFields(), await api.as('technician'))
    const revised = await agent
      .put(`/api/orders/${own.number}/draft`)
      .send({ expectedVersion: own.version, fields: praziFields({ problem: 'mine' }) })
    expect([revised.status, revised.body.phase]).toEqual([200, 'proposed'])
  })

  it('is refused in plain words where its shape is wrong', async () => {
    const { agent } = await api.as('veterinarian')
    const refused = await agent
      .post('/api/order-previews')
      .send({
        ...praziFields(),
        doses: 0,
        contactMinutes: 30_000,
        startsAt: 'soon',
        basis: 'mine',
        problem: 7,
      })
      .expect(422)
    const said = Object.fromEntries(
      refused.body.errors.map(({ pointer, detail }: { pointer: string; detail: string }) => [
        pointer,
        detail,
      ]),
    )
    expect(said).toEqual({
      '/doses': 'Type a number of 1 or more.',
      '/contactMinutes': 'Type a number of 20160 or less.',
      '/startsAt': 'Give a day and a time with its offset, for example 2026-12-01T14:20:00-05:00',
      '/basis': 'Choose one of: active, product, salt, base, free, total.',
      '/problem': 'Write this as text.',
    })
  })

  it('prints whatever was typed into it, however long a word', async () => {
    const long = 'W'.repeat(500)
    const draft = await aDraft(
      api,
      praziFields({
        problem: long,
        stopIf: 'W'.repeat(1000),
        instructions: 'W'.repeat(2000),
        target: { value: '30', unit: 'mg/L' },
      }),
    )
    const reason = 'W'.repeat(2000)
    expect((await signDraft(api, draft, { overrides: [{ ruleId: 'R26', reason }] })).status).toBe(201)
    const { agent } = await api.as('technician')
    await agent
      .post(`/api/orders/${draft.number}/doses/1/record`)
      .send({
        id: api.nextId(),
        kind: 'recorded',
        happenedAt: '2026-12-01T18:15:00Z',
        amount: { value: '4.36', unit: 'g' },
        lotId: prazi.lotId,
        note: long,
      })
      .expect(201)
    for (const url of [`/api/orders/${draft.number}/print`, `/api/orders/${draft.number}/doses/1/print`]) {
      const print = await agent.get(url).buffer(true)
      expect(print.status, JSON.stringify(print.body).slice(0, 300)).toBe(200)
      expect(textOf(print.body as Buffer).replace(/\s/g, '')).toContain('W'.repeat(500))
    }
  })
})
