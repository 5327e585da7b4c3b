import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { parse } from 'csv-parse/sync'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { acquisitionBody, aPermit, newLine, permitBody } from '../builders/a-register.ts'
import type { Permit } from '../../shared/contracts/permits.contract.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let ray: string
let other: string
let tank: TestPlace
beforeAll(async () => {
  api = await startApi()
  ray = await aStingray(api, 1)
  other = await aStingray(api, 2)
  tank = await aPlace(api)
})
afterAll(() => api.stop())

const registrar = async () => (await api.as('registrar')).agent
const url = (permit: Pick<Permit, 'number'>) => `/api/register/permits/${permit.number}`
const read = async (permit: Pick<Permit, 'number'>) =>
  (await (await registrar()).get(url(permit)).expect(200)).body as Permit

/** Accessions a group under a permit. */
async function take(permit: { id: string }, quantity: number, given: object = {}, taxonId = ray) {
  const line = newLine(api, { taxonId, enclosureId: tank.id, count: quantity })
  return (await registrar()).post('/api/register/acquisitions').send(
    acquisitionBody(api, {
      stage: 'now',
      on: '2026-12-01',
      lines: [line],
      permitUses: [{ id: api.nextId(), permitId: permit.id, lineId: line.id, quantity }],
      ...given,
      kind: 'wild-collection',
    }),
  )
}

