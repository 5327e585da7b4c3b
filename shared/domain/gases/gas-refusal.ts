import type { LimitRefusal } from '../units/number-refusal.ts'

/** Why a figure of dissolved oxygen or of air pressure has no answer. */
export type GasRefusal =
  | LimitRefusal
  | 'not-finite'
  | 'unknown-pressure-unit'
  /** The number is no air pressure in its unit, and would be one in another. */
  | 'pressure-looks-like-other-unit'
  /** The reading makes a pressure by the sea that there is not. */
  | 'pressure-not-of-altitude'
