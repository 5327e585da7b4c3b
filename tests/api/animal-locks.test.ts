import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aGroup, anAnimal, aPlace, aStingray } from '../builders/a-collection.ts'
import type { TestPlace } from '../builders/a-collection.ts'
import type { Tx } from '../../server/platform/database/transactions.ts'
import { installation } from '../../server/platform/http/request-context.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'
import { newKey, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let taxonId: string
let wing1: TestPlace
let wing2: TestPlace
let hall: TestPlace
beforeAll(async () => {
  api = await startApi()
  taxonId = await aStingray(api)
  wing1 = await aPlace(api, { boundary: 'Quarantine wing' })
  wing2 = await aPlace(api, { boundary: 'Quarantine wing' })
  hall = await aPlace(api)
})
afterAll(() => api.stop())

const locked = '2026-11-02T00:00:00Z'
let minute = 0
const nextTime = () => new Date(Date.parse('2026-11-30T14:00:00Z') + ++minute * 60_000).toISOString()

const inTx = (work: (tx: Tx) => Promise<unknown>) =>
  api.composition.parts.transactions.inTransaction({ actor: installation, requestId: 'test' }, async (tx) => {
    await work(tx)
  })
const lock = (animalId: string, kind: 'boundary' | 'all', caseId = api.nextId()) =>
  inTx((tx) =>
    api.composition.animals.service.lockMovement(tx, {
      animalId,
      kind,
      source: { kind: 'case', id: caseId, label: 'Q-014' },
      reason: 'in quarantine',
      at: locked,
    }),
  ).then(() => caseId)
const clear = (sourceId: string) =>
  inTx((tx) =>
    api.composition.animals.service.liftMovement(tx, { sourceId, reason: 'cleared', at: nextTime() }),
  )
const move = async (role: Role, url: string, from: TestPlace, to: TestPlace, body: object = {}) =>
  (await api.as(role)).agent.post(`${url}/moves`).send({
    id: api.nextId(),
    fromEnclosureId: from.id,
    toEnclosureId: to.id,
    happenedAt: nextTime(),
    ...body,
  })

describe('quarantine locks', () => {
  it('keep an animal inside its boundary for everybody but a veterinarian with a documented transfer', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: wing1.id })
    const caseId = await lock(ray.id, 'boundary')
    expect((await move('keeper', ray.url, wing1, wing2)).status).toBe(201)
    for (const role of ['technician', 'keeper', 'registrar'] as const) {
      const reply = await move(role, ray.url, wing2, hall, { documentedTransfer: 'to the hall' })
      expect([reply.status, reply.body.code]).toEqual([403, 'documented-transfer-needed'])
      expect(reply.body.detail).toContain('Q-014')
    }
    expect((await move('veterinarian', ray.url, wing2, hall)).body.code).toBe('documented-transfer-needed')
    const transfer = await move('veterinarian', ray.url, wing2, hall, {
      documentedTransfer: 'to the sea hall, same clock, own net',
    })
    expect(transfer.status).toBe(201)
    await clear(caseId)
    expect((await move('keeper', ray.url, hall, wing1)).status).toBe(201)
    expect((await move('keeper', ray.url, wing1, hall)).status).toBe(201)
  })

  it('hold who came into the water of a case and belongs to none, also when that case is over, through every tank of the wing', async () => {
    const ward = await aPlace(api, { boundary: 'Quarantine wing' })
    const quarantined = await anAnimal(api, { taxonId, enclosureId: ward.id })
    const id = await lock(quarantined.id, 'boundary')
    const happenedAt = '2026-11-20T14:00:00Z'
    const newcomer = await anAnimal(api, { taxonId, enclosureId: ward.id, happenedAt })
    await clear(id)
    expect((await move('keeper', quarantined.url, ward, hall)).status).toBe(201)
    expect((await move('keeper', newcomer.url, ward, wing2)).status).toBe(201)
    const reply = await move('keeper', newcomer.url, wing2, hall)
    expect([reply.status, reply.body.code]).toEqual([403, 'documented-transfer-needed'])
    expect(reply.body.detail).toContain('Q-014')
    const documented = { documentedTransfer: 'seen healthy, to the hall', reason: 'no case was opened' }
    expect((await move('veterinarian', newcomer.url, wing2, hall, documented)).status).toBe(201)
  })

  it('stop every move under a full lock, and say who lifts it', async () => {
    // Of its own, since a full lock on an animal holds the water that it stands in
    const ward = await aPlace(api, { boundary: 'Quarantine wing' })
    const ray = await anAnimal(api, { taxonId, enclosureId: ward.id })
    await lock(ray.id, 'all')
    const reply = await move('veterinarian', ray.url, ward, wing2, { documentedTransfer: 'it is needed' })
    expect([reply.status, reply.body.code]).toEqual([409, 'movement-locked'])
    expect(reply.body.detail).toMatch(/A veterinarian lifts the hold/)
  })

  it('keep a move that was made all the same, mark it, ask a veterinarian, and lock what follows', async () => {
    const ray = await anAnimal(api, { taxonId, enclosureId: wing1.id })
    await lock(ray.id, 'boundary')
    const reply = await move('keeper', ray.url, wing1, hall, { alreadyHappened: 'the pipe burst at night' })
    expect(reply.status).toBe(201)
    expect(reply.body.place.code).toBe(hall.code)
    const [open] = reply.body.discrepancies
    expect(open).toMatchObject({ kind: 'crossed-boundary', forRole: 'veterinarian' })
    const { agent } = await api.as('keeper')
    const moves = await agent.get(`${ray.url}/moves`).expect(200)
    expect(moves.body.rows[0]).toMatchObject({
      againstRule: 'crossed-boundary',
      reason: 'the pipe burst at night',
    })
    expect((await move('keeper', ray.url, hall, wing1)).body.code).toBe('movement-locked')

    const resolve = async (role: Role) =>
      (await api.as(role)).agent
        .post(`/api/discrepancies/${String(open.id)}/resolution`)
        .set('Idempotency-Key', newKey())
        .send({ outcome: 'explained', reason: 'hall tank joined to the case' })
    expect((await resolve('registrar')).status).toBe(403)
    expect((await resolve('veterinarian')).status).toBe(200)
    expect((await move('veterinarian', ray.url, hall, wing1, { documentedTransfer: 'back' })).status).toBe(
      201,
    )
  })

  it('go with the part that is split off, and keep groups of different cases apart', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: wing1.id, count: 8 })
    const resident = await aGroup(api, { taxonId, enclosureId: wing1.id, count: 8 })
    const caseId = await lock(school.id, 'boundary')
    const { agent } = await api.as('keeper')
    const split = (to: TestPlace) =>
      agent.post(`${school.url}/splits`).send({
        id: api.nextId(),
        form: 'group',
        count: 2,
        toEnclosureId: to.id,
        happenedAt: nextTime(),
      })
    expect((await split(hall)).body.code).toBe('documented-transfer-needed')
    const part = await split(wing2)
    expect(part.body.into).toMatchObject({ lock: 'boundary', locks: [{ sourceLabel: 'Q-014' }] })
    const merged = await agent
      .post(`${school.url}/merges`)
      .send({ id: api.nextId(), into: resident.accession, happenedAt: nextTime() })
    expect(merged.body.code).toBe('movement-locked')

    const lifted: string[] = []
    await inTx(async (tx) => {
      const at = nextTime()
      lifted.push(
        ...(await api.composition.animals.service.liftMovement(tx, {
          sourceId: caseId,
          reason: 'cleared',
          at,
        })),
      )
    })
    expect(lifted).toHaveLength(2)
    const sheet = await agent.get(`/api/animals/${String(part.body.into.accession)}`).expect(200)
    expect(sheet.body.lock).toBe('none')
  })

  it('let nothing leave the house but what is dead, until they are lifted', async () => {
    const school = await aGroup(api, { taxonId, enclosureId: wing1.id, count: 3 })
    await lock(school.id, 'boundary')
    const leave = (kind: 'sale' | 'escape', isFact: boolean) =>
      inTx((tx) =>
        api.composition.animals.service.changeCount(tx, {
          id: api.nextId(),
          animalId: school.id,
          kind,
          count: 1,
          happenedAt: nextTime(),
          isFact,
          source: { kind: 'transaction', id: api.nextId() },
        }),
      )
    await expect(leave('sale', false)).rejects.toMatchObject({ code: 'movement-locked' })
    await leave('escape', true)
    const { agent } = await api.as('keeper')
    const death = await agent
      .post(`${school.url}/deaths`)
      .send({ id: api.nextId(), kind: 'found-dead', count: 2, happenedAt: nextTime() })
    expect(death.body).toMatchObject({ postedCount: 2, excessCount: 0 })
  })
})

