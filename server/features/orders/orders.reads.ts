import { containing } from '../../platform/database/like.ts'
import type { Db } from '../../platform/database/db.ts'
import type { Seal } from '../../platform/signatures/signer.ts'
import type { SigningChain } from './signing-chain.ts'

/** The columns of a signed version, and whom it names. */
export interface Copies {
  version: Record<string, unknown>
  animalIds: string[]
}

export interface OrderReadRow {
  id: string
  number: string
  enclosure_id: string
  enclosure_code: string
  enclosure_name: string
  stage: 'draft' | 'proposed' | 'none'
  draft_text: string | null
  created_at: Date
  created_by: string | null
  created_by_name: string | null
  version: number
  version_id: string | null
  version_no: number | null
  signed_text_id: string | null
  agent: string | null
  amount_entered_value: string | null
  amount_entered_unit: string | null
  doses: number | null
  interval_hours: number | null
  contact_minutes: number | null
  starts_at: Date | null
  signed_at: Date | null
  signed_by_name: string | null
  signed_text: string | null
  /** What the text was sealed with; null with the text. */
  seal: Seal | null
  held: boolean
  ended: boolean
  done_keys: string[]
  /** Doses whose two calculations agree, under the version in force. */
  agreed_keys: string[]
  given: number
  /** Doses against a rule, stopped before the time was over, or given more than once. */
  irregular: number
  /** A timed bath, or one whose time cannot be read, went in and has no end. */
  running: boolean
  /** The signed version in force as its columns say it; null while none is signed. */
  copies: Copies | null
  /** What there is of its signings: an order with a link missing is not what was signed. */
  chain: SigningChain
}

/** Of the version that a query calls v. */
const copiesColumn = `json_build_object('version', to_jsonb(v.*),
    'animalIds', coalesce((SELECT json_agg(a.animal_id) FROM order_version_animals a WHERE a.order_version_id = v.id), '[]'))`

/** Of the order that a query calls o. */
const chainColumn = `json_build_object(
    'signings', (SELECT coalesce(json_agg(e.text ORDER BY e.seq), '[]') FROM audit_entries e
                  WHERE e.subject_kind = 'order' AND e.subject_id = o.id::text AND e.action IN ('order.sign', 'order.amend')),
    'versions', (SELECT coalesce(json_agg(json_build_object('versionNo', x.version_no, 'hash', y.hash)), '[]')
                   FROM order_versions x LEFT JOIN signed_texts y ON y.id = x.signed_text_id WHERE x.order_id = o.id),
    'looseTexts', (SELECT count(*) FROM signed_texts y
                    WHERE y.subject_kind = 'order' AND y.subject_id = o.id
                      AND NOT EXISTS (SELECT 1 FROM order_versions x WHERE x.signed_text_id = y.id)))`

const columns = `
  o.id, o.number, o.enclosure_id, c.code AS enclosure_code, c.name AS enclosure_name, o.stage, o.draft_text,
  o.created_at, o.created_by, w.printed_name AS created_by_name, o.version, v.id AS version_id, v.version_no, v.signed_text_id,
  coalesce(v.agent, f.agent) AS agent, v.amount_entered_value, v.amount_entered_unit, v.doses, v.interval_hours, v.contact_minutes, v.starts_at,
  v.signed_at, s.printed_name AS signed_by_name, t.text AS signed_text,
  CASE WHEN t.id IS NULL THEN NULL ELSE json_build_object('hash', t.hash, 'signature', t.signature, 'keyId', t.key_id) END AS seal,
  coalesce((SELECT e.kind = 'held' FROM order_events e WHERE e.order_id = o.id AND e.kind <> 'discontinued'
             ORDER BY e.recorded_at DESC, e.happened_at DESC LIMIT 1), false) AS held,
  EXISTS (SELECT 1 FROM order_events e WHERE e.order_id = o.id AND e.kind = 'discontinued') AS ended,
  coalesce((SELECT array_agg(DISTINCT d.dose_key) FROM live_doses d JOIN orders_of_doses x ON x.dose_id = d.id
             WHERE x.order_id = o.id), '{}') AS done_keys,
  coalesce((SELECT array_agg(a.dose_key) FROM calculations_agreed a WHERE a.order_version_id = v.id), '{}') AS agreed_keys,
  (SELECT count(*)::int FROM live_doses d JOIN orders_of_doses x ON x.dose_id = d.id
    WHERE x.order_id = o.id AND d.kind IN ('given', 'recorded')) AS given,
  (SELECT count(DISTINCT d.dose_key)::int FROM live_doses d JOIN orders_of_doses x ON x.dose_id = d.id
    WHERE x.order_id = o.id
      AND (d.exceptions_text LIKE '%"level":"stop"%' OR d.exceptions_text LIKE '%"ruleId":"record"%'
           OR EXISTS (SELECT 1 FROM live_bath_stops s WHERE s.dose_id = d.id AND s.cause = 'stopped')
           OR (d.kind IN ('given', 'recorded')
               AND EXISTS (SELECT 1 FROM live_doses e JOIN orders_of_doses y ON y.dose_id = e.id
                            WHERE y.order_id = o.id AND e.dose_key = d.dose_key AND e.id <> d.id
                              AND e.kind IN ('given', 'recorded'))))) AS irregular,
  EXISTS (SELECT 1 FROM live_doses d JOIN orders_of_doses x ON x.dose_id = d.id JOIN contacts_of_doses l ON l.dose_id = d.id
           WHERE x.order_id = o.id AND d.kind IN ('given', 'recorded')
             AND NOT EXISTS (SELECT 1 FROM live_bath_stops s WHERE s.dose_id = d.id)
             AND l.needs_an_end) AS running,
  CASE WHEN v.id IS NULL THEN NULL ELSE ${copiesColumn} END AS copies,
  ${chainColumn} AS chain`

