import { passageWords } from '../../../shared/messages/passage.ts'
import { classNames } from '../class-names.ts'
import { DayRuler, dayRulerHeight } from '../day-ruler.tsx'
import { useWidth } from '../use-width.ts'
import { layCaseLabels } from './case-labels.ts'
import { CourseDrawing } from './course-drawing.tsx'
import { dayScale, weekStarts } from './day-scale.ts'
import type { DayScale } from './day-scale.ts'
import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import { shortDay } from '../day-words.ts'
import { layPassage, overlap, textBox } from './passage-geometry.ts'
import type { CourseGeometry, OldLeg } from './passage-geometry.ts'
import { PassageFixes } from './passage-fixes.tsx'
import { harbourWords, passageSummary } from './passage-words.ts'
import type { PassageLeg, PassageView } from './passage-view.ts'

const water = 200
const courseY = 136

/** One case as its passage, large: legs, steps with their days, now, and the harbour. */
export function PassageCase({
  view,
  from,
  until,
  onOpenFix,
}: {
  view: PassageView
  from: string
  until: string
  /** Called with the steps of the mark that was opened; without it each step's own address is a link. */
  onOpenFix?: (fixIds: string[]) => void
}) {
  const [frame, width] = useWidth<HTMLDivElement>(1128)
  const scale = dayScale(from, until, width)
  const course = layPassage(view, scale, courseY, 'case')
  const labels = layCaseLabels(view, course.marks, courseY, width, course.nowX, (day) =>
    passageWords.dayNumber({ day }),
  )
  const shoreX = course.harbourX === null ? null : course.harbourX + 13

  return (
    <div ref={frame} className="passage overflow-hidden">
      <svg
        width={width}
        height={water + dayRulerHeight}
        viewBox={`0 0 ${width} ${water + dayRulerHeight}`}
        role="img"
        aria-label={passageSummary(view)}
      >
        <rect width={width} height={water} className="p-water" />
        {shoreX === null ? null : <CaseCoast x={shoreX} width={width} />}
        {weekStarts(scale).map((date) => (
          <path key={date} d={`M${scale.x(date)} 0V${water}`} className="p-grid" />
        ))}
        <CourseDrawing course={course} size="case" allMet={view.harbour?.allMet ?? false} />
        {course.oldLegs.map((old, i) => (
          <OldLegWords key={old.breakX} old={old} first={i === 0} scale={scale} />
        ))}
        {labels.map((label) => (
          <g key={`${label.x} ${label.dayY} ${label.day}`}>
            <text x={label.x} y={label.dayY} className={classNames('s-11 s-b', anchors[label.anchor])}>
              {label.day}
            </text>
            <text x={label.x} y={label.wordsY} className={classNames('s-11 s-n s-2', anchors[label.anchor])}>
              {label.words}
            </text>
          </g>
        ))}
        <Soundings view={view} scale={scale} labels={labels} />
        <path d={`M${course.nowX} 0V${water + 12}`} className="p-now" />
        <HarbourWords view={view} course={course} width={width} />
        <DayRuler scale={scale} today={view.today} y={water} />
      </svg>
      <div className="passage-fixes">
        <PassageFixes view={view} marks={course.marks} width={width} onOpenFix={onOpenFix} />
      </div>
    </div>
  )
}

const anchors = { start: undefined, middle: 'mid', end: 'end' } as const

/** A short coast with two contours to seaward; decoration. */
function CaseCoast({ x, width }: { x: number; width: number }) {
  const line = (at: number) =>
    `M${at + 20} 0C${at + 14} 30 ${at + 24} 52 ${at + 16} 84C${at + 10} 104 ${at + 2} 112 ${at + 3} 134C${at + 4} 154 ${at + 12} 160 ${at + 13} 176C${at + 14} 190 ${at + 10} 196 ${at + 11} ${water}`
  return (
    <>
      <path d={line(x - 9)} className="p-contour" />
      <path d={line(x - 17)} className="p-contour" strokeDasharray="1 3" />
      <path d={`${line(x)}H${width}V0Z`} className="p-land" />
      <path d={line(x)} className="p-coast" />
    </>
  )
}

