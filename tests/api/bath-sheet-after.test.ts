import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { bathSheetDocument } from '../../server/features/administrations/bath-sheet-document.ts'
import { drawDocument } from '../../server/platform/pdf/draw-document.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { layoutOf, pageCount, textOf } from '../pdf/support/poppler.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { fetchPdf } from '../support/fetch-pdf.ts'

let api: TestApi
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
afterAll(() => api.stop())

const printed = (number: string) => fetchPdf(house.technician, house.doseAt(number, '/print'))
/** From the two calculations on: the page that is filled in, or says what was. */
const after = (bytes: Uint8Array) =>
  (layoutOf(bytes).split('Two calculations')[1] ?? '').split('licence')[0] ?? ''
/** A box for the pen holds its unit alone. */
const emptyBox = /(First|Second)( +mL)? *$/m

describe('a bath sheet printed', () => {
  it('after the first calculation names who made it, and no amount to the second person', async () => {
    const bath = await house.tankWithSchool()
    await house.freshWater(bath)
    const number = await house.signedBath(bath)
    await house.calculateFirst(number).expect(201)
    const page = after(await printed(number))
    expect(page).toMatch(/First +Test technician/)
    expect(page).not.toMatch(/218/)
    expect(page).toMatch(/Second +mL *$/m)
    expect(page).toContain('Weighed or measured')
  })

  it('while the bath runs says both calculations and what went in, with lines for what is to come', async () => {
    const bath = await house.tankWithSchool()
    await house.freshWater(bath)
    const number = await house.signedBath(bath)
    await house.calculateFirst(number).expect(201)
    await house.calculateSecond(bath, number).expect(201)
    await house.give(number).expect(201)
    const bytes = await printed(number)
    expect(pageCount(bytes)).toBe(2)
    const page = after(bytes)
    expect(page).toMatch(/First +Test technician .*1 Dec 2026.* 218\smL/)
    expect(page).toMatch(/Second +Second technician .*1 Dec 2026.* 219\smL/)
    expect(page).not.toMatch(emptyBox)
    expect(page).toMatch(/218\smL, given/)
    expect(page).toContain('Ended at')
    expect(page).toContain('Seen during the bath')
    expect(page).not.toContain('Weighed or measured')
  })

  it('after it ended says every record with its amount, and has no line for the pen', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const dose = api.nextId()
    await house.record(number, { id: dose }).expect(201)
    await house.record(number, { amount: { value: '300', unit: 'mL' } }, house.second).expect(201)
    const { recorded } = (await house.technician.agent.get(house.doseAt(number)).expect(200)).body
    for (const { id } of recorded as { id: string }[])
      await house.technician.agent
        .post(`/api/doses/${id}/stop`)
        .send({ id: api.nextId(), cause: 'stopped', happenedAt: '2026-12-01T18:20:00Z', seen: 'gasping' })
        .expect(201)
    const bytes = await printed(number)
    const page = after(bytes)
    expect(page).toMatch(/First +not recorded/)
    expect(page).toMatch(/Second +not recorded/)
    expect(page).toMatch(/218\smL, recorded/)
    expect(page).toMatch(/300\smL, recorded/)
    expect(page).toContain('gasping')
    expect(page).not.toMatch(emptyBox)
    for (const line of [
      'Weighed or measured',
      'Time up at',
      'Seen during the bath',
      'fresh copy of this page',
    ])
      expect(page).not.toContain(line)
  })
})

describe('a bath sheet with many cautions', () => {
  it('goes on with them from page to page, and leaves none near empty', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const { body: sheet } = await house.technician.agent.get(house.doseAt(number)).expect(200)
    const { body: order } = await house.technician.agent
      .get(`/api/orders/${number}?amounts=yes`)
      .catch(() => ({ body: null }))
    const { body: plain } = await house.technician.agent.get(`/api/orders/${number}`).expect(200)
    const version = (order?.versions ?? plain.versions)[0]
    const [one] = sheet.cautions
    const cautions = Array.from({ length: 14 }, (_, i) => ({
      ...one,
      level: 'warning',
      title: `Caution ${String(i + 1)}`,
      text: 'Something that whoever doses has to know before the first gram goes in. '.repeat(3),
    }))
    const bytes = await drawDocument(
      bathSheetDocument({
        sheet: { ...sheet, cautions },
        content: version.content,
        block: version.signature,
        notice: null,
        facility: 'Harrow Point Sea Hall',
        publicUrl: 'https://records.example',
        paper: 'a4',
        printedBy: 'S. Brandt',
        printedAt: '2026-12-01T18:20:00.000Z',
      }),
    )
    expect(pageCount(bytes)).toBe(3)
    const on = (page: number) => textOf(bytes, page).match(/Caution \d+\./g)?.length ?? 0
    expect(on(1)).toBeGreaterThanOrEqual(1)
    expect(on(1) + on(2)).toBe(14)
  })
})
