import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { verifyOrders } from '../../server/features/orders/index.ts'
import { aTaxon, anAnimal } from '../builders/a-collection.ts'
import { aTankAndSumpSheet, anEnclosure } from '../builders/a-water.ts'
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

describe('what may be signed: an order', () => {
  it('is signed by nobody whose licence was made longer in the database', async () => {
    const lengthen = (days: number) =>
      owner
        .query(`SET session_replication_role = replica`)
        .then(() => owner.query(`UPDATE licences SET valid_until = valid_until + $1::int`, [days]))
    const draft = await aDraft(api, praziFields({}))
    await lengthen(365)
    expect((await signDraft(api, draft)).body.code).toBe('licence-not-valid')
    await lengthen(-365)
    await owner.query(`SET session_replication_role = DEFAULT`)
  })

  it('with a figure far beyond every dose line of the drug is signed by nobody, whether it names one or not', async () => {
    const { lines } = (await (await api.as('veterinarian')).agent.get('/api/formulary').expect(200)).body
    const short = lines.find((line: { use: string }) => line.use === 'flukes-short')
    for (const doseLineId of [null, short.id]) {
      const fields = praziFields({ target: { value: '2000', unit: 'mg/L' }, doseLineId })
      const draft = await aDraft(api, fields)
      const signed = await signDraft(api, draft, {
        overrides: ['R26', 'R47', 'R49'].map((ruleId) => ({ ruleId, reason: 'meant so' })),
      })
      expect(signed.body).toMatchObject({
        code: 'caution-stops',
        cautions: [{ ruleId: 'R47', code: 'beyond-every-line', overridable: false }],
      })
    }
    // ten times the line that was meant: a stop, whether the line is named or left out
    for (const doseLineId of [null, short.id])
      expect(
        (await preview(praziFields({ target: { value: '100', unit: 'mg/L' }, doseLineId }))).cautions,
      ).toContainEqual(expect.objectContaining({ ruleId: 'R26', level: 'stop', overridable: true }))
  })

  it('is held against water and contact of its dose line, and of the lines that fit where it names none', async () => {
    const { lines } = (await (await api.as('veterinarian')).agent.get('/api/formulary').expect(200)).body
    const lineOf = (use: string) => lines.find((line: { use: string }) => line.use === use).id
    const fired = async (given: object) =>
      (await preview(praziFields(given))).cautions
        .filter(({ ruleId }: { ruleId: string }) => ['R26', 'R49'].includes(ruleId))
        .map(({ level, code }: { level: string; code: string }) => `${level} ${code}`)
    const short = { doseLineId: lineOf('flukes-short'), target: { value: '10', unit: 'mg/L' } }
    const timed = (contactMinutes: number) => ({ timing: 'timed', contactMinutes })
    expect(await fired({ ...short, ...timed(2880) })).toEqual([])
    expect(await fired({ ...short, ...timed(2881) })).toEqual(['warning contact-over-line'])
    expect(await fired({ ...short, ...timed(5761) })).toEqual(['stop contact-far-over-line'])
    expect(await fired(short)).toEqual(['stop left-in-over-line'])
    const tricaine = await aProduct(api, {
      agent: 'tricaine',
      productName: 'Tricaine',
      strengthBasis: 'salt',
    })
    const asleep = {
      productId: tricaine.id,
      lotId: tricaine.lotId,
      basis: 'salt',
      target: { value: '75', unit: 'mg/L' },
    }
    // an anaesthetic is watched, and has an end
    expect(await fired({ ...asleep, doseLineId: lineOf('sedation') })).toEqual(['stop left-in-bath-line'])
    expect(await fired(asleep)).toEqual(['stop no-line-fits'])
    expect(await fired({ ...asleep, doseLineId: lineOf('sedation'), ...timed(20) })).toEqual([])
    // a day is as many baths as are planned, and no more than its hours
    const course = (doses: number, intervalHours: number) => ({
      ...asleep,
      doseLineId: lineOf('sedation'),
      ...timed(60),
      doses,
      intervalHours,
    })
    expect(await fired(course(2, 2))).toEqual(['warning contact-over-untimed-line'])
    expect(await fired(course(3, 2))).toEqual(['stop contact-far-over-untimed-line'])
    expect(await fired({ ...short, ...timed(1000), doses: 6, intervalHours: 8 })).toEqual([])
    // left out, the line loosens nothing: only the one for what stays in sea water counts
    expect(await fired({ target: { value: '20', unit: 'mg/L' } })).toEqual(['stop far-over-default'])
    expect(await fired({ target: { value: '10', unit: 'mg/L' }, ...timed(2880) })).toEqual([
      'warning line-not-named',
    ])
    const pond = await aBathWater(api, 'QT-11')
    const fish = await aSchool(api, pond.id, 11)
    const inFresh = {
      enclosureId: pond.id,
      animalIds: [fish.id],
      stated: { ...bathFields({ enclosureId: pond.id }).stated, waterKind: 'fresh' },
    }
    expect(await fired(inFresh)).toEqual(['stop no-line-fits'])
    const prolonged = { ...inFresh, doseLineId: lineOf('flukes-prolonged') }
    expect(await fired(prolonged)).toEqual(['stop line-of-other-water'])
    const draft = await aDraft(api, praziFields(prolonged))
    const refused = await signDraft(api, draft)
    expect(refused.body).toMatchObject({
      code: 'caution-stops',
      cautions: [{ ruleId: 'R49', code: 'line-of-other-water', overridable: true }],
    })
    expect((await shownCautions(api, draft.number)).find(({ ruleId }) => ruleId === 'R49')?.text).toBe(
      'The dose line is for sea water. This is fresh water.',
    )
    const reason = 'the only figure there is; watched through the whole bath'
    expect((await signDraft(api, draft, { overrides: [{ ruleId: 'R49', reason }] })).status).toBe(201)
  })

  it('refuses a dose line of another drug, and one that nobody confirmed', async () => {
    const { agent } = await api.as('technician')
    const { lines } = (await agent.get('/api/formulary').expect(200)).body
    const lineOf = (use: string) => lines.find((line: { use: string }) => line.use === use)
    const other = praziFields({ doseLineId: lineOf('sedation').id })
    for (const send of [
      agent.post('/api/orders').send({ id: api.nextId(), fields: other }),
      agent.post('/api/order-previews').send(other),
    ]) {
      const refused = await send.expect(422)
      expect(refused.body.code).toBe('dose-line-not-usable')
      expect(refused.body.detail).toContain('tricaine')
    }
    const proposed = api.nextId()
    await agent
      .post('/api/dose-lines')
      .send({
        id: proposed,
        supersedesId: lineOf('flukes-short').id,
        low: null,
        high: 2000,
        longestContactMinutes: 60,
        reason: 'read in an abstract',
      })
      .expect(201)
    const refused = await agent
      .post('/api/order-previews')
      .send(praziFields({ doseLineId: proposed }))
      .expect(422)
    expect(refused.body.detail).toContain('waits to be confirmed')
  })

  it('takes answers only to cautions that stand, in the words that they stand in', async () => {
    const draft = await aDraft(api, praziFields())
    const { agent } = await api.as('veterinarian')
    const shown = await shownCautions(api, draft.number)
    const read = shown.map(({ ruleId, code, text }) => ({ ruleId, code, text }))
    const sign = (more: object) =>
      agent
        .post(`/api/orders/${draft.number}/signature`)
        .set('Idempotency-Key', newKey())
        .send({ password, relationship: true, expectedVersion: draft.version, read, overrides: [], ...more })
    // a reason kept for later: the lot is judged at the dose, and no veterinarian has seen it recalled
    const ahead = {
      ruleId: 'R34',
      code: 'lot-recalled',
      text: 'The lot was recalled.',
      reason: 'just in case',
    }
    const early = await sign({ overrides: [ahead] })
    expect(early.status).toBe(409)
    expect(early.body).toMatchObject({ code: 'caution-not-fired', answers: [{ ruleId: 'R34' }] })
    const [first, ...rest] = read
    expect((await sign({ read: [{ ...first, text: 'Something milder.' }, ...rest] })).body.code).toBe(
      'caution-not-fired',
    )
    const signed = await sign({})
    expect(signed.status).toBe(201)
    expect(signed.body.versions[0].content.read).toEqual(read)
  })

  it('takes a signed override for the finding and the facts that it was given for, and for nothing else', async () => {
    const water = await aBathWater(api, 'QT-9')
    const formalin = await aProduct(api, {
      agent: 'formalin',
      productName: 'Formalin 37 %',
      form: 'liquid',
      strength: { value: '37', unit: 'percent_w_w' },
      density: { value: '1.08', unit: 'g/mL' },
    })
    const draft = await aDraft(
      api,
      bathFields({
        enclosureId: water.id,
        animalIds: [(await aSchool(api, water.id, 9)).id],
        productId: formalin.id,
        lotId: formalin.lotId,
        target: { value: '260', unit: 'uL/L' },
        basis: 'product',
        timing: 'timed',
        contactMinutes: 45,
        division: { value: '1', unit: 'mL' },
        startsAt: '2026-12-01T18:20:00Z',
      }),
    )
    const reason = 'a resistant strain; watched through the whole bath'
    const signed = await signDraft(api, draft, { overrides: [{ ruleId: 'R05', reason }] })
    expect(signed.status).toBe(201)
    const tech = await api.as('technician')
    const sheetNow = async () => {
      const { body } = await tech.agent.get(`/api/orders/${draft.number}/doses/1`).expect(200)
      const ceiling = body.cautions.find((one: { ruleId: string }) => one.ruleId === 'R05')
      return { ceiling, stops: body.why.filter((why: string) => why.startsWith(ceiling.title)).length }
    }
    expect(await sheetNow()).toMatchObject({
      stops: 0,
      ceiling: { level: 'stop', overridden: { by: 'Test veterinarian', reason } },
    })
    const print = await tech.agent.get(`/api/orders/${draft.number}/doses/1/print`).buffer(true).expect(200)
    expect(textOf(print.body as Buffer)).toContain('Overridden by Test veterinarian')
    // shrimp have come into the water since: the same rule, another ceiling, and nobody has answered that
    const shrimp = await aTaxon(api, {
      scientificName: 'Penaeus monodon',
      commonName: 'Tiger prawn',
      group: 'penaeid-shrimp',
    })
    await anAnimal(api, { taxonId: shrimp, enclosureId: water.id })
    expect(await sheetNow()).toMatchObject({ stops: 1, ceiling: { level: 'stop', overridden: null } })
  })

  it('is broken when what is stored beside the text was changed in the database, and says so wherever it is shown', async () => {
    const draft = await aDraft(api, praziFields())
    expect((await signDraft(api, draft)).status).toBe(201)
    const { agent } = await api.as('technician')
    const url = `/api/orders/${draft.number}`
    const listed = async () =>
      (await agent.get(`/api/orders?q=${draft.number}`).expect(200)).body.rows[0] as Record<string, unknown>
    const verify = () =>
      verifyOrders(api.composition.parts.dataSource, api.composition.signing.service.signer)
    expect(await listed()).toMatchObject({ record: 'intact', amountText: '4.36\u00a0g' })
    expect((await verify()).faults).toEqual([])
    const change = (set: string) =>
      owner.query(`UPDATE order_versions SET ${set} WHERE order_id = $1`, [draft.id])
    const other = await aSchool(api, tank.id, 2)
    const sealWith = (signature: string) =>
      owner.query(`UPDATE signed_texts SET signature = $2 WHERE subject_id = $1`, [draft.id, signature])
    const { rows: seals } = await owner.query<{ signature: string }>(
      `SELECT signature FROM signed_texts WHERE subject_id = $1`,
      [draft.id],
    )
    await sealWith(Buffer.alloc(64, 7).toString('base64'))
    expect(await listed()).toMatchObject({ record: 'broken', amountText: null, targetText: null })
    await sealWith(String(seals[0]?.signature))
    expect(await listed()).toMatchObject({ record: 'intact' })
    for (const [set, back, name] of [
      ['amount_entered_value = 43.6', 'amount_entered_value = 4.36', 'amount_entered_value'],
      ["starts_at = starts_at + interval '1 day'", "starts_at = starts_at - interval '1 day'", 'starts_at'],
      ['doses = 3', 'doses = 1', 'doses'],
    ] as const) {
      await change(set)
      // no figure is given where something differs
      expect(await listed()).toMatchObject({
        record: 'broken',
        amountText: null,
        targetText: null,
        doses: 1,
        startsAt: '2026-12-01T19:00:00.000Z',
      })
      expect((await agent.get(url).expect(200)).body).toMatchObject({
        record: 'broken',
        versions: [{ signature: { state: 'broken' } }],
      })
      expect((await agent.get(`${url}/doses/1`).expect(200)).body).toMatchObject({
        state: 'broken',
        mayStart: false,
      })
      const first = await agent
        .post(`${url}/doses/1/first-calculation`)
        .send({ id: api.nextId(), lotId: prazi.lotId })
      expect(first.body.code).toBe('broken-record')
      expect((await verify()).faults).toEqual([
        { at: `${draft.number} version 1`, what: 'copies', detail: name },
      ])
      await change(back)
    }
    await owner.query(
      `UPDATE order_version_animals SET animal_id = $2
        WHERE order_version_id = (SELECT id FROM order_versions WHERE order_id = $1)`,
      [draft.id, other.id],
    )
    expect((await verify()).faults).toMatchObject([{ what: 'copies', detail: 'animals' }])
    const print = await agent.get(`${url}/print`).buffer(true).expect(200)
    expect(textOf(print.body as Buffer)).toContain('Record check failed')
    // a text that nothing can read: broken, with no date of its own invention
    await owner.query(`UPDATE signed_texts SET text = 'x' || text WHERE subject_id = $1`, [draft.id])
    expect(await listed()).toMatchObject({ record: 'broken', amountText: null, phase: 'not-started' })
    const shown = (await agent.get(url).expect(200)).body.versions[0]
    expect(shown).toMatchObject({ content: null, signature: { state: 'broken', licence: null } })
    // and nothing to dose by on its sheet, where what has happened is still recorded
    expect((await agent.get(`${url}/doses/1`).expect(200)).body).toMatchObject({
      state: 'broken',
      mayStart: false,
      signedAmountText: null,
      amountNow: null,
    })
  })
})

