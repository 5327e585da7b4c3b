import type { Tx } from '../../platform/database/transactions.ts'
import { insertOnce } from '../../platform/database/rows.ts'
import { SettingConfirmation, SettingVersion } from './setting.entity.ts'

export function insertSettingVersion(tx: Tx, row: SettingVersion): Promise<{ created: boolean }> {
  return insertOnce(tx, SettingVersion, row, ['key', 'value', 'reason', 'proposedBy'])
}

export async function insertConfirmation(tx: Tx, row: SettingConfirmation): Promise<void> {
  await tx.manager.insert(SettingConfirmation, row)
}

/** Advisory locks of this kind stand for a setting: its versions are a ledger without a row to lock. */
const settingLocks = 4400_0005

/** Puts everybody who proposes or confirms a value of the setting in one line until the transaction ends. */
export async function lockSetting(tx: Tx, key: string): Promise<void> {
  await tx.manager.query('SELECT pg_advisory_xact_lock($1, hashtext($2))', [settingLocks, key])
}

/** One human number after the other, never twice: the counter's row is locked until the transaction ends. */
export async function takeNumber(tx: Tx, kind: string): Promise<number> {
  const [row]: [{ last_number: number }] = await tx.manager.query(
    `INSERT INTO counters AS c (kind, last_number) VALUES ($1, 1)
     ON CONFLICT (kind) DO UPDATE SET last_number = c.last_number + 1 RETURNING last_number`,
    [kind],
  )
  return row.last_number
}
