import { ok, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in an upright cylinder, π ÷ 4 × diameter² × depth, or in the half of one with a flat back.
 *
 * @refuses as readLengths
 * @source  mensuration · check values geom.02, geom.05
 */
export function volumeOfCylinder(
  tank: Extract<TankShape, { shape: 'cylindrical' | 'half-cylindrical' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['diameter', 'depth'], place.path)
  if (!read.ok) return read
  const { diameter, depth } = read.value
  const whole = `pi / 4 * (${enteredTerm(diameter)})^2 * ${enteredTerm(depth)}`
  const cubicMetres = (Math.PI / 4) * diameter.value ** 2 * depth.value
  return ok(
    tank.shape === 'cylindrical'
      ? oneLineVolume(place, 'water-cylindrical', whole, cubicMetres)
      : oneLineVolume(place, 'water-half-cylindrical', `${whole} / 2`, cubicMetres / 2),
  )
}
