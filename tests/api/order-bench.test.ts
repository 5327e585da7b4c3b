import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { SignedBathOrder } from '../../shared/contracts/signed-order.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aDraft, signDraft } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let house: FormalinHouse
let bath: BathTank
let keeper: TestPerson
let otherVet: TestPerson
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
  keeper = await api.as('keeper')
  otherVet = await api.person({
    email: 'vet2@harrow-point.example',
    printedName: 'Second veterinarian',
    roles: ['veterinarian'],
  })
})
// each in water of its own: what somebody learns of one order they know of the next one there
beforeEach(async () => {
  api.clock.set(testDay)
  bath = await house.tankWithSchool()
})
afterAll(() => api.stop())

/** 100 µL/L in so many litres, on a measure of 1 mL: 218 mL for 2,181.4 L, worked by hand. */
const benchOf = (litres = '2181.4') => ({
  calculator: 'bath-dose',
  inputs: {
    target: { value: '100', unit: 'uL/L' },
    basis: 'product',
    volume: { value: litres, unit: 'L' },
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    strengthOf: 'active',
    density: { value: '1.08', unit: 'g/mL' },
    division: { value: '1', unit: 'mL' },
  },
})
const preview = (fields: object, by: TestPerson, order?: string) =>
  by.agent
    .post('/api/order-previews')
    .query(order ? { order } : {})
    .send(fields)
const get = async (number: string, by: TestPerson) =>
  (await by.agent.get(`/api/orders/${number}`).expect(200)).body
const save = (number: string, expectedVersion: number, fields: object, by: TestPerson) =>
  by.agent.put(`/api/orders/${number}/draft`).send({ expectedVersion, fields })
const plain = (text: string) => text.replaceAll(/[\s\u00a0]+/g, ' ')
const shows = /21[89](\.1\d*)? ?mL|2,?181\.4|bath-dose|Bath dose/
/** Everything but the volume of the water itself, which is nobody's secret. */
const sent = (body: object) => plain(JSON.stringify(body))

