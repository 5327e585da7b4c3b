import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { anEnclosure, aValve, aWaterBody, longAgo } from '../builders/a-water.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { newKey, startApi, testDay } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let a: BuiltEnclosure
let b: BuiltEnclosure
let sumpId: string
let valveA: string
let valveB: string
beforeAll(async () => {
  api = await startApi()
  a = await anEnclosure(api, 'RG-1', { area: 'River gallery' })
  b = await anEnclosure(api, 'RG-2', { area: 'River gallery' })
  sumpId = await aWaterBody(api, 'RS-1')
  valveA = await aValve(api, 'V-1', [a.waterBodyId, sumpId])
  valveB = await aValve(api, 'V-2', [b.waterBodyId, sumpId], false)
})
beforeEach(() => api.clock.set(testDay))
afterAll(() => api.stop())

const water = async (code: string, asOf?: string) => {
  const { agent } = await api.as('keeper')
  const reply = await agent.get(`/api/enclosures/${code}/water${asOf ? `?asOf=${asOf}` : ''}`).expect(200)
  return reply.body as {
    bodies: { code: string }[]
    enclosures: { code: string }[]
    connections: { code: string; state: string; inside: boolean; by: string | null }[]
  }
}
const codes = (rows: { code: string }[]) => rows.map((row) => row.code).sort()