function OldLegWords({ old, first, scale }: { old: OldLeg; first: boolean; scale: DayScale }) {
  const { leg } = old
  const days = daysBetween(leg.from, leg.until ?? leg.from)
  const right = old.breakX + 14 + (leg.endWords ?? '').length * 5.8 > scale.width
  const x = right ? old.breakX - 12 : old.breakX + 10
  const anchor = right ? 'end' : undefined
  return (
    <>
      <text x={Math.max(2, old.x1 - 8)} y={old.y - 30} className="s-12 s-2">
        {first ? passageWords.firstLeg({ days }) : passageWords.earlierLeg({ days })}
      </text>
      {shownSteps(leg, scale, old.y - 13).map((step) => (
        <text key={step.key} x={step.x} y={step.y} className="s-11 s-n s-2 mid">
          {step.text}
        </text>
      ))}
      {leg.until ? (
        <>
          <text x={x} y={old.y - 5} className={classNames('s-12 s-b', anchor)}>
            {passageWords.restartedOn({ on: shortDay(leg.until) })}
          </text>
          <text x={x} y={old.y + 10} className={classNames('s-12 s-2', anchor)}>
            {leg.endWords}
          </text>
        </>
      ) : null}
    </>
  )
}

/** Short names of the steps of an earlier leg, as far as they have room. */
function shownSteps(leg: PassageLeg, scale: DayScale, y: number) {
  const shown: { key: string; x: number; y: number; text: string; anchor: 'middle' }[] = []
  for (const fix of leg.fixes) {
    const step = { key: fix.id, x: scale.x(fix.on), y, text: fix.short ?? '', anchor: 'middle' as const }
    const box = textBox(step)
    if (step.text && box.x1 > 0 && shown.every((other) => !overlap(box, textBox(other)))) shown.push(step)
  }
  return shown
}

/** Animals at each count, over the running course and under the earlier one, where no label stands. */
function Soundings({
  view,
  scale,
  labels,
}: {
  view: PassageView
  scale: DayScale
  labels: readonly {
    x: number
    dayY: number
    day: string
    words: string
    anchor: 'start' | 'middle' | 'end'
  }[]
}) {
  return view.legs.flatMap((leg) =>
    leg.counts
      .map((count) => ({
        ...count,
        x: scale.x(count.on),
        y: leg.until === null ? courseY - 10 : courseY - 74 + 20,
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
      )
      .map(({ on, animals, x, y }) => (
        <text key={`${leg.from} ${on}`} x={x} y={y} className="sounding">
          {animals}
        </text>
      )),
  )
}

/** On the land: when it may be cleared at the earliest; or why nothing is set. On a narrow drawing under the course. */
function HarbourWords({ view, course, width }: { view: PassageView; course: CourseGeometry; width: number }) {
  if (course.heldX !== null) {
    return (
      <text x={width - 6} y={water - 8} className="s-12 s-2 end">
        {view.held}
      </text>
    )
  }
  if (!view.harbour || course.harbourX === null) return null
  const days = daysBetween(view.today, view.harbour.on)
  const date = shortDay(view.harbour.on)
  const colour = view.harbour.allMet && days <= 0 && 's-g'
  const toRun = days > 0 ? passageWords.daysToRun({ days }) : harbourWords(view)
  const x = course.harbourX + 42
  if (x + 118 > width) {
    return (
      <text x={width - 6} y={water - 8} className="end">
        <tspan className={classNames('s-13 s-b', colour)}>{date}</tspan>
        <tspan className="s-12 s-2" dx="5">
          {`${passageWords.earliestClearance}, ${toRun}`}
        </tspan>
      </text>
    )
  }
  return (
    <>
      <text x={x} y={courseY - 4} className={classNames('s-18 s-b', colour)}>
        {date}
      </text>
      {view.flag === 'C' ? null : (
        <text x={x} y={courseY + 12} className="s-12 s-2">
          {passageWords.earliestClearance}
        </text>
      )}
      <text x={x} y={courseY + 27} className="s-12 s-2">
        {toRun}
      </text>
    </>
  )
}
