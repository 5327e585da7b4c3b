import { findUnbalancedTransfers } from '../../../shared/domain/ledger/find-unbalanced-transfers.ts'
import { listRunningCounts } from '../../../shared/domain/ledger/list-running-counts.ts'
import { listStays } from '../../../shared/domain/ledger/list-stays.ts'
import type { Db } from '../../platform/database/db.ts'
import { readStored } from './verify-animals.reads.ts'

/** Something stored that does not follow from its ledger. */
export interface AnimalFault {
  /** Accession number, or the id of a transfer. */
  at: string
  what: 'stays' | 'moves' | 'count' | 'count-sum' | 'transfer' | 'description'
  detail: string
}

export interface AnimalReport {
  animals: number
  entries: number
  moves: number
  faults: AnimalFault[]
}

/**
 * Works out every animal's stays from its moves and its count from its ledger again, with the same pure rules as the
 * browser, and compares them with what the database holds and sums.
 */
export async function verifyAnimals(db: Db): Promise<AnimalReport> {
  const stored = await readStored(db)
  const faults: AnimalFault[] = []
  for (const one of stored) {
    const note = (what: AnimalFault['what'], detail: string) =>
      faults.push({ at: one.accession, what, detail })
    const stays = listStays(one.moves)
    if (!stays.ok) note('moves', `${stays.refusal.code} ${JSON.stringify(stays.refusal.params ?? {})}`)
    else {
      const worked = stays.value.map(({ enclosureId, from, until }) => ({ enclosureId, from, until }))
      if (JSON.stringify(worked) !== JSON.stringify(one.stays))
        note('stays', `stored ${JSON.stringify(one.stays)}, from the moves ${JSON.stringify(worked)}`)
    }
    const running = listRunningCounts(one.entries)
    if (!running.ok) note('count', `${running.refusal.code} ${JSON.stringify(running.refusal.params ?? {})}`)
    else if ((running.value.at(-1)?.balance ?? 0) !== one.ledger)
      note(
        'count-sum',
        `summed ${String(one.ledger)}, from the ledger ${String(running.value.at(-1)?.balance ?? 0)}`,
      )
    if (one.head !== one.newest) note('description', `stored ${one.head}, newest ${one.newest}`)
  }
  for (const transferId of findUnbalancedTransfers(stored.flatMap((one) => one.entries)))
    faults.push({ at: transferId, what: 'transfer', detail: 'its two halves do not balance' })
  return {
    animals: stored.length,
    entries: stored.reduce((sum, one) => sum + one.entries.length, 0),
    moves: stored.reduce((sum, one) => sum + one.moves.length, 0),
    faults,
  }
}
