import type { ConversionRefusal, LimitRefusal } from '../units/number-refusal.ts'

/** Why a question about length and weight has no answer. */
export type GrowthRefusal =
  | LimitRefusal
  | ConversionRefusal
  /** A length says what it was measured to. */
  | 'length-type-not-stated'
  /** The coefficients are of another length: of 20 cm fork length they make what 20 cm total length would weigh. */
  | 'length-type-differs'
