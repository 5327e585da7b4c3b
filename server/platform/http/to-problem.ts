import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express'
import type { z } from 'zod'
import type { FieldProblem, ProblemBody } from '../../../shared/contracts/problems.ts'
import { printWords } from '../../../shared/messages/print-problems.ts'
import { bodyWords, problemTitles } from '../../../shared/messages/problems.ts'
import type { Log } from '../log.ts'
import { Problem } from './problem.ts'
import { PdfPoolBusy } from '../pdf/pdf-pool.ts'
import { PdfRenderError } from '../pdf/pdf-render-error.ts'
import { notInUtf8 } from './read-json.ts'
import { requestIdOf } from './request-id.ts'

/** Every issue of a failed parse as a pointer and a sentence, not only the first. */
export function fieldProblems(error: z.ZodError, root = ''): FieldProblem[] {
  return error.issues.flatMap((issue) => {
    const pointer = [root, ...issue.path.map(String)].join('/')
    if (issue.code === 'unrecognized_keys')
      return issue.keys.map((key) => ({
        pointer: `${pointer}/${key}`,
        detail: issue.message,
      }))
    return [{ pointer, detail: issue.message }]
  })
}

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

function asProblem(error: unknown): Problem | null {
  if (error instanceof Problem) return error
  if (error instanceof PdfPoolBusy) return new Problem('print-busy', { detail: printWords.busy })
  if (error instanceof PdfRenderError) return new Problem('print-failed', { detail: printWords[error.code] })
  const { type, status } = error as { type?: string; status?: number }
  if (type === 'entity.parse.failed') return new Problem('malformed-json', { detail: bodyWords.notJson })
  if (type === 'encoding.unsupported' || type === notInUtf8)
    return new Problem('malformed-json', { detail: bodyWords.otherEncoding })
  if (type === 'entity.too.large')
    return new Problem('file-too-large', { detail: 'The request is over 1 MB.' })
  // Express refuses an address it cannot decode, such as /people/%
  if (error instanceof URIError || status === 400)
    return new Problem('malformed-json', { detail: 'The request could not be read.' })
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
