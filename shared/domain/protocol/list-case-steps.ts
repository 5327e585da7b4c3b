import { addDays, daysBetween } from '../time/facility-date.ts'
import type { FacilityDate } from '../time/instant.ts'
import type { ProtocolStep } from './protocol-content.ts'

/** That a step was done, or that it was tried in vain, on a day of the facility. */
export interface StepRecord {
  recordId: string
  stepKey: string
  outcome: 'done' | 'failed'
  on: FacilityDate
}

export type CaseStepState = 'done' | 'due' | 'to-come' | 'overdue' | 'failed'

/** A step of a leg of a case, with its dates and where it stands. */
export interface CaseStep {
  step: ProtocolStep
  /** First and last day of its window. */
  on: FacilityDate
  untilOn: FacilityDate
  state: CaseStepState
  /** The record that settles it; null while none does. */
  recordId: string | null
  doneOn: FacilityDate | null
  /** Days since the end of the window; 0 unless overdue. */
  lateDays: number
  /** Of a daily step: days already looked at, days that have been, and the days without. Today is not yet missed. */
  daily: { doneDays: number; passedDays: number; missedOn: FacilityDate[] } | null
}

/** The leg that the steps are dated by. `untilOn` is the day of the restart that ended it, or the day after its case ended. */
export interface LegDays {
  day0On: FacilityDate
  untilOn: FacilityDate | null
}

/**
 * The steps of a protocol on the dates of one leg, each with its state.
 *
 * Records belong to the leg in which they were made, so a restart opens every step again. A failed step stays failed
 * until it is done after all. A step is due on each day of its window and overdue after it. On a leg that has ended
 * nothing is due any more: what was not done is left out.
 *
 * @param records    of this case, in any order
 * @param lookedAtOn days with an observation of the case, for daily steps
 * @param asOfOn     the day asked about
 * @returns in order of their windows
 */
export function listCaseSteps(
  steps: readonly ProtocolStep[],
  leg: LegDays,
  records: readonly StepRecord[],
  lookedAtOn: readonly FacilityDate[],
  asOfOn: FacilityDate,
): CaseStep[] {
  const inLeg = (on: FacilityDate) =>
    on >= leg.day0On && (leg.untilOn === null || on < leg.untilOn) && on <= asOfOn
  const looked = new Set(lookedAtOn.filter(inLeg))
  const listed = steps.map((step): CaseStep => {
    const on = addDays(leg.day0On, step.day)
    const untilOn = addDays(leg.day0On, step.untilDay)
    return step.daily
      ? judgeDaily(step, on, untilOn, leg, looked, asOfOn)
      : judgeOnce(step, on, untilOn, records, inLeg, asOfOn)
  })
  return listed
    .filter(({ state }) => leg.untilOn === null || state === 'done' || state === 'failed')
    .sort((a, b) => a.step.day - b.step.day || a.step.untilDay - b.step.untilDay)
}

function judgeOnce(
  step: ProtocolStep,
  on: FacilityDate,
  untilOn: FacilityDate,
  records: readonly StepRecord[],
  inLeg: (on: FacilityDate) => boolean,
  asOfOn: FacilityDate,
): CaseStep {
  const own = records
    .filter((record) => record.stepKey === step.key && inLeg(record.on))
    .sort((a, b) => (a.on < b.on ? -1 : Number(a.on > b.on)))
  const settled = own.find(({ outcome }) => outcome === 'done') ?? own.at(-1)
  const state =
    settled?.outcome ?? (asOfOn < on ? 'to-come' : asOfOn <= untilOn ? 'due' : ('overdue' as const))
  return {
    step,
    on,
    untilOn,
    state,
    recordId: settled?.recordId ?? null,
    doneOn: settled?.on ?? null,
    lateDays: state === 'overdue' ? daysBetween(untilOn, asOfOn) : 0,
    daily: null,
  }
}

function judgeDaily(
  step: ProtocolStep,
  on: FacilityDate,
  untilOn: FacilityDate,
  leg: LegDays,
  looked: ReadonlySet<FacilityDate>,
  asOfOn: FacilityDate,
): CaseStep {
  // While the animals are here they are looked at, also after the last day of the protocol
  const lastOn = leg.untilOn === null ? asOfOn : addDays(leg.untilOn, -1)
  const days = Array.from({ length: Math.max(0, daysBetween(on, lastOn) + 1) }, (_, i) => addDays(on, i))
  const missedOn = days.filter((day) => !looked.has(day) && day < asOfOn)
  const doneDays = days.filter((day) => looked.has(day)).length
  const lastMissed = missedOn.at(-1)
  const state = stateOfDaily()
  return {
    step,
    on,
    untilOn,
    state,
    recordId: null,
    doneOn: null,
    lateDays: state === 'overdue' && lastMissed !== undefined ? daysBetween(lastMissed, asOfOn) : 0,
    daily: { doneDays, passedDays: days.length, missedOn },
  }

  function stateOfDaily(): CaseStepState {
    if (asOfOn < on) return 'to-come'
    if (leg.untilOn !== null) return doneDays > 0 ? 'done' : 'failed'
    if (looked.has(asOfOn)) return 'done'
    // Yesterday without a look is late today; older gaps are history
    return missedOn.includes(addDays(asOfOn, -1)) ? 'overdue' : 'due'
  }
}
