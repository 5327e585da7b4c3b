import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { CountEntry } from './count-entry.ts'
import { type CountRefusal, findEntryFault, listRunningCounts } from './list-running-counts.ts'

/** What a recorded fact does to the ledger: the part that fits, and the part that needs a recount. */
export interface CountPosting {
  /** The line to write; null when nothing of it fits. */
  entry: CountEntry | null
  /** Whole animals of the fact that are in the ledger now. */
  postedCount: number
  /** Whole animals that the ledger could not give; more than 0 opens a discrepancy. */
  excessCount: number
  /** Set when a discrepancy has to be opened: what was seen against what the ledger could give. */
  discrepancy: { animalId: string; seenCount: number; availableCount: number; excessCount: number } | null
}

/**
 * Posts a fact to a group's ledger without ever taking it below zero.
 *
 * Three carcasses where the ledger says two are three carcasses: two are posted, and the third is the discrepancy. The
 * sum is kept from falling below zero at **every** later instant too, so that a fact entered late cannot undo what was
 * posted since.
 *
 * @param entries the group's lines so far, any order
 * @param fact    the line as seen; its delta is what happened, whether the ledger can give it or not
 * @returns the line to write (its delta may be smaller), and the excess
 * @refuses as `listRunningCounts`, and several-animals when the fact is of another group
 */
export function postCount(
  entries: readonly CountEntry[],
  fact: CountEntry,
): Result<CountPosting, CountRefusal> {
  const wrong = findEntryFault(fact)
  if (wrong) return wrong
  const running = listRunningCounts(entries)
  if (!running.ok) return running
  const other = entries.find((entry) => !entry.voided && entry.animalId !== fact.animalId)
  if (other) return refuse('several-animals', 'fact')

  const seenCount = Math.abs(fact.delta)
  if (fact.delta > 0) return ok({ entry: fact, postedCount: seenCount, excessCount: 0, discrepancy: null })

  const before = running.value.findLast(({ entry }) => compareInstants(entry.at, fact.at) <= 0)?.balance ?? 0
  const after = running.value
    .filter(({ entry }) => compareInstants(entry.at, fact.at) > 0)
    .map(({ balance }) => balance)
  const availableCount = Math.min(before, ...after)
  const postedCount = Math.min(seenCount, availableCount)
  const excessCount = seenCount - postedCount
  return ok({
    entry: postedCount > 0 ? { ...fact, delta: -postedCount } : null,
    postedCount,
    excessCount,
    discrepancy: excessCount > 0 ? { animalId: fact.animalId, seenCount, availableCount, excessCount } : null,
  })
}
