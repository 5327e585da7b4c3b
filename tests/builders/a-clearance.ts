import { expect } from 'vitest'
import { newKey, password, testDay } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { aCase } from './a-case.ts'
import type { BuiltCase } from './a-case.ts'
import { anEnclosure } from './a-water.ts'

/** A case whose days have run and whose two samples were negative: nothing stands between it and clearance. */
export async function aClearableCase(
  api: TestApi,
  given: Parameters<typeof aCase>[1] = {},
): Promise<BuiltCase> {
  const one = await aCase(api, { at: '2026-10-25T14:00:00Z', ...given })
  await negative(api, one, '2026-11-08')
  await negative(api, one, '2026-11-22')
  return one
}

/** A negative wet mount of a sample taken on a day, reported the next. */
export async function negative(api: TestApi, one: BuiltCase, takenOn: string): Promise<void> {
  const { agent } = await api.as('technician')
  const taken = new Date(`${takenOn}T14:00:00Z`)
  await agent
    .post(`${one.url}/results`)
    .send({
      id: api.nextId(),
      takenAt: taken.toISOString(),
      happenedAt: new Date(taken.getTime() + 86_400_000).toISOString(),
      testKey: 'wet-mount',
      result: 'negative',
    })
    .expect(201)
}

/** Signs the clearance of a case as a person; nothing unmet was seen unless told. */
export function clear(
  person: TestPerson,
  one: Pick<BuiltCase, 'url'>,
  change: Record<string, unknown> = {},
  key = newKey(),
) {
  return person.agent
    .post(`${one.url}/clearance`)
    .set('Idempotency-Key', key)
    .send({ password, expectedUnmet: [], ...change })
}

/** A keeper moves the animals of a case out of its boundary, into a hall. */
export async function moveOut(api: TestApi, one: BuiltCase) {
  const hall = await anEnclosure(api, `HALL-${one.number}`)
  const { agent } = await api.as('keeper')
  return agent.post(`/api/animals/${one.animal.accession}/moves`).send({
    id: api.nextId(),
    fromEnclosureId: one.enclosure.id,
    toEnclosureId: hall.id,
    happenedAt: testDay.toISOString(),
  })
}

/** Nobody can tell any more that these animals were cleared: wherever they are shown, they stay inside the boundary. */
export async function expectInside(api: TestApi, one: BuiltCase): Promise<void> {
  const { agent } = await api.as('keeper')
  const { body: sheet } = await agent.get(`/api/animals/${one.animal.accession}`).expect(200)
  expect(sheet.locks).toMatchObject([{ kind: 'boundary', sourceLabel: one.number }])
  const { body: list } = await agent.get(`/api/animals?q=${one.animal.accession}`).expect(200)
  expect(list.rows).toMatchObject([{ accession: one.animal.accession, lock: 'boundary' }])
}
