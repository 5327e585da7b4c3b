import type { SourceKey, SourceMark } from '../sources.ts'
import type { ConcentrationBasis } from '../units/basis.ts'
import type { UnitOf } from '../units/unit-table.ts'
import type { AgentCode } from './agent.ts'

export type WaterKind = 'fresh' | 'marine' | 'both'
/** What the bath is for, worded in messages/formulary.ts. */
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

/** One published range for one use of an agent in water, with the basis of its figure and where it comes from. */
export interface DoseLine {
  id: string
  agent: AgentCode
  use: DoseUse
  /** Lower end; null where the source gives an upper limit only. */
  low: number | null
  high: number
  unit: UnitOf<'massConcentration'> | UnitOf<'volumeConcentration'>
  basis: ConcentrationBasis
  /** Longest contact in minutes that the source names; null: indefinite, or a bath to effect that is held to a default. */
  longestContactMinutes: number | null
  water: WaterKind
  source: SourceKey
  mark: SourceMark
}
