import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { aDisposition, anAcquisition, aParty, newLine } from '../builders/a-register.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let taxonId: string
let tank: TestPlace
let partyId: string
beforeAll(async () => {
  api = await startApi()
  taxonId = await aStingray(api)
  tank = await aPlace(api)
  partyId = await aParty(api, 'Point Ansel Hatchery')
})
afterAll(() => api.stop())

async function aSchool(count: number) {
  const transaction = await anAcquisition(api, {
    on: '2026-10-01',
    lines: [newLine(api, { taxonId, enclosureId: tank.id, count })],
  })
  const [line] = transaction.lines
  if (!line) throw new Error('no line')
  return { id: line.animalId, accession: line.accession, url: `/api/animals/${line.accession}` }
}
const send = async (body: object) =>
  (await api.as('registrar')).agent
    .post('/api/register/dispositions')
    .send({ id: api.nextId(), stage: 'now', on: '2026-12-01', permitUses: [], ...body })
const read = async (url: string) => (await (await api.as('keeper')).agent.get(url).expect(200)).body
const leaving = (animal: { id: string }, count: number) => ({ id: api.nextId(), animalId: animal.id, count })

describe('animals that leave', () => {
  it('are taken from the ledger, and the last one ends the stay', async () => {
    const school = await aSchool(10)
    const sale = await aDisposition(api, {
      kind: 'sale',
      counterpartyId: partyId,
      lines: [leaving(school, 4)],
    })
    expect(sale).toMatchObject({
      way: 'out',
      kind: 'sale',
      counterparty: { name: 'Point Ansel Hatchery' },
      lines: [{ accession: school.accession, count: 4, enclosure: { code: tank.code } }],
    })
    expect(await read(school.url)).toMatchObject({ count: { ledger: 6 }, place: { code: tank.code } })
    await aDisposition(api, {
      kind: 'release',
      on: '2026-11-28',
      place: { locality: 'Norrell Sound' },
      lines: [leaving(school, 6)],
    })
    expect(await read(school.url)).toMatchObject({ count: { ledger: 0 }, place: null })
  })

  it('are not more than there are, when it is about to happen', async () => {
    const school = await aSchool(3)
    const reply = await send({ kind: 'sale', counterpartyId: partyId, lines: [leaving(school, 5)] })
    expect([reply.status, reply.body.code]).toEqual([409, 'count-too-small'])
    expect(reply.body.errors[0].pointer).toBe('/lines/0/count')
    expect(await read(school.url)).toMatchObject({ count: { ledger: 3 } })
  })

  it('are kept as they were seen when it has happened: the ledger gives what it has, and a discrepancy opens', async () => {
    const school = await aSchool(3)
    const sale = await aDisposition(api, {
      kind: 'transfer-out',
      counterpartyId: partyId,
      lines: [leaving(school, 5)],
    })
    expect(sale.lines).toMatchObject([{ count: 5 }])
    expect(await read(school.url)).toMatchObject({
      count: { ledger: 0 },
      discrepancies: [
        {
          kind: 'more-than-counted',
          forRole: 'registrar',
          facts: { seen: 5, posted: 3, excess: 2, cause: 'transfer-out' },
        },
      ],
    })
  })

  it('are found among the deaths when they died, and struck out with the transaction', async () => {
    const school = await aSchool(8)
    const death = await aDisposition(api, { kind: 'death', on: '2026-11-25', lines: [leaving(school, 2)] })
    const counts = await read(`${school.url}/counts`)
    expect(counts.deaths).toMatchObject([
      { seenCount: 2, postedCount: 2, struck: null, place: { code: tank.code } },
    ])
    await (
      await api.as('registrar')
    ).agent
      .post(`/api/register/transactions/${death.number}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Of another school' })
      .expect(200)
    const after = await read(`${school.url}/counts`)
    expect(after.deaths).toMatchObject([{ struck: { reason: 'Of another school' } }])
    expect(await read(school.url)).toMatchObject({ count: { ledger: 8 }, place: { code: tank.code } })
  })

  it('under a quarantine lock are refused, or kept and told to the veterinarian', async () => {
    const school = await aSchool(6)
    await api.composition.parts.transactions.inTransaction(
      { actor: installation, requestId: 'test' },
      async (tx) => {
        await api.composition.animals.service.lockMovement(tx, {
          animalId: school.id,
          kind: 'boundary',
          source: { kind: 'case', id: api.nextId(), label: 'Q-014' },
          reason: 'in quarantine',
          at: '2026-10-02T00:00:00Z',
        })
      },
    )
    const refused = await send({ kind: 'sale', counterpartyId: partyId, lines: [leaving(school, 1)] })
    expect([refused.status, refused.body.code]).toEqual([409, 'movement-locked'])
    expect(refused.body.detail).toContain('Q-014')
    await aDisposition(api, { kind: 'sale', counterpartyId: partyId, lines: [leaving(school, 1)] })
    await aDisposition(api, { kind: 'death', lines: [leaving(school, 1)] })
    expect(await read(school.url)).toMatchObject({
      count: { ledger: 4 },
      discrepancies: [{ kind: 'moved-under-lock', forRole: 'veterinarian', facts: { from: tank.code } }],
    })
  })

  it('name the other party where there is one, and none where there is none', async () => {
    const school = await aSchool(6)
    const nobody = await send({ kind: 'sale', lines: [leaving(school, 1)] })
    expect([nobody.status, nobody.body.errors[0].pointer]).toEqual([422, '/counterpartyId'])
    const somebody = await send({ kind: 'death', counterpartyId: partyId, lines: [leaving(school, 1)] })
    expect([somebody.status, somebody.body.errors[0].pointer]).toEqual([422, '/counterpartyId'])
  })

  it('of an unknown number are refused; a way in is no way out', async () => {
    const unknown = await send({ kind: 'death', lines: [leaving({ id: api.nextId() }, 1)] })
    expect([unknown.status, unknown.body.errors[0].pointer]).toEqual([404, '/lines/0/animalId'])
    const wrongWay = await send({ kind: 'purchase', lines: [leaving({ id: api.nextId() }, 1)] })
    expect([wrongWay.status, wrongWay.body.errors[0].pointer]).toEqual([422, '/kind'])
  })

  it('leave once when the form is sent twice', async () => {
    const school = await aSchool(6)
    const body = { id: api.nextId(), kind: 'death', stage: 'already', lines: [leaving(school, 2)] }
    const replies = [await send(body), await send(body)]
    expect(replies.map((reply) => reply.body.number)).toEqual([
      replies[0]?.body.number,
      replies[0]?.body.number,
    ])
    expect(await read(school.url)).toMatchObject({ count: { ledger: 4 } })
  })
})
