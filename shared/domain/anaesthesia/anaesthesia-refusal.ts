import type { LimitRefusal } from '../units/number-refusal.ts'

/** Why a question about an anaesthetic bath of tricaine has no answer. */
export type AnaesthesiaRefusal =
  | LimitRefusal
  | 'not-finite'
  /** No volume of a stock makes a bath as strong as the stock itself. */
  | 'target-not-below-stock'
  /** Tricaine without buffer is an acid bath: only a veterinarian orders it, and the engine does not. */
  | 'unbuffered-stock'
