import { type Instant, isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { CountEntry } from './count-entry.ts'
import { type CountRefusal, listRunningCounts } from './list-running-counts.ts'

/**
 * The ledger's count of a group at an instant, everything up to and including that instant.
 *
 * @returns whole animals, 0 or more; 0 before the first line
 * @refuses as `listRunningCounts`
 */
export function countAt(entries: readonly CountEntry[], at: Instant): Result<number, CountRefusal> {
  if (!isInstant(at)) return refuse('not-an-instant', 'at')
  const running = listRunningCounts(entries)
  if (!running.ok) return running
  return ok(running.value.findLast(({ entry }) => compareInstants(entry.at, at) <= 0)?.balance ?? 0)
}