describe('an order keeps what was worked out on the bench beforehand', () => {
  it('works it out again as it is written, in words, beside its own amount and never in its place', async () => {
    const vet = await api.as('veterinarian')
    const fields = house.fieldsOf(bath, { bench: benchOf() })
    const { amount, bench } = (await preview(fields, vet).expect(200)).body
    expect(amount.measured).toEqual({ value: '218', unit: 'mL' })
    expect(bench).toMatchObject({
      head: 'Bath dose: 218\u00a0mL',
      comparison: 'The order’s own amount is 218\u00a0mL; the bench came to 218\u00a0mL. They are the same.',
    })
    expect(bench.inputs).toContain('Net volume of the water: 2,181.4\u00a0L')
    expect(bench.working.at(-1)).toMatch(/ = 218\.14\smL$/)
    expect(bench.sources.join()).toMatch(/\(V2?\)/)
    // 100 µL/L × 2,500 L = 250 mL
    const other = (await preview(house.fieldsOf(bath, { bench: benchOf('2500') }), vet).expect(200)).body
    expect(other.amount.measured).toEqual({ value: '218', unit: 'mL' })
    expect(plain(other.bench.comparison)).toContain(
      'amount is 218 mL; the bench came to 250 mL. They differ.',
    )
    // a figure of another dimension is compared with nothing, nor is one while there is no amount
    const solid = {
      calculator: 'wash-out',
      inputs: (await import('../../shared/bench/calculators/wash-out.ts')).washOut.example,
    }
    const unlike = (await preview(house.fieldsOf(bath, { bench: solid }), vet).expect(200)).body.bench
    expect(unlike).toMatchObject({ comparison: null })
    expect(unlike.working.length).toBeGreaterThan(0)
    const open = house.fieldsOf(bath, { bench: benchOf(), target: null })
    expect((await preview(open, vet).expect(200)).body.bench).toMatchObject({ comparison: null })
    expect((await preview(house.fieldsOf(bath), vet).expect(200)).body.bench).toBeNull()
  })

  it('refuses an unknown calculator and a question without an answer, and says what to do', async () => {
    const vet = await api.as('veterinarian')
    const wrong = [
      { calculator: 'no-such', inputs: {} },
      { calculator: 'bath-dose', inputs: { ...benchOf().inputs, volume: { value: '-3', unit: 'L' } } },
      { calculator: 'bath-dose', inputs: { ...benchOf().inputs, colour: 'red' } },
    ]
    const draft = await aDraft(api, house.fieldsOf(bath))
    for (const bench of wrong) {
      const fields = house.fieldsOf(bath, { bench })
      const replies = [
        await preview(fields, vet),
        await vet.agent.post('/api/orders').send({ id: api.nextId(), fields }),
        await save(draft.number, draft.version, fields, vet),
      ]
      for (const { status, body } of replies) {
        expect([status, body.code, body.errors[0].pointer]).toEqual([422, 'bad-input', '/fields/bench'])
        expect(body.detail).toMatch(/Leave the bench’s working out of this order, or work it out anew/)
      }
    }
    // a client's own figure has no place, and what is kept has a limit
    const inputs = Object.fromEntries(Array.from({ length: 41 }, (_, i) => [`a${String(i)}`, '1']))
    for (const bench of [
      { ...benchOf(), result: '5 g' },
      { calculator: 'bath-dose', inputs },
      { calculator: 'bath-dose', inputs: { target: 'x'.repeat(201) } },
    ]) {
      const reply = await preview(house.fieldsOf(bath, { bench }), vet)
      expect([reply.status, reply.body.code]).toEqual([422, 'bad-input'])
    }
    expect((await get(draft.number, vet)).version).toBe(draft.version)
  })

  it('freezes it in the signed text, on the page and on paper, and asks again at the signature', async () => {
    const vet = await api.as('veterinarian')
    const number = await house.signedBath(bath, { bench: benchOf() })
    const { versions, record } = await get(number, vet)
    expect(record).toBe('intact')
    const content = SignedBathOrder.parse(versions[0].content)
    expect(content.bench).toMatchObject({ head: 'Bath dose: 218\u00a0mL' })
    expect(content.bench?.comparison).toContain('They are the same.')
    expect(content.fields.bench).toEqual(benchOf())
    const paper = plain(textOf(await fetchPdf(vet, `/api/orders/${number}/print`)))
    expect(paper).toContain('Worked out beforehand on the bench')
    expect(paper).toContain('Bath dose: 218 mL. The order’s own amount is 218 mL')
    expect(paper).toMatch(/Asked: .*Net volume of the water: 2,181\.4 L/)
    expect(paper).toMatch(/Working: .*218\.14 mL\./)
    expect(paper).toMatch(/Sources: /)

    const draft = await aDraft(api, house.fieldsOf(bath, { bench: benchOf() }))
    await api.composition.parts.dataSource.query(
      `UPDATE orders SET draft_text = replace(draft_text, 'bath-dose', 'no-such') WHERE number = $1`,
      [draft.number],
    )
    const refused = await vet.agent
      .post(`/api/orders/${draft.number}/signature`)
      .set('Idempotency-Key', newKey())
      .send({ password, expectedVersion: draft.version, read: [], overrides: [] })
    expect([refused.status, refused.body.code]).toEqual([422, 'bad-input'])
    expect((await get(draft.number, vet)).draftBench).toBeNull()
  })

  it('is part of the draft in the audit trail', async () => {
    const draft = await aDraft(api, house.fieldsOf(bath, { bench: benchOf() }))
    const vet = await api.as('veterinarian')
    await save(draft.number, draft.version, house.fieldsOf(bath, { bench: null }), vet).expect(200)
    const { rows } = (await vet.agent.get(`/api/audit?q=${draft.number}`).expect(200)).body
    const of = (action: string) => rows.find((row: { action: string }) => row.action === action)
    expect(of('order.draft').after.bench).toEqual(benchOf())
    expect(of('order.revise-draft')).toMatchObject({ before: { bench: benchOf() }, after: { bench: null } })
    // nobody else learns from the trail what they may have to work out blind, also after it was left out
    const entries = (await otherVet.agent.get(`/api/audit?q=${draft.number}`).expect(200)).body.rows
    expect(entries.length).toBeGreaterThan(1)
    expect(sent(entries)).not.toMatch(shows)
    expect(entries.at(-1)).toMatchObject({ amountLeftOut: true, after: { problem: expect.any(String) } })
  })
})

