import { daysBetween } from '../time/facility-date.ts'
import type { CaseClock, UnmetCriterion } from './case-clock.ts'

/**
 * What stands between a case and clearance on the day asked about: the checklist of the clearance, as far as the clock
 * knows it. Empty = nothing does. An ended case has none.
 *
 * @param pauseRuns whether the clock stands still at the instant
 */
export function listUnmet(clock: CaseClock, pauseRuns: boolean): UnmetCriterion[] {
  const { status, day0On, asOfOn } = clock
  if (status === 'cleared' || status === 'recalled' || status === 'transferred') return []
  const unmet: UnmetCriterion[] = []
  if (day0On === null) unmet.push({ code: 'not-closed', params: {}, overridable: false })
  for (const { liftedAt, cause, eventId, fromCaseId } of clock.locks) {
    if (liftedAt !== null) continue
    if (fromCaseId !== null)
      unmet.push({
        code: 'locked-shared-water',
        params: { eventId, otherCaseId: fromCaseId },
        overridable: false,
      })
    else
      unmet.push({
        code: cause === 'held' ? 'held' : 'locked',
        params: { eventId, cause },
        overridable: false,
      })
  }
  const length = clock.bounds.find(({ kind }) => kind === 'length')
  if (length && length.on > asOfOn)
    unmet.push({
      code: 'length-not-reached',
      params: {
        untilOn: length.on,
        daysLeft: daysBetween(asOfOn, length.on),
        requiredDays: clock.requiredDays,
      },
      overridable: true,
    })
  for (const { state, untilOn, kind, eventId } of clock.extensions) {
    if (state !== 'standing' || (untilOn !== null && untilOn <= asOfOn)) continue
    unmet.push({
      code: 'extension-running',
      params: { eventId, kind, untilOn: untilOn ?? '' },
      overridable: true,
    })
  }
  if (pauseRuns) unmet.push({ code: 'pause-running', params: {}, overridable: true })
  for (const { met, kind, criterionId, count, wanted, earliestSampleOn } of clock.criteria) {
    if (met) continue
    if (kind === 'declared') unmet.push({ code: 'not-declared', params: { criterionId }, overridable: true })
    else
      unmet.push({
        code: 'negatives-missing',
        params: { criterionId, count, wanted, earliestSampleOn: earliestSampleOn ?? '' },
        overridable: true,
      })
  }
  return unmet
}
