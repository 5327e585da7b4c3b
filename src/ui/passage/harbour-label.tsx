import { classNames } from '../class-names.ts'
import { shortDay } from '../day-words.ts'
import { letterPx } from './passage-geometry.ts'
import type { CourseGeometry } from './passage-geometry.ts'
import { harbourWords } from './passage-words.ts'
import type { PassageView } from './passage-view.ts'

/** Room that date and days need right of the anchor, in one line and in two. */
const roomOneLine = 125
const roomTwoLines = 82

/** Half of what a step takes along its course. */
const fixRadiusPx = 8

/** On the land of a board row: the date of earliest clearance and how far away it is; or why nothing is set. */
export function HarbourLabel({
  view,
  course,
  width,
  oneLine,
}: {
  view: PassageView
  course: CourseGeometry
  width: number
  oneLine: boolean
}) {
  const { y } = course
  if (course.heldX !== null) {
    const fits = course.heldX + 12 + (view.held ?? '').length * letterPx < width
    return (
      <text
        x={fits ? course.heldX + 12 : width - 4}
        y={fits ? y + 4 : y + 24}
        className={classNames('s-11 s-n s-2', !fits && 'end')}
      >
        {view.held}
      </text>
    )
  }
  if (!view.harbour || course.harbourX === null) return null
  const x = course.harbourX
  const date = shortDay(view.harbour.on)
  const words = harbourWords(view)
  const colour = view.harbour.allMet && x <= course.nowX + 0.5 && 's-g'
  const room = (oneLine ? roomOneLine : roomTwoLines) - 20
  // where the line of now would run through the words, or a step of today lies upon them, they stand behind it
  const crossed = x + 20 - fixRadiusPx < course.nowX && course.nowX < x + 20 + room
  const start = crossed ? course.nowX + fixRadiusPx + 4 : x + 20
  const tooNear = start + room > width
  if (oneLine || tooNear) {
    // near the edge: over the course and left of the anchor
    return (
      <text x={tooNear ? x - 8 : start} y={tooNear ? y - 10 : y + 4} className={tooNear ? 'end' : undefined}>
        <tspan className={classNames('s-13 s-b', colour)}>{date}</tspan>
        <tspan className="s-11 s-n s-2" dx="6">
          {words}
        </tspan>
      </text>
    )
  }
  return (
    <>
      <text x={start} y={y - 1} className={classNames('s-13 s-b', colour)}>
        {date}
      </text>
      <text x={start} y={y + 13} className="s-11 s-n s-2">
        {words}
      </text>
    </>
  )
}
