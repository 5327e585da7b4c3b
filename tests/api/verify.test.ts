import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { verifyOrders } from '../../server/features/orders/index.ts'
import { verifySignedEvents } from '../../server/features/quarantine/index.ts'
import { verifyRows } from '../../server/platform/audit/verify-rows.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aClearableCase, clear } from '../builders/a-clearance.ts'
import { aDraft, aProduct, signDraft } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let owner: pg.Client
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  house = await aFormalinHouse(api)
})
beforeEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

const rowFaults = async () => (await verifyRows(api.composition.parts.dataSource)).faults
const orderFaults = async () =>
  (await verifyOrders(api.composition.parts.dataSource, api.composition.signing.service.signer)).faults
const caseFaults = async () =>
  (await verifySignedEvents(api.composition.parts.dataSource, api.composition.signing.service)).faults

/** As the owner, past the constraints that join the tables. */
async function byHand(...statements: [sql: string, ...values: unknown[]][]): Promise<void> {
  await owner.query('BEGIN')
  await owner.query(`SET LOCAL session_replication_role = replica`)
  for (const [sql, ...values] of statements) await owner.query(sql, values)
  await owner.query('COMMIT')
}

/** An order amended from 100 to 50 µL/L. */
async function anAmendedOrder() {
  const bath = await house.tankWithSchool()
  const number = await house.signedBath(bath)
  const vet = await api.as('veterinarian')
  const signed = (await vet.agent.get(`/api/orders/${number}`).expect(200)).body
  const { fields } = signed.versions[0].content
  await vet.agent
    .put(`/api/orders/${number}/draft`)
    .send({ expectedVersion: signed.version, fields: { ...fields, target: { value: '50', unit: 'uL/L' } } })
    .expect(200)
  const reply = await signDraft(api, { number, version: signed.version + 1 })
  expect([reply.status, reply.body.versionNo]).toEqual([201, 2])
  return { number, id: reply.body.id as string, school: bath.school }
}

