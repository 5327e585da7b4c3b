import type { RequestHandler } from 'express'
import { Problem } from './problem.ts'

const reading = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses a state-changing request that a browser says comes from another site. Absent headers pass, so that plain
 * HTTP clients work; SameSite=Lax covers browsers that send neither.
 */
export function checkOrigin(publicUrl: string | null): RequestHandler {
  const expected = publicUrl ? new URL(publicUrl).host : null
  return (req, _res, next) => {
    if (reading.has(req.method)) return next()
    const site = req.get('sec-fetch-site')
    if (site && site !== 'same-origin' && site !== 'none') throw new Problem('foreign-origin')
    const origin = req.get('origin')
    if (origin) {
      const host = URL.canParse(origin) ? new URL(origin).host : null
      if (host === null || (host !== req.get('host') && host !== expected))
        throw new Problem('foreign-origin')
    }
    next()
  }
}
