import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import { aCase } from '../builders/a-case.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aProduct, aSchool } from '../builders/an-order.ts'
import { aPlace } from '../builders/a-collection.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'

let api: TestApi
let house: FormalinHouse
let worklist: ReturnType<typeof worklistOf>
beforeAll(async () => {
  api = await startApi()
  worklist = worklistOf(api)
  house = await aFormalinHouse(api)
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const codesOf = (reply: { body: { recorded: { exceptions: { code: string }[] }[] } }) =>
  reply.body.recorded.flatMap(({ exceptions }) => exceptions.map(({ code }) => code))

const openOf = async (accession: string) =>
  (await (await api.as('veterinarian')).agent.get(`/api/animals/${accession}`).expect(200)).body
    .discrepancies as { id: string; kind: string; forRole: string }[]

async function moveAway({ tank, school }: BathTank) {
  const other = await aPlace(api)
  await (
    await api.as('veterinarian')
  ).agent
    .post(`/api/animals/${school.accession}/moves`)
    .send({
      id: api.nextId(),
      fromEnclosureId: tank.id,
      toEnclosureId: other.id,
      happenedAt: '2026-12-01T18:00:00Z',
      reason: 'cleared',
    })
    .expect(201)
}

describe('a dose whose animals have left the water', () => {
  it('is neither prepared nor given; what went in is recorded, marked, and a veterinarian explains it', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await house.freshWater(bath)
    await house.calculateFirst(number).expect(201)
    await house.calculateSecond(bath, number).expect(201)
    await moveAway(bath)
    const sentence = `The animals of this order are not in this water any more: ${bath.school.accession} Yellow tang.`
    const sheet = await house.technician.agent.get(house.doseAt(number)).expect(200)
    expect(sheet.body.mayStart).toBe(false)
    expect(sheet.body.why.join(' ')).toContain(sentence)
    expect(sheet.body.treated.join().replaceAll('\u00a0', ' ')).toBe(
      `Yellow tang, 14 animals, ${bath.school.accession} (no longer in this water)`,
    )
    const first = await house.calculateFirst(number)
    expect(first.body).toMatchObject({ code: 'dose-not-possible' })
    expect(first.body.detail).toContain(sentence)
    expect((await house.give(number)).body.detail).toContain(sentence)

    const recorded = await house.record(number).expect(201)
    expect(codesOf(recorded)).toContain('animals-gone')
    expect(await openOf(bath.school.accession)).toMatchObject([
      { kind: 'dosed-in-absence', forRole: 'veterinarian' },
    ])
  })

  it('goes on for the others while some are left, and says who is gone', async () => {
    const bath = await house.tankWithSchool()
    const others = await aSchool(api, bath.tank.id, 90)
    const number = await house.signedBath(bath, { animalIds: [bath.school.id, others.id] })
    await house.freshWater(bath)
    await moveAway(bath)
    const first = await house.calculateFirst(number).expect(201)
    expect(first.body.why.join(' ')).not.toContain('not in this water any more')
    expect(first.body.cautions[0]).toMatchObject({ code: 'animals-left', level: 'warning' })
    expect(first.body.cautions[0].text).toContain(bath.school.accession)
    await house.calculateSecond(bath, number).expect(201)
    await house.give(number).expect(201)
    expect(await openOf(others.accession)).toEqual([])
  })
})

describe('the next dose', () => {
  const whyNot = async (number: string, key: string) => {
    const sheet = await house.technician.agent.get(`/api/orders/${number}/doses/${key}`).expect(200)
    return (sheet.body.why as string[]).join(' ').replaceAll('\u00a0', ' ')
  }

  it('waits until somebody recorded the end of the bath before it', async () => {
    const number = await house.signedBath(await house.tankWithSchool(), { doses: 2, intervalHours: 24 })
    const doseId = api.nextId()
    await house.record(number, { id: doseId }).expect(201)
    expect(await whyNot(number, '2')).toContain('The bath of dose 1, begun 1 Dec 2026, 14:20, has no end.')
    const stop = { id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T18:20:00Z' }
    await house.technician.agent.post(`/api/doses/${doseId}/stop`).send(stop).expect(201)
    expect(await whyNot(number, '2')).not.toContain('has no end')
  })

  it('is not worked out from a product that somebody changed in the database; what went in is kept and marked', async () => {
    const powder = await aProduct(api, {})
    const number = await house.signedBath(await house.tankWithSchool(), {
      productId: powder.id,
      lotId: powder.lotId,
      target: { value: '2', unit: 'mg/L' },
      basis: 'active',
      division: { value: '0.01', unit: 'g' },
      contactMinutes: null,
      timing: 'indefinite',
    })
    expect(await whyNot(number, '1')).not.toContain('was signed')
    const owner = new pg.Client({ connectionString: api.ownerUrl })
    await owner.connect()
    await owner.query(`UPDATE products SET strength_entered_value = 9.9 WHERE id = $1`, [powder.id])
    await owner.end()
    expect(await whyNot(number, '1')).toContain('The strength of this product')
    expect(await whyNot(number, '1')).toContain('is not what was entered')
    const sheet = (await house.technician.agent.get(`/api/orders/${number}/doses/1`).expect(200)).body
    expect([sheet.amountNowText, sheet.mayStart]).toEqual([null, false])
    const first = await house.technician.agent
      .post(house.doseAt(number, '/first-calculation'))
      .send({ id: api.nextId(), lotId: powder.lotId })
    expect([first.status, first.body.detail]).toEqual([
      409,
      expect.stringContaining('is not what was entered'),
    ])
    const amount = { value: '4.36', unit: 'g' }
    expect((await house.give(number, { lotId: powder.lotId, amount })).status).toBe(409)
    const recorded = await house.record(number, { lotId: powder.lotId, amount }).expect(201)
    const codes = recorded.body.recorded[0].exceptions.map(({ code }: { code: string }) => code)
    expect(codes).toContain('figures-changed')
    // it is the amount that was signed, from the strength as it was entered
    expect(codes).not.toContain('amount-differs')
  })
})

describe('an amount recorded as given', () => {
  it('ten times what was worked out is kept, marked against both figures, and locks the next dose until explained', async () => {
    const bath = await house.tankWithSchool()
    const also = await aSchool(api, bath.tank.id, 91)
    const number = await house.signedBath(bath, {
      animalIds: [bath.school.id, also.id],
      doses: 2,
      intervalHours: 24,
    })
    const keeper = await api.as('keeper')
    const recorded = await house.record(number, { amount: { value: '2.18', unit: 'L' } }, keeper).expect(201)
    expect(recorded.body.recorded[0].amountText).toBe('2.18\u00a0L')
    const [mark] = recorded.body.recorded[0].exceptions.filter(
      ({ code }: { code: string }) => code === 'amount-differs',
    )
    expect(mark).toMatchObject({ level: 'stop' })
    expect(mark.text.replaceAll('\u00a0', ' ')).toBe(
      'Given: 2.18 L. Signed: 218 mL. Worked out for the water then: 218 mL. That is about 10 times as much.',
    )

    // one dose is one thing to explain, however many animals were in the water
    const open = await openOf(bath.school.accession)
    expect(open).toMatchObject([{ kind: 'dose-amount-differs', forRole: 'veterinarian' }])
    expect(await openOf(also.accession)).toHaveLength(1)
    const [item, ...more] = await worklist.itemsOf('veterinarian', 'discrepancy-veterinarian', number)
    expect(more).toEqual([])
    expect(item?.params).toMatchObject({ code: 'dose-amount-differs', 'fact.given': '2.18\u00a0L' })
    const next = await house.technician.agent.get(`/api/orders/${number}/doses/2`).expect(200)
    expect(next.body.why.join(' ')).toContain('A veterinarian looks at it and explains it first.')

    const { agent } = await api.as('veterinarian')
    await agent
      .post(`/api/discrepancies/${open[0]?.id ?? ''}/resolution`)
      .set('Idempotency-Key', newKey())
      .send({ outcome: 'seen-wrongly', reason: 'it was 218 mL; litres were typed by mistake' })
      .expect(200)
    expect(await openOf(also.accession)).toEqual([])
    const after = await house.technician.agent.get(`/api/orders/${number}/doses/2`).expect(200)
    expect(after.body.why.join(' ')).not.toContain('explains it first')
  })

  it.each([
    ['21.8', 'mL', 'That is about 10 times less.'],
    ['230', 'mL', 'Worked out for the water then: 218 mL.'],
    ['235', 'g', 'The two cannot be compared: one is a weight and the other a volume.'],
  ])('of %s %s is marked', async (value, unit, sentence) => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const recorded = await house.record(number, { amount: { value, unit } }).expect(201)
    const marks = recorded.body.recorded[0].exceptions as { code: string; text: string }[]
    const text = marks.find(({ code }) => code === 'amount-differs')?.text.replaceAll('\u00a0', ' ') ?? ''
    expect(text.endsWith(sentence)).toBe(true)
    expect(await openOf(bath.school.accession)).toHaveLength(1)
  })

  it('within two percent or one step of the measure is not', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const recorded = await house.record(number, { amount: { value: '0.222', unit: 'L' } }).expect(201)
    expect(codesOf(recorded)).not.toContain('amount-differs')
    expect(await openOf(bath.school.accession)).toEqual([])
  })

  it('counts for as much as went in, in what the next order is judged by', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath, {
      target: { value: '25', unit: 'mg/L' },
      basis: 'active',
      division: { value: '1', unit: 'mL' },
    })
    const sheet = await house.technician.agent.get(house.doseAt(number)).expect(200)
    const tenfold = {
      value: String(Number(sheet.body.amountNow.value) * 10),
      unit: sheet.body.amountNow.unit,
    }
    await house.record(number, { amount: tenfold }).expect(201)
    const [row] = await api.composition.parts.dataSource.query(
      `SELECT d.given_mg_per_l FROM doses d JOIN order_versions v ON v.id = d.order_version_id
         JOIN orders o ON o.id = v.order_id WHERE o.number = $1`,
      [number],
    )
    expect(row.given_mg_per_l).toBeCloseTo(250, 6)
  })
})

