import { type Instant } from '../time/instant.ts'
import { compareInstants } from '../time/instant-arithmetic.ts'
import type { ConnectionState, ConnectionStateEntry } from './water-map.ts'

/**
 * Whether a valve stood open (or a pump ran) at an instant, by the open/shut ledger.
 *
 * The newest entry at or before the instant counts; of two at the same instant the one recorded later, so that the
 * order in which rows are read never matters.
 *
 * @returns `unknown` before the first entry. Callers treat unknown as joined: not knowing that a valve is shut is no
 * reason to think the animals behind it safe.
 */
export function connectionStateAt(
  connectionId: string,
  ledger: readonly ConnectionStateEntry[],
  at: Instant,
): ConnectionState | 'unknown' {
  let newest: ConnectionStateEntry | undefined
  for (const entry of ledger) {
    if (entry.connectionId !== connectionId || entry.voided || compareInstants(entry.at, at) > 0) continue
    if (!newest || isLater(entry, newest)) newest = entry
  }
  return newest?.state ?? 'unknown'
}

function isLater(a: ConnectionStateEntry, b: ConnectionStateEntry): boolean {
  const byTime = compareInstants(a.at, b.at) || compareInstants(a.recordedAt, b.recordedAt)
  return byTime === 0 ? a.entryId > b.entryId : byTime > 0
}
