import { wallClockOf } from '../../../shared/domain/time/facility-date.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Zone } from '../../../shared/domain/time/instant.ts'
import { sayWork } from '../../../shared/messages/say-today.ts'
import type { TodayReply } from '../../lib/today-query.ts'
import type { DueItem } from '../../ui/hour-ruler-geometry.ts'
import { addressOfWork } from './address-of.ts'
import { chosenLanes, laneOf, lateText } from './today-model.ts'

/**
 * What stands on the hour ruler: of the chosen lanes, what is late, and what has an hour of today. Work that is due on
 * days stands on no hour until it is done, and what waits without one never does.
 *
 * @param preferred the lane kept with the person
 */
export function dueItemsOf(
  { at, on, items }: Pick<TodayReply, 'at' | 'on' | 'items'>,
  given: { zone: Zone; roles: readonly Role[]; preferred: string | undefined },
): DueItem[] {
  const lanes = chosenLanes(given.roles, given.preferred)
  return items
    .filter((item) => laneOf(item) === 'urgent' || lanes.includes(laneOf(item)))
    .flatMap((item): DueItem[] => {
      const isLate = item.state === 'late'
      const when = item.state === 'done' ? item.at : item.state === 'waiting' ? null : item.dueAt
      const wall = when === null ? null : wallClockOf(when, given.zone)
      if (!isLate && wall?.date !== on) return []
      const time = wall?.time.slice(0, 5) ?? ''
      return [
        {
          id: item.id,
          dueMinute: wall?.date === on ? Number(time.slice(0, 2)) * 60 + Number(time.slice(3, 5)) : 0,
          state: isLate ? 'overdue' : item.state === 'done' ? 'done' : 'due',
          time: isLate ? lateText(item, at, given.zone) : time,
          what: sayWork(item, at, given.zone).title,
          to: addressOfWork(item),
        },
      ]
    })
}
