import type { Db } from '../../platform/database/db.ts'

export interface NoticeReadRow {
  id: string
  observation_id: string
  enclosure_code: string
  enclosure_name: string
  case_number: string | null
  case_name: string | null
  words: string
  happened_at: Date
  recorded_by: string | null
  recorded_by_name: string | null
  deliveries: {
    name: string
    address: string
    outcome: 'sent' | 'failed'
    error: string | null
    at: string
  }[]
  acts: { kind: 'seen' | 'telephoned'; by: string | null; at: string; whom: string | null }[]
}

/** A call is seen when somebody else than whoever raised it says so. */
export const seenByAnother = (act: string): string => `${act}.recorded_by IS DISTINCT FROM n.recorded_by`

/** Urgent calls with what became of them: one, or the newest hundred. */
export function readNotices(
  db: Db,
  filter: { id?: string; unseen?: boolean } = {},
): Promise<NoticeReadRow[]> {
  return db.query(
    `SELECT n.id, n.observation_id, e.code AS enclosure_code, e.name AS enclosure_name, n.case_number,
            (SELECT c.name FROM quarantine_cases c WHERE c.number = n.case_number) AS case_name,
            n.words, n.happened_at, n.recorded_by, w.printed_name AS recorded_by_name,
            coalesce((SELECT json_agg(json_build_object('name', d.to_name, 'address', d.to_address,
                               'outcome', d.outcome, 'error', d.error, 'at', d.recorded_at) ORDER BY d.recorded_at)
                        FROM notice_deliveries d WHERE d.notice_id = n.id), '[]') AS deliveries,
            coalesce((SELECT json_agg(json_build_object('kind', a.kind, 'by', p.printed_name, 'at', a.happened_at,
                               'whom', a.whom) ORDER BY a.happened_at)
                        FROM notice_acts a LEFT JOIN people p ON p.id = a.recorded_by
                       WHERE a.notice_id = n.id AND (a.kind <> 'seen' OR ${seenByAnother('a')})), '[]') AS acts
       FROM notices n
       JOIN enclosures e ON e.id = n.enclosure_id
       LEFT JOIN people w ON w.id = n.recorded_by
      WHERE ($1::uuid IS NULL OR n.id = $1)
        AND (NOT $2::boolean OR NOT EXISTS (SELECT 1 FROM notice_acts s
                                             WHERE s.notice_id = n.id AND s.kind = 'seen'
                                               AND ${seenByAnother('s')}))
      ORDER BY n.happened_at DESC LIMIT 100`,
    [filter.id ?? null, filter.unseen ?? false],
  )
}
