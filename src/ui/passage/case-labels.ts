import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import { overlap, textBox } from './passage-geometry.ts'
import type { CourseMark } from './passage-geometry.ts'
import type { PassageView } from './passage-view.ts'

/** Two lines at a mark of a case: the day, and what is done. */
export interface CaseLabel {
  x: number
  anchor: 'start' | 'middle' | 'end'
  dayY: number
  day: string
  wordsY: number
  words: string
}

/**
 * Places the labels of the running leg: under the course, over it where there is no room, and left out (they stand in
 * the table) where there is none either. Marks that are due or overdue are placed first.
 *
 * @param standing words that have their place already, such as those over a pause
 */
export function layCaseLabels(
  view: PassageView,
  marks: readonly CourseMark[],
  y: number,
  width: number,
  nowX: number,
  dayWords: (day: number) => string,
  standing: readonly Parameters<typeof textBox>[0][] = [],
): CaseLabel[] {
  const dayZero = view.legs[view.legs.length - 1]?.from ?? view.today
  const taken = standing.map((words) => textBox(words))
  const labels: CaseLabel[] = []
  const urgency = (mark: CourseMark) => (mark.state === 'overdue' || mark.state === 'due' ? 0 : 1)
  const inOrder = marks.filter((mark) => !mark.old).sort((a, b) => urgency(a) - urgency(b) || a.x - b.x)
  for (const mark of inOrder) {
    const fix = mark.fixes[0]
    if (!fix) continue
    const words = mark.fixes.length > 1 ? '' : (fix.late ?? fix.short ?? fix.name)
    const day = dayWords(daysBetween(dayZero, fix.on))
    const half = (Math.max(words.length, day.length) * 5.4) / 2
    const { x, anchor } = placeBeside(mark.x, half, width, nowX)
    for (const [dayY, wordsY] of [
      [y + 22, y + 35],
      [y - 26, y - 13],
    ] as const) {
      const boxes = [
        textBox({ x, y: dayY, text: day, anchor }),
        ...(words ? [textBox({ x, y: wordsY, text: words, anchor })] : []),
      ]
      if (boxes.some((box) => taken.some((other) => overlap(box, other)))) continue
      taken.push(...boxes)
      labels.push({ x, anchor, dayY, day, wordsY, words })
      break
    }
  }
  return labels
}

/** Centred on its mark, but never over the edge of the drawing, nor across the line of now where there is room beside it. */
function placeBeside(x: number, half: number, width: number, nowX: number): Pick<CaseLabel, 'x' | 'anchor'> {
  if (x - half < nowX && x + half > nowX) {
    const after = Math.max(nowX + 5, x - 8)
    if (x <= nowX + 1 && nowX - 10 - 2 * half >= 2) return { x: nowX - 10, anchor: 'end' }
    if (x > nowX + 1 && after + 2 * half <= width - 2) return { x: after, anchor: 'start' }
  }
  if (x - half < 2) return { x: 3, anchor: 'start' }
  if (x + half > width - 2) return { x: width - 3, anchor: 'end' }
  return { x, anchor: 'middle' }
}
