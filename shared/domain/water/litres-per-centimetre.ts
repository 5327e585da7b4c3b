import { ok, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { TankShape } from './tank-shape.ts'
import { volumeOfShape } from './volume-of-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

const centimetre = 0.01

/**
 * The water in the uppermost centimetre of a tank: what a mark read 1 cm too high or too low is worth.
 *
 * @returns litres; of water shallower than 1 cm, all of it; undefined for a stated volume, which has no depth
 * @refuses as volumeOfShape
 */
export function litresPerCentimetre(tank: TankShape): Result<number | undefined, VolumeRefusal> {
  const full = volumeOfShape(tank)
  if (!full.ok) return full
  if (tank.shape === 'stated') return ok(undefined)
  const depth = parseQuantity(tank.depth, { dimension: 'length', field: 'depth' })
  if (!depth.ok) return depth
  if (depth.value.value <= centimetre) return ok(full.value.litres)
  const lower = volumeOfShape({
    ...tank,
    depth: { value: String(depth.value.value - centimetre), unit: 'm' },
  })
  return lower.ok ? ok(full.value.litres - lower.value.litres) : lower
}
