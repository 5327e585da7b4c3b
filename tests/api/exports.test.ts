import { createHash } from 'node:crypto'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { parse } from 'csv-parse/sync'
import { aPlace, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import { aDisposition, anAcquisition, aParty, aPermit, newLine, pdfBytes } from '../builders/a-register.ts'
import type { ExportRow, History } from '../../shared/contracts/exports.contract.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { pageCount, textOf } from '../pdf/support/poppler.ts'

let api: TestApi
let quarantine: TestPlace
let display: TestPlace
let accession: string
let splitAccession: string
beforeAll(async () => {
  api = await startApi()
  quarantine = await aPlace(api)
  display = await aPlace(api)
  await aHistory()
})
afterAll(() => api.stop())

const site = { locality: 'Ledder Marsh, pier 2', latitude: 44.7, longitude: -63.5, uncertaintyMetres: 50 }
/** Worked by hand: 24 bought, 1 dead, 8 taken out, 4 sold, 5 hatched, and a birth of 3 struck out: 16 are left. */
async function aHistory() {
  const taxonId = await aStingray(api)
  const dealer = await aParty(api, '=Ledder & Sons, "Marsh" Ltd', 'dealer')
  const permit = await aPermit(api, { permitNumber: 'NS-26-017', quantityAllowed: 20 })
  const line = newLine(api, {
    taxonId,
    enclosureId: quarantine.id,
    count: 24,
    theirNumber: 'LB-77',
    deadOnArrival: 2,
    sourceCode: 'W',
  })
  const bought = await anAcquisition(api, {
    kind: 'purchase',
    on: '2026-09-14',
    time: '13:25',
    counterpartyId: dealer,
    reference: 'INV-2231',
    place: {
      locality: 'Norrell Sound, outer bank',
      on: '2026-09',
      method: 'hand net',
      latitude: 44.62,
      longitude: -63.57,
      uncertaintyMetres: 500,
    },
    transport: {
      carrier: 'Norrell Live Freight',
      boxCount: 3,
      sealedAt: '2026-09-14T08:10:00-03:00',
      openedAt: '2026-09-14T13:25:00-03:00',
    },
    lines: [line],
    permitUses: [{ id: api.nextId(), permitId: permit.id, lineId: line.id, quantity: 24 }],
  })
  accession = bought.lines[0]?.accession ?? ''
  const registrar = await api.as('registrar')
  await registrar.agent
    .post(`/api/register/transactions/${bought.number}/documents`)
    .field('id', api.nextId())
    .field('title', 'Invoice INV-2231')
    .field('kind', 'invoice')
    .attach('file', pdfBytes('invoice'), { filename: 'invoice.pdf' })
    .expect(201)
  const keeper = await api.as('keeper')
  const post = (path: string, body: object) =>
    keeper.agent
      .post(`/api/animals/${accession}/${path}`)
      .send({ id: api.nextId(), ...body })
      .expect(201)
  await post('deaths', { kind: 'found-dead', count: 1, happenedAt: '2026-09-20T12:00:00Z' })
  const split = await post('splits', {
    form: 'group',
    count: 8,
    toEnclosureId: display.id,
    happenedAt: '2026-10-01T12:00:00Z',
  })
  splitAccession = split.body.into.accession
  await post('moves', {
    fromEnclosureId: quarantine.id,
    toEnclosureId: display.id,
    reason: 'cleared',
    happenedAt: '2026-10-16T12:00:00Z',
  })
  await aDisposition(api, {
    kind: 'sale',
    on: '2026-11',
    counterpartyId: dealer,
    place: site,
    lines: [{ id: api.nextId(), animalId: line.animalId, count: 4 }],
  })
  await post('births', { count: 5, happenedAt: '2026-11-10T12:00:00Z' })
  const wrong = api.nextId()
  await keeper.agent
    .post(`/api/animals/${accession}/births`)
    .send({ id: wrong, count: 3, happenedAt: '2026-11-11T12:00:00Z' })
    .expect(201)
  await registrar.agent
    .post(`/api/animals/${accession}/counts/${wrong}/void`)
    .set('Idempotency-Key', newKey())
    .send({ reason: 'Counted twice' })
    .expect(200)
}

const read = async (query = '') =>
  (await (await api.as('registrar')).agent.get(`/api/animals/${accession}/history${query}`).expect(200))
    .body as History

async function exported(format: string, given: object = {}): Promise<{ row: ExportRow; bytes: Buffer }> {
  const { agent } = await api.as('registrar')
  const reply = await agent
    .post(`/api/animals/${accession}/history/exports`)
    .send({ id: api.nextId(), format, ...given })
  if (reply.status !== 201) throw new Error(JSON.stringify(reply.body))
  const row = reply.body as ExportRow
  const file = await agent
    .get(`/api/exports/${row.id}/file`)
    .buffer(true)
    .parse((res, done) => {
      const chunks: Buffer[] = []
      res.on('data', (chunk: Buffer) => chunks.push(chunk))
      res.on('end', () => done(null, Buffer.concat(chunks)))
    })
  return { row, bytes: file.body as Buffer }
}
const sum = (numbers: number[]) => numbers.reduce((a, b) => a + b, 0)

describe('an acquisition history', () => {
  it('names every custody event in order and adds up to what the screens show', async () => {
    const history = await read()
    expect(history.events.map(({ kind, delta, countAfter }) => [kind, delta, countAfter])).toEqual([
      ['purchase', 24, 24],
      ['death', -1, 23],
      ['split-out', -8, 15],
      ['move', 0, 15],
      ['birth-or-hatch', 5, 20],
      ['birth-or-hatch', 3, 20],
      ['sale', -4, 16],
    ])
    expect(history).toMatchObject({
      opening: 0,
      gained: 29,
      lost: 13,
      closing: 16,
      heldAs: 'owned',
      since: '2026-09-14',
    })
    expect(history.totals).toEqual([
      { kind: 'purchase', lines: 1, delta: 24 },
      { kind: 'death', lines: 1, delta: -1 },
      { kind: 'split-out', lines: 1, delta: -8 },
      { kind: 'birth-or-hatch', lines: 1, delta: 5 },
      { kind: 'sale', lines: 1, delta: -4 },
    ])
    const { agent } = await api.as('keeper')
    const animal = await agent.get(`/api/animals/${accession}`)
    expect(animal.body.count.ledger).toBe(history.closing)
    expect(history.place).toEqual({ code: display.code, name: `Tank ${display.code}` })
  })

  it('says of each event what is known of it', async () => {
    const [bought, death, split, move, , struck, sale] = (await read()).events
    expect(bought).toMatchObject({
      on: '2026-09-14',
      at: '2026-09-14T16:25:00.000Z',
      exact: true,
      to: { code: quarantine.code },
      counterparty: '=Ledder & Sons, "Marsh" Ltd',
      reference: 'INV-2231',
      theirNumber: 'LB-77',
      deadOnArrival: 2,
      sourceCode: 'W',
      transport: expect.stringContaining('Norrell Live Freight'),
      permits: [{ permitNumber: 'NS-26-017', quantity: 24, marks: ['over-quantity'] }],
      documents: [{ title: 'Invoice INV-2231' }],
      recordedBy: 'Test registrar',
    })
    expect([death?.from?.code, split?.otherAccession]).toEqual([quarantine.code, splitAccession])
    expect(move).toMatchObject({
      from: { code: quarantine.code },
      to: { code: display.code },
      note: 'cleared',
    })
    expect(struck?.voided).toMatchObject({ reason: 'Counted twice', by: 'Test registrar' })
    expect(sale).toMatchObject({ on: '2026-11', exact: false, site })
  })

  it('opens and closes a period with the counts of its ends', async () => {
    const history = await read('?from=2026-09-20&until=2026-10-31')
    expect(history).toMatchObject({ opening: 24, gained: 0, lost: 9, closing: 15 })
    expect(history.events).toHaveLength(3)
    const reversed = await (
      await api.as('registrar')
    ).agent.get(`/api/animals/${accession}/history?from=2026-10-02&until=2026-10-01`)
    expect([reversed.status, reversed.body.code]).toEqual([422, 'period-reversed'])
  })

  it('of the group that was taken out begins with the split', async () => {
    const { agent } = await api.as('registrar')
    const other = (await agent.get(`/api/animals/${splitAccession}/history`)).body as History
    expect(other.events).toMatchObject([
      { kind: 'split-in', delta: 8, otherAccession: accession, to: { code: display.code } },
    ])
  })

  it('is unknown for an unknown number', async () => {
    expect((await (await api.as('registrar')).agent.get('/api/animals/A-9999/history')).status).toBe(404)
  })
})

describe('the history as CSV', () => {
  it('reads back one event a row, sums to the closing count, and keeps what was struck out beside the sums', async () => {
    const history = await read()
    const { row, bytes } = await exported('csv')
    expect(row).toMatchObject({
      fileName: `${accession}-2026-12-01.csv`,
      bytes: bytes.length,
      exportedBy: 'Test registrar',
    })
    expect(row.sha256).toBe(createHash('sha256').update(bytes).digest('hex'))
    const text = bytes.toString('utf8')
    expect(text.startsWith('accession,event_date,')).toBe(true)
    expect(text.split('\r\n').at(-1)).toBe('')
    const rows = parse(text, { columns: true }) as Record<string, string>[]
    expect(rows).toHaveLength(history.events.length)
    expect(sum(rows.map((one) => Number(one.count_change)))).toBe(history.closing - history.opening)
    expect(rows.map((one) => Number(one.count_after))).toEqual(
      history.events.map((event) => event.countAfter),
    )
    expect(rows.map((one) => one.struck_out_change).filter(Boolean)).toEqual(['3'])
    expect(rows[0]).toMatchObject({
      accession,
      event_date: '2026-09-14T13:25:00-03:00',
      event: 'purchase',
      count_change: '24',
      to_enclosure: quarantine.code,
      counterparty: '=Ledder & Sons, "Marsh" Ltd',
      permits: 'Norrell Sound Fisheries NS-26-017: 24',
      recorded_by: 'Test registrar',
    })
    const sale = { event: 'sale', event_date: '2026-11', count_change: '-4', place: site.locality }
    expect(rows.at(-1)).toMatchObject({ ...sale, latitude: '44.7', uncertainty_metres: '50' })
  })

  it('guards formulas and marks its encoding in the variant for spreadsheets; negative numbers stay numbers', async () => {
    const { bytes } = await exported('csv-guarded')
    const text = bytes.toString('utf8')
    expect(text.charCodeAt(0)).toBe(0xfeff)
    const rows = parse(text, { columns: true, bom: true }) as Record<string, string>[]
    expect(rows[0]?.counterparty).toBe(`'=Ledder & Sons, "Marsh" Ltd`)
    expect(sum(rows.map((one) => Number(one.count_change)))).toBe(16)
  })

  it('leaves in the terms of Darwin Core, what was struck out left out', async () => {
    const { bytes } = await exported('darwin-core')
    const rows = parse(bytes.toString('utf8'), { columns: true }) as Record<string, string>[]
    expect(rows).toHaveLength(6)
    expect(rows[0]).toMatchObject({
      'dwc:catalogNumber': accession,
      'dwc:scientificName': 'Hypanus americanus 1',
      'dwc:basisOfRecord': 'LivingSpecimen',
      'dwc:individualCount': '24',
      'dwc:eventDate': '2026-09-14T13:25:00-03:00',
      'dwc:locality': 'Norrell Sound, outer bank',
      'dwc:decimalLatitude': '44.62',
      'dwc:coordinateUncertaintyInMeters': '500',
      'dwc:institutionCode': 'Harrow Point Sea Hall',
    })
    expect(rows.at(-1)?.['dwc:locality']).toBe(site.locality)
    expect(JSON.parse(rows[0]?.['dwc:dynamicProperties'] ?? '{}')).toMatchObject({ reference: 'INV-2231' })
  })
})

describe('the history as JSON', () => {
  it('holds events, balances and totals, and says by whom and when', async () => {
    const { row, bytes } = await exported('json', { reason: 'Yearly loan report' })
    const file = JSON.parse(bytes.toString('utf8')) as { history: History } & Record<string, unknown>
    expect(file).toMatchObject({
      format: 'pratique-acquisition-history',
      facility: 'Harrow Point Sea Hall',
      zone: 'America/Halifax',
      exportedBy: 'Test registrar',
      exportedAt: '2026-12-01T18:20:00.000Z',
      fingerprint: row.fingerprint,
      history: { accession, opening: 0, gained: 29, lost: 13, closing: 16 },
    })
    expect(sum(file.history.totals.map((total) => total.delta))).toBe(16)
    expect([row.reason, file.history.events.at(-1)?.site]).toEqual(['Yearly loan report', site])
  })
})

describe('the history as pages', () => {
  it('reads cleanly: custody, ledger with its sum, marks, permits, papers, fingerprint, who printed it and when', async () => {
    const { row, bytes } = await exported('pdf')
    expect(pageCount(bytes)).toBeGreaterThanOrEqual(1)
    const text = textOf(bytes).replaceAll('\u00a0', ' ').replace(/\s+/g, ' ')
    for (const words of [
      'Harrow Point Sea Hall',
      'Acquisition history',
      accession,
      'Southern stingray',
      'Hypanus americanus 1',
      '14 Sep 2026, 13:25',
      'Bought from =Ledder & Sons, "Marsh" Ltd',
      'Norrell Sound, outer bank',
      'Their number LB-77.',
      `Taken out as ${splitAccession}`,
      `Moved from ${quarantine.code} to ${display.code}`,
      'Nov 2026 Sold to =Ledder',
      'At Ledder Marsh, pier 2, 44.7° N, 63.5° W (WGS 84), within 50 m.',
      'Struck out: Counted twice',
      'Sum of the period + 16 16',
      'Collecting permit NS-26-017',
      'Norrell Sound Fisheries',
      'More than the permit allows',
      'Invoice INV-2231',
      'invoice.pdf',
      '0 + 29 − 13 = 16',
      'Printed 1 Dec 2026, 14:20, UTC−4, by Test registrar.',
      'the law of the place decides',
    ])
      expect(text).toContain(words)
    const digits = (row.fingerprint.toUpperCase().match(/.{4}/g) ?? []).join(' ')
    expect(text).toContain(digits)
    expect(text).toContain(`Record check ${digits.slice(0, 19)}`)
  })

  it('comes out whatever somebody once typed', async () => {
    const { agent } = await api.as('registrar')
    const taxonId = await aStingray(api, 7)
    const fish = await anAcquisition(api, {
      note: 'labelled 錦鯉 🐟',
      lines: [newLine(api, { taxonId, enclosureId: display.id })],
    })
    const reply = await agent
      .post(`/api/animals/${fish.lines[0]?.accession ?? ''}/history/exports`)
      .send({ id: api.nextId(), format: 'pdf' })
    expect(reply.status).toBe(201)
  })
})

describe('an export', () => {
  it('is written in the record with hash and exporter, once for one id', async () => {
    const { agent } = await api.as('registrar')
    const body = { id: api.nextId(), format: 'csv', reason: 'For the next holder' }
    const address = `/api/animals/${accession}/history/exports`
    const first = await agent.post(address).send(body)
    const again = await agent.post(address).send(body)
    expect(again.body).toEqual(first.body)
    expect((await agent.post(address).send({ ...body, format: 'json' })).body.code).toBe('id-already-used')
    const admin = await api.as('administrator')
    const trail = await admin.agent.get('/api/audit?q=history.export&limit=1')
    expect(trail.body.rows[0]).toMatchObject({
      actorName: 'Test registrar',
      subjectLabel: accession,
      after: { format: 'csv', sha256: first.body.sha256, reason: 'For the next holder' },
    })
    const list = await agent.get('/api/register/exports?q=next holder')
    expect(list.body.rows).toMatchObject([{ id: body.id, accession, exportedBy: 'Test registrar' }])
    expect((await agent.get(`/api/exports/${api.nextId()}/file`)).status).toBe(404)
    const shape = await agent.post(address).send({ id: 'x', format: 'docx' })
    expect(shape.body.errors.map((e: { pointer: string }) => e.pointer).sort()).toEqual(['/format', '/id'])
  })

  it('is found again by the digits on the paper, and says when the record has changed since', async () => {
    const { row } = await exported('pdf')
    const keeper = await api.as('keeper')
    const typed = encodeURIComponent(
      (row.fingerprint.slice(0, 16).toUpperCase().match(/.{4}/g) ?? []).join(' '),
    )
    const check = async (digits = typed) => keeper.agent.get(`/api/checks/${digits}`)
    const now = await check()
    expect(now.body).toMatchObject({ fingerprint: row.fingerprint, state: 'current', now: null })
    expect(now.body.prints[0]).toMatchObject({
      kind: 'acquisition-history',
      subject: accession,
      version: '7',
      printedBy: 'Test registrar',
    })
    await keeper.agent
      .post(`/api/animals/${accession}/births`)
      .send({ id: api.nextId(), count: 1, happenedAt: '2026-11-30T12:00:00Z' })
      .expect(201)
    expect((await check()).body).toMatchObject({ state: 'changed', now: '8' })
    const unknown = await check('0000000000000000')
    expect([unknown.status, unknown.body.detail]).toEqual([
      404,
      expect.stringContaining('Do not rely on the paper'),
    ])
    const short = await check('7C1E40AF')
    expect([short.status, short.body.errors[0].code]).toEqual([422, 'fingerprint-too-short'])
    expect((await check('hello')).body.errors[0].code).toBe('not-a-fingerprint')
  })
})
