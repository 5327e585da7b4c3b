import type { AnimalForm } from '../../../shared/domain/animals/description.ts'
import type { PermitMark } from '../../../shared/domain/register/judge-permit-use.ts'
import type { PermitKind } from '../../../shared/domain/register/permit-kinds.ts'
import type { TransactionKind } from '../../../shared/domain/register/transaction-kinds.ts'
import type { Db } from '../../platform/database/db.ts'

export interface TransactionReadRow {
  id: string
  number: string
  way: 'in' | 'out'
  kind: TransactionKind
  stage: 'now' | 'already'
  happened_text: string
  happened_time: string | null
  happened_at: Date
  counterparty_id: string | null
  counterparty_name: string | null
  reference: string | null
  place: string | null
  place_date: string | null
  place_method: string | null
  latitude: number | null
  longitude: number | null
  uncertainty_metres: number | null
  carrier: string | null
  waybill: string | null
  box_count: number | null
  sealed_at: Date | null
  opened_at: Date | null
  transport_note: string | null
  loan_due_on: string | null
  note: string | null
  recorded_at: Date
  recorded_by_name: string | null
  voided_reason: string | null
  voided_at: Date | null
  voided_by_name: string | null
}

const columns = `
  t.id, t.number, t.way, t.kind, t.stage, t.happened_text, t.happened_time, t.happened_at, t.counterparty_id,
  c.name AS counterparty_name, t.reference, t.place, t.place_date, t.place_method, t.latitude, t.longitude,
  t.uncertainty_metres, t.carrier, t.waybill, t.box_count, t.sealed_at, t.opened_at, t.transport_note,
  t.loan_due_on::text, t.note, t.recorded_at, w.printed_name AS recorded_by_name, v.reason AS voided_reason,
  v.recorded_at AS voided_at, x.printed_name AS voided_by_name`
const joins = `
  transactions t
  LEFT JOIN counterparties c ON c.id = t.counterparty_id
  LEFT JOIN people w ON w.id = t.recorded_by
  LEFT JOIN transaction_voids v ON v.transaction_id = t.id
  LEFT JOIN people x ON x.id = v.recorded_by`

export async function readTransaction(db: Db, number: string): Promise<TransactionReadRow | null> {
  const [row]: TransactionReadRow[] = await db.query(`SELECT ${columns} FROM ${joins} WHERE t.number = $1`, [
    number,
  ])
  return row ?? null
}

/** Every transaction that names an animal or group, voided ones too, the oldest first. */
export function readTransactionsOf(db: Db, animalId: string): Promise<TransactionReadRow[]> {
  return db.query(
    `SELECT ${columns} FROM ${joins}
      WHERE EXISTS (SELECT 1 FROM transaction_lines l WHERE l.transaction_id = t.id AND l.animal_id = $1)
      ORDER BY t.happened_at, t.id`,
    [animalId],
  )
}

export interface LineReadRow {
  id: string
  transaction_id: string
  animal_id: string
  accession: string
  name: string | null
  common_name: string
  scientific_name: string
  form: AnimalForm
  accessioned: boolean
  count: number
  estimate_low: number | null
  estimate_high: number | null
  dead_on_arrival: number | null
  their_number: string | null
  source_code: string | null
  count_entry_id: string | null
  enclosure_id: string | null
  enclosure_code: string | null
  enclosure_name: string | null
}

export function readLines(db: Db, transactionIds: readonly string[]): Promise<LineReadRow[]> {
  return db.query(
    `SELECT l.id, l.transaction_id, l.animal_id, a.accession, a.name, x.common_name, x.scientific_name, a.form,
            l.accessioned, l.count, l.estimate_low, l.estimate_high, l.dead_on_arrival, l.their_number, l.source_code,
            l.count_entry_id, l.enclosure_id, e.code AS enclosure_code, e.name AS enclosure_name
       FROM transaction_lines l
       JOIN animals a ON a.id = l.animal_id
       JOIN taxa x ON x.id = a.taxon_id
       LEFT JOIN enclosures e ON e.id = l.enclosure_id
      WHERE l.transaction_id = ANY($1::uuid[]) ORDER BY l.transaction_id, l.position`,
    [transactionIds],
  )
}

export interface UseReadRow {
  id: string
  transaction_id: string
  line_id: string
  permit: string
  permit_number: string
  authority: string
  kind: PermitKind
  valid_from: string
  valid_until: string
  quantity: number
  excess: number
  marks: PermitMark[]
  explained: string | null
}

export function readUses(db: Db, transactionIds: readonly string[]): Promise<UseReadRow[]> {
  return db.query(
    `SELECT u.id, u.transaction_id, u.line_id, p.number AS permit, p.permit_number, p.authority, p.kind,
            p.valid_from::text, p.valid_until::text, u.quantity, u.excess, u.marks, e.reason AS explained
       FROM permit_uses u
       JOIN permits p ON p.id = u.permit_id
       LEFT JOIN permit_use_explanations e ON e.permit_use_id = u.id
      WHERE u.transaction_id = ANY($1::uuid[]) ORDER BY p.number, u.id`,
    [transactionIds],
  )
}
