import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { Zone } from '../../../shared/domain/time/instant.ts'
import { groupToday } from '../../../shared/domain/today/group-today.ts'
import type { TodayBand } from '../../../shared/domain/today/group-today.ts'
import { howLate } from '../../../shared/domain/today/how-late.ts'
import {
  isForRoles,
  lanesOf,
  todayKindNames,
  todayKinds,
  todayLanes,
} from '../../../shared/domain/today/today-kinds.ts'
import type { TodayLane } from '../../../shared/domain/today/today-kinds.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { agoWords, lateWords } from '../../../shared/messages/today.ts'

export const laneOf = (item: Pick<TodayWork, 'kind'>): TodayLane => todayKinds[item.kind].lane

/** A column of a band. */
export interface LaneCell {
  lane: TodayLane
  items: TodayWork[]
}

export interface TodayView {
  /** Columns, the chosen one first. */
  lanes: TodayLane[]
  chosen: TodayLane | null
  urgent: TodayWork[]
  bands: (Omit<TodayBand<TodayWork>, 'items'> & { cells: LaneCell[]; count: number })[]
  done: TodayWork[]
  /** Work of the reader's own lanes that can be done now or is late. */
  waits: number
  waitsLate: number
  /** Late work in lanes that are not the reader's own. */
  othersLate: number
  /** Nothing at all stands on the list. */
  empty: boolean
}

/** The lanes in which somebody with these roles can have work; urgent calls stand over them. */
export function lanesSeenBy(roles: readonly Role[]): TodayLane[] {
  return todayLanes.filter(
    (lane) =>
      lane !== 'urgent' &&
      todayKindNames.some((kind) => todayKinds[kind].lane === lane && isForRoles(kind, roles)),
  )
}

/**
 * The lanes that stand on the hour ruler and come first: the one somebody chose, else their own.
 *
 * @param preferred the lane kept with the person; what is no lane of theirs is taken for no choice
 */
export function chosenLanes(roles: readonly Role[], preferred: string | undefined): TodayLane[] {
  const seen = lanesSeenBy(roles)
  const kept = seen.filter((lane) => lane === preferred)
  return kept.length > 0 ? kept : lanesOf(roles).filter((lane) => seen.includes(lane))
}

/** Work as Today shows it: lanes side by side in bands of time. */
export function viewToday(
  items: readonly TodayWork[],
  given: { at: string; zone: Zone; roles: readonly Role[]; preferred: string | undefined },
): TodayView {
  const chosen = chosenLanes(given.roles, given.preferred)
  const seen = lanesSeenBy(given.roles)
  const lanes = [...chosen, ...seen.filter((lane) => !chosen.includes(lane))]
  const urgent = items.filter((item) => laneOf(item) === 'urgent')
  const work = items.filter((item) => laneOf(item) !== 'urgent')
  const bands = groupToday(work, given.at, given.zone).map(({ items: inBand, ...band }) => ({
    ...band,
    count: inBand.length,
    cells: lanes.map((lane) => ({ lane, items: inBand.filter((item) => laneOf(item) === lane) })),
  }))
  const own = lanesOf(given.roles)
  const open = items.filter(({ state }) => state !== 'done' && state !== 'coming')
  const mine = open.filter((item) => own.includes(laneOf(item)))
  // an urgent call says itself since when; the band of what is late has it not
  const isLate = (item: TodayWork) => item.state === 'late' && laneOf(item) !== 'urgent'
  return {
    lanes,
    chosen: chosen[0] ?? null,
    urgent,
    bands,
    done: work.filter(({ state }) => state === 'done'),
    waits: mine.length,
    waitsLate: mine.filter(isLate).length,
    othersLate: open.filter((item) => isLate(item) && !own.includes(laneOf(item))).length,
    empty: items.every(({ state }) => state === 'done'),
  }
}

/** How long ago an urgent call was raised, in words. */
export function agoText(call: TodayWork, at: string, zone: Zone): string {
  const since = howLate(call, at, facilityDateOf(at, zone))
  return since === null ? '' : agoWords[since.unit](since)
}

/** How late something is, in words; empty for what is not. */
export function lateText(item: TodayWork, at: string, zone: Zone): string {
  const late = howLate(item, at, facilityDateOf(at, zone))
  return late === null ? '' : lateWords[late.unit](late)
}
