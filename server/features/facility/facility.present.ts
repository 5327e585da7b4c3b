import type { Setting } from '../../../shared/contracts/facility.contract.ts'
import { settings } from '../../../shared/domain/settings/settings.ts'
import type { SettingKey } from '../../../shared/domain/settings/settings.ts'
import type { SettingRow } from './facility.reads.ts'

/** A setting from its versions, the newest first: the value in force and the proposal that waits, if any. */
export function presentSetting(key: SettingKey, versions: readonly SettingRow[]): Setting {
  const confirmed = versions
    .filter((row) => row.confirmed_at !== null)
    .sort((a, b) => Number(b.confirmed_at) - Number(a.confirmed_at))[0]
  const newest = versions[0]
  const waiting = newest && newest.confirmed_at === null ? newest : undefined
  return {
    key,
    value: confirmed?.value ?? settings[key].default,
    state: confirmed ? 'confirmed' : 'default',
    confirmedBy: confirmed?.confirmed_by_name ?? null,
    confirmedAt: confirmed?.confirmed_at?.toISOString() ?? null,
    proposal: waiting
      ? {
          id: waiting.id,
          value: waiting.value,
          proposedBy: waiting.proposed_by_name ?? '',
          proposedAt: waiting.proposed_at.toISOString(),
          reason: waiting.reason,
        }
      : null,
  }
}
