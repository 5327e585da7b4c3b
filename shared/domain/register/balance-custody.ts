import type { CountKind } from '../ledger/count-entry.ts'
import { ok, refuse, type Result } from '../result.ts'
import type { Instant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import type { CustodyEvent } from './list-custody.ts'

export interface BalancedEvent extends CustodyEvent {
  /** Animals held after the event; a voided line changes nothing and repeats the count before it. */
  countAfter: number
}

export interface KindTotal {
  kind: CountKind
  /** Ledger lines of the kind. */
  lines: number
  /** Whole animals, signed as in the ledger. */
  delta: number
}

/** A history that adds up: opening + gained − lost = closing, and the kinds sum to the same. */
export interface BalancedCustody {
  opening: number
  closing: number
  gained: number
  lost: number
  totals: KindTotal[]
  events: BalancedEvent[]
}

/**
 * The events of a period with the count after each, and the sums that prove them.
 *
 * @param events all events of one animal or group, in order, as `listCustody` gives them
 * @param period from (included) and until (excluded); absent ends are open. Events outside it go into the balances
 * @refuses count-below-zero, with the event at which the sum first went below zero: the ledger itself is wrong
 */
export function balanceCustody(
  events: readonly CustodyEvent[],
  period: { from?: Instant | undefined; until?: Instant | undefined } = {},
): Result<BalancedCustody, 'count-below-zero'> {
  const { from, until } = period
  const totals = new Map<CountKind, KindTotal>()
  const inside: BalancedEvent[] = []
  let [opening, count, gained, lost] = [0, 0, 0, 0]
  for (const event of events) {
    if (until !== undefined && compareInstants(event.at, until) >= 0) break
    const counts = !event.voided && event.delta !== 0
    if (counts) count += event.delta
    if (count < 0) return refuse('count-below-zero', 'events', { eventId: event.eventId, count })
    if (from !== undefined && compareInstants(event.at, from) < 0) {
      opening = count
      continue
    }
    inside.push({ ...event, countAfter: count })
    if (!counts) continue
    gained += Math.max(0, event.delta)
    lost += Math.max(0, -event.delta)
    const kind = event.kind as CountKind
    const so = totals.get(kind) ?? { kind, lines: 0, delta: 0 }
    totals.set(kind, { kind, lines: so.lines + 1, delta: so.delta + event.delta })
  }
  return ok({ opening, closing: count, gained, lost, totals: [...totals.values()], events: inside })
}
