import type { Permit } from '../../shared/contracts/permits.contract.ts'
import type { Transaction } from '../../shared/contracts/acquisitions.contract.ts'
import type { TestApi } from '../support/api.ts'

/** Another party, entered by the registrar. */
export async function aParty(api: TestApi, name: string, kind = 'institution'): Promise<string> {
  const { agent } = await api.as('registrar')
  const id = api.nextId()
  await agent.post('/api/register/counterparties').send({ id, name, kind }).expect(201)
  return id
}

let lastPermit = 0

export const permitBody = (api: TestApi, given: object = {}) => ({
  id: api.nextId(),
  permitNumber: `NS-26-${String(++lastPermit).padStart(3, '0')}`,
  authority: 'Norrell Sound Fisheries',
  kind: 'collecting',
  validFrom: '2026-01-01',
  validUntil: '2026-12-31',
  quantityAllowed: 20,
  taxonIds: [],
  ...given,
})

/** A permit for 20 animals in 2026, unless told. */
export async function aPermit(api: TestApi, given: object = {}): Promise<Permit> {
  const { agent } = await api.as('registrar')
  const reply = await agent.post('/api/register/permits').send(permitBody(api, given)).expect(201)
  return reply.body as Permit
}

export interface LineGiven {
  taxonId: string
  enclosureId: string
  count?: number
  form?: 'individual' | 'group'
}

/** A line that accessions a group of 12, or what it is told. */
export const newLine = (api: TestApi, given: LineGiven & Record<string, unknown>) => ({
  record: 'new',
  id: api.nextId(),
  animalId: api.nextId(),
  form: 'group',
  sex: 'unknown',
  lifeStage: 'adult',
  count: 12,
  ...given,
})

/** The form of an acquisition as the registrar sends it: found animals of today, unless told. */
export const acquisitionBody = (api: TestApi, given: { lines: object[] } & Record<string, unknown>) => ({
  id: api.nextId(),
  kind: 'found',
  stage: 'already',
  on: '2026-11-20',
  permitUses: [],
  ...given,
})

export async function anAcquisition(
  api: TestApi,
  given: { lines: object[] } & Record<string, unknown>,
): Promise<Transaction> {
  const { agent } = await api.as('registrar')
  const reply = await agent.post('/api/register/acquisitions').send(acquisitionBody(api, given))
  if (reply.status !== 201) throw new Error(JSON.stringify(reply.body))
  return reply.body as Transaction
}

export async function aDisposition(
  api: TestApi,
  given: { kind: string; lines: object[] } & Record<string, unknown>,
): Promise<Transaction> {
  const { agent } = await api.as('registrar')
  const body = { id: api.nextId(), stage: 'already', on: '2026-11-25', permitUses: [], ...given }
  const reply = await agent.post('/api/register/dispositions').send(body)
  if (reply.status !== 201) throw new Error(JSON.stringify(reply.body))
  return reply.body as Transaction
}

/** A page of PDF, made by hand: what a sniffer takes for one and a reader opens. */
export const pdfBytes = (words = 'Loan agreement') =>
  Buffer.from(
    `%PDF-1.4\n1 0 obj<</Type/Catalog/Pages 2 0 R>>endobj\n2 0 obj<</Type/Pages/Kids[]/Count 0>>endobj\n` +
      `% ${words}\ntrailer<</Root 1 0 R>>\n%%EOF\n`,
  )
