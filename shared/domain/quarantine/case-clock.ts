import type { FacilityDate, Instant } from '../time/instant.ts'
import type { ClockReason } from './clock-reason.ts'
import type { ClockPolicy } from './clock-policy.ts'
import type { QuarantineKind } from './quarantine-kind.ts'

/** A case as the clock needs it. */
export interface CaseForClock {
  caseId: string
  quarantineKind: QuarantineKind
  policy: ClockPolicy
}

/**
 * A time during which cases share one water, from the map of connections (`listSharedWaterSpells`).
 * `until` is exclusive, null while it lasts. Overlapping spells of two pairs join all four.
 */
export interface SharedWaterSpell {
  spellId: string
  caseIds: readonly string[]
  from: Instant
  until: Instant | null
}

/**
 * `open`: not all of the batch is in · `in-quarantine` · `locked`: no movement, no clearance · `cleared` ·
 * `recalled`: cleared, then a result taken before came back positive · `transferred`.
 */
export type CaseStatus = 'open' | 'in-quarantine' | 'locked' | 'cleared' | 'recalled' | 'transferred'

/** The part of a passage between two restarts. */
export interface ClockLeg {
  day0On: FacilityDate
  /** The event that set this day 0: the last entry, or the restart. */
  startedByEventId: string
  startedAt: Instant
  endedByEventId: string | null
  /** The day of the restart that ended it; null for the running leg. */
  endedOn: FacilityDate | null
  /** Days counted when it ended; they no longer count. */
  daysRun: number | null
}

export type ExtensionKind = 'death' | 'signs' | 'masking' | 'not-feeding' | 'positive'

/** A reason to wait longer. `untilOn` null: until a vet ends it or its criterion is met. */
export interface ClockExtension {
  eventId: string
  kind: ExtensionKind
  fromOn: FacilityDate
  untilOn: FacilityDate | null
  /** True while a treatment still runs: the date is the earliest it can be and may move. */
  provisional: boolean
  state: 'standing' | 'withdrawn' | 'ended'
}

export interface ClockPause {
  pauseId: string
  eventId: string
  cause: 'life-support-failure' | 'temperature-out-of-range'
  from: Instant
  /** Null while it lasts. */
  until: Instant | null
  /** The other case it came from over shared water; null for its own. */
  fromCaseId: string | null
}

export type LockCause = 'positive' | 'notifiable-suspicion' | 'veterinarian' | 'held' | 'recall'

export interface ClockLock {
  eventId: string
  cause: LockCause
  from: Instant
  liftedAt: Instant | null
  /** The other case it came from over shared water; null for its own. */
  fromCaseId: string | null
}

export interface CriterionState {
  criterionId: string
  kind: 'negatives' | 'declared'
  met: boolean
  metOn: FacilityDate | null
  /** Negatives that count now, and how many are wanted; 0 and 0 for a declared criterion. */
  count: number
  wanted: number
  /** The first day on which a sample taken could meet it; null when met, or not to be told. */
  earliestSampleOn: FacilityDate | null
}

/** Everything that the earliest clearance is the latest of. */
export interface ClearanceBound {
  kind: 'length' | 'extension' | 'criterion'
  on: FacilityDate
  /** Event of an extension, id of a criterion, `''` for the length. */
  id: string
  binds: boolean
}

/** What stands between a case and its clearance on the day asked about. */
export interface UnmetCriterion {
  code:
    | 'not-closed'
    | 'locked'
    | 'locked-shared-water'
    | 'held'
    | 'length-not-reached'
    | 'extension-running'
    | 'pause-running'
    | 'negatives-missing'
    | 'not-declared'
  params: Record<string, string | number>
  /** Whether a vet may clear against it with a reason and password. A lock has to be lifted first. */
  overridable: boolean
}

/** Something that a veterinarian, or the person with the sampling kit, has to decide or do. */
export interface ClockDecisionDue {
  code: 'exposure' | 'recall' | 'repeat-sample' | 'positive-untreated'
  eventId: string
  params: Record<string, string | number>
}

/** The clock of one case, as of an instant. */
export interface CaseClock {
  caseId: string
  asOfOn: FacilityDate
  status: CaseStatus
  /** Null while the batch is open. */
  day0On: FacilityDate | null
  /** The local date of the last entry so far; the day 0 to be, while the batch is open. */
  lastEntryOn: FacilityDate | null
  /** Calendar days since day 0; null while open. */
  dayNumber: number | null
  requiredDays: number
  legs: ClockLeg[]
  pauses: ClockPause[]
  /** True minutes paused since 00:00 of day 0, each counted once. */
  pausedMinutes: number
  /** Those minutes, summed and then rounded up to whole days. */
  pausedDays: number
  extensions: ClockExtension[]
  locks: ClockLock[]
  criteria: CriterionState[]
  /** Null while the batch is open or the case locked. */
  earliestClearanceOn: FacilityDate | null
  /** The same, as it would be if every lock were lifted now; null while open. */
  earliestIfUnlockedOn: FacilityDate | null
  bounds: ClearanceBound[]
  unmet: UnmetCriterion[]
  decisionsDue: ClockDecisionDue[]
  /** Cases whose water this one shares at the instant asked about, sorted. */
  sharesWaterWith: string[]
  /** Every change, in time order. */
  reasons: ClockReason[]
}