describe('a record of a dose that was a mistake', () => {
  const strike = async (
    kind: 'dose' | 'stop',
    id: string,
    by: TestPerson,
    reason = 'typed on the wrong order',
  ) => by.agent.post(`/api/dose-records/${kind}/${id}/void`).set('Idempotency-Key', newKey()).send({ reason })
  const tomorrow = new Date('2026-12-02T18:20:00Z')

  it('is struck out with a reason, stays readable, and nothing rests on it any more', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await house.freshWater(bath)
    const id = api.nextId()
    await house.record(number, { id, amount: { value: '2.18', unit: 'L' } }).expect(201)
    const order = async () => (await house.technician.agent.get(`/api/orders/${number}`).expect(200)).body
    expect(await order()).toMatchObject({ dosesGiven: 1 })
    const struck = await strike('dose', id, house.technician)
    expect(struck.status).toBe(200)
    expect(struck.body).toMatchObject({
      state: 'due',
      recorded: [
        {
          id,
          amountText: '2.18\u00a0L',
          mayStrike: false,
          struck: { reason: 'typed on the wrong order', by: 'Test technician' },
        },
      ],
    })
    expect(await order()).toMatchObject({ dosesGiven: 0 })
    expect(await openOf(bath.school.accession)).toEqual([])
    expect((await strike('dose', id, house.technician)).body.code).toBe('already-void')
    // the dose can be given after all
    await house.calculateFirst(number).expect(201)
    await house.calculateSecond(bath, number).expect(201)
    const given = await house.give(number).expect(201)
    expect(given.body.recorded.map((one: { struck: unknown }) => one.struck !== null)).toEqual([false, true])
  })

  it('by whoever recorded it on its day, or a veterinarian; by nobody else', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const id = api.nextId()
    await house.record(number, { id }).expect(201)
    expect((await strike('dose', id, house.second)).status).toBe(403)
    expect((await strike('dose', id, await api.as('registrar'))).status).toBe(403)
    api.clock.set(tomorrow)
    const late = await strike('dose', id, house.technician)
    expect([late.status, late.body.code]).toEqual([403, 'may-not'])
    expect(late.body.detail).toContain('a veterinarian does')
    expect((await strike('dose', id, await api.as('veterinarian'))).status).toBe(200)
    expect((await strike('stop', id, await api.as('veterinarian'))).status).toBe(404)
  })

  it('takes back what it told the clocks of quarantine', async () => {
    const { tank } = await house.tankWithSchool()
    const batch = await aCase(api, { enclosure: tank })
    const events = async () =>
      (
        await api.composition.parts.dataSource.query(
          `SELECT e.kind FROM live_case_events e JOIN quarantine_cases c ON c.id = e.case_id
            WHERE c.number = $1 AND e.kind LIKE 'treatment%' ORDER BY e.happened_at, e.id`,
          [batch.number],
        )
      ).map((row: { kind: string }) => row.kind)
    const bath = { tank, school: batch.animal }
    const number = await house.signedBath(bath)
    const dose = api.nextId()
    const stop = { id: api.nextId(), cause: 'time-up', happenedAt: '2026-12-01T18:20:00Z' }
    await house.record(number, { id: dose, happenedAt: '2026-12-01T17:35:00Z' }).expect(201)
    await house.technician.agent.post(`/api/doses/${dose}/stop`).send(stop).expect(201)
    expect(await events()).toEqual(['treatment-started', 'treatment-ended'])
    // the end alone: the bath has not ended, its beginning stands
    expect((await strike('stop', stop.id, house.technician)).body).toMatchObject({ state: 'running' })
    expect(await events()).toEqual(['treatment-started'])
    expect((await strike('dose', dose, house.technician)).status).toBe(200)
    expect(await events()).toEqual([])
  })

  it('whose end lies before it runs on: the end is kept, said and explained, and ends nothing', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const dose = api.nextId()
    await house.record(number, { id: dose }).expect(201)
    const keeper = await api.as('keeper')
    const stopped = await keeper.agent
      .post(`/api/doses/${dose}/stop`)
      .send({ id: api.nextId(), cause: 'stopped', happenedAt: '2026-12-01T08:20:00Z' })
      .expect(201)
    expect(stopped.body).toMatchObject({
      state: 'running',
      recorded: [{ stop: null, otherStops: [{ beforeStart: true, mayStrike: true }] }],
    })
    expect(await openOf(bath.school.accession)).toMatchObject([
      { kind: 'end-before-dose', forRole: 'veterinarian' },
    ])
    const today = await keeper.agent.get('/api/today').expect(200)
    expect(JSON.stringify(today.body)).toContain(`bath-running`)
    // a minute is the finest that is typed: the minute of the dose is not before it
    const ended = await keeper.agent
      .post(`/api/doses/${dose}/stop`)
      .send({ id: api.nextId(), cause: 'stopped', happenedAt: '2026-12-01T18:20:00Z' })
      .expect(201)
    expect(ended.body).toMatchObject({ state: 'done', recorded: [{ stop: { beforeStart: false } }] })
    const early = ended.body.recorded[0].otherStops[0].id
    expect((await strike('stop', early, keeper)).body.recorded[0].otherStops).toEqual([])
    expect(await openOf(bath.school.accession)).toEqual([])
  })
})

