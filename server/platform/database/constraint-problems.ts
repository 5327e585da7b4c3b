import type { ProblemCode } from '../../../shared/contracts/problems.ts'
import { Problem } from '../http/problem.ts'

/** Which refusal a race runs into when the database stops what the service had just found allowed. */
const byConstraint: Record<string, ProblemCode> = {
  uq_people_email: 'email-already-used',
  ck_licences_period: 'period-reversed',
  uq_setting_confirmations_version: 'already-confirmed',
}

/** The problem for a broken constraint; null when none is foreseen, which is a bug and answers 500. */
export function problemFromConstraint(constraint: string): Problem | null {
  const code = byConstraint[constraint]
  return code ? new Problem(code) : null
}
