import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
let bath: BathTank
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
beforeEach(async () => {
  api.clock.set(testDay)
  bath = await house.tankWithSchool()
})
afterAll(() => api.stop())

describe('the amount of a dose whose record a strike would open again', () => {
  it('is kept from a second person, who is remembered when they look all the same', async () => {
    const number = await house.signedBath(bath)
    await house.freshWater(bath)
    const keeper = await api.as('keeper')
    const other = await api.person({
      email: 'vet3@harrow-point.example',
      printedName: 'Third veterinarian',
      roles: ['veterinarian'],
    })
    const url = `/api/orders/${number}`
    const sent = (body: object) => JSON.stringify(body).replaceAll('\u00a0', ' ')
    const shows = /21[89](\.1\d*)? ?mL|"21[89]"|218\.1/
    const withheld = await house
      .record(number, { kind: 'withheld', amount: null, lotId: null }, house.second)
      .expect(201)
    expect(withheld.body).toMatchObject({ blind: true, state: 'done' })
    const isOfIt = (one: { params: object }) => Object.values(one.params).includes(number)
    const seenBy = async (by: TestPerson) => [
      sent(await house.blindSheet(number, by)),
      sent((await by.agent.get(url).expect(200)).body),
      sent((await by.agent.get(`/api/orders?q=${number}`).expect(200)).body),
      (await by.agent.get(`/api/orders.csv?q=${number}`).expect(200)).text,
      sent((await by.agent.get('/api/today').expect(200)).body.log.filter(isOfIt)),
    ]
    for (const shown of [sent(withheld.body), ...(await seenBy(house.second)), ...(await seenBy(keeper))]) {
      expect(shown).toContain(number)
      expect(shown).not.toMatch(shows)
    }
    // whoever asks all the same, or prints it, is remembered
    const whole = await keeper.agent.get(house.doseAt(number)).expect(200)
    expect(sent(whole.body)).toMatch(shows)
    await other.agent.get(`${url}/print`).expect(200)

    const { id } = withheld.body.recorded[0]
    const struck = await house.second.agent
      .post(`/api/dose-records/dose/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'the other tank was meant' })
      .expect(200)
    expect(sent(struck.body)).not.toMatch(shows)
    await house.calculateFirst(number).expect(201)
    for (const by of [keeper, other]) {
      expect((await house.blindSheet(number, by)).secondShut).toBe('amount-seen')
      expect((await house.calculateSecond(bath, number, {}, by)).body.code).toBe('another-person-needed')
    }
    await house.calculateSecond(bath, number).expect(201)
  })

  it('is shown once the last window is over, after which no dose of the order is given', async () => {
    const number = await house.signedBath(bath)
    const given = (await house.record(number).expect(201)).body.recorded[0]
    expect(given.amountText).toBe('218\u00a0mL')
    api.clock.set(new Date(testDay.getTime() + 45 * 60_000))
    await house.technician.agent
      .post(`/api/doses/${given.id}/stop`)
      .send({ id: api.nextId(), happenedAt: api.clock.now().toISOString(), cause: 'time-up' })
      .expect(201)
    const keeper = await api.as('keeper')
    const shown = async () => (await keeper.agent.get(`/api/orders/${number}`).expect(200)).body
    const logged = async () => {
      const { log } = (await keeper.agent.get('/api/today').expect(200)).body
      return JSON.stringify(
        log.filter(({ params }: { params: object }) => Object.values(params).includes(number)),
      )
    }
    expect(await shown()).toMatchObject({ phase: 'completed', amountsWithheld: true, amountText: null })
    expect(await logged()).toContain(number)
    expect(await logged()).not.toContain('218')
    api.clock.set(new Date(testDay.getTime() + 7 * 60 * 60_000))
    expect(await shown()).toMatchObject({ amountsWithheld: false, amountText: '218\u00a0mL' })
  })
})
