import type { AnsweredCaution } from '../../shared/contracts/orders.contract.ts'
import type { BathOrderFields, SaidCaution } from '../../shared/contracts/order-primitives.ts'
import { nothingStated } from '../../shared/domain/orders/bath-order-draft.ts'
import { newKey, password } from '../support/api.ts'
import type { TestApi, TestPerson } from '../support/api.ts'
import { aGroup, aTaxon } from './a-collection.ts'
import { anEnclosure, aTankAndSumpSheet, aValve, aWaterBody } from './a-water.ts'
import type { BuiltEnclosure } from './a-water.ts'

/** A tank with its sump, its volume determined and confirmed: 2,181.4 L net, ± 2 %. */
export async function aBathWater(
  api: TestApi,
  code: string,
  joined: readonly BuiltEnclosure[] = [],
): Promise<BuiltEnclosure & { sumpId: string }> {
  const tank = await anEnclosure(api, code)
  const sumpId = await aWaterBody(api, `S-${code}`)
  await aValve(api, `V-${code}`, [tank.waterBodyId, sumpId])
  for (const other of joined) await aValve(api, `V-${other.code}`, [sumpId, other.waterBodyId])
  await determineBathWater(api, code, [tank, { waterBodyId: sumpId }, ...joined])
  return { ...tank, sumpId }
}

/** Its volume, measured by one person and confirmed by another; also anew. */
export async function determineBathWater(
  api: TestApi,
  code: string,
  bodies: readonly { waterBodyId: string }[],
  happenedAt = '2026-11-30T14:00:00Z',
): Promise<void> {
  const id = api.nextId()
  await (
    await api.as('technician')
  ).agent
    .post(`/api/enclosures/${code}/volumes`)
    .send({
      id,
      happenedAt,
      waterBodyIds: bodies.map(({ waterBodyId }) => waterBodyId),
      sheet: aTankAndSumpSheet,
    })
    .expect(201)
  await (
    await api.as('veterinarian')
  ).agent
    .post(`/api/volumes/${id}/confirmation`)
    .set('Idempotency-Key', newKey())
    .send({})
    .expect(200)
}

/** Readings of a moment in one body of water. */
export async function readingsNow(
  api: TestApi,
  waterBodyId: string,
  values: Record<string, [value: string, unit: string]>,
  happenedAt = '2026-12-01T18:10:00Z',
): Promise<void> {
  const readings = Object.entries(values).map(([parameter, [value, unit]]) => ({
    id: api.nextId(),
    parameter,
    value: { value, unit },
    ...(parameter === 'ph' ? { scale: 'nbs' } : {}),
  }))
  await (
    await api.as('technician')
  ).agent
    .post('/api/readings')
    .send({ waterBodyId, happenedAt, readings })
    .expect(201)
}

/** A group of marine fish in an enclosure. */
export async function aSchool(
  api: TestApi,
  enclosureId: string,
  n: number,
): Promise<{ id: string; accession: string }> {
  const taxonId = await aTaxon(api, {
    scientificName: `Zebrasoma flavescens ${String(n)}`,
    commonName: 'Yellow tang',
    group: 'teleost',
  })
  return aGroup(api, { taxonId, enclosureId, count: 14 })
}

/** A product with a usable lot, entered by the technician. */
export async function aProduct(api: TestApi, given: object, expiresOn = '2028-03-31') {
  // as at every start of the server: without a dose line to be held against, an order is stopped
  await api.composition.formulary.service.loadDefaults()
  const { agent } = await api.as('technician')
  const id = api.nextId()
  const lotId = api.nextId()
  const product = {
    id,
    agent: 'praziquantel',
    productName: 'Praziquantel powder',
    form: 'powder',
    strength: { value: '100', unit: 'percent_w_w' },
    strengthBasis: 'active',
    ...given,
  }
  await agent.post('/api/products').send(product).expect(201)
  await agent
    .post(`/api/products/${id}/lots`)
    .send({ id: lotId, lotNumber: 'PZ-0317', expiresOn, receivedOn: '2026-01-10' })
    .expect(201)
  // formalin is given only after somebody looked at the bottle that day
  if (product.agent === 'formalin')
    await agent
      .post(`/api/lots/${lotId}/events`)
      .send({ id: api.nextId(), kind: 'looked-at', happenedAt: '2026-12-01T14:00:00Z' })
      .expect(201)
  return { id, lotId }
}

/** The fields of a praziquantel bath, 2 mg/L left in the water; everything is filled in. */
export const bathFields = (
  given: Partial<BathOrderFields> & Pick<BathOrderFields, 'enclosureId'>,
): BathOrderFields => ({
  animalIds: [],
  productId: null,
  lotId: null,
  doseLineId: null,
  problem: 'Monogeneans on gill mount',
  use: 'extralabel',
  target: { value: '2', unit: 'mg/L' },
  basis: 'active',
  timing: 'indefinite',
  contactMinutes: null,
  doses: 1,
  intervalHours: null,
  startsAt: '2026-12-01T19:00:00Z',
  setting: 'tank',
  division: { value: '0.01', unit: 'g' },
  stopIf: 'any fish lies on its side',
  instructions: 'Dissolve in tank water and add over 20 min at the return.',
  allowedVolumeDriftPercent: 5,
  stated: { ...nothingStated, waterKind: 'marine' },
  ...given,
})

/** Keeps a draft as the veterinarian and gives its number and version. */
export async function aDraft(api: TestApi, fields: BathOrderFields, by?: TestPerson) {
  const person = by ?? (await api.as('veterinarian'))
  const reply = await person.agent.post('/api/orders').send({ id: api.nextId(), fields })
  if (reply.status !== 201) throw new Error(JSON.stringify(reply.body))
  return {
    number: reply.body.number as string,
    version: reply.body.version as number,
    id: reply.body.id as string,
  }
}

/** Signs a draft as the veterinarian, who answers what the form shows. */
export async function signDraft(
  api: TestApi,
  draft: { number: string; version: number },
  more: { overrides?: { ruleId: string; reason: string }[]; read?: AnsweredCaution[] } = {},
) {
  const { agent } = await api.as('veterinarian')
  const answers = await answersTo(api, draft.number, more.overrides)
  return agent
    .post(`/api/orders/${draft.number}/signature`)
    .set('Idempotency-Key', newKey())
    .send({
      password,
      expectedVersion: draft.version,
      relationship: true,
      ...answers,
      ...(more.read ? { read: more.read } : {}),
    })
}

/** Every warning read, and the stops of the rules that are named overridden, each as it stands on the draft now. */
export async function answersTo(
  api: TestApi,
  number: string,
  overrides: readonly { ruleId: string; reason: string }[] = [],
) {
  const shown = await shownCautions(api, number)
  const named = ({ ruleId, code, text }: SaidCaution) => ({ ruleId, code, text })
  // the tests order the same drug for one water over and over
  const all = [...overrides, { ruleId: 'R29', reason: 'given from one of them only' }]
  return {
    read: shown.filter(({ level }) => level === 'warning').map(named),
    overrides: all.flatMap(({ ruleId, reason }) =>
      shown
        .filter((one) => one.level === 'stop' && one.ruleId === ruleId)
        .map((one) => ({ ...named(one), reason })),
    ),
  }
}

/** The cautions that stand on the draft of an order now; none where it has no draft. */
export async function shownCautions(api: TestApi, number: string): Promise<SaidCaution[]> {
  const { agent } = await api.as('veterinarian')
  const { draft } = (await agent.get(`/api/orders/${number}`)).body
  return draft
    ? (await agent.post('/api/order-previews').query({ order: number }).send(draft)).body.cautions
    : []
}
