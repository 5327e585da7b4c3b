import type { QuantityRefusal } from '../units/number-refusal.ts'

/** Why a volume of water has no answer. The sentences are in shared/messages/volume-refusals.ts. */
export type VolumeRefusal =
  | QuantityRefusal
  | 'deeper-than-shape'
  | 'narrower-than-side'
  | 'axes-swapped'
  | 'sides-not-whole'
  | 'unknown-shape'
  | 'no-water-part'
  | 'part-named-twice'
  | 'displaces-too-much'
  | 'error-outside-range'
  | 'error-above-volume'
  | 'meter-runs-backwards'
  | 'salinity-did-not-rise'
  | 'changed-more-than-volume'
  | 'fraction-outside-range'
  | 'changes-not-whole'
