import type { WeightOrderFields } from '../../../shared/contracts/weight-orders.contract.ts'
import type { RouteByWeight } from '../../../shared/domain/orders/order-route.ts'
import type { TypedQuantity } from '../../ui/use-quantity-field.ts'

/** What is typed and chosen of a dose by weight; null for a choice that nobody made. */
export interface WeightValues {
  animalId: string | null
  route: RouteByWeight | null
  place: WeightOrderFields['place']
  productId: string | null
  target: TypedQuantity
  basis: WeightOrderFields['basis']
  division: TypedQuantity
  mostPerPlace: TypedQuantity
}

/** Nothing is chosen beforehand. */
export const emptyWeightValues = (animalId: string | null): WeightValues => ({
  animalId,
  route: null,
  place: null,
  productId: null,
  target: { value: '', unit: 'mg/kg' },
  basis: null,
  division: { value: '', unit: 'mL' },
  mostPerPlace: { value: '', unit: 'mL' },
})

const entered = ({ value, unit }: TypedQuantity) =>
  value.trim() === '' ? null : { value: value.trim(), unit }

/**
 * The question that the fields say; null until there is an animal and a route. What an order has besides, and what no
 * amount goes by, stays open.
 */
export function weightFieldsOf(values: WeightValues): WeightOrderFields | null {
  const { animalId, route } = values
  if (animalId === null || route === null) return null
  const isInjection = route === 'injection'
  return {
    animalId,
    route,
    place: isInjection ? values.place : null,
    productId: values.productId,
    lotId: null,
    problem: '',
    use: null,
    target: entered(values.target),
    basis: values.basis,
    mostPerPlace: isInjection ? entered(values.mostPerPlace) : null,
    doses: 1,
    intervalHours: null,
    startsAt: null,
    division: entered(values.division),
    stopIf: '',
    instructions: '',
    experienceWith: [],
  }
}
