import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { BathOrderFields } from '../../shared/contracts/order-primitives.ts'
import { nothingStated } from '../../shared/domain/orders/bath-order-draft.ts'
import {
  aBathWater,
  aDraft,
  aProduct,
  aSchool,
  bathFields,
  readingsNow,
  signDraft,
} from '../builders/an-order.ts'
import { aFormalinHouse } from '../builders/a-bath.ts'
import type { FormalinHouse } from '../builders/a-bath.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let house: FormalinHouse
beforeAll(async () => {
  api = await startApi()
  house = await aFormalinHouse(api)
})
afterAll(() => api.stop())

interface Said {
  ruleId: string
  level: string
  code: string
}
const of = (ruleId: string, cautions: readonly Said[]) =>
  cautions.filter((one) => one.ruleId === ruleId).map(({ level, code }) => `${level} ${code}`)

/** What a rule finds while the order is written. */
async function written(ruleId: string, fields: BathOrderFields) {
  const { agent } = await api.as('veterinarian')
  return of(ruleId, (await agent.post('/api/order-previews').send(fields).expect(200)).body.cautions)
}

/** What it finds at the first dose. */
async function atDose(ruleId: string, number: string) {
  const { agent } = await api.as('technician')
  return of(ruleId, (await agent.get(`/api/orders/${number}/doses/1`).expect(200)).body.cautions)
}

async function sign(fields: BathOrderFields, overrides: { ruleId: string; reason: string }[] = []) {
  const draft = await aDraft(api, fields)
  const signed = await signDraft(api, draft, { overrides })
  expect(signed.status, JSON.stringify(signed.body)).toBe(201)
  return draft.number
}

const stated = (given: Partial<BathOrderFields['stated']>) => ({
  ...nothingStated,
  waterKind: 'marine' as const,
  ...given,
})

/** Nobody said so of the animals of these tests; a veterinarian answers for it. */
const neverEaten = { ruleId: 'R19', reason: 'on show, never eaten' }

describe('a tricaine bath in a tub', () => {
  it('is asked for its buffer, and at the dose for the pH of the tub beside that of the home water', async () => {
    const tub = await aBathWater(api, 'TV-1')
    await api.composition.parts.dataSource.query(
      `UPDATE enclosures SET treatment_vessel = true, fill_mark = 'blue line', fill_mark_entered_value = 2000,
              fill_mark_entered_unit = 'L', fill_mark_litres = 2000 WHERE id = $1`,
      [tub.id],
    )
    const home = await aBathWater(api, 'HM-1')
    const school = await aSchool(api, home.id, 11)
    const tricaine = await aProduct(api, {
      agent: 'tricaine',
      productName: 'Tricaine',
      strengthBasis: 'salt',
    })
    const fields = bathFields({
      enclosureId: tub.id,
      animalIds: [school.id],
      productId: tricaine.id,
      lotId: tricaine.lotId,
      basis: 'salt',
      target: { value: '75', unit: 'mg/L' },
      timing: 'timed',
      contactMinutes: 20,
      startsAt: '2026-12-01T18:30:00Z',
    })
    // a draft from before the question, silence, and both answers
    expect(await written('R18', fields)).toEqual(['stop tricaine-buffer-unknown'])
    expect(await written('R18', { ...fields, stated: stated({ isBuffered: null }) })).toEqual([
      'stop tricaine-buffer-unknown',
    ])
    expect(await written('R18', { ...fields, stated: stated({ isBuffered: false }) })).toEqual([
      'stop tricaine-unbuffered',
    ])
    const buffered = { ...fields, stated: stated({ isBuffered: true }) }
    expect(await written('R18', buffered)).toEqual([])

    const number = await sign(buffered, [neverEaten])
    expect(await atDose('R18', number)).toEqual(['stop tricaine-ph-unknown', 'stop tricaine-home-ph-unknown'])
    await readingsNow(api, home.waterBodyId, { ph: ['8.1', 'pH'] })
    await readingsNow(api, tub.waterBodyId, { ph: ['7.2', 'pH'] })
    expect(await atDose('R18', number)).toEqual(['stop tricaine-ph-differs'])
    await readingsNow(api, tub.waterBodyId, { ph: ['7.8', 'pH'] }, '2026-12-01T18:12:00Z')
    expect(await atDose('R18', number)).toEqual([])
    // once they are in the tub, home is where they came from
    await (
      await api.as('veterinarian')
    ).agent
      .post(`/api/animals/${school.accession}/moves`)
      .send({
        id: api.nextId(),
        fromEnclosureId: home.id,
        toEnclosureId: tub.id,
        happenedAt: '2026-12-01T18:13:00Z',
        reason: 'for their bath',
      })
      .expect(201)
    expect(await atDose('R18', number)).toEqual([])
    await readingsNow(api, home.waterBodyId, { ph: ['8.2', 'pH'] }, '2026-12-01T18:14:00Z')
    expect(await atDose('R18', number)).toEqual(['stop tricaine-ph-differs'])
  })

  it('where the animals live has no other water to differ from', async () => {
    const tank = await aBathWater(api, 'HM-2')
    const school = await aSchool(api, tank.id, 12)
    const { id, lotId } = await aProduct(api, {
      agent: 'tricaine',
      productName: 'Tricaine 2',
      strengthBasis: 'salt',
    })
    const number = await sign(
      bathFields({
        enclosureId: tank.id,
        animalIds: [school.id],
        productId: id,
        lotId,
        basis: 'salt',
        target: { value: '75', unit: 'mg/L' },
        timing: 'timed',
        contactMinutes: 20,
        stated: stated({ isBuffered: true }),
      }),
      [neverEaten],
    )
    await readingsNow(api, tank.waterBodyId, { ph: ['6.7', 'pH'] })
    expect(await atDose('R18', number)).toEqual(['stop tricaine-acid'])
    await readingsNow(api, tank.waterBodyId, { ph: ['6.8', 'pH'] }, '2026-12-01T18:12:00Z')
    expect(await atDose('R18', number)).toEqual([])
  })
})

