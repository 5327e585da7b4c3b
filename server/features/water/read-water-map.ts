import type { WaterMap } from '../../../shared/domain/connections/water-map.ts'
import type { Db } from '../../platform/database/db.ts'
import { timeSeenAt } from '../../platform/database/happened-by.ts'
import { placeReads } from '../enclosures/index.ts'
import type { WaterBodyReadRow } from '../enclosures/index.ts'
import { readConnectionLedger, readConnections, readConnectionStatesAt } from './water-map.reads.ts'
import type { ConnectionReadRow, ConnectionStateReadRow } from './water-map.reads.ts'

/** The map as the engines take it, with the rows it was made from. */
export interface WaterMapRows {
  map: WaterMap
  bodies: WaterBodyReadRow[]
  connections: ConnectionReadRow[]
  states: ConnectionStateReadRow[]
}

const span = (row: { in_use_from: Date; in_use_until: Date | null }) => ({
  existsFrom: row.in_use_from.toISOString(),
  ...(row.in_use_until ? { existsUntil: row.in_use_until.toISOString() } : {}),
})

function mapOf(
  bodies: WaterBodyReadRow[],
  connections: ConnectionReadRow[],
  states: ConnectionStateReadRow[],
  at?: Date,
): WaterMapRows {
  const map: WaterMap = {
    bodies: bodies.map((row) => ({
      waterBodyId: row.id,
      kind: row.kind,
      enclosureId: row.enclosure_id,
      ...span(row),
    })),
    connections: connections.map((row) => ({
      connectionId: row.id,
      kind: row.kind,
      bodyAId: row.from_body_id,
      bodyBId: row.to_body_id,
      ...span(row),
    })),
    ledger: states.map((row) => ({
      entryId: row.id,
      connectionId: row.connection_id,
      state: row.open ? ('open' as const) : ('shut' as const),
      at: (at ? timeSeenAt(row, at) : row.happened_at).toISOString(),
      recordedAt: row.recorded_at.toISOString(),
    })),
  }
  return { map, bodies, connections, states }
}

/** The map with the newest state of each valve and pump at an instant. It answers for that instant only. */
export async function readWaterMapAt(db: Db, at: Date): Promise<WaterMapRows> {
  return mapOf(
    await placeReads.readWaterBodies(db),
    await readConnections(db),
    await readConnectionStatesAt(db, at),
    at,
  )
}

/** The map with its whole ledger, for questions over an interval. */
export async function readWholeWaterMap(db: Db): Promise<WaterMap> {
  const rows = mapOf(
    await placeReads.readWaterBodies(db),
    await readConnections(db),
    await readConnectionLedger(db),
  )
  return rows.map
}
