import { type Result, refuse } from '../result.ts'
import { listStays } from './list-stays.ts'
import type { Move, Stay, StayRefusal } from './move.ts'

/**
 * Whether a move fits the ledger: the animal is in the enclosure it would leave, and the moves already recorded after
 * it still make sense.
 *
 * @param moves the animal's moves so far
 * @param move  the one about to be recorded, at any time
 * @returns the stays as they would be
 * @refuses not-in-enclosure, with the enclosure it is really in (`''` = not in the house) | contradicts-later-move,
 * with that move | as `listStays`
 */
export function checkMove(moves: readonly Move[], move: Move): Result<Stay[], StayRefusal> {
  const before = listStays(moves)
  if (!before.ok) return before
  const after = listStays([...moves, move])
  if (after.ok || after.refusal.code !== 'not-in-enclosure') return after
  const culprit = String(after.refusal.params?.moveId)
  return culprit === move.moveId
    ? after
    : refuse('contradicts-later-move', 'at', { moveId: move.moveId, otherMoveId: culprit })
}
