import { ok, refuse, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import { waterLimits } from './water-limits.ts'

/**
 * Water in a bowl that is part of a sphere: π ÷ 3 × depth² × (3 radius − depth). Filled to its radius it is a
 * hemisphere.
 *
 * @refuses as readLengths · deeper-than-shape when the depth is more than the sphere's diameter
 * @source  mensuration · check values geom.11, geom.12
 */
export function volumeOfSphericalCap(
  tank: Extract<TankShape, { shape: 'spherical-cap' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['radius', 'depth'], place.path)
  if (!read.ok) return read
  const { radius, depth } = read.value
  if (depth.value > 2 * radius.value * waterLimits.sameLength)
    return refuse('deeper-than-shape', `${place.path}depth`)
  const deep = enteredTerm(depth)
  const expression = `pi / 3 * (${deep})^2 * (3 * ${enteredTerm(radius)} - ${deep})`
  const cubicMetres = (Math.PI / 3) * depth.value ** 2 * (3 * radius.value - depth.value)
  return ok(oneLineVolume(place, 'water-spherical-cap', expression, cubicMetres))
}
