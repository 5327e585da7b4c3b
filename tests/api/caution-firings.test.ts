import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { aDraft, shownCautions, signDraft } from '../builders/an-order.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
afterAll(() => api.stop())

interface Row {
  ruleId: string
  fired: number
  overridden: number
  isOften: boolean
  reasons: { reason: string; times: number }[]
}
const listOf = async (month: string) => {
  const { agent } = await api.as('veterinarian')
  return (await agent.get(`/api/caution-firings?month=${month}`).expect(200)).body as {
    rules: Row[]
    unreadable: number
  }
}
const rowOf = async (ruleId: string) => (await listOf('2026-12')).rules.find((one) => one.ruleId === ruleId)

/** An order for a pond whose temperature nobody read: signed with a reason for every stop. */
async function signedPond(reason: string): Promise<string[]> {
  const bath = await house.tankWithSchool()
  const fields = { setting: 'pond', target: { value: '200', unit: 'uL/L' }, contactMinutes: 30 }
  const draft = await aDraft(api, house.fieldsOf(bath, fields))
  const stops = (await shownCautions(api, draft.number)).filter(({ level }) => level === 'stop')
  const ids = stops.map(({ ruleId }) => ruleId)
  const signed = await signDraft(api, draft, {
    overrides: [...new Set(ids)].map((ruleId) => ({ ruleId, reason })),
  })
  if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  return ids
}

describe('how often rules fired in a month', () => {
  it('counts what was signed, what was overridden and why, and puts what is overridden most before the veterinarian', async () => {
    expect((await listOf('2026-12')).rules).toEqual([])
    await signedPond('the keeper read the pond by hand')
    const stops = await signedPond('the keeper read the pond by hand')
    await signedPond('another reason')
    const perOrder = stops.filter((ruleId) => ruleId === 'R03').length
    expect(await rowOf('R03')).toMatchObject({
      fired: 3 * perOrder,
      overridden: 3 * perOrder,
      isOften: true,
      reasons: [
        { reason: 'the keeper read the pond by hand', times: 2 * perOrder },
        { reason: 'another reason', times: perOrder },
      ],
    })
    // a warning that was read is no override
    expect(await rowOf('R06')).toMatchObject({ fired: 3, overridden: 0, isOften: false, reasons: [] })
    const { rules, unreadable } = await listOf('2026-12')
    expect(unreadable).toBe(0)
    const often = rules.map(({ isOften }) => isOften)
    expect(often).toEqual([...often].sort((a, b) => Number(b) - Number(a)))
    expect((await listOf('2026-11')).rules).toEqual([])
  })

  it('counts what is kept with a dose that was given all the same', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const before = (await rowOf('R01'))?.fired ?? 0
    await house.record(number).expect(201)
    expect(await rowOf('R01')).toMatchObject({ fired: before + 1, overridden: 0 })
  })

  it('comes as CSV, a row for each reason', async () => {
    const { agent } = await api.as('veterinarian')
    const reply = await agent.get('/api/caution-firings.csv?month=2026-12').expect(200)
    expect(reply.headers['content-type']).toContain('text/csv')
    const lines = reply.text.replace('\ufeff', '').split('\r\n')
    expect(lines[0]).toBe('month,rule,asks,fired,overridden,more_than_half,reason,times')
    expect(lines.filter((line) => line.startsWith('2026-12,R03,'))).toHaveLength(2)
    expect(reply.text).toContain('another reason')
  })

  it('is for veterinarians, and asks for a month', async () => {
    for (const role of ['technician', 'keeper', 'registrar', 'administrator'] as const)
      await (await api.as(role)).agent.get('/api/caution-firings?month=2026-12').expect(403)
    const { agent } = await api.as('veterinarian')
    await agent.get('/api/caution-firings?month=2026-13').expect(422)
    await agent.get('/api/caution-firings').expect(422)
  })
})
