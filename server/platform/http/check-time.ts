import { problemTitles } from '../../../shared/messages/problems.ts'
import { clockSkewMs } from '../database/happened-by.ts'
import { Problem } from './problem.ts'

/**
 * When somebody stopped something: as they say, or now where their clock goes ahead. Stopping is never refused, and what
 * is stopped was stopped by now.
 */
export const timeByNow = (given: string, now: Date): Date =>
  new Date(Math.min(Date.parse(given), now.getTime()))

/** The time a person gave as a Date; refused when it lies more than 5 min ahead of the server's clock. */
export function timeNotAhead(given: string, now: Date, pointer = '/happenedAt'): Date {
  const at = new Date(given)
  if (at.getTime() > now.getTime() + clockSkewMs)
    throw new Problem('in-the-future', {
      errors: [{ pointer, detail: problemTitles['in-the-future'], code: 'in-the-future' }],
    })
  return at
}
