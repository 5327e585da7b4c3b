import { passageWords } from '../../../shared/messages/passage.ts'
import type { StepState } from '../step-mark.tsx'
import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import { longDay, shortDay } from '../day-words.ts'
import type { CourseGeometry, CourseMark, CourseText } from './passage-geometry.ts'
import type { PassageFix, PassageView } from './passage-view.ts'

/** A state in words. */
export function stateWords(state: StepState): string {
  return {
    done: passageWords.stepDone,
    due: passageWords.due,
    'to-come': passageWords.toCome,
    overdue: passageWords.overdue,
    failed: passageWords.failed,
  }[state]
}

/** The words over each pause of the course, above its upright ends. */
export function pauseWords(
  { pauses, y }: Pick<CourseGeometry, 'pauses' | 'y'>,
  half: number,
): Pick<CourseText, 'x' | 'y' | 'text' | 'anchor'>[] {
  return pauses.map(({ x1, x2, days }) => ({
    x: (x1 + x2) / 2,
    y: y - half - 5,
    text: passageWords.paused({ days }),
    anchor: 'middle',
  }))
}

/** "skin scrape, day 19, Thu 14 May, due today" */
export function fixWords(fix: PassageFix, dayZero: string): string {
  return passageWords.fixName({
    name: fix.name,
    day: daysBetween(dayZero, fix.on),
    on: longDay(fix.on),
    state: fix.late ?? stateWords(fix.state),
  })
}

/** Name of a mark: its step, or all the steps that stand close together. */
export function markWords(mark: CourseMark, view: PassageView): string {
  const dayZero = view.legs.find((leg) => leg.fixes.includes(mark.fixes[0] as PassageFix))?.from ?? view.today
  const each = mark.fixes.map((fix) => fixWords(fix, dayZero))
  return each.length === 1
    ? (each[0] ?? '')
    : `${passageWords.stepsTogether({ count: each.length })}: ${each.join('; ')}`
}

/** What the drawing says, for who does not see it: number, animals, day and length, due and overdue steps, harbour. */
export function passageSummary(view: PassageView): string {
  const fixes = view.legs[view.legs.length - 1]?.fixes ?? []
  const listed = (state: StepState) =>
    fixes
      .filter((fix) => fix.state === state)
      .map((fix) => `${fix.name} ${fix.late ?? stateWords(state)}`)
      .join(', ')
  return [
    `${view.number} ${view.name}`,
    view.day === null
      ? view.held
        ? passageWords.held
        : passageWords.notBegun
      : passageWords.dayOf({ day: view.day, length: view.lengthDays }),
    listed('overdue'),
    listed('due'),
    view.held ?? (view.harbour ? `${passageWords.earliestClearance} ${shortDay(view.harbour.on)}` : ''),
  ]
    .filter(Boolean)
    .join('. ')
}

/** Words beside the harbour: how long still, or that all is met. */
export function harbourWords(view: PassageView): string {
  if (!view.harbour) return ''
  if (view.flag === 'C') return passageWords.cleared
  const days = daysBetween(view.today, view.harbour.on)
  if (days <= 0)
    return view.harbour.allMet
      ? passageWords.readyToClear
      : days < 0
        ? passageWords.passed
        : passageWords.today
  return passageWords.inDays({ days })
}
