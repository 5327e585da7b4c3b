import { ok, refuse, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import { waterLimits } from './water-limits.ts'

/**
 * Water in an upright regular polygon of n sides: n × side² ÷ (4 tan(π ÷ n)) × depth, or, measured across from flat to
 * flat, n × width² × tan(π ÷ n) ÷ 4 × depth. The two differ, so the person says which was measured.
 *
 * @refuses as readLengths · sides-not-whole unless 3…24 whole sides · measured across flats with an odd number of
 *          sides, which has no opposite flats, as sides-not-whole
 * @source  mensuration · check values geom.08, geom.09
 */
export function volumeOfPolygon(
  tank: Extract<TankShape, { shape: 'polygon' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const { sides, measured } = tank
  const whole = Number.isInteger(sides) && sides >= 3 && sides <= waterLimits.mostSides
  if (!whole || (measured === 'across-flats' && sides % 2 === 1))
    return refuse('sides-not-whole', `${place.path}sides`, { most: waterLimits.mostSides })
  const read = readLengths(tank, ['side', 'depth'], place.path)
  if (!read.ok) return read
  const { side, depth } = read.value
  const [along, deep] = [enteredTerm(side), enteredTerm(depth)]
  const tangent = Math.tan(Math.PI / sides)
  if (measured === 'side') {
    const expression = `${sides} * (${along})^2 / (4 * tan(pi / ${sides})) * ${deep}`
    return ok(
      oneLineVolume(
        place,
        'water-polygon',
        expression,
        ((sides * side.value ** 2) / (4 * tangent)) * depth.value,
      ),
    )
  }
  const expression = `${sides} * (${along})^2 * tan(pi / ${sides}) / 4 * ${deep}`
  return ok(
    oneLineVolume(
      place,
      'water-polygon',
      expression,
      ((sides * side.value ** 2 * tangent) / 4) * depth.value,
    ),
  )
}
