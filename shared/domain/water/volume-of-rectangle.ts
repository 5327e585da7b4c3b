import { ok, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in a rectangular tank: length × width × depth.
 *
 * @refuses as readLengths
 * @source  mensuration · check values geom.01, bath.03
 */
export function volumeOfRectangle(
  tank: Extract<TankShape, { shape: 'rectangular' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['length', 'width', 'depth'], place.path)
  if (!read.ok) return read
  const { length, width, depth } = read.value
  const expression = `${enteredTerm(length)} * ${enteredTerm(width)} * ${enteredTerm(depth)}`
  return ok(oneLineVolume(place, 'water-rectangular', expression, length.value * width.value * depth.value))
}
