import pg from 'pg'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import type { WeightOrderFields, WeightOrderPreview } from '../../shared/contracts/weight-orders.contract.ts'
import { anAnimal, aGroup, aStingray } from '../builders/a-collection.ts'
import { aBathWater, aProduct, bathFields } from '../builders/an-order.ts'
import { startApi } from '../support/api.ts'
import type { TestApi } from '../support/api.ts'

let api: TestApi
let tank: { id: string }
let taxonId: string
let enrofloxacin: { id: string; lotId: string }

beforeAll(async () => {
  api = await startApi()
  tank = await aBathWater(api, 'QT-3')
  taxonId = await aStingray(api)
  enrofloxacin = await aProduct(api, {
    agent: 'enrofloxacin',
    productName: 'Enrofloxacin injection',
    form: 'liquid',
    strength: { value: '22.7', unit: 'mg/mL' },
    strengthBasis: 'base',
  })
})
afterAll(() => api.stop())

const yesterday = '2026-11-30T14:00:00Z'
type Weighed = [value: string, unit: string, more?: object]
async function weighed(url: string, [value, unit, more = {}]: Weighed): Promise<void> {
  const { agent } = await api.as('keeper')
  await agent
    .post(`${url}/weights`)
    .send({
      id: api.nextId(),
      weight: { value, unit },
      basis: 'measured',
      confirmedReason: 'read twice',
      happenedAt: yesterday,
      ...more,
    })
    .expect(201)
}
async function aRay(weight: Weighed | null) {
  const ray = await anAnimal(api, { taxonId, enclosureId: tank.id })
  if (weight) await weighed(ray.url, weight)
  return ray
}

/** 10 mg/kg of enrofloxacin base into the muscle, on a syringe of 0.01 mL. */
const fieldsFor = (animalId: string, given: Partial<WeightOrderFields> = {}): WeightOrderFields => ({
  route: 'injection',
  animalId,
  place: 'muscle',
  productId: enrofloxacin.id,
  lotId: enrofloxacin.lotId,
  problem: 'Ulcer on the left disc',
  use: 'extralabel',
  target: { value: '10', unit: 'mg/kg' },
  basis: 'base',
  mostPerPlace: null,
  doses: 1,
  intervalHours: null,
  startsAt: '2026-12-01T19:00:00Z',
  division: { value: '0.01', unit: 'mL' },
  stopIf: 'It bleeds, or does not swim off.',
  instructions: '',
  experienceWith: [],
  ...given,
})
const ask = async (fields: WeightOrderFields) =>
  (await api.as('veterinarian')).agent.post('/api/weight-order-previews').send(fields)
async function preview(fields: WeightOrderFields): Promise<WeightOrderPreview> {
  const reply = await ask(fields)
  expect(reply.status, JSON.stringify(reply.body)).toBe(200)
  return reply.body as WeightOrderPreview
}
const codesOf = ({ cautions }: WeightOrderPreview, ruleId: string) =>
  cautions.filter((one) => one.ruleId === ruleId).map(({ code }) => code)

