import type { CaseClock } from './case-clock.ts'

/**
 * Whether a whole batch may go to the water of another quarantine before its clearance (rule K05): only to one whose
 * days are as few or fewer, so that no animal further along meets one less far. Neither may be locked.
 *
 * @returns the reason against it, or null
 */
export function findBatchTransferObstacle(
  from: CaseClock,
  to: CaseClock,
): 'locked' | 'not-closed' | 'further-along' | 'ended' | null {
  const isEnded = ({ status }: CaseClock) => ['cleared', 'recalled', 'transferred'].includes(status)
  if (isEnded(from) || isEnded(to)) return 'ended'
  if (from.locks.some(({ liftedAt }) => liftedAt === null)) return 'locked'
  if (to.locks.some(({ liftedAt }) => liftedAt === null)) return 'locked'
  if (from.day0On === null || to.day0On === null) return 'not-closed'
  return to.day0On >= from.day0On ? null : 'further-along'
}
