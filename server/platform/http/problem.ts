import { problemStatus } from '../../../shared/contracts/problems.ts'
import type { FieldProblem, ProblemCode } from '../../../shared/contracts/problems.ts'

export interface ProblemDetails {
  /** What happened this time and the next step, in plain words. */
  detail?: string
  errors?: FieldProblem[]
  /** Further members of the problem body, such as the version now stored. */
  extra?: Record<string, unknown>
}

/** A refusal by a rule: thrown by services, answered at the edge as RFC 9457. */
export class Problem extends Error {
  readonly code: ProblemCode
  readonly status: number
  readonly details: ProblemDetails

  constructor(code: ProblemCode, details: ProblemDetails = {}) {
    super(details.detail ?? code)
    this.name = 'Problem'
    this.code = code
    this.status = problemStatus[code]
    this.details = details
  }
}
