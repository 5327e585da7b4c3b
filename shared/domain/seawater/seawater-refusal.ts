import type { LimitRefusal } from '../units/number-refusal.ts'

/** Why a question about sea water has no answer. */
export type SeawaterRefusal =
  | LimitRefusal
  | 'not-finite'
  | 'salinity-above-scale'
  | 'salinity-below-scale'
  | 'lighter-than-fresh-water'
  | 'salinity-as-specific-gravity'
  | 'specific-gravity-as-salinity'
