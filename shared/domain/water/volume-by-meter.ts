import { refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { knownVolume } from './known-volume.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import type { VolumeSheet } from './volume-sheet.ts'

/**
 * Net volume from a water meter read before and after filling the empty system.
 *
 * @refuses as parseQuantity · meter-runs-backwards (endReading) when the second reading is not the larger · as knownVolume
 */
export function volumeByMeter(
  sheet: Extract<VolumeSheet, { method: 'metered' }>,
): Result<VolumeDetermination, VolumeRefusal> {
  const start = parseQuantity(sheet.startReading, { dimension: 'volume', min: 0, field: 'startReading' })
  if (!start.ok) return start
  const end = parseQuantity(sheet.endReading, { dimension: 'volume', min: 0, field: 'endReading' })
  if (!end.ok) return end
  const litres = end.value.value - start.value.value
  if (litres <= 0) return refuse('meter-runs-backwards', 'endReading')
  const expression = `${enteredTerm(end.value)} - ${enteredTerm(start.value)} to L`
  const line = { key: 'net-volume', code: 'water-metered' as const, params: {}, expression, value: litres }
  return knownVolume('metered', [{ ...line, unit: 'L', rests: [] }], litres, sheet.errorPercent)
}
