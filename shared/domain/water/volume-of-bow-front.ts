import { ok, refuse, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { valueTerm } from '../working/value-term.ts'
import { circleSegmentArea } from './circle-segment-area.ts'
import { circleSegmentExpression } from './circle-segment-expression.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in a tank whose front bows out: a rectangle and the segment of a circle. The circle's radius follows from the
 * length (its chord c) and from how far the bow stands out (s = centre width − side width): c² ÷ 8s + s ÷ 2.
 *
 * @refuses as readLengths · narrower-than-side when the middle is not wider than the side · deeper-than-shape (field
 *          centreWidth) when the bow stands out by more than half the length, which is no such segment
 * @source  mensuration · check value geom.06
 */
export function volumeOfBowFront(
  tank: Extract<TankShape, { shape: 'bow-front' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['length', 'sideWidth', 'centreWidth', 'depth'], place.path)
  if (!read.ok) return read
  const { length, sideWidth, centreWidth, depth } = read.value
  const bow = centreWidth.value - sideWidth.value
  if (bow <= 0) return refuse('narrower-than-side', `${place.path}centreWidth`)
  if (bow > length.value / 2) return refuse('deeper-than-shape', `${place.path}centreWidth`)
  const { key, params } = place
  const bowTerm = `(${enteredTerm(centreWidth)} - ${enteredTerm(sideWidth)})`
  const radius = length.value ** 2 / (8 * bow) + bow / 2
  const squareMetres = circleSegmentArea(radius, bow)
  const litres = (length.value * sideWidth.value + squareMetres) * depth.value * 1000
  const rectangle = `${enteredTerm(length)} * ${enteredTerm(sideWidth)}`
  return ok({
    litres,
    lines: [
      {
        key: `${key}-radius`,
        code: 'bow-radius',
        params,
        expression: `(${enteredTerm(length)})^2 / (8 * ${bowTerm}) + ${bowTerm} / 2 to m`,
        value: radius,
        unit: 'm',
        rests: [],
      },
      {
        key: `${key}-segment`,
        code: 'bow-segment',
        params,
        expression: circleSegmentExpression(valueTerm(radius, 'm'), bowTerm),
        value: squareMetres,
        unit: 'm2',
        rests: [`${key}-radius`],
      },
      {
        key,
        code: 'water-bow-front',
        params,
        expression: `(${rectangle} + ${valueTerm(squareMetres, 'm2')}) * ${enteredTerm(depth)} to L`,
        value: litres,
        unit: 'L',
        rests: [`${key}-segment`],
      },
    ],
  })
}
