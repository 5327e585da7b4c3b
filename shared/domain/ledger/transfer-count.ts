import type { Instant } from '../time/instant.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { CountEntry } from './count-entry.ts'
import { postCount } from './post-count.ts'
import type { CountRefusal } from './list-running-counts.ts'

/** A split takes part of a group into another; a merge puts a group (or part of it) into another. */
export interface CountTransfer {
  kind: 'split' | 'merge'
  transferId: string
  outEntryId: string
  inEntryId: string
  fromAnimalId: string
  toAnimalId: string
  count: number
  at: Instant
  recordedAt: Instant
}

/** The two lines of a transfer, always of equal size, and what the giving group could not give. */
export interface TransferPosting {
  entries: CountEntry[]
  postedCount: number
  excessCount: number
}

/**
 * Both halves of a split or merge: the same number of animals out of one group and into the other, in one pair.
 * No animal is made or lost, whatever the ledger can give.
 *
 * For something about to happen, treat an excess as a refusal; for something that has happened, write what fits and
 * open a discrepancy for the rest.
 *
 * @param fromEntries lines so far of the giving group
 * @param transfer    count in whole animals, more than 0
 * @refuses same-group | count-not-positive | as `listRunningCounts`
 */
export function transferCount(
  fromEntries: readonly CountEntry[],
  transfer: CountTransfer,
): Result<TransferPosting, CountRefusal | 'same-group' | 'count-not-positive'> {
  const { kind, count, fromAnimalId, toAnimalId, transferId, at, recordedAt } = transfer
  if (fromAnimalId === toAnimalId) return refuse('same-group', 'toAnimalId')
  if (!Number.isSafeInteger(count) || count <= 0) return refuse('count-not-positive', 'count')
  const shared = { at, recordedAt, transferId }
  const posting = postCount(fromEntries, {
    ...shared,
    entryId: transfer.outEntryId,
    animalId: fromAnimalId,
    kind: `${kind}-out`,
    delta: -count,
  })
  if (!posting.ok) return posting
  const { entry: out, postedCount, excessCount } = posting.value
  if (!out) return ok({ entries: [], postedCount, excessCount })
  const into: CountEntry = {
    ...shared,
    entryId: transfer.inEntryId,
    animalId: toAnimalId,
    kind: `${kind}-in`,
    delta: postedCount,
  }
  return ok({ entries: [out, into], postedCount, excessCount })
}
