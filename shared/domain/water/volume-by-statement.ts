import type { Result } from '../result.ts'
import { knownVolume } from './known-volume.ts'
import { statedVolume } from './stated-volume.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { VolumeSheet } from './volume-sheet.ts'

/**
 * Net volume as somebody states it, with the error that they state.
 *
 * @refuses as statedVolume and knownVolume
 */
export function volumeByStatement(
  sheet: Extract<VolumeSheet, { method: 'stated' }>,
): Result<VolumeDetermination, VolumeRefusal> {
  const volume = statedVolume(sheet, { key: 'net-volume', path: '', params: { role: 'net' } })
  if (!volume.ok) return volume
  return knownVolume('stated', volume.value.lines, volume.value.litres, sheet.errorPercent)
}
