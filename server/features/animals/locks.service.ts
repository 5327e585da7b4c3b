import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FacilityService, FactTimes } from '../facility/index.ts'
import type { Ledgers } from './ledgers.ts'
import { readLiveMoves } from './ledgers.repository.ts'
import type { Animal } from './animal.entity.ts'
import * as animals from './animals.repository.ts'
import { readLocks } from './chart.reads.ts'
import * as repository from './watch.repository.ts'

/** What puts a lock on: a quarantine case, a clock event. */
export interface LockSource {
  kind: string
  id: string
  /** As people know it, for example the case number. */
  label: string
}

/** Movement locks: quarantine writes them in its own transaction, moves are judged by them here. */
export function createLocks(parts: { ids: Ids; facility: FacilityService; ledgers: Ledgers }) {
  const subject = (animal: Animal) => ({ kind: 'animal', id: animal.id, label: animal.accession })

  async function write(
    tx: Tx,
    animal: Animal,
    given: { kind: 'boundary' | 'all'; source: LockSource; reason: string },
    times: FactTimes,
  ): Promise<string> {
    const id = parts.ids.next()
    await repository.insertLock(tx, {
      id,
      animalId: animal.id,
      kind: given.kind,
      sourceKind: given.source.kind,
      sourceId: given.source.id,
      sourceLabel: given.source.label,
      reason: given.reason,
      ...times,
    })
    tx.audit({
      action: 'animal.lock-movement',
      subject: subject(animal),
      after: { kind: given.kind, source: given.source.label, reason: given.reason },
    })
    return id
  }

  /** A lock that comes to be known late: what moved under it meanwhile broke it, though nobody could know. */
  async function markMovesSince(tx: Tx, animal: Animal, lock: { from: Date; label: string }): Promise<void> {
    const moves = (await readLiveMoves(tx, animal.id)).filter(
      (move) => !move.automatic && new Date(move.at) >= lock.from,
    )
    const places = await animals.findEnclosures(
      tx,
      moves.flatMap((move) => [move.fromEnclosureId, move.toEnclosureId].filter((id) => id !== null)),
    )
    const codeOf = (id: string | null) => (id === null ? '' : (places.get(id)?.code ?? ''))
    for (const move of moves) {
      if (await repository.isAskedAbout(tx, move.moveId)) continue
      const times = await parts.facility.timesOf(tx, move.at)
      await parts.ledgers.openDiscrepancy(tx, animal, {
        kind: 'moved-under-lock',
        source: { kind: 'move', id: move.moveId },
        facts: {
          from: codeOf(move.fromEnclosureId),
          to: codeOf(move.toEnclosureId),
          by: lock.label,
          reason: animalRefusals.heldUnknown,
        },
        times,
      })
    }
  }

  return {
    /**
     * Locks the movement of an animal from an instant on: `boundary` keeps it inside its quarantine boundary, `all`
     * where it is. The animal's head is locked here, so call it in the order of locks (animal before case).
     * @returns the id of the lock
     */
    async lockMovement(
      tx: Tx,
      given: { animalId: string; kind: 'boundary' | 'all'; source: LockSource; reason: string; at: string },
    ): Promise<string> {
      const animal = (await animals.lockAnimals(tx, [given.animalId])).get(given.animalId)
      if (!animal) throw new Problem('not-found')
      const times = await parts.facility.timesOf(tx, given.at)
      const id = await write(tx, animal, given, times)
      if (given.kind === 'all')
        await markMovesSince(tx, animal, { from: times.happenedAt, label: given.source.label })
      return id
    },

    /** Lifts the locks of a source from an instant on, of all its animals or of one; already lifted ones stay so. */
    async liftMovement(
      tx: Tx,
      given: { sourceId: string; animalId?: string; reason: string; at: string },
    ): Promise<string[]> {
      const times = await parts.facility.timesOf(tx, given.at)
      const locks = await repository.unliftedLocks(tx, given.sourceId, given.animalId ?? null)
      const heads = await animals.lockAnimals(
        tx,
        locks.map((lock) => lock.animal_id),
      )
      for (const lock of locks) {
        const animal = heads.get(lock.animal_id)
        if (!animal) continue
        await repository.insertLockLift(tx, {
          id: parts.ids.next(),
          lockId: lock.id,
          reason: given.reason,
          ...times,
        })
        tx.audit({
          action: 'animal.lift-movement-lock',
          subject: subject(animal),
          after: { reason: given.reason },
        })
      }
      return locks.map((lock) => lock.id)
    },

    /** What was taken out of a locked group is locked with it. */
    async inheritLocks(tx: Tx, from: Animal, to: Animal, times: FactTimes): Promise<void> {
      for (const lock of await readLocks(tx.manager, [from.id], times.happenedAt)) {
        const id = await write(
          tx,
          to,
          {
            kind: lock.kind,
            source: { kind: lock.source_kind, id: lock.source_id, label: lock.source_label },
            reason: lock.reason,
          },
          times,
        )
        // A split entered late: what freed the group in the meantime freed this part too
        const lift = await repository.findLift(tx, lock.id)
        if (lift) await repository.insertLockLift(tx, { ...lift, id: parts.ids.next(), lockId: id })
      }
    },
  }
}

export type LockService = ReturnType<typeof createLocks>
