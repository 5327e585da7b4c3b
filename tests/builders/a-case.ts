import type { TestApi } from '../support/api.ts'
import { aGroup, aTaxon } from './a-collection.ts'
import { anEnclosure } from './a-water.ts'
import type { BuiltEnclosure } from './a-water.ts'

/** The protocol that every installation starts with: 30 days, looked at every day, two samples. */
export const simpleProtocolId = '019a0000-0011-7000-8000-000000000002'

export interface BuiltCase {
  id: string
  number: string
  url: string
  enclosure: BuiltEnclosure
  taxonId: string
  animal: { id: string; accession: string }
}

let last = 0

/** A taxon of fish with a name of its own. */
export function aFish(api: TestApi, group = 'teleost'): Promise<string> {
  const n = String(++last)
  return aTaxon(api, { scientificName: `Piscis numerus ${n}`, commonName: `Lined wrasse ${n}`, group })
}

/**
 * A quarantine case of one group in a tank of its own: arrived, opened and, unless told, closed at the same time.
 */
export async function aCase(
  api: TestApi,
  given: {
    at?: string
    count?: number
    close?: boolean
    enclosure?: BuiltEnclosure
    taxonId?: string
    protocolVersionId?: string
  } = {},
): Promise<BuiltCase> {
  const at = given.at ?? '2026-11-10T14:00:00Z'
  const enclosure = given.enclosure ?? (await anEnclosure(api, `C-${String(++last)}`, { boundary: 'Wing' }))
  const taxonId = given.taxonId ?? (await aFish(api))
  const animal = await aGroup(api, {
    taxonId,
    enclosureId: enclosure.id,
    count: given.count ?? 8,
    happenedAt: at,
  })
  const { agent } = await api.as('technician')
  const id = api.nextId()
  const opened = await agent
    .post('/api/cases')
    .send({
      id,
      protocolVersionId: given.protocolVersionId ?? simpleProtocolId,
      members: [{ id: api.nextId(), accession: animal.accession, happenedAt: at }],
      happenedAt: at,
    })
    .expect(201)
  const number = opened.body.number as string
  const url = `/api/cases/${number}`
  if (given.close !== false)
    await agent.post(`${url}/closing`).send({ id: api.nextId(), happenedAt: at }).expect(201)
  return { id, number, url, enclosure, taxonId, animal }
}
