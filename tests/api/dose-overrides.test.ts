import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { verifyOverrides } from '../../server/features/administrations/index.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { BathTank, FormalinHouse } from '../builders/a-bath.ts'
import { aDraft, readingsNow, signDraft } from '../builders/an-order.ts'
import { textOf } from '../pdf/support/poppler.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let owner: pg.Client
let house: FormalinHouse
let vet: TestPerson
beforeAll(async () => {
  api = await startApi()
  owner = new pg.Client({ connectionString: api.ownerUrl })
  await owner.connect()
  house = await aFormalinHouse(api)
  vet = await api.as('veterinarian')
})
beforeEach(() => api.clock.set(testDay))
afterAll(async () => {
  await owner.end()
  await api.stop()
})

const reason = 'the meter is out; the water is aerated hard and somebody stays with the fish'

interface Stop {
  ruleId: string
  code: string
  finding: string | null
  title: string
  overridden: { by: string; reason: string } | null
}

/** Lower figures for every formalin line in force, proposed and confirmed as people do. */
async function lowerEveryLine(high: number): Promise<void> {
  const vet = await api.as('veterinarian')
  const { lines } = (await vet.agent.get('/api/formulary').expect(200)).body
  for (const line of lines.filter((one: { agent: string }) => one.agent === 'formalin')) {
    const id = api.nextId()
    const { longestContactMinutes } = line
    const figures = { id, supersedesId: line.id, low: null, high, longestContactMinutes, reason: 'far lower' }
    await house.technician.agent.post('/api/dose-lines').send(figures).expect(201)
    await vet.agent
      .post(`/api/dose-lines/${id}/confirmation`)
      .set('Idempotency-Key', newKey())
      .send({})
      .expect(200)
  }
}

/** Too little oxygen in the water, and everything else well. */
const lowOxygen = ({ tank }: BathTank, happenedAt?: string) =>
  readingsNow(api, tank.waterBodyId, { 'dissolved-oxygen': ['4.2', 'mg/L'] }, happenedAt)

async function aReadyBathWithoutOxygen() {
  const bath = await house.tankWithSchool()
  const number = await house.signedBath(bath)
  await house.freshWater(bath)
  await house.calculateFirst(number).expect(201)
  await house.calculateSecond(bath, number).expect(201)
  await lowOxygen(bath, '2026-12-01T18:12:00Z')
  return { bath, number }
}

const sheetOf = async (number: string) =>
  (await house.technician.agent.get(house.doseAt(number)).expect(200)).body
const stopOf = (sheet: { cautions: Stop[] }, ruleId = 'R01') => {
  const found = sheet.cautions.find((one) => one.ruleId === ruleId)
  if (!found) throw new Error(`${ruleId} has not fired`)
  return found
}

async function override(number: string, given: object = {}, by: TestPerson = vet, key = newKey()) {
  const sheet = await sheetOf(number)
  const { ruleId, code, finding } = stopOf(sheet)
  return by.agent
    .post(house.doseAt(number, '/overrides'))
    .set('Idempotency-Key', key)
    .send({ password, ruleId, code, finding, lotId: sheet.lotId, reason, ...given })
}

