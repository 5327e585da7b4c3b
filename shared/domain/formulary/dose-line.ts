import type { SourceKey, SourceMark } from '../sources.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import type { UnitOf } from '../units/unit-table.ts'
import type { RouteByWeight } from '../orders/order-route.ts'
import type { AgentCode } from './agent.ts'

export type WaterKind = 'fresh' | 'marine' | 'both'
/** What it is given for, worded in messages/formulary.ts. */
export type DoseUse =
  | 'ectoparasites-bath'
  | 'ectoparasites-indefinite'
  | 'ectoparasites-marine-course'
  | 'ectoparasites-fresh-single'
  | 'flukes-prolonged'
  | 'flukes-short'
  | 'external-bacteria'
  | 'salt-bath'
  | 'salt-dip'
  | 'salt-prolonged'
  | 'sedation'
  | 'protozoa-course'
  | 'bacteria-injection'
  | 'bacteria-by-mouth'
  | 'worms-by-mouth'
  | 'fungi-by-mouth'
  | 'pain-injection'
  | 'inflammation-injection'

/** Uses in which the drug is given to the animal itself, by its weight; all others are baths. */
const usesByWeight: Partial<Record<DoseUse, RouteByWeight>> = {
  'bacteria-injection': 'injection',
  'bacteria-by-mouth': 'by-mouth',
  'worms-by-mouth': 'by-mouth',
  'fungi-by-mouth': 'by-mouth',
  'pain-injection': 'injection',
  'inflammation-injection': 'injection',
}

/** How a use reaches the animal: through its water, or on a route by weight. */
export function routeOfUse(use: string): 'immersion' | RouteByWeight {
  return Object.hasOwn(usesByWeight, use) ? (usesByWeight[use as DoseUse] ?? 'immersion') : 'immersion'
}

/** Uses in which the agent stays in the water; of all others the animals come out of it, or it out of the water. */
const usesThatStay: readonly DoseUse[] = [
  'ectoparasites-indefinite',
  'ectoparasites-marine-course',
  'ectoparasites-fresh-single',
  'flukes-prolonged',
  'salt-prolonged',
  'protozoa-course',
]

/** Whether a use leaves its agent in the water. */
export const staysInWater = (use: string): boolean => usesThatStay.some((one) => one === use)

/** One published range for one use of an agent, in water or by weight, with the basis of its figure and where it comes from. */
export interface DoseLine {
  id: string
  agent: AgentCode
  use: DoseUse
  /** Lower end; null where the source gives an upper limit only. */
  low: number | null
  high: number
  unit: UnitOf<'massConcentration'> | UnitOf<'volumeConcentration'> | UnitOf<'bodyDose'>
  basis: ConcentrationBasis
  /** Longest contact in minutes that the source names; null: indefinite, or a bath to effect that is held to a default. */
  longestContactMinutes: number | null
  /** Of a dose by weight: both, since nothing goes into the water. */
  water: WaterKind
  source: SourceKey
  mark: SourceMark
}
