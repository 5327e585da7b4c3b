import type { FacilityDate, Instant, Zone } from '../time/instant.ts'
import { daysBetween, facilityDateOf, laterDate } from '../time/facility-date.ts'
import { instantToMs, msToInstant } from '../time/instant-arithmetic.ts'
import type { ClockLeg } from './case-clock.ts'
import { type EntryVerdict, classifyBreach, classifyEntry } from './classify-entry.ts'
import type { ClockReason, ClockRule } from './clock-reason.ts'
import { type PreparedCase, eventsOf } from './prepare-cases.ts'
import type { Sharing } from './build-sharing.ts'

/** The day 0 of a case, how it came about, and why. */
export interface DayZero {
  day0On: FacilityDate | null
  lastEntryOn: FacilityDate | null
  legs: ClockLeg[]
  reasons: ClockReason[]
}

/** Something at an instant that may set a day 0. */
interface Step {
  ms: number
  at: Instant
  id: string
  caseId: string
  onDate: FacilityDate
  does: { kind: 'entry' } | { kind: 'verdict'; verdict: EntryVerdict; rule: ClockRule } | { kind: 'join' }
}

/**
 * Day 0 and legs of every case (rules K02, K06, K07, K12).
 *
 * Walks through time once, all cases together, because cases on one water always have the latest day 0 of them all:
 * from the instant their waters meet, and at every restart while they are joined. Day 0 only ever moves later.
 */
export function computeDayZeros(
  cases: readonly PreparedCase[],
  sharing: Sharing,
  zone: Zone,
): Map<string, DayZero> {
  const found = new Map<string, DayZero>(
    cases.map((one) => [one.given.caseId, { day0On: null, lastEntryOn: null, legs: [], reasons: [] }]),
  )
  const closedMs = new Map(
    cases.map((one) => [one.given.caseId, one.closed ? instantToMs(one.closed.at) : Infinity] as const),
  )
  const isClosed = (caseId: string, ms: number) => ms >= (closedMs.get(caseId) ?? Infinity)

  /** Moves a case's day 0: as a new leg once the case is closed, in place while its batch still comes in. */
  const move = (caseId: string, state: DayZero, to: FacilityDate, step: Step): FacilityDate | null => {
    const from = state.day0On
    state.day0On = to
    const running = state.legs.at(-1)
    const isOwnEntry = step.does.kind === 'entry' && step.caseId === caseId
    if (running && isClosed(caseId, step.ms) && !isOwnEntry) {
      running.endedByEventId = step.id
      running.endedOn = step.onDate
      running.daysRun = daysBetween(running.day0On, step.onDate)
      state.legs.push(legOf(to, step))
    } else state.legs.splice(-1, 1, legOf(to, step))
    return from
  }

  /** Gives every case on one water the latest day 0 among them. */
  const level = (caseIds: readonly string[], step: Step) => {
    const started = caseIds.flatMap((caseId) => {
      const state = found.get(caseId)
      return state && state.day0On !== null ? [{ caseId, state, day0On: state.day0On }] : []
    })
    const latest = started.map(({ day0On }) => day0On).reduce(laterDate, '')
    const givers = started.filter(({ day0On }) => day0On === latest)
    const giver = givers.find(({ caseId }) => caseId === step.caseId) ?? givers[0]
    for (const { caseId, state, day0On } of started) {
      const base = { ...reasonBase(step, 'K12'), params: { happenedOn: step.onDate, otherCaseId: '' } }
      if (day0On < latest) {
        const fromOn = move(caseId, state, latest, step)
        const effect = { kind: 'day-zero', fromOn, toOn: latest } as const
        const params = { happenedOn: step.onDate, otherCaseId: giver?.caseId ?? '', day0On: latest }
        state.reasons.push({ ...base, code: 'restarted-shared-water', effect, params })
      } else if (step.does.kind === 'join') {
        const other = giver?.caseId === caseId ? started.find((one) => one.caseId !== caseId) : giver
        if (!other) continue
        const params = { happenedOn: step.onDate, otherCaseId: other.caseId }
        state.reasons.push({ ...base, code: 'shared-water', effect: { kind: 'none' }, params })
      }
    }
  }

  const restart = (state: DayZero, step: Step, verdict: EntryVerdict, rule: ClockRule) => {
    const base = { ...reasonBase(step, rule), code: verdict.code, params: verdict.params }
    if (!verdict.restarts) state.reasons.push({ ...base, effect: { kind: 'none' } } as ClockReason)
    else if (state.day0On !== null && step.onDate <= state.day0On) {
      const params = { happenedOn: step.onDate, day0On: state.day0On }
      state.reasons.push({ ...base, code: 'no-restart-counted', effect: { kind: 'none' }, params })
    } else {
      const fromOn = move(step.caseId, state, step.onDate, step)
      state.reasons.push({ ...base, effect: { kind: 'day-zero', fromOn, toOn: step.onDate } } as ClockReason)
    }
  }

  for (const step of listSteps(cases, sharing, zone)) {
    const state = found.get(step.caseId)
    if (!state) continue
    if (step.does.kind === 'entry') {
      state.lastEntryOn = laterDate(state.lastEntryOn ?? step.onDate, step.onDate)
      if (state.day0On === null || step.onDate > state.day0On) move(step.caseId, state, step.onDate, step)
    } else if (step.does.kind === 'verdict') restart(state, step, step.does.verdict, step.does.rule)
    const partners = sharing.partnersAt(step.caseId, step.ms)
    if (partners.length > 0) level([step.caseId, ...partners].sort(), step)
  }
  return found
}

