import type { Db } from '../../platform/database/db.ts'

export interface AgentUseRow {
  agent: string
  number: string
  starts_at: Date
  ends_at: Date | null
  discontinued_at: Date | null
  last_given_at: Date | null
  timed: boolean
  doses: number
  interval_hours: number | null
  contact_minutes: number | null
  /** Planned doses with a record of any kind. */
  done_keys: string[]
  /** When doses went in, and when the bath was over or the agent out of the water. */
  given: { at: string; ended: string | null }[]
}

/**
 * Signed orders into any of these enclosures, the version in force of each, with the last dose given. `ends_at` is
 * the end of the last planned contact; null when the agent stays in the water.
 */
export function readAgentUses(
  db: Db,
  enclosureIds: readonly string[],
  at: Date,
  exceptOrderId: string | null,
) {
  return db.query(
    `SELECT v.agent, o.number, v.starts_at, v.contact_minutes IS NOT NULL AS timed,
            CASE WHEN v.contact_minutes IS NULL THEN NULL
                 ELSE v.starts_at + (coalesce(v.interval_hours, 0) * (v.doses - 1)) * interval '1 hour'
                      + v.contact_minutes * interval '1 minute' END AS ends_at,
            v.doses, v.interval_hours, v.contact_minutes,
            coalesce((SELECT array_agg(DISTINCT d.dose_key) FROM live_doses d JOIN order_versions x ON x.id = d.order_version_id
                       WHERE x.order_id = o.id AND d.happened_at <= $2), '{}') AS done_keys,
            coalesce((SELECT json_agg(json_build_object('at', d.happened_at, 'ended',
                               (SELECT min(s.happened_at) FROM live_bath_stops s
                                 WHERE s.dose_id = d.id AND s.happened_at <= $2)))
                        FROM live_doses d JOIN order_versions x ON x.id = d.order_version_id
                       WHERE x.order_id = o.id AND d.kind IN ('given', 'recorded') AND d.happened_at <= $2), '[]') AS given,
            (SELECT min(e.happened_at) FROM order_events e
              WHERE e.order_id = o.id AND e.kind = 'discontinued' AND e.happened_at <= $2) AS discontinued_at,
            (SELECT max(d.happened_at) FROM live_doses d JOIN order_versions w ON w.id = d.order_version_id
              WHERE w.order_id = o.id AND d.kind IN ('given', 'recorded') AND d.happened_at <= $2) AS last_given_at
       FROM orders o
       JOIN order_versions v ON v.order_id = o.id
      WHERE v.enclosure_id = ANY($1) AND v.signed_at <= $2 AND ($3::uuid IS NULL OR o.id <> $3)
        AND NOT EXISTS (SELECT 1 FROM order_versions n
                         WHERE n.order_id = o.id AND n.version_no > v.version_no AND n.signed_at <= $2)`,
    [[...enclosureIds], at, exceptOrderId],
  ) as Promise<AgentUseRow[]>
}

/** Milligrams per litre of an agent given into these enclosures in the 24 h before an instant. */
export async function readGivenInLast24h(db: Db, enclosureIds: readonly string[], agent: string, at: Date) {
  const [row]: { total: number | null; unclear: string }[] = await db.query(
    `SELECT sum(d.given_mg_per_l) AS total, count(*) FILTER (WHERE d.given_mg_per_l IS NULL) AS unclear
       FROM live_doses d JOIN order_versions v ON v.id = d.order_version_id
      WHERE v.enclosure_id = ANY($1) AND v.agent = $2 AND d.kind IN ('given', 'recorded')
        AND d.happened_at <= $3 AND d.happened_at > $3 - interval '24 hours'`,
    [[...enclosureIds], agent, at],
  )
  return { totalMgPerL: row?.total ?? 0, unclear: Number(row?.unclear ?? 0) > 0 }
}

/** Taxa, of those asked about, in which this agent was given here before or experience was declared. */
export async function readExperiencedTaxa(db: Db, agent: string, taxonIds: readonly string[], at: Date) {
  const rows: { taxon_id: string }[] = await db.query(
    `SELECT a.taxon_id FROM live_doses d
       JOIN order_versions v ON v.id = d.order_version_id
       JOIN order_version_animals a ON a.order_version_id = v.id
      WHERE v.agent = $1 AND a.taxon_id = ANY($2) AND d.kind IN ('given', 'recorded') AND d.happened_at <= $3
      UNION
     SELECT e.taxon_id FROM agent_experience e
      WHERE e.agent = $1 AND e.taxon_id = ANY($2) AND e.declared_at <= $3`,
    [agent, [...taxonIds], at],
  )
  return new Set(rows.map((row) => row.taxon_id))
}

/** What the versions of an order gave so far: planned doses that went in, and when the last did. Nothing of a new order. */
export async function readGivenBefore(
  db: Db,
  orderId: string | null,
): Promise<{ doses: number; lastAt: string | null }> {
  if (orderId === null) return { doses: 0, lastAt: null }
  const [row]: { doses: number; last_at: Date | null }[] = await db.query(
    `SELECT count(DISTINCT d.dose_key)::int AS doses, max(d.happened_at) AS last_at
       FROM live_doses d JOIN order_versions v ON v.id = d.order_version_id
      WHERE v.order_id = $1 AND d.kind IN ('given', 'recorded')`,
    [orderId],
  )
  return { doses: row?.doses ?? 0, lastAt: row?.last_at?.toISOString() ?? null }
}
