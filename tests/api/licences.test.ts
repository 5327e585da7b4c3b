import pg from 'pg'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import type { Licence } from '../../shared/contracts/people.contract.ts'
import { addDays } from '../../shared/domain/time/facility-date.ts'
import { pdfBytes } from '../builders/a-register.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

const today = '2026-12-01'
let api: TestApi
let owner: pg.Client
let admin: TestPerson
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  admin = await api.as('administrator')
  await api.setSetting('facility.jurisdictions', 'Norrell Sound, Outer Skerries')
})
afterEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

let people = 0
const aVet = (): Promise<TestPerson> => {
  people += 1
  return api.person({
    email: `vet${String(people)}@harrow-point.example`,
    printedName: `Dr Vet ${String(people)}`,
    roles: ['veterinarian'],
  })
}
const licence = (given: object = {}) => ({
  id: api.nextId(),
  class: 'veterinary',
  jurisdiction: 'Norrell Sound',
  number: 'VL-1',
  validFrom: '2026-01-01',
  validUntil: '2027-12-31',
  ...given,
})
const addressOf = (person: TestPerson) => `/api/people/${person.id}/licences`
const enter = async (person: TestPerson, given: object = {}) => {
  const body = licence(given)
  await admin.agent.post(addressOf(person)).send(body).expect(201)
  return body
}
const licencesOf = async (person: TestPerson) =>
  (await admin.agent.get(`/api/people/${person.id}`).expect(200)).body.licences as Licence[]
const end = (person: TestPerson, id: string, given: object) =>
  admin.agent
    .post(`${addressOf(person)}/${id}/end`)
    .set('Idempotency-Key', newKey())
    .send(given)
const trail = async (action: string) =>
  (await owner.query(`SELECT text FROM audit_entries WHERE action = $1 ORDER BY seq DESC LIMIT 1`, [action]))
    .rows[0]?.text as string
const meOf = async (person: TestPerson) => (await person.agent.get('/api/me').expect(200)).body

