import type { DoseRecord } from '../../../shared/domain/orders/dose-states.ts'
import type { Db } from '../../platform/database/db.ts'

/** An end of a bath as a list gives it. */
export interface OtherStop {
  id: string
  at: string
  by: string
  cause: 'time-up' | 'stopped'
  seen: string | null
  rescue: string | null
  recorded_at: string
  recorded_by: string
  /** It lies before the dose: kept and shown, and it ends nothing. */
  before_start: boolean
}

export interface DoseReadRow {
  id: string
  order_id: string
  dose_key: string
  kind: 'given' | 'recorded' | 'withheld' | 'refused'
  amount_entered_value: string | null
  amount_entered_unit: string | null
  lot_number: string | null
  note: string | null
  /** Contact time of the version it was given under, as signed; null where the agent stays in the water or nobody can tell. */
  contact_minutes: number | null
  /** False where the signed text cannot be read: nobody can tell how long it was to be in. */
  contact_is_told: boolean
  exceptions_text: string
  /** False where somebody changed it in the database: none of its figures is shown. */
  is_as_written: boolean
  happened_at: Date
  recorded_at: Date
  by_name: string
  stop_at: Date | null
  stop_by: string | null
  stop_cause: 'time-up' | 'stopped' | null
  stop_seen: string | null
  stop_rescue: string | null
  stop_id: string | null
  recorded_by: string
  stop_recorded_at: Date | null
  stop_recorded_by: string | null
  /** Ends of the same bath besides the one that counts, the latest first. */
  other_stops: OtherStop[]
  struck_reason: string | null
  struck_at: Date | null
  struck_by: string | null
}

/** A record that stands: nobody struck it out. */
export const stands = (row: DoseReadRow): boolean => row.struck_reason === null

/** A record as the calendar of doses takes it. */
export const recordOf = (row: DoseReadRow): DoseRecord => ({
  doseKey: row.dose_key,
  kind: row.kind,
  endedAt: row.stop_at?.toISOString() ?? null,
})

/** Of several ends of one bath the latest that is not before it counts until somebody strikes it out: the animals were in it that long. */
export const latestFirst = 'b.happened_at DESC, b.recorded_at DESC'
const otherStops = `(SELECT coalesce(json_agg(json_build_object('id', b.id, 'at', b.happened_at, 'by', r.printed_name,
             'cause', b.cause, 'seen', b.seen, 'rescue', b.rescue, 'recorded_at', b.recorded_at, 'recorded_by', b.recorded_by,
             'before_start', b.before_start)
             ORDER BY ${latestFirst}), '[]')
        FROM recorded_bath_stops b JOIN people r ON r.id = b.recorded_by
       WHERE b.dose_id = d.id AND b.id IS DISTINCT FROM s.id)`

/** Every record of an order's doses, over all its versions, in time order, struck-out ones with the reason. */
export function readDoses(db: Db, orderId: string): Promise<DoseReadRow[]> {
  return readDosesOf(db, [orderId])
}

/** The same of several orders at once; each row says whose it is. */
export function readDosesOf(db: Db, orderIds: readonly string[]): Promise<DoseReadRow[]> {
  return db.query(
    `SELECT d.id, w.order_id, d.dose_key, d.kind, d.amount_entered_value, d.amount_entered_unit, t.lot_number, d.note, c.contact_minutes, c.is_told AS contact_is_told,
            d.exceptions_text, row_is_as_written('doses', d.id::text) AS is_as_written, d.happened_at, d.recorded_at, p.printed_name AS by_name,
            s.happened_at AS stop_at, q.printed_name AS stop_by, s.cause AS stop_cause, s.seen AS stop_seen,
            s.rescue AS stop_rescue, s.id AS stop_id, d.recorded_by, s.recorded_at AS stop_recorded_at,
            s.recorded_by AS stop_recorded_by, ${otherStops} AS other_stops, x.reason AS struck_reason, x.recorded_at AS struck_at,
            y.printed_name AS struck_by
       FROM doses d
       JOIN orders_of_doses w ON w.dose_id = d.id
       JOIN contacts_of_doses c ON c.dose_id = d.id
       JOIN people p ON p.id = d.recorded_by
       LEFT JOIN product_lots t ON t.id = d.lot_id
       LEFT JOIN LATERAL (SELECT * FROM live_bath_stops b WHERE b.dose_id = d.id ORDER BY ${latestFirst} LIMIT 1) s ON true
       LEFT JOIN people q ON q.id = s.recorded_by
       LEFT JOIN dose_voids x ON x.dose_id = d.id
       LEFT JOIN people y ON y.id = x.recorded_by
      WHERE w.order_id = ANY($1::uuid[]) ORDER BY d.happened_at, d.recorded_at`,
    [orderIds],
  )
}

export interface CalculationReadRow {
  id: string
  part: 'first' | 'second'
  lot_id: string | null
  lot_number: string | null
  enclosure_read: string | null
  mark_read: string | null
  lot_read: string | null
  strength_entered_value: string | null
  strength_entered_unit: string | null
  amount_entered_value: string
  amount_entered_unit: string
  net_volume_litres: number | null
  agrees: boolean | null
  difference_percent: number | null
  recorded_at: Date
  recorded_by: string
  by_name: string
}

/** Calculations for one dose, the newest first. */
export function readCalculations(
  db: Db,
  orderVersionId: string,
  doseKey: string,
): Promise<CalculationReadRow[]> {
  return db.query(
    `SELECT c.id, c.part, c.lot_id, t.lot_number, c.amount_entered_value, c.amount_entered_unit, c.net_volume_litres,
            c.enclosure_read, c.mark_read, c.lot_read, c.strength_entered_value, c.strength_entered_unit, c.agrees,
            c.difference_percent, c.recorded_at, c.recorded_by, p.printed_name AS by_name
       FROM dose_calculations c
       JOIN people p ON p.id = c.recorded_by
       LEFT JOIN product_lots t ON t.id = c.lot_id
      WHERE c.order_version_id = $1 AND c.dose_key = $2 ORDER BY c.recorded_at DESC, c.id DESC`,
    [orderVersionId, doseKey],
  )
}

export async function readOrderNumberOfDose(db: Db, doseId: string) {
  const [row]: { number: string; dose_key: string }[] = await db.query(
    `SELECT o.number, d.dose_key FROM doses d
       JOIN orders_of_doses w ON w.dose_id = d.id JOIN orders o ON o.id = w.order_id
      WHERE d.id = $1`,
    [doseId],
  )
  return row ? { number: row.number, key: row.dose_key } : null
}
