import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish } from '../builders/a-case.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { anAnimal } from '../builders/a-collection.ts'
import { aParty, newLine } from '../builders/a-register.ts'
import { anEnclosure, aValve } from '../builders/a-water.ts'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'
import { worklistOf } from '../support/worklist.ts'
import type { Role } from '../../shared/domain/permissions/roles.ts'

let api: TestApi
let worklist: ReturnType<typeof worklistOf>
let hall: BuiltEnclosure
let taxonId: string
beforeAll(async () => {
  api = await startApi()
  worklist = worklistOf(api)
  hall = await anEnclosure(api, 'HALL')
  taxonId = await aFish(api)
})
afterAll(() => api.stop())

const send = async (role: Role, url: string, body: object) => (await api.as(role)).agent.post(url).send(body)

/** An animal of no case: it came long before, and stands in an enclosure since. */
const resident = (enclosure: BuiltEnclosure, happenedAt = '2026-11-05T14:00:00Z') =>
  anAnimal(api, { taxonId, enclosureId: enclosure.id, happenedAt })

const move = (
  animal: { url: string },
  from: BuiltEnclosure,
  to: BuiltEnclosure,
  body: object = {},
  role: Role = 'keeper',
) =>
  send(role, `${animal.url}/moves`, {
    id: api.nextId(),
    fromEnclosureId: from.id,
    toEnclosureId: to.id,
    happenedAt: '2026-11-25T14:00:00Z',
    ...body,
  })

const hold = async (one: BuiltCase, happenedAt = '2026-11-20T14:00:00Z', origin = 'online') => {
  const reply = await send('keeper', `${one.url}/holds`, {
    id: api.nextId(),
    happenedAt,
    origin,
    device: 'test',
  })
  expect(reply.status).toBe(201)
}

const happened = { alreadyHappened: 'the wrong net was taken' }

