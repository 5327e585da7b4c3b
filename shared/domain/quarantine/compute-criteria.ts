import type { FacilityDate, Zone } from '../time/instant.ts'
import { addDays, daysBetween, facilityDateOf, laterDate } from '../time/facility-date.ts'
import { instantToMs } from '../time/instant-arithmetic.ts'
import type { ClockDecisionDue, CriterionState } from './case-clock.ts'
import type { EventOf } from './clock-event.ts'
import type { ClearanceCriterion, NegativesCriterion } from './clock-policy.ts'
import type { ClockReason } from './clock-reason.ts'
import { type PreparedCase, eventsOf } from './prepare-cases.ts'

export interface Criteria {
  criteria: CriterionState[]
  reasons: ClockReason[]
  decisionsDue: ClockDecisionDue[]
}

type Sample = EventOf<'sample-result'> & { takenOn: FacilityDate }

/**
 * Which criteria of a case are met, and on which day (rule K15).
 *
 * @param day0On      samples taken before it do not count: the animals that moved day 0 were not yet there
 * @param lastMaskOn  end of the last masking treatment; null when there was none
 * @param maskRunning a masking treatment has not ended: no sample can be the last
 */
export function computeCriteria(
  one: PreparedCase,
  day0On: FacilityDate | null,
  lastMaskOn: FacilityDate | null,
  maskRunning: boolean,
  zone: Zone,
): Criteria {
  const reasons: ClockReason[] = []
  const decisionsDue: ClockDecisionDue[] = []
  const samples = eventsOf(one.events, 'sample-result')
    .map((event): Sample => ({ ...event, takenOn: facilityDateOf(event.takenAt, zone) }))
    .sort(inOrderTaken)
  const criteria = one.policy.criteria.map((criterion): CriterionState => {
    if (criterion.kind === 'declared') return judgeDeclared(one, criterion, reasons, zone)
    const own = samples.filter((sample) => sample.testKey === criterion.testKey)
    return judgeNegatives(criterion, own, day0On, maskRunning ? null : (lastMaskOn ?? ''), reasons)
  })
  for (const [i, sample] of samples.entries()) {
    const { result, testKey, takenOn, eventId, at } = sample
    if (result !== 'inconclusive' && result !== 'insufficient') continue
    const repeated = samples.slice(i + 1).some((later) => later.testKey === testKey)
    const params = { testKey, takenOn, result } as const
    reasons.push({
      code: 'repeat-due',
      rule: 'K15',
      eventId,
      at,
      standing: !repeated,
      effect: { kind: 'none' },
      params,
    })
    if (!repeated) decisionsDue.push({ code: 'repeat-sample', eventId, params })
  }
  return { criteria, reasons, decisionsDue }
}

function judgeDeclared(
  one: PreparedCase,
  { criterionId }: ClearanceCriterion,
  reasons: ClockReason[],
  zone: Zone,
): CriterionState {
  const last = eventsOf(one.events, 'criterion-declared').findLast(
    (event) => event.criterionId === criterionId,
  )
  const state = { criterionId, kind: 'declared', count: 0, wanted: 0, earliestSampleOn: null } as const
  if (!last) return { ...state, met: false, metOn: null }
  const onDate = facilityDateOf(last.at, zone)
  const base = { rule: 'K15', eventId: last.eventId, at: last.at, standing: true } as const
  const effect = { kind: 'criterion' } as const
  if (last.met)
    reasons.push({ ...base, code: 'criterion-met', effect, params: { criterionId, metOn: onDate } })
  else
    reasons.push({ ...base, code: 'criterion-not-met', effect, params: { criterionId, happenedOn: onDate } })
  return { ...state, met: last.met, metOn: last.met ? onDate : null }
}

/**
 * `lastMaskOn`: '' when nothing ever masked, null while something still does.
 *
 * A sample can be the last of k when it lies far enough behind the masking treatment and k − 1 others, each the
 * distance apart, lie before it and after the last positive. So a negative that came too early to be the last may still
 * be one of the earlier ones, and one taken too soon after another is passed over without harm.
 */
