import type { FieldProblem, ProblemBody } from '../../shared/contracts/problems.ts'

/**
 * A refusal as it came over the wire (RFC 9457), or that the server could not be reached. `code` is stable and is what
 * screens decide by; `says` is what they show.
 */
export class ProblemError extends Error {
  override readonly name = 'ProblemError'

  constructor(
    /** HTTP status; 0 when there was no answer. */
    readonly status: number,
    /** A code of shared/contracts/problems.ts, `no-answer`, or `not-understood` for an answer in another form. */
    readonly code: string,
    readonly title: string,
    readonly detail: string | undefined,
    readonly errors: readonly FieldProblem[],
    readonly requestId: string | undefined,
    /** The whole body, for the extensions of a particular problem. */
    readonly body: Readonly<Record<string, unknown>>,
  ) {
    super(detail ? `${title} ${detail}` : title)
  }

  /** Title and next step in one or two sentences. */
  get says(): string {
    return this.detail ? `${this.title.replace(/[.!?]?$/, '.')} ${this.detail}` : this.title
  }

  /** The network failed, not the request: it may be tried again as it is. */
  get noAnswer(): boolean {
    return this.status === 0
  }

  static fromBody(status: number, body: ProblemBody): ProblemError {
    return new ProblemError(
      status,
      body.code,
      body.title,
      body.detail,
      body.errors ?? [],
      body.request_id,
      body,
    )
  }
}

/** Whether an error is a refusal, and with these codes if any are given. */
export function isProblem(error: unknown, ...codes: string[]): error is ProblemError {
  return error instanceof ProblemError && (codes.length === 0 || codes.includes(error.code))
}
