import type { Db } from '../../platform/database/db.ts'

export interface OverrideReadRow {
  id: string
  order_version_id: string
  dose_key: string
  signed_text_id: string
  rule_id: string
  code: string
  reason: string
  recorded_at: Date
  number: string
}

const columns = `w.id, w.order_version_id, w.dose_key, w.signed_text_id, w.rule_id, w.code, w.reason, w.recorded_at, o.number`
const tables = `FROM dose_overrides w JOIN order_versions v ON v.id = w.order_version_id JOIN orders o ON o.id = v.order_id`

/** Overrides at one dose, in time order. */
export function readOverrides(db: Db, orderVersionId: string, doseKey: string): Promise<OverrideReadRow[]> {
  return db.query(
    `SELECT ${columns} ${tables} WHERE w.order_version_id = $1 AND w.dose_key = $2 ORDER BY w.recorded_at, w.id`,
    [orderVersionId, doseKey],
  )
}

export function readAllOverrides(db: Db): Promise<OverrideReadRow[]> {
  return db.query(`SELECT ${columns} ${tables} ORDER BY o.number, w.recorded_at`)
}

/** Texts that were signed as overrides at a dose and that no row points at. */
export function readLooseOverrideTexts(db: Db): Promise<{ id: string; label: string }[]> {
  return db.query(
    `SELECT t.id, t.subject_label AS label FROM signed_texts t
      WHERE t.subject_kind = 'dose-override'
        AND NOT EXISTS (SELECT 1 FROM dose_overrides w WHERE w.signed_text_id = t.id)
      ORDER BY t.signed_at`,
  )
}
