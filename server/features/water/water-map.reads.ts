import type { ConnectionKind } from '../../../shared/domain/connections/water-map.ts'
import type { LifeSupportKind } from '../../../shared/domain/places/life-support-kind.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy } from '../../platform/database/happened-by.ts'

export interface ConnectionReadRow {
  id: string
  code: string
  name: string
  kind: ConnectionKind
  from_body_id: string
  from_code: string
  to_body_id: string
  to_code: string
  in_use_from: Date
  in_use_until: Date | null
  version: number
}

/** All valves and pumps, also those no longer in use, by code. */
export function readConnections(db: Db, id?: string): Promise<ConnectionReadRow[]> {
  return db.query(
    `SELECT c.id, c.code, c.name, c.kind, c.from_body_id, f.code AS from_code, c.to_body_id, t.code AS to_code,
            c.in_use_from, c.in_use_until, c.version
       FROM connections c
       JOIN water_bodies f ON f.id = c.from_body_id
       JOIN water_bodies t ON t.id = c.to_body_id
      WHERE $1::uuid IS NULL OR c.id = $1
      ORDER BY c.code`,
    [id ?? null],
  )
}

export interface ConnectionStateReadRow {
  id: string
  connection_id: string
  open: boolean
  happened_at: Date
  recorded_at: Date
  recorded_by_name: string | null
}

const stateColumns = `s.id, s.connection_id, s.open, s.happened_at, s.recorded_at, p.printed_name AS recorded_by_name`
const stateSource = `
  connection_states s LEFT JOIN people p ON p.id = s.recorded_by
  WHERE NOT EXISTS (SELECT 1 FROM water_voids v WHERE v.connection_state_id = s.id)`

/** The newest entry of every valve and pump at an instant: enough to know the connected water of that instant. */
export function readConnectionStatesAt(db: Db, at: Date): Promise<ConnectionStateReadRow[]> {
  return db.query(
    `SELECT DISTINCT ON (s.connection_id) ${stateColumns} FROM ${stateSource} AND ${happenedBy('s', '$1')}
      ORDER BY s.connection_id, s.happened_at DESC, s.recorded_at DESC, s.id DESC`,
    [at],
  )
}

/** The whole open/shut ledger without what was struck through, for questions over an interval. */
export function readConnectionLedger(db: Db): Promise<ConnectionStateReadRow[]> {
  return db.query(`SELECT ${stateColumns} FROM ${stateSource} ORDER BY s.happened_at, s.recorded_at, s.id`)
}

export interface LifeSupportReadRow {
  id: string
  code: string
  name: string
  kind: LifeSupportKind
  water_body_id: string
  water_body_code: string
  is_on: boolean | null
  since: Date | null
  recorded_by_name: string | null
  version: number
}

/** Machines in use at an instant on these bodies (all bodies when none are named), with their state then. */
export function readLifeSupportAt(
  db: Db,
  at: Date,
  only: { waterBodyIds?: readonly string[]; id?: string } = {},
): Promise<LifeSupportReadRow[]> {
  return db.query(
    `SELECT u.id, u.code, u.name, u.kind, u.water_body_id, b.code AS water_body_code, s.is_on,
            s.happened_at AS since, p.printed_name AS recorded_by_name, u.version
       FROM life_support_units u
       JOIN water_bodies b ON b.id = u.water_body_id
       LEFT JOIN LATERAL (
         SELECT l.is_on, l.happened_at, l.recorded_by FROM life_support_states l
          WHERE l.unit_id = u.id AND ${happenedBy('l', '$1')}
            AND NOT EXISTS (SELECT 1 FROM water_voids v WHERE v.life_support_state_id = l.id)
          ORDER BY l.happened_at DESC, l.recorded_at DESC, l.id DESC LIMIT 1) s ON true
       LEFT JOIN people p ON p.id = s.recorded_by
      WHERE ($2::uuid[] IS NULL OR u.water_body_id = ANY($2)) AND ($3::uuid IS NULL OR u.id = $3)
        AND ($3::uuid IS NOT NULL OR (u.in_use_from <= $1 AND (u.in_use_until IS NULL OR u.in_use_until > $1)))
      ORDER BY u.code`,
    [at, only.waterBodyIds ?? null, only.id ?? null],
  )
}
