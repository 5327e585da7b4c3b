import { ok, refuse, type Result } from '../result.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { TankShape } from './tank-shape.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in an upright elliptical tank: π ÷ 4 × long axis × short axis × depth, full axes.
 *
 * @refuses as readLengths · axes-swapped when the short axis is the longer one
 * @source  mensuration · check value geom.07
 */
export function volumeOfEllipse(
  tank: Extract<TankShape, { shape: 'elliptical' }>,
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(tank, ['longAxis', 'shortAxis', 'depth'], place.path)
  if (!read.ok) return read
  const { longAxis, shortAxis, depth } = read.value
  if (shortAxis.value > longAxis.value) return refuse('axes-swapped', `${place.path}shortAxis`)
  const expression = `pi / 4 * ${enteredTerm(longAxis)} * ${enteredTerm(shortAxis)} * ${enteredTerm(depth)}`
  const cubicMetres = (Math.PI / 4) * longAxis.value * shortAxis.value * depth.value
  return ok(oneLineVolume(place, 'water-elliptical', expression, cubicMetres))
}
