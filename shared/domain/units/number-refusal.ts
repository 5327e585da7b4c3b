/** Why a typed number or unit is not taken. The sentences are in shared/messages/number-refusals.ts. */
export type NumberTextRefusal =
  'blank' | 'not-a-number' | 'two-separators' | 'thousands-or-decimal' | 'too-long'

export type UnitTextRefusal =
  | 'unit-missing'
  | 'unknown-unit'
  | 'bare-ppm'
  | 'parts-per-thousand'
  | 'gallon-not-stated'
  | 'fluid-ounce-not-stated'
  | 'ton-not-stated'
  | 'percent-not-stated'
  | 'write-millilitres'
  | 'spell-units'
  | 'household-measure'

export type ConversionRefusal = 'not-finite' | 'unknown-unit' | 'dimensions-differ' | 'below-absolute-zero'

export type LimitRefusal = 'not-above-zero' | 'below-least' | 'above-most'

export type QuantityRefusal = NumberTextRefusal | UnitTextRefusal | ConversionRefusal | LimitRefusal
