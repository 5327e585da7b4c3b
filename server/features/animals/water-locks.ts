import type { LocksOnMove } from '../../../shared/domain/animals/judge-move.ts'
import { animalRefusals } from '../../../shared/messages/animal-refusals.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { WaterQuestions } from '../water/index.ts'
import * as animals from './animals.repository.ts'
import { readLocks } from './chart.reads.ts'
import type { LockReadRow } from './chart.reads.ts'

export interface MovePlaces {
  /** The animal that moves; null when it is new. */
  animalId: string | null
  /** Enclosure it leaves; null from outside. */
  fromId: string | null
  /** Enclosure it comes to; null to outside. */
  toId: string | null
  at: Date
}

export interface BearingLocks extends LocksOnMove {
  own: LockReadRow[]
  leaves: LockReadRow[]
  enters: LockReadRow[]
  /** Full locks that stand now and began after the time of the move: an entry after the event must not slip past them. */
  later: LockReadRow[]
}

/** Every lock once, as people know it: "Q-003: held". */
export const sayLocks = (locks: readonly LockReadRow[]): string =>
  [
    ...new Set(
      locks.map((lock) => animalRefusals.openRequest({ label: lock.source_label, reason: lock.reason })),
    ),
  ].join('; ')

/** The numbers of the cases that locks come from. */
export const labelsOf = (locks: readonly LockReadRow[]): string =>
  [...new Set(locks.map((lock) => lock.source_label))].join(', ')

/**
 * Which locks bear on a move: those on the animal, and those on the animals whose water it leaves or comes to. An animal
 * of no case carries the water of a case out with it as well as one of the batch does.
 */
export function createWaterLocks(parts: { water: WaterQuestions }) {
  async function othersIn(tx: Tx, enclosureId: string | null, given: { at: Date; but: string | null }) {
    if (enclosureId === null) return []
    const sharing = await parts.water.enclosuresSharing(enclosureId, given.at, tx.manager)
    return animals.findOthersIn(tx, sharing, given)
  }

  /**
   * Came into the water of a case and never belonged to one: the end of that case says nothing of it. Boundary locks
   * of those that it met, as they stood when it came.
   */
  async function metOnArrival(tx: Tx, animalId: string, at: Date): Promise<LockReadRow[]> {
    const found: LockReadRow[] = []
    for (const { enclosure_id, since } of await animals.findArrivalsInBoundary(tx, animalId, at)) {
      const others = await othersIn(tx, enclosure_id, { at: since, but: animalId })
      found.push(...(await readLocks(tx.manager, others, since)).filter(({ kind }) => kind === 'boundary'))
    }
    return found
  }

  return {
    async bearingOn(tx: Tx, { animalId, fromId, toId, at }: MovePlaces): Promise<BearingLocks> {
      const left = await othersIn(tx, fromId, { at, but: animalId })
      const there = await othersIn(tx, toId, { at, but: animalId })
      const self = animalId === null ? [] : [animalId]
      const then = await readLocks(tx.manager, [...self, ...left, ...there], at)
      const on = (ids: readonly string[]) => then.filter((lock) => ids.includes(lock.animal_id))
      // Its own clearance let it out of this water; a hold on the water stands all the same
      const cleared = animalId !== null && (await animals.wasClearedHere(tx, animalId, at))
      const known = new Set(then.map(({ id }) => id))
      const now = at < tx.at ? await readLocks(tx.manager, [...self, ...left, ...there], tx.at) : []
      const met = animalId === null ? [] : await metOnArrival(tx, animalId, at)
      return {
        own: on(self),
        leaves: [...on(left).filter(({ kind }) => kind === 'all' || !cleared), ...met],
        enters: on(there),
        later: now.filter((lock) => lock.kind === 'all' && !known.has(lock.id)),
      }
    },
  }
}

export type WaterLocks = ReturnType<typeof createWaterLocks>
