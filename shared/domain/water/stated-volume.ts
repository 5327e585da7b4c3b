import { ok, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import { waterLimits } from './water-limits.ts'

/**
 * A volume that somebody states, in litres.
 *
 * @refuses as parseQuantity; 0.01 L to 100,000,000 L
 */
export function statedVolume(
  stated: { volume: Quantity },
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const volume = parseQuantity(stated.volume, {
    dimension: 'volume',
    above: 0,
    min: waterLimits.leastLitres,
    max: waterLimits.mostLitres,
    field: `${place.path}volume`,
  })
  if (!volume.ok) return volume
  const litres = volume.value.value
  const expression = `${enteredTerm(volume.value)} to L`
  const line = {
    key: place.key,
    code: 'water-stated' as const,
    params: place.params,
    expression,
    value: litres,
  }
  return ok({ litres, lines: [{ ...line, unit: 'L', rests: [] }] })
}
