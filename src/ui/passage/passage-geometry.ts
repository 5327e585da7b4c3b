import type { StepState } from '../step-mark.tsx'
import type { DayScale } from './day-scale.ts'
import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import type { PassageFix, PassageLeg, PassageView } from './passage-view.ts'
import { stretchesBetween } from './stretches-between.ts'

export type PassageSize = 'roomy' | 'close' | 'case'

/** A mark on the course; several steps of one state that stand closer than 10 px are one mark with a count. */
export interface CourseMark {
  x: number
  y: number
  state: StepState
  fixes: PassageFix[]
  /** Belongs to a leg that no longer counts. */
  old: boolean
}

export interface CourseText {
  x: number
  y: number
  text: string
  anchor: 'start' | 'middle' | 'end'
  kind: 'late' | 'note' | 'sounding' | 'break'
}

export interface OldLeg {
  y: number
  x1: number
  x2: number
  /** Where the break mark stands and the dotted drop begins. */
  breakX: number
  dropTo: number
  leg: PassageLeg
}

export interface CourseGeometry {
  y: number
  nowX: number
  /** Pieces of the course made, without the pauses. */
  made: { x1: number; x2: number }[]
  /** Upright ends of each pause, and the words over it. */
  pauses: { x1: number; x2: number; days: number }[]
  ahead: { x1: number; x2: number } | null
  beginsBefore: boolean
  oldLegs: OldLeg[]
  marks: CourseMark[]
  shipX: number | null
  heldX: number | null
  harbourX: number | null
  texts: CourseText[]
}

const mergeWithin = 10
/** Half the height of the upright ends of a pause in the drawing of a case. */
export const caseHalf = 7
/** About how wide a letter of the narrow 11 px text is. */
export const letterPx = 5.4

/** How far the course of the leg before stands above the running one. */
const oldLegRise: Record<PassageSize, number> = { roomy: 14, close: 11, case: 74 }

/** Lays one passage on a day scale, its running course at `y`. */
export function layPassage(view: PassageView, scale: DayScale, y: number, size: PassageSize): CourseGeometry {
  const running = view.legs[view.legs.length - 1]
  const nowX = scale.x(view.today)
  const begin = running ? scale.x(running.from) : nowX
  const from = Math.max(0, begin)
  const rawHarbour = view.harbour && !view.held ? scale.x(view.harbour.on) : null
  const oldLegs = view.legs.slice(0, -1).map((leg) => layOldLeg(leg, scale, y, size))
  const pauses = (running?.pauses ?? []).map((pause) => ({
    x1: Math.max(from, scale.x(pause.from)),
    x2: Math.min(nowX, scale.x(pause.until ?? view.today)),
    days: daysBetween(pause.from, pause.until ?? view.today),
  }))
  const marks = [
    ...oldLegs.flatMap((old) => layMarks(old.leg, scale, old.y, true)),
    ...(running ? layMarks(running, scale, y, false) : []),
  ]
  const nearNow = (mark: CourseMark) => !mark.old && Math.abs(mark.x - nowX) < 13
  const ringOnNow = marks.some((mark) => nearNow(mark) && mark.state === 'due')
  const harbourOnNow = rawHarbour !== null && Math.abs(rawHarbour - nowX) < 12
  const crowded = marks.some((mark) => nearNow(mark) && mark.state !== 'due')

  return {
    y,
    nowX,
    made: withoutPauses(from, Math.max(from, nowX), pauses),
    pauses,
    ahead: rawHarbour !== null && rawHarbour - 9 > nowX ? { x1: nowX, x2: rawHarbour - 9 } : null,
    beginsBefore: begin < 0,
    oldLegs,
    marks,
    shipX: view.held || ringOnNow || harbourOnNow || !running ? null : nowX + (crowded ? 17 : 8),
    heldX: view.held ? nowX + 12 : null,
    harbourX: rawHarbour,
    texts: size === 'case' ? [] : layTexts(view, scale, y, { marks, oldLegs, pauses }, size),
  }
}

function layOldLeg(leg: PassageLeg, scale: DayScale, y: number, size: PassageSize): OldLeg {
  const end = scale.x(leg.until ?? leg.from)
  const at = y - oldLegRise[size]
  return { y: at, x1: Math.max(0, scale.x(leg.from)), x2: end - 4, breakX: end, dropTo: y, leg }
}

