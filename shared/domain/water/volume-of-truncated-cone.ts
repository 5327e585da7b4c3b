import { ok, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in a tub with sloping sides: π ÷ 12 × depth × (top² + top × bottom + bottom²), diameters at the water line and
 * at the floor.
 *
 * @refuses as readLengths
 * @source  mensuration · check value geom.10
 */
export function volumeOfTruncatedCone(
  tank: Extract<TankShape, { shape: 'truncated-cone' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['topDiameter', 'bottomDiameter', 'depth'], place.path)
  if (!read.ok) return read
  const { topDiameter, bottomDiameter, depth } = read.value
  const [top, bottom] = [topDiameter.value, bottomDiameter.value]
  const [topTerm, bottomTerm] = [enteredTerm(topDiameter), enteredTerm(bottomDiameter)]
  const squares = `(${topTerm})^2 + ${topTerm} * ${bottomTerm} + (${bottomTerm})^2`
  const expression = `pi / 12 * ${enteredTerm(depth)} * (${squares})`
  const cubicMetres = (Math.PI / 12) * depth.value * (top ** 2 + top * bottom + bottom ** 2)
  return ok(oneLineVolume(place, 'water-truncated-cone', expression, cubicMetres))
}
