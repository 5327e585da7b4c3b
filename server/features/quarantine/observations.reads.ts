import type {
  Breathing,
  CountBasis,
  Feeding,
  SignCode,
  Skin,
} from '../../../shared/domain/observations/observation.ts'
import type { Db } from '../../platform/database/db.ts'
import { namedByStruck } from './observations.repository.ts'
import { seenByAnother } from './notices.reads.ts'

export interface ObservationReadRow {
  id: string
  enclosure_code: string
  case_numbers: string[]
  happened_at: Date
  happened_on: string
  said_at: Date
  time_doubtful: boolean
  recorded_at: Date
  recorded_by: string | null
  recorded_by_name: string | null
  origin: 'online' | 'outbox'
  looked_at: boolean
  feeding: Feeding | null
  breathing: Breathing | null
  skin: Skin | null
  signs: SignCode[]
  words: string | null
  count_basis: CountBasis | null
  count_low: number | null
  count_high: number | null
  found_dead: number | null
  unwell_count: number | null
  handled: boolean | null
  unassigned_dead: number
  for_veterinarian: boolean
  urgent: boolean
  bodies_to_name: number
  bodies_named: number | null
  bodies_reason: string | null
  bodies_by: string | null
  bodies_at: Date | null
  reviewed_by: string | null
  reviewed_at: Date | null
  reviewed_words: string | null
  voided_reason: string | null
  deaths_standing: { accession: string; count: number }[]
  notice_id: string | null
  notice_seen: number
  notice_sent: number
  notice_failed: number
  total: number
}

export interface ObservationsFilter {
  id?: string
  case?: string
  enclosure?: string
  waiting?: boolean
  bodiesToName?: boolean
  offset?: number
  limit?: number
}

const notStruck = `NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)`

/** Bodies of a look that wait for a name: found without one, or without one again since their death was struck out. */
const bodiesToName = `(o.unassigned_dead + ${namedByStruck}
    - (SELECT coalesce(sum(coalesce(z.settled_count, o.unassigned_dead)), 0)::int FROM observation_bodies z
        WHERE z.observation_id = o.id))`

/** One page of them by themselves: what came of each is looked up for those that are shown, not for all of the house. */
const observationPage = `
  SELECT o.*, count(*) OVER ()::int AS total
    FROM observations o
   WHERE ($1::uuid IS NULL OR o.id = $1)
     AND ($2::text IS NULL OR o.id IN (SELECT k.observation_id FROM observation_cases k
                                         JOIN quarantine_cases c ON c.id = k.case_id WHERE c.number = $2))
     AND ($3::text IS NULL OR o.enclosure_id = (SELECT e.id FROM enclosures e WHERE e.code = $3))
     AND (NOT $4::boolean OR (o.for_veterinarian AND ${notStruck}
          AND NOT EXISTS (SELECT 1 FROM observation_reviews r WHERE r.observation_id = o.id)))
     AND (NOT $7::boolean OR (${notStruck} AND ${bodiesToName} > 0
          AND (o.unassigned_dead > 0 OR o.id IN (SELECT k.observation_id FROM observation_deaths k
                                                   JOIN animal_voids s ON s.death_id = k.death_id))))
   ORDER BY o.happened_at DESC, o.id DESC
   LIMIT $5 OFFSET $6`

/** Observations with everything that came of them, the newest first. */
export function readObservations(db: Db, filter: ObservationsFilter): Promise<ObservationReadRow[]> {
  return db.query(
    `SELECT o.id, e.code AS enclosure_code,
            coalesce((SELECT array_agg(c.number ORDER BY c.number) FROM observation_cases k
                        JOIN quarantine_cases c ON c.id = k.case_id WHERE k.observation_id = o.id), '{}')
              AS case_numbers,
            o.happened_at, o.happened_on::text AS happened_on, o.said_at, o.time_doubtful, o.recorded_at,
            o.recorded_by, w.printed_name AS recorded_by_name, o.origin, o.looked_at, o.feeding, o.breathing, o.skin,
            o.signs, o.words, o.count_basis, o.count_low, o.count_high, o.found_dead, o.unwell_count, o.handled, o.unassigned_dead,
            CASE WHEN v.id IS NULL THEN ${bodiesToName} ELSE 0 END AS bodies_to_name,
            b.named_in_all AS bodies_named, b.reason AS bodies_reason, bp.printed_name AS bodies_by,
            b.recorded_at AS bodies_at, o.for_veterinarian, o.urgent, rp.printed_name AS reviewed_by, r.recorded_at AS reviewed_at,
            r.words AS reviewed_words, v.reason AS voided_reason,
            CASE WHEN v.id IS NULL THEN '[]'::json
                 ELSE (SELECT coalesce(json_agg(json_build_object('accession', a.accession, 'count', d.seen_count)
                                                ORDER BY a.accession), '[]')
                         FROM observation_deaths k JOIN live_deaths d ON d.id = k.death_id
                         JOIN animals a ON a.id = d.animal_id WHERE k.observation_id = o.id) END AS deaths_standing,
            n.id AS notice_id,
            (SELECT count(*)::int FROM notice_acts a WHERE a.notice_id = n.id AND a.kind = 'seen'
                AND ${seenByAnother('a')}) AS notice_seen,
            (SELECT count(*)::int FROM notice_deliveries d
              WHERE d.notice_id = n.id AND d.outcome = 'sent') AS notice_sent,
            (SELECT count(*)::int FROM notice_deliveries d
              WHERE d.notice_id = n.id AND d.outcome = 'failed') AS notice_failed,
            o.total
       FROM (${observationPage}) o
       JOIN enclosures e ON e.id = o.enclosure_id
       LEFT JOIN people w ON w.id = o.recorded_by
       LEFT JOIN LATERAL (SELECT r.* FROM observation_reviews r WHERE r.observation_id = o.id
                           ORDER BY r.recorded_at DESC, r.id DESC LIMIT 1) r ON true
       LEFT JOIN people rp ON rp.id = r.recorded_by
       LEFT JOIN observation_voids v ON v.observation_id = o.id
       LEFT JOIN LATERAL (SELECT b.*, sum(b.named_count) OVER ()::int AS named_in_all FROM observation_bodies b
                           WHERE b.observation_id = o.id ORDER BY coalesce(b.naming_no, 1) DESC LIMIT 1) b ON true
       LEFT JOIN people bp ON bp.id = b.recorded_by
       LEFT JOIN notices n ON n.observation_id = o.id
      ORDER BY o.happened_at DESC, o.id DESC`,
    [
      filter.id ?? null,
      filter.case ?? null,
      filter.enclosure ?? null,
      filter.waiting ?? false,
      filter.limit ?? 50,
      filter.offset ?? 0,
      filter.bodiesToName ?? false,
    ],
  )
}

export interface LastLookReadRow {
  enclosure_id: string
  last_at: Date
  today: number
}

/** When each enclosure was last looked at, and how often on a day. */
export function readLastLooks(db: Db, on: string): Promise<LastLookReadRow[]> {
  return db.query(
    `SELECT o.enclosure_id, max(o.happened_at) AS last_at,
            count(*) FILTER (WHERE o.happened_on = $1::date)::int AS today
       FROM observations o
      WHERE NOT EXISTS (SELECT 1 FROM observation_voids v WHERE v.observation_id = o.id)
      GROUP BY o.enclosure_id`,
    [on],
  )
}
