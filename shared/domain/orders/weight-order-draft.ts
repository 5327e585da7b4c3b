import type { WeightFact } from '../cautions/caution-facts.ts'
import type { Instant } from '../time/instant.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import type { Quantity } from '../units/quantity.ts'
import type { InjectionPlace, RouteByWeight } from './order-route.ts'

/** What a veterinarian writes on an order that goes by the weight of the animal; everything is as entered. */
export interface WeightOrderDraft {
  route: RouteByWeight | null
  /** Where the needle goes in; of an injection only. */
  place: InjectionPlace | null
  target: { dose: Quantity; basis: ConcentrationBasis | null }
  /** The largest volume for one place of an injection; null: all of it goes in at one. */
  mostPerPlace: Quantity | null
  /** The step of the syringe or balance. */
  division: Quantity
  doses: number
  /** Hours between doses; null for a single one. */
  intervalHours: number | null
  startsAt: Instant | null
  /** What earlier versions of the order gave already. */
  given: { doses: number; lastAt: Instant | null }
  /** Taxa for which a veterinarian declares earlier experience with the agent here. */
  experienceWith: readonly string[]
}

/** An animal, or a group by the mean of its members, that an order names. */
export interface AnimalToTreat {
  animalId: string
  /** Accession number. */
  label: string
  /** Its newest weight, as it was entered; null where nobody weighed it. */
  weight: (WeightFact & { entered: Quantity }) | null
}
