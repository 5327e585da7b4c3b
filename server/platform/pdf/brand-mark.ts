import type { Canvas } from './canvas.ts'
import { colour } from './type-scale.ts'

/** The project's mark on its grid of 32: a basin open to seaward between two pier heads, a fix and its course out. */
export function drawBrandMark(canvas: Canvas, x: number, top: number, side: number): void {
  const unit = side / 32
  const at = (gridX: number, gridY: number): [number, number] => [x + gridX * unit, top + gridY * unit]
  const opening = (Math.acos(8 / 12) * 180) / Math.PI
  canvas.arc(...at(14, 16), 12 * unit, opening, 360 - 2 * opening, { weight: 3.2 * unit })
  canvas.box(...at(20, 2.5), 5.6 * unit, 7.5 * unit, { fill: colour.ink })
  canvas.box(...at(20, 22), 5.6 * unit, 7.5 * unit, { fill: colour.ink })
  canvas.box(...at(13, 14.4), 19 * unit, 3.2 * unit, { fill: colour.clearance })
  canvas.circle(...at(13, 16), 3.8 * unit, { fill: colour.ink })
}
