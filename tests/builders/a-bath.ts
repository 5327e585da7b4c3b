import { aBathWater, aDraft, aProduct, aSchool, bathFields, readingsNow, signDraft } from './an-order.ts'
import type { BuiltEnclosure } from './a-water.ts'
import type { TestApi, TestPerson } from '../support/api.ts'

/** Amount of the formalin bath below, worked by hand: 2,181.4 L × 100 µL/L = 218.14 mL, on a measure of 1 mL. */
export const bathAmount = { value: '218', unit: 'mL' }

export interface BathTank {
  tank: BuiltEnclosure & { sumpId: string }
  school: { id: string; accession: string }
}

/** Orders for formalin baths, a hazard that asks for a second calculation, and the people who carry them out. */
export async function aFormalinHouse(api: TestApi) {
  const formalin = await aProduct(api, {
    agent: 'formalin',
    productName: 'Formalin 37 %',
    form: 'liquid',
    strength: { value: '37', unit: 'percent_w_w' },
    density: { value: '1.08', unit: 'g/mL' },
  })
  const second = await api.person({
    email: 'tech2@harrow-point.example',
    printedName: 'Second technician',
    roles: ['technician'],
  })
  const technician = await api.as('technician')
  let tanks = 0

  const doseAt = (number: string, rest = '') => `/api/orders/${number}/doses/1${rest}`
  const tankWithSchool = async (): Promise<BathTank> => {
    tanks += 1
    const tank = await aBathWater(api, `QT-${String(tanks)}`)
    return { tank, school: await aSchool(api, tank.id, tanks) }
  }
  const fieldsOf = ({ tank, school }: BathTank, given: object = {}) =>
    bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: formalin.id,
      lotId: formalin.lotId,
      target: { value: '100', unit: 'uL/L' },
      basis: 'product',
      timing: 'timed',
      contactMinutes: 45,
      division: { value: '1', unit: 'mL' },
      startsAt: '2026-12-01T18:20:00Z',
      ...given,
    })
  /** The sheet as whoever may be the second person first gets it. */
  const blindSheet = async (number: string, by: TestPerson) =>
    (await by.agent.get(`${doseAt(number)}?blind=yes`).expect(200)).body
  /** A signed bath of 45 min at 100 µL/L for the school of a tank, due now. */
  async function signedBath(bath: BathTank, given: object = {}, begunBy?: TestPerson): Promise<string> {
    const draft = await aDraft(api, fieldsOf(bath, given), begunBy)
    const signed = await signDraft(api, draft)
    if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
    return draft.number
  }
  /** The next version of it, signed. */
  async function amend(bath: BathTank, number: string, given: object): Promise<void> {
    const { agent } = await api.as('veterinarian')
    const { version } = (await agent.get(`/api/orders/${number}`).expect(200)).body
    const draft = await agent
      .put(`/api/orders/${number}/draft`)
      .send({ expectedVersion: version, fields: fieldsOf(bath, given) })
      .expect(200)
    const signed = await signDraft(api, { number, version: draft.body.version })
    if (signed.status !== 201) throw new Error(JSON.stringify(signed.body))
  }
  const freshWater = ({ tank }: BathTank) =>
    readingsNow(api, tank.waterBodyId, {
      'dissolved-oxygen': ['6.9', 'mg/L'],
      temperature: ['20.4', 'degC'],
      salinity: ['33.1', 'PSS-78'],
      ph: ['8.1', 'pH'],
      alkalinity: ['2.4', 'meq/L'],
    })
  const calculateFirst = (number: string, by: TestPerson = technician) =>
    by.agent.post(doseAt(number, '/first-calculation')).send({ id: api.nextId(), lotId: formalin.lotId })
  const calculateSecond = ({ tank }: BathTank, number: string, given: object = {}, by: TestPerson = second) =>
    by.agent.post(doseAt(number, '/second-calculation')).send({
      id: api.nextId(),
      enclosureRead: tank.code,
      markRead: '0.68 m',
      lotRead: 'PZ-0317',
      strengthRead: { value: '37', unit: 'percent_w_w' },
      amount: { value: '219', unit: 'mL' },
      ...given,
    })
  const give = (number: string, given: object = {}) =>
    technician.agent
      .post(doseAt(number, '/give'))
      .send({ id: api.nextId(), lotId: formalin.lotId, amount: bathAmount, ...given })
  const record = (number: string, given: object = {}, by: TestPerson = technician) =>
    by.agent.post(doseAt(number, '/record')).send({
      id: api.nextId(),
      kind: 'recorded',
      happenedAt: '2026-12-01T18:20:00Z',
      amount: bathAmount,
      lotId: formalin.lotId,
      ...given,
    })
  return {
    formalin,
    second,
    technician,
    doseAt,
    tankWithSchool,
    fieldsOf,
    blindSheet,
    signedBath,
    amend,
    freshWater,
    calculateFirst,
    calculateSecond,
    give,
    record,
  }
}

export type FormalinHouse = Awaited<ReturnType<typeof aFormalinHouse>>
