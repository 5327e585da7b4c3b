import type { Db } from '../../platform/database/db.ts'

export interface SettingRow {
  key: string
  id: string
  value: string
  reason: string | null
  proposed_at: Date
  proposed_by_name: string | null
  confirmed_at: Date | null
  confirmed_by_name: string | null
}

/** All versions of all settings, or of one, the newest first. */
export function readSettingVersions(db: Db, key?: string): Promise<SettingRow[]> {
  return db.query(
    `SELECT v.key, v.id, v.value, v.reason, v.proposed_at, p.printed_name AS proposed_by_name,
            c.confirmed_at, q.printed_name AS confirmed_by_name
       FROM setting_versions v
       LEFT JOIN setting_confirmations c ON c.setting_version_id = v.id
       LEFT JOIN people p ON p.id = v.proposed_by
       LEFT JOIN people q ON q.id = c.confirmed_by
      WHERE $1::text IS NULL OR v.key = $1
      ORDER BY v.position DESC`,
    [key ?? null],
  )
}

/** The value of a setting that was confirmed last; null when none ever was. */
export async function readConfirmedValue(db: Db, key: string): Promise<string | null> {
  const [row]: { value: string }[] = await db.query(
    `SELECT v.value FROM setting_versions v JOIN setting_confirmations c ON c.setting_version_id = v.id
      WHERE v.key = $1 ORDER BY c.confirmed_at DESC, v.position DESC LIMIT 1`,
    [key],
  )
  return row?.value ?? null
}
