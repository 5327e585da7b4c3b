import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { aCase, aFish } from '../builders/a-case.ts'
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
})
