import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aSchool } from '../builders/an-order.ts'
import { aPlace } from '../builders/a-collection.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
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
      '14 animals, Yellow tang (no longer in this water)',
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
