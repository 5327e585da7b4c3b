import type { Db } from '../../platform/database/db.ts'

export interface DoseLineReadRow {
  id: string
  agent: string
  use: string
  low: number | null
  high: number
  unit: string
  basis: string
  longest_contact_minutes: number | null
  water: string
  source: string
  mark: string
  proposed_by: string | null
  confirmed_at: Date | null
  confirmed_by_name: string | null
}

const lineColumns = `
  l.id, l.agent, l.use, l.low, l.high, l.unit, l.basis, l.longest_contact_minutes, l.water, l.source, l.mark,
  l.proposed_by, c.confirmed_at, p.printed_name AS confirmed_by_name
  FROM dose_lines l
  LEFT JOIN dose_line_confirmations c ON c.dose_line_id = l.id
  LEFT JOIN people p ON p.id = c.confirmed_by`

/**
 * The lines in force: the newest confirmed of each chain of supersession, or the project default at its beginning;
 * and with them proposals that wait, which are not in force.
 */
export function readDoseLines(db: Db): Promise<DoseLineReadRow[]> {
  return db.query(
    `SELECT ${lineColumns}
      WHERE NOT EXISTS (
        SELECT 1 FROM dose_lines n JOIN dose_line_confirmations nc ON nc.dose_line_id = n.id
         WHERE n.supersedes_id = l.id)
      ORDER BY l.agent, l.use, l.proposed_at`,
  )
}

export async function readDoseLine(db: Db, id: string): Promise<DoseLineReadRow | null> {
  const [row]: DoseLineReadRow[] = await db.query(`SELECT ${lineColumns} WHERE l.id = $1`, [id])
  return row ?? null
}

export interface ProductReadRow {
  id: string
  agent: string
  product_name: string
  form: string
  strength_entered_value: string
  strength_entered_unit: string
  strength_basis: string
  density_g_per_ml: number | null
  in_use: boolean
  version: number
  is_as_written: boolean
  lots: LotReadRow[]
}

export interface LotReadRow {
  id: string
  lot_number: string
  expires_on: string
  received_on: string
  /** What keeps it out of use; null when nothing does. */
  last_event: string | null
  /** When somebody last looked at it and found it clear; ISO 8601. */
  found_clear_at: string | null
}

/**
 * What keeps lots out of use: everything noted since somebody put them back, whatever its own time. A recall that is
 * entered late stands as well.
 */
export const standingLotEvents = `
  SELECT e.id, e.lot_id, e.kind, e.happened_at, e.recorded_by FROM lot_events e
   WHERE e.kind NOT IN ('looked-at', 'returned-to-use')
     AND NOT EXISTS (SELECT 1 FROM lot_events r
                      WHERE r.lot_id = e.lot_id AND r.kind = 'returned-to-use'
                        AND (r.recorded_at, r.happened_at) > (e.recorded_at, e.happened_at))`

/** A recall stands over everything that is noted beside it. */
const gravestFirst = `ORDER BY (e.kind = 'recalled') DESC, e.happened_at DESC`

/** Products with their lots, all of them or one. */
export function readProducts(db: Db, id?: string): Promise<ProductReadRow[]> {
  return db.query(
    `SELECT p.id, p.agent, p.product_name, p.form, p.strength_entered_value, p.strength_entered_unit,
            p.strength_basis, p.density_g_per_ml, p.in_use, p.version,
            row_is_as_written('products', p.id::text) AS is_as_written,
            coalesce((SELECT json_agg(json_build_object(
                               'id', t.id, 'lot_number', t.lot_number, 'expires_on', t.expires_on,
                               'received_on', t.received_on,
                               'last_event', (SELECT e.kind FROM (${standingLotEvents}) e
                                               WHERE e.lot_id = t.id ${gravestFirst} LIMIT 1),
                               'found_clear_at', (SELECT max(e.happened_at) FROM lot_events e
                                                   WHERE e.lot_id = t.id AND e.kind = 'looked-at'))
                             ORDER BY t.expires_on, t.lot_number)
                        FROM product_lots t WHERE t.product_id = p.id), '[]') AS lots
       FROM products p WHERE $1::uuid IS NULL OR p.id = $1
      ORDER BY p.agent, lower(p.product_name)`,
    [id ?? null],
  )
}

export async function readProductIdOfLot(db: Db, lotId: string): Promise<string | null> {
  const [row]: { product_id: string }[] = await db.query(
    `SELECT t.product_id FROM product_lots t WHERE t.id = $1`,
    [lotId],
  )
  return row?.product_id ?? null
}
