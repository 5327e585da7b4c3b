import type { VolumeMethod } from '../../../shared/domain/connections/volume-determination.ts'
import type { Db } from '../../platform/database/db.ts'
import type { RecordedReadRow } from './measurement.reads.ts'

export interface VolumeReadRow extends RecordedReadRow {
  method: VolumeMethod
  gross_volume_litres: number | null
  net_volume_litres: number
  error_percent: number | null
  displacement_subtracted: boolean
  inputs: string
  working: string
  isolation_id: string | null
  note: string | null
  next_check_on: string | null
  recorded_by: string
  water_body_ids: string[]
  codes: string[]
  valves: { connectionId: string; code: string; open: boolean }[]
  confirmed_at: Date | null
  confirmed_by_name: string | null
  confirmation_note: string | null
}

/** Determinations that cover any of these bodies, or all, or the one with this id; the newest first. */
export function readVolumes(
  db: Db,
  by: { waterBodyIds?: readonly string[]; id?: string; withVoided: boolean },
): Promise<VolumeReadRow[]> {
  return db.query(
    `SELECT d.id, d.happened_at, d.happened_on::text, d.recorded_at, p.printed_name AS recorded_by_name,
            v.reason AS void_reason, v.recorded_at AS void_at, w.printed_name AS void_by_name,
            d.method, d.gross_volume_litres, d.net_volume_litres, d.error_percent, d.displacement_subtracted,
            d.inputs, d.working, d.isolation_id, d.note, d.next_check_on::text, d.recorded_by,
            bodies.ids AS water_body_ids, bodies.codes, coalesce(valves.list, '[]') AS valves,
            c.confirmed_at, q.printed_name AS confirmed_by_name, c.note AS confirmation_note
       FROM volume_determinations d
       JOIN LATERAL (
         SELECT array_agg(b.id ORDER BY b.id) AS ids, array_agg(b.code ORDER BY b.code) AS codes
           FROM volume_determination_bodies x JOIN water_bodies b ON b.id = x.water_body_id
          WHERE x.determination_id = d.id) bodies ON true
       LEFT JOIN LATERAL (
         SELECT json_agg(json_build_object('connectionId', k.id, 'code', k.code, 'open', x.open) ORDER BY k.code) AS list
           FROM volume_determination_valves x JOIN connections k ON k.id = x.connection_id
          WHERE x.determination_id = d.id) valves ON true
       LEFT JOIN people p ON p.id = d.recorded_by
       LEFT JOIN water_voids v ON v.determination_id = d.id
       LEFT JOIN people w ON w.id = v.recorded_by
       LEFT JOIN volume_confirmations c ON c.determination_id = d.id
       LEFT JOIN people q ON q.id = c.confirmed_by
      WHERE ($1::uuid[] IS NULL OR EXISTS (SELECT 1 FROM volume_determination_bodies x
               WHERE x.determination_id = d.id AND x.water_body_id = ANY($1)))
        AND ($2::uuid IS NULL OR d.id = $2)
        AND ($3 OR v.id IS NULL)
      ORDER BY d.happened_at DESC, d.id DESC`,
    [by.waterBodyIds ?? null, by.id ?? null, by.withVoided],
  )
}

export interface IsolationReadRow extends RecordedReadRow {
  note: string | null
  water_body_ids: string[]
  codes: string[]
  test_method: string | null
  test_passed: boolean | null
  test_at: Date | null
  test_by_name: string | null
  ended_at: Date | null
}

/** Isolations that name any of these bodies, or all, or the one with this id; without those struck through. */
export function readIsolations(
  db: Db,
  by: { waterBodyIds?: readonly string[]; id?: string; withVoided?: boolean },
): Promise<IsolationReadRow[]> {
  return db.query(
    `SELECT i.id, i.happened_at, i.happened_on::text, i.recorded_at, p.printed_name AS recorded_by_name,
            v.reason AS void_reason, v.recorded_at AS void_at, w.printed_name AS void_by_name, i.note,
            bodies.ids AS water_body_ids, bodies.codes,
            t.method AS test_method, t.passed AS test_passed, t.happened_at AS test_at,
            tp.printed_name AS test_by_name, e.happened_at AS ended_at
       FROM isolations i
       JOIN LATERAL (
         SELECT array_agg(b.id ORDER BY b.id) AS ids, array_agg(b.code ORDER BY b.code) AS codes
           FROM isolation_bodies x JOIN water_bodies b ON b.id = x.water_body_id
          WHERE x.isolation_id = i.id) bodies ON true
       LEFT JOIN LATERAL (
         SELECT x.method, x.passed, x.happened_at, x.recorded_by FROM isolation_tests x
          WHERE x.isolation_id = i.id ORDER BY x.happened_at DESC, x.recorded_at DESC, x.id DESC LIMIT 1) t ON true
       LEFT JOIN people tp ON tp.id = t.recorded_by
       LEFT JOIN isolation_ends e ON e.isolation_id = i.id
       LEFT JOIN people p ON p.id = i.recorded_by
       LEFT JOIN water_voids v ON v.isolation_id = i.id
       LEFT JOIN people w ON w.id = v.recorded_by
      WHERE ($1::uuid[] IS NULL OR EXISTS (SELECT 1 FROM isolation_bodies x
               WHERE x.isolation_id = i.id AND x.water_body_id = ANY($1)))
        AND ($2::uuid IS NULL OR i.id = $2)
        AND ($3 OR v.id IS NULL)
      ORDER BY i.happened_at DESC, i.id DESC`,
    [by.waterBodyIds ?? null, by.id ?? null, by.withVoided ?? false],
  )
}
