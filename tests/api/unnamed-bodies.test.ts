import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish } from '../builders/a-case.ts'
import type { BuiltCase } from '../builders/a-case.ts'
import { aGroup } from '../builders/a-collection.ts'
import { anEnclosure } from '../builders/a-water.ts'
import { anObservation } from '../builders/an-observation.ts'
import { newKey, password, startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
beforeAll(async () => void (api = await startApi()))
afterAll(() => api.stop())

describe('bodies without a name where two cases live', () => {
  const unextended = '2026-12-10'
  const extended = '2026-12-15'

  /** Two batches of the same kind in one tank, and bodies that nobody could name. */
  async function bodiesInOneTank(code: string, foundDead: number) {
    const enclosure = await anEnclosure(api, code, { boundary: 'Wing' })
    const taxonId = await aFish(api)
    const both = [
      await aCase(api, { enclosure, taxonId, count: 5 }),
      await aCase(api, { enclosure, taxonId, count: 6 }),
    ] as const
    const keeper = await api.as('keeper')
    const seen = await keeper.agent
      .post('/api/observations')
      .send(anObservation(api, enclosure.code, { foundDead }))
    expect(seen.body).toMatchObject({ unassignedDead: foundDead, cases: both.map(({ number }) => number) })
    const { agent } = await api.as('technician')
    const standing = async () => {
      const found: [string, (string | null)[]][] = []
      for (const { url } of both) {
        const { body } = await agent.get(url).expect(200)
        found.push([
          body.earliestClearanceOn,
          body.deaths.map((row: { accession: string | null }) => row.accession),
        ])
      }
      return found
    }
    return { both, id: seen.body.id as string, standing }
  }
  const name = async (id: string, body: object) =>
    (await api.as('veterinarian')).agent
      .post(`/api/observations/${id}/bodies`)
      .send({ id: api.nextId(), ...body })
  const strike = async (role: 'keeper' | 'veterinarian', id: string) =>
    (await api.as(role)).agent
      .post(`/api/observations/${id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Looked into the wrong tank' })

  it('are waited for by both, and once they are named only by their own', async () => {
    const { both, id, standing } = await bodiesInOneTank('OB-TWO', 1)
    expect(await standing()).toEqual([
      [extended, [null]],
      [extended, [null]],
    ])
    const { accession } = both[1].animal
    expect((await name(id, { deaths: [{ id: api.nextId(), accession, count: 1 }] })).status).toBe(201)
    expect(await standing()).toEqual([
      [unextended, []],
      [extended, [accession]],
    ])
  })

  it('are waited for again by both when the death that they were named by is struck out', async () => {
    const { both, id, standing } = await bodiesInOneTank('OB-AGAIN', 2)
    const { accession } = both[1].animal
    const deaths = [{ id: api.nextId(), accession, count: 1 }]
    expect((await name(id, { deaths, reason: 'the other was eaten' })).status).toBe(201)
    const vet = await api.as('veterinarian')
    await vet.agent
      .post(`/api/animals/${accession}/deaths/${String(deaths[0]?.id)}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'It was one of the others' })
      .expect(200)
    const again = [
      [extended, [null, null]],
      [extended, [null, null]],
    ]
    expect(await standing()).toEqual(again)
    // the one that lost its name, not the one that was explained, waits for a name, and is given one
    const toName = async () => {
      const { rows } = (await vet.agent.get('/api/observations?bodies=to-name').expect(200)).body
      return rows
        .filter((row: { id: string }) => row.id === id)
        .map((row: { bodiesToName: number }) => row.bodiesToName)
    }
    expect(await toName()).toEqual([1])
    const other = { id: api.nextId(), accession: both[0].animal.accession, count: 1 }
    expect((await name(id, { deaths: [{ ...other, count: 2 }] })).status).toBe(422)
    expect((await name(id, { deaths: [other] })).status).toBe(201)
    expect(await toName()).toEqual([])
    expect(await standing()).toEqual([
      [extended, expect.arrayContaining([other.accession, null])],
      [extended, [null]],
    ])
    expect((await name(id, { deaths: [], reason: 'nobody knows' })).body.code).toBe('already-explained')
    await vet.agent
      .post(`/api/animals/${other.accession}/deaths/${other.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'It was none of these either' })
      .expect(200)
    expect(await standing()).toEqual(again)
    // also by a case that is entered later
    const at = '2026-11-10T14:00:00Z'
    const { enclosure, taxonId } = both[0]
    const late = await aCase(api, { enclosure, taxonId, at })
    expect((await vet.agent.get(late.url)).body).toMatchObject({
      earliestClearanceOn: extended,
      deaths: [{ count: 2 }],
    })
    // and once the look itself is struck out, by none
    expect((await strike('veterinarian', id)).status).toBe(200)
    expect(await standing()).toEqual([
      [unextended, []],
      [unextended, []],
    ])
  })

  it('go on standing in both where nobody will ever name them', async () => {
    const { both, id, standing } = await bodiesInOneTank('OB-REST', 2)
    const { accession } = both[0].animal
    const deaths = [{ id: api.nextId(), accession, count: 1 }]
    expect((await name(id, { deaths, reason: 'the other was eaten' })).status).toBe(201)
    expect(await standing()).toEqual([
      [extended, expect.arrayContaining([accession, null])],
      [extended, [null]],
    ])
  })

  it('are waited for by none once their observation is struck out, on the day by who made it, later by a veterinarian', async () => {
    const slip = await bodiesInOneTank('OB-SLIP', 1)
    expect((await strike('keeper', slip.id)).status).toBe(200)
    const free = [
      [unextended, []],
      [unextended, []],
    ]
    expect(await slip.standing()).toEqual(free)

    const late = await bodiesInOneTank('OB-LATE', 1)
    const today = api.clock.now()
    api.clock.set(new Date(today.getTime() + 24 * 3600_000))
    const refused = await strike('keeper', late.id)
    expect([refused.status, refused.body.code]).toEqual([403, 'may-not'])
    expect((await strike('veterinarian', late.id)).status).toBe(200)
    api.clock.set(today)
    expect(await late.standing()).toEqual(free)
    expect((await name(late.id, { deaths: [], reason: 'nobody knows' })).body.code).toBe('already-void')
  })

  it('are not struck out while a veterinarian’s signed cause stands on them', async () => {
    const { both, id, standing } = await bodiesInOneTank('OB-SIGN', 1)
    const vet = await api.as('veterinarian')
    const [death] = (await vet.agent.get(both[0].url)).body.deaths as { eventId: string }[]
    await vet.agent
      .post(`${both[0].url}/deaths/${String(death?.eventId)}/cause`)
      .set('Idempotency-Key', newKey())
      .send({ finding: 'explained-not-transmissible', cause: 'caught in the screen', password })
      .expect(200)
    const refused = await strike('veterinarian', id)
    expect([refused.status, refused.body.code]).toEqual([409, 'cause-signed'])
    expect(refused.body.detail).toContain(both[0].number)
    expect(await standing()).toEqual([
      [unextended, [null]],
      [extended, [null]],
    ])
  })

  /** A group that lives in a tank of its own, in no case. */
  const aStranger = async (code: string) => {
    const enclosure = await anEnclosure(api, code, { boundary: 'Wing' })
    const at = '2026-11-10T14:00:00Z'
    const group = { taxonId: await aFish(api), enclosureId: enclosure.id, count: 4, happenedAt: at }
    return aGroup(api, group)
  }
  const explain = async (accession: string, outcome: 'explained' | 'seen-wrongly') => {
    const { agent } = await api.as('registrar')
    const chart = await agent.get(`/api/animals/${accession}`).expect(200)
    const [open] = chart.body.discrepancies as { id: string; kind: string }[]
    expect(open?.kind).toBe('died-elsewhere')
    await agent
      .post(`/api/discrepancies/${String(open?.id)}/resolution`)
      .set('Idempotency-Key', newKey())
      .send({ outcome, reason: 'It had jumped over the wall' })
      .expect(200)
  }
  const waits = [
    [extended, [null]],
    [extended, [null]],
  ]

  it('are waited for, though named as an animal from elsewhere, until somebody explained how it came there', async () => {
    const { id, standing } = await bodiesInOneTank('OB-ELSE', 1)
    const { accession } = await aStranger('OB-ELSE-2')
    expect((await name(id, { deaths: [{ id: api.nextId(), accession, count: 1 }] })).status).toBe(201)
    expect(await standing()).toEqual(waits)
    // the death of a named animal stands when the look is struck out, which says so, and so does the wait for what
    // explains it
    const struck = await strike('keeper', id)
    expect([struck.status, struck.body.deathsStanding]).toEqual([200, [{ accession, count: 1 }]])
    expect(await standing()).toEqual(waits)
    await explain(accession, 'explained')
    expect(await standing()).toEqual([
      [unextended, []],
      [unextended, []],
    ])
  })

  it('go on being waited for where it turns out that they were not that animal', async () => {
    const { id, standing } = await bodiesInOneTank('OB-NOT', 1)
    const { accession } = await aStranger('OB-NOT-2')
    expect((await name(id, { deaths: [{ id: api.nextId(), accession, count: 1 }] })).status).toBe(201)
    await explain(accession, 'seen-wrongly')
    expect(await standing()).toEqual(waits)
  })

  it('named as an animal from elsewhere at once are waited for in the same way', async () => {
    const one = await aCase(api)
    const { accession } = await aStranger('OB-ONCE')
    const deaths = [{ id: api.nextId(), accession, count: 1 }]
    const { agent } = await api.as('keeper')
    await agent
      .post('/api/observations')
      .send(anObservation(api, one.enclosure.code, { foundDead: 1, deaths }))
      .expect(201)
    expect((await agent.get(one.url)).body.earliestClearanceOn).toBe(extended)
    await explain(accession, 'explained')
    expect((await agent.get(one.url)).body.earliestClearanceOn).toBe(unextended)
  })
})

describe('bodies found where a batch is no longer, or is not known of yet', () => {
  const seeDead = async (code: string, happenedAt = '2026-12-01T18:00:00Z') => {
    const { agent } = await api.as('keeper')
    const seen = await agent
      .post('/api/observations')
      .send(anObservation(api, code, { foundDead: 1, happenedAt }))
    expect(seen.status).toBe(201)
    return seen.body as { id: string; unassignedDead: number; cases: string[] }
  }
  const clearanceOf = async (url: string) =>
    (await (await api.as('technician')).agent.get(url).expect(200)).body.earliestClearanceOn as string
  const moveOut = async (one: BuiltCase, happenedAt: string) => {
    const to = await anEnclosure(api, `${one.enclosure.code}-B`, { boundary: 'Wing' })
    const { agent } = await api.as('technician')
    await agent
      .post(`/api/animals/${one.animal.accession}/moves`)
      .send({ id: api.nextId(), fromEnclosureId: one.enclosure.id, toEnclosureId: to.id, happenedAt })
      .expect(201)
  }

  it.each([
    ['minutes', '2026-12-01T17:50:00Z', '2026-12-15'],
    ['almost a day', '2026-11-30T18:30:00Z', '2026-12-15'],
    ['more than a day', '2026-11-30T17:30:00Z', '2026-12-10'],
  ])('after it left %s before are waited for if it was there within a day', async (_, leftAt, clearance) => {
    const one = await aCase(api)
    await moveOut(one, leftAt)
    await seeDead(one.enclosure.code)
    expect(await clearanceOf(one.url)).toBe(clearance)
  })

  it('are not given to the only group there while another batch has just left', async () => {
    const left = await aCase(api)
    const stays = await aCase(api, { enclosure: left.enclosure, taxonId: left.taxonId })
    await moveOut(left, '2026-12-01T17:50:00Z')
    expect((await seeDead(left.enclosure.code)).unassignedDead).toBe(1)
    expect([await clearanceOf(left.url), await clearanceOf(stays.url)]).toEqual(['2026-12-15', '2026-12-15'])
  })

  it.each([
    ['in time', '2026-11-30T12:00:00Z', '2026-12-15'],
    ['only after they were found', '2026-12-01T18:05:00Z', '2026-12-10'],
  ])('where a move that is entered later had brought a batch %s', async (_, happenedAt, clearance) => {
    const one = await aCase(api)
    const to = await anEnclosure(api, `${one.enclosure.code}-C`, { boundary: 'Wing' })
    await seeDead(to.code)
    expect(await clearanceOf(one.url)).toBe('2026-12-10')
    const { agent } = await api.as('technician')
    await agent
      .post(`/api/animals/${one.animal.accession}/moves`)
      .send({ id: api.nextId(), fromEnclosureId: one.enclosure.id, toEnclosureId: to.id, happenedAt })
      .expect(201)
    expect(await clearanceOf(one.url)).toBe(clearance)
  })

  it('before its case was entered are waited for by it too', async () => {
    const at = '2026-11-10T14:00:00Z'
    const enclosure = await anEnclosure(api, 'OB-LATER', { boundary: 'Wing' })
    const taxonId = await aFish(api)
    // a second group, so that nobody can say whose the body is
    await aGroup(api, { taxonId, enclosureId: enclosure.id, count: 3, happenedAt: at })
    // and the first of the case, entered after the body
    const first = await aCase(api, { enclosure, taxonId, at })
    const seen = await seeDead(enclosure.code)
    expect([seen.unassignedDead, seen.cases]).toEqual([1, [first.number]])
    const late = await aCase(api, { enclosure, taxonId, at })
    expect([await clearanceOf(first.url), await clearanceOf(late.url)]).toEqual(['2026-12-15', '2026-12-15'])
    const strike = await (
      await api.as('keeper')
    ).agent
      .post(`/api/observations/${seen.id}/void`)
      .set('Idempotency-Key', newKey())
      .send({ reason: 'Looked into the wrong tank' })
    expect(strike.status).toBe(200)
    expect([await clearanceOf(first.url), await clearanceOf(late.url)]).toEqual(['2026-12-10', '2026-12-10'])
  })
})
