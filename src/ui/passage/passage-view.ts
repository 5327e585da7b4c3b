import type { Flag } from '../flag-mark.tsx'
import type { StepState } from '../step-mark.tsx'

/** A date at the facility, `YYYY-MM-DD`. */
export type DayDate = string

/** One step of the protocol, where it stands on the course. */
export interface PassageFix {
  id: string
  on: DayDate
  state: StepState
  /** What is done: "skin scrape". */
  name: string
  /** Shorter, for the drawing of a case: "scrape". */
  short?: string
  /** How late, in words ("1 day late"); only with `overdue`. */
  late?: string
  /** Result, owner or time, for the table. */
  result?: string
  /** Where Enter opens it; without one, `onOpenFix` of the drawing is called. */
  to?: string
}

/** The part of a passage between two clock restarts. */
export interface PassageLeg {
  /** Day 0 of this leg. */
  from: DayDate
  /** Day on which the clock was restarted; null for the leg that runs now. */
  until: DayDate | null
  /** Why it ended: "a fourth ray entered the same water". */
  endWords?: string
  fixes: readonly PassageFix[]
  /** Animals at each count; text, because an estimate has two numbers. */
  counts: readonly { on: DayDate; animals: string }[]
  /** Half-open: the clock stood still from `from` until the day before `until`; null is still paused. */
  pauses: readonly { from: DayDate; until: DayDate | null }[]
}

/** What the drawing of one quarantine case needs; made by the case's own model, never fetched here. */
export interface PassageView {
  id: string
  /** Case number as on the label: "Q-115". */
  number: string
  /** Animals: "Cownose ray". */
  name: string
  /** "QT-6, 4 animals" */
  detail: string
  to?: string
  flag: Flag
  /** Day of the clock, and the length required; null when the clock does not run. */
  day: number | null
  lengthDays: number
  /** Words beside the two strokes of a held case; null when it is not held. */
  held: string | null
  today: DayDate
  /** Legs in order of time, the running one last. */
  legs: readonly PassageLeg[]
  harbour: { on: DayDate; allMet: boolean } | null
  /** What changed the clock, where it happened: "death 4 May, end moved 12 days". */
  notes: readonly { on: DayDate; words: string }[]
}
