import type { FlagLetter } from '../../../shared/domain/documents/pdf-document-model.ts'
import type { Canvas } from './canvas.ts'
import { colour, px } from './type-scale.ts'

/**
 * A signal flag as vector with an ink outline. L is quartered yellow at the mast top, C five stripes, N sixteen checks
 * with blue first. The words stand beside it; the flag carries nothing alone.
 */
export function drawFlag(canvas: Canvas, flag: FlagLetter, x: number, top: number, side: number): void {
  const part = (fraction: number): number => side * fraction
  canvas.box(x, top, side, side, { fill: flag === 'Q' || flag === 'L' ? colour.quarantine : colour.paper })
  if (flag === 'L') {
    canvas.box(x + part(0.5), top, part(0.5), part(0.5), { fill: colour.ink })
    canvas.box(x, top + part(0.5), part(0.5), part(0.5), { fill: colour.ink })
  }
  if (flag === 'C') {
    const stripes = [colour.flagBlue, colour.paper, colour.flagRed, colour.paper, colour.flagBlue]
    stripes.forEach((fill, i) => canvas.box(x, top + part(i / 5), side, part(1 / 5), { fill }))
  }
  if (flag === 'N')
    for (let row = 0; row < 4; row++)
      for (let column = row % 2; column < 4; column += 2)
        canvas.box(x + part(column / 4), top + part(row / 4), part(1 / 4), part(1 / 4), {
          fill: colour.flagBlue,
        })
  canvas.box(x, top, side, side, { stroke: { weight: px(1) } })
}
