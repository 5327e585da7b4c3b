import type { AgentCode } from '../formulary/agent.ts'
import type { BathProduct } from '../dose/bath-product.ts'
import type { DefaultRange } from '../cautions/caution-facts.ts'
import type { FacilityDate, Instant } from '../time/instant.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import type { Quantity } from '../units/quantity.ts'

/** What a veterinarian writes on an order for an immersion bath; everything is as entered. */
export interface BathOrderDraft {
  target: { concentration: Quantity; basis: ConcentrationBasis | null }
  timing: 'timed' | 'indefinite' | null
  /** Of one treatment; null when it stays in the water. */
  contactMinutes: number | null
  doses: number
  /** Hours between doses; null for a single one. */
  intervalHours: number | null
  startsAt: Instant | null
  setting: 'tank' | 'raceway' | 'pond' | null
  /** The step of the balance or measure. */
  division: Quantity
  /** What earlier versions of the order gave already, and how many of those nobody recorded as out of the water. */
  given: { doses: number; lastAt: Instant | null; stillIn: number }
  /** What only a person knows; empty until somebody says so. */
  stated: StatedFacts
}

/** Facts no ledger holds yet: stated on the form, by name, and printed with the order. */
export interface StatedFacts {
  waterKind: 'fresh' | 'brackish' | 'marine' | null
  oxygenIsLogged: boolean | null
  hasBloom: boolean | null
  hasPlantsOrAlgae: boolean | null
  lights: 'full' | 'dimmed' | 'off' | null
  /** Bicarbonate goes into the bath with tricaine; absent in orders written before it was asked for. */
  isBuffered?: boolean | null | undefined
  /** Out of doors, or in a room whose air is changed; absent in orders written before it was asked for. */
  isAired?: boolean | null | undefined
  /** A biofilter stands in this water; absent in orders written before it was asked for. */
  hasBiofilter?: boolean | null | undefined
  /** Taxa for which a veterinarian declares earlier experience with the agent here. */
  experienceWith: readonly string[]
}

/** Before anybody said anything. */
export const nothingStated = {
  waterKind: null,
  oxygenIsLogged: null,
  hasBloom: null,
  hasPlantsOrAlgae: null,
  lights: null,
  experienceWith: [] as string[],
} satisfies StatedFacts

/** The product chosen, with the lot if one is chosen, the dose line it is ordered by, and all those it could be. */
export interface ChosenProduct {
  agent: AgentCode
  product: BathProduct
  lot: { expiresOn: FacilityDate; state: string; foundClearAt: Instant | null } | null
  line: DefaultRange | null
  /** Every dose line in force for the agent; what an order is held against that names none of them. */
  lines: readonly DefaultRange[]
}
