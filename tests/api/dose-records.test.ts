import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { anEnclosure } from '../builders/a-water.ts'
import { aBathWater, determineBathWater, aSchool } from '../builders/an-order.ts'
import { aFormalinHouse, bathAmount } from '../builders/a-bath.ts'
import type { OrderRow } from '../../shared/contracts/orders.contract.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

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

const stopBath = (doseId: string, happenedAt: string, id = api.nextId()) =>
  house.technician.agent.post(`/api/doses/${doseId}/stop`).send({ id, cause: 'time-up', happenedAt })

describe('a bath whose end was recorded twice', () => {
  it('shows both, says so, and counts the later one until it is struck out', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    const dose = api.nextId()
    await house.record(number, { id: dose, happenedAt: '2026-12-01T17:00:00Z' }).expect(201)
    // the hour typed one too early
    const wrong = api.nextId()
    await stopBath(dose, '2026-12-01T16:45:00Z', wrong).expect(201)
    const both = await stopBath(dose, '2026-12-01T17:45:00Z').expect(201)
    const [record] = both.body.recorded
    expect(record.stop).toMatchObject({ at: '2026-12-01T17:45:00.000Z', beforeStart: false })
    expect(record.otherStops).toMatchObject([
      {
        id: wrong,
        at: '2026-12-01T16:45:00.000Z',
        beforeStart: true,
        mayStrike: true,
        by: 'Test technician',
      },
    ])
    const struck = await house.technician.agent
      .post(`/api/dose-records/stop/${wrong}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'the hour was typed wrong' })
      .expect(200)
    expect(struck.body.recorded[0]).toMatchObject({
      stop: { at: '2026-12-01T17:45:00.000Z' },
      otherStops: [],
    })
  })
})

describe('a dose that was not given', () => {
  it.each(['withheld', 'refused'])('and is recorded as %s carries no amount', async (kind) => {
    const number = await house.signedBath(await house.tankWithSchool())
    const refused = await house.record(number, { kind })
    expect(refused.status).toBe(422)
    expect(refused.body.errors).toMatchObject([{ pointer: '/amount' }])
    expect(refused.body.errors[0].detail).toContain('Nothing goes in')
    const kept = await house.record(number, { kind, amount: null, lotId: null }).expect(201)
    expect(kept.body.recorded).toMatchObject([{ kind, amountText: null }])
  })

  it('and is recorded as given needs one', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    const refused = await house.record(number, { amount: null })
    expect(refused.body.errors).toMatchObject([{ pointer: '/amount', detail: 'Type how much was given.' }])
  })
})

describe('an order of several baths', () => {
  it('is in progress while one of them runs past its last window, and not expired', async () => {
    const number = await house.signedBath(await house.tankWithSchool(), {
      doses: 3,
      intervalHours: 1,
      contactMinutes: 20,
    })
    await house.record(number).expect(201)
    api.clock.set(new Date('2026-12-01T23:00:00Z'))
    const listed = await house.technician.agent.get(`/api/orders?q=${number}`).expect(200)
    expect(listed.body.rows[0].phase).toBe('in-progress')
    const [{ id } = { id: '' }] = (
      await owner.query<{ id: string }>(
        `SELECT d.id FROM doses d JOIN order_versions v ON v.id = d.order_version_id JOIN orders o ON o.id = v.order_id WHERE o.number = $1`,
        [number],
      )
    ).rows
    await stopBath(id, '2026-12-01T22:00:00Z').expect(201)
    const after = await house.technician.agent.get(`/api/orders?q=${number}`).expect(200)
    expect(after.body.rows[0].phase).toBe('expired')
  })

  it('of which two run at once tells of each with its own end, and of none that all is done', async () => {
    const number = await house.signedBath(await house.tankWithSchool(), { doses: 2, intervalHours: 1 })
    const [one, two] = [api.nextId(), api.nextId()]
    const at = (key: string, rest = '') => house.doseAt(number).replace('/1', `/${key}`) + rest
    const sheet = async (key: string) =>
      (await house.technician.agent.get(`${at(key)}?blind=yes`).expect(200)).body
    const goesIn = (id: string, key: string, happenedAt: string) =>
      house.technician.agent.post(at(key, '/record')).send({
        id,
        kind: 'recorded',
        happenedAt,
        amount: bathAmount,
        lotId: house.formalin.lotId,
      })
    await goesIn(two, '2', '2026-12-01T18:15:00Z').expect(201)
    await goesIn(one, '1', '2026-12-01T18:10:00Z').expect(201)
    const running = [
      { doseId: one, key: '1', startedAt: '2026-12-01T18:10:00.000Z', endsAt: '2026-12-01T18:55:00.000Z' },
      { doseId: two, key: '2', startedAt: '2026-12-01T18:15:00.000Z', endsAt: '2026-12-01T19:00:00.000Z' },
    ]
    for (const key of ['1', '2'])
      expect(await sheet(key)).toMatchObject({ state: 'running', standing: null, running })
    const listed = await house.technician.agent.get(`/api/orders?q=${number}`).expect(200)
    expect(listed.body.rows[0].phase).toBe('in-progress')
    const paper = textOf(await fetchPdf(house.technician, `/api/orders/${number}/print`))
    expect(paper.replaceAll(/\s+/g, ' ')).toContain(
      'No dose is to come, and a bath runs. Do not dose from this page.',
    )

    // the first is over, by its own sheet; the second goes on, and is told of there too
    await stopBath(one, '2026-12-01T18:20:00Z').expect(201)
    expect(await sheet('1')).toMatchObject({ state: 'done', standing: null, running: running.slice(1) })
    await stopBath(two, '2026-12-01T18:20:00Z').expect(201)
    expect(await sheet('1')).toMatchObject({ standing: { kind: 'completed' }, running: [] })
  })

  it('tells of both records of one dose that went in twice, and of the agreed time each was given under', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await house.record(number, { happenedAt: '2026-12-01T18:00:00Z' }).expect(201)
    await house.record(number, { happenedAt: '2026-12-01T18:05:00Z' }).expect(201)
    await house.amend(bath, number, { contactMinutes: 30 })
    const { body } = await house.technician.agent.get(`${house.doseAt(number)}?blind=yes`).expect(200)
    expect(body.running.map((bath: { endsAt: string }) => bath.endsAt)).toEqual([
      '2026-12-01T18:45:00.000Z',
      '2026-12-01T18:50:00.000Z',
    ])
  })
})

describe('what was recorded under one order tells the amount of the next for that drug and water', () => {
  const shows = /218(\.1\d*)?[ \u00a0]?mL|"218"|218\.1/
  const dayMs = 24 * 60 * 60_000
  let bath: BathTank
  let over: string
  beforeEach(async () => {
    bath = await house.tankWithSchool()
  })
  /** Over, and so late that no strike opens its dose again. */
  const isEnded = async (given: object = {}) => {
    over = await house.signedBath(bath, { startsAt: '2026-12-01T12:10:00Z' })
    const dose = api.nextId()
    await house.record(over, { id: dose, ...given }).expect(201)
    await stopBath(dose, '2026-12-01T18:20:00Z').expect(201)
  }
  const next = (given: object = {}) => house.signedBath(bath, given)
  const read = async (by: TestPerson, path: string) => {
    const { body, text } = await by.agent.get(path).expect(200)
    return path.startsWith('/api/orders.csv') ? text : JSON.stringify(body)
  }
  const shut = async (number: string, by: TestPerson) =>
    (await by.agent.get(`${house.doseAt(number)}?blind=yes`).expect(200)).body.secondShut

  it('so it is left out everywhere for whoever may be asked, who is remembered when they look all the same', async () => {
    const keeper = await api.as('keeper')
    await isEnded()
    const listed = [`/api/orders?q=${over}`, `/api/orders.csv?q=${over}`]
    for (const path of listed) expect(await read(keeper, path)).toMatch(shows)
    const number = await next()
    await house.freshWater(bath)
    await house.calculateFirst(number).expect(201)
    for (const path of [...listed, `/api/orders/${over}`, `${house.doseAt(over)}?blind=yes`])
      expect(await read(keeper, path), path).not.toMatch(shows)
    const all = JSON.parse(await read(keeper, '/api/orders?limit=50')).rows as OrderRow[]
    expect(all.find((row) => row.number === over)).toMatchObject({ amountText: null })
    const today = JSON.parse(await read(keeper, '/api/today'))
    const told = [...today.items, ...today.log].filter((one) => Object.values(one.params).includes(over))
    expect(told.length).toBeGreaterThan(0)
    expect(JSON.stringify(told)).not.toMatch(shows)
    expect(await shut(number, keeper)).toBeNull()

    // on its own page, on its sheet and on paper, it is seen, and with it that of the next
    const looks = [`/api/orders/${over}?amounts=yes`, house.doseAt(over), `/api/orders/${over}/print`]
    for (const [i, path] of looks.entries()) {
      const by = await api.person({
        email: `looks-${String(i)}@harrow-point.example`,
        printedName: `Looks ${String(i)}`,
        roles: ['keeper'],
      })
      expect(await shut(number, by), path).toBeNull()
      await by.agent.get(path).expect(200)
      expect(await shut(number, by), path).toBe('amount-seen')
    }
    await house.calculateSecond(bath, number, {}, keeper).expect(201)
  })

  it('so the audit trail leaves it out for a veterinarian who may be asked', async () => {
    const other = await api.person({
      email: 'vet2@harrow-point.example',
      printedName: 'Second veterinarian',
      roles: ['veterinarian'],
    })
    await isEnded()
    const trail = () => read(other, `/api/audit?q=${over}`)
    expect(await trail()).toMatch(shows)
    const number = await next()
    expect(await trail()).not.toMatch(shows)
    await other.agent.get(`/api/orders/${number}?amounts=yes`).expect(200)
    expect(await trail()).toMatch(shows)
  })

  it('also where the two are for different tanks on one water', async () => {
    const beside = await anEnclosure(api, 'QT-90')
    const tank = await aBathWater(api, 'QT-91', [beside])
    bath = { tank, school: await aSchool(api, tank.id, 91) }
    await isEnded()
    const keeper = await api.as('keeper')
    expect(await read(keeper, `/api/orders/${over}`)).toMatch(shows)
    const other = { tank: { ...beside, sumpId: tank.sumpId }, school: await aSchool(api, beside.id, 90) }
    // determined anew between the two: the amount of the one still tells that of the other
    const bodies = [tank, { waterBodyId: tank.sumpId }, beside]
    await determineBathWater(api, 'QT-90', bodies, '2026-12-01T14:00:00Z')
    const number = await house.signedBath(other)
    expect(await read(keeper, `/api/orders/${over}`)).not.toMatch(shows)
    expect(JSON.parse(await read(house.technician, `/api/orders/${number}`)).amountsWithheld).toBe(false)
  })

  it('so a discrepancy of it names no amount to them, on the animal, on the worklist and in the trail', async () => {
    const other = await api.person({
      email: 'vet3@harrow-point.example',
      printedName: 'Third veterinarian',
      // the whole trail is open to them
      roles: ['veterinarian', 'administrator'],
    })
    const veterinarian = await api.as('veterinarian')
    await isEnded({ amount: { value: '2.18', unit: 'L' } })
    const places = [`/api/animals/${bath.school.accession}`, '/api/discrepancies?state=open&limit=50']
    const amounts = /218[ \u00a0]?mL|2\.18[ \u00a0]?L/
    const about = async (by: TestPerson, path: string) => {
      const body = JSON.parse(await read(by, path))
      const found = (body.discrepancies ?? body.rows ?? body.items) as object[]
      const own = found.filter((one) => JSON.stringify(one).includes(over))
      expect(own.length, path).toBeGreaterThan(0)
      return JSON.stringify(own)
    }
    for (const path of places) expect(await about(other, path)).toMatch(amounts)
    await next()
    for (const path of [...places, '/api/today']) {
      expect(await about(other, path), path).not.toMatch(amounts)
      expect(await about(veterinarian, path), path).toMatch(amounts)
    }
    const { discrepancies } = JSON.parse(await read(veterinarian, places[0] ?? ''))
    await veterinarian.agent
      .post(`/api/discrepancies/${String(discrepancies[0].id)}/resolution`)
      .set('Idempotency-Key', newKey())
      .send({ outcome: 'explained', reason: 'read from the wrong line of the balance' })
      .expect(200)
    const trail = `/api/audit?q=${bath.school.accession}`
    expect(await about(veterinarian, trail)).toMatch(amounts)
    expect(await about(other, trail)).not.toMatch(amounts)
  })

  it('so nobody is asked who learnt it there within a month, except who had worked it out blind', async () => {
    over = await next()
    await house.freshWater(bath)
    await house.calculateFirst(over).expect(201)
    await house.calculateSecond(bath, over).expect(201)
    const [given] = (await house.give(over).expect(201)).body.recorded
    await stopBath(given.id, '2026-12-01T18:20:00Z').expect(201)
    const veterinarian = await api.as('veterinarian')
    const withheld = async (number: string, by: TestPerson) =>
      JSON.parse(await read(by, `/api/orders/${number}`)).amountsWithheld as boolean
    const soon = await next({ target: { value: '90', unit: 'uL/L' } })
    await house.calculateFirst(soon, veterinarian).expect(201)
    expect(await shut(soon, house.technician)).toBe('amount-seen')
    expect(await withheld(over, house.technician)).toBe(false)
    expect(await shut(soon, house.second)).toBeNull()
    expect(await withheld(over, house.second)).toBe(true)
    // another water is another amount
    const elsewhere = await house.signedBath(await house.tankWithSchool())
    await house.calculateFirst(elsewhere, veterinarian).expect(201)
    expect(await shut(elsewhere, house.technician)).toBeNull()
    // and a month is long enough to forget a figure
    api.clock.set(new Date(testDay.getTime() + 31 * dayMs))
    const late = await next({ startsAt: api.clock.now().toISOString() })
    await house.freshWater(bath)
    await house.calculateFirst(late, veterinarian).expect(201)
    expect(await shut(late, house.technician)).toBeNull()
    expect(await withheld(over, house.technician)).toBe(true)
  })
})

describe('a dose under an order that is not what was signed', () => {
  const openOf = async (accession: string) =>
    (await (await api.as('veterinarian')).agent.get(`/api/animals/${accession}`).expect(200)).body
      .discrepancies as { kind: string; forRole: string; facts: Record<string, string> }[]

  it.each([
    ['text is not readable any more', `'x' || text`],
    ['text is another JSON', `'{"content":{"number":"TO-1"}}'`],
    ['text was changed', `replace(text, '"stopIf"', '"stopIF"')`],
    ['text says another amount', `replace(text, '218', '281')`],
  ])('whose %s is recorded, marked, and a veterinarian explains it', async (_, text) => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await owner.query(`UPDATE signed_texts SET text = ${text} WHERE subject_label = $1`, [number])
    const { agent } = house.technician
    const sheet = await agent.get(house.doseAt(number)).expect(200)
    expect(sheet.body).toMatchObject({
      state: 'broken',
      mayStart: false,
      signedAmountText: null,
      amountNow: null,
      enclosureCode: bath.tank.code,
    })
    expect(JSON.stringify(sheet.body)).not.toContain('281')
    expect(sheet.body.why.join(' ')).toContain('cannot be read any more')
    expect(sheet.body.treated.join()).toContain('Yellow tang')
    expect((await house.calculateFirst(number)).body.code).toBe('broken-record')
    expect((await house.give(number)).body.code).toBe('broken-record')
    expect((await agent.get(house.doseAt(number, '/print'))).status).toBe(409)

    const id = api.nextId()
    const recorded = await house.record(number, { id }).expect(201)
    expect(recorded.body.recorded).toMatchObject([{ id, kind: 'recorded' }])
    // nothing wears the end of a course that nobody can read
    expect((await agent.get(house.doseAt(number)).expect(200)).body.record).toBe('broken')
    const codes = recorded.body.recorded[0].exceptions.map(({ code }: { code: string }) => code)
    expect(codes).toContain('not-intact')
    expect(codes).not.toContain('amount-differs')
    expect(await openOf(bath.school.accession)).toMatchObject([
      { kind: 'dose-under-broken-order', forRole: 'veterinarian', facts: { order: number, key: '1' } },
    ])
    // the same again is kept once, and its end can be recorded
    await house.record(number, { id }).expect(201)
    expect((await stopBath(id, '2026-12-01T18:25:00Z').expect(201)).body.recorded[0].stop).not.toBeNull()
    expect(await openOf(bath.school.accession)).toHaveLength(1)
  })

  it('whose columns were changed opens the same discrepancy', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await owner.query(
      `UPDATE order_versions v SET amount_entered_value = 2180 FROM orders o WHERE o.id = v.order_id AND o.number = $1`,
      [number],
    )
    await house.record(number).expect(201)
    expect((await openOf(bath.school.accession)).map(({ kind }) => kind)).toContain('dose-under-broken-order')
  })
})