const tables = `
  FROM orders o
  JOIN enclosures c ON c.id = o.enclosure_id
  LEFT JOIN people w ON w.id = o.created_by
  LEFT JOIN LATERAL (SELECT * FROM order_versions n WHERE n.order_id = o.id ORDER BY n.version_no DESC LIMIT 1) v ON true
  LEFT JOIN products f ON v.id IS NULL AND f.id = (o.draft_text::jsonb ->> 'productId')::uuid
  LEFT JOIN people s ON s.id = v.signed_by
  LEFT JOIN signed_texts t ON t.id = v.signed_text_id`

export interface OrderFilter {
  q?: string
  enclosureCode?: string
}

/** Orders that match, unsorted and unpaged: where they stand is computed, so filter and sort follow in the query module. */
export function readOrders(db: Db, filter: OrderFilter): Promise<OrderReadRow[]> {
  const like = containing(filter.q)
  return db.query(
    `SELECT ${columns} ${tables}
      WHERE ($1::text IS NULL OR plain_text(o.number) LIKE plain_text($1) OR plain_text(c.code) LIKE plain_text($1) OR plain_text(c.name) LIKE plain_text($1) OR plain_text(v.agent) LIKE plain_text($1) OR plain_text(f.agent) LIKE plain_text($1))
        AND ($2::text IS NULL OR c.code = $2)
      ORDER BY o.number DESC`,
    [like, filter.enclosureCode ?? null],
  )
}

export async function readOrder(db: Db, number: string): Promise<OrderReadRow | null> {
  const [row] = await readOrdersNumbered(db, [number])
  return row ?? null
}

export const readOrdersNumbered = (db: Db, numbers: readonly string[]): Promise<OrderReadRow[]> =>
  db.query(`SELECT ${columns} ${tables} WHERE o.number = ANY($1)`, [numbers])

export interface VersionReadRow {
  id: string
  version_no: number
  signed_text_id: string
  copies: Copies
}

export function readVersions(db: Db, orderId: string): Promise<VersionReadRow[]> {
  return db.query(
    `SELECT v.id, v.version_no, v.signed_text_id, ${copiesColumn} AS copies FROM order_versions v WHERE v.order_id = $1 ORDER BY v.version_no DESC`,
    [orderId],
  )
}

export interface StoredVersionRow {
  id: string
  number: string
  /** Null, with all of its seal, where the signed text is gone. */
  text: string | null
  hash: string
  signature: string
  key_id: string
  copies: Copies
}

/** Every signed version of every order with its text and seal. */
export function readStoredVersions(db: Db): Promise<StoredVersionRow[]> {
  return db.query(
    `SELECT o.id, o.number, t.text, t.hash, t.signature, t.key_id, ${copiesColumn} AS copies
       FROM order_versions v JOIN orders o ON o.id = v.order_id LEFT JOIN signed_texts t ON t.id = v.signed_text_id
      ORDER BY o.number, v.version_no`,
  )
}