describe('methylene blue', () => {
  it('asks the life support for a biofilter, and the order where it lists none', async () => {
    const tank = await aBathWater(api, 'QT-MB')
    const school = await aSchool(api, tank.id, 13)
    const blue = await aProduct(api, {
      agent: 'methylene-blue',
      productName: 'Methylene blue',
      strengthBasis: 'product',
    })
    const fields = bathFields({
      enclosureId: tank.id,
      animalIds: [school.id],
      productId: blue.id,
      lotId: blue.lotId,
      basis: 'product',
    })
    const said = (hasBiofilter: boolean) => written('R25', { ...fields, stated: stated({ hasBiofilter }) })
    expect(await written('R25', fields)).toEqual(['stop biofilter-unknown'])
    expect(await said(true)).toEqual(['stop biofilter-on'])
    expect(await said(false)).toEqual([])
    const unit = {
      id: api.nextId(),
      code: 'BIO-MB',
      name: 'Biofilter',
      kind: 'biofilter',
      waterBodyId: tank.sumpId,
      inUseFrom: '2026-11-01T08:00:00Z',
      on: true,
    }
    await (await api.as('technician')).agent.post('/api/life-support').send(unit).expect(201)
    // what the ledger knows stands against what anybody says
    expect(await said(false)).toEqual(['stop biofilter-on'])
  })
})

describe('ammonia under formalin', () => {
  it('is read from the ledger of readings: the newest, those before, and its un-ionised part', async () => {
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    const unread = ['warning nitrogen-unknown', 'warning nitrogen-unknown']
    expect(await atDose('R30', number)).toEqual(unread)
    const nitrogen = (ammonia: string, nitrite: string, at: string) =>
      readingsNow(
        api,
        bath.tank.waterBodyId,
        { 'total-ammonia-n': [ammonia, 'mg/L'], 'nitrite-n': [nitrite, 'mg/L'] },
        at,
      )
    await nitrogen('0.5', '0.02', '2026-12-01T08:00:00Z')
    expect(await atDose('R30', number)).toEqual([
      'warning nitrogen-before-unknown',
      'warning nitrogen-before-unknown',
      'warning unionised-ammonia-unknown',
    ])
    await nitrogen('0.5', '0.02', '2026-11-29T08:00:00Z')
    // 20.4 °C, pH 8.1, 33.1: some 4 percent of 0.5 mg/L, well below 0.05
    await house.freshWater(bath)
    expect(await atDose('R30', number)).toEqual([])
    // of 2 mg/L as well it is more than 0.05
    await nitrogen('2', '0.05', '2026-12-01T18:11:00Z')
    expect(await atDose('R30', number)).toEqual([
      'warning nitrogen-rising',
      'warning nitrogen-rising',
      'warning unionised-ammonia-high',
    ])
  })
})

describe('formalin in a room', () => {
  it('says on the sheet until when nobody stays there, unless the order says that it is aired', async () => {
    const sheetOf = async (number: string) =>
      (await house.technician.agent.get(house.doseAt(number)).expect(200)).body
    const bath = await house.tankWithSchool()
    const number = await house.signedBath(bath)
    expect(await atDose('R40', number)).toEqual(['warning room-air-unknown'])
    expect((await sheetOf(number)).reentry).toBeNull()
    await house.record(number).expect(201)
    expect((await sheetOf(number)).reentry).toMatchObject({ until: '2026-12-01T18:50:00.000Z' })
    expect((await sheetOf(number)).reentry.place).toContain(bath.tank.code)

    const other = await house.tankWithSchool()
    const aired = await house.signedBath(other, { stated: stated({ isAired: true }) })
    expect(await atDose('R40', aired)).toEqual([])
    await house.record(aired).expect(201)
    expect((await sheetOf(aired)).reentry).toBeNull()
  })
})
