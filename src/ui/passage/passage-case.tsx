import { passageWords } from '../../../shared/messages/passage.ts'
import { classNames } from '../class-names.ts'
import { DayRuler, dayRulerHeight } from '../day-ruler.tsx'
import { useWidth } from '../use-width.ts'
import { layCaseLabels } from './case-labels.ts'
import { harbourLines, labelWords, oldLegWords, soundings, wholeOf } from './case-words.ts'
import { CourseDrawing } from './course-drawing.tsx'
import { dayScale, weekStarts } from './day-scale.ts'
import { nowLinePieces } from './now-line.ts'
import { caseHalf, layPassage } from './passage-geometry.ts'
import { PassageFixes } from './passage-fixes.tsx'
import { passageSummary, pauseWords } from './passage-words.ts'
import type { PassageView } from './passage-view.ts'

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
  const labels = layCaseLabels(
    view,
    course.marks,
    courseY,
    width,
    course.nowX,
    (day) => passageWords.dayNumber({ day }),
    pauseWords(course, caseHalf),
  )
  const words = [
    ...course.oldLegs.flatMap((old, i) => oldLegWords(old, i === 0, scale)),
    ...labelWords(labels),
    ...soundings(view, scale, labels, courseY),
    ...harbourLines(view, course, { width, courseY, footY: water - 8 }),
  ]
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
        {words.map(({ key, x, y, anchor, look, text, lead }) => (
          <text key={key} x={x} y={y} className={classNames(look, anchors[anchor])}>
            {lead ? (
              <>
                <tspan className={lead.look}>{lead.text}</tspan>
                <tspan className={look} dx="5">
                  {text}
                </tspan>
              </>
            ) : (
              text
            )}
          </text>
        ))}
        {nowLinePieces(course.nowX, 0, water + 12, words.map(wholeOf)).map(({ y1, y2 }) => (
          <path key={y1} d={`M${course.nowX} ${y1}V${y2}`} className="p-now" />
        ))}
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
