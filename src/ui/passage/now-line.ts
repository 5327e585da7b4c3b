import { stretchesBetween } from './stretches-between.ts'
import { textBox } from './passage-geometry.ts'
import type { CourseText } from './passage-geometry.ts'

/** Words in the drawing of a case, with what their room is reckoned from. */
export type CaseWords = Pick<CourseText, 'x' | 'y' | 'text' | 'anchor'> & { sizePx: number }

/** About how wide a letter is, of the height of its type. */
const letterPart = 0.47
const marginPx = 4

/** The line of now in pieces: it is broken where words stand and crosses none of them. */
export function nowLinePieces(
  x: number,
  from: number,
  until: number,
  words: readonly CaseWords[],
): { y1: number; y2: number }[] {
  const gaps = words
    .map((one) => ({ one, box: textBox(one, one.sizePx * letterPart) }))
    .filter(({ box }) => box.x1 - marginPx < x && x < box.x2 + marginPx)
    .map(({ one }) => [one.y - one.sizePx, one.y + one.sizePx / 3] as const)
    .sort(([a], [b]) => a - b)
  return stretchesBetween(from, until, gaps).map(([y1, y2]) => ({ y1, y2 }))
}
