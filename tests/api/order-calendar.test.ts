import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
afterAll(() => api.stop())

describe('the doses of an order', () => {
  it('name on its page every record with what it breaks, and are counted for the list; not for a struck one', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await house.freshWater(bath)
    const amount = { value: '218', unit: 'mL' }
    const order = async () => (await house.technician.agent.get(`/api/orders/${number}`).expect(200)).body
    await house.record(number, { amount }).expect(201)
    expect(await order()).toMatchObject({ phase: 'in-progress', dosesIrregular: 0 })
    const tenfold = api.nextId()
    await house
      .record(number, {
        id: tenfold,
        amount: { value: '2.18', unit: 'L' },
        happenedAt: '2026-12-01T18:22:00Z',
      })
      .expect(201)
    const { dosesIrregular, calendar } = await order()
    expect(dosesIrregular).toBe(1)
    expect(calendar[0].records).toMatchObject([
      { kind: 'recorded', by: 'Test technician', broke: [], record: 'intact' },
      {
        kind: 'recorded',
        by: 'Test technician',
        broke: ['Another amount was given than was worked out', 'All planned doses are given'],
      },
    ])
    // titles alone: the amount is for nobody who may calculate the dose blind
    expect(JSON.stringify(calendar)).not.toContain('2.18')
    await house.technician.agent
      .post(`/api/dose-records/dose/${tenfold}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'typed in litres' })
      .expect(200)
    expect(await order()).toMatchObject({ dosesIrregular: 0, calendar: [{ records: [{ broke: [] }] }] })
    // stopped before its time
    const [{ id }] = (
      await house.technician.agent.get(house.doseAt(number)).expect(200)
    ).body.recorded.filter(({ struck }: { struck: unknown }) => struck === null)
    await house.technician.agent
      .post(`/api/doses/${id}/stop`)
      .send({ id: api.nextId(), cause: 'stopped', happenedAt: testDay.toISOString(), seen: 'on their side' })
      .expect(201)
    expect(await order()).toMatchObject({ phase: 'completed', dosesIrregular: 1 })
    const list = await house.technician.agent.get(`/api/orders?q=${number}`).expect(200)
    expect(list.body.rows).toMatchObject([{ number, dosesIrregular: 1 }])
  })

  it('given before the order was signed is one of them', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    await house.record(number, { happenedAt: '2026-12-01T08:00:00Z' }).expect(201)
    const { dosesIrregular, calendar } = (
      await house.technician.agent.get(`/api/orders/${number}`).expect(200)
    ).body
    expect(dosesIrregular).toBe(1)
    expect(calendar[0].records[0].broke).toContain('The order was signed after this dose')
  })
})
