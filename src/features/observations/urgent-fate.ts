import type { Notice } from '../../../shared/contracts/notices.contract.ts'
import type { OutboxItem } from '../../lib/outbox-store.ts'

/** What is known of an urgent call; the sheet never says more than that. */
export type UrgentFate = 'sending' | 'not-sent' | 'sent' | 'seen'

/** How long a call may be on its way before it counts as not sent. */
export const patienceMs = 20_000

/**
 * The fate of an urgent call.
 *
 * @param local  the entry while it is on this device; undefined once the server has it
 * @param notice what the server says of it; undefined while nothing was heard
 * @param down   nobody answers at present
 * @param ageMs  time since the call
 */
export function urgentFate(known: {
  local: Pick<OutboxItem, 'state' | 'tries'> | undefined
  notice: Pick<Notice, 'state'> | undefined
  down: boolean
  ageMs: number
}): UrgentFate {
  const { local, notice, down, ageMs } = known
  if (notice?.state === 'seen' || notice?.state === 'sent') return notice.state
  if (notice?.state === 'not-sent') return 'not-sent'
  if (local && (local.state !== 'waiting' || local.tries > 0)) return 'not-sent'
  if (!notice && down) return 'not-sent'
  return ageMs < patienceMs ? 'sending' : 'not-sent'
}
