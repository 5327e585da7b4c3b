import type { Accession } from '../../server/features/animals/index.ts'
import type { Actor } from '../../server/platform/http/request-context.ts'
import type { TestApi } from '../support/api.ts'
import { anEnclosure } from './a-water.ts'

export interface TestPlace {
  id: string
  code: string
}

/** A month before the fixed day of the tests. */
export const arrivalAt = '2026-11-01T12:00:00Z'

let lastPlace = 0

/** An enclosure, empty, in use since long ago. */
export async function aPlace(
  api: TestApi,
  given: { boundary?: string; inUseUntil?: string } = {},
): Promise<TestPlace> {
  const { id, code } = await anEnclosure(api, `T-${String(++lastPlace)}`, {
    boundary: given.boundary ?? null,
  })
  // no screen takes an enclosure out of use yet
  if (given.inUseUntil !== undefined)
    await api.composition.parts.dataSource.query(`UPDATE enclosures SET in_use_until = $2 WHERE id = $1`, [
      id,
      given.inUseUntil,
    ])
  return { id, code }
}

/** A taxon with a plausible weight, entered by the registrar. */
export async function aTaxon(
  api: TestApi,
  given: {
    scientificName: string
    commonName: string
    group: string
    band?: [low: string, high: string, unit: string]
  },
): Promise<string> {
  const { agent } = await api.as('registrar')
  const id = api.nextId()
  const { band, ...names } = given
  await agent
    .post('/api/taxa')
    .send({ id, ...names })
    .expect(201)
  if (band)
    await agent
      .post(`/api/taxa/${id}/weight-bands`)
      .send({
        id: api.nextId(),
        stage: null,
        low: band[0],
        high: band[1],
        unit: band[2],
        source: 'test of plausible weights',
        mark: 'P',
      })
      .expect(201)
  return id
}

export const aStingray = (api: TestApi, n = 1) =>
  aTaxon(api, {
    scientificName: `Hypanus americanus ${String(n)}`,
    commonName: 'Southern stingray',
    group: 'elasmobranch',
    band: ['10', '100', 'kg'],
  })

/** Enters an animal or group as the registrar's acquisition does. */
export async function anAnimal(
  api: TestApi,
  given: Pick<Accession, 'taxonId' | 'enclosureId'> & Partial<Accession>,
): Promise<{ id: string; accession: string; url: string }> {
  const registrar = await api.as('registrar')
  const id = given.id ?? api.nextId()
  const actor: Actor = { personId: registrar.id, printedName: registrar.printedName, roles: ['registrar'] }
  const { parts, animals } = api.composition
  const { accession } = await parts.transactions.inTransaction({ actor, requestId: 'test' }, (tx) =>
    animals.service.accessionAnimal(tx, {
      form: 'individual',
      count: 1,
      sex: 'unknown',
      stage: 'adult',
      kind: 'purchase',
      happenedAt: arrivalAt,
      ...given,
      id,
    }),
  )
  return { id, accession, url: `/api/animals/${accession}` }
}

export const aGroup = (
  api: TestApi,
  given: Pick<Accession, 'taxonId' | 'enclosureId' | 'count'> & Partial<Accession>,
) => anAnimal(api, { form: 'group', ...given })
