import { ok, type Result } from '../result.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { oneLineVolume } from './one-line-volume.ts'
import { readLengths } from './read-lengths.ts'
import type { ShapePlace, ShapeVolume } from './shape-volume.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Water in full pipework: π ÷ 4 × inner diameter² × length.
 *
 * @refuses as readLengths
 * @source  mensuration · check value geom.24
 */
export function volumeOfPipe(
  pipe: { bore: Quantity; length: Quantity },
  place: ShapePlace,
): Result<ShapeVolume, VolumeRefusal> {
  const read = readLengths(pipe, ['bore', 'length'], place.path)
  if (!read.ok) return read
  const { bore, length } = read.value
  const expression = `pi / 4 * (${enteredTerm(bore)})^2 * ${enteredTerm(length)}`
  return ok(oneLineVolume(place, 'water-pipe', expression, (Math.PI / 4) * bore.value ** 2 * length.value))
}
