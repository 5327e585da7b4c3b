import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import { passageWords } from '../../../shared/messages/passage.ts'
import { classNames } from '../class-names.ts'
import { shortDay } from '../day-words.ts'
import type { CaseLabel } from './case-labels.ts'
import type { DayScale } from './day-scale.ts'
import type { CaseWords } from './now-line.ts'
import { overlap, textBox } from './passage-geometry.ts'
import type { CourseGeometry, OldLeg } from './passage-geometry.ts'
import { harbourWords } from './passage-words.ts'
import type { PassageLeg, PassageView } from './passage-view.ts'

/** Words in the drawing of a case with the classes that they are drawn in. */
export interface DrawnWords extends CaseWords {
  key: string
  look: string
  /** Said before it on the same line, in a look of its own. */
  lead?: { text: string; look: string }
}

/** A line with what leads it, as it is read. */
export const wholeOf = (words: DrawnWords): CaseWords =>
  words.lead ? { ...words, text: `${words.lead.text} ${words.text}` } : words

/** The two lines of each label of the running leg. */
export function labelWords(labels: readonly CaseLabel[]): DrawnWords[] {
  return labels.flatMap(({ x, anchor, dayY, day, wordsY, words }) => {
    const key = `${String(x)} ${String(dayY)} ${day}`
    const line = { x, anchor, sizePx: 11 }
    return [
      { ...line, key: `${key} day`, y: dayY, text: day, look: 's-11 s-b' },
      { ...line, key: `${key} words`, y: wordsY, text: words, look: 's-11 s-n s-2' },
    ]
  })
}

/** What is said of a leg that no longer counts: its length over it, its steps, and why it ended beside its end. */
export function oldLegWords(old: OldLeg, first: boolean, scale: DayScale): DrawnWords[] {
  const { leg } = old
  const days = daysBetween(leg.from, leg.until ?? leg.from)
  const left = old.breakX + 14 + (leg.endWords ?? '').length * 5.8 > scale.width
  const beside = {
    x: left ? old.breakX - 12 : old.breakX + 10,
    anchor: left ? ('end' as const) : ('start' as const),
    sizePx: 12,
  }
  const key = String(old.breakX)
  return [
    {
      key: `${key} length`,
      x: Math.max(2, old.x1 - 8),
      y: old.y - 30,
      text: first ? passageWords.firstLeg({ days }) : passageWords.earlierLeg({ days }),
      anchor: 'start',
      sizePx: 12,
      look: 's-12 s-2',
    },
    ...shownSteps(leg, scale, old.y - 13),
    ...(leg.until === null
      ? []
      : [
          {
            ...beside,
            key: `${key} end`,
            y: old.y - 5,
            text: passageWords.restartedOn({ on: shortDay(leg.until) }),
            look: 's-12 s-b',
          },
          { ...beside, key: `${key} why`, y: old.y + 10, text: leg.endWords ?? '', look: 's-12 s-2' },
        ]),
  ]
}

/** Short names of the steps of an earlier leg, as far as they have room. */
function shownSteps(leg: PassageLeg, scale: DayScale, y: number): DrawnWords[] {
  const shown: DrawnWords[] = []
  for (const fix of leg.fixes) {
    const step: DrawnWords = {
      key: fix.id,
      x: scale.x(fix.on),
      y,
      text: fix.short ?? '',
      anchor: 'middle',
      sizePx: 11,
      look: 's-11 s-n s-2',
    }
    const box = textBox(step)
    if (step.text && box.x1 > 0 && shown.every((other) => !overlap(box, textBox(other)))) shown.push(step)
  }
  return shown
}

/** Animals at each count, over the running course and under the earlier one, where no label and no later count stands. */
export function soundings(
  view: PassageView,
  scale: DayScale,
  labels: readonly CaseLabel[],
  courseY: number,
): DrawnWords[] {
  const candidates = view.legs.flatMap((leg) =>
    leg.counts
      .map((count): DrawnWords => ({
        key: `${leg.from} ${count.on}`,
        x: scale.x(count.on),
        y: leg.until === null ? courseY - 10 : courseY - 74 + 20,
        text: count.animals,
        anchor: 'middle',
        sizePx: 10.5,
        look: 'sounding',
      }))
      .filter(({ x, y }) =>
        labels.every((label) => {
          const box = textBox({
            ...label,
            text: label.words.length > label.day.length ? label.words : label.day,
            y,
          })
          return label.dayY > courseY || x + 8 < box.x1 || x - 8 > box.x2
        }),
      ),
  )
  // two counts that ran into one another would read as one number; the newest is kept
  return candidates.reduceRight<DrawnWords[]>((kept, one) => {
    const box = textBox(one)
    return kept.some((other) => overlap(box, textBox(other))) ? kept : [one, ...kept]
  }, [])
}

/** On the land: when it may be cleared at the earliest; or why nothing is set. On a narrow drawing at its foot. */
export function harbourLines(
  view: PassageView,
  course: CourseGeometry,
  { width, courseY, footY }: { width: number; courseY: number; footY: number },
): DrawnWords[] {
  const foot = { x: width - 6, y: footY, anchor: 'end', sizePx: 12, look: 's-12 s-2' } as const
  if (course.heldX !== null) return [{ ...foot, key: 'held', text: view.held ?? '' }]
  if (!view.harbour || course.harbourX === null) return []
  const days = daysBetween(view.today, view.harbour.on)
  const date = shortDay(view.harbour.on)
  const colour = view.harbour.allMet && days <= 0 && 's-g'
  const toRun = days > 0 ? passageWords.daysToRun({ days }) : harbourWords(view)
  const beside = course.harbourX + 42
  // behind the line of now and the step of today, where they would stand in the words
  const x = beside - 12 < course.nowX && course.nowX < beside + 118 ? course.nowX + 14 : beside
  if (x + 118 > width) {
    const lead = { text: date, look: classNames('s-13 s-b', colour) }
    const text = view.flag === 'C' ? toRun : `${passageWords.earliestClearance}, ${toRun}`
    return [{ ...foot, key: 'harbour', text, lead }]
  }
  const onLand = { x, anchor: 'start' as const, sizePx: 12, look: 's-12 s-2' }
  return [
    {
      ...onLand,
      key: 'harbour date',
      y: courseY - 4,
      text: date,
      sizePx: 18,
      look: classNames('s-18 s-b', colour),
    },
    ...(view.flag === 'C'
      ? []
      : [{ ...onLand, key: 'harbour', y: courseY + 12, text: passageWords.earliestClearance }]),
    { ...onLand, key: 'harbour days', y: courseY + 27, text: toRun },
  ]
}