describe('drafts and orders without it', () => {
  it('go on working, and a form that does not know of it takes nothing away', async () => {
    const vet = await api.as('veterinarian')
    const old = await aDraft(api, house.fieldsOf(bath))
    expect(await get(old.number, vet)).toMatchObject({ draftBench: null, benchWithheld: false })
    expect((await get(old.number, vet)).draft).not.toHaveProperty('bench')
    const signed = await signDraft(api, old)
    expect(signed.status).toBe(201)
    expect(signed.body.versions[0].content).not.toHaveProperty('bench')
    const paper = textOf(await fetchPdf(vet, `/api/orders/${old.number}/print`))
    expect(paper).not.toContain('bench')

    const draft = await aDraft(api, house.fieldsOf(bath, { bench: benchOf() }))
    const again = await save(draft.number, 1, house.fieldsOf(bath, { problem: 'Seen again' }), vet).expect(
      200,
    )
    expect(again.body).toMatchObject({ draft: { problem: 'Seen again', bench: benchOf() } })
    expect(again.body.draftBench.head).toBe('Bath dose: 218\u00a0mL')
    const without = await save(draft.number, 2, house.fieldsOf(bath, { bench: null }), vet).expect(200)
    expect(without.body).toMatchObject({ draft: { bench: null }, draftBench: null, benchWithheld: false })
  })
})

describe('whoever may be asked to calculate blind', () => {
  it('is not shown it with a signed order, its amendment, the lists or the trail, until they ask for the amount', async () => {
    const number = await house.signedBath(bath, { bench: benchOf('2500') })
    const seen = /250 ?mL|2,?500|bath-dose|Bath dose/
    for (const by of [house.second, keeper]) {
      const order = await get(number, by)
      expect(order).toMatchObject({ amountsWithheld: true, benchWithheld: true })
      expect(order.versions[0].content).not.toHaveProperty('bench')
      expect(sent(order)).not.toMatch(seen)
      expect(sent((await by.agent.get(`/api/orders?q=${number}`)).body)).not.toMatch(seen)
      expect((await by.agent.get(`/api/orders.csv?q=${number}`)).text).not.toMatch(seen)
      expect(sent(await house.blindSheet(number, by))).not.toMatch(seen)
    }
    // an amended version in which it stays: saved by whoever does not see it, it is still there
    const vet = await api.as('veterinarian')
    const { version } = await get(number, vet)
    const amended = await save(number, version, house.fieldsOf(bath, { problem: 'Again' }), vet).expect(200)
    expect(amended.body.draft.bench).toEqual(benchOf('2500'))
    expect(sent(await get(number, keeper))).not.toMatch(seen)
    const trail = (await otherVet.agent.get(`/api/audit?q=${number}`).expect(200)).body.rows
    expect(sent(trail)).not.toMatch(seen)

    const asked = (await keeper.agent.get(`/api/orders/${number}?amounts=yes`).expect(200)).body
    expect(asked).toMatchObject({ amountsWithheld: false, benchWithheld: false })
    expect(asked.versions[0].content.bench.head).toBe('Bath dose: 250\u00a0mL')
    expect((await house.blindSheet(number, keeper)).secondShut).not.toBeNull()
  })

  it('is not shown it with a draft either, and is noted when they work it out in its form', async () => {
    const draft = await aDraft(api, house.fieldsOf(bath, { bench: benchOf('2500') }))
    const { second, technician } = house
    const seen = /250 ?mL|2,?500|bath-dose|Bath dose/
    for (const by of [second, keeper, otherVet]) {
      const order = await get(draft.number, by)
      expect(order).toMatchObject({ benchWithheld: true, draftBench: null })
      expect(sent(order)).not.toMatch(seen)
    }
    expect(await get(draft.number, await api.as('veterinarian'))).toMatchObject({
      benchWithheld: false,
      draftBench: { head: 'Bath dose: 250\u00a0mL' },
    })
    expect((await get(draft.number, await api.as('registrar'))).benchWithheld).toBe(false)
    // another water, or no amount: nothing would be noted for this one, and nothing is shown
    const elsewhere = await house.tankWithSchool()
    for (const fields of [house.fieldsOf(elsewhere), house.fieldsOf(bath, { target: null })])
      expect((await preview(fields, otherVet, draft.number).expect(200)).body.bench).toBeNull()
    expect((await get(draft.number, otherVet)).benchWithheld).toBe(true)
    const taken = (await preview(house.fieldsOf(bath), otherVet, draft.number).expect(200)).body
    expect(taken.bench).toMatchObject({ head: 'Bath dose: 250\u00a0mL' })
    expect((await get(draft.number, otherVet)).benchWithheld).toBe(false)
    // and they are no second person of it once it is signed
    expect((await signDraft(api, draft)).status).toBe(201)
    await house.freshWater(bath)
    await house.calculateFirst(draft.number, technician).expect(201)
    expect((await house.blindSheet(draft.number, otherVet)).secondShut).toBe('amount-seen')
    expect((await house.blindSheet(draft.number, second)).secondShut).toBeNull()
  })
})