function legOf(day0On: FacilityDate, step: Step): ClockLeg {
  return {
    day0On,
    startedByEventId: step.id,
    startedAt: step.at,
    endedByEventId: null,
    endedOn: null,
    daysRun: null,
  }
}

function reasonBase(step: Step, rule: ClockRule) {
  return { rule, eventId: step.id, at: step.at, standing: true }
}

/** Everything that may set a day 0, in time order; at one instant cases' own events before joins. */
function listSteps(cases: readonly PreparedCase[], sharing: Sharing, zone: Zone): Step[] {
  const steps: Step[] = []
  for (const one of cases) {
    const { caseId, quarantineKind } = one.given
    const step = (event: { at: Instant; eventId: string }, does: Step['does']): Step => ({
      ms: instantToMs(event.at),
      at: event.at,
      id: event.eventId,
      caseId,
      onDate: facilityDateOf(event.at, zone),
      does,
    })
    const own: Step[] = []
    for (const event of one.events) {
      const onDate = facilityDateOf(event.at, zone)
      if (event.kind === 'arrival' || event.kind === 'addition') {
        const verdict = classifyEntry(event, quarantineKind, onDate)
        const isOfBatch = !one.closed || instantToMs(event.at) <= instantToMs(one.closed.at)
        if (verdict.restarts && isOfBatch) own.push(step(event, { kind: 'entry' }))
        else own.push(step(event, { kind: 'verdict', verdict, rule: 'K06' }))
      }
      if (event.kind === 'breach')
        own.push(step(event, { kind: 'verdict', verdict: classifyBreach(event, onDate), rule: 'K06' }))
    }
    for (const treated of listTreatedPositives(one)) {
      const verdict: EntryVerdict = {
        restarts: true,
        code: 'restarted-after-positive',
        params: { pathogenName: treated.pathogenName, endedOn: facilityDateOf(treated.ended.at, zone) },
      }
      own.push(step(treated.ended, { kind: 'verdict', verdict, rule: 'K07' }))
    }
    // A batch closed without a recorded entry counts from the day somebody closed it.
    if (one.closed && !own.some(({ does }) => does.kind === 'entry'))
      own.push(step(one.closed, { kind: 'entry' }))
    steps.push(...own)
  }
  for (const { atMs, spellId, caseIds } of sharing.joins) {
    const at = msToInstant(atMs)
    const onDate = facilityDateOf(at, zone)
    const here = caseIds.find((caseId) => sharing.partnersAt(caseId, atMs).length > 0)
    if (here !== undefined)
      steps.push({ ms: atMs, at, id: spellId, caseId: here, onDate, does: { kind: 'join' } })
  }
  const rank = (step: Step) => ({ entry: 0, verdict: 1, join: 2 })[step.does.kind]
  return steps.sort((a, b) => a.ms - b.ms || rank(a) - rank(b) || (a.id < b.id ? -1 : Number(a.id > b.id)))
}

/** Ends of treatment of a listed or facility-critical positive, after it was reported (rule K07). */
export function listTreatedPositives(one: PreparedCase) {
  const positives = eventsOf(one.events, 'sample-result').filter(isCriticalPositive)
  return positives.flatMap((positive) =>
    eventsOf(one.events, 'treatment-ended')
      .filter(
        (ended) =>
          ended.forResultEventId === positive.eventId && instantToMs(ended.at) >= instantToMs(positive.at),
      )
      .map((ended) => ({ positive, ended, pathogenName: positive.pathogenName ?? '' })),
  )
}

/** A positive that locks: of a listed pathogen, or one that this facility calls critical. */
export function isCriticalPositive(event: { result: string; pathogenStatus?: string }): boolean {
  return (
    event.result === 'positive' &&
    (event.pathogenStatus === 'listed' || event.pathogenStatus === 'facility-critical')
  )
}
