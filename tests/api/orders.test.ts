import { execFileSync } from 'node:child_process'
import { mkdtempSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { parse } from 'csv-parse/sync'
import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { SignedBathOrder } from '../../shared/contracts/signed-order.ts'
import { aTaxon, anAnimal } from '../builders/a-collection.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  answersTo,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import { newKey, password, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let owner: pg.Client
let tank: BuiltEnclosure & { sumpId: string }
let school: { id: string; accession: string }
let prazi: { id: string; lotId: string }
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  await api.composition.formulary.service.loadDefaults()
  tank = await aBathWater(api, 'QT-3')
  school = await aSchool(api, tank.id, 1)
  prazi = await aProduct(api, {})
  await readingsNow(api, tank.waterBodyId, {
    'dissolved-oxygen': ['6.9', 'mg/L'],
    temperature: ['23.4', 'degC'],
    salinity: ['33.1', 'PSS-78'],
    ph: ['8.1', 'pH'],
    alkalinity: ['2.4', 'meq/L'],
  })
})
afterAll(async () => {
  await owner.end()
  await api.stop()
})

const praziFields = (given: object = {}) =>
  bathFields({
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: prazi.id,
    lotId: prazi.lotId,
    ...given,
  })
const preview = async (fields: object) => {
  const { agent } = await api.as('veterinarian')
  return (await agent.post('/api/order-previews').send(fields).expect(200)).body
}

