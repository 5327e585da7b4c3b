import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aBathWater, aDraft, answersTo, aProduct, aSchool, bathFields } from '../builders/an-order.ts'
import { newKey, password, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let fields: ReturnType<typeof bathFields>
let systemic: { id: string; lotId: string }
let prazi: { id: string; lotId: string }
beforeAll(async () => {
  api = await startApi()
  const tank = await aBathWater(api, 'QT-3')
  const school = await aSchool(api, tank.id, 1)
  prazi = await aProduct(api, {})
  fields = bathFields({ enclosureId: tank.id, animalIds: [school.id], productId: prazi.id, lotId: null })
  systemic = await aProduct(api, {
    agent: 'enrofloxacin',
    productName: 'Enrofloxacin injection',
    form: 'liquid',
    strength: { value: '100', unit: 'mg/mL' },
  })
})
afterAll(() => api.stop())

describe('a bath of a drug that is given to the animal itself', () => {
  const said =
    'Enrofloxacin is given to the animal itself: no dose line in force says how much of it goes into water. Choose a product that is given into water.'

  it('is refused while it is written, when it is kept, and when a draft is changed to it', async () => {
    const { agent } = await api.as('veterinarian')
    const wrong = { ...fields, productId: systemic.id, lotId: systemic.lotId }
    const draft = await aDraft(api, fields)
    for (const send of [
      agent.post('/api/order-previews').send(wrong),
      agent.post('/api/orders').send({ id: api.nextId(), fields: wrong }),
      agent.put(`/api/orders/${draft.number}/draft`).send({ expectedVersion: draft.version, fields: wrong }),
    ]) {
      const refused = await send.expect(422)
      expect(refused.body).toMatchObject({
        code: 'product-not-for-water',
        detail: said,
        errors: [{ pointer: '/fields/productId', code: 'product-not-for-water' }],
      })
    }
  })

  it('is not signed either where such a draft is already there', async () => {
    const draft = await aDraft(api, fields)
    const answers = await answersTo(api, draft.number)
    // as drafts were kept before they were refused
    const owner = new pg.Client({ connectionString: api.ownerUrl })
    await owner.connect()
    await owner.query('update orders set draft_text = replace(draft_text, $2, $3) where number = $1', [
      draft.number,
      prazi.id,
      systemic.id,
    ])
    await owner.end()
    const { agent } = await api.as('veterinarian')
    const refused = await agent
      .post(`/api/orders/${draft.number}/signature`)
      .set('Idempotency-Key', newKey())
      .send({ password, expectedVersion: draft.version, ...answers })
    expect([refused.status, refused.body.code]).toEqual([422, 'product-not-for-water'])
  })

  it('is ordered where its product is one that goes into water', async () => {
    const inWater = await aProduct(api, { productName: 'Praziquantel powder, fine' })
    const { agent } = await api.as('veterinarian')
    await agent
      .post('/api/orders')
      .send({ id: api.nextId(), fields: { ...fields, productId: inWater.id, lotId: inWater.lotId } })
      .expect(201)
  })
})