describe('what other features ask', () => {
  it('gives everybody in some enclosures at an instant, with what rules need to know of them', async () => {
    const place = await aPlace(api)
    const ray = await anAnimal(api, { taxonId, enclosureId: place.id, sex: 'female' })
    const school = await aGroup(api, {
      taxonId,
      enclosureId: place.id,
      count: 40,
      estimate: { low: 30, high: 50 },
      stage: 'juvenile',
    })
    const gone = await anAnimal(api, { taxonId, enclosureId: place.id })
    const { agent } = await api.as('keeper')
    await agent
      .post(`${gone.url}/deaths`)
      .send({ id: api.nextId(), kind: 'died-seen', count: 1, happenedAt: '2026-11-10T00:00:00Z' })
      .expect(201)
    await agent
      .post(`${ray.url}/weights`)
      .send({
        id: api.nextId(),
        weight: { value: '38.20', unit: 'kg' },
        basis: 'measured',
        happenedAt: '2026-11-20T00:00:00Z',
      })
      .expect(201)
    const vet = await api.as('veterinarian')
    await vet.agent
      .post(`/api/taxa/${taxonId}/sensitivities`)
      .send({ id: api.nextId(), code: 'copper', level: 'avoid' })
      .expect(201)
    const { questions } = api.composition.animals
    const now = await questions.animalsIn([place.id], new Date('2026-12-01T00:00:00Z'))
    expect(now.map((one) => one.accession)).toEqual([ray.accession, school.accession].sort())
    expect(now.find((one) => one.animalId === ray.id)).toMatchObject({
      taxonGroup: 'elasmobranch',
      quarantineKind: 'fish',
      sex: 'female',
      newestWeight: { weightKg: 38.2, value: '38.20', happenedOn: '2026-11-19' },
      weightBand: { lowKg: 10, highKg: 100 },
      sensitivities: [{ code: 'copper', level: 'avoid' }],
      lock: 'none',
    })
    expect(now.find((one) => one.animalId === school.id)).toMatchObject({
      stage: 'juvenile',
      weightBand: { lowKg: 0, highKg: 100 },
      count: { basis: 'estimated', ledger: 40, low: 30, high: 50 },
    })
    const then = await questions.animalsIn([place.id], new Date('2026-11-05T00:00:00Z'))
    expect(then.map((one) => one.accession)).toContain(gone.accession)
    expect(then.find((one) => one.animalId === ray.id)?.newestWeight).toBeNull()
    expect(await questions.animalsIn([place.id], new Date('2026-10-01T00:00:00Z'))).toEqual([])
    expect(await questions.deathsOf([gone.id, ray.id])).toMatchObject([
      { animalId: gone.id, happenedOn: '2026-11-09' },
    ])
    expect(await questions.staysOf([gone.id])).toMatchObject([
      { enclosureId: place.id, until: '2026-11-10T00:00:00.000Z' },
    ])
    const during = { from: new Date('2026-11-11T00:00:00Z'), until: new Date('2026-11-12T00:00:00Z') }
    expect((await questions.staysIn([place.id], during)).map((stay) => stay.animalId).sort()).toEqual(
      [ray.id, school.id].sort(),
    )
  })
})