describe('an order of which a signature is missing', () => {
  const newest = (id: string) =>
    `(SELECT v.id FROM order_versions v WHERE v.order_id = '${id}' ORDER BY v.version_no DESC LIMIT 1)`
  const textOfNewest = (id: string) =>
    `(SELECT v.signed_text_id FROM order_versions v WHERE v.order_id = '${id}' ORDER BY v.version_no DESC LIMIT 1)`

  it.each([
    ['its newest version', (id: string) => [`DELETE FROM order_versions WHERE id = ${newest(id)}`]],
    [
      'its newest version with its text',
      (id: string) => [
        `DELETE FROM signed_texts WHERE id = ${textOfNewest(id)}`,
        `DELETE FROM order_versions WHERE id = ${newest(id)}`,
      ],
    ],
    [
      'the text of its newest version',
      (id: string) => [`DELETE FROM signed_texts WHERE id = ${textOfNewest(id)}`],
    ],
  ])('by %s is broken in the list, on its sheets and for its doses', async (_, damage) => {
    const { number, id } = await anAmendedOrder()
    expect((await orderFaults()).filter(({ at }) => at.startsWith(number))).toEqual([])
    await byHand(...damage(id).map((sql): [string] => [sql]))
    const { agent } = house.technician
    const listed = await agent.get(`/api/orders?q=${number}`).expect(200)
    expect(listed.body.rows).toMatchObject([{ number, record: 'broken' }])
    const shown = (await agent.get(`/api/orders/${number}`).expect(200)).body.versions
    for (const { signature } of shown) expect(signature.state).toBe('broken')
    expect((await house.calculateFirst(number)).body.code).toBe('broken-record')
    expect((await house.give(number)).status).toBe(409)
    expect((await orderFaults()).filter(({ at }) => at === number).length).toBeGreaterThan(0)
    expect((await rowFaults()).map(({ what }) => what)).toContain('missing')
  })

  it('says so on paper', async () => {
    const { number, id } = await anAmendedOrder()
    await byHand([`DELETE FROM order_versions WHERE id = ${newest(id)}`])
    const print = await house.technician.agent.get(`/api/orders/${number}/print`).buffer(true).expect(200)
    expect(textOf(print.body as Buffer)).toContain('Record check failed')
  })

  it('by all of them is broken, and no draft; what happened at the tank is recorded, marked and explained all the same', async () => {
    const { number, id, school } = await anAmendedOrder()
    const before = api.nextId()
    await house.record(number, { id: before }).expect(201)
    await byHand([`DELETE FROM order_versions WHERE order_id = $1`, id])
    const { agent } = house.technician
    // a bath that was begun before it can be ended
    const end = { id: api.nextId(), cause: 'stopped', happenedAt: '2026-12-01T18:25:00Z' }
    await agent.post(`/api/doses/${before}/stop`).send(end).expect(201)
    expect((await house.calculateFirst(number)).body.code).toBe('broken-record')
    expect((await house.give(number)).status).toBe(409)
    const dose = api.nextId()
    const recorded = (
      await agent
        .post(`/api/orders/${number}/doses/2/record`)
        .send({
          id: dose,
          kind: 'recorded',
          happenedAt: '2026-12-01T18:22:00Z',
          amount: { value: '218', unit: 'mL' },
          lotId: house.formalin.lotId,
        })
        .expect(201)
    ).body
    expect([recorded.record, recorded.mayStart]).toEqual(['broken', false])
    const [record] = recorded.recorded
    expect(record).toMatchObject({ id: dose, record: 'intact', amountText: '218\u00a0mL' })
    const codes = record.exceptions.map(({ code }: { code: string }) => code)
    expect(codes).toContain('not-intact')
    expect(codes).not.toContain('other-product')
    const vet = await api.as('veterinarian')
    const chart = (await vet.agent.get(`/api/animals/${school.accession}`).expect(200)).body
    expect(chart.discrepancies).toContainEqual(
      expect.objectContaining({
        kind: 'dose-under-broken-order',
        facts: expect.objectContaining({ order: number, key: '2' }),
      }),
    )
    expect((await rowFaults()).filter(({ at }) => at.startsWith('doses '))).not.toContainEqual(
      expect.objectContaining({ at: `doses ${dose}` }),
    )
    const stop = { id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T18:22:00Z' }
    await agent.post(`/api/doses/${dose}/stop`).send(stop).expect(201)
    await agent
      .post(`/api/dose-records/dose/${dose}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Typed under another order' })
      .expect(200)
    expect((await agent.get(`/api/orders?q=${number}`).expect(200)).body.rows[0].record).toBe('broken')
    expect((await agent.get(`/api/orders/${number}/print`)).status).toBe(409)
    await byHand([`DELETE FROM orders WHERE id = $1`, id])
    expect(await orderFaults()).toContainEqual(expect.objectContaining({ at: number, what: 'signings' }))
  })
})

/** An order being written for 2 mg/L of a powder of its own. */
const aPowderBath = (bath: BathTank, product: { id: string; lotId: string }) =>
  aDraft(
    api,
    house.fieldsOf(bath, {
      productId: product.id,
      lotId: product.lotId,
      target: { value: '2', unit: 'mg/L' },
      basis: 'active',
      division: { value: '0.01', unit: 'g' },
    }),
  )

describe('a kept row that another hand changed', () => {
  const found = async (what: string, at: string) =>
    (await rowFaults()).filter((fault) => fault.what === what && fault.at.startsWith(at))

  it('is reported: the amount of a dose, a hold made a lift, the end of a bath, a row put in', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const dose = api.nextId()
    // the record opens a discrepancy as well, which is another act of the same moment
    await house.record(number, { id: dose, amount: { value: '500', unit: 'mL' } }).expect(201)
    const stop = api.nextId()
    await house.technician.agent
      .post(`/api/doses/${dose}/stop`)
      .send({ id: stop, cause: 'time-up', happenedAt: '2026-12-01T18:25:00Z' })
      .expect(201)
    const hold = api.nextId()
    await house.technician.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: hold, happenedAt: '2026-12-01T18:25:00Z' })
      .expect(201)
    expect(await found('changed', 'doses ')).toEqual([])
    await byHand([`UPDATE doses SET amount_entered_value = 21.8 WHERE id = $1`, dose])
    const [amount] = await found('changed', `doses ${dose}`)
    expect(amount?.detail).toContain('dose.recorded')
    expect(amount?.detail).toContain(number)
    const shown = (await house.technician.agent.get(house.doseAt(number)).expect(200)).body.recorded[0]
    expect(shown).toMatchObject({ record: 'broken', amountText: null })
    expect(shown.exceptions[0].title).toBe('Not what was recorded')
    const order = (await house.technician.agent.get(`/api/orders/${number}`).expect(200)).body
    expect(order.calendar[0].records).toMatchObject([{ record: 'broken' }])
    const print = await house.technician.agent.get(`/api/orders/${number}/print`).buffer(true).expect(200)
    const paper = textOf(print.body as Buffer).replaceAll(/\s+/g, ' ')
    expect(paper).toContain('Not what was recorded')
    expect(paper).not.toContain('21.8')
    const today = JSON.stringify((await house.technician.agent.get('/api/today').expect(200)).body)
    expect(today).toContain('not what was recorded')
    expect(today).not.toContain('21.8')
    await byHand([`UPDATE order_events SET kind = 'hold-lifted' WHERE id = $1`, hold])
    expect(await found('changed', `order_events ${hold}`)).toHaveLength(1)
    await byHand([`DELETE FROM bath_stops WHERE id = $1`, stop])
    expect(await found('missing', `bath_stops ${stop}`)).toHaveLength(1)
    await byHand([
      `INSERT INTO order_events (id, order_id, kind, happened_at, happened_on, recorded_at, recorded_by)
       SELECT gen_random_uuid(), e.order_id, 'hold-lifted', e.happened_at, e.happened_on, e.recorded_at, e.recorded_by
         FROM order_events e WHERE e.id = $1`,
      hold,
    ])
    expect(await found('not-by-the-program', 'order_events ')).toHaveLength(1)
  })

  it('is reported of what a dose is worked out from: a product, an enclosure, a draft; no later act hides it', async () => {
    const bath = await house.tankWithSchool()
    const product = await aProduct(api, {})
    const draft = await aPowderBath(bath, product)
    const { agent } = house.technician
    const listed = async () => {
      const { products } = (await agent.get('/api/formulary').expect(200)).body
      return products.find((one: { id: string }) => one.id === product.id)
    }
    const setUse = async (inUse: boolean) =>
      agent
        .put(`/api/products/${product.id}`)
        .set('Idempotency-Key', newKey())
        .send({ expectedVersion: (await listed()).version, inUse })
        .expect(200)
    await setUse(false)
    await setUse(true)
    expect(await found('changed', 'products ')).toEqual([])
    expect((await listed()).record).toBe('intact')

    await byHand([`UPDATE products SET strength_entered_value = 50 WHERE id = $1`, product.id])
    const at = `products ${product.id}`
    expect(await found('changed', at)).toMatchObject([
      { detail: expect.stringContaining('product.set-use, Praziquantel powder') },
    ])
    const vet = await api.as('veterinarian')
    const order = (await vet.agent.get(`/api/orders/${draft.number}`).expect(200)).body
    const preview = (await vet.agent.post('/api/order-previews').send(order.draft).expect(200)).body
    expect([preview.amount, preview.refusal.code]).toEqual([null, 'not-as-entered'])
    const signed = await signDraft(api, draft)
    expect([signed.status, signed.body.code]).toEqual([409, 'not-as-entered'])
    expect(signed.body.detail).toContain('have it entered anew')
    await setUse(false)
    expect(await found('changed', at)).toHaveLength(1)
    expect((await listed()).record).toBe('broken')

    await byHand([`UPDATE enclosures SET air_space = 'another' WHERE id = $1`, bath.tank.id])
    expect(await found('changed', `enclosures ${bath.tank.id}`)).toHaveLength(1)
    await byHand([`UPDATE orders SET draft_text = replace(draft_text, '"2"', '"4"') WHERE id = $1`, draft.id])
    expect(await found('changed', `orders ${draft.id}`)).toHaveLength(1)
    const put = api.nextId()
    await byHand([
      `INSERT INTO products SELECT $2, agent, 'Put in', form, 25, strength_entered_unit, strength_basis,
              density_g_per_ml, in_use, recorded_at, recorded_by, 1 FROM products WHERE id = $1`,
      product.id,
      put,
    ])
    expect(await found('not-by-the-program', `products ${put}`)).toHaveLength(1)
  })

  it('is no volume to sign a dose by', async () => {
    const bath = await house.tankWithSchool()
    const draft = await aDraft(api, house.fieldsOf(bath))
    await byHand([
      `UPDATE volume_determinations SET net_volume_litres = net_volume_litres * 0.5 WHERE id IN
         (SELECT b.determination_id FROM volume_determination_bodies b WHERE b.water_body_id = $1)`,
      bath.tank.waterBodyId,
    ])
    const signed = await signDraft(api, draft)
    expect([signed.status, signed.body.detail]).toEqual([409, expect.stringContaining('Determine it anew')])
  })

  it('is no volume to sign a dose by when other bodies were put under it', async () => {
    const bath = await house.tankWithSchool()
    const draft = await aDraft(api, house.fieldsOf(bath))
    await byHand([
      `UPDATE volume_determination_bodies SET water_body_id = (SELECT id FROM water_bodies WHERE id <> $1 LIMIT 1)
        WHERE water_body_id <> $1 AND determination_id IN
          (SELECT b.determination_id FROM volume_determination_bodies b WHERE b.water_body_id = $1)`,
      bath.tank.waterBodyId,
    ])
    const signed = await signDraft(api, draft)
    expect([signed.status, signed.body.code]).toEqual([
      409,
      expect.stringMatching(/not-as-entered|order-incomplete/),
    ])
  })

  it('is no dose line to hold an order against, though the order names none', async () => {
    const bath = await house.tankWithSchool()
    const draft = await aDraft(api, house.fieldsOf(bath, { doseLineId: null }))
    await byHand([`UPDATE dose_lines SET high = high * 100 WHERE agent = 'formalin'`])
    const signed = await signDraft(api, draft)
    expect([signed.status, signed.body.detail]).toEqual([
      409,
      expect.stringContaining('dose line of this drug'),
    ])
    await byHand([`UPDATE dose_lines SET high = high / 100 WHERE agent = 'formalin'`])
  })

  it('is no lot to sign a dose by when its recall was taken away', async () => {
    const bath = await house.tankWithSchool()
    const product = await aProduct(api, {})
    const draft = await aPowderBath(bath, product)
    const vet = await api.as('veterinarian')
    const recall = api.nextId()
    await vet.agent
      .post(`/api/lots/${product.lotId}/events`)
      .send({ id: recall, kind: 'recalled', happenedAt: '2026-12-01T17:00:00Z', note: 'by its maker' })
      .expect(201)
    await byHand([`DELETE FROM lot_events WHERE id = $1`, recall])
    const signed = await signDraft(api, draft)
    expect([signed.status, signed.body.detail]).toEqual([
      409,
      expect.stringContaining('This lot is not what'),
    ])
  })

  it('is reported though it bears a time before anything else was written', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const hold = api.nextId()
    await house.technician.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: hold, happenedAt: '2026-12-01T18:25:00Z' })
      .expect(201)
    const put = api.nextId()
    await byHand([
      `INSERT INTO order_events (id, order_id, kind, happened_at, happened_on, recorded_at, recorded_by)
       SELECT $2, e.order_id, 'hold-lifted', e.happened_at, e.happened_on, '2020-01-01T00:00:00Z', e.recorded_by
         FROM order_events e WHERE e.id = $1`,
      hold,
      put,
    ])
    expect(await found('not-by-the-program', `order_events ${put}`)).toHaveLength(1)
  })

  it('is reported where the row has no id of its own, as of whom an order treats', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const rows = await owner.query<{ key: string }>(
      `SELECT a.animal_id || '/' || a.order_version_id AS key FROM order_version_animals a
         JOIN order_versions v ON v.id = a.order_version_id JOIN orders o ON o.id = v.order_id WHERE o.number = $1`,
      [number],
    )
    const at = `order_version_animals ${String(rows.rows[0]?.key)}`
    expect((await rowFaults()).filter((fault) => fault.at === at)).toEqual([])
    const [animalId, versionId] = String(rows.rows[0]?.key).split('/')
    await byHand([
      `INSERT INTO order_version_animals (order_version_id, animal_id, taxon_id)
       SELECT a.order_version_id, gen_random_uuid(), a.taxon_id FROM order_version_animals a
        WHERE a.animal_id = $1 AND a.order_version_id = $2`,
      animalId,
      versionId,
    ])
    expect(await found('not-by-the-program', 'order_version_animals ')).toHaveLength(1)
    await byHand([
      `DELETE FROM order_version_animals WHERE animal_id = $1 AND order_version_id = $2`,
      animalId,
      versionId,
    ])
    expect(await found('missing', at)).toHaveLength(1)
  })

  it('is reported of a signed clearance: its text against its columns, and a pointer that leads nowhere', async () => {
    const one = await aClearableCase(api)
    await clear(await api.as('veterinarian'), one).expect(200)
    expect(await caseFaults()).toEqual([])
    const event = `kind = 'cleared' AND case_id = (SELECT id FROM quarantine_cases WHERE number = '${one.number}')`
    await byHand([`UPDATE case_events SET happened_on = happened_on - 1 WHERE ${event}`])
    expect(await caseFaults()).toMatchObject([{ at: one.number, what: 'signature' }])
    await byHand([`UPDATE case_events SET happened_on = happened_on + 1 WHERE ${event}`])
    expect(await caseFaults()).toEqual([])
    await byHand([`UPDATE case_events SET signed_text_id = gen_random_uuid() WHERE ${event}`])
    expect(await caseFaults()).toHaveLength(2)
    expect(await found('changed', 'case_events ')).toHaveLength(1)
  })
})
