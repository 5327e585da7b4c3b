import type { Result } from '../result.ts'
import { volumeByDilution } from './volume-by-dilution.ts'
import { volumeByGeometry } from './volume-by-geometry.ts'
import { volumeByMeter } from './volume-by-meter.ts'
import { volumeByStatement } from './volume-by-statement.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { VolumeSheet } from './volume-sheet.ts'

/**
 * The gross and net volume of connected water with its error and its working, by whichever way the sheet names.
 *
 * @refuses as volumeByGeometry, volumeByMeter, volumeByStatement, volumeByDilution; fields are paths into the sheet
 */
export function computeVolume(sheet: VolumeSheet): Result<VolumeDetermination, VolumeRefusal> {
  switch (sheet.method) {
    case 'geometry':
      return volumeByGeometry(sheet)
    case 'metered':
      return volumeByMeter(sheet)
    case 'stated':
      return volumeByStatement(sheet)
    case 'salt-dilution':
      return volumeByDilution(sheet)
  }
}
