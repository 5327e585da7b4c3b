import type { CautionSettings, ConfirmedParameter } from '../../../shared/domain/cautions/caution-rule.ts'
import type { Db } from '../../platform/database/db.ts'

export interface ParameterVersionRow {
  id: string
  rule_id: string
  parameter_key: string
  entered_value: string
  entered_unit: string
  reason: string
  proposed_at: Date
  proposed_by_name: string
  confirmed_at: Date | null
  confirmed_on: string | null
  confirmed_by_name: string | null
  confirmed_reason: string | null
  jurisdiction: string | null
}

/** Every value that was proposed for a threshold, the newest first; of one threshold where one is named. */
export function readParameterVersions(
  db: Db,
  of: { ruleId?: string; key?: string } = {},
): Promise<ParameterVersionRow[]> {
  return db.query(
    `SELECT v.id, v.rule_id, v.parameter_key, v.entered_value::text AS entered_value, v.entered_unit, v.reason,
            v.proposed_at, p.printed_name AS proposed_by_name, c.confirmed_at, c.confirmed_on::text AS confirmed_on,
            q.printed_name AS confirmed_by_name, c.reason AS confirmed_reason, c.jurisdiction
       FROM rule_parameter_versions v
       JOIN people p ON p.id = v.proposed_by
       LEFT JOIN rule_parameter_confirmations c ON c.version_id = v.id
       LEFT JOIN people q ON q.id = c.confirmed_by
      WHERE ($1::text IS NULL OR v.rule_id = $1) AND ($2::text IS NULL OR v.parameter_key = $2)
      ORDER BY v.position DESC`,
    [of.ruleId ?? null, of.key ?? null],
  )
}

interface ConfirmedRow extends ConfirmedParameter {
  ruleId: keyof CautionSettings
  key: string
}

/**
 * The thresholds that were in force at an instant: of each the value confirmed last until then. A dose that is recorded
 * late is judged by those of its own time.
 */
export async function readCautionSettings(db: Db, at: Date): Promise<CautionSettings> {
  const rows: ConfirmedRow[] = await db.query(
    `SELECT DISTINCT ON (v.rule_id, v.parameter_key)
            v.rule_id AS "ruleId", v.parameter_key AS key, v.entered_value::double precision AS value,
            q.printed_name AS "confirmedBy", c.confirmed_on::text AS "confirmedOn", c.reason, c.jurisdiction
       FROM rule_parameter_confirmations c
       JOIN rule_parameter_versions v ON v.id = c.version_id
       JOIN people q ON q.id = c.confirmed_by
      WHERE c.confirmed_at <= $1
      ORDER BY v.rule_id, v.parameter_key, v.position DESC`,
    [at],
  )
  const settings: CautionSettings = {}
  for (const { ruleId, key, ...confirmed } of rows)
    settings[ruleId] = { ...settings[ruleId], [key]: confirmed }
  return settings
}
