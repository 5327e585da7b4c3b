import { quarantineRecords } from '../../../shared/messages/quarantine-records.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { Animals } from '../animals/index.ts'
import type { ClockFacts } from './read-clocks.ts'

const boundarySource = 'quarantine-case'
const lockSource = 'quarantine-lock'

interface WantedLock {
  animalId: string
  kind: 'boundary' | 'all'
  source: { kind: string; id: string; label: string }
  reason: string
  /** Since when it is in force. */
  at: string
}

const keyOf = (lock: { animalId: string; source: { id: string } }) => `${lock.animalId} ${lock.source.id}`

/** The movement locks that the clocks ask for: the boundary while a case runs, and none at all under each lock. */
function listWanted(facts: ClockFacts): WantedLock[] {
  return facts.cases.flatMap((one) => {
    const clock = facts.clocks.get(one.id)
    const batch = facts.batches.filter((row) => row.case_id === one.id)
    const running = clock && !['cleared', 'recalled', 'transferred'].includes(clock.status)
    const standing = (clock?.locks ?? []).filter(({ liftedAt }) => liftedAt === null)
    return batch.flatMap(({ animal_id: animalId, joined_at }): WantedLock[] => [
      ...(running
        ? [
            {
              animalId,
              kind: 'boundary' as const,
              source: { kind: boundarySource, id: one.id, label: one.number },
              reason: quarantineRecords.inQuarantine,
              at: joined_at.toISOString(),
            },
          ]
        : []),
      ...standing.map(({ eventId, cause, from }) => ({
        animalId,
        kind: 'all' as const,
        source: { kind: lockSource, id: eventId, label: one.number },
        reason: quarantineRecords.lockedBy[cause],
        at: from,
      })),
    ])
  })
}

/**
 * Brings the movement locks of the animals of some cases to what their clocks say now. Called in the transaction of
 * every change of a clock, so that animals alone can judge a move.
 */
export async function settleLocks(parts: { animals: Animals }, tx: Tx, facts: ClockFacts): Promise<void> {
  const { animals } = parts
  const wanted = new Map(listWanted(facts).map((lock) => [keyOf(lock), lock]))
  // asked by where a lock came from: an animal that was struck out of a batch is in it no more, and is held all the same
  const ours = [...facts.cases.map(({ id }) => id), ...facts.events.map(({ id }) => id)]
  const standing = (await animals.questions.locksFrom(ours, tx.at, tx.manager)).filter(
    ({ sourceKind }) => sourceKind === boundarySource || sourceKind === lockSource,
  )
  const has = new Set(standing.map(({ animalId, sourceId }) => `${animalId} ${sourceId}`))
  for (const [key, lock] of wanted) if (!has.has(key)) await animals.service.lockMovement(tx, lock)
  for (const { animalId, sourceId, since } of standing)
    if (!wanted.has(`${animalId} ${sourceId}`))
      await animals.service.liftMovement(tx, {
        sourceId,
        animalId,
        reason: quarantineRecords.lifted,
        at: liftedAt(facts, sourceId) ?? since,
      })
}

/** When a lock ended by the clock: with its case, or when it was lifted; null for one that was voided. */
function liftedAt(facts: ClockFacts, sourceId: string): string | null {
  const head = facts.cases.find(({ id }) => id === sourceId)
  if (head) return head.ended_at?.toISOString() ?? null
  const locks = [...facts.clocks.values()].flatMap((clock) => clock.locks)
  return locks.find(({ eventId }) => eventId === sourceId)?.liftedAt ?? null
}