function judgeNegatives(
  criterion: NegativesCriterion,
  samples: readonly Sample[],
  day0On: FacilityDate | null,
  lastMaskOn: FacilityDate | null,
  reasons: ClockReason[],
): CriterionState {
  const { criterionId, testKey, count: wanted, daysApart, daysAfterMasking } = criterion
  const mayBeLastFrom =
    lastMaskOn === null ? null : lastMaskOn === '' ? '' : addDays(lastMaskOn, daysAfterMasking)
  const mayBeLast = (takenOn: FacilityDate) => mayBeLastFrom !== null && takenOn >= mayBeLastFrom
  let chain: FacilityDate[] = []
  let metBy: Sample | null = null
  let counted: ClockReason[] = []

  for (const sample of samples) {
    const { result, takenOn, eventId, at } = sample
    const base = { rule: 'K15', eventId, at, standing: true, effect: { kind: 'criterion' } } as const
    if (result === 'positive') {
      chain = []
      metBy = null
      for (const reason of counted) reason.standing = false
      counted = []
      reasons.push({ ...base, code: 'negatives-reset', params: { testKey, takenOn } })
    }
    if (result !== 'negative') continue
    if (day0On !== null && takenOn < day0On) {
      const params = { testKey, takenOn, day0On }
      reasons.push({ ...base, code: 'negative-before-day0', effect: { kind: 'none' }, params })
      continue
    }
    const before = chain.filter((day) => daysBetween(day, takenOn) >= daysApart).length
    if (before === chain.length) {
      chain.push(takenOn)
      const params = { testKey, takenOn, count: Math.min(chain.length, wanted), wanted }
      const reason: ClockReason = { ...base, code: 'negatives-counted', params }
      counted.push(reason)
      reasons.push(reason)
    } else {
      const params = { testKey, takenOn, daysApart }
      reasons.push({ ...base, code: 'negative-not-counted', effect: { kind: 'none' }, params })
    }
    if (!metBy && before + 1 >= wanted && mayBeLast(takenOn)) metBy = sample
  }

  const metOn = metBy?.takenOn ?? null
  if (metBy && metOn)
    reasons.push({
      rule: 'K15',
      eventId: metBy.eventId,
      at: metBy.at,
      standing: true,
      code: 'criterion-met',
      effect: { kind: 'criterion' },
      params: { criterionId, metOn },
    })
  return {
    criterionId,
    kind: 'negatives',
    met: metBy !== null,
    metOn,
    count: Math.min(chain.length, wanted),
    wanted,
    earliestSampleOn:
      metBy || mayBeLastFrom === null ? null : earliestLast(chain, wanted, daysApart, mayBeLastFrom, day0On),
  }
}

/** The first day on which a negative would complete the chain, or null while the batch is open. */
function earliestLast(
  chain: readonly FacilityDate[],
  wanted: number,
  daysApart: number,
  mayBeLastFrom: FacilityDate | '',
  day0On: FacilityDate | null,
): FacilityDate | null {
  if (day0On === null) return null
  const missing = Math.max(1, wanted - chain.length)
  const behind = chain[chain.length >= wanted ? wanted - 2 : chain.length - 1]
  const spaced =
    behind === undefined ? addDays(day0On, (missing - 1) * daysApart) : addDays(behind, missing * daysApart)
  return laterDate(spaced, mayBeLastFrom)
}

/** By the instant taken; at one instant the positive last, so that no negative taken with it counts. */
function inOrderTaken(a: Sample, b: Sample): number {
  return (
    instantToMs(a.takenAt) - instantToMs(b.takenAt) ||
    Number(a.result === 'positive') - Number(b.result === 'positive') ||
    (a.eventId < b.eventId ? -1 : Number(a.eventId > b.eventId))
  )
}