describe('connected water', () => {
  it('is what open valves join at the instant asked about', async () => {
    const { agent } = await api.as('keeper')
    expect(codes((await water('RG-1')).bodies)).toEqual(['RG-1', 'RS-1'])
    expect(codes((await water('RG-2')).bodies)).toEqual(['RG-2'])
    const open = { id: api.nextId(), open: true, happenedAt: '2026-12-01T09:00:00Z' }
    const reply = await agent.post(`/api/connections/${valveB}/states`).send(open).expect(201)
    expect(reply.body).toMatchObject({ code: 'V-2', state: 'open', by: 'Test keeper', inside: true })
    await agent.post(`/api/connections/${valveB}/states`).send(open).expect(201)

    const now = await water('RG-1')
    expect(codes(now.bodies)).toEqual(['RG-1', 'RG-2', 'RS-1'])
    expect(codes(now.enclosures)).toEqual(['RG-1', 'RG-2'])
    expect(codes((await water('RG-1', '2026-12-01T08:59:59Z')).bodies)).toEqual(['RG-1', 'RS-1'])
    const before = await water('RG-2', '2025-06-01T00:00:00Z')
    expect(before.bodies).toEqual([])
  })

  it('takes a state entered late at its own time, and forgets one that is struck through', async () => {
    const { agent } = await api.as('technician')
    const shut = { id: api.nextId(), open: false, happenedAt: '2026-12-01T12:00:00Z' }
    await agent.post(`/api/connections/${valveB}/states`).send(shut).expect(201)
    expect(codes((await water('RG-2')).bodies)).toEqual(['RG-2'])
    await agent
      .post(`/api/water-records/connection-state/${shut.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'it was the other valve' })
      .expect(200)
    expect(codes((await water('RG-2')).bodies)).toEqual(['RG-1', 'RG-2', 'RS-1'])
  })

  it('refuses a state in the future and a valve that is not there', async () => {
    const { agent } = await api.as('technician')
    const state = (happenedAt: string) => ({ id: api.nextId(), open: false, happenedAt })
    const ahead = await agent.post(`/api/connections/${valveA}/states`).send(state('2026-12-02T00:00:00Z'))
    expect([ahead.status, ahead.body.code]).toEqual([422, 'in-the-future'])
    await agent
      .post(`/api/connections/${api.nextId()}/states`)
      .send(state('2026-12-01T00:00:00Z'))
      .expect(404)
  })

  it('draws the whole map, each body in just one water', async () => {
    const { agent } = await api.as('registrar')
    const { body } = await agent.get('/api/water-map').expect(200)
    const all = (body.waters as string[][]).flat()
    expect(new Set(all).size).toBe(all.length)
    expect(all.sort()).toEqual((body.bodies as { id: string }[]).map((one) => one.id).sort())
  })
})

describe('places', () => {
  const enclosure = (code: string, more: object = {}) => ({
    id: api.nextId(),
    code,
    name: 'Dip tub',
    kind: 'tub',
    area: 'Treatment room',
    boundary: null,
    airSpace: null,
    treatmentVessel: true,
    fillMark: { mark: 'red line', volume: { value: '60', unit: 'L' } },
    description: null,
    ...more,
  })

  it('enters a treatment vessel with its fill mark, and its water with it', async () => {
    const { agent } = await api.as('technician')
    const sent = enclosure('tub-7')
    const reply = await agent.post('/api/enclosures').send(sent).expect(201)
    expect(reply.body).toMatchObject({
      code: 'TUB-7',
      fillMark: { litres: 60, volume: { value: '60' } },
      version: 1,
    })
    expect(reply.body.waterBodyId).not.toBeNull()
    await agent.post('/api/enclosures').send(sent).expect(201)
    const twice = await agent.post('/api/enclosures').send(enclosure('TUB-7')).expect(409)
    expect(twice.body.code).toBe('number-already-used')
  })

  it.each([
    ['a vessel without a mark', { fillMark: null }, '/fillMark'],
    ['a mark of nothing', { fillMark: { mark: 'x', volume: { value: '0', unit: 'L' } } }, '/fillMark/volume'],
    [
      'an absurd mark',
      { fillMark: { mark: 'x', volume: { value: '900000', unit: 'm3' } } },
      '/fillMark/volume',
    ],
    ['a mark on a plain tank', { treatmentVessel: false }, '/fillMark'],
    ['a land area to bathe in', { kind: 'land-area' }, '/treatmentVessel'],
    ['a code with a space', { code: 'QT 3' }, '/code'],
  ])('refuses %s', async (_what, more, pointer) => {
    const { agent } = await api.as('technician')
    const reply = await agent.post('/api/enclosures').send(enclosure('X-1', more)).expect(422)
    expect(reply.body.errors[0].pointer).toBe(pointer)
  })

  it('keeps a stale correction from overwriting a newer one, and never changes the code', async () => {
    const { agent } = await api.as('technician')
    await agent.post('/api/enclosures').send(enclosure('TUB-8')).expect(201)
    const { id: _id, code: _code, ...description } = enclosure('TUB-8', { name: 'Long tub' })
    const put = (expectedVersion: number, more: object = {}) =>
      agent.put('/api/enclosures/TUB-8').send({ ...description, ...more, expectedVersion })
    expect((await put(1).expect(200)).body).toMatchObject({ name: 'Long tub', version: 2 })
    const stale = await put(1, { name: 'Short tub' }).expect(409)
    expect(stale.body).toMatchObject({ code: 'stale-version', current_version: 2 })
    const land = await put(2, { kind: 'land-area', treatmentVessel: false, fillMark: null }).expect(409)
    expect(land.body.code).toBe('kind-has-no-water')
    await agent
      .put('/api/enclosures/NONE-1')
      .send({ ...description, expectedVersion: 1 })
      .expect(404)
  })

  it('lets a keeper propose volumes, not places', async () => {
    const { agent } = await api.as('keeper')
    const reply = await agent.post('/api/enclosures').send(enclosure('TUB-9')).expect(403)
    expect(reply.body.code).toBe('may-not')
    await agent.get('/api/enclosures/TUB-9').expect(404)
  })

  it('has no water on a land area', async () => {
    const { agent } = await api.as('technician')
    const land = await anEnclosure(api, 'LAND-1', { kind: 'land-area' })
    expect((await agent.get('/api/enclosures/LAND-1').expect(200)).body.waterBodyId).toBeNull()
    expect((await water('LAND-1')).bodies).toEqual([])
    expect(await api.composition.water.questions.connectedWaterAt(land.id, testDay)).toBeNull()
  })

  it('lists by code as people count, with search and pages', async () => {
    const { agent } = await api.as('registrar')
    for (const code of ['QZ-2', 'QZ-10', 'QZ-1']) await anEnclosure(api, code, { area: 'Paging hall' })
    const list = await agent.get('/api/enclosures?q=paging&limit=2').expect(200)
    expect(list.body.total).toBe(3)
    expect(codes(list.body.rows)).toEqual(['QZ-1', 'QZ-2'])
    const rest = await agent.get(`/api/enclosures?q=paging&limit=2&cursor=${list.body.nextCursor as string}`)
    expect(codes(rest.body.rows)).toEqual(['QZ-10'])
    const water = await agent.get('/api/water?q=paging&sort=code&direction=desc&limit=2').expect(200)
    expect(water.body.rows.map((row: { code: string }) => row.code)).toEqual(['QZ-10', 'QZ-2'])
    expect(water.body.rows[0]).toMatchObject({
      volumeState: 'none',
      connectedCodes: [],
      netVolumeLitres: null,
    })
    const csv = await agent.get('/api/water.csv?q=paging').expect(200)
    expect(csv.text.split('\r\n').filter(Boolean)).toHaveLength(4)
  })

  it('takes a sump out of use, once its version is the one that was read', async () => {
    const { agent } = await api.as('technician')
    const id = await aWaterBody(api, 'RS-9')
    const put = (given: object) => agent.put(`/api/water-bodies/${id}`).send({ name: 'Old sump', ...given })
    const backwards = await put({ expectedVersion: 1, inUseUntil: '2025-01-01T00:00:00Z' }).expect(422)
    expect(backwards.body.code).toBe('period-reversed')
    await put({ expectedVersion: 1, inUseUntil: '2026-11-30T00:00:00Z' }).expect(200)
    await put({ expectedVersion: 1, inUseUntil: null }).expect(409)
    const own = await agent
      .put(`/api/water-bodies/${a.waterBodyId}`)
      .send({ name: 'x', inUseUntil: null, expectedVersion: 1 })
      .expect(409)
    expect(own.body.code).toBe('belongs-to-enclosure')
  })

  it('refuses a valve between a body and itself, and to nowhere', async () => {
    const { agent } = await api.as('technician')
    const valve = (fromBodyId: string, toBodyId: string) => ({
      id: api.nextId(),
      code: `V-${api.nextId().slice(-6)}`.toUpperCase(),
      name: 'Valve',
      kind: 'valve',
      fromBodyId,
      toBodyId,
      open: true,
      inUseFrom: longAgo,
    })
    const itself = await agent.post('/api/connections').send(valve(sumpId, sumpId)).expect(422)
    expect(itself.body.code).toBe('same-body-twice')
    await agent.post('/api/connections').send(valve(sumpId, api.nextId())).expect(404)
    const entered = valve(sumpId, a.waterBodyId)
    const made = await agent.post('/api/connections').send(entered).expect(201)
    expect(made.body).toMatchObject({ state: 'open', version: 1 })
    const out = { expectedVersion: 1, name: 'Gone', inUseUntil: '2026-11-01T00:00:00Z' }
    await agent.put(`/api/connections/${entered.id}`).send(out).expect(200)
    expect((await agent.put(`/api/connections/${entered.id}`).send(out).expect(409)).body.code).toBe(
      'stale-version',
    )
  })
})

describe('life support', () => {
  it('is on or off since when and by whom; a wrong entry is struck through', async () => {
    const { agent } = await api.as('technician')
    const unit = {
      id: api.nextId(),
      code: 'UV-1',
      name: 'UV of the river',
      kind: 'uv',
      waterBodyId: sumpId,
      on: true,
      inUseFrom: longAgo,
    }
    expect((await agent.post('/api/life-support').send(unit).expect(201)).body.state).toBe('on')
    await agent.post('/api/life-support').send(unit).expect(201)
    const off = { id: api.nextId(), on: false, happenedAt: '2026-12-01T10:00:00Z', note: 'bath on RG-1' }
    const keeper = (await api.as('keeper')).agent
    expect(
      (await keeper.post(`/api/life-support/${unit.id}/states`).send(off).expect(201)).body,
    ).toMatchObject({
      state: 'off',
      by: 'Test keeper',
    })
    const list = await agent.get('/api/water?state=life-support-off').expect(200)
    expect(list.body.rows.find((row: { code: string }) => row.code === 'RG-1').lifeSupportOff).toEqual([
      'UV-1',
    ])
    await keeper
      .post(`/api/water-records/life-support-state/${off.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'it stayed on' })
      .expect(200)
    expect((await agent.get('/api/enclosures/RG-1/water').expect(200)).body.lifeSupport[0].state).toBe('on')
    const put = (given: object) =>
      agent.put(`/api/life-support/${unit.id}`).send({ name: 'UV', inUseUntil: null, ...given })
    await put({ expectedVersion: 1 }).expect(200)
    expect((await put({ expectedVersion: 1 }).expect(409)).body.code).toBe('stale-version')
    await agent
      .post(`/api/life-support/${api.nextId()}/states`)
      .send({ ...off, id: api.nextId() })
      .expect(404)
  })
})

describe('the trail', () => {
  it('has an entry for each change, with the code as its label', async () => {
    const { agent } = await api.as('administrator')
    for (const action of [
      'enclosure.enter',
      'enclosure.correct',
      'water-body.enter',
      'connection.enter',
      'connection.open',
      'life-support.enter',
      'life-support.switch-off',
      'connection-state.void',
    ]) {
      const trail = await agent.get(`/api/audit?q=${action}&limit=1`).expect(200)
      expect(trail.body.total, action).toBeGreaterThan(0)
    }
  })
})