describe('a dose by the weight of an animal', () => {
  it('goes by the newest weight, is rounded to the syringe, and says what the rounding makes of it', async () => {
    const ray = await aRay(['2.5', 'kg'])
    const shown = await preview(fieldsFor(ray.id))
    // check values inj.01, injr.01 and inje.01 (computed): 1.10132 mL, 1.10 mL, −0.12 %
    expect(shown.amount).toMatchObject({
      unroundedUnit: 'mL',
      measured: { value: '1.10', unit: 'mL' },
      text: '1.1\u00a0mL',
      portions: [],
    })
    expect(shown.amount?.unrounded).toBeCloseTo(1.10132, 5)
    expect(shown.amount?.roundingPercent).toBeCloseTo(-0.12, 1)
    expect(shown.weight).toEqual({
      text: '2.5\u00a0kg',
      basis: 'measured',
      happenedOn: '2026-11-30',
      animalsWeighed: 1,
    })
    expect(shown.animal).toMatchObject({ accession: ray.accession, enclosureCode: 'QT-3' })
    expect(shown.refusal).toBeNull()
    expect(shown.missing).toEqual([])
    expect(shown.working.map(({ key }) => key)).toContain('drug-for-weight')
  })

  it('is another once the animal is weighed again, and the same for a member of a group by the mean', async () => {
    const ray = await aRay(['2.5', 'kg'])
    await weighed(ray.url, ['2500', 'g', { happenedAt: '2026-11-30T15:00:00Z' }])
    expect((await preview(fieldsFor(ray.id))).amount?.unrounded).toBeCloseTo(1.10132, 5)
    await weighed(ray.url, ['3', 'kg', { happenedAt: '2026-11-30T16:00:00Z' }])
    // 10 × 3 ÷ 22.7
    expect((await preview(fieldsFor(ray.id))).amount?.unrounded).toBeCloseTo(1.3215859, 6)

    const school = await aGroup(api, { taxonId, enclosureId: tank.id, count: 12 })
    await weighed(school.url, ['10', 'kg', { animalsWeighed: 4 }])
    const each = await preview(fieldsFor(school.id))
    expect(each.amount?.unrounded).toBeCloseTo(1.10132, 5)
    expect(each.weight).toMatchObject({ text: '2.5\u00a0kg', animalsWeighed: 4 })
  })

  it('is divided over places that each take no more than the largest volume, and come to the whole', async () => {
    const ray = await aRay(['2.5', 'kg'])
    const { amount } = await preview(fieldsFor(ray.id, { mostPerPlace: { value: '0.5', unit: 'mL' } }))
    expect(amount?.portions.map(({ value }) => Number(value))).toEqual([0.37, 0.37, 0.36])
  })

  it('has no amount without a weight, and says so as a caution too', async () => {
    const shown = await preview(fieldsFor((await aRay(null)).id))
    expect(shown.amount).toBeNull()
    expect(shown.refusal).toMatchObject({
      code: 'no-weight',
      detail: 'Nobody weighed this animal. Weigh it, and record the weight with the animal.',
    })
    expect(codesOf(shown, 'R33')).toEqual(['weight-missing'])
  })

  it('warns of an old weight, of one that was reckoned, and of one that such an animal hardly has', async () => {
    // a young animal: its weight counts for 30 days, and it came 30 days and a few hours ago
    const old = await anAnimal(api, { taxonId, enclosureId: tank.id, stage: 'juvenile' })
    await weighed(old.url, ['42', 'kg', { happenedAt: '2026-11-01T13:00:00Z' }])
    expect(codesOf(await preview(fieldsFor(old.id)), 'R33')).toEqual(['weight-old'])
    const reckoned = await aRay(['42', 'kg', { basis: 'estimated' }])
    expect(codesOf(await preview(fieldsFor(reckoned.id)), 'R33')).toEqual(['weight-estimated'])
    // the band of the taxon is 10 to 100 kg
    const small = await aRay(['2.5', 'kg'])
    expect(codesOf(await preview(fieldsFor(small.id)), 'R33')).toEqual(['weight-implausible'])
    const sound = await aRay(['42', 'kg'])
    expect(codesOf(await preview(fieldsFor(sound.id)), 'R33')).toEqual([])
  })

  it('is held against the lines of its own route: within them, above them, and where there is none', async () => {
    const ray = await aRay(['42', 'kg'])
    // the formulary of the reference has 5 to 10 mg/kg of the base (M), by injection and by mouth
    const within = await preview(fieldsFor(ray.id))
    expect(codesOf(within, 'R26')).not.toContain('no-default-range')
    for (const [value, level, code] of [
      ['15', 'warning', 'over-default'],
      ['25', 'stop', 'far-over-default'],
    ]) {
      const { cautions } = await preview(fieldsFor(ray.id, { target: { value: value ?? '', unit: 'mg/kg' } }))
      const [over] = cautions.filter(({ ruleId }) => ruleId === 'R26')
      expect([over?.level, over?.code]).toEqual([level, code])
    }
    const onSkin = await preview(fieldsFor(ray.id, { route: 'on-skin', place: null }))
    expect(codesOf(onSkin, 'R26')).toEqual(['no-default-range'])
  })

  it('has lines that no bath is ordered by', async () => {
    const { agent } = await api.as('veterinarian')
    const formulary = await agent.get('/api/formulary').expect(200)
    const line = (formulary.body.lines as { id: string; use: string; agent: string }[]).find(
      (one) => one.agent === 'praziquantel' && one.use === 'worms-by-mouth',
    )
    const powder = await aProduct(api, {})
    const fish = await aRay(['42', 'kg'])
    const bath = bathFields({
      enclosureId: tank.id,
      animalIds: [fish.id],
      productId: powder.id,
      lotId: powder.lotId,
    })
    const refused = await agent.post('/api/order-previews').send({ ...bath, doseLineId: line?.id })
    expect([refused.status, refused.body.code]).toEqual([422, 'dose-line-not-usable'])
    expect(refused.body.detail).toBe(
      'This dose line goes by the weight of the animal. Choose a dose line for the water.',
    )
  })

  it('says what is still to be filled in', async () => {
    const ray = await aRay(['42', 'kg'])
    const shown = await preview(
      fieldsFor(ray.id, { place: null, target: null, basis: null, doses: 3, division: null, stopIf: '' }),
    )
    expect(shown.amount).toBeNull()
    expect(shown.missing).toEqual([
      'Choose where the needle goes in.',
      'Type the dose for the weight of the animal, with its unit.',
      'Choose what the dose is of.',
      'Type the hours between doses.',
      'Type the smallest step of the syringe or balance.',
      'Type when it is stopped at once.',
    ])
  })

  it('does not know what else the animal had, and says so of a pain killer', async () => {
    const meloxicam = await aProduct(api, {
      agent: 'meloxicam',
      productName: 'Meloxicam injection',
      form: 'liquid',
      strength: { value: '5', unit: 'mg/mL' },
      strengthBasis: 'active',
    })
    const ray = await aRay(['42', 'kg'])
    const shown = await preview(
      fieldsFor(ray.id, {
        productId: meloxicam.id,
        lotId: meloxicam.lotId,
        target: { value: '1', unit: 'mg/kg' },
        basis: 'active',
      }),
    )
    // 1 mg/kg × 42 kg ÷ 5 mg/mL
    expect(shown.amount?.text).toBe('8.4\u00a0mL')
    expect(codesOf(shown, 'R44')).toEqual(['animal-uses-unknown'])
  })
})

