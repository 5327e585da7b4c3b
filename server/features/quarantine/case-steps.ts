import { addDays } from '../../../shared/domain/time/facility-date.ts'
import { listCaseSteps } from '../../../shared/domain/protocol/list-case-steps.ts'
import type { CaseStep } from '../../../shared/domain/protocol/list-case-steps.ts'
import type {
  CaseLegView,
  CaseStepView,
  ClockReasonView,
} from '../../../shared/contracts/quarantine-primitives.ts'
import type { z } from 'zod'
import type { ClockLeg } from '../../../shared/domain/quarantine/case-clock.ts'
import type { ClockReason } from '../../../shared/domain/quarantine/clock-reason.ts'
import type { CaseReadRow, LookReadRow, StepRecordReadRow } from './case-facts.reads.ts'
import { protocolContentOf } from './protocol-in-force.ts'
import { presentReason } from './present-reason.ts'
import type { ClockFacts } from './read-clocks.ts'

/** What was done in cases besides the events of their clocks. */
export interface CaseWork {
  stepRecords: readonly StepRecordReadRow[]
  looks: readonly LookReadRow[]
}

type LegView = z.infer<typeof CaseLegView>

function presentStep(step: CaseStep, records: readonly StepRecordReadRow[]): CaseStepView {
  const record = records.find(({ id }) => id === step.recordId)
  const { key, kind, name, short, day, untilDay } = step.step
  return {
    key,
    kind,
    name,
    short,
    day,
    untilDay,
    on: step.on,
    untilOn: step.untilOn,
    state: step.state,
    doneOn: step.doneOn,
    doneBy: record?.recorded_by_name ?? null,
    note: record?.note ?? null,
    lateDays: step.lateDays,
    daily: step.daily,
  }
}

/**
 * The legs of a case with their steps. The clearance is the decision, so nobody records that step by hand; the last leg
 * ends with the day on which the case ended, and like on any leg that has ended nothing is due or late any more.
 */
export function presentLegs(
  facts: ClockFacts,
  head: CaseReadRow,
  legs: readonly ClockLeg[],
  reasons: readonly ClockReason[],
  work: CaseWork,
  asOfOn: string,
  endedOn: string | null,
): LegView[] {
  const records = work.stepRecords.filter((row) => row.case_id === head.id && row.happened_at <= facts.asOf)
  const lookedAtOn = work.looks
    .filter((row) => row.case_id === head.id && row.happened_at <= facts.asOf)
    .map((row) => row.happened_on)
  const { steps } = protocolContentOf(facts, head)
  const decided = steps.flatMap(({ key, kind }) =>
    kind === 'decide' && endedOn !== null
      ? [{ recordId: head.id, stepKey: key, outcome: 'done' as const, on: endedOn }]
      : [],
  )
  return legs.map((leg): LegView => {
    const listed = listCaseSteps(
      steps,
      { day0On: leg.day0On, untilOn: leg.endedOn ?? (endedOn === null ? null : addDays(endedOn, 1)) },
      [
        ...records.map((row) => ({
          recordId: row.id,
          stepKey: row.step_key,
          outcome: row.outcome,
          on: row.happened_on,
        })),
        ...decided,
      ],
      lookedAtOn,
      asOfOn,
    ).map((step) => presentStep(step, records))
    return {
      day0On: leg.day0On,
      endedOn: leg.endedOn,
      daysRun: leg.daysRun,
      endReason: endReasonOf(leg, reasons),
      steps: listed,
    }
  })
}

function endReasonOf(leg: ClockLeg, reasons: readonly ClockReason[]): ClockReasonView | null {
  if (leg.endedByEventId === null) return null
  const own = reasons.filter(({ eventId }) => eventId === leg.endedByEventId)
  const reason = own.find(({ effect }) => effect.kind === 'day-zero') ?? own[0]
  return reason ? presentReason(reason) : null
}
