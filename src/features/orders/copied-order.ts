import type { Order } from '../../../shared/contracts/orders.contract.ts'
import type { BathOrderFields } from '../../../shared/contracts/order-primitives.ts'
import { emptyOrder, valuesOf } from './order-form-model.ts'
import type { OrderValues } from './order-form-model.ts'

/** What an order says: the draft where one stands, else the signed text; null where that is not what was signed. */
export function fieldsOfOrder(order: Order): BathOrderFields | null {
  const signed = order.versions[0]?.content as { fields?: BathOrderFields } | null | undefined
  return order.draft ?? signed?.fields ?? null
}

/**
 * A new order that begins as an earlier one. What was true or attested only then is open again: the animals, the lot, the
 * first dose, whether the use is by the label, and whatever was stated of the water.
 */
export function copiedOrder(fields: BathOrderFields, zone: string): OrderValues {
  const { animalIds, lotId, use, startsAt, stated } = emptyOrder()
  return { ...valuesOf(fields, zone), animalIds, lotId, use, startsAt, stated }
}
