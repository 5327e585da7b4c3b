import { ok, refuse, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import { circleSegmentArea } from './circle-segment-area.ts'
import { circleSegmentExpression } from './circle-segment-expression.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import { waterLimits } from './water-limits.ts'

/**
 * Water in a cylinder that lies on its side: its length × the area of the circle below the water line.
 *
 * @refuses as readLengths · deeper-than-shape when the depth is more than the diameter
 * @source  mensuration · check values geom.13 to geom.22
 */
export function volumeOfHorizontalCylinder(
  tank: Extract<TankShape, { shape: 'horizontal-cylinder' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['diameter', 'length', 'depth'], place.path)
  if (!read.ok) return read
  const { diameter, length } = read.value
  const entered = read.value.depth
  if (entered.value > diameter.value * waterLimits.sameLength)
    return refuse('deeper-than-shape', `${place.path}depth`)
  // Full to the top, the last binary digit of two units decides nothing: the arcsine is steep there.
  const depth = entered.value * waterLimits.sameLength >= diameter.value ? diameter : entered
  const { key, params } = place
  const areaKey = `${key}-area`
  const squareMetres = circleSegmentArea(diameter.value / 2, depth.value)
  const litres = length.value * squareMetres * 1000
  return ok({
    litres,
    lines: [
      {
        key: areaKey,
        code: 'segment-area',
        params,
        expression: circleSegmentExpression(`${enteredTerm(diameter)} / 2`, enteredTerm(depth)),
        value: squareMetres,
        unit: 'm2',
        rests: [],
      },
      {
        key,
        code: 'water-horizontal-cylinder',
        params,
        expression: `${valueTerm(squareMetres, 'm2')} * ${enteredTerm(length)} to L`,
        value: litres,
        unit: 'L',
        rests: [areaKey],
      },
    ],
  })
}