describe('an order for a bath', () => {
  it('works the amount out from the connected water, with its working and range', async () => {
    const shown = await preview(praziFields())
    // 2 mg/L × 2,181.4 L = 4.3628 g (worked by hand); ± 2 % and the displacement's own error in the range
    expect(shown.amount.unrounded).toBeCloseTo(4.3628, 9)
    expect(shown.amount).toMatchObject({ measured: { value: '4.36', unit: 'g' }, text: '4.36\u00a0g' })
    expect(shown.water.bodies.sort()).toEqual(['QT-3', 'S-QT-3'])
    expect(shown.working.length).toBeGreaterThan(1)
    expect(shown.water.animals).toMatchObject([{ accession: school.accession, treated: true }])
    expect(shown.missing).toEqual([])
  })

  it('says what is missing, and refuses bare ppm, zero, strength beyond reason and a target without a basis', async () => {
    expect((await preview(praziFields({ problem: '', use: null }))).missing).toHaveLength(2)
    expect((await preview(praziFields({ target: { value: '2', unit: 'ppm' } }))).refusal.code).toBe(
      'bare-ppm',
    )
    expect((await preview(praziFields({ target: { value: '0', unit: 'mg/L' } }))).refusal.code).toBe(
      'not-above-zero',
    )
    expect((await preview(praziFields({ target: { value: '-2', unit: 'mg/L' } }))).refusal).not.toBeNull()
    const without = await preview(praziFields({ basis: null }))
    expect(without.refusal.code).toBe('basis-missing')
    expect(without.cautions).toContainEqual(
      expect.objectContaining({ ruleId: 'R27', level: 'stop', overridable: false }),
    )
  })

  it('stops copper where a ray or an invertebrate shares the water, and an expired lot before the dose', async () => {
    const water = await aBathWater(api, 'QT-4')
    const fish = await aSchool(api, water.id, 2)
    const shrimp = await aTaxon(api, {
      scientificName: 'Lysmata amboinensis',
      commonName: 'Cleaner shrimp',
      group: 'crustacean',
    })
    await anAnimal(api, { taxonId: shrimp, enclosureId: water.id })
    const copper = await aProduct(
      api,
      {
        agent: 'copper-sulfate',
        productName: 'Copper sulfate pentahydrate',
        form: 'crystals',
        strength: { value: '99', unit: 'percent_w_w' },
        strengthBasis: 'salt',
      },
      '2026-11-30',
    )
    const fields = bathFields({
      enclosureId: water.id,
      animalIds: [fish.id],
      productId: copper.id,
      lotId: copper.lotId,
      target: { value: '0.15', unit: 'mg/L' },
      basis: 'free',
      division: { value: '0.001', unit: 'g' },
    })
    const shown = await preview(fields)
    expect(shown.cautions[0]).toMatchObject({ ruleId: 'R09', level: 'stop', overridable: true })
    expect(shown.cautions[0].text).toContain('Cleaner shrimp')
    expect(shown.conditions).toContainEqual(expect.objectContaining({ ruleId: 'R34', state: 'unmet' }))
    const draft = await aDraft(api, fields)
    const refused = await signDraft(api, draft)
    expect(refused.status).toBe(409)
    expect(refused.body.code).toBe('caution-stops')
    const signed = await signDraft(api, draft, {
      overrides: [{ ruleId: 'R09', reason: 'the shrimp moves to QT-5 before the first gram' }],
    })
    expect(signed.status).toBe(201)
    expect(signed.body.versions[0].content.overrides).toMatchObject([{ ruleId: 'R09' }])
  })

  it('judges formalin by its label ceiling', async () => {
    const formalin = await aProduct(api, {
      agent: 'formalin',
      productName: 'Formalin 37 %',
      form: 'liquid',
      strength: { value: '37', unit: 'percent_w_w' },
      density: { value: '1.08', unit: 'g/mL' },
    })
    const fields = (value: string) =>
      praziFields({
        productId: formalin.id,
        lotId: formalin.lotId,
        target: { value, unit: 'uL/L' },
        basis: 'product',
        timing: 'timed',
        contactMinutes: 45,
        division: { value: '1', unit: 'mL' },
      })
    // 21 CFR 529.1030: other finfish up to 250 µL/L (read in the 2015 edition)
    const over = await preview(fields('260'))
    expect(over.cautions).toContainEqual(expect.objectContaining({ ruleId: 'R05', level: 'stop' }))
    const within = await preview(fields('125'))
    expect(within.cautions.map((caution: { ruleId: string }) => caution.ruleId)).not.toContain('R05')
    // 125 µL/L × 2,181.4 L = 272.675 mL (worked by hand)
    expect(within.amount.measured).toEqual({ value: '273', unit: 'mL' })
    expect(within.conditions.map((condition: { ruleId: string }) => condition.ruleId)).toContain('R01')
    // R07: somebody looked at the bottle today; without a look, or with one of another day, nobody knows
    const storage = (shown: { conditions: { ruleId: string }[] }) =>
      shown.conditions.find((condition) => condition.ruleId === 'R07')
    expect(storage(within)).toMatchObject({ state: 'met' })
    const { agent } = await api.as('technician')
    const unseen = api.nextId()
    await agent
      .post(`/api/products/${formalin.id}/lots`)
      .send({ id: unseen, lotNumber: 'FO-2', expiresOn: '2027-03-31', receivedOn: '2026-01-10' })
      .expect(201)
    expect(storage(await preview({ ...fields('125'), lotId: unseen }))).toMatchObject({ state: 'unknown' })
    await agent
      .post(`/api/lots/${unseen}/events`)
      .send({ id: api.nextId(), kind: 'looked-at', happenedAt: '2026-11-30T14:00:00Z' })
      .expect(201)
    expect(storage(await preview({ ...fields('125'), lotId: unseen }))).toMatchObject({ state: 'unknown' })
  })

  it('says a reading with the digits of its instrument', async () => {
    const water = await aBathWater(api, 'QT-8')
    const fish = await aSchool(api, water.id, 8)
    await readingsNow(api, water.waterBodyId, { 'dissolved-oxygen': ['4.0', 'mg/L'], ph: ['9.0', 'pH'] })
    const permanganate = await aProduct(api, {
      agent: 'potassium-permanganate',
      productName: 'Potassium permanganate',
      form: 'crystals',
      strengthBasis: 'salt',
    })
    const shown = await preview(
      bathFields({
        enclosureId: water.id,
        animalIds: [fish.id],
        productId: permanganate.id,
        lotId: permanganate.lotId,
        basis: 'salt',
        stated: { ...bathFields({ enclosureId: water.id }).stated, waterKind: 'fresh' },
      }),
    )
    const alkaline = shown.cautions.find(
      (caution: { code: string }) => caution.code === 'permanganate-alkaline',
    )
    expect(alkaline.text).toContain('pH\u00a09.0')
  })

  it('is signed with password and valid licence, frozen, and found intact', async () => {
    const draft = await aDraft(api, praziFields())
    const vet = await api.as('veterinarian')
    const sign = (body: object) =>
      vet.agent.post(`/api/orders/${draft.number}/signature`).set('Idempotency-Key', newKey()).send(body)
    const whole = { password, expectedVersion: draft.version, read: [], overrides: [] }
    expect((await sign({ ...whole, password: 'wrong' })).body.code).toBe('password-wrong')
    expect((await sign({ ...whole, expectedVersion: 9 })).body.code).toBe('stale-version')
    const signed = await signDraft(api, draft)
    expect(signed.status).toBe(201)
    expect(signed.body).toMatchObject({
      phase: 'not-started',
      versionNo: 1,
      amountText: '4.36\u00a0g',
      draft: null,
    })
    const [version] = signed.body.versions
    expect(version.signature).toMatchObject({
      state: 'intact',
      printedName: 'Test veterinarian',
      meaning: 'author of this order',
      licence: { number: 'VL-20417' },
      signedOn: '2026-12-01',
    })
    expect(version.content).toMatchObject({
      number: draft.number,
      volume: { errorPercent: expect.any(Number) },
    })
    expect((await signDraft(api, { ...draft, version: draft.version + 1 })).body.code).toBe('nothing-to-sign')
    // what screens read of a signed text is all there
    expect(SignedBathOrder.parse(version.content)).toMatchObject({ targetText: '2\u00a0mg/L' })
    expect(signed.body.calendar).toMatchObject([
      { key: '1', dueAt: '2026-12-01T19:00:00.000Z', recorded: null, records: [] },
    ])
    const trail = await owner.query(`SELECT action FROM audit_entries WHERE subject_id = $1 ORDER BY seq`, [
      draft.id,
    ])
    expect(trail.rows.map((row) => row.action)).toEqual(['order.draft', 'signature.make', 'order.sign'])
  })

  it('cannot be signed by a veterinarian without a valid licence, who is told why', async () => {
    const draft = await aDraft(api, praziFields())
    const late = await api.person({
      email: 'vet2@harrow-point.example',
      printedName: 'Dr Late',
      roles: ['veterinarian'],
    })
    const reply = await late.agent
      .post(`/api/orders/${draft.number}/signature`)
      .set('Idempotency-Key', newKey())
      .send({ password, expectedVersion: draft.version, read: [], overrides: [] })
    expect(reply.status).toBe(403)
    expect(reply.body).toMatchObject({ code: 'licence-not-valid' })
    expect(reply.body.detail).toMatch(/licence/)
  })

  it('signs once for a key, and gives the same answer again', async () => {
    const draft = await aDraft(api, praziFields())
    const { agent } = await api.as('veterinarian')
    const key = newKey()
    const answers = await answersTo(api, draft.number)
    const body = { password, expectedVersion: draft.version, relationship: true, ...answers }
    const send = () =>
      agent.post(`/api/orders/${draft.number}/signature`).set('Idempotency-Key', key).send(body)
    const replies = await Promise.all([send(), send()])
    expect(replies.map((reply) => reply.status)).toEqual([201, 201])
    expect((await owner.query('SELECT 1 FROM order_versions WHERE order_id = $1', [draft.id])).rowCount).toBe(
      1,
    )
  })

  it('keeps a draft that somebody else has changed meanwhile', async () => {
    const draft = await aDraft(api, praziFields())
    const { agent } = await api.as('veterinarian')
    const save = (problem: string) =>
      agent
        .put(`/api/orders/${draft.number}/draft`)
        .send({ expectedVersion: 1, fields: praziFields({ problem }) })
    await save('first').then((reply) => expect(reply.status).toBe(200))
    const stale = await save('second')
    expect(stale.body).toMatchObject({ code: 'stale-version', current_version: 2 })
    expect((await agent.get(`/api/orders/${draft.number}`)).body.draft.problem).toBe('first')
  })

  it('is a proposal when a technician writes it, and nothing a keeper may write', async () => {
    const tech = await api.as('technician')
    const draft = await aDraft(api, praziFields(), tech)
    const order = await tech.agent.get(`/api/orders/${draft.number}`).expect(200)
    expect(order.body.phase).toBe('proposed')
    const keeper = await api.as('keeper')
    await keeper.agent.post('/api/orders').send({ id: api.nextId(), fields: praziFields() }).expect(403)
    const reader = await api.as('registrar')
    await reader.agent.get(`/api/orders/${draft.number}`).expect(200)
    await reader.agent.get(`/api/orders/${draft.number}/print`).expect(403)
  })

  it('is held by a keeper at once without password, and the hold is lifted by a veterinarian only', async () => {
    const draft = await aDraft(api, praziFields())
    await signDraft(api, draft)
    const keeper = await api.as('keeper')
    const hold = { id: api.nextId(), happenedAt: '2026-12-01T18:19:00Z' }
    const held = await keeper.agent.post(`/api/orders/${draft.number}/holds`).send(hold).expect(201)
    expect(held.body.phase).toBe('held')
    await keeper.agent.post(`/api/orders/${draft.number}/holds`).send(hold).expect(201)
    const lift = (agent: typeof keeper.agent) =>
      agent
        .post(`/api/orders/${draft.number}/hold-lift`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'seen them' })
    expect((await lift(keeper.agent)).status).toBe(403)
    const vet = await api.as('veterinarian')
    const lifted = await lift(vet.agent)
    expect(lifted.status).toBe(200)
    expect(lifted.body.phase).toBe('not-started')
    expect(lifted.body.events).toHaveLength(2)
    expect((await lift(vet.agent)).body.code).toBe('not-held')
    // a phone whose clock goes half an hour ahead holds all the same, by now; the same request again changes nothing
    api.clock.set(new Date(api.clock.now().getTime() + 60_000))
    const fast = {
      id: api.nextId(),
      happenedAt: new Date(api.clock.now().getTime() + 1_800_000).toISOString(),
    }
    const url = `/api/orders/${draft.number}/holds`
    await keeper.agent.post(url).send(fast).expect(201)
    api.clock.set(new Date(api.clock.now().getTime() + 1000))
    const again = await keeper.agent.post(url).send(fast).expect(201)
    expect(again.body).toMatchObject({
      phase: 'held',
      events: [{ kind: 'held', happenedAt: '2026-12-01T18:21:00.000Z' }, {}, {}],
    })
    // and one that comes in after the lift holds, though it was pressed before it: nobody lifted that
    api.clock.set(new Date(api.clock.now().getTime() + 60_000))
    expect((await lift(vet.agent)).body.phase).toBe('not-started')
    api.clock.set(new Date(api.clock.now().getTime() + 60_000))
    const late = { id: api.nextId(), happenedAt: '2026-12-01T18:00:00Z' }
    expect((await keeper.agent.post(url).send(late).expect(201)).body.phase).toBe('held')
    expect((await lift(keeper.agent)).status).toBe(403)
    api.clock.set(new Date('2026-12-01T18:20:00Z'))
  })

  it('prints with licence block, working, conditions and cautions, and says so when the record was changed', async () => {
    const draft = await aDraft(api, praziFields())
    await signDraft(api, draft)
    const tech = await api.as('technician')
    const textOf = async () => {
      const reply = await tech.agent.get(`/api/orders/${draft.number}/print`).buffer(true).expect(200)
      expect(reply.headers['content-type']).toBe('application/pdf')
      const folder = mkdtempSync(path.join(tmpdir(), 'order-'))
      writeFileSync(path.join(folder, 'order.pdf'), reply.body as Buffer)
      return execFileSync('pdftotext', ['-layout', path.join(folder, 'order.pdf'), '-'], {
        encoding: 'utf8',
      }).normalize('NFKC')
    }
    const text = await textOf()
    for (const words of [
      draft.number,
      '4.36 g',
      'praziquantel',
      'VL-20417',
      'Norrell Sound',
      'Decision support',
    ])
      expect(text).toContain(words)
    await owner.query(`UPDATE signed_texts SET text = replace(text, '4.36', '43.6') WHERE subject_id = $1`, [
      draft.id,
    ])
    const changed = await textOf()
    expect(changed).toContain('Record check failed')
    expect(changed).not.toMatch(/43\.6|4\.36/)
    const shown = await tech.agent.get(`/api/orders/${draft.number}`).expect(200)
    expect(shown.body).toMatchObject({ record: 'broken', amountText: null, targetText: null })
    expect(shown.body.versions[0]).toMatchObject({ content: null, signature: { state: 'broken' } })
    expect(JSON.stringify(shown.body)).not.toContain('43.6')
  })

  it('is listed by where it stands', async () => {
    const { agent } = await api.as('keeper')
    const open = await agent.get('/api/orders?phase=open&limit=3').expect(200)
    expect(open.body.rows.length).toBe(3)
    const drafts = await agent.get('/api/orders?phase=draft').expect(200)
    expect(drafts.body.rows.every((row: { phase: string }) => row.phase === 'draft')).toBe(true)
    expect(drafts.body.rows[0].agent).toBe('praziquantel')
    expect((await agent.get('/api/orders?q=nothing-like-this').expect(200)).body).toMatchObject({
      rows: [],
      total: 0,
    })
    await agent.get('/api/orders/TO-9999').expect(404)
    const csv = await agent.get('/api/orders.csv?phase=draft&sort=number&direction=asc').expect(200)
    const listed = await agent.get('/api/orders?phase=draft&sort=number&direction=asc&limit=200').expect(200)
    const rows = parse(csv.text, { columns: true, bom: true }) as { number: string }[]
    expect(rows.map((row) => row.number)).toEqual(
      listed.body.rows.map((row: { number: string }) => row.number),
    )
    expect(rows.length).toBeGreaterThan(1)
  })
})
