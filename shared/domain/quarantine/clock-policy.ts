import type { SourceKey, SourceMark } from '../sources.ts'

/**
 * Negatives wanted before clearance (rule K15): `count` in a row, each at least `daysApart` days after the one before,
 * the last at least `daysAfterMasking` days after the last masking treatment ended.
 */
export interface NegativesCriterion {
  criterionId: string
  kind: 'negatives'
  /** Which results count: those with the same key. */
  testKey: string
  count: number
  daysApart: number
  daysAfterMasking: number
}

/** Something that a person declares met, such as "all animals feeding" or "weight within 5 %". */
export interface DeclaredCriterion {
  criterionId: string
  kind: 'declared'
}

export type ClearanceCriterion = NegativesCriterion | DeclaredCriterion

/** What a protocol version and the facility's settings say about a clock. Days are calendar days, hours true hours. */
export interface ClockPolicy {
  /** N: days from day 0 to the earliest clearance when nothing happens. */
  requiredDays: number
  /** X after an unexplained death. */
  deathExtensionDays: number
  /** X after new clinical signs. */
  signsExtensionDays: number
  /** Window after the end of a treatment that hides what the tests look for. */
  maskingWindowDays: number
  /** A death up to and including so many hours after arrival is put down to the journey. */
  transportDeathHours: number
  /** A temperature spell pauses the clock only when it lasted longer than this, and then as a whole. */
  temperaturePauseHours: number
  criteria: readonly ClearanceCriterion[]
}

/** The clock of a case for which nobody set anything else. Figures are project defaults except the 30 days. */
export const defaultClockPolicy: ClockPolicy = {
  requiredDays: 30,
  deathExtensionDays: 14,
  signsExtensionDays: 14,
  maskingWindowDays: 14,
  transportDeathHours: 48,
  temperaturePauseHours: 24,
  criteria: [],
}

/** Where each default comes from; shown beside the setting. */
export const clockPolicySources: Record<
  Exclude<keyof ClockPolicy, 'criteria'>,
  { source: SourceKey; mark: SourceMark }
> = {
  requiredDays: { source: 'quarantine-practice', mark: 'V' },
  deathExtensionDays: { source: 'project-default', mark: 'P' },
  signsExtensionDays: { source: 'project-default', mark: 'P' },
  maskingWindowDays: { source: 'project-default', mark: 'P' },
  transportDeathHours: { source: 'project-default', mark: 'P' },
  temperaturePauseHours: { source: 'project-default', mark: 'P' },
}
