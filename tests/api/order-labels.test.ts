import { Client } from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aBathWater, aDraft, aProduct, aSchool, bathFields, signDraft } from '../builders/an-order.ts'
import { pageCount, textOf } from '../pdf/support/poppler.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let number: string
let hash: string
beforeAll(async () => {
  api = await startApi()
  const tank = await aBathWater(api, 'QT-3')
  const school = await aSchool(api, tank.id, 1)
  const product = await aProduct(api, {})
  const draft = await aDraft(
    api,
    bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: product.id,
      lotId: product.lotId,
    }),
  )
  const signed = await signDraft(api, draft)
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  number = draft.number
  hash = signed.body.versions[0].signature.hash as string
})
afterAll(() => api.stop())

const labelFor = async (role: Parameters<TestApi['as']>[0]) =>
  textOf(await fetchPdf(await api.as(role), `/api/orders/${number}/label`))

describe('the label for a container', () => {
  it('leaves room for an address that nobody entered, on one page', async () => {
    const bytes = await fetchPdf(await api.as('veterinarian'), `/api/orders/${number}/label`)
    expect(textOf(bytes)).toContain('Address of the veterinarian')
    expect(pageCount(bytes)).toBe(1)
  })

  // Source: 21 CFR 530.12 (a) to (e), as restated in the treatments reference (V)
  it('says whatever a label of a dispensed drug has to say', async () => {
    await api.setSetting('facility.address', '4 Breakwater Road, Harrow Point')
    const text = await labelFor('technician')
    const { body: order } = await (
      await api.as('veterinarian')
    ).agent.get(`/api/orders/${number}?amounts=yes`)
    const { content } = order.versions[0]
    expect(text).not.toContain('No dose line is named')
    for (const part of [
      order.versions[0].signature.printedName,
      '4 Breakwater Road, Harrow Point',
      content.product.establishedName,
      content.lot.lotNumber,
      'QT-3',
      content.fields.problem,
      content.targetText,
      'into the water of QT-3',
      'Withdrawal',
      'Not for animals that may be eaten or released',
      content.fields.stopIf,
      'Is this paper still current?',
      `/check/${hash.slice(0, 16)}`,
    ])
      expect(text.replace(/\s+/g, ' ')).toContain(part.replace(/\s+/g, ' '))
    for (const { accession } of content.water.animals) expect(text).toContain(accession)
  })

  it('tells no amount, so that it spoils no blind second calculation', async () => {
    const { body: order } = await (
      await api.as('veterinarian')
    ).agent.get(`/api/orders/${number}?amounts=yes`)
    const { amount } = order.versions[0].content
    const text = await labelFor('technician')
    expect(amount.text).toMatch(/\d/)
    expect(text).not.toContain(amount.text)
    expect(text).toContain('never from this label')
  })

  it('is found again by its fingerprint', async () => {
    const { agent } = await api.as('keeper')
    const found = await agent.get(`/api/checks/${hash.slice(0, 16)}`).expect(200)
    expect(found.body.prints.map(({ kind }: { kind: string }) => kind)).toContain('order-label')
    expect(found.body.state).toBe('current')
  })

  it('says across the page that the order is held', async () => {
    const keeper = await api.as('keeper')
    await keeper.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:19:00Z' })
      .expect(201)
    expect((await labelFor('technician')).toLowerCase()).toContain('held')
    const { agent } = await api.as('veterinarian')
    await agent
      .post(`/api/orders/${number}/hold-lift`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'looked at, breathing well' })
      .expect(200)
  })

  it('is for those who may print orders, and of orders that are signed', async () => {
    await api.anonymous().get(`/api/orders/${number}/label`).expect(401)
    await (await api.as('administrator')).agent.get(`/api/orders/${number}/label`).expect(403)
    await (await api.as('technician')).agent.get('/api/orders/TO-9999/label').expect(404)
  })

  it('does not exist of an order that is not what was signed', async () => {
    const owner = new Client({ connectionString: api.ownerUrl })
    await owner.connect()
    await owner.query('ALTER TABLE signed_texts DISABLE TRIGGER USER')
    await owner.query(
      `UPDATE signed_texts SET text = replace(text, 'any fish', 'each fish') WHERE subject_label = $1`,
      [number],
    )
    await owner.query('ALTER TABLE signed_texts ENABLE TRIGGER USER')
    await owner.end()
    const answer = await (await api.as('technician')).agent.get(`/api/orders/${number}/label`)
    expect([answer.status, answer.body.code]).toEqual([409, 'broken-record'])
  })
})
