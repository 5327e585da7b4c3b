import type { ConversionRefusal, NumberTextRefusal, UnitTextRefusal } from './number-refusal.ts'

/** Why arithmetic typed into a number field gives no number. Sentences: shared/messages/arithmetic-refusals.ts. */
export type ArithmeticRefusal =
  | NumberTextRefusal
  | UnitTextRefusal
  | ConversionRefusal
  | 'arithmetic-not-readable'
  | 'arithmetic-unit-not-usable'
  | 'arithmetic-with-temperatures'
  | 'arithmetic-units-do-not-fit'
  | 'arithmetic-not-loaded'
