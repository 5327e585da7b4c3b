import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
let expired: string
let fresh: string
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
  expired = await aLot('FM-0001', '2026-11-30')
  fresh = await aLot('FM-0002', '2028-03-31')
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

async function aLot(lotNumber: string, expiresOn: string): Promise<string> {
  const id = api.nextId()
  await house.technician.agent
    .post(`/api/products/${house.formalin.id}/lots`)
    .send({ id, lotNumber, expiresOn, receivedOn: '2026-06-10' })
    .expect(201)
  return id
}

async function aReadyBath() {
  const bath = await house.tankWithSchool()
  const number = await house.signedBath(bath)
  await house.freshWater(bath)
  return { bath, number }
}
const sheetOf = async (number: string, query = '') =>
  (await house.technician.agent.get(`${house.doseAt(number)}${query}`).expect(200)).body
const codes = (sheet: { cautions: { code: string }[] }) => sheet.cautions.map(({ code }) => code)
const stateOf = (sheet: { steps: { ruleId: string; state: string }[] }, rule: string) =>
  sheet.steps.find(({ ruleId }) => ruleId === rule)?.state
const calculate = (number: string, lotId: string) =>
  house.technician.agent.post(house.doseAt(number, '/first-calculation')).send({ id: api.nextId(), lotId })

describe('the lot in the hand', () => {
  it('is the one that a sheet is judged by as soon as it is chosen, also by whoever sees no amount', async () => {
    const { number } = await aReadyBath()
    const ordered = await sheetOf(number, '?blind=yes')
    expect([codes(ordered).includes('lot-expired'), stateOf(ordered, 'R34')]).toEqual([false, 'met'])
    for (const blind of ['', '&blind=yes']) {
      const chosen = await sheetOf(number, `?lot=${expired}${blind}`)
      expect(chosen.lotId).toBe(expired)
      expect([codes(chosen).includes('lot-expired'), stateOf(chosen, 'R34')]).toEqual([true, 'unmet'])
    }
    // and one that nobody has is none to judge by
    expect((await sheetOf(number, `?lot=${api.nextId()}`)).lotId).toBe(house.formalin.lotId)
  })

  it('that is expired shows its caution with the first calculation, and is given only by an override of a veterinarian', async () => {
    const { bath, number } = await aReadyBath()
    const first = await calculate(number, expired).expect(201)
    expect(codes(first.body)).toContain('lot-expired')
    expect(first.body).toMatchObject({ lotId: expired, lotChanged: false, mayStart: false })
    const second = { lotRead: 'FM-0001' }
    await house.calculateSecond(bath, number, second).expect(201)
    const refused = await house.give(number, { lotId: expired })
    expect([refused.status, refused.body.code]).toEqual([409, 'dose-not-possible'])
    const stop = (await sheetOf(number)).cautions.find(({ code }: { code: string }) => code === 'lot-expired')
    const { agent } = await api.as('veterinarian')
    const reason = 'no other lot on the island; the strength was measured today'
    await agent
      .post(house.doseAt(number, '/overrides'))
      .set('Idempotency-Key', newKey())
      .send({ password, ruleId: 'R34', code: 'lot-expired', finding: stop.finding, lotId: expired, reason })
      .expect(201)
    const sheet = await sheetOf(number)
    expect(sheet.why.join(' ')).not.toContain('expired')
    // for that lot alone: the bottle of another is judged by itself
    const other = await sheetOf(number, `?lot=${fresh}`)
    expect([codes(other).includes('lot-expired'), other.lotChanged, other.mayStart]).toEqual([
      false,
      true,
      false,
    ])
  })

  it('chosen after the first calculation asks for it again, and its own bottle to be looked at', async () => {
    const { bath, number } = await aReadyBath()
    await house.calculateFirst(number).expect(201)
    await house.calculateSecond(bath, number).expect(201)
    expect(await sheetOf(number)).toMatchObject({ mayStart: true, lotChanged: false })
    const other = await sheetOf(number, `?lot=${fresh}`)
    expect(other).toMatchObject({ lotId: fresh, lotChanged: true, mayStart: false })
    expect(other.why.join(' ')).toContain('again')
    const clear = (sheet: { steps: { text: string; state: string }[] }) =>
      sheet.steps.find(({ text }) => text.includes('precipitate'))?.state
    expect([clear(await sheetOf(number)), clear(other)]).toEqual(['met', 'unknown'])
    expect((await house.give(number, { lotId: fresh })).body.code).toBe('dose-not-possible')
    // what went in all the same is recorded, and marked by the lot that it came from
    const recorded = await house.record(number, { lotId: expired }).expect(201)
    expect(recorded.body.recorded[0].exceptions.map(({ code }: { code: string }) => code)).toContain(
      'lot-expired',
    )
  })
})
