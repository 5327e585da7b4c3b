import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aBathWater, aDraft, aProduct, aSchool, bathFields, signDraft } from '../builders/an-order.ts'
import { layoutOf, pageCount, textOf } from '../pdf/support/poppler.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let fields: ReturnType<typeof bathFields>
beforeAll(async () => {
  api = await startApi()
  const tank = await aBathWater(api, 'QT-3')
  const school = await aSchool(api, tank.id, 1)
  const product = await aProduct(api, {})
  fields = bathFields({
    enclosureId: tank.id,
    animalIds: [school.id],
    productId: product.id,
    lotId: product.lotId,
  })
})
afterAll(() => api.stop())

async function aSigned(given: object = {}) {
  const draft = await aDraft(api, { ...fields, ...given })
  const signed = await signDraft(api, draft)
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  return { number: draft.number, hash: signed.body.versions[0].signature.hash as string }
}

const printed = async (path: string) => fetchPdf(await api.as('technician'), path)

const check = async (hash: string) =>
  (await (await api.as('keeper')).agent.get(`/api/checks/${hash.slice(0, 16)}`).expect(200)).body

describe('a printed order that is looked up', () => {
  it('still stands, then is held, stands again, and is superseded by an amended version', async () => {
    const { number, hash } = await aSigned()
    await printed(`/api/orders/${number}/print`)
    expect(await check(hash)).toMatchObject({
      state: 'current',
      now: null,
      prints: [{ kind: 'treatment-order', subject: number, version: '1' }],
    })
    const keeper = await api.as('keeper')
    await keeper.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:19:00Z' })
      .expect(201)
    expect((await check(hash)).state).toBe('held')
    const { agent } = await api.as('veterinarian')
    await agent
      .post(`/api/orders/${number}/hold-lift`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'looked at, breathing well' })
      .expect(200)
    expect((await check(hash)).state).toBe('current')
    const order = await agent.get(`/api/orders/${number}`).expect(200)
    const amended = await agent
      .put(`/api/orders/${number}/draft`)
      .send({
        expectedVersion: order.body.version,
        fields: { ...fields, stopIf: 'any fish lies on its side or gasps' },
      })
      .expect(200)
    expect((await signDraft(api, { number, version: amended.body.version })).status).toBe(201)
    expect(await check(hash)).toMatchObject({ state: 'superseded', now: '2' })
  })

  it('is discontinued once a veterinarian has ended it', async () => {
    const { number, hash } = await aSigned()
    await printed(`/api/orders/${number}/print`)
    const { agent } = await api.as('veterinarian')
    await agent
      .post(`/api/orders/${number}/discontinuation`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'mounts clean' })
      .expect(200)
    expect(await check(hash)).toMatchObject({ state: 'discontinued', now: null })
  })

  it('has a box for the pen only at doses that nobody recorded', async () => {
    const tank = await aBathWater(api, 'QT-5')
    const school = await aSchool(api, tank.id, 2)
    const { number } = await aSigned({
      enclosureId: tank.id,
      animalIds: [school.id],
      doses: 2,
      intervalHours: 48,
    })
    const record = async (role: 'keeper' | 'technician', value: string) => {
      const { agent } = await api.as(role)
      const given = { kind: 'recorded', happenedAt: '2026-12-01T18:20:00Z', lotId: fields.lotId }
      await agent
        .post(`/api/orders/${number}/doses/1/record`)
        .send({ id: api.nextId(), ...given, amount: { value, unit: 'g' } })
        .expect(201)
    }
    await record('keeper', '43.6')
    await record('technician', '4.36')
    const bytes = await printed(`/api/orders/${number}/print`)
    const table = layoutOf(bytes).split(/Given\n/)[1] ?? ''
    // a second record of the same dose hides nothing of the first, and nobody calculated either of them again
    expect(table).toMatch(/^ *1 .*none +43\.6 g, .* 1 Dec 2026/m)
    expect(table).toMatch(/^ *1 .*none +4\.36 g, .* 1 Dec 2026, .*Test/m)
    expect(table.match(/recorded *\n? *as given|as given/g)).toHaveLength(2)
    const text = textOf(bytes).replace(/\s+/g, ' ')
    expect(text).toMatch(/Dose 1, 1 Dec 2026, 14:20: [^.]*43\.6 g/)
    expect(table).toMatch(/^ *2 .* g +g *$/m)
  })

  it('says what the working comes to unrounded and what the balance makes of it', async () => {
    const { number } = await aSigned()
    const text = textOf(await printed(`/api/orders/${number}/print`)).replace(/\s+/g, ' ')
    // 2,181.4 L × 2 mg/L = 4.3628 g, worked by hand
    expect(text).toMatch(
      /Unrounded 4\.36\d+ g\. The balance or measure reads to 0\.01 g, so 4\.36 g is weighed/,
    )
  })

  it('comes out even where somebody wrote what the typeface lacks, spelled out', async () => {
    const { number } = await aSigned({ problem: 'Flukes 🐟 on mount' })
    expect(textOf(await printed(`/api/orders/${number}/print`))).toContain('Flukes [U+1F41F] on mount')
  })
})

