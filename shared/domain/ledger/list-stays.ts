import { isInstant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import { type Result, ok, refuse } from '../result.ts'
import type { Move, Stay, StayRefusal } from './move.ts'

/**
 * Where one animal was, as intervals, from its moves: never two enclosures at once, none outside its time here.
 *
 * @param moves lines of **one** animal or group, any order; voided ones are left out
 * @refuses not-in-enclosure (a move leaves an enclosure the animal was not in; names where it was) |
 * two-moves-at-one-instant | same-enclosure | no-place-named | several-animals | not-an-instant
 */
export function listStays(moves: readonly Move[]): Result<Stay[], StayRefusal> {
  const live = moves.filter((move) => !move.voided)
  for (const move of live) {
    const fault = findMoveFault(move)
    if (fault) return fault
    if (move.animalId !== live[0]?.animalId) return refuse('several-animals', 'moves')
  }
  const stays: Stay[] = []
  let last: Move | undefined
  for (const move of [...live].sort((a, b) => compareInstants(a.at, b.at))) {
    if (last && compareInstants(last.at, move.at) === 0)
      return refuse('two-moves-at-one-instant', 'at', { moveId: move.moveId, otherMoveId: last.moveId })
    const actual = last?.toEnclosureId ?? null
    if (move.fromEnclosureId !== actual)
      return refuse('not-in-enclosure', 'fromEnclosureId', {
        moveId: move.moveId,
        fromEnclosureId: move.fromEnclosureId ?? '',
        actualEnclosureId: actual ?? '',
      })
    const open = stays.at(-1)
    if (open && open.until === null) open.until = move.at
    if (move.toEnclosureId !== null)
      stays.push({ animalId: move.animalId, enclosureId: move.toEnclosureId, from: move.at, until: null })
    last = move
  }
  return ok(stays)
}

function findMoveFault(move: Move): ReturnType<typeof refuse<StayRefusal>> | null {
  if (!isInstant(move.at)) return refuse<StayRefusal>('not-an-instant', 'at', { moveId: move.moveId })
  if (move.fromEnclosureId === null && move.toEnclosureId === null)
    return refuse<StayRefusal>('no-place-named', 'toEnclosureId', { moveId: move.moveId })
  if (move.fromEnclosureId === move.toEnclosureId)
    return refuse<StayRefusal>('same-enclosure', 'toEnclosureId', { moveId: move.moveId })
  return null
}