describe('a lot of another product', () => {
  it('is neither prepared nor given nor signed; recorded as given it is kept, marked and explained', async () => {
    const bath = await house.tankWithSchool()
    const other = await aProduct(api, {})
    const number = await house.signedBath(bath)
    const sentence = 'Lot PZ-0317 is of another product (Praziquantel powder).'
    const first = await house.technician.agent
      .post(house.doseAt(number, '/first-calculation'))
      .send({ id: api.nextId(), lotId: other.lotId })
    expect([first.status, first.body.errors[0].pointer]).toEqual([422, '/lotId'])
    expect(first.body.errors[0].detail).toContain(sentence)
    const given = await house.give(number, { lotId: other.lotId })
    expect([given.status, given.body.errors[0].code]).toEqual([422, 'lot-of-other-product'])

    const recorded = await house.record(number, { lotId: other.lotId }).expect(201)
    expect(codesOf(recorded)).toContain('other-product')
    expect(await openOf(bath.school.accession)).toMatchObject([{ kind: 'dose-of-other-product' }])
    await expect(house.signedBath(bath, { lotId: other.lotId })).rejects.toThrow('lot-of-other-product')
  })

  it('that nobody has is refused with what to do, not as a fault of the house', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const nobodys = { lotId: api.nextId() }
    for (const reply of [
      await house.record(number, nobodys),
      await house.give(number, nobodys),
      await house.technician.agent
        .post(house.doseAt(number, '/first-calculation'))
        .send({ id: api.nextId(), ...nobodys }),
    ]) {
      expect([reply.status, reply.body.code]).toEqual([422, 'bad-input'])
      expect(reply.body.errors[0].detail).toContain('There is no such lot.')
    }
    await expect(house.signedBath(bath, nobodys)).rejects.toThrow('lot-of-other-product')
  })
})
