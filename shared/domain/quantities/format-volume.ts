import { convert } from '../units/convert.ts'
import type { UnitOf } from '../units/unit-table.ts'
import type { FormattedQuantity } from './formatted-quantity.ts'
import { fixedPlaces, groupThousands } from './number-text.ts'
import { withUnit } from './with-unit.ts'

/**
 * A volume of water as it stands in a line of working: one decimal place, so that a column adds up by eye.
 * A volume that is not working is drawn with its error (formatVolumeWithError).
 *
 * @throws RangeError when the volume is not a finite number
 */
export function formatVolume(litres: number, unit: UnitOf<'volume'> = 'L', places = 1): FormattedQuantity {
  const value = convert(litres, 'L', unit)
  if (!value.ok) throw new RangeError('a volume that is not a finite number cannot be drawn')
  return withUnit('volume', groupThousands(fixedPlaces(value.value, places)), unit)
}
