import type { FacilityDate, Instant } from '../time/instant.ts'
import type { TodayKind } from './today-kinds.ts'

/**
 * - `late`    its window has closed
 * - `running` goes on now, such as a bath
 * - `due`     its window is open
 * - `waiting` has no hour; somebody has to see to it
 * - `coming`  its window opens later
 * - `done`    done today
 */
export const todayStates = ['late', 'running', 'due', 'waiting', 'coming', 'done'] as const
export type TodayState = (typeof todayStates)[number]

/** One piece of work. It has instants, or days, or neither: a step is due on days, a dose at an hour. */
export interface TodayItem {
  /** Names the work for as long as it stands: kind and record. */
  id: string
  kind: TodayKind
  state: TodayState
  /** When it is due, and the last instant at which it is on time. */
  dueAt: Instant | null
  latestAt: Instant | null
  /** First and last day on which it is on time. */
  dueOn: FacilityDate | null
  latestOn: FacilityDate | null
  /** When it was done, of what is done; since when it waits or runs, of what does. */
  at: Instant | null
}
