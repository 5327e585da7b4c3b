import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { parse } from 'csv-parse/sync'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import { aDisposition, anAcquisition, aParty, newLine } from '../builders/a-register.ts'
import type { TransactionRow } from '../../shared/contracts/acquisitions.contract.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let animalId: string
beforeAll(async () => {
  api = await startApi()
  const taxonId = await aStingray(api)
  const tank = await aPlace(api)
  const party = await aParty(api, 'Ledder Bay Marsh Trust')
  const line = (count: number) => newLine(api, { taxonId, enclosureId: tank.id, count })
  const first = await anAcquisition(api, {
    kind: 'purchase',
    on: '2026-03-14',
    counterpartyId: party,
    reference: 'INV-1',
    lines: [line(24)],
  })
  await anAcquisition(api, { on: '2025', lines: [line(5), line(6), line(7), line(8)] })
  animalId = first.lines[0]?.animalId ?? ''
  await aDisposition(api, {
    kind: 'sale',
    on: '2026-06-01',
    counterpartyId: party,
    lines: [{ id: api.nextId(), animalId, count: 3 }],
  })
  const wrong = await anAcquisition(api, { on: '2026-05-01', lines: [line(2)] })
  await (
    await api.as('registrar')
  ).agent
    .post(`/api/register/transactions/${wrong.number}/void`)
    .set('Idempotency-Key', newKey())
    .send({ reason: 'Never came' })
    .expect(200)
})
afterAll(() => api.stop())

const list = async (query = '') =>
  (await (await api.as('keeper')).agent.get(`/api/register/transactions?${query}`).expect(200)).body as {
    rows: TransactionRow[]
    total: number
    nextCursor: string | null
  }
const numbers = (rows: TransactionRow[]) => rows.map((row) => row.number)

describe('the list of transactions', () => {
  it('shows the newest first, with at most three animals named and all of them counted', async () => {
    const { rows, total } = await list()
    expect(total).toBe(4)
    expect(rows.map((row) => row.on)).toEqual(['2026-06-01', '2026-05-01', '2026-03-14', '2025'])
    expect(rows[3]).toMatchObject({ lines: 4, count: 26, animals: { length: 3 } })
    expect(rows[2]).toMatchObject({
      counterparty: 'Ledder Bay Marsh Trust',
      reference: 'INV-1',
      kind: 'purchase',
    })
    expect(rows[1]?.voided).toBe(true)
  })

  it.each([
    ['q=ledder', ['TR-0003', 'TR-0001']],
    ['q=inv-1', ['TR-0001']],
    ['q=stingray&way=in&voided=no', ['TR-0001', 'TR-0002']],
    ['way=out', ['TR-0003']],
    ['kind=found', ['TR-0004', 'TR-0002']],
    ['voided=yes', ['TR-0004']],
    ['from=2026-03-14&until=2026-05-31', ['TR-0004', 'TR-0001']],
    ['open=yes', []],
    ['q=%25', []],
    ['sort=count&direction=asc', ['TR-0004', 'TR-0003', 'TR-0001', 'TR-0002']],
    ['sort=number', ['TR-0001', 'TR-0002', 'TR-0003', 'TR-0004']],
  ])('answers %s', async (query, expected) => {
    expect(numbers((await list(query)).rows)).toEqual(expected)
  })

  it('names the transactions of one animal', async () => {
    expect(numbers((await list(`animalId=${animalId}`)).rows)).toEqual(['TR-0003', 'TR-0001'])
  })

  it('is read page by page', async () => {
    const first = await list('limit=3')
    const second = await list(`limit=3&cursor=${String(first.nextCursor)}`)
    expect([first.rows.length, second.rows.length, second.nextCursor]).toEqual([3, 1, null])
    expect(new Set(numbers([...first.rows, ...second.rows])).size).toBe(4)
  })

  it('leaves as CSV, one line of a transaction a row, and sums to what is shown', async () => {
    const { agent } = await api.as('keeper')
    const reply = await agent.get('/api/register/transactions.csv?voided=no').expect(200)
    const rows = parse(reply.text, { columns: true }) as Record<string, string>[]
    expect(rows).toHaveLength(6)
    const { rows: shown } = await list('voided=no')
    const total = (of: number[]) => of.reduce((a, b) => a + b, 0)
    expect(total(rows.map((row) => Number(row.count)))).toBe(total(shown.map((row) => row.count)))
    expect(rows[0]).toMatchObject({ transaction: 'TR-0003', way: 'out', kind: 'sale', date: '2026-06-01' })
    expect(rows.at(-1)).toMatchObject({ date: '2025', voided: 'no' })
  })

  it('refuses what it cannot be asked', async () => {
    const { agent } = await api.as('keeper')
    const reply = await agent.get('/api/register/transactions?sort=colour&limit=0&shoe=43&kind=raffle')
    expect(reply.status).toBe(422)
    expect(reply.body.errors).toHaveLength(4)
  })
})

describe('other parties', () => {
  it('are found by name, corrected with what they were kept, and not overwritten by a stale form', async () => {
    const { agent } = await api.as('registrar')
    const id = await aParty(api, 'Point Ansel Hatchery', 'dealer')
    const found = await agent.get('/api/register/counterparties?q=ansel').expect(200)
    expect(found.body.rows).toMatchObject([{ id, name: 'Point Ansel Hatchery', transactions: 0, version: 1 }])
    const correct = (name: string) =>
      agent
        .put(`/api/register/counterparties/${id}`)
        .send({ expectedVersion: 1, name, kind: 'institution', telephone: '+1 902 555 0134' })
    expect((await correct('Point Ansel Hatchery Trust').expect(200)).body).toMatchObject({
      version: 2,
      telephone: '+1 902 555 0134',
    })
    const stale = await correct('Point Ansel')
    expect([stale.status, stale.body.code, stale.body.current_version]).toEqual([409, 'stale-version', 2])
    const taken = await agent
      .put(`/api/register/counterparties/${id}`)
      .send({ expectedVersion: 2, name: 'LEDDER BAY MARSH TRUST', kind: 'institution' })
    expect([taken.status, taken.body.code]).toEqual([409, 'name-already-used'])
    const admin = await api.as('administrator')
    const trail = await admin.agent.get(`/api/audit?subjectId=${id}`)
    expect(trail.body.rows[0]).toMatchObject({
      action: 'counterparty.correct',
      before: { name: 'Point Ansel Hatchery' },
      after: { name: 'Point Ansel Hatchery Trust' },
    })
    const used = await agent.get('/api/register/counterparties?q=ledder')
    expect(used.body.rows).toMatchObject([{ transactions: 2 }])
    expect(
      (
        await agent
          .put(`/api/register/counterparties/${api.nextId()}`)
          .send({ expectedVersion: 1, name: 'x', kind: 'other' })
      ).status,
    ).toBe(404)
  })

  it('are entered once', async () => {
    const { agent } = await api.as('registrar')
    const body = { id: api.nextId(), name: 'Harbour Board', kind: 'authority' }
    await agent.post('/api/register/counterparties').send(body).expect(201)
    await agent.post('/api/register/counterparties').send(body).expect(201)
    const other = await agent.post('/api/register/counterparties').send({ ...body, note: 'other' })
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
    const shape = await agent.post('/api/register/counterparties').send({ id: '1', name: '', kind: 'friend' })
    expect(shape.body.errors.map((e: { pointer: string }) => e.pointer).sort()).toEqual([
      '/id',
      '/kind',
      '/name',
    ])
  })
})
