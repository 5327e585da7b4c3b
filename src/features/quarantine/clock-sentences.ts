import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { ClockReasonView } from '../../../shared/contracts/quarantine-primitives.ts'
import type { UnmetCriterion } from '../../../shared/domain/quarantine/case-clock.ts'
import type { ClockReason } from '../../../shared/domain/quarantine/clock-reason.ts'
import { sayClockReason } from '../../../shared/messages/say-clock-reason.ts'
import type { ClockWords } from '../../../shared/messages/say-clock-reason.ts'
import { sayDate, sayInstant } from '../../../shared/messages/say-date.ts'
import { sayUnmet as sayUnmetOf } from '../../../shared/messages/say-unmet.ts'

type Names = CaseDetail['names']

function wordsOf(names: Names, zone: string): ClockWords {
  return {
    date: sayDate,
    instant: (at) => sayInstant(at, zone),
    caseName: (id) => names.cases[id] ?? id,
    criterionName: (id) => names.criteria[id] ?? id,
    testName: (key) => names.tests[key] ?? key,
  }
}

/** The sentence for one change of the clock, as it stands on screen. */
export function sayReason(reason: ClockReasonView, names: Names, zone: string): string {
  return sayClockReason(reason as unknown as ClockReason, wordsOf(names, zone))
}

type Unmet = CaseDetail['unmet'][number]

/** The sentence for one thing that stands between a case and clearance. */
export function sayUnmet(unmet: Unmet, names: Names): string {
  return sayUnmetOf(unmet as Pick<UnmetCriterion, 'params'> & Unmet, wordsOf(names, ''))
}

/** The change that explains the clock best: the last that moved day 0 and stands, else the last that stands. */
export function headlineReason(reasons: readonly ClockReasonView[]): ClockReasonView | undefined {
  const standing = reasons.filter((reason) => reason.standing)
  return standing.findLast(({ effect }) => effect.kind === 'day-zero') ?? standing.at(-1)
}
