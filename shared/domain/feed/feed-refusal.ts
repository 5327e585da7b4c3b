import type { LimitRefusal } from '../units/number-refusal.ts'

/** Why a question about a group or its medicated feed has no answer. */
export type FeedRefusal =
  | LimitRefusal
  | 'not-finite'
  /** Animals come one by one, also where their number is an estimate. */
  | 'count-not-whole'
  /** At this rate of feeding a kilogram of feed would have to hold more than a kilogram of drug. */
  | 'more-drug-than-feed'
  /** The feed would have to be stronger than the premix that it is made with. */
  | 'target-above-premix'
