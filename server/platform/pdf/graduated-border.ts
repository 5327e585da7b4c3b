import type { Canvas } from './canvas.ts'
import type { PageGeometry } from './page-geometry.ts'
import { colour, px } from './type-scale.ts'

/** The border of a chart sheet: two lines and between them black grades as long as the gaps, black at every corner. */
export function drawGraduatedBorder(canvas: Canvas, { outer, inner }: PageGeometry): void {
  const line = { weight: px(1) }
  canvas.box(outer.left, outer.top, outer.width, outer.height, { stroke: line })
  canvas.box(inner.left, inner.top, inner.width, inner.height, { stroke: line })
  const thick = px(3)
  const inset = (inner.left - outer.left - thick) / 2
  const left = outer.left + inset
  const top = outer.top + inset
  const width = outer.width - 2 * inset
  const height = outer.height - 2 * inset
  for (const [from, length] of grades(width))
    for (const y of [top, top + height - thick])
      canvas.box(left + from, y, length, thick, { fill: colour.ink })
  for (const [from, length] of grades(height))
    for (const x of [left, left + width - thick])
      canvas.box(x, top + from, thick, length, { fill: colour.ink })
}

/** An odd number of equal grades near 34 px, so that the first and the last are black. */
function grades(length: number): [number, number][] {
  const count = 2 * Math.round((length / px(34) - 1) / 2) + 1
  const grade = length / count
  return Array.from({ length: (count + 1) / 2 }, (_, i) => [2 * i * grade, grade])
}
