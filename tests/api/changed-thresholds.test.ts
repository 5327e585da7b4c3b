import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { putInForce } from '../builders/a-threshold.ts'
import { readingsNow } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let house: FormalinHouse
let tech: TestPerson
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
  tech = await api.as('technician')
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const plain = (text: string) => text.replace(/\s+/g, ' ')

/** A bath signed at the thresholds in force, in water that was read at so much oxygen a few minutes ago. */
async function aBathAt(oxygenMgPerL: string): Promise<string> {
  const bath = await house.tankWithSchool()
  const number = await house.signedBath(bath, { contactMinutes: 30 })
  await house.freshWater(bath)
  await readingsNow(
    api,
    bath.tank.waterBodyId,
    { 'dissolved-oxygen': [oxygenMgPerL, 'mg/L'] },
    '2026-12-01T18:12:00Z',
  )
  return number
}
const floor = (value: string) => putInForce(api, 'R01', 'oxygenFloorMgPerL', value)
interface Step {
  ruleId: string
  text: string
  state: string
  help: string | null
  changed: string[]
}
async function sheetOf(number: string) {
  const sheet = (await tech.agent.get(house.doseAt(number)).expect(200)).body
  const steps = sheet.steps as Step[]
  const found = steps.find(({ ruleId }) => ruleId === 'R01')
  if (!found) throw new Error('no step of oxygen')
  return { sheet, step: { ...found, changed: found.changed.map(plain) } }
}

describe('a threshold that was changed after an order was signed', () => {
  it('shows the signed one, says in a sentence of its own that it is stricter now, and stops by the stricter', async () => {
    await floor('4')
    const number = await aBathAt('5.4')
    const before = await sheetOf(number)
    expect(plain(before.step.text)).toContain('Oxygen at least 4 mg/L')
    expect(before.step).toMatchObject({ state: 'met', help: null, changed: [] })

    await floor('6')
    const { sheet, step } = await sheetOf(number)
    expect(plain(step.text)).toContain('Oxygen at least 4 mg/L')
    // by the signed limit nothing is found; what is found by the one in force stands with the sentence that names it
    expect(step.help).toBeNull()
    expect(step.state).toBe('unmet')
    expect(step.changed[0]).toBe(
      'Since signing the facility has changed this limit to 6 mg/L (lowest oxygen). Each dose is judged by the limit in force.',
    )
    expect(step.changed[1]).toContain('5.4 mg/L')
    expect(step.changed).toHaveLength(2)
    expect(sheet.mayStart).toBe(false)
    expect(plain(JSON.stringify(sheet.why))).toContain('6 mg/L')
    await house.calculateFirst(number).expect(201)
    const refused = await house.give(number)
    expect(refused.status).toBe(409)

    const paper = plain(textOf(await fetchPdf(tech, house.doseAt(number, '/print'))))
    expect(paper).toContain('Since signing the facility has changed this limit to 6 mg/L')
    expect(paper).toContain('Oxygen at least 4 mg/L')
  })

  it('says what is found by the signed limit, where that finds it too', async () => {
    await floor('5')
    const number = await aBathAt('4.2')
    await floor('6')
    const { step } = await sheetOf(number)
    expect(plain(step.help ?? '')).toContain('5 mg/L')
    expect(plain(step.help ?? '')).not.toContain('6 mg/L')
    expect(step.changed).toEqual([
      'Since signing the facility has changed this limit to 6 mg/L (lowest oxygen). Each dose is judged by the limit in force.',
    ])
  })

  it('says so as well where it was loosened: a step is not met against its own words without a word', async () => {
    await floor('6')
    const number = await aBathAt('5.4')
    await floor('4.5')
    const { step } = await sheetOf(number)
    expect(plain(step.text)).toContain('Oxygen at least 6 mg/L')
    expect(step.state).toBe('met')
    expect(step.changed[0]).toContain('changed this limit to 4.5 mg/L')
    // both limits find it; who confirmed the loosened one is still told
    const low = await aBathAt('4.2')
    await floor('4.4')
    const told = (await sheetOf(low)).step
    expect(told.changed.join(' ')).toContain('Loosened here: lowest oxygen 4.4 mg/L in place of 5 mg/L')
  })

  it('is silent about a limit of a test that the order does not ask for', async () => {
    await floor('5')
    const number = await aBathAt('6.4')
    await putInForce(api, 'R31', 'copperHours', '6')
    const { sheet } = await sheetOf(number)
    for (const { changed } of sheet.steps as Step[]) expect(changed).toEqual([])
  })
})
