/** A lock that quarantine has put on an animal. */
export interface MovementLock {
  /** `boundary`: it may move inside its quarantine boundary. `all`: it may not move at all. */
  kind: 'boundary' | 'all'
}

/** The locks that bear on a move, in force at the time of it. */
export interface LocksOnMove {
  /** On the animal itself. */
  own: readonly MovementLock[]
  /** On other animals in the water that it leaves, and in all water connected with that. */
  leaves: readonly MovementLock[]
  /** The same of the water that it comes to. */
  enters: readonly MovementLock[]
}

export type MoveJudgement =
  | { may: 'yes' }
  /** Only a veterinarian, as a documented transfer. */
  | { may: 'documented-transfer' }
  /** Nobody, until the lock is lifted. */
  | { may: 'no' }

/**
 * Whether a move may happen, by the locks on the animal and on the water, and the quarantine boundaries of the two
 * enclosures.
 *
 * An animal without a lock that leaves water without one moves freely: it was never in quarantine or has been cleared.
 * One in quarantine, or out of water in which others are, moves inside its boundary; across it only by a documented
 * transfer. Under a full lock, out of water under one and into it, nothing moves at all. Into the water of a case that
 * runs anything may come: that is an addition, and the clock of the case says what follows.
 *
 * @param locks        of the animal and of the water
 * @param fromBoundary name of the quarantine boundary it stands in, null outside any; `undefined` for an arrival
 * @param toBoundary   the same of where it is going; `undefined` for leaving the house
 */
export function judgeMove(
  locks: LocksOnMove,
  fromBoundary: string | null | undefined,
  toBoundary: string | null | undefined,
): MoveJudgement {
  const { own, leaves, enters } = locks
  if ([...own, ...leaves, ...enters].some((lock) => lock.kind === 'all')) return { may: 'no' }
  if (own.length + leaves.length === 0) return { may: 'yes' }
  const inside = typeof fromBoundary === 'string' && fromBoundary === toBoundary
  return inside ? { may: 'yes' } : { may: 'documented-transfer' }
}
