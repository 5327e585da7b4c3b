import pg from 'pg'
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { aDraft, answersTo, aProduct } from '../builders/an-order.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let owner: pg.Client
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  house = await aFormalinHouse(api)
})
afterEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

let vets = 0
async function aVet(): Promise<TestPerson> {
  vets += 1
  return api.person({
    email: `vet${String(vets)}@harrow-point.example`,
    printedName: `Dr Vet ${String(vets)}`,
    roles: ['veterinarian'],
  })
}
async function license(vet: TestPerson, given: object = {}): Promise<string> {
  const id = api.nextId()
  await (
    await api.as('administrator')
  ).agent
    .post(`/api/people/${vet.id}/licences`)
    .send({
      id,
      class: 'veterinary',
      jurisdiction: 'Norrell Sound',
      number: 'VL-1',
      validFrom: '2026-01-01',
      validUntil: '2027-12-31',
      ...given,
    })
    .expect(201)
  return id
}
const signatures = async () =>
  Number((await owner.query(`SELECT count(*) AS n FROM signed_texts`)).rows[0].n as string)

async function aDraftOf(vet: TestPerson) {
  const draft = await aDraft(api, house.fieldsOf(await house.tankWithSchool()), vet)
  const answers = await answersTo(api, draft.number)
  const sign = (given: object = {}, key = newKey()) =>
    vet.agent
      .post(`/api/orders/${draft.number}/signature`)
      .set('Idempotency-Key', key)
      .send({ password, expectedVersion: draft.version, relationship: true, ...answers, ...given })
  return { ...draft, sign }
}

describe('a form for the signature that was opened on the last day of the licence', () => {
  // the day ends at 04:00 UTC at the facility
  const lastMinute = new Date('2026-12-02T03:59:30Z')
  const after = new Date('2026-12-02T04:00:00Z')

  it('and sent after midnight is refused with a sentence, and signs nothing', async () => {
    const vet = await aVet()
    const licenceId = await license(vet, { number: 'VL-12', validUntil: '2026-12-01' })
    api.clock.set(lastMinute)
    expect((await vet.agent.get('/api/me').expect(200)).body.licences[0]).toMatchObject({
      state: 'valid',
      warning: { level: 'last', daysLeft: 0 },
    })
    const { sign } = await aDraftOf(vet)
    const before = await signatures()
    api.clock.set(after)
    for (const sent of [{ licenceId }, {}]) {
      const late = await sign(sent)
      expect([late.status, late.body.code]).toEqual([403, 'licence-not-valid'])
    }
    expect((await sign({})).body.detail).toMatch(/licence VL-12 .*ended on 1.Dec.2026.*hold and stop/)
    expect((await sign({ licenceId })).body.detail).toMatch(/VL-12.*ended on 1.Dec.2026/)
    expect(await signatures()).toBe(before)
    // the same form a minute before
    api.clock.set(lastMinute)
    expect((await sign({ licenceId })).body.code).not.toBe('licence-not-valid')
  })

  it('with another one that goes on is not signed under that one instead: the signer chooses again', async () => {
    const vet = await aVet()
    const ends = await license(vet, { number: 'VL-13', validUntil: '2026-12-01' })
    const goesOn = await license(vet, { number: 'VL-14' })
    api.clock.set(lastMinute)
    const { sign } = await aDraftOf(vet)
    const before = await signatures()
    expect((await sign()).body).toMatchObject({ code: 'licence-not-chosen' })
    api.clock.set(after)
    const late = await sign({ licenceId: ends })
    expect(late.body).toMatchObject({
      code: 'licence-not-valid',
      errors: [{ pointer: '/licenceId', code: 'chosen-licence-not-valid' }],
    })
    expect(late.body.detail).toMatch(/Choose again/)
    expect(await signatures()).toBe(before)
    api.clock.set(lastMinute)
    const signed = await sign({ licenceId: goesOn })
    expect(signed.status).toBe(201)
    expect(signed.body.versions[0].signature.licence).toMatchObject({ number: 'VL-14' })
  })

  it('sent twice under one key signs once', async () => {
    const vet = await aVet()
    await license(vet)
    const { sign } = await aDraftOf(vet)
    const before = await signatures()
    const key = newKey()
    const [first, again] = [await sign({}, key), await sign({}, key)]
    expect([first.status, again.status]).toEqual([201, 201])
    expect(await signatures()).toBe(before + 1)
  })

  it('under the licence of somebody else is refused', async () => {
    const [vet, other] = [await aVet(), await aVet()]
    await license(vet)
    const theirs = await license(other)
    const { sign } = await aDraftOf(vet)
    expect((await sign({ licenceId: theirs })).body.code).toBe('licence-not-valid')
  })
})

