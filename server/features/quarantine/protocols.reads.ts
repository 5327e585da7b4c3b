import type { ProtocolContent } from '../../../shared/domain/protocol/protocol-content.ts'
import type { Db } from '../../platform/database/db.ts'

export interface ProtocolVersionReadRow {
  id: string
  code: string
  version: number
  name: string
  content: ProtocolContent
  source: string
  mark: string
  reason: string | null
  proposed_at: Date
  proposed_by_name: string | null
  confirmed_at: Date | null
  confirmed_by_name: string | null
  /** The newest confirmed version of its protocol; where none is confirmed, the first. */
  current: boolean
}

export function readProtocolVersions(
  db: Db,
  filter: { id?: string; code?: string; version?: number } = {},
): Promise<ProtocolVersionReadRow[]> {
  return db.query(
    `SELECT * FROM (
       SELECT v.id, p.code, v.version, v.name, v.content, v.source, v.mark, v.reason, v.proposed_at,
              b.printed_name AS proposed_by_name, f.confirmed_at, k.printed_name AS confirmed_by_name,
              v.version = coalesce(
                max(v.version) FILTER (WHERE f.id IS NOT NULL) OVER (PARTITION BY p.id), 1) AS current
         FROM protocol_versions v
         JOIN protocols p ON p.id = v.protocol_id
         LEFT JOIN people b ON b.id = v.proposed_by
         LEFT JOIN protocol_confirmations f ON f.protocol_version_id = v.id
         LEFT JOIN people k ON k.id = f.confirmed_by) r
      WHERE ($1::uuid IS NULL OR r.id = $1) AND ($2::text IS NULL OR r.code = $2)
        AND ($3::integer IS NULL OR r.version = $3)
      ORDER BY r.code, r.version DESC`,
    [filter.id ?? null, filter.code ?? null, filter.version ?? null],
  )
}
