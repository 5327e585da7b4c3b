import { ok, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import { quantityOf } from '../units/quantity-of.ts'
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
  const lower = volumeOfShape(atDepth(tank, depth.value.value, depth.value.value - centimetre))
  return lower.ok ? ok(full.value.litres - lower.value.litres) : lower
}

/**
 * The tank with its water at a lower depth. The diameter of a tub is that of its water line, so it moves along the wall;
 * every other shape is described by what does not change with the water.
 *
 * @param from and to in metres
 */
function atDepth(tank: Exclude<TankShape, { shape: 'stated' }>, from: number, to: number): TankShape {
  const depth = quantityOf(to, 'm')
  if (tank.shape !== 'truncated-cone') return { ...tank, depth }
  const [top, bottom] = [tank.topDiameter, tank.bottomDiameter].map((diameter) => {
    const parsed = parseQuantity(diameter, { dimension: 'length' })
    // both were read when the full tub was worked out
    return parsed.ok ? parsed.value.value : NaN
  }) as [number, number]
  return { ...tank, topDiameter: quantityOf(bottom + ((top - bottom) * to) / from, 'm'), depth }
}