describe('a volume far from the one before', () => {
  it('is confirmed only by somebody who says that it was measured again, and errors above the water are refused', async () => {
    const alone = await anEnclosure(api, 'QT-10')
    const technician = await api.as('technician')
    const [tankPart] = aTankAndSumpSheet.parts
    const send = (sheet: object, happenedAt: string) => {
      const id = api.nextId()
      return technician.agent
        .post('/api/enclosures/QT-10/volumes')
        .send({ id, happenedAt, waterBodyIds: [alone.waterBodyId], sheet })
        .then((reply) => ({ id, reply }))
    }
    const of = (depth: string) => ({
      method: 'geometry' as const,
      parts: [{ ...tankPart, shape: { ...tankPart?.shape, depth: { value: depth, unit: 'm' } } }],
      pipes: [],
    })
    const vet = await api.as('veterinarian')
    const confirm = (id: string, given: object = {}) =>
      vet.agent.post(`/api/volumes/${id}/confirmation`).set('Idempotency-Key', newKey()).send(given)
    const before = await send(of('0.68'), '2026-12-01T14:00:00Z')
    expect((await confirm(before.id)).status).toBe(200)
    // the depth typed a decimal place off
    const later = await send(of('6.80'), '2026-12-01T15:00:00Z')
    const refused = await confirm(later.id)
    expect([refused.status, refused.body.code]).toEqual([409, 'volume-differs'])
    expect(refused.body.detail).toContain('decimal point')
    const seen = await confirm(later.id, { differenceSeen: true })
    expect(seen.status).toBe(200)
    // 2.40 m × 1.20 m × 0.68 m
    const now = await api.composition.water.questions.connectedWaterAt(alone.id, api.clock.now())
    expect(now?.volume).toMatchObject({ netVolumeLitres: 19_584, previousLitres: 1958.4 })
    const displacement = { by: 'share', share: { value: '60', unit: 'percent' }, errorPercent: 100 }
    const { reply } = await send({ ...of('0.68'), displacement }, '2026-12-01T15:30:00Z')
    expect([reply.status, reply.body.errors?.[0]?.code]).toEqual([422, 'error-above-volume'])
  })
})
