import { randomUUID } from 'node:crypto'
import type { Request, RequestHandler } from 'express'

const key = Symbol('request id')
type Marked = Request & { [key]?: string }

/** Gives every request an id, which its answer, its log lines and its audit entries carry. */
export const giveRequestId: RequestHandler = (req, res, next) => {
  const id = randomUUID()
  ;(req as Marked)[key] = id
  res.setHeader('X-Request-Id', id)
  next()
}

export function requestIdOf(req: Request): string {
  return (req as Marked)[key] ?? 'unknown'
}
