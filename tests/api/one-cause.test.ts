import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { SaidCaution } from '../../shared/contracts/order-primitives.ts'
import { groupSaid } from '../../shared/domain/cautions/group-said.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { aDraft, shownCautions, signDraft } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
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

const plain = (text: string) => text.replace(/\s+/g, ' ')
const idsOf = (cautions: readonly { ruleId: string }[]) => cautions.map(({ ruleId }) => ruleId)

describe('cautions of one cause', () => {
  it('are one on the form and on paper, and each is answered and signed as itself', async () => {
    const bath = await house.tankWithSchool()
    // a pond whose temperature nobody has read: one stops and another warns, for want of one reading
    const draft = await aDraft(
      api,
      house.fieldsOf(bath, { setting: 'pond', target: { value: '200', unit: 'uL/L' }, contactMinutes: 30 }),
    )
    const shown = await shownCautions(api, draft.number)
    const group = groupSaid(shown).find(({ members }) =>
      members.some(({ cause }) => cause?.unknownFacts.includes('water.temperatureC')),
    )
    expect(idsOf(group?.members ?? [])).toEqual(expect.arrayContaining(['R03', 'R06']))
    expect(group?.lead.level).toBe('stop')
    expect(group?.stops.length).toBeGreaterThan(0)
    expect(group?.acknowledged.length).toBeGreaterThan(0)

    // the tick of the line answers its warnings; no stop is answered with it
    const read = shown
      .filter(({ level }) => level === 'warning')
      .map(({ ruleId, code, text }) => ({ ruleId, code, text }))
    const stopped = await signDraft(api, draft, { read })
    expect([stopped.status, stopped.body.code]).toEqual([409, 'caution-stops'])
    const stops = shown.filter(({ level }) => level === 'stop')
    expect(stops.every(({ overridable }) => overridable)).toBe(true)
    const overrides = [...new Set(idsOf(stops))].map((ruleId) => ({
      ruleId,
      reason: `the keeper read the pond by hand, ${ruleId}`,
    }))
    const signed = await signDraft(api, draft, { overrides })
    expect(signed.status).toBe(201)

    const [row]: { text: string }[] = await api.composition.parts.dataSource.query(
      `SELECT text FROM signed_texts WHERE subject_label LIKE $1`,
      [`${draft.number}%`],
    )
    const { content } = JSON.parse(row?.text ?? '{}') as {
      content: {
        cautions: SaidCaution[]
        overrides: { ruleId: string; code: string; reason: string }[]
        read: { ruleId: string; code: string }[]
      }
    }
    expect(content.cautions).toEqual(shown)
    for (const { ruleId, code } of stops)
      expect(content.overrides).toContainEqual(
        expect.objectContaining({ ruleId, code, reason: `the keeper read the pond by hand, ${ruleId}` }),
      )
    for (const { ruleId, code } of read)
      expect(content.read).toContainEqual(expect.objectContaining({ ruleId, code }))

    const paper = plain(
      textOf(await fetchPdf(await api.as('technician'), `/api/orders/${draft.number}/print`)),
    )
    const lead = group?.lead
    expect(paper).toContain(`${lead?.title ?? ''}: one cause, ${String(group?.members.length)} rules`)
    for (const { ruleId, title } of group?.members ?? [])
      expect(paper).toContain(`${ruleId}: ${plain(title)}.`)
    for (const { ruleId } of group?.stops ?? [])
      expect(paper).toContain(`the keeper read the pond by hand, ${ruleId}`)
  })

  it('are told with their cause on the bath sheet: oxygen that nobody read stops by two rules', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const { agent } = await api.as('technician')
    const sheet = (await agent.get(house.doseAt(number)).expect(200)).body
    const group = groupSaid(sheet.cautions as SaidCaution[]).find(({ members }) =>
      members.some(({ ruleId }) => ruleId === 'R01'),
    )
    expect(idsOf(group?.members ?? [])).toEqual(expect.arrayContaining(['R01', 'R31']))
    const paper = plain(textOf(await fetchPdf(await api.as('technician'), house.doseAt(number, '/print'))))
    expect(paper).toMatch(/: one cause, \d rules/)
    expect(paper).toContain('Stop R01: ')
    expect(paper).toContain('Stop R31: ')
  })
})
