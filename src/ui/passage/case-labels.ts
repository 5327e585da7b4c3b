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
 */
export function layCaseLabels(
  view: PassageView,
  marks: readonly CourseMark[],
  y: number,
  width: number,
  dayWords: (day: number) => string,
): CaseLabel[] {
  const dayZero = view.legs[view.legs.length - 1]?.from ?? view.today
  const taken: ReturnType<typeof textBox>[] = []
  const labels: CaseLabel[] = []
  const urgency = (mark: CourseMark) => (mark.state === 'overdue' || mark.state === 'due' ? 0 : 1)
  const inOrder = marks.filter((mark) => !mark.old).sort((a, b) => urgency(a) - urgency(b) || a.x - b.x)
  for (const mark of inOrder) {
    const fix = mark.fixes[0]
    if (!fix) continue
    const words = mark.fixes.length > 1 ? '' : (fix.late ?? fix.short ?? fix.name)
    const day = dayWords(daysBetween(dayZero, fix.on))
    const half = (Math.max(words.length, day.length) * 5.4) / 2
    const anchor = mark.x - half < 2 ? 'start' : mark.x + half > width - 2 ? 'end' : 'middle'
    const x = anchor === 'start' ? 3 : anchor === 'end' ? width - 3 : mark.x
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