describe('the licences of a person', () => {
  it('are entered with their class, which nobody presumes', async () => {
    const vet = await aVet()
    const { class: _, ...without } = licence()
    const refused = await admin.agent.post(addressOf(vet)).send(without).expect(422)
    expect(refused.body.errors[0].pointer).toBe('/class')
    await enter(vet)
    await enter(vet, { class: 'controlled-substance', number: 'CS-1' })
    await enter(vet, { jurisdiction: 'Outer Skerries', number: 'VL-2' })
    expect((await licencesOf(vet)).map(({ number, class: of }) => [number, of]).sort()).toEqual([
      ['CS-1', 'controlled-substance'],
      ['VL-1', 'veterinary'],
      ['VL-2', 'veterinary'],
    ])
    expect(await trail('licence.enter')).toContain('VL-2')
  })

  it('do not let anybody practise by a registration alone', async () => {
    const vet = await aVet()
    await enter(vet, { class: 'controlled-substance' })
    expect((await meOf(vet)).mayPractise).toBe(false)
    expect((await admin.agent.get(`/api/people/${vet.id}`)).body.licenceState).toBe('none')
  })

  it('are corrected by another entry, and the earlier one stays readable', async () => {
    const vet = await aVet()
    const wrong = await enter(vet, { number: 'VL-19' })
    const correction = { ...licence({ number: 'VL-91' }), reason: 'digits exchanged' }
    const correct = (body: object) => admin.agent.post(`${addressOf(vet)}/${wrong.id}/correction`).send(body)
    await correct(correction).expect(201)
    // the same request sent again changes nothing
    await correct(correction).expect(201)
    const after = await licencesOf(vet)
    expect(after).toHaveLength(2)
    expect(after.find(({ id }) => id === wrong.id)).toMatchObject({ number: 'VL-19', state: 'superseded' })
    expect(after.find(({ id }) => id === correction.id)).toMatchObject({
      state: 'valid',
      supersedesId: wrong.id,
      reason: 'digits exchanged',
    })
    expect((await meOf(vet)).licences.map(({ number }: { number: string }) => number)).toEqual(['VL-91'])
    expect(await trail('licence.correct')).toContain('VL-19')
    // a second correction of the same entry would leave two in its place
    const second = await correct({ ...licence(), reason: 'again' }).expect(409)
    expect(second.body.code).toBe('licence-changed')
    expect((await end(vet, wrong.id, { endedOn: today, reason: 'moved' })).body.code).toBe('licence-changed')
    const voided = await admin.agent
      .post(`${addressOf(vet)}/${wrong.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'not theirs' })
    expect(voided.body.code).toBe('licence-changed')
    const gone = await admin.agent
      .post(`${addressOf(admin)}/${wrong.id}/correction`)
      .send({ ...licence(), reason: 'of somebody else' })
    expect(gone.status).toBe(404)
  })

  it('are ended before their time with the last day and a reason', async () => {
    const vet = await aVet()
    const { id } = await enter(vet)
    for (const endedOn of ['2025-12-31', '2028-01-01'])
      expect((await end(vet, id, { endedOn, reason: 'moved' }).expect(422)).body.errors[0].pointer).toBe(
        '/endedOn',
      )
    await end(vet, id, { endedOn: today, reason: 'moved away' }).expect(200)
    expect((await meOf(vet)).mayPractise).toBe(true)
    // 00:00 of the next day at the facility
    api.clock.set(new Date('2026-12-02T04:00:00Z'))
    expect((await meOf(vet)).mayPractise).toBe(false)
    expect((await licencesOf(vet))[0]).toMatchObject({
      state: 'ended',
      validUntil: '2027-12-31',
      ended: { on: today, reason: 'moved away', by: admin.printedName },
    })
    expect(await trail('licence.end')).toContain('moved away')
    expect((await end(vet, id, { endedOn: today, reason: 'again' })).body.code).toBe('licence-changed')
  })

  it('bear their papers, which the person reads and nobody else but the administrator', async () => {
    const vet = await aVet()
    const { id } = await enter(vet)
    const attach = (agent: TestPerson['agent']) =>
      agent
        .post(`${addressOf(vet)}/${id}/documents`)
        .field('id', api.nextId())
        .field('title', 'Licence VL-1')
        .field('kind', 'licence')
        .attach('file', pdfBytes(), { filename: 'licence.pdf' })
    expect((await attach(vet.agent)).status).toBe(403)
    const paper = (await attach(admin.agent).expect(201)).body
    expect((await licencesOf(vet))[0]?.documents.map(({ title }) => title)).toEqual(['Licence VL-1'])
    const own = (await vet.agent.get('/api/me/licences').expect(200)).body.licences as Licence[]
    expect(own[0]?.documents[0]?.id).toBe(paper.id)
    await vet.agent.get(`/api/documents/${String(paper.id)}/file`).expect(200)
    await admin.agent.get(`/api/documents/${String(paper.id)}/file`).expect(200)
    const other = await aVet()
    expect((await other.agent.get(`/api/documents/${String(paper.id)}/file`)).status).toBe(403)
    await admin.agent
      .post(`/api/documents/${String(paper.id)}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'wrong scan' })
      .expect(200)
  })
})

describe('the end of a licence on Today', () => {
  it.each([61, 60, 59, 30, 29, 7, 6, 1, 0, -1])('%s days before its last day', async (days) => {
    const vet = await aVet()
    await enter(vet, { number: 'VL-7', validUntil: addDays(today, days) })
    const worklist = worklistOf(api)
    const own = await worklist.itemsOf(vet, 'own-licence')
    const told = (await worklist.itemsOf('administrator', 'licence-ends')).filter(
      ({ params }) => params.personId === vet.id,
    )
    const without = (await worklist.itemsOf('administrator', 'account-without-licence')).filter(
      ({ params }) => params.personId === vet.id,
    )
    const level = {
      60: 'first',
      59: 'first',
      30: 'second',
      29: 'second',
      7: 'last',
      6: 'last',
      1: 'last',
      0: 'last',
    }[days]
    if (days > 60) return expect([own, told, without]).toEqual([[], [], []])
    if (days < 0) {
      expect([own.map(({ params }) => params), told, without.length]).toEqual([[{}], [], 1])
      expect((await meOf(vet)).licences[0].warning).toEqual({ level: 'ended', daysLeft: -1 })
      return
    }
    const params = { number: 'VL-7', level, days, until: addDays(today, days) }
    expect(own.map((item) => item.params)).toMatchObject([params])
    expect(told.map((item) => item.params)).toMatchObject([params])
    expect(without).toEqual([])
    expect((await meOf(vet)).licences[0].warning).toEqual({ level, daysLeft: days })
  })

  it('follows the settings of the facility', async () => {
    const vet = await aVet()
    await enter(vet, { validUntil: addDays(today, 80) })
    expect((await meOf(vet)).licences[0].warning).toBeNull()
    await api.setSetting('licences.warn-first-days', '90')
    expect((await meOf(vet)).licences[0].warning).toEqual({ level: 'first', daysLeft: 80 })
    await api.setSetting('licences.warn-first-days', '60')
  })
})

