import { describe, expect, it } from 'vitest'
import type { Order } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { copiedOrder, fieldsOfOrder } from '../../../src/features/orders/copied-order.ts'
import { emptyOrder, fieldsOf } from '../../../src/features/orders/order-form-model.ts'
import { newId } from '../../../src/lib/new-id.ts'

const zone = 'America/Halifax'
const fields = {
  ...fieldsOf({ ...emptyOrder(), enclosureId: newId() }, zone).fields,
  animalIds: [newId()],
  productId: newId(),
  lotId: newId(),
  doseLineId: newId(),
  problem: 'Flukes on gill mount',
  use: 'extralabel',
  target: { value: '2', unit: 'mg/L' },
  basis: 'active',
  timing: 'timed',
  contactMinutes: 60,
  doses: 3,
  intervalHours: 48,
  startsAt: '2026-12-01T18:20:00.000Z',
  stopIf: 'any fish on its side',
  stated: {
    waterKind: 'marine',
    oxygenIsLogged: true,
    hasBloom: false,
    hasPlantsOrAlgae: false,
    lights: 'dimmed',
    experienceWith: ['Zebrasoma flavescens'],
  },
} as BathOrderFields

describe('an order that begins as an earlier one', () => {
  it('takes over what was ordered', () => {
    const copy = copiedOrder(fields, zone)
    expect(copy).toMatchObject({
      enclosureId: fields.enclosureId,
      productId: fields.productId,
      doseLineId: fields.doseLineId,
      problem: 'Flukes on gill mount',
      target: { value: '2', unit: 'mg/L' },
      basis: 'active',
      timing: 'timed',
      contactMinutes: '60',
      doses: '3',
      intervalHours: '48',
      stopIf: 'any fish on its side',
    })
  })

  it('leaves open whatever was true or attested only then', () => {
    const { animalIds, lotId, use, startsAt, stated } = copiedOrder(fields, zone)
    expect({ animalIds, lotId, use, startsAt, stated }).toEqual({
      animalIds: [],
      lotId: null,
      use: null,
      startsAt: '',
      stated: emptyOrder().stated,
    })
  })

  it('goes by the draft, else by the text that was signed, and by neither of a record that is broken', () => {
    const order = (draft: BathOrderFields | null, content: unknown) =>
      ({ draft, versions: content === undefined ? [] : [{ content }] }) as unknown as Order
    const other = { ...fields, problem: 'Other' }
    expect(fieldsOfOrder(order(other, { fields }))).toBe(other)
    expect(fieldsOfOrder(order(null, { fields }))).toBe(fields)
    expect(fieldsOfOrder(order(null, null))).toBeNull()
    expect(fieldsOfOrder(order(null, undefined))).toBeNull()
  })
})
