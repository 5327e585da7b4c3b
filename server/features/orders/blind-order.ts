import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Actor } from '../../platform/http/request-context.ts'
import type { SignedOrder } from './order-content.ts'
import { blindKeys } from './orders.present.ts'
import type { OrderReadRow } from './orders.reads.ts'

/** Whether somebody's roles let them calculate a second time at all. */
export const mayBeSecond = (actor: Actor): boolean =>
  decide('dose.calculate-second', actor.roles, { 'another-person': true }).allowed

/**
 * Whether an order is shown to somebody without its amount: they may be the second person of a dose that is still to
 * come, have not been shown it, and neither began nor signed it.
 */
export function isBlindTo(row: OrderReadRow, now: string, actor: Actor): boolean {
  const keys = blindKeys(row, now)
  if (keys.length === 0 || row.writers.some((id) => id === actor.personId)) return false
  if (!mayBeSecond(actor)) return false
  const known = new Set(
    row.knowers.filter(({ personId }) => personId === actor.personId).map(({ key }) => key),
  )
  return !keys.every((key) => known.has(key))
}

/** What was signed, without the amount and all that it could be read off from. */
export function withoutAmount(content: SignedOrder | null) {
  return content && { ...content, amount: null, working: [], facts: null }
}
