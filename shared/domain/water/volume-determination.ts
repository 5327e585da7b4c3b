import type { WorkingLine } from '../working/working-line.ts'
import type { VolumeMethod } from './volume-sheet.ts'

/** How much water there is, how it is known, and how well. All volumes unrounded, in litres. */
export interface VolumeDetermination {
  method: VolumeMethod
  /** Tanks, sumps and pipes as if nothing stood in them. */
  grossLitres: number
  displacedLitres: number
  /** The water that is really there: what a dose is worked out from. */
  netLitres: number
  errorLitres: number
  errorPercent: number
  /** Whether displacement was measured; a meter and a dilution see only water, so for them it does not apply. */
  displacement: 'measured' | 'guessed' | 'not-measured' | 'not-applicable'
  working: WorkingLine[]
}