describe('while signing is locked after five wrong passwords', () => {
  async function lockedVet(): Promise<TestPerson> {
    const vet = await aVet()
    await license(vet)
    const { sign } = await aDraftOf(vet)
    for (let i = 0; i < 5; i++) expect((await sign({ password: 'wrong' })).body.code).toBe('password-wrong')
    const locked = await sign()
    expect([locked.status, locked.body.code]).toEqual([429, 'sign-in-locked'])
    expect(locked.body.detail).toMatch(/15 min\. It opens by itself then; nobody can open it sooner\./)
    expect(locked.body.locked_until).toBe('2026-12-01T18:35:00.000Z')
    return vet
  }

  it('a bath that runs is stopped, and what went in is recorded, by the same person', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    const vet = await lockedVet()
    const dose = api.nextId()
    await house.record(number, { id: dose, happenedAt: '2026-12-01T18:10:00Z' }, vet).expect(201)
    const stopped = await vet.agent.post(`/api/doses/${dose}/stop`).send({
      id: api.nextId(),
      cause: 'stopped',
      seen: 'a fish on its side',
      happenedAt: '2026-12-01T18:19:00Z',
    })
    expect([stopped.status, stopped.body.recorded?.[0]?.stop?.at]).toEqual([201, '2026-12-01T18:19:00.000Z'])
    const withheld = await house.signedBath(await house.tankWithSchool())
    await house.record(withheld, { kind: 'withheld', amount: null, lotId: null }, vet).expect(201)
    await vet.agent
      .post(`/api/orders/${withheld}/holds`)
      .send({ id: api.nextId(), happenedAt: testDay.toISOString() })
      .expect(201)
    await vet.agent
      .post(`/api/orders/${withheld}/discontinuation`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'no longer needed' })
      .expect(200)
  })

  it('a stop of the dose is not overridden, and nobody else is locked', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    const vet = await lockedVet()
    const reply = await vet.agent
      .post(house.doseAt(number, '/overrides'))
      .set('Idempotency-Key', newKey())
      .send({
        password,
        ruleId: 'R09',
        code: 'shrimp',
        finding: 'x',
        lotId: house.formalin.lotId,
        reason: 'meant so',
      })
    expect(reply.body.code).toBe('sign-in-locked')
    await house.record(number).expect(201)
    await house.signedBath(await house.tankWithSchool())
  })
})

describe('an order for a controlled drug', () => {
  it('is signed only by whoever holds a registration besides the licence, valid where the licence is', async () => {
    const vet = await aVet()
    await license(vet)
    const ketamine = await aProduct(api, {
      agent: 'ketamine',
      productName: 'Ketamine 100 mg/mL',
      form: 'liquid',
      strength: { value: '100', unit: 'mg/mL' },
    })
    const { number, sign } = await aDraftOf(vet)
    // nobody drafts a bath of it; a draft from elsewhere may name it
    await owner.query(
      `UPDATE orders SET draft_text = jsonb_set(draft_text::jsonb, '{productId}', to_jsonb($2::text))::text WHERE number = $1`,
      [number, ketamine.id],
    )
    const lacks = async () => {
      const { body } = await sign()
      return [body.code, body.lacks]
    }
    expect(await lacks()).toEqual(['registration-needed', ['no-registration']])
    expect((await sign()).body.detail).toMatch(/schedule III .*registration.*hold and stop/)
    await license(vet, { class: 'controlled-substance', number: 'CS-1', validUntil: '2026-11-30' })
    expect(await lacks()).toEqual(['registration-needed', ['registration-ended']])
    await license(vet, { class: 'controlled-substance', number: 'CS-2' })
    // what refuses it now is that it is not given into water
    expect((await sign()).body.code).toBe('product-not-for-water')
  })
})
