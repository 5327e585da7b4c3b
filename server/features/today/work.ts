import type { TodayWork } from '../../../shared/contracts/today.contract.ts'
import { judgeDays, judgeHours } from '../../../shared/domain/today/judge-window.ts'
import type { FacilityDate, Instant, Zone } from '../../../shared/domain/time/instant.ts'
import type { Actor } from '../../platform/http/request-context.ts'

/** The moment a worklist is made for, and whom it is made for. */
export interface Moment {
  now: Date
  at: Instant
  on: FacilityDate
  zone: Zone
  actor: Actor
}

type Told = Pick<TodayWork, 'id' | 'kind' | 'params'> & Partial<TodayWork>

/** A piece of work with what was told of it; the rest is empty. */
export function work(told: Told & Pick<TodayWork, 'state'>): TodayWork {
  return { dueAt: null, latestAt: null, dueOn: null, latestOn: null, at: null, acts: [], ...told }
}

/** Work that has no hour: it waits for somebody, since an instant where one is known. */
export const waiting = (told: Told): TodayWork => work({ state: 'waiting', ...told })

/** Work with an hour, judged by its window. */
export const atHour = (told: Told & { dueAt: Instant; latestAt: Instant }, moment: Moment): TodayWork =>
  work({ state: judgeHours(told, moment.at), ...told })

/** Work with days, judged by its window. */
export const onDays = (
  told: Told & { dueOn: FacilityDate; latestOn: FacilityDate },
  moment: Moment,
): TodayWork => work({ state: judgeDays(told, moment.on), ...told })