describe('a bath that runs under an order whose versions were taken away', () => {
  /** As the owner, past the constraints that join the tables. */
  async function byHand(sql: string, number: string): Promise<void> {
    await owner.query('BEGIN')
    await owner.query(`SET LOCAL session_replication_role = replica`)
    await owner.query(
      `${sql} WHERE ${sql.includes('order_versions') ? 'order_id' : 'subject_id'} = (SELECT id FROM orders WHERE number = $1)`,
      [number],
    )
    await owner.query('COMMIT')
  }
  const takeVersions = (number: string) => byHand('DELETE FROM order_versions', number)

  /** What the sheet, the doses that are due and the worklist say of a bath that runs. */
  async function running(number: string) {
    const { agent } = house.technician
    const sheet = (await agent.get(house.doseAt(number)).expect(200)).body
    const due = (await agent.get('/api/due-doses').expect(200)).body.rows
    const { items } = (await agent.get('/api/today').expect(200)).body
    return {
      sheet: [sheet.state, sheet.running.map((bath: { endsAt: string | null }) => bath.endsAt)],
      due: due
        .filter((row: { number: string }) => row.number === number)
        .map((row: { state: string }) => row.state),
      today: items
        .filter(
          (one: { kind: string; params: { number: string } }) =>
            one.kind === 'bath-running' && one.params.number === number,
        )
        .map((one: { dueAt: string | null }) => one.dueAt),
    }
  }
  const end = '2026-12-01T19:05:00.000Z'
  const untold = { sheet: ['running', [null]], due: ['running'], today: [null] }

  it('runs on until somebody ends it, and is in the list as broken, not as a draft', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    const id = api.nextId()
    await house.record(number, { id }).expect(201)
    expect(await running(number)).toEqual({ sheet: ['running', [end]], due: ['running'], today: [end] })
    await takeVersions(number)
    expect(await running(number)).toEqual(untold)
    const { agent } = house.technician
    const listed = async () => (await agent.get(`/api/orders?q=${number}`).expect(200)).body.rows
    expect(await listed()).toMatchObject([{ record: 'broken', phase: 'in-progress', dosesGiven: 1 }])
    await agent
      .post(`/api/doses/${id}/stop`)
      .send({ id: api.nextId(), cause: 'stopped', happenedAt: '2026-12-01T18:20:00Z' })
      .expect(201)
    expect(await running(number)).toEqual({ sheet: ['done', []], due: [], today: [] })
  })

  it('ends by the time that was signed, whatever a column says; where the text cannot be read, by none', async () => {
    const number = await house.signedBath(await house.tankWithSchool())
    await house.record(number).expect(201)
    await byHand('UPDATE order_versions SET contact_minutes = 4500', number)
    expect(await running(number)).toEqual({ sheet: ['running', [end]], due: ['running'], today: [end] })
    await byHand(
      `UPDATE signed_texts SET text = replace(text, '"contactMinutes":45', '"contactMinutes":450')`,
      number,
    )
    expect(await running(number)).toEqual(untold)
    await byHand(`UPDATE signed_texts SET text = 'nothing'`, number)
    expect(await running(number)).toEqual(untold)
  })

  it('leaves what is in that water unknown, which stops the next order for it', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    await house.record(number).expect(201)
    const second = await aDraft(api, house.fieldsOf(bath))
    const codes = async () => {
      const { draft } = (await vet.agent.get(`/api/orders/${second.number}`).expect(200)).body
      const { cautions } = (await vet.agent.post('/api/order-previews').send(draft).expect(200)).body
      return cautions.map((one: { code: string; level: string }) => `${one.level} ${one.code}`)
    }
    expect(await codes()).toContain('stop same-agent-together')
    await takeVersions(number)
    expect(await codes()).toContain('stop agent-history-unknown')
    expect((await signDraft(api, second)).status).toBe(409)
  })
})

