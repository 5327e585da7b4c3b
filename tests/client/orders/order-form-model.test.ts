import { describe, expect, it } from 'vitest'
import { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { differences, emptyOrder, fieldsOf, valuesOf } from '../../../src/features/orders/order-form-model.ts'
import type { OrderValues } from '../../../src/features/orders/order-form-model.ts'
import { newId } from '../../../src/lib/new-id.ts'

const zone = 'America/Halifax'
const enclosureId = newId()
const filled = (more: Partial<OrderValues> = {}): OrderValues => ({
  ...emptyOrder(),
  enclosureId,
  animalIds: [newId()],
  productId: newId(),
  problem: ' Flukes on gill mount ',
  use: 'extralabel',
  target: { value: '0.10', unit: 'mg/L' },
  basis: 'active',
  timing: 'timed',
  contactMinutes: '60',
  doses: '3',
  intervalHours: '48',
  startsAt: '2026-12-01T14:20',
  setting: 'tank',
  division: { value: '0.01', unit: 'g' },
  stopIf: 'any fish on its side',
  ...more,
})
const read = (more?: Partial<OrderValues>) => fieldsOf(filled(more), zone)

describe('the form of an order', () => {
  it('opens with nothing chosen that goes on the record', () => {
    const empty = emptyOrder()
    expect([empty.use, empty.basis, empty.timing, empty.setting, empty.productId, empty.lotId]).toEqual(
      Array(6).fill(null),
    )
    expect(empty.animalIds).toEqual([])
    expect(empty.target.value).toBe('')
    expect(Object.values(empty.stated).flat()).toEqual(Array(5).fill(null))
    // treatments reference: allowed drift of the volume ± 5 % (project default, mark P)
    expect(empty.drift).toBe('5')
  })

  it('needs an enclosure and nothing else for a draft, and then fits the contract', () => {
    expect(fieldsOf(emptyOrder(), zone)).toEqual({ fields: null, faults: [] })
    const { fields, faults } = fieldsOf({ ...emptyOrder(), enclosureId }, zone)
    expect(faults).toEqual([])
    expect(BathOrderFields.parse(fields)).toMatchObject({ target: null, doses: 1, startsAt: null })
    expect(BathOrderFields.safeParse(read().fields).success).toBe(true)
  })

  it('keeps the digits as typed and means facility time', () => {
    const { fields } = read()
    expect(fields).toMatchObject({
      target: { value: '0.10', unit: 'mg/L' },
      problem: 'Flukes on gill mount',
      contactMinutes: 60,
      intervalHours: 48,
    })
    // Halifax is four hours behind UTC in December
    expect(Date.parse(fields?.startsAt ?? '')).toBe(Date.parse('2026-12-01T18:20:00Z'))
  })

  it('asks for numbers that can be read, by name', () => {
    const faultOf = (more: Partial<OrderValues>) => read(more).faults.map((fault) => fault.name)
    expect(faultOf({ contactMinutes: 'an hour' })).toEqual(['contactMinutes'])
    expect(faultOf({ contactMinutes: '-5' })).toEqual(['contactMinutes'])
    expect(faultOf({ doses: '2.5' })).toEqual(['doses'])
    expect(faultOf({ doses: '' })).toEqual(['doses'])
    expect(faultOf({ drift: '80' })).toEqual(['drift'])
    expect(faultOf({ intervalHours: '1,5' })).toEqual(['intervalHours'])
    expect(read({ doses: '2.5' }).faults[0]?.says).toBe('Type a whole number.')
  })

  it('leaves out a contact time of a bath left in the water, and hours between doses of a single one', () => {
    expect(read({ timing: 'indefinite' }).fields?.contactMinutes).toBeNull()
    expect(read({ timing: 'indefinite', contactMinutes: 'x' }).faults).toEqual([])
    expect(read({ doses: '1' }).fields?.intervalHours).toBeNull()
  })

  it('comes back from a draft as it was kept', () => {
    const { fields } = read()
    if (!fields) throw new Error('no fields')
    const again = fieldsOf(valuesOf(fields, zone), zone)
    expect(again.faults).toEqual([])
    expect(differences(fields, again.fields ?? fields)).toEqual([])
    expect(again.fields).toEqual(fields)
  })

  it('tells two versions of a draft apart by their parts, not by how they are written', () => {
    const { fields } = read()
    if (!fields) throw new Error('no fields')
    const others = newId()
    const [own = ''] = fields.animalIds
    const two = { ...fields, animalIds: [own, others] }
    expect(differences(two, { ...two, animalIds: [others, own] })).toEqual([])
    expect(differences(fields, { ...fields, startsAt: '2026-12-01T18:20:31.000Z' })).toEqual([])
    expect(
      differences(fields, { ...fields, problem: 'Other', target: { value: '0.1', unit: 'mg/L' } }),
    ).toEqual(['problem', 'target'])
  })

  it('keeps what was asked on the bench, leaves out nothing that it was not shown, and tells two of them apart', () => {
    const bench = { calculator: 'bath-dose', inputs: { target: { value: '2', unit: 'mg/L' } } }
    const fieldsWith = (of: OrderValues['bench']) => read({ bench: of }).fields
    const [kept, none, notShown] = [fieldsWith(bench), fieldsWith(null), fieldsWith(undefined)]
    if (!kept || !none || !notShown) throw new Error('no fields')
    expect(BathOrderFields.parse(kept).bench).toEqual(bench)
    expect(fieldsOf(valuesOf(kept, zone), zone).fields?.bench).toEqual(bench)
    expect(none.bench).toBeNull()
    // a draft kept before there was such a part, and one whose part is not shown
    expect(notShown).not.toHaveProperty('bench')
    expect(fieldsOf(valuesOf(notShown, zone), zone).fields).not.toHaveProperty('bench')
    const same = { ...kept, animalIds: none.animalIds, productId: none.productId }
    expect(differences(same, none)).toEqual(['bench'])
    expect(differences(none, { ...notShown, animalIds: none.animalIds, productId: none.productId })).toEqual(
      [],
    )
  })
})
