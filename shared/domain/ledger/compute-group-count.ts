import { type Instant, isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { CountEntry } from './count-entry.ts'
import { type CountRefusal, listRunningCounts } from './list-running-counts.ts'

/** What somebody found when they looked: every animal counted, or a range. It changes no ledger by itself. */
export type CountStatement = {
  statementId: string
  at: Instant
  recordedAt: Instant
  voided?: boolean
} & ({ basis: 'counted'; count: number } | { basis: 'estimated'; low: number; high: number })

/**
 * How many animals a group holds, as honestly as it is known. `ledgerCount` always equals the sum of the ledger.
 * For an estimated group the range of the last look is carried along by what was posted since.
 */
export type GroupCount =
  | { basis: 'counted'; ledgerCount: number; differsFromStatement: number }
  | { basis: 'estimated'; ledgerCount: number; low: number; high: number; ledgerOutsideRange: boolean }

export type GroupCountRefusal = CountRefusal | 'statement-not-whole' | 'range-backwards'

/**
 * The count of a group at an instant: counted, or estimated between two figures.
 *
 * The newest statement at or before the instant says which. Ledger lines after it move its figures: twelve dead after
 * an estimate of 300 to 400 leave 288 to 388. A figure never goes below 0. Without any statement the ledger counts as
 * counted.
 *
 * @param entries    the group's ledger, any order
 * @param statements counts and estimates made, any order
 * @returns `differsFromStatement` = ledger less count (0 when they agree); another figure calls for a recount or a
 * signed adjustment
 * @refuses not-an-instant | statement-not-whole | range-backwards | as `listRunningCounts`
 */
export function computeGroupCount(
  entries: readonly CountEntry[],
  statements: readonly CountStatement[],
  at: Instant,
): Result<GroupCount, GroupCountRefusal> {
  if (!isInstant(at)) return refuse('not-an-instant', 'at')
  for (const one of statements) {
    const figures = one.basis === 'counted' ? [one.count] : [one.low, one.high]
    if (!isInstant(one.at)) return refuse('not-an-instant', 'statements', { statementId: one.statementId })
    if (figures.some((figure) => !Number.isSafeInteger(figure) || figure < 0))
      return refuse('statement-not-whole', 'statements', { statementId: one.statementId })
    if (one.basis === 'estimated' && one.low > one.high)
      return refuse('range-backwards', 'statements', { statementId: one.statementId })
  }
  const running = listRunningCounts(entries)
  if (!running.ok) return running
  const until = running.value.filter(({ entry }) => compareInstants(entry.at, at) <= 0)
  const ledgerCount = until.at(-1)?.balance ?? 0

  const newest = statements
    .filter((one) => !one.voided && compareInstants(one.at, at) <= 0)
    .sort(
      (a, b) =>
        compareInstants(b.at, a.at) ||
        compareInstants(b.recordedAt, a.recordedAt) ||
        (a.statementId < b.statementId ? 1 : -1),
    )[0]
  if (!newest) return ok({ basis: 'counted', ledgerCount, differsFromStatement: 0 })

  const moved = until
    .filter(({ entry }) => compareInstants(entry.at, newest.at) > 0)
    .reduce((sum, { entry }) => sum + entry.delta, 0)
  const now = (figure: number) => Math.max(0, figure + moved)
  if (newest.basis === 'counted')
    return ok({ basis: 'counted', ledgerCount, differsFromStatement: ledgerCount - now(newest.count) })
  const low = now(newest.low)
  const high = now(newest.high)
  return ok({
    basis: 'estimated',
    ledgerCount,
    low,
    high,
    ledgerOutsideRange: ledgerCount < low || ledgerCount > high,
  })
}
