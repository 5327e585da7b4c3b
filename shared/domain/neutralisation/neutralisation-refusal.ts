import type { LimitRefusal } from '../units/number-refusal.ts'

/** Why a question about chlorine and what takes it away has no answer. */
export type NeutralisationRefusal =
  | LimitRefusal
  | 'not-finite'
  /** The pentahydrate and the anhydrous salt differ by 1.57 times. */
  | 'thiosulfate-form-not-stated'
  /** The way to sulfate needs an eighth of it and is too slow to plan a dose by. */
  | 'only-tetrathionate-plans-a-dose'
  /** Spent disinfectant and tap water have ratios of their own. */
  | 'chlorinated-water-not-stated'
  /** No bleach can make water stronger than itself. */
  | 'target-above-bleach'
