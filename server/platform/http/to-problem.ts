import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express'
import type { ProblemBody } from '../../../shared/contracts/problems.ts'
import { printWords } from '../../../shared/messages/print-problems.ts'
import { bodyWords, problemTitles } from '../../../shared/messages/problems.ts'
import type { Log } from '../log.ts'
import { Problem } from './problem.ts'
import { PdfPoolBusy } from '../pdf/pdf-pool.ts'
import { PdfRenderError } from '../pdf/pdf-render-error.ts'
import { notInUtf8 } from './read-json.ts'
import { requestIdOf } from './request-id.ts'

/** The wire form of a refusal. */
export function problemBody(problem: Problem, req: Request): ProblemBody {
  return {
    type: `/problems/${problem.code}`,
    title: problemTitles[problem.code],
    status: problem.status,
    code: problem.code,
    ...(problem.details.detail ? { detail: problem.details.detail } : {}),
    instance: req.originalUrl,
    request_id: requestIdOf(req),
    ...(problem.details.errors ? { errors: problem.details.errors } : {}),
    ...problem.details.extra,
  }
}

/** A body of which nothing was taken in: there is no field to point at, and the code says why. */
const unread = (of: 'malformed-json' | 'file-too-large', code: string, detail: string): Problem =>
  new Problem(of, { detail, errors: [{ pointer: '', code, detail }] })

function asProblem(error: unknown): Problem | null {
  if (error instanceof Problem) return error
  if (error instanceof PdfPoolBusy) return new Problem('print-busy', { detail: printWords.busy })
  if (error instanceof PdfRenderError) return new Problem('print-failed', { detail: printWords[error.code] })
  const { type, status } = error as { type?: string; status?: number }
  if (type === 'entity.parse.failed') return unread('malformed-json', 'not-json', bodyWords.notJson)
  if (type === 'encoding.unsupported' || type === notInUtf8)
    return unread('malformed-json', 'other-encoding', bodyWords.otherEncoding)
  if (type === 'entity.too.large') return unread('file-too-large', 'body-too-large', bodyWords.tooLarge)
  // Express refuses an address it cannot decode, such as /people/%
  if (error instanceof URIError || status === 400)
    return unread('malformed-json', 'not-readable', bodyWords.notReadable)
  return null
}

/** The one place where an error becomes an answer. Bugs answer with a request id only; the log has the rest. */
export function problemEdge(log: Log): ErrorRequestHandler {
  return (error: unknown, req: Request, res: Response, next) => {
    if (res.headersSent) return next(error)
    const known = asProblem(error)
    if (!known || known.status === 500)
      log.error({ err: error, request_id: requestIdOf(req), url: req.originalUrl }, 'unexpected failure')
    const problem =
      known ??
      new Problem('outside-working-order', {
        detail:
          'Nothing was half saved. Try again; if it stays, give the request number to whoever runs Pratique.',
      })
    if (problem.status === 503 || problem.status === 429)
      res.setHeader('Retry-After', String(problem.details.extra?.['retry_after_seconds'] ?? 5))
    res
      .status(problem.status)
      .type('application/problem+json')
      .send(JSON.stringify(problemBody(problem, req)))
  }
}

/** Answers for addresses below /api that do not exist. */
export const unknownRoute: RequestHandler = () => {
  throw new Problem('unknown-route')
}
