import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { BuiltEnclosure } from '../builders/a-water.ts'
import { aBathWater, aProduct, aSchool, bathFields } from '../builders/an-order.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let tank: BuiltEnclosure
let school: { id: string; accession: string }
beforeAll(async () => {
  api = await startApi()
  tank = await aBathWater(api, 'FR-1')
  school = await aSchool(api, tank.id, 1)
})
afterAll(() => api.stop())

const statement = (given: object = {}) => ({
  id: api.nextId(),
  answer: 'yes',
  reason: 'raised for the restocking of the bay',
  happenedAt: '2026-12-01T12:00:00Z',
  ...given,
})
const say = async (
  body: object,
  role: 'registrar' | 'veterinarian' | 'technician' | 'keeper' = 'registrar',
  accession = school.accession,
) => (await api.as(role)).agent.post(`/api/animals/${accession}/food-or-release`).send(body)
const shown = async () =>
  (await (await api.as('keeper')).agent.get(`/api/animals/${school.accession}`).expect(200)).body
    .foodOrRelease

async function found(ruleId: string, productId: string, lotId: string) {
  const fields = bathFields({ enclosureId: tank.id, animalIds: [school.id], productId, lotId })
  const { agent } = await api.as('veterinarian')
  const { cautions } = (await agent.post('/api/order-previews').send(fields).expect(200)).body
  return (cautions as { ruleId: string; level: string; code: string; overridable: boolean }[])
    .filter((one) => one.ruleId === ruleId)
    .map(({ level, code, overridable }) => `${level} ${code}${overridable ? '' : ', never overridden'}`)
}

describe('whether an animal may be eaten or set free', () => {
  it('is unknown until somebody says so, and then decides what may be signed', async () => {
    const { id, lotId } = await aProduct(api, { agent: 'metronidazole', productName: 'Metronidazole' })
    expect(await shown()).toBeNull()
    expect(await found('R37', id, lotId)).toEqual(['stop food-or-release-not-said, never overridden'])

    const body = statement({ answer: 'no', reason: 'on show for life' })
    expect((await say(body)).body.foodOrRelease).toMatchObject({ answer: 'no', reason: 'on show for life' })
    expect(await found('R37', id, lotId)).toEqual([])

    const second = statement({ happenedAt: '2026-12-01T13:00:00Z' })
    expect((await say(second, 'veterinarian')).status).toBe(201)
    expect(await shown()).toMatchObject({
      answer: 'yes',
      accession: school.accession,
      reason: 'raised for the restocking of the bay',
    })
    expect(await found('R37', id, lotId)).toEqual(['stop prohibited-in-food, never overridden'])

    // sent again it is one statement; the same number for another is refused
    expect((await say(second, 'veterinarian')).status).toBe(201)
    expect((await say({ ...second, answer: 'no' })).body.code).toBe('id-already-used')
    const trail = await (
      await api.as('administrator')
    ).agent
      .get('/api/audit?q=animal.say-food-or-release')
      .expect(200)
    expect(trail.body.rows).toMatchObject([
      { before: { answer: 'no' }, after: { answer: 'yes' } },
      { before: { answer: null }, after: { answer: 'no', reason: 'on show for life' } },
    ])
    const log = (await (await api.as('keeper')).agent.get(`/api/animals/${school.accession}/log`)).body.rows
    expect(log.filter((line: { kind: string }) => line.kind === 'food-or-release')).toHaveLength(2)
  })

  it('is said by a registrar or a veterinarian, with a reason, of an animal that is there, of what has been', async () => {
    for (const role of ['technician', 'keeper'] as const)
      expect((await say(statement(), role)).body.code, role).toBe('may-not')
    for (const bad of [{ answer: null }, { answer: 'unknown' }, { reason: '' }, { reason: 'x' }])
      expect((await say(statement(bad))).body.code, JSON.stringify(bad)).toBe('bad-input')
    expect((await say(statement({ happenedAt: '2026-12-01T20:00:00Z' }))).body.code).toBe('in-the-future')
    expect((await say(statement(), 'registrar', 'HP-9999')).body.code).toBe('not-found')
  })
})