describe('the water of a quarantine case', () => {
  it('lets an animal of no case out across the boundary by a documented transfer only', async () => {
    const one = await aCase(api)
    const guest = await resident(one.enclosure)
    const refused = await move(guest, one.enclosure, hall)
    expect([refused.status, refused.body.code]).toEqual([403, 'documented-transfer-needed'])
    expect(refused.body.detail).toContain(one.number)
    const kept = await move(guest, one.enclosure, hall, happened)
    expect(kept.body.discrepancies).toMatchObject([
      { kind: 'crossed-boundary', forRole: 'veterinarian', facts: { by: one.number, to: 'HALL' } },
    ])
    const { accession } = guest
    expect(await worklist.rolesThatSee('discrepancy-veterinarian', accession)).toEqual(['veterinarian'])
    expect(await worklist.rolesThatSee('movement-marked', accession)).toEqual(['registrar'])
    const other = await resident(one.enclosure)
    const transfer = { documentedTransfer: 'to the hall, own net' }
    expect((await move(other, one.enclosure, hall, transfer, 'veterinarian')).status).toBe(201)
  })

  it('lets nothing in or out while it is held; what came in all the same is marked and starts the days again', async () => {
    const one = await aCase(api)
    const inside = await resident(one.enclosure)
    const outside = await resident(hall)
    await hold(one)
    for (const reply of [
      await move(inside, one.enclosure, hall, { documentedTransfer: 'to the hall' }, 'veterinarian'),
      await move(outside, hall, one.enclosure),
    ]) {
      expect([reply.status, reply.body.code]).toEqual([409, 'movement-locked'])
      expect(reply.body.detail).toContain(`The water of ${one.enclosure.code} is held: ${one.number}`)
    }
    const { agent } = await api.as('keeper')
    expect((await agent.get(one.url)).body.day0On).toBe('2026-11-10')
    const kept = await move(outside, hall, one.enclosure, happened)
    expect(kept.status).toBe(201)
    expect(kept.body.discrepancies).toMatchObject([{ kind: 'moved-under-lock', facts: { by: one.number } }])
    const moves = await agent.get(`${outside.url}/moves`)
    expect(moves.body.rows[0]).toMatchObject({ againstRule: 'moved-under-lock' })
    expect((await agent.get(one.url)).body.day0On).toBe('2026-11-25')
  })

  it('is all water joined with it', async () => {
    const one = await aCase(api)
    const next = await anEnclosure(api, 'NEXT', { boundary: 'Wing' })
    await aValve(api, 'V-NEXT', [one.enclosure.waterBodyId, next.waterBodyId])
    const guest = await resident(next)
    await hold(one)
    expect((await move(guest, next, hall)).body.code).toBe('movement-locked')
  })

  it('says which cases are in it before an animal is put there', async () => {
    const one = await aCase(api)
    const open = await aCase(api, { close: false })
    const next = await anEnclosure(api, 'BESIDE', { boundary: 'Wing' })
    const ask = async (enclosure: BuiltEnclosure) => {
      const { agent } = await api.as('registrar')
      return (await agent.get(`/api/enclosures/${enclosure.id}/cases`).expect(200)).body.rows
    }
    expect(await ask(one.enclosure)).toEqual([{ number: one.number, batchClosed: true }])
    expect(await ask(open.enclosure)).toEqual([{ number: open.number, batchClosed: false }])
    expect(await ask(next)).toEqual([])
    await aValve(api, 'V-BESIDE', [one.enclosure.waterBodyId, next.waterBodyId])
    expect(await ask(next)).toEqual([{ number: one.number, batchClosed: true }])
    const { agent } = await api.as('registrar')
    const nowhere = await agent.get(`/api/enclosures/${api.nextId()}/cases`)
    expect([nowhere.status, nowhere.body.code]).toEqual([404, 'not-found'])
  })

  it('is left freely by what was cleared in it', async () => {
    const one = await aCase(api)
    const guest = await resident(one.enclosure)
    await api.composition.parts.transactions.inTransaction(
      { actor: { personId: null, printedName: 'test', roles: [] }, requestId: 'test' },
      async (tx) => {
        // of another keeper of locks than the cases: a case that lifts has its clearance behind it
        const source = { kind: 'earlier-house', id: api.nextId(), label: 'Q-999' }
        const { lockMovement, liftMovement } = api.composition.animals.service
        const at = '2026-11-06T14:00:00Z'
        await lockMovement(tx, { animalId: guest.id, kind: 'boundary', source, reason: 'in quarantine', at })
        await liftMovement(tx, { sourceId: source.id, reason: 'cleared', at: '2026-11-24T14:00:00Z' })
      },
    )
    expect((await move(guest, one.enclosure, hall)).status).toBe(201)
  })

  it('takes no new animals in while it is held, unless they are in it already', async () => {
    const one = await aCase(api)
    await hold(one)
    const counterpartyId = await aParty(api, 'Norrell Reef Lab')
    const acquire = (stage: 'now' | 'already') =>
      send('registrar', '/api/register/acquisitions', {
        id: api.nextId(),
        kind: 'purchase',
        stage,
        on: '2026-11-26',
        counterpartyId,
        permitUses: [],
        lines: [newLine(api, { taxonId, enclosureId: one.enclosure.id, count: 3 })],
      })
    const refused = await acquire('now')
    expect([refused.status, refused.body.code]).toEqual([409, 'movement-locked'])
    expect(refused.body.errors[0].pointer).toBe('/lines/0/enclosureId')
    const kept = await acquire('already')
    expect(kept.status).toBe(201)
    const accession = kept.body.lines[0].accession as string
    expect(await worklist.rolesThatSee('movement-marked', accession)).toEqual(['registrar'])
    const { agent } = await api.as('keeper')
    expect((await agent.get(one.url)).body.day0On).toBe('2026-11-26')
  })
})

describe('a move entered after a hold, for a time before it', () => {
  it('is asked back, and kept with its reason and marked', async () => {
    const one = await aCase(api)
    const url = `/api/animals/${one.animal.accession}`
    const ward = await anEnclosure(api, 'WARD', { boundary: 'Wing' })
    await hold(one, '2026-11-26T14:00:00Z')
    const refused = await move({ url }, one.enclosure, ward)
    expect([refused.status, refused.body.code]).toEqual([409, 'movement-locked'])
    expect(refused.body.detail).toMatch(/began after the time/)
    const kept = await move({ url }, one.enclosure, ward, happened)
    expect(kept.body.discrepancies).toMatchObject([
      { kind: 'moved-before-lock', forRole: 'veterinarian', facts: { by: one.number } },
    ])
  })

  it('is asked about when the hold itself comes in late', async () => {
    const one = await aCase(api)
    const url = `/api/animals/${one.animal.accession}`
    const ward = await anEnclosure(api, 'WARD-3', { boundary: 'Wing' })
    expect((await move({ url }, one.enclosure, ward)).status).toBe(201)
    await hold(one, '2026-11-24T14:00:00Z', 'outbox')
    const { agent } = await api.as('veterinarian')
    const sheet = await agent.get(url)
    expect(sheet.body.discrepancies).toMatchObject([
      { kind: 'moved-under-lock', facts: { to: 'WARD-3', by: one.number } },
    ])
  })
})
