/** A lock that quarantine has put on an animal. */
export interface MovementLock {
  /** `boundary`: it may move inside its quarantine boundary. `all`: it may not move at all. */
  kind: 'boundary' | 'all'
}

export type MoveJudgement =
  | { may: 'yes' }
  /** Only a veterinarian, as a documented transfer. */
  | { may: 'documented-transfer' }
  /** Nobody, until the lock is lifted. */
  | { may: 'no' }

/**
 * Whether a move may happen, by the locks on the animal and the quarantine boundaries of the two enclosures.
 *
 * An animal without a lock moves freely: it was never in quarantine or has been cleared. One in quarantine moves inside
 * its boundary; across it only by a documented transfer; under a full lock not at all.
 *
 * @param locks        in force at the time of the move
 * @param fromBoundary name of the quarantine boundary it stands in, null outside any; `undefined` for an arrival
 * @param toBoundary   the same of where it is going; `undefined` for leaving the house
 */
export function judgeMove(
  locks: readonly MovementLock[],
  fromBoundary: string | null | undefined,
  toBoundary: string | null | undefined,
): MoveJudgement {
  if (locks.some((lock) => lock.kind === 'all')) return { may: 'no' }
  if (locks.length === 0) return { may: 'yes' }
  const inside = typeof fromBoundary === 'string' && fromBoundary === toBoundary
  return inside ? { may: 'yes' } : { may: 'documented-transfer' }
}
