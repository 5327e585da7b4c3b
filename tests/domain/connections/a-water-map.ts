import type {
  ConnectionStateEntry,
  WaterBody,
  WaterConnection,
  WaterMap,
} from '../../../shared/domain/connections/water-map.ts'

/** A body named after its enclosure, or a sump or loop when the name starts with `sump` or `loop`. */
export function aBody(waterBodyId: string): WaterBody {
  const kind = waterBodyId.startsWith('sump') ? 'sump' : waterBodyId.startsWith('loop') ? 'loop' : 'enclosure'
  return { waterBodyId, kind, enclosureId: kind === 'enclosure' ? `tank-${waterBodyId}` : null }
}

/** A valve called `a-b` between the bodies a and b. */
export function aValve(bodyAId: string, bodyBId: string): WaterConnection {
  return { connectionId: `${bodyAId}-${bodyBId}`, kind: 'valve', bodyAId, bodyBId }
}

let entries = 0
/** A ledger line for the valve, recorded when it happened. */
export function turned(
  connectionId: string,
  state: 'open' | 'shut',
  at: string,
  recordedAt = at,
): ConnectionStateEntry {
  entries += 1
  return { entryId: `entry-${String(entries).padStart(4, '0')}`, connectionId, state, at, recordedAt }
}

/** Quarantine water QS-C of the demo house in small: Q5, Q6 and a sump; the valve Q5-Q6 shut on 3 April. */
export function aSmallMap(): WaterMap {
  return {
    bodies: ['q5', 'q6', 'sump', 'hall'].map(aBody),
    connections: [aValve('q5', 'sump'), aValve('q5', 'q6')],
    ledger: [
      turned('q5-sump', 'open', '2026-01-01T00:00:00Z'),
      turned('q5-q6', 'open', '2026-03-01T08:00:00Z'),
      turned('q5-q6', 'shut', '2026-04-03T09:40:00Z'),
    ],
  }
}
