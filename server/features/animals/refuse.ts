import type { ProblemCode } from '../../../shared/contracts/problems.ts'
import { wallClockOf } from '../../../shared/domain/time/facility-date.ts'
import { Problem } from '../../platform/http/problem.ts'

/** A refusal that points at one field. */
export function refuseField(code: ProblemCode, pointer: string, detail: string): Problem {
  return new Problem(code, { detail, errors: [{ pointer, detail, code }] })
}

/** An instant as the wall clock of the facility showed it: `2026-12-01 14:20`. */
export function sayInstant(at: Date | string, zone: string): string {
  const { date, time } = wallClockOf(typeof at === 'string' ? at : at.toISOString(), zone)
  return `${date} ${time.slice(0, 5)}`
}
