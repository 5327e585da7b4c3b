import type { WaterSourceSpell } from '../../../shared/domain/connections/list-water-sources.ts'
import type { Db } from '../../platform/database/db.ts'
import { happenedBy } from '../../platform/database/happened-by.ts'

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
            coalesce((SELECT array_agg(DISTINCT d.dose_key) FROM live_doses d JOIN orders_of_doses x ON x.dose_id = d.id
                       WHERE x.order_id = o.id AND ${happenedBy('d', '$2')}), '{}') AS done_keys,
            coalesce((SELECT json_agg(json_build_object('at', d.happened_at, 'ended',
                               (SELECT max(s.happened_at) FROM live_bath_stops s
                                 WHERE s.dose_id = d.id AND ${happenedBy('s', '$2')})))
                        FROM live_doses d JOIN orders_of_doses x ON x.dose_id = d.id
                       WHERE x.order_id = o.id AND d.kind IN ('given', 'recorded') AND ${happenedBy('d', '$2')}), '[]') AS given,
            (SELECT min(e.happened_at) FROM order_events e
              WHERE e.order_id = o.id AND e.kind = 'discontinued' AND ${happenedBy('e', '$2')}) AS discontinued_at,
            (SELECT max(d.happened_at) FROM live_doses d JOIN orders_of_doses w ON w.dose_id = d.id
              WHERE w.order_id = o.id AND d.kind IN ('given', 'recorded') AND ${happenedBy('d', '$2')}) AS last_given_at
       FROM orders o
       JOIN order_versions v ON v.order_id = o.id
      WHERE v.enclosure_id = ANY($1) AND v.signed_at <= $2 AND ($3::uuid IS NULL OR o.id <> $3)
        AND NOT EXISTS (SELECT 1 FROM order_versions n
                         WHERE n.order_id = o.id AND n.version_no > v.version_no AND n.signed_at <= $2)`,
    [[...enclosureIds], at, exceptOrderId],
  ) as Promise<AgentUseRow[]>
}

/** An agent that came into a water with doses given where that water was then. */
export interface CarriedAgentRow {
  agent: string
  number: string
  contact_minutes: number | null
  /** When those doses went in, in time order, into which enclosure, and when its bath was over or the agent out of it. */
  given: { at: string; ended: string | null; enclosureId: string }[]
}

/** How long an agent that is out of the water is remembered. Project default: longer than any rule looks back. */
export const daysRemembered = 30

/** The first dose, anywhere, whose agent may still be in some water or was within the last days; null when there is none. */
export async function readFirstDoseThatMatters(db: Db, at: Date): Promise<Date | null> {
  const [row]: { first_at: Date | null }[] = await db.query(
    `SELECT min(d.happened_at) AS first_at FROM live_doses d
      WHERE d.kind IN ('given', 'recorded') AND ${happenedBy('d', '$1')}
        AND NOT EXISTS (SELECT 1 FROM live_bath_stops s
                         WHERE s.dose_id = d.id AND s.happened_at <= $1::timestamptz - $2 * interval '1 day')`,
    [at, daysRemembered],
  )
  return row?.first_at ?? null
}

/** Doses that went into an enclosure during a spell in which its water came to the water asked about. */
const dosesFromSources = `
  live_doses d
  JOIN order_versions v ON v.id = d.order_version_id AND d.kind IN ('given', 'recorded')
  JOIN jsonb_to_recordset($1::jsonb) AS source("from" timestamptz, "until" timestamptz, "enclosureIds" jsonb)
    ON d.happened_at >= source."from" AND d.happened_at < source."until"
       AND source."enclosureIds" @> to_jsonb(v.enclosure_id::text)`

/** The spells as the database reads them; the last has no end, for it holds the instant asked about. */
const sourceRows = (sources: readonly WaterSourceSpell[]): string =>
  JSON.stringify(
    sources.map((spell, i) => (i === sources.length - 1 ? { ...spell, until: 'infinity' } : spell)),
  )

/** What doses brought into a water up to an instant, by the water that each went into at its own time. */
export function readCarriedAgents(
  db: Db,
  sources: readonly WaterSourceSpell[],
  at: Date,
  exceptOrderId: string | null,
): Promise<CarriedAgentRow[]> {
  return db.query(
    `SELECT v.agent, o.number, v.contact_minutes,
            json_agg(json_build_object('at', d.happened_at, 'enclosureId', v.enclosure_id, 'ended',
                       (SELECT max(s.happened_at) FROM live_bath_stops s
                         WHERE s.dose_id = d.id AND ${happenedBy('s', '$2')})) ORDER BY d.happened_at) AS given
       FROM ${dosesFromSources}
       JOIN orders o ON o.id = v.order_id
      WHERE ${happenedBy('d', '$2')} AND ($3::uuid IS NULL OR o.id <> $3)
      GROUP BY v.agent, o.number, v.contact_minutes`,
    [sourceRows(sources), at, exceptOrderId],
  )
}

/**
 * When doses went into a water under a signed version that is gone: nobody can tell of which agent, nor for how long. Each is
 * remembered as an agent out of the water is. Where they went is where their order is for.
 */
export async function readDosesOfGoneVersions(
  db: Db,
  sources: readonly WaterSourceSpell[],
  at: Date,
): Promise<Date[]> {
  const rows: { happened_at: Date }[] = await db.query(
    `SELECT d.happened_at FROM live_doses d JOIN orders o ON o.id = d.order_id
      WHERE d.kind IN ('given', 'recorded') AND ${happenedBy('d', '$2')}
        AND NOT EXISTS (SELECT 1 FROM order_versions v WHERE v.id = d.order_version_id)
        AND NOT EXISTS (SELECT 1 FROM live_bath_stops s
                         WHERE s.dose_id = d.id AND s.happened_at <= $2::timestamptz - $3 * interval '1 day')
        AND EXISTS (
              SELECT 1 FROM jsonb_to_recordset($1::jsonb) AS source("from" timestamptz, "until" timestamptz, "enclosureIds" jsonb)
               WHERE d.happened_at >= source."from" AND d.happened_at < source."until"
                 AND source."enclosureIds" @> to_jsonb(o.enclosure_id::text))`,
    [sourceRows(sources), at, daysRemembered],
  )
  return rows.map((row) => row.happened_at)
}

/** Milligrams per litre of an agent that came into a water with the doses of the 24 h before an instant. */
export async function readGivenInLast24h(
  db: Db,
  sources: readonly WaterSourceSpell[],
  agent: string,
  at: Date,
) {
  const [row]: { total: number | null; unclear: string }[] = await db.query(
    `SELECT sum(d.given_mg_per_l) AS total, 
            count(*) FILTER (WHERE d.given_mg_per_l IS NULL OR NOT row_is_as_written('doses', d.id::text)) AS unclear
       FROM ${dosesFromSources}
      WHERE v.agent = $2 AND ${happenedBy('d', '$3')} AND d.happened_at > $3 - interval '24 hours'`,
    [sourceRows(sources), agent, at],
  )
  return { totalMgPerL: row?.total ?? 0, unclear: Number(row?.unclear ?? 0) > 0 }
}

/** Taxa, of those asked about, in which this agent was given here before or experience was declared. */
export async function readExperiencedTaxa(db: Db, agent: string, taxonIds: readonly string[], at: Date) {
  const rows: { taxon_id: string }[] = await db.query(
    `SELECT a.taxon_id FROM live_doses d
       JOIN order_versions v ON v.id = d.order_version_id
       JOIN order_version_animals a ON a.order_version_id = v.id
      WHERE v.agent = $1 AND a.taxon_id = ANY($2) AND d.kind IN ('given', 'recorded') AND ${happenedBy('d', '$3')}
      UNION
     SELECT e.taxon_id FROM agent_experience e
      WHERE e.agent = $1 AND e.taxon_id = ANY($2) AND e.declared_at <= $3`,
    [agent, [...taxonIds], at],
  )
  return new Set(rows.map((row) => row.taxon_id))
}

/**
 * What the versions of an order gave so far: planned doses that went in, when the last did, and how many nobody recorded
 * as out of the water. Nothing of a new order.
 */
export async function readGivenBefore(
  db: Db,
  orderId: string | null,
): Promise<{ doses: number; lastAt: string | null; stillIn: number }> {
  if (orderId === null) return { doses: 0, lastAt: null, stillIn: 0 }
  const [row]: { doses: number; last_at: Date | null; still_in: number }[] = await db.query(
    `SELECT count(DISTINCT d.dose_key)::int AS doses, max(d.happened_at) AS last_at,
            (count(*) FILTER (WHERE NOT EXISTS (SELECT 1 FROM live_bath_stops s WHERE s.dose_id = d.id)))::int AS still_in
       FROM live_doses d JOIN orders_of_doses w ON w.dose_id = d.id
      WHERE w.order_id = $1 AND d.kind IN ('given', 'recorded')`,
    [orderId],
  )
  return {
    doses: row?.doses ?? 0,
    lastAt: row?.last_at?.toISOString() ?? null,
    stillIn: row?.still_in ?? 0,
  }
}
