import { isDeathKind } from '../ledger/count-entry.ts'
import type { CountEntry, CountKind } from '../ledger/count-entry.ts'
import type { CountStatement } from '../ledger/compute-group-count.ts'
import { inTimeOrder } from '../ledger/list-running-counts.ts'
import type { Move } from '../ledger/move.ts'
import type { Instant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'

export type CustodyKind = CountKind | 'move' | 'counted' | 'estimated'

/** One thing that happened to an animal or group while it was kept here. */
export interface CustodyEvent {
  /** Id of the ledger line, move or statement it comes from. */
  eventId: string
  kind: CustodyKind
  at: Instant
  recordedAt: Instant
  /** Whole animals gained (positive) or lost; 0 for a move and for a look. A voided line keeps what it said. */
  delta: number
  /** `null` is outside the house; both `null` when no place changed. Of a death, `from` is where it happened. */
  fromEnclosureId: string | null
  toEnclosureId: string | null
  /** What was found when somebody counted or estimated; absent otherwise. */
  found?: { low: number; high: number }
  transferId: string | null
  voided: boolean
}

/**
 * Everything that happened to one animal or group, in one line each, in the order in which it happened.
 *
 * An arrival is a line of the count ledger and a move into the house at the same instant; it becomes one event with a
 * place, and so does a departure. At one instant gains stand before moves, and moves before losses, as the count
 * ledger orders them.
 *
 * @param entries    count ledger of **one** animal or group, any order, voided lines included
 * @param moves      its moves, any order, voided ones included
 * @param statements what was found when somebody looked, any order
 */
export function listCustody(
  entries: readonly CountEntry[],
  moves: readonly Move[],
  statements: readonly CountStatement[] = [],
): CustodyEvent[] {
  const joined = new Set<string>()
  // Of several losses at one instant, it is the last of the ledger that empties the place
  const order = [...entries].sort(inTimeOrder)
  const arrivalsFirst = [
    ...order.filter((entry) => entry.delta > 0),
    ...order.filter((entry) => entry.delta < 0).reverse(),
  ]
  const counts = arrivalsFirst.map((entry): CustodyEvent => {
    const move = moves.find(
      (one) =>
        !joined.has(one.moveId) &&
        (one.voided ?? false) === (entry.voided ?? false) &&
        compareInstants(one.at, entry.at) === 0 &&
        (entry.delta > 0 ? one.fromEnclosureId === null : one.toEnclosureId === null),
    )
    if (move) joined.add(move.moveId)
    return {
      eventId: entry.entryId,
      kind: entry.kind,
      at: entry.at,
      recordedAt: entry.recordedAt,
      delta: entry.delta,
      fromEnclosureId: move?.fromEnclosureId ?? (isDeathKind(entry.kind) ? placeAt(moves, entry.at) : null),
      toEnclosureId: move?.toEnclosureId ?? null,
      transferId: entry.transferId,
      voided: entry.voided ?? false,
    }
  })
  const plain = { delta: 0, transferId: null }
  const moved = moves
    .filter((move) => !joined.has(move.moveId))
    .map((move): CustodyEvent => {
      const { moveId: eventId, at, recordedAt, fromEnclosureId, toEnclosureId, voided = false } = move
      return { ...plain, eventId, kind: 'move', at, recordedAt, fromEnclosureId, toEnclosureId, voided }
    })
  const looked = statements.map((one): CustodyEvent => {
    const found = one.basis === 'counted' ? { low: one.count, high: one.count } : one
    return {
      ...plain,
      eventId: one.statementId,
      kind: one.basis,
      at: one.at,
      recordedAt: one.recordedAt,
      fromEnclosureId: null,
      toEnclosureId: null,
      found: { low: found.low, high: found.high },
      voided: one.voided ?? false,
    }
  })
  return [...counts, ...moved, ...looked].sort(inOrder)
}

/**
 * Where those stood that were lost at an instant: where the last move that stands, at it or before, had brought them;
 * at the instant at which the last of them left, what they left.
 */
function placeAt(moves: readonly Move[], at: Instant): string | null {
  const last = moves
    .filter((move) => !move.voided && compareInstants(move.at, at) <= 0)
    .reduce<Move | null>((late, move) => (late && compareInstants(late.at, move.at) > 0 ? late : move), null)
  if (last === null) return null
  return last.toEnclosureId ?? (compareInstants(last.at, at) === 0 ? last.fromEnclosureId : null)
}

function inOrder(a: CustodyEvent, b: CustodyEvent): number {
  return (
    compareInstants(a.at, b.at) ||
    Math.sign(b.delta) - Math.sign(a.delta) ||
    (a.eventId < b.eventId ? -1 : Number(a.eventId > b.eventId))
  )
}