describe('what is refused', () => {
  const expectRefused = async (fields: WeightOrderFields, status: number, error: object) => {
    const reply = await ask(fields)
    expect(reply.status, JSON.stringify(reply.body)).toBe(status)
    expect(reply.body.errors).toMatchObject([error])
    return reply.body as { code: string; detail: string }
  }

  it('is a drug that is not given so', async () => {
    const ray = await aRay(['42', 'kg'])
    const formalin = await aProduct(api, {
      agent: 'formalin',
      productName: 'Formalin',
      form: 'liquid',
      strength: { value: '37', unit: 'percent_w_w' },
      strengthBasis: 'active',
      density: { value: '1.08', unit: 'g/mL' },
    })
    const refused = await expectRefused(fieldsFor(ray.id, { productId: formalin.id, lotId: null }), 422, {
      pointer: '/productId',
      code: 'product-not-by-weight',
    })
    expect(refused.code).toBe('product-not-by-weight')
    expect(refused.detail).toMatch(/is not given by injection\. Choose another product or another route\.$/)
    const powder = await aProduct(api, {})
    const byMouth = { productId: powder.id, lotId: powder.lotId, place: null } as const
    await expectRefused(fieldsFor(ray.id, { ...byMouth, route: 'on-skin' }), 422, {
      code: 'product-not-by-weight',
    })
    const dose = { target: { value: '70', unit: 'mg/kg' }, basis: 'active' } as const
    const step = { division: { value: '0.1', unit: 'g' } }
    const shown = await preview(fieldsFor(ray.id, { ...byMouth, ...dose, ...step, route: 'by-mouth' }))
    // 70 mg/kg × 42 kg
    expect(shown.amount?.text).toBe('2.9\u00a0g')
  })

  it('is an animal that died, or that there is none of', async () => {
    const ray = await aRay(['42', 'kg'])
    const { agent } = await api.as('keeper')
    await agent
      .post(`${ray.url}/deaths`)
      .send({ id: api.nextId(), kind: 'died-seen', count: 1, happenedAt: '2026-11-30T20:00:00Z' })
      .expect(201)
    for (const id of [ray.id, api.nextId()])
      await expectRefused(fieldsFor(id), 404, { pointer: '/animalId', code: 'no-such-animal' })
  })

  it('is a place without a needle, a lot of another product, and a year that nobody means', async () => {
    const ray = await aRay(['42', 'kg'])
    await expectRefused(fieldsFor(ray.id, { route: 'by-mouth' }), 422, { pointer: '/place' })
    await expectRefused(
      fieldsFor(ray.id, { route: 'by-mouth', place: null, mostPerPlace: { value: '1', unit: 'mL' } }),
      422,
      { pointer: '/mostPerPlace' },
    )
    const other = await aProduct(api, { productName: 'Another powder' })
    await expectRefused(fieldsFor(ray.id, { lotId: other.lotId }), 422, {
      pointer: '/lotId',
      code: 'lot-of-other-product',
    })
    await expectRefused(fieldsFor(ray.id, { startsAt: '2030-12-01T19:00:00Z' }), 422, {
      pointer: '/startsAt',
      code: 'start-beyond-reason',
    })
  })

  it('is no wrong unit: the amount waits, and the reason is said at its field', async () => {
    const ray = await aRay(['42', 'kg'])
    const shown = await preview(fieldsFor(ray.id, { target: { value: '10', unit: 'mg/L' } }))
    expect(shown.amount).toBeNull()
    expect(shown.refusal?.field).toBe('target')
  })

  it('is to work with a weight that somebody changed past the program', async () => {
    const ray = await aRay(['42', 'kg'])
    const owner = new pg.Client({ connectionString: api.ownerUrl })
    await owner.connect()
    await owner.query('ALTER TABLE weights DISABLE TRIGGER USER')
    await owner.query('UPDATE weights SET weight_kg = 4.2 WHERE animal_id = $1', [ray.id])
    await owner.query('ALTER TABLE weights ENABLE TRIGGER USER')
    await owner.end()
    const shown = await preview(fieldsFor(ray.id))
    expect(shown.amount).toBeNull()
    expect(shown.refusal).toMatchObject({ code: 'not-as-entered' })
    expect(shown.refusal?.detail).toContain('weigh it anew')
  })
})
