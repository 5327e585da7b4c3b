import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { relationshipWords } from '../../shared/messages/orders.ts'
import {
  aBathWater,
  aDraft,
  answersTo,
  aProduct,
  aSchool,
  bathFields,
  signDraft,
} from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { newKey, password, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let bathFieldsHere: (more?: object) => ReturnType<typeof bathFields>
beforeAll(async () => {
  api = await startApi()
  const tank = await aBathWater(api, 'QT-3')
  const school = await aSchool(api, tank.id, 1)
  const product = await aProduct(api, {})
  bathFieldsHere = (more = {}) =>
    bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: product.id,
      lotId: product.lotId,
      ...more,
    })
})
afterAll(() => api.stop())

describe('an order outside the label', () => {
  // Source: 21 CFR 530.3(i), as the treatments reference restates it (V)
  it('is signed outside the label only with what makes up a valid relationship, and freezes it', async () => {
    const draft = await aDraft(api, bathFieldsHere())
    const { agent } = await api.as('veterinarian')
    const answers = await answersTo(api, draft.number)
    const sign = (more: object) =>
      agent
        .post(`/api/orders/${draft.number}/signature`)
        .set('Idempotency-Key', newKey())
        .send({ password, expectedVersion: draft.version, ...answers, ...more })
    for (const more of [{}, { relationship: false }])
      expect(await sign(more)).toMatchObject({
        status: 422,
        body: { errors: [{ pointer: '/relationship', code: 'relationship-not-stated' }] },
      })
    const signed = await sign({ relationship: true })
    expect(signed.status).toBe(201)
    const { statement } = relationshipWords
    expect(signed.body.versions[0].content.relationship).toBe(statement)
    const paper = textOf(await fetchPdf(await api.as('technician'), `/api/orders/${draft.number}/print`))
    expect(paper.replace(/\s+/g, ' ')).toContain(statement)
    // what was said of it was true then: an order by the label says nothing
    const labelled = await aDraft(api, bathFieldsHere({ use: 'as-labelled' }))
    const other = await signDraft(api, labelled)
    expect(other.body.versions[0].content.relationship).toBeNull()
  })
})