describe('a permit', () => {
  it('gets a number of our own beside the one that is printed on it', async () => {
    const permit = await aPermit(api, {
      permitNumber: 'NS-26-400',
      taxonIds: [ray],
      purposeCode: 'Z',
      conditions: 'By hand net',
    })
    expect(permit).toMatchObject({
      number: expect.stringMatching(/^PM-\d{3}$/),
      permitNumber: 'NS-26-400',
      state: 'runs-out',
      daysLeft: 30,
      quantityAllowed: 20,
      used: 0,
      remaining: 20,
      taxa: [{ commonName: 'Southern stingray' }],
      conditions: 'By hand net',
      uses: [],
      papers: [],
      may: ['register.manage', 'document.attach'],
    })
    const keeper = await api.as('keeper')
    expect((await keeper.agent.get(url(permit)).expect(200)).body.may).toEqual([])
  })

  it('is entered once, and its number at its authority once', async () => {
    const body = permitBody(api)
    const agent = await registrar()
    const replies = await Promise.all([1, 2].map(() => agent.post('/api/register/permits').send(body)))
    expect(replies.map((reply) => reply.status)).toEqual([201, 201])
    expect(replies[0]?.body.number).toBe(replies[1]?.body.number)
    const changed = await agent.post('/api/register/permits').send({ ...body, taxonIds: [ray] })
    expect([changed.status, changed.body.code]).toEqual([409, 'id-already-used'])
    const again = await agent.post('/api/register/permits').send({ ...body, id: api.nextId() })
    expect([again.status, again.body.code]).toEqual([409, 'number-already-used'])
    await agent
      .post(`${url(replies[0]?.body as Permit)}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Typed from the wrong page' })
      .expect(200)
    await agent
      .post('/api/register/permits')
      .send({ ...body, id: api.nextId() })
      .expect(201)
  })

  it('is refused with everything that is wrong with it', async () => {
    const agent = await registrar()
    const shape = await agent
      .post('/api/register/permits')
      .send(
        permitBody(api, { permitNumber: ' ', kind: 'poster', quantityAllowed: 0, validFrom: '2026-02-30' }),
      )
    expect(shape.body.errors.map((e: { pointer: string }) => e.pointer).sort()).toEqual([
      '/kind',
      '/permitNumber',
      '/quantityAllowed',
      '/validFrom',
    ])
    const reversed = await agent
      .post('/api/register/permits')
      .send(permitBody(api, { validUntil: '2025-12-31' }))
    expect([reversed.status, reversed.body.code]).toEqual([422, 'period-reversed'])
    const taxon = await agent
      .post('/api/register/permits')
      .send(permitBody(api, { taxonIds: [api.nextId()] }))
    expect([taxon.status, taxon.body.errors[0].pointer]).toEqual([404, '/taxonIds'])
    const party = await agent
      .post('/api/register/permits')
      .send(permitBody(api, { counterpartyId: api.nextId() }))
    expect([party.status, party.body.errors[0].pointer]).toEqual([404, '/counterpartyId'])
    expect((await agent.get('/api/register/permits/PM-999')).status).toBe(404)
  })
})

describe('the use-up of a permit', () => {
  it('counts down, and refuses one animal too many before it happens', async () => {
    const permit = await aPermit(api)
    expect((await take(permit, 12)).status).toBe(201)
    const tooMany = await take(permit, 9)
    expect([tooMany.status, tooMany.body.code]).toEqual([409, 'permit-does-not-cover'])
    expect(tooMany.body.errors).toEqual([
      {
        pointer: '/permitUses/0/permitId',
        code: 'over-quantity',
        detail: `Permit ${permit.number} has 8\u00a0animals left; this takes 9\u00a0animals.`,
      },
    ])
    expect((await take(permit, 8)).status).toBe(201)
    expect(await read(permit)).toMatchObject({ used: 20, remaining: 0, openMarks: 0 })
  })

  it('keeps what has already happened, marks it, and waits for the registrar to explain it', async () => {
    const permit = await aPermit(api)
    const kept = await take(permit, 23, { stage: 'already', on: '2026-11-20' })
    expect(kept.body.permitUses).toMatchObject([
      { quantity: 23, excess: 3, marks: ['over-quantity'], explained: null },
    ])
    const open = await read(permit)
    expect(open).toMatchObject({
      used: 23,
      remaining: -3,
      openMarks: 1,
      uses: [{ excess: 3, remaining: -3 }],
    })
    const agent = await registrar()
    const explain = (reason: string, useId = open.uses[0]?.id ?? '') =>
      agent
        .post(`${url(permit)}/uses/${useId}/explanation`)
        .set('Idempotency-Key', newKey())
        .send({ reason })
    expect((await explain('x')).status).toBe(422)
    expect((await explain('Three were released at sea', api.nextId())).status).toBe(404)
    const explained = await explain('Three were released at sea; the authority was told')
    expect(explained.body).toMatchObject({
      openMarks: 0,
      uses: [{ marks: ['over-quantity'], explained: { by: 'Test registrar' } }],
    })
    expect((await explain('Again')).body.code).toBe('already-explained')
  })

  it.each([
    ['expired', { validUntil: '2026-11-30' }, 'expired'],
    ['not yet valid', { validFrom: '2026-12-02' }, 'not-yet-valid'],
  ])('refuses a permit that is %s on the day', async (_, given, mark) => {
    const permit = await aPermit(api, given)
    const refused = await take(permit, 1)
    expect([refused.status, refused.body.errors[0].code]).toEqual([409, mark])
    const kept = await take(permit, 1, { stage: 'already' })
    expect(kept.body.permitUses[0].marks).toEqual([mark])
  })

  it('refuses another taxon than the permit names, and a permit that is void', async () => {
    const permit = await aPermit(api, { taxonIds: [ray] })
    expect((await take(permit, 1)).status).toBe(201)
    expect((await take(permit, 1, {}, other)).body.errors[0].code).toBe('other-taxon')
    const agent = await registrar()
    const voided = () =>
      agent
        .post(`${url(permit)}/void`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'Withdrawn by the authority' })
    expect((await voided()).body).toMatchObject({
      state: 'void',
      voided: { reason: 'Withdrawn by the authority' },
    })
    expect((await voided()).body.code).toBe('already-voided')
    expect((await take(permit, 1)).body.errors[0].code).toBe('voided')
  })

  it('has no number to use up where none is stated', async () => {
    const permit = await aPermit(api, { quantityAllowed: null })
    expect((await take(permit, 5000)).status).toBe(201)
    expect(await read(permit)).toMatchObject({ used: 5000, remaining: null, uses: [{ remaining: null }] })
  })

  it('does not give the last animals to two shipments at once', async () => {
    const permit = await aPermit(api, { quantityAllowed: 10 })
    const replies = await Promise.all([take(permit, 6), take(permit, 6), take(permit, 6)])
    expect(replies.map((reply) => reply.status).sort()).toEqual([201, 409, 409])
    expect(await read(permit)).toMatchObject({ used: 6, remaining: 4 })
  })

  it('covers all animals of a line, with others of its kind; of what happened the rest is marked', async () => {
    const permit = await aPermit(api, { quantityAllowed: 50 })
    const second = await aPermit(api, { quantityAllowed: 50 })
    const send = async (stage: 'now' | 'already', uses: [Permit, number][]) => {
      const line = newLine(api, { taxonId: ray, enclosureId: tank.id, count: 8 })
      const permitUses = uses.map(([of, quantity]) => ({
        id: api.nextId(),
        permitId: of.id,
        lineId: line.id,
        quantity,
      }))
      return (await registrar()).post('/api/register/acquisitions').send(
        acquisitionBody(api, {
          kind: 'wild-collection',
          stage,
          on: '2026-12-01',
          lines: [line],
          permitUses,
        }),
      )
    }
    const fewer = await send('now', [[permit, 5]])
    expect([fewer.status, fewer.body.code]).toEqual([409, 'permit-does-not-cover'])
    expect(fewer.body.errors).toMatchObject([
      { pointer: '/permitUses/0/permitId', code: 'fewer-than-animals' },
    ])
    expect(fewer.body.detail).toContain('8\u00a0animals are in the line')
    expect(
      (
        await send('now', [
          [permit, 5],
          [second, 3],
        ])
      ).status,
    ).toBe(201)
    expect((await send('already', [[permit, 5]])).status).toBe(201)
    expect((await send('already', [[permit, 9]])).status).toBe(201)
    const { uses } = await read(permit)
    expect(uses.map(({ marks }) => marks)).toEqual(
      expect.arrayContaining([[], ['fewer-than-animals'], ['more-than-animals']]),
    )
  })

  it('is one use when two lines of one form share the last animals', async () => {
    const permit = await aPermit(api, { quantityAllowed: 10 })
    const lines = [1, 2].map(() => newLine(api, { taxonId: ray, enclosureId: tank.id, count: 6 }))
    const permitUses = lines.map((line) => ({
      id: api.nextId(),
      permitId: permit.id,
      lineId: line.id,
      quantity: 6,
    }))
    const reply = await (
      await registrar()
    )
      .post('/api/register/acquisitions')
      .send(
        acquisitionBody(api, { kind: 'wild-collection', stage: 'now', on: '2026-12-01', lines, permitUses }),
      )
    expect(reply.body.errors).toMatchObject([{ pointer: '/permitUses/1/permitId', code: 'over-quantity' }])
    expect(await read(permit)).toMatchObject({ used: 0 })
  })
})

describe('the list of permits', () => {
  it('is searched, filtered, sorted and paged by the server, and leaves as the CSV of what is shown', async () => {
    await aPermit(api, { authority: 'Harbour Board', kind: 'transport-notice', validUntil: '2027-12-31' })
    await aPermit(api, {
      authority: 'Harbour Board',
      kind: 'holding',
      validUntil: '2026-06-30',
      taxonIds: [ray],
    })
    const agent = await registrar()
    const list = async (query: string) => (await agent.get(`/api/register/permits?${query}`).expect(200)).body
    expect((await list('q=harbour')).total).toBe(2)
    expect((await list('q=harbour&state=expired')).rows).toMatchObject([{ kind: 'holding', daysLeft: -154 }])
    expect((await list('kind=transport-notice')).rows).toMatchObject([{ state: 'valid' }])
    expect((await list('q=stingray&kind=holding')).total).toBe(1)
    const open = await list('open=yes')
    expect(open.rows.every((row: Permit) => row.openMarks > 0)).toBe(true)
    const first = await list('limit=2&sort=number')
    const second = await list(`limit=2&sort=number&cursor=${String(first.nextCursor)}`)
    expect([...first.rows, ...second.rows].map((row: Permit) => row.number)).toEqual([
      'PM-001',
      'PM-002',
      'PM-003',
      'PM-004',
    ])
    const csv = await agent.get('/api/register/permits.csv?q=harbour&sort=validUntil').expect(200)
    expect(csv.headers['content-type']).toBe('text/csv; charset=utf-8')
    expect(csv.headers['content-disposition']).toContain('permits-2026-12-01.csv')
    const rows = parse(csv.text, { columns: true }) as Record<string, string>[]
    expect(rows).toMatchObject([
      { kind: 'holding', valid_until: '2026-06-30', state: 'expired', taxa: 'Hypanus americanus 1' },
      { kind: 'transport-notice', remaining: '20' },
    ])
  })
})