/** Marks of one leg in order; equal neighbours closer than 10 px become one with a count. */
function layMarks(leg: PassageLeg, scale: DayScale, y: number, old: boolean): CourseMark[] {
  const marks: CourseMark[] = []
  for (const fix of [...leg.fixes].sort((a, b) => daysBetween(b.on, a.on))) {
    const x = scale.x(fix.on)
    if (x < -6 || x > scale.width + 6) continue
    const before = marks[marks.length - 1]
    const mergeable = fix.state === 'done' || fix.state === 'to-come' || fix.state === 'due'
    if (before && mergeable && before.state === fix.state && x - before.x < mergeWithin) {
      before.x = (before.x * before.fixes.length + x) / (before.fixes.length + 1)
      before.fixes.push(fix)
    } else {
      marks.push({ x, y, state: fix.state, fixes: [fix], old })
    }
  }
  return marks
}

function withoutPauses(from: number, to: number, pauses: readonly { x1: number; x2: number }[]) {
  const gaps = pauses.map(({ x1, x2 }) => [x1, x2] as const)
  return stretchesBetween(from, to, gaps).map(([x1, x2]) => ({ x1, x2 }))
}

/** Words of a board row. The late ones first: what finds no free place is left out of the drawing, not of the row. */
function layTexts(
  view: PassageView,
  scale: DayScale,
  y: number,
  { marks, oldLegs, pauses }: Pick<CourseGeometry, 'marks' | 'oldLegs' | 'pauses'>,
  size: PassageSize,
): CourseText[] {
  const texts: CourseText[] = []
  const harbour = view.harbour && !view.held ? scale.x(view.harbour.on) : Infinity
  const nearEdge = harbour + (size === 'close' ? 125 : 82) > scale.width
  const land: Box = nearEdge
    ? { x1: harbour - 110, x2: harbour + 10, y1: y - 20, y2: y - 6 }
    : { x1: harbour + 16, x2: harbour + 110, y1: y - 14, y2: y + 16 }
  const rise = size === 'close' ? 9 : 11
  // the words over a pause, and the marks themselves, have their place already
  const taken: Box[] = [
    ...(size === 'close' ? [] : pauses).map(({ x1, x2 }) => around((x1 + x2) / 2, y - 12, 36, 10)),
    ...marks.filter((mark) => mark.old).map((mark) => around(mark.x, mark.y, 6, 5)),
    ...oldLegs.slice(1).map((old) => around(old.breakX, old.y, 4, 6)),
  ]
  const place = (text: CourseText) => {
    const box = textBox(text)
    const fits = box.x1 >= 0 && box.x2 <= scale.width
    if (
      fits &&
      !overlap(box, land) &&
      taken.every((other) => !overlap(box, other)) &&
      texts.every((other) => !overlap(box, textBox(other)))
    )
      texts.push(text)
  }
  for (const mark of marks) {
    const late = mark.fixes[0]?.late
    if (mark.state !== 'overdue' || !late) continue
    const words = `${mark.fixes[0]?.short ?? mark.fixes[0]?.name}, ${late}`
    const left = mark.x - 12 - words.length * letterPx < 0
    place({
      x: left ? 2 : mark.x - 12,
      y: y - rise,
      text: words,
      anchor: left ? 'start' : 'end',
      kind: 'late',
    })
  }
  for (const old of oldLegs) {
    if (old.leg.endWords) {
      place({ x: old.breakX + 9, y: old.y + 3.5, text: old.leg.endWords, anchor: 'start', kind: 'break' })
    }
  }
  for (const note of view.notes) {
    const x = scale.x(note.on)
    const left = x + 7 - note.words.length * letterPx < 0
    place({
      x: left ? 2 : x + 7,
      y: y - rise + 1,
      text: note.words,
      anchor: left ? 'start' : 'end',
      kind: 'note',
    })
  }
  if (size === 'close') return texts
  for (const leg of view.legs) {
    const legY = oldLegs.find((old) => old.leg === leg)?.y ?? y
    for (const count of leg.counts) {
      place({ x: scale.x(count.on), y: legY + 19, text: count.animals, anchor: 'middle', kind: 'sounding' })
    }
  }
  return texts
}

interface Box {
  x1: number
  x2: number
  y1: number
  y2: number
}

const around = (x: number, y: number, half: number, rise: number): Box => ({
  x1: x - half,
  x2: x + half,
  y1: y - rise,
  y2: y + rise,
})

/** About how much room a text takes in the drawing. */
export function textBox(
  { x, y, text, anchor }: Pick<CourseText, 'x' | 'y' | 'text' | 'anchor'>,
  letter: number = letterPx,
): Box {
  const width = text.length * letter
  const x1 = anchor === 'start' ? x : anchor === 'end' ? x - width : x - width / 2
  return { x1, x2: x1 + width, y1: y - 9, y2: y + 2 }
}

export function overlap(a: Box, b: Box): boolean {
  return a.x1 < b.x2 + 3 && b.x1 < a.x2 + 3 && a.y1 < b.y2 && b.y1 < a.y2
}