describe('a stop found at the dose', () => {
  it('is overridden by a signed reason for this dose, which then goes on and shows it', async () => {
    const { number } = await aReadyBathWithoutOxygen()
    const before = await sheetOf(number)
    expect(before).toMatchObject({ mayStart: false, overrides: [] })
    expect(stopOf(before)).toMatchObject({ code: 'oxygen-low', overridden: null })
    expect((await house.give(number)).body.code).toBe('dose-not-possible')

    const key = newKey()
    const given = { finding: stopOf(before).finding, code: 'oxygen-low', ruleId: 'R01' }
    const signed = await override(number, given, vet, key)
    expect(signed.status).toBe(201)
    // the same again, with its answer lost on the way
    expect((await override(number, given, vet, key)).status).toBe(201)
    const sheet = await sheetOf(number)
    expect(sheet.overrides).toHaveLength(1)
    expect(sheet.overrides[0]).toMatchObject({
      reason,
      signature: { printedName: 'Test veterinarian', state: 'intact', licence: { number: 'VL-20417' } },
    })
    expect(stopOf(sheet)).toMatchObject({ overridden: { by: 'Test veterinarian', reason }, finding: null })
    const step = sheet.steps.find((one: { ruleId: string }) => one.ruleId === 'R01')
    expect(step).toMatchObject({ state: 'unmet', overridden: true })
    expect([sheet.mayStart, sheet.why]).toEqual([true, []])

    const given201 = await house.give(number)
    expect(given201.status).toBe(201)
    expect(given201.body.overrides).toHaveLength(1)
    const paper = await house.technician.agent.get(house.doseAt(number, '/print')).buffer(true).expect(200)
    const text = textOf(paper.body as Buffer).replaceAll(/\s+/g, ' ')
    expect(text).toContain('Overridden for this dose')
    expect(text).toContain('Overridden by Test veterinarian, licence VL-20417')
    expect(text).toContain(reason)
    const trail = await vet.agent.get(`/api/audit?q=dose.override`).expect(200)
    expect(trail.body.rows[0]).toMatchObject({
      subjectLabel: number,
      after: { key: '1', ruleId: 'R01', reason },
    })
    const { dataSource } = api.composition.parts
    expect((await verifyOverrides(dataSource, api.composition.signing.service)).faults).toEqual([])
  })

  it('is overridden only by a veterinarian who shows who they are', async () => {
    const { number } = await aReadyBathWithoutOxygen()
    expect((await override(number, {}, house.technician)).status).toBe(403)
    const wrong = await override(number, { password: 'not-mine-at-all' })
    expect([wrong.status, wrong.body.code]).toEqual([403, 'password-wrong'])
    const unlicensed = await api.person({
      email: `vet-${number}@harrow-point.example`,
      printedName: 'Vet without a licence',
      roles: ['veterinarian'],
    })
    expect((await override(number, {}, unlicensed)).body.code).toBe('licence-not-valid')
    expect((await override(number, { reason: '' })).status).toBe(422)
    expect(await sheetOf(number)).toMatchObject({ overrides: [], mayStart: false })
  })

  it('is answered for the facts as they are: another reading, or an hour, and it stops again', async () => {
    const { bath, number } = await aReadyBathWithoutOxygen()
    const shown = stopOf(await sheetOf(number))
    await lowOxygen(bath, '2026-12-01T18:14:00Z')
    const stale = await override(number, { finding: shown.finding })
    expect([stale.status, stale.body.code]).toEqual([409, 'caution-not-fired'])
    expect((await override(number)).status).toBe(201)
    expect((await sheetOf(number)).mayStart).toBe(true)
    await lowOxygen(bath, '2026-12-01T18:16:00Z')
    const after = await sheetOf(number)
    expect([after.mayStart, stopOf(after).overridden]).toEqual([false, null])
    expect((await house.give(number)).body.code).toBe('dose-not-possible')

    expect((await override(number)).status).toBe(201)
    expect(stopOf(await sheetOf(number)).overridden).not.toBeNull()
    api.clock.set(new Date(testDay.getTime() + 61 * 60_000))
    expect(stopOf(await sheetOf(number)).overridden).toBeNull()
  })

  it('is not answered by a text or a row that was changed by hand', async () => {
    const { number } = await aReadyBathWithoutOxygen()
    expect((await override(number)).status).toBe(201)
    await owner.query(`UPDATE dose_overrides SET reason = 'as ordered'`)
    const sheet = await sheetOf(number)
    expect(sheet.mayStart).toBe(false)
    expect(sheet.overrides[0].signature.state).toBe('broken')
    const { dataSource } = api.composition.parts
    const { faults } = await verifyOverrides(dataSource, api.composition.signing.service)
    expect(faults).toContainEqual(expect.objectContaining({ at: `${number} dose 1` }))
  })

  it('that nobody may override stays, and a dose that is recorded needs none', async () => {
    const { number } = await aReadyBathWithoutOxygen()
    const sheet = await sheetOf(number)
    const open = sheet.cautions.filter((one: Stop) => one.finding !== null)
    expect(open.map(({ ruleId }: Stop) => ruleId)).toEqual(['R01'])
    const unknown = await override(number, { ruleId: 'R34', code: 'lot-recalled' })
    expect(unknown.body.code).toBe('caution-not-fired')
    const shown = stopOf(sheet)
    await house.record(number).expect(201)
    const late = await override(number, { finding: shown.finding })
    expect(late.body.code).toBe('dose-not-possible')
  })
})

// last of all: the lines are the same for the whole house
describe('a dose when every line of its drug was lowered since', () => {
  it('is far beyond them all, and given by nobody', async () => {
    const other = await aReadyBathWithoutOxygen()
    await lowerEveryLine(0.01)
    const beyond = stopOf(await sheetOf(other.number), 'R47')
    expect([beyond.finding, beyond.overridden]).toEqual([null, null])
    const refused = await override(other.number, { ruleId: 'R47', code: beyond.code, finding: 'any' })
    expect([refused.status, refused.body.code]).toEqual([409, 'caution-stops'])
    expect(refused.body.detail).toContain('Nobody may override')
  })
})