describe('a printed bath sheet', () => {
  it('says what to weigh with its working, what has to be true, when to stop, and has lines for the pen', async () => {
    // in water of its own, so that no other order adds a caution
    const tank = await aBathWater(api, 'QT-6')
    const school = await aSchool(api, tank.id, 3)
    const { number, hash } = await aSigned({ enclosureId: tank.id, animalIds: [school.id] })
    const bytes = await printed(`/api/orders/${number}/doses/1/print`)
    // the last page is the one that the second person gets: it has no amount on it
    expect(pageCount(bytes)).toBe(2)
    expect(textOf(bytes, 1)).not.toContain('Second person')
    expect(textOf(bytes, 2)).toContain('Second person')
    expect(textOf(bytes, 2)).not.toMatch(/4\.36|2,181/)
    expect(textOf(bytes, 1).replace(/\s+/g, ' ')).toMatch(
      /Unrounded 4\.36\d+ g\. The balance or measure reads to 0\.01 g, so 4\.36 g is weighed/,
    )
    // a stop that stands in the way is said once, in its own look
    expect(textOf(bytes).match(/Oxygen is not known\. Oxygen was not read/g)).toHaveLength(1)
    expect(textOf(bytes).match(/No reading of (oxygen|temperature)/g)).toHaveLength(2)
    const text = textOf(bytes)
    let from = 0
    for (const part of [
      'Harrow Point Sea Hall',
      'Bath sheet',
      `${number}, version 1, dose 1 of 1`,
      'QT-6',
      // 2,181.4 L × 2 mg/L = 4.3628 g, worked by hand; 0.01 g is the balance's step
      '4.36 g',
      'The amount as signed is the same.',
      'STOP IF',
      'any fish lies on its side',
      'Stands in the way',
      'Before the first gram',
      'not known when printed',
      'Working of the amount',
      'Two calculations',
      'Weighed or measured',
      'Time up at',
      'Seen during the bath',
      'Second person',
      'Signed as author of this order',
      'Decision support for licensed professionals',
    ]) {
      const at = text.indexOf(part, from)
      expect(at, `"${part}" after "${text.slice(Math.max(0, from - 60), from)}"`).toBeGreaterThanOrEqual(0)
      from = part === 'Bath sheet' ? at : at + part.length
    }
    expect(text).toContain('Not ready when this was printed')
    expect(await check(hash)).toMatchObject({
      state: 'current',
      prints: [{ kind: 'bath-sheet', subject: number }],
    })
  })

  it('says on every page that the order is held, and is not for people who may not print orders', async () => {
    const { number } = await aSigned()
    const keeper = await api.as('keeper')
    await keeper.agent
      .post(`/api/orders/${number}/holds`)
      .send({ id: api.nextId(), happenedAt: '2026-12-01T18:19:00Z' })
      .expect(201)
    const bytes = await printed(`/api/orders/${number}/doses/1/print`)
    for (let page = 1; page <= pageCount(bytes); page++)
      expect(textOf(bytes, page)).toContain('Held. Do not dose until a veterinarian lifts the hold.')
    const registrar = await api.as('registrar')
    await registrar.agent.get(`/api/orders/${number}/doses/1/print`).expect(403)
    await keeper.agent.get(`/api/orders/${number}/doses/9/print`).expect(404)
  })

  it('is told to wait while too much is printed at once', async () => {
    const { number } = await aSigned()
    await api.composition.parts.pdf.close()
    const { agent } = await api.as('technician')
    const reply = await agent.get(`/api/orders/${number}/doses/1/print`)
    expect(reply.status).toBe(503)
    expect(reply.body.code).toBe('print-busy')
  })
})
