import { ok, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in a cylinder that stands on a cone. Depth is from the tip: while it is within the cone, the surface is as
 * much smaller as the depth is; above it, a third of the cone's height counts like cylinder.
 *
 * @refuses as readLengths
 * @source  mensuration · check values geom.03, geom.04
 */
export function volumeOfConeBottom(
  tank: Extract<TankShape, { shape: 'cone-bottom' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['diameter', 'coneHeight', 'depth'], place.path)
  if (!read.ok) return read
  const { diameter, coneHeight, depth } = read.value
  const [wide, cone, deep] = [enteredTerm(diameter), enteredTerm(coneHeight), enteredTerm(depth)]
  const fullSurface = (Math.PI / 4) * diameter.value ** 2
  if (depth.value <= coneHeight.value) {
    const expression = `pi / 4 * (${wide} * (${deep}) / (${cone}))^2 * ${deep} / 3`
    const surface = fullSurface * (depth.value / coneHeight.value) ** 2
    return ok(oneLineVolume(place, 'water-in-cone', expression, (surface * depth.value) / 3))
  }
  const expression = `pi / 4 * (${wide})^2 * (${cone} / 3 + ${deep} - ${cone})`
  const cubicMetres = fullSurface * (coneHeight.value / 3 + depth.value - coneHeight.value)
  return ok(oneLineVolume(place, 'water-cone-bottom', expression, cubicMetres))
}
