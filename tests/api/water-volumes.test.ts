import pg from 'pg'
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { anEnclosure, aTankAndSumpSheet, aValve, aWaterBody } from '../builders/a-water.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

let api: TestApi
let tank: BuiltEnclosure
let neighbour: BuiltEnclosure
let sumpId: string
let valveOut: string
let second: TestPerson
beforeAll(async () => {
  api = await startApi()
  tank = await anEnclosure(api, 'QT-3')
  neighbour = await anEnclosure(api, 'QT-4')
  sumpId = await aWaterBody(api, 'QS-3')
  await aValve(api, 'V-31', [tank.waterBodyId, sumpId])
  valveOut = await aValve(api, 'V-32', [sumpId, neighbour.waterBodyId], false)
  second = await api.person({
    email: 'second@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const determination = (more: object = {}) => ({
  id: api.nextId(),
  happenedAt: '2026-12-01T14:00:00Z',
  waterBodyIds: [tank.waterBodyId, sumpId],
  sheet: aTankAndSumpSheet,
  ...more,
})
const determine = async (
  sent: object,
  role: 'technician' | 'keeper' | 'veterinarian' = 'technician',
  code = 'QT-3',
) => (await api.as(role)).agent.post(`/api/enclosures/${code}/volumes`).send(sent)
const confirm = (person: TestPerson, id: string, key = newKey()) =>
  person.agent.post(`/api/volumes/${id}/confirmation`).set('Idempotency-Key', key).send({})
const volumeNow = async (code = 'QT-3') => {
  const { agent } = await api.as('keeper')
  return (await agent.get(`/api/enclosures/${code}/water`).expect(200)).body.volume
}
const facts = (at = api.clock.now()) => api.composition.water.questions.connectedWaterAt(tank.id, at)
const moveValve = async (open: boolean, happenedAt: string) => {
  const { agent } = await api.as('technician')
  await agent
    .post(`/api/connections/${valveOut}/states`)
    .send({ id: api.nextId(), open, happenedAt })
    .expect(201)
}

describe('a volume determination', () => {
  it('is worked out on the server and counts once another person has confirmed it', async () => {
    expect(await volumeNow()).toMatchObject({ volume: null, usable: false, refusal: 'no-determination' })
    const sent = determination()
    const made = await determine(sent)
    expect(made.status).toBe(201)
    // 2.40 × 1.20 × 0.68 m + 1.10 × 0.60 × 0.40 m = 1,958.4 + 264 = 2,222.4 L; less 41 L by bucket: 2,181.4 L
    // (mensuration; worked by hand)
    expect(made.body.grossVolumeLitres).toBeCloseTo(2222.4, 9)
    expect(made.body.netVolumeLitres).toBeCloseTo(2181.4, 9)
    expect(made.body).toMatchObject({
      method: 'geometry',
      displacementSubtracted: true,
      codes: ['QS-3', 'QT-3'],
      valves: [
        { code: 'V-31', open: true },
        { code: 'V-32', open: false },
      ],
      confirmation: null,
      recordedBy: 'Test technician',
    })
    expect(made.body.working.at(-1).key).toBe('volume-error-percent')
    expect(await volumeNow()).toMatchObject({
      usable: false,
      holds: true,
      refusal: 'determination-not-confirmed',
    })

    const technician = await api.as('technician')
    const own = await confirm(technician, sent.id)
    expect([own.status, own.body.code]).toEqual([403, 'another-person-needed'])
    const key = newKey()
    expect((await confirm(second, sent.id, key)).body.confirmation).toMatchObject({ by: 'Second technician' })
    expect((await confirm(second, sent.id, key)).status).toBe(200)
    const twice = await confirm(await api.as('veterinarian'), sent.id)
    expect([twice.status, twice.body.code]).toEqual([409, 'already-confirmed'])
    expect(await volumeNow()).toMatchObject({
      usable: true,
      holds: true,
      basis: 'connected-water',
      refusal: null,
    })
    expect((await facts())?.volume).toMatchObject({
      id: sent.id,
      confirmed: true,
      holdsForThisValveState: true,
      method: 'geometry',
      measuredOn: '2026-12-01',
    })
  })

  it('does not hold once a valve is opened, and holds again when it is shut', async () => {
    await moveValve(true, '2026-12-01T15:00:00Z')
    expect(await volumeNow()).toMatchObject({
      usable: false,
      holds: false,
      refusal: 'smaller-than-connected-water',
    })
    const fact = await facts()
    expect(fact?.volume).toMatchObject({ confirmed: true, holdsForThisValveState: false })
    expect(fact?.volume?.mismatches.map((one) => one.code).sort()).toEqual([
      'connection-differs',
      'water-body-missing',
    ])
    // Before it was opened the figure held; asked as of then, it still does
    expect((await facts(new Date('2026-12-01T14:59:00Z')))?.volume?.holdsForThisValveState).toBe(true)
    await moveValve(false, '2026-12-01T16:00:00Z')
    expect(await volumeNow()).toMatchObject({ usable: true, holds: true })
  })

  it('was not yet confirmed when asked as of a time before the confirmation', async () => {
    expect((await facts(new Date('2026-12-01T14:30:00Z')))?.volume?.confirmed).toBe(false)
  })

  it('is one when the same form is sent twice, and refused when the id is used for another', async () => {
    const sent = determination({ note: 'by bucket' })
    expect((await determine(sent)).status).toBe(201)
    expect((await determine(sent)).status).toBe(201)
    const other = await determine({ ...sent, sheet: { ...aTankAndSumpSheet, displacement: undefined } })
    expect([other.status, other.body.code]).toEqual([409, 'id-already-used'])
    const { agent } = await api.as('registrar')
    const list = await agent.get('/api/enclosures/QT-3/volumes').expect(200)
    expect(list.body.volumes.filter((one: { note: string | null }) => one.note === 'by bucket')).toHaveLength(
      1,
    )
  })

  it('is withdrawn with a reason, stays readable, and no dose is worked out from it', async () => {
    const sent = determination({ happenedAt: '2026-12-01T17:00:00Z' })
    await determine(sent)
    await confirm(second, sent.id)
    expect((await facts())?.volume?.id).toBe(sent.id)
    const strike = (person: TestPerson) =>
      person.agent
        .post(`/api/volumes/${sent.id}/void`)
        .set('Idempotency-Key', newKey())
        .send({ reason: 'depth read at the wrong mark' })
    const keeper = await strike(await api.as('keeper'))
    expect([keeper.status, keeper.body.code]).toEqual([403, 'may-not'])
    expect((await strike(second)).body.voided).toMatchObject({ reason: 'depth read at the wrong mark' })
    expect((await strike(second)).body.code).toBe('already-void')
    expect((await confirm(await api.as('veterinarian'), sent.id)).body.code).toBe('already-void')
    expect((await facts())?.volume?.id).not.toBe(sent.id)
  })

  it('may be proposed by a keeper, who withdraws it while nobody has confirmed it', async () => {
    const sent = determination({ happenedAt: '2026-12-01T13:00:00Z' })
    expect((await determine(sent, 'keeper')).status).toBe(201)
    const keeper = await api.as('keeper')
    const own = await confirm(keeper, sent.id)
    expect([own.status, own.body.code]).toEqual([403, 'may-not'])
    await keeper.agent
      .post(`/api/volumes/${sent.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'measured again' })
      .expect(200)
  })

  it('by meter, by dilution and by statement give net water with its error', async () => {
    const metered = await determine(
      determination({
        sheet: {
          method: 'metered',
          startReading: { value: '1204.5', unit: 'm3' },
          endReading: { value: '1206.72', unit: 'm3' },
          errorPercent: 1,
        },
      }),
    )
    expect(metered.body).toMatchObject({ method: 'metered', grossVolumeLitres: null, errorPercent: 1 })
    expect(metered.body.netVolumeLitres).toBeCloseTo(2220, 6)
    const dilution = await determine(
      determination({
        sheet: {
          method: 'salt-dilution',
          saltMass: { value: '2.24', unit: 'kg' },
          salinityRise: { value: '1.0', unit: 'g/L' },
          errorPercent: 3,
        },
      }),
    )
    expect(dilution.body).toMatchObject({ method: 'dilution' })
    expect(dilution.body.netVolumeLitres).toBeCloseTo(2240, 9)
    const stated = await determine(
      determination({ sheet: { method: 'stated', volume: { value: '2200', unit: 'L' }, errorPercent: 10 } }),
    )
    expect(stated.body).toMatchObject({ method: 'estimated', netVolumeLitres: 2200 })
  })
})

describe('bad input', () => {
  const withDepth = (value: string, unit = 'm') => {
    const sheet = structuredClone(aTankAndSumpSheet)
    const [part] = sheet.parts
    if (part) part.shape.depth = { value, unit: unit as 'm' }
    return { sheet }
  }
  it.each([
    ['no depth at all', withDepth('0'), '/sheet/parts/0/depth', 'not-above-zero'],
    ['a negative depth', withDepth('-0.68'), '/sheet/parts/0/depth', 'not-above-zero'],
    ['centimetres typed as metres', withDepth('68'), '/sheet/parts/0/depth', 'above-most'],
    ['a depth of litres', withDepth('0.68', 'L'), '/sheet/parts/0/depth', 'dimensions-differ'],
    ['words for a depth', withDepth('deep'), '/sheet/parts/0/depth', 'not-a-number'],
    [
      'a meter that runs backwards',
      {
        sheet: {
          method: 'metered',
          startReading: { value: '10', unit: 'L' },
          endReading: { value: '5', unit: 'L' },
          errorPercent: 1,
        },
      },
      '/sheet/endReading',
      'meter-runs-backwards',
    ],
    [
      'a volume no house has',
      { sheet: { method: 'stated', volume: { value: '200000000', unit: 'm3' }, errorPercent: 5 } },
      '/sheet/volume',
      'above-most',
    ],
    [
      'a volume known exactly',
      { sheet: { method: 'stated', volume: { value: '2200', unit: 'L' }, errorPercent: 0 } },
      '/sheet',
      'error-needed',
    ],
    [
      'rock that fills the tank',
      {
        sheet: {
          ...aTankAndSumpSheet,
          displacement: { by: 'volume', volume: { value: '1950', unit: 'L' }, errorPercent: 5 },
        },
      },
      '/sheet/displacement',
      'displaces-too-much',
    ],
  ])('refuses %s', async (_what, more, pointer, code) => {
    const reply = await determine(determination(more))
    expect(reply.status).toBe(422)
    expect(reply.body.errors[0]).toMatchObject({ pointer, code })
  })

  it('refuses a time in the future, an enclosure and a volume that are not there', async () => {
    const ahead = await determine(determination({ happenedAt: '2026-12-03T00:00:00Z' }))
    expect([ahead.status, ahead.body.code]).toEqual([422, 'in-the-future'])
    expect((await determine(determination(), 'technician', 'NOPE-1')).status).toBe(404)
    expect((await confirm(second, api.nextId())).status).toBe(404)
    const land = await anEnclosure(api, 'LAND-2', { kind: 'land-area' })
    expect((await determine(determination(), 'technician', land.code)).body.code).toBe('kind-has-no-water')
  })

  it('refuses a volume of less, or of other, water than was joined', async () => {
    const less = await determine(determination({ waterBodyIds: [tank.waterBodyId] }))
    expect([less.status, less.body.code]).toEqual([409, 'isolation-needed'])
    expect(less.body.detail).toContain('QS-3')
    const other = await determine(
      determination({ waterBodyIds: [tank.waterBodyId, sumpId, neighbour.waterBodyId] }),
    )
    expect([other.status, other.body.code]).toEqual([409, 'volume-covers-other-water'])
    expect(other.body.detail).toContain('QT-4')
    const without = await determine(determination({ waterBodyIds: [sumpId] }))
    expect(without.body.errors[0].pointer).toBe('/waterBodyIds')
  })
})

describe('a volume under isolation', () => {
  it('needs the isolation recorded, of exactly these bodies, and its test passed', async () => {
    const { agent } = await api.as('technician')
    const isolation = {
      id: api.nextId(),
      waterBodyIds: [tank.waterBodyId],
      happenedAt: '2026-12-01T17:30:00Z',
      note: 'sump by-passed for a bath',
    }
    const apart = await agent
      .post('/api/isolations')
      .send({ ...isolation, id: api.nextId(), waterBodyIds: [tank.waterBodyId, neighbour.waterBodyId] })
      .expect(409)
    expect(apart.body.code).toBe('not-one-water')
    expect((await agent.post('/api/isolations').send(isolation).expect(201)).body.codes).toEqual(['QT-3'])
    await agent.post('/api/isolations').send(isolation).expect(201)

    const sheet = { ...aTankAndSumpSheet, parts: aTankAndSumpSheet.parts.slice(0, 1) }
    const sent = determination({
      sheet,
      waterBodyIds: [tank.waterBodyId],
      isolationId: isolation.id,
      happenedAt: '2026-12-01T17:40:00Z',
    })
    const early = await determine({ ...sent, id: api.nextId(), happenedAt: '2026-12-01T17:20:00Z' })
    expect(early.body.code).toBe('isolation-not-standing')
    expect((await determine(sent)).status).toBe(201)
    await confirm(second, sent.id)
    expect(await volumeNow()).toMatchObject({
      usable: false,
      basis: 'isolation',
      refusal: 'isolation-test-missing',
    })

    const test = (passed: boolean, happenedAt: string) =>
      agent
        .post(`/api/isolations/${isolation.id}/tests`)
        .send({ id: api.nextId(), method: 'dye, 20 min', passed, happenedAt })
        .expect(201)
    await test(false, '2026-12-01T17:45:00Z')
    expect((await volumeNow()).refusal).toBe('isolation-test-failed')
    await test(true, '2026-12-01T18:00:00Z')
    expect(await volumeNow()).toMatchObject({ usable: true, basis: 'isolation', volume: { id: sent.id } })
    expect((await facts())?.volume).toMatchObject({ isolationId: isolation.id, holdsForThisValveState: true })

    const end = (happenedAt: string) =>
      agent.post(`/api/isolations/${isolation.id}/end`).send({ id: api.nextId(), happenedAt, note: null })
    expect((await end('2026-12-01T17:00:00Z').expect(422)).body.code).toBe('period-reversed')
    await end('2026-12-01T18:10:00Z').expect(201)
    expect((await end('2026-12-01T18:15:00Z').expect(409)).body.code).toBe('isolation-ended')
    expect((await volumeNow()).basis).toBe('connected-water')
  })
})

describe('the database itself', () => {
  it('refuses a person who confirms their own figure, and a second confirmation', async () => {
    const sent = determination({ happenedAt: '2026-12-01T12:00:00Z' })
    await determine(sent)
    const technician = await api.as('technician')
    const client = new pg.Client({ connectionString: api.ownerUrl })
    await client.connect()
    const insert = (by: string) =>
      client.query(
        `INSERT INTO volume_confirmations (id, determination_id, determined_by, confirmed_at, confirmed_by)
         VALUES ($1, $2, $3, now(), $4)`,
        [api.nextId(), sent.id, technician.id, by],
      )
    await expect(insert(technician.id)).rejects.toMatchObject({
      constraint: 'ck_volume_confirmations_another_person',
    })
    await insert(second.id)
    await expect(insert(second.id)).rejects.toMatchObject({
      constraint: 'uq_volume_confirmations_determination',
    })
    await expect(
      client.query(
        `INSERT INTO volume_confirmations (id, determination_id, determined_by, confirmed_at, confirmed_by)
         VALUES ($1, $2, $3, now(), $4)`,
        [api.nextId(), sent.id, second.id, technician.id],
      ),
    ).rejects.toMatchObject({ code: expect.stringMatching(/^23/) as string })
    await client.end()
  })

  it('answers one of two confirmations that arrive at once', async () => {
    const sent = determination({ happenedAt: '2026-12-01T11:00:00Z' })
    await determine(sent)
    const vet = await api.as('veterinarian')
    const replies = await Promise.all([confirm(second, sent.id), confirm(vet, sent.id)])
    expect(replies.map((reply) => reply.status).sort()).toEqual([200, 409])
  })
})
