import type { Db } from '../../platform/database/db.ts'

export interface HandoverReadRow {
  id: string
  about: string | null
  words: string
  recorded_at: Date
  recorded_by: string
  by_name: string
  reads: { personId: string; by: string; at: string }[]
}

/** Notes since an instant, or the one with this id, the newest first; each with everybody's first reading of it. */
export function readNotes(
  db: Db,
  filter: { since?: Date; id?: string; limit?: number },
): Promise<HandoverReadRow[]> {
  return db.query(
    `SELECT n.id, n.about, n.words, n.recorded_at, n.recorded_by, w.printed_name AS by_name,
            coalesce((SELECT json_agg(json_build_object('personId', f.recorded_by, 'by', f.printed_name,
                                                        'at', f.recorded_at) ORDER BY f.recorded_at)
                        FROM (SELECT DISTINCT ON (r.recorded_by) r.recorded_by, p.printed_name, r.recorded_at
                                FROM handover_reads r JOIN people p ON p.id = r.recorded_by
                               WHERE r.note_id = n.id ORDER BY r.recorded_by, r.recorded_at) f), '[]') AS reads
       FROM handover_notes n JOIN people w ON w.id = n.recorded_by
      WHERE ($1::uuid IS NULL OR n.id = $1) AND ($2::timestamptz IS NULL OR n.recorded_at >= $2)
      ORDER BY n.recorded_at DESC, n.id DESC LIMIT $3`,
    [filter.id ?? null, filter.since ?? null, filter.limit ?? 20],
  )
}
