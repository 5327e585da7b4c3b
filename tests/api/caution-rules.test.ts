import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { cautionRules } from '../../shared/domain/cautions/caution-rules.ts'
import { roles } from '../../shared/domain/permissions/roles.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { aDraft, readingsNow, signDraft } from '../builders/an-order.ts'
import { newKey, password, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
let vet: TestPerson
let tech: TestPerson
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
  vet = await api.as('veterinarian')
  tech = await api.as('technician')
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

interface Parameter {
  key: string
  unit: string
  value: number
  state: string
  loosened: boolean
  versions: { id: string; state: string; value: string; confirmation: object | null }[]
}
const rules = async (by: TestPerson = vet) =>
  (await by.agent.get('/api/caution-rules').expect(200)).body.rules as {
    ruleId: string
    parameters: Parameter[]
  }[]
async function parameterOf(ruleId: string, key: string): Promise<Parameter> {
  const found = (await rules())
    .find((rule) => rule.ruleId === ruleId)
    ?.parameters.find((one) => one.key === key)
  if (!found) throw new Error(`${ruleId} has no ${key}`)
  return found
}
async function propose(ruleId: string, key: string, given: object = {}, by: TestPerson = tech) {
  const { unit, versions } = await parameterOf(ruleId, key)
  return by.agent.post(`/api/caution-rules/${ruleId}/parameters/${key}/proposals`).send({
    id: api.nextId(),
    value: '6',
    unit,
    supersedesId: versions[0]?.id ?? null,
    reason: 'the meters here read low',
    ...given,
  })
}
async function confirm(
  ruleId: string,
  key: string,
  given: object = {},
  { by = vet, id, commandKey = newKey() }: { by?: TestPerson; id?: string; commandKey?: string } = {},
) {
  const proposalId = id ?? (await parameterOf(ruleId, key)).versions[0]?.id ?? ''
  return by.agent
    .post(`/api/caution-rules/${ruleId}/parameters/${key}/proposals/${proposalId}/confirmation`)
    .set('Idempotency-Key', commandKey)
    .send({ password, reason: 'checked against the log of the meters', ...given })
}

/** A signed bath of half an hour, in water that was read at so much oxygen a few minutes ago. */
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

describe('the list of rules', () => {
  it('holds every rule with its words, findings, sources and thresholds, for every role that is signed in', async () => {
    for (const role of roles) {
      const listed = await rules(await api.as(role))
      expect(listed.map(({ ruleId }) => ruleId)).toEqual(cautionRules.map(({ id }) => id))
    }
    const first = (await rules()).find(({ ruleId }) => ruleId === 'R01')
    expect(first).toMatchObject({
      asks: 'Oxygen is read shortly before the dose and is high enough',
      levels: ['stop'],
      when: 'start',
      overridable: true,
      routes: ['immersion'],
      effects: [],
      sources: [{ source: 'cfr-529-1030', mark: 'V' }, { mark: 'P' }],
    })
    expect(first).toHaveProperty('findings.0', {
      code: 'oxygen-unknown',
      title: 'Oxygen is not known',
      resolvedBy: [{ code: 'read-oxygen', text: 'Read oxygen now.' }],
    })
    expect(first?.parameters[0]).toMatchObject({
      key: 'oxygenFloorMgPerL',
      label: 'Lowest oxygen',
      default: 5,
      unit: 'mg/L',
      mark: 'P',
      legal: false,
      tighter: 'higher',
      least: 0.5,
      most: 50,
      value: 5,
      state: 'default',
      versions: [],
    })
    const ceiling = (await rules())
      .find(({ ruleId }) => ruleId === 'R05')
      ?.parameters.find(({ key }) => key === 'finfishUlPerL')
    expect(ceiling).toMatchObject({ legal: true, mark: 'V' })
  })
})

describe('a threshold of the facility', () => {
  it('is proposed, confirmed with a reason, and superseded by the next; each stays readable and is in the trail', async () => {
    const proposed = await propose('R31', 'copperHours', { value: '12' })
    expect(proposed.status).toBe(201)
    expect(await parameterOf('R31', 'copperHours')).toMatchObject({
      value: 24,
      state: 'default',
      versions: [{ state: 'proposed', value: '12', proposedBy: 'Test technician', confirmation: null }],
    })
    expect((await confirm('R31', 'copperHours')).status).toBe(200)
    expect(await parameterOf('R31', 'copperHours')).toMatchObject({
      value: 12,
      state: 'confirmed',
      loosened: false,
      versions: [
        {
          state: 'confirmed',
          confirmation: {
            by: 'Test veterinarian',
            on: '2026-12-01',
            reason: 'checked against the log of the meters',
            jurisdiction: 'Norrell Sound',
          },
        },
      ],
    })
    expect((await propose('R31', 'copperHours', { value: '6.5' })).status).toBe(201)
    expect((await parameterOf('R31', 'copperHours')).value).toBe(12)
    expect((await confirm('R31', 'copperHours')).status).toBe(200)
    const now = await parameterOf('R31', 'copperHours')
    expect(now.value).toBe(6.5)
    expect(now.versions.map(({ state }) => state)).toEqual(['confirmed', 'superseded'])
    const admin = await api.as('administrator')
    const trail = await admin.agent.get('/api/audit?q=rule-parameter.confirm').expect(200)
    expect(trail.body.rows[0]).toMatchObject({
      action: 'rule-parameter.confirm',
      subjectLabel: 'R31 copperHours',
    })
  })

  it('is refused where the value makes no sense, and says why', async () => {
    const refusal = async (given: object) => {
      const reply = await propose('R01', 'oxygenFloorMgPerL', given)
      expect(reply.status).toBe(422)
      return reply.body.errors[0] as { pointer: string; code: string; detail: string }
    }
    expect(await refusal({ value: 'six' })).toMatchObject({ pointer: '/value', code: 'not-a-number' })
    expect(await refusal({ value: '0' })).toMatchObject({ code: 'not-above-zero' })
    expect(await refusal({ value: '-1' })).toMatchObject({ code: 'not-above-zero' })
    const low = await refusal({ value: '0.1' })
    expect(low.code).toBe('below-least')
    expect(low.detail.replaceAll('\u00a0', ' ')).toContain('at least 0.5 mg/L')
    expect(await refusal({ value: '500' })).toMatchObject({ code: 'above-most' })
    expect(await refusal({ unit: 'ug/L' })).toMatchObject({ pointer: '/unit', code: 'other-unit' })
    expect(await refusal({ reason: '' })).toMatchObject({ pointer: '/reason' })
    const { agent } = tech
    const body = { id: api.nextId(), value: '5', unit: 'h', supersedesId: null, reason: 'no such thing' }
    for (const key of ['copperHours', 'constructor', 'toString'])
      expect(
        (await agent.post(`/api/caution-rules/R01/parameters/${key}/proposals`).send(body).expect(404)).body
          .code,
      ).toBe('not-found')
    await agent.post('/api/caution-rules/R99/parameters/copperHours/proposals').send(body).expect(422)
  })

  it('is refused to the wrong role, without a licence, with a wrong password, and signed out', async () => {
    const keeper = await api.as('keeper')
    expect((await propose('R31', 'oxygenMinutes', { value: '20' }, keeper)).body.code).toBe('may-not')
    expect((await propose('R31', 'oxygenMinutes', { value: '20' })).status).toBe(201)
    expect((await confirm('R31', 'oxygenMinutes', {}, { by: tech })).body.code).toBe('may-not')
    const without = await api.person({
      email: 'nolic@harrow-point.example',
      printedName: 'No licence',
      roles: ['veterinarian'],
    })
    expect((await confirm('R31', 'oxygenMinutes', {}, { by: without })).body.code).toBe('licence-not-valid')
    const wrong = await confirm('R31', 'oxygenMinutes', { password: 'another' })
    expect([wrong.status, wrong.body.code]).toEqual([403, 'password-wrong'])
    expect((await confirm('R31', 'oxygenMinutes', { reason: '' })).status).toBe(422)
    expect(await parameterOf('R31', 'oxygenMinutes')).toMatchObject({ value: 30, state: 'default' })
    await api.anonymous().get('/api/caution-rules').expect(401)
    await api
      .anonymous()
      .post('/api/caution-rules/R31/parameters/oxygenMinutes/proposals')
      .send({})
      .expect(401)
  })

  it('happens once however often it is sent, and takes nothing that others have moved on from', async () => {
    const id = api.nextId()
    const given = { id, value: '25', supersedesId: null }
    expect((await propose('R41', 'unwellPercent', { ...given, value: '4' })).status).toBe(201)
    expect((await propose('R41', 'unwellPercent', { ...given, value: '4' })).status).toBe(201)
    expect((await parameterOf('R41', 'unwellPercent')).versions).toHaveLength(1)
    expect((await propose('R41', 'unwellPercent', { ...given, value: '3' })).body.code).toBe(
      'id-already-used',
    )
    // read before the first was there
    const stale = await propose('R41', 'unwellPercent', { value: '3', supersedesId: null })
    expect([stale.status, stale.body.code]).toEqual([409, 'stale-version'])
    expect(stale.body.detail).toContain('Test technician')
    expect((await propose('R41', 'unwellPercent', { value: '3' })).status).toBe(201)
    expect((await confirm('R41', 'unwellPercent', {}, { id })).body.code).toBe('stale-version')
    const commandKey = newKey()
    expect((await confirm('R41', 'unwellPercent', {}, { commandKey })).status).toBe(200)
    expect((await confirm('R41', 'unwellPercent', {}, { commandKey })).status).toBe(200)
    expect((await confirm('R41', 'unwellPercent')).body.code).toBe('already-confirmed')
    expect((await confirm('R41', 'unwellPercent', {}, { id: api.nextId() })).body.code).toBe('not-found')
  })

  it('loosens a limit read at its source only for a jurisdiction that the facility accepts', async () => {
    expect((await propose('R05', 'penaeidTankUlPerL', { value: '120' })).status).toBe(201)
    const bare = await confirm('R05', 'penaeidTankUlPerL')
    expect(bare.body.errors[0]).toMatchObject({ pointer: '/jurisdiction', code: 'jurisdiction-needed' })
    const other = await confirm('R05', 'penaeidTankUlPerL', { jurisdiction: 'Elsewhere' })
    expect(other.body.errors[0]).toMatchObject({ code: 'jurisdiction-not-accepted' })
    expect((await confirm('R05', 'penaeidTankUlPerL', { jurisdiction: 'Norrell Sound' })).status).toBe(200)
    expect(await parameterOf('R05', 'penaeidTankUlPerL')).toMatchObject({ value: 120, loosened: true })
  })
})

describe('cautions by the thresholds of the facility', () => {
  const cautionsAtDose = async (number: string) =>
    (await tech.agent.get(house.doseAt(number)).expect(200)).body.cautions as {
      ruleId: string
      code: string
      text: string
      finding: string | null
    }[]

  it('a confirmed one holds at the preview, at the signature and in the signed text', async () => {
    const bath = await house.tankWithSchool()
    const fields = house.fieldsOf(bath, { contactMinutes: 50 })
    const codes = async () => {
      const { body } = await vet.agent.post('/api/order-previews').send(fields).expect(200)
      return (body.cautions as { code: string }[]).map(({ code }) => code)
    }
    const before = await codes()
    expect(before).not.toContain('formalin-too-long')
    expect((await propose('R04', 'finfishMinutes', { value: '40' })).status).toBe(201)
    expect(await codes()).toEqual(before)
    expect((await confirm('R04', 'finfishMinutes')).status).toBe(200)
    const draft = await aDraft(api, fields)
    const now = await codes()
    expect(now.some((code) => code.startsWith('formalin-too-long'))).toBe(true)
    const signed = await signDraft(api, draft)
    expect(signed.status).toBe(409)
    expect(signed.body.code).toBe('caution-stops')
    // what the facility confirmed stands in what is signed
    const short = await aDraft(api, house.fieldsOf(bath, { contactMinutes: 30 }))
    expect((await signDraft(api, short)).status).toBe(201)
    const [row]: { text: string }[] = await api.composition.parts.dataSource.query(
      `SELECT text FROM signed_texts WHERE subject_label LIKE $1`,
      [`${short.number}%`],
    )
    const { content } = JSON.parse(row?.text ?? '{}') as { content: { settings: object } }
    expect(content.settings).toMatchObject({
      R04: { finfishMinutes: { value: 40, confirmedBy: 'Test veterinarian', jurisdiction: 'Norrell Sound' } },
    })
  })

  it('a loosened one shows on every caution that it touches, and names who confirmed it', async () => {
    const number = await aBathAt('4.2')
    const fired = async () => (await cautionsAtDose(number)).find(({ ruleId }) => ruleId === 'R01')
    const strict = await fired()
    expect(strict).toMatchObject({ code: 'oxygen-low' })
    expect(strict?.text).not.toContain('Loosened')
    expect((await propose('R01', 'oxygenFloorMgPerL', { value: '4.5' })).status).toBe(201)
    expect((await confirm('R01', 'oxygenFloorMgPerL')).status).toBe(200)
    const loose = await fired()
    expect(loose?.text.replaceAll('\u00a0', ' ')).toContain(
      'Loosened here: lowest oxygen 4.5 mg/L in place of 5 mg/L, confirmed by Test veterinarian on 1 Dec 2026 for Norrell Sound',
    )
    // another threshold makes it another finding: an override signed for the first is none for this one
    expect(loose?.finding).not.toBe(strict?.finding)
    expect((await propose('R01', 'oxygenFloorMgPerL', { value: '4' })).status).toBe(201)
    expect((await confirm('R01', 'oxygenFloorMgPerL')).status).toBe(200)
    expect(await fired()).toBeUndefined()
  })

  it('a dose recorded late is judged by those of its own time', async () => {
    const number = await aBathAt('5.4')
    api.clock.set(new Date('2026-12-01T18:40:00Z'))
    expect((await propose('R01', 'oxygenFloorMgPerL', { value: '6' })).status).toBe(201)
    expect((await confirm('R01', 'oxygenFloorMgPerL')).status).toBe(200)
    await house.record(number, { happenedAt: '2026-12-01T18:20:00Z' }).expect(201)
    const sheet = (await tech.agent.get(house.doseAt(number)).expect(200)).body
    // what is about to happen goes by the threshold of today, what happened by that of its time
    expect(JSON.stringify(sheet.cautions)).toContain('oxygen-low')
    expect(sheet.recorded).toHaveLength(1)
    expect(JSON.stringify(sheet.recorded[0].exceptions)).not.toContain('oxygen-low')
  })
})
