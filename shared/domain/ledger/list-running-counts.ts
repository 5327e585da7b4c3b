import { isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import { type CountEntry, countKinds } from './count-entry.ts'

/** A ledger line with the group's count after it. */
export interface RunningCount {
  entry: CountEntry
  balance: number
}

export type CountRefusal =
  | 'not-an-instant'
  | 'delta-not-whole'
  | 'delta-sign-does-not-fit-kind'
  | 'count-below-zero'
  | 'several-animals'

/**
 * The count of one group after each of its ledger lines, in time order.
 *
 * At one instant arrivals stand before departures, so that animals which came and were moved on in the same minute do
 * not make the count dip below zero on paper. The order in which lines were read or recorded makes no difference.
 *
 * @param entries lines of **one** group, any order; voided ones are left out
 * @refuses not-an-instant | delta-not-whole | delta-sign-does-not-fit-kind | several-animals | count-below-zero, with
 * the entry at which the sum first went below zero
 */
export function listRunningCounts(entries: readonly CountEntry[]): Result<RunningCount[], CountRefusal> {
  const live = entries.filter((entry) => !entry.voided)
  for (const entry of live) {
    const wrong = findEntryFault(entry)
    if (wrong) return wrong
    if (entry.animalId !== live[0]?.animalId) return refuse('several-animals', 'entries')
  }
  let balance = 0
  const running: RunningCount[] = []
  for (const entry of [...live].sort(inTimeOrder)) {
    balance += entry.delta
    if (balance < 0)
      return refuse('count-below-zero', 'entries', { entryId: entry.entryId, balance, at: entry.at })
    running.push({ entry, balance })
  }
  return ok(running)
}

/** Order of ledger lines: by instant, arrivals first, then by id. Total, so every reader sees the same order. */
export function inTimeOrder(a: CountEntry, b: CountEntry): number {
  return (
    compareInstants(a.at, b.at) ||
    Number(b.delta > 0) - Number(a.delta > 0) ||
    (a.entryId < b.entryId ? -1 : Number(a.entryId > b.entryId))
  )
}

/** What is wrong with a single line, if anything. */
export function findEntryFault(entry: CountEntry): ReturnType<typeof refuse<CountRefusal>> | null {
  if (!isInstant(entry.at)) return refuse<CountRefusal>('not-an-instant', 'at', { entryId: entry.entryId })
  if (!Number.isSafeInteger(entry.delta) || entry.delta === 0)
    return refuse<CountRefusal>('delta-not-whole', 'delta', { entryId: entry.entryId })
  const way = countKinds[entry.kind]
  if ((way === 'in' && entry.delta < 0) || (way === 'out' && entry.delta > 0))
    return refuse<CountRefusal>('delta-sign-does-not-fit-kind', 'delta', { entryId: entry.entryId })
  return null
}