/** What there is of the signings of every order. */
export function readSigningChains(db: Db): Promise<{ number: string; chain: SigningChain }[]> {
  return db.query(`SELECT o.number, ${chainColumn} AS chain FROM orders o ORDER BY o.number`)
}

/** Numbers of orders that were signed, by the audit trail or by a signed text, and are gone with all their versions. */
export async function readGoneOrders(db: Db): Promise<string[]> {
  const rows: { label: string }[] = await db.query(
    `SELECT e.subject_label AS label FROM audit_entries e
      WHERE e.subject_kind = 'order' AND e.action IN ('order.sign', 'order.amend')
        AND NOT EXISTS (SELECT 1 FROM orders o WHERE o.id::text = e.subject_id)
      UNION
     SELECT t.subject_label FROM signed_texts t
      WHERE t.subject_kind = 'order' AND NOT EXISTS (SELECT 1 FROM orders o WHERE o.id = t.subject_id)
      ORDER BY label`,
  )
  return rows.map(({ label }) => label)
}

export interface EventReadRow {
  id: string
  kind: 'held' | 'hold-lifted' | 'discontinued'
  reason: string | null
  happened_at: Date
  by_name: string | null
}

export function readEvents(db: Db, orderId: string): Promise<EventReadRow[]> {
  return db.query(
    `SELECT e.id, e.kind, e.reason, e.happened_at, p.printed_name AS by_name
       FROM order_events e LEFT JOIN people p ON p.id = e.recorded_by
      WHERE e.order_id = $1 ORDER BY e.recorded_at DESC, e.happened_at DESC`,
    [orderId],
  )
}

export interface RecordedDoseRow {
  dose_key: string
  kind: 'given' | 'recorded' | 'withheld' | 'refused'
  happened_at: Date
  amount_entered_value: string | null
  amount_entered_unit: string | null
  /** False where somebody changed it in the database: none of its figures is shown. */
  is_as_written: boolean
  by_name: string | null
  ended_at: Date | null
  /** When somebody stopped its bath before the time was over. */
  stopped_at: Date | null
  /** What was seen when it was stopped. */
  stopped_seen: string | null
  /** What was against the rules, as JSON of codes and sentences. */
  exceptions_text: string
  /** Who calculated it a second time; null where nobody did. */
  second_by: string | null
  /** How many minutes after their own first calculation; null where another person had done that. */
  alone_after_minutes: number | null
}

/** What was recorded of the planned doses, over all versions of an order, the newest first. */
export function readRecordedDoses(db: Db, orderId: string): Promise<RecordedDoseRow[]> {
  return db.query(
    `SELECT d.dose_key, d.kind, d.happened_at, d.amount_entered_value, d.amount_entered_unit,
            row_is_as_written('doses', d.id::text) AS is_as_written,
            p.printed_name AS by_name,
            (SELECT max(s.happened_at) FROM live_bath_stops s WHERE s.dose_id = d.id) AS ended_at,
            t.happened_at AS stopped_at, t.seen AS stopped_seen, d.exceptions_text,
            c.by_name AS second_by, c.alone_after_minutes
       FROM live_doses d
       JOIN orders_of_doses w ON w.dose_id = d.id
       LEFT JOIN people p ON p.id = d.recorded_by
       LEFT JOIN LATERAL (
         SELECT s.happened_at, s.seen FROM live_bath_stops s
          WHERE s.dose_id = d.id AND s.cause = 'stopped' ORDER BY s.happened_at DESC LIMIT 1) t ON true
       LEFT JOIN LATERAL (
         SELECT r.printed_name AS by_name,
                floor(extract(epoch FROM x.recorded_at - f.recorded_at) / 60)::int AS alone_after_minutes
           FROM dose_calculations x
           JOIN people r ON r.id = x.recorded_by
           LEFT JOIN LATERAL (SELECT g.recorded_at, g.recorded_by FROM dose_calculations g
                               WHERE g.order_version_id = x.order_version_id AND g.dose_key = x.dose_key
                                 AND g.part = 'first' AND g.recorded_at <= x.recorded_at
                               ORDER BY g.recorded_at DESC, g.id DESC LIMIT 1) f ON f.recorded_by = x.recorded_by
          WHERE x.id = d.second_calculation_id) c ON true
      WHERE w.order_id = $1 ORDER BY d.happened_at DESC, d.recorded_at DESC, d.id DESC`,
    [orderId],
  )
}