describe('the licence that signs', () => {
  const sign = (vet: TestPerson, asked: object = {}) =>
    api.composition.signing.service.confirmSignatory(
      {
        actor: { personId: vet.id, printedName: vet.printedName, roles: ['veterinarian'] },
        requestId: 'test',
      },
      'order.sign',
      password,
      api.clock.now(),
      asked,
    )

  it('is chosen by the signer where several are valid', async () => {
    const vet = await aVet()
    await enter(vet)
    expect((await sign(vet)).licence.number).toBe('VL-1')
    const other = await enter(vet, { jurisdiction: 'Outer Skerries', number: 'VL-2' })
    await expect(sign(vet)).rejects.toMatchObject({ code: 'licence-not-chosen' })
    expect((await sign(vet, { licenceId: other.id })).licence).toEqual({
      jurisdiction: 'Outer Skerries',
      number: 'VL-2',
      validUntil: '2027-12-31',
    })
    await end(vet, other.id, { endedOn: '2026-06-30', reason: 'given up' }).expect(200)
    await expect(sign(vet, { licenceId: other.id })).rejects.toMatchObject({ code: 'licence-not-valid' })
    expect((await sign(vet)).licence.number).toBe('VL-1')
  })

  it('says which one ended and what may still be done', async () => {
    const vet = await aVet()
    await enter(vet, { number: 'VL-8', validUntil: '2026-11-30' })
    await expect(sign(vet)).rejects.toMatchObject({
      code: 'licence-not-valid',
      message: expect.stringMatching(/VL-8 .*ended on 30.Nov.2026.*hold and stop/),
    })
  })

  it('wants a registration besides for a controlled drug, and stands with it in the signed text', async () => {
    const vet = await aVet()
    await enter(vet)
    const asked = { controlledSchedule: 'IV' } as const
    await expect(sign(vet, asked)).rejects.toMatchObject({
      code: 'registration-needed',
      details: { extra: { lacks: ['no-registration'] } },
    })
    const { id } = await enter(vet, { class: 'controlled-substance', number: 'CS-4' })
    const signatory = await sign(vet, asked)
    expect(signatory.registration?.number).toBe('CS-4')
    expect((await sign(vet)).registration).toBeNull()
    const { parts, signing } = api.composition
    const actor = { personId: vet.id, printedName: vet.printedName, roles: ['veterinarian' as const] }
    const sealed = await parts.transactions.inTransaction({ actor, requestId: 'test' }, async (tx) => {
      const { id: sealedId } = await signing.service.seal(tx, {
        signatory,
        subject: { kind: 'order', id: api.nextId(), label: 'TO-0001' },
        meaning: 'author of this order',
        content: {},
      })
      return sealedId
    })
    const { block } = await signing.service.readSealed(sealed, api.clock.now())
    expect(block).toMatchObject({ registration: { number: 'CS-4' }, state: 'intact' })
    await end(vet, id, { endedOn: '2026-11-30', reason: 'given up' }).expect(200)
    await expect(sign(vet, asked)).rejects.toMatchObject({
      code: 'registration-needed',
      details: { extra: { lacks: ['registration-ended'] } },
    })
  })

  it('is none that another hand made longer or turned into one to practise', async () => {
    const vet = await aVet()
    const { id } = await enter(vet, { class: 'controlled-substance' })
    await owner.query(`SET session_replication_role = replica`)
    await owner.query(`UPDATE licences SET class = 'veterinary' WHERE id = $1`, [id])
    await owner.query(`SET session_replication_role = DEFAULT`)
    await expect(sign(vet)).rejects.toMatchObject({ code: 'licence-not-valid' })
  })
})
