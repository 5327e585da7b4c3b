import type { DiscrepancyKind } from '../../../shared/domain/animals/discrepancy.ts'
import { discrepancyKinds } from '../../../shared/domain/animals/discrepancy.ts'
import { checkMove } from '../../../shared/domain/ledger/check-move.ts'
import { computeGroupCount } from '../../../shared/domain/ledger/compute-group-count.ts'
import type { CountKind } from '../../../shared/domain/ledger/count-entry.ts'
import { enclosureAt } from '../../../shared/domain/ledger/list-inhabitants.ts'
import { listRunningCounts } from '../../../shared/domain/ledger/list-running-counts.ts'
import { listStays } from '../../../shared/domain/ledger/list-stays.ts'
import type { Stay } from '../../../shared/domain/ledger/move.ts'
import { postCount } from '../../../shared/domain/ledger/post-count.ts'
import type { Result } from '../../../shared/domain/result.ts'
import type { Tx } from '../../platform/database/transactions.ts'
import type { Ids } from '../../platform/ids.ts'
import type { FactTimes } from '../facility/index.ts'
import type { Animal } from './animal.entity.ts'
import * as repository from './ledgers.repository.ts'
import { insertDiscrepancy } from './watch.repository.ts'

/** A stored ledger that the rules cannot read is a bug or a hand in the database, never an answer. */
export function sound<T>(result: Result<T>): T {
  if (result.ok) return result.value
  throw new Error(
    `A stored ledger is unsound: ${result.refusal.code} ${JSON.stringify(result.refusal.params)}`,
  )
}

/** Later than anything that is recorded. */
const endOfTime = new Date('9999-12-31T00:00:00Z')

export interface CountFact {
  /** Id of the line to write. */
  id: string
  kind: CountKind
  /** Whole animals, signed, as it happened. */
  delta: number
  reason: string | null
  transferId?: string
}

export interface Posted {
  entryId: string | null
  postedCount: number
  excessCount: number
}

/** The count ledger and the places of animals: how every use case writes them. The animal's head is locked before. */
export function createLedgers(parts: { ids: Ids }) {
  async function openDiscrepancy(
    tx: Tx,
    animal: Animal,
    given: {
      kind: DiscrepancyKind
      source: { kind: string; id: string }
      facts: Record<string, string | number>
      times: FactTimes
    },
  ): Promise<string> {
    const id = parts.ids.next()
    const forRole = discrepancyKinds[given.kind]
    await insertDiscrepancy(tx, {
      id,
      animalId: animal.id,
      kind: given.kind,
      forRole,
      sourceKind: given.source.kind,
      sourceId: given.source.id,
      facts: given.facts,
      ...given.times,
    })
    tx.audit({
      action: 'discrepancy.open',
      subject: { kind: 'animal', id: animal.id, label: animal.accession },
      after: { kind: given.kind, forRole, ...given.facts },
    })
    return id
  }

  /** Where an animal was, with the move that began each stay. */
  async function staysOf(tx: Tx, animalId: string): Promise<(Stay & { moveId: string })[]> {
    const moves = await repository.readLiveMoves(tx, animalId)
    const begunBy = new Map(moves.map((move) => [move.at, move.moveId]))
    return sound(listStays(moves)).map((stay) => ({ ...stay, moveId: begunBy.get(stay.from) ?? '' }))
  }

  async function rebuildStays(tx: Tx, animalId: string): Promise<void> {
    await repository.replaceStays(tx, animalId, await staysOf(tx, animalId))
  }

  /** Enclosure at an instant; null outside the house. */
  async function placeAt(tx: Tx, animalId: string, at: Date): Promise<string | null> {
    return enclosureAt(await staysOf(tx, animalId), at.toISOString())
  }

  /** The count as known at an instant. */
  async function countAt(tx: Tx, animalId: string, at: Date) {
    const entries = await repository.readEntries(tx, animalId)
    const statements = await repository.readStatements(tx, animalId)
    return sound(computeGroupCount(entries, statements, at.toISOString()))
  }

  /** Ends the stay when nothing is left, and takes that back when something is left after all. */
  async function settlePlace(tx: Tx, animal: Animal, source: { kind: string; id: string }): Promise<void> {
    const running = sound(listRunningCounts(await repository.readEntries(tx, animal.id)))
    const last = running.at(-1)
    if (!last) return
    const moves = await repository.readLiveMoves(tx, animal.id)
    const lastMove = moves.at(-1)
    const left = await countAt(tx, animal.id, endOfTime)
    const gone = last.balance === 0 && (left.basis === 'counted' || left.high === 0)
    const emptied = lastMove?.automatic && lastMove.toEnclosureId === null ? lastMove : null
    if (emptied && gone && emptied.at === last.entry.at) return
    if (emptied) {
      await repository.strike(tx, {
        id: parts.ids.next(),
        what: 'moveId',
        rowId: emptied.moveId,
        reason: gone ? 'The last one left at another time' : 'Not all had left',
      })
      await rebuildStays(tx, animal.id)
    }
    const live = moves.filter((move) => move !== emptied)
    if (!gone || live.at(-1)?.toEnclosureId === null || live.length === 0) return
    const entry = await repository.findEntry(tx, last.entry.entryId)
    if (!entry) return
    const { happenedAt, happenedOn } = entry
    const times = { happenedAt, happenedOn, recordedAt: tx.at, recordedBy: tx.actor.personId }
    const from = enclosureAt(sound(listStays(live)), last.entry.at)
    const departure = {
      moveId: parts.ids.next(),
      animalId: animal.id,
      fromEnclosureId: from,
      toEnclosureId: null,
      at: last.entry.at,
      recordedAt: tx.at.toISOString(),
    }
    if (from === null || !checkMove(live, departure).ok) {
      await openDiscrepancy(tx, animal, { kind: 'place-contradicted', source, facts: {}, times })
      return
    }
    await repository.insertMove(tx, {
      id: departure.moveId,
      animalId: animal.id,
      kind: 'departure',
      fromEnclosureId: from,
      toEnclosureId: null,
      reason: null,
      documentedTransfer: null,
      againstRule: null,
      automatic: true,
      ...times,
    })
    await rebuildStays(tx, animal.id)
  }

  /**
   * Posts a fact to the count ledger: what fits is written, what does not is the excess, which the caller refuses or
   * keeps as a discrepancy. The place is settled by the caller, after all lines of the change are written.
   */
  async function post(tx: Tx, animal: Animal, fact: CountFact, times: FactTimes): Promise<Posted> {
    const posting = sound(
      postCount(await repository.readEntries(tx, animal.id), {
        entryId: fact.id,
        animalId: animal.id,
        kind: fact.kind,
        delta: fact.delta,
        at: times.happenedAt.toISOString(),
        recordedAt: times.recordedAt.toISOString(),
        transferId: fact.transferId ?? null,
      }),
    )
    if (posting.entry)
      await repository.insertEntry(tx, {
        id: fact.id,
        animalId: animal.id,
        kind: fact.kind,
        delta: posting.entry.delta,
        transferId: fact.transferId ?? null,
        reason: fact.reason,
        ...times,
      })
    return {
      entryId: posting.entry ? fact.id : null,
      postedCount: posting.postedCount,
      excessCount: posting.excessCount,
    }
  }

  return { openDiscrepancy, staysOf, rebuildStays, placeAt, countAt, settlePlace, post }
}

export type Ledgers = ReturnType<typeof createLedgers>
