import { facilityDateOf, wallClockOf } from '../time/facility-date.ts'
import type { FacilityDate, Instant, Zone } from '../time/instant.ts'
import { sortToday } from './sort-today.ts'
import type { TodayItem } from './today-item.ts'

/**
 * A band of the worklist.
 *
 * - `late` what is late
 * - `now`  what can be done now: running, due, and what waits without an hour
 * - `hour` what comes in one hour of today
 * - `day`  what comes on a later day
 */
export interface TodayBand<T extends TodayItem = TodayItem> {
  /** `late`, `now`, the hour as `16:00`, or the day. */
  key: string
  kind: 'late' | 'now' | 'hour' | 'day'
  /** Hour of the day, 0 to 23; of an `hour` only. */
  hour: number | null
  /** Day of the facility; of a `day` only. */
  on: FacilityDate | null
  items: T[]
}

/**
 * Puts work into bands of time, in reading order. `now` is always there; the others only where something stands in
 * them. What is done is in none.
 *
 * @param now  the instant of the worklist
 * @param zone zone of the facility, whose hours the bands are
 */
export function groupToday<T extends TodayItem>(
  items: readonly T[],
  now: Instant,
  zone: Zone,
): TodayBand<T>[] {
  const today = facilityDateOf(now, zone)
  const bands = new Map<string, TodayBand<T>>([
    ['now', { key: 'now', kind: 'now', hour: null, on: null, items: [] }],
  ])
  for (const item of sortToday(items, zone)) {
    const place = placeOf(item, today, zone)
    if (place === null) continue
    const band = bands.get(place.key) ?? { ...place, items: [] }
    band.items.push(item)
    bands.set(place.key, band)
  }
  const rank = (band: TodayBand<T>) => ({ late: '0', now: '1', hour: `2 ${band.key}`, day: `3 ${band.key}` })
  return [...bands.values()].sort((a, b) => {
    const [x, y] = [rank(a)[a.kind], rank(b)[b.kind]]
    return x < y ? -1 : Number(x > y)
  })
}

function placeOf(item: TodayItem, today: FacilityDate, zone: Zone): Omit<TodayBand, 'items'> | null {
  if (item.state === 'done') return null
  if (item.state === 'late') return { key: 'late', kind: 'late', hour: null, on: null }
  if (item.state !== 'coming') return { key: 'now', kind: 'now', hour: null, on: null }
  const wall = item.dueAt === null ? null : wallClockOf(item.dueAt, zone)
  const on = wall?.date ?? item.dueOn ?? today
  if (wall === null || on !== today) return { key: on, kind: 'day', hour: null, on }
  const hour = Number(wall.time.slice(0, 2))
  return { key: `${wall.time.slice(0, 2)}:00`, kind: 'hour', hour, on: null }
}
