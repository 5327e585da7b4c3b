import { compareInstants } from '../time/instant-arithmetic.ts'
import { startOfFacilityDay } from '../time/local-time.ts'
import type { Instant, Zone } from '../time/instant.ts'
import type { TodayItem } from './today-item.ts'
import { todayStates } from './today-item.ts'
import { todayKindNames } from './today-kinds.ts'

/** The instant an item stands at: its hour, else the beginning of its day, else since when it waits. */
export function whenOf(item: TodayItem, zone: Zone): Instant | null {
  if (item.state === 'late') {
    // What has been late longest comes first
    if (item.latestAt !== null) return item.latestAt
    if (item.latestOn !== null) return startOfFacilityDay(item.latestOn, zone)
  }
  if (item.dueAt !== null) return item.dueAt
  if (item.dueOn !== null) return startOfFacilityDay(item.dueOn, zone)
  return item.at
}

/**
 * Work in the order in which it is seen to: late before running, due, waiting and coming, done last; within these by
 * time, the earliest first, and at the same time by kind. What has no time stands after what has.
 */
export function sortToday<T extends TodayItem>(items: readonly T[], zone: Zone): T[] {
  const keyed = items.map((item) => ({ item, when: whenOf(item, zone) }))
  keyed.sort((a, b) => {
    const byState = todayStates.indexOf(a.item.state) - todayStates.indexOf(b.item.state)
    if (byState !== 0) return byState
    if (a.when !== null && b.when !== null) {
      const byTime = compareInstants(a.when, b.when)
      if (byTime !== 0) return byTime
    } else if (a.when !== b.when) return a.when === null ? 1 : -1
    const byKind = todayKindNames.indexOf(a.item.kind) - todayKindNames.indexOf(b.item.kind)
    return byKind !== 0 ? byKind : a.item.id < b.item.id ? -1 : Number(a.item.id > b.item.id)
  })
  return keyed.map(({ item }) => item)
}
