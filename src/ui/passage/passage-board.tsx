import { Link } from 'react-router-dom'
import { passageWords } from '../../../shared/messages/passage.ts'
import { classNames } from '../class-names.ts'
import { DayRuler, dayRulerHeight } from '../day-ruler.tsx'
import { FlagMark } from '../flag-mark.tsx'
import { useMedia } from '../use-media.ts'
import { useWidth } from '../use-width.ts'
import { coastPath, landPath } from './coast.ts'
import { CourseDrawing } from './course-drawing.tsx'
import { dayScale, weekStarts } from './day-scale.ts'
import { shortDay } from '../day-words.ts'
import { HarbourLabel } from './harbour-label.tsx'
import { layPassage } from './passage-geometry.ts'
import { PassageFixes } from './passage-fixes.tsx'
import { passageSummary } from './passage-words.ts'
import type { PassageView } from './passage-view.ts'

export interface PassageBoardProps {
  /** In the order of the board; sorted by clearance they give one coastline. */
  passages: readonly PassageView[]
  /** First and last day of the ruler. */
  from: string
  until: string
  today: string
  density: 'roomy' | 'close'
}

/** Height of a row, where its course stands, and the room for its head when it stands over the course. */
const rowSizes = {
  roomy: { height: 68, course: 33, head: 0 },
  close: { height: 44, course: 22, head: 0 },
  stacked: { height: 124, course: 88, head: 54 },
} as const

const shoreBehindHarbour = 13

/** Every case as a passage on one day ruler. Each row's link opens its case; each mark can be focused and opened. */
export function PassageBoard({ passages, from, until, today, density }: PassageBoardProps) {
  const phone = useMedia('(max-width: 600px)')
  const [frame, width] = useWidth<HTMLDivElement>(852)
  const layout = phone ? rowSizes.stacked : rowSizes[density]
  const size = phone || density === 'roomy' ? 'roomy' : 'close'
  const scale = dayScale(from, until, width)
  const height = passages.length * layout.height
  const rows = passages.map((view, i) => {
    const top = i * layout.height
    const course = layPassage(view, scale, top + layout.course, size)
    const shoreX = course.harbourX === null ? width + 40 : course.harbourX + shoreBehindHarbour
    return { view, course, top, height: layout.height, shoreX }
  })

  return (
    <div className={classNames('board', phone ? 'board-stacked' : `board-${density}`)}>
      <ol className="board-rows">
        {rows.map(({ view }, i) => (
          <li key={view.id}>
            <BoardRow
              view={view}
              third={i % 3 === 2}
              height={phone ? layout.head : layout.height}
              close={density === 'close' && !phone}
            />
            {phone ? (
              <div className="board-head-gap" style={{ height: layout.height - layout.head }} />
            ) : null}
          </li>
        ))}
      </ol>
      <div ref={frame} className="passage min-w-0 overflow-hidden">
        <svg
          width={width}
          height={height}
          viewBox={`0 0 ${width} ${height}`}
          role="img"
          aria-label={passageWords.boardLabel({
            count: passages.length,
            from: shortDay(from),
            until: shortDay(until),
          })}
        >
          <rect width={width} height={height} className="p-water" />
          <path d={coastPath(rows, 7)} className="p-contour" />
          <path d={coastPath(rows, 13)} className="p-contour" strokeDasharray="1 3" />
          <path d={landPath(rows, width)} className="p-land" />
          <path d={coastPath(rows)} className="p-coast" />
          {weekStarts(scale).map((date) => (
            <path key={date} d={`M${scale.x(date)} 0V${height}`} className="p-grid" />
          ))}
          {rows.map((row, i) => (
            <path
              key={row.view.id}
              d={`M0 ${row.top + row.height}H${width}`}
              className="p-grid"
              strokeOpacity={i % 3 === 2 ? 0.26 : undefined}
            />
          ))}
          {rows.map(({ view, course }) => (
            <g key={view.id}>
              <CourseDrawing course={course} size={size} allMet={view.harbour?.allMet ?? false} />
              <HarbourLabel view={view} course={course} width={width} oneLine={size === 'close'} />
            </g>
          ))}
          <path d={`M${scale.x(today)} 0V${height}`} className="p-now" />
        </svg>
        <div className="passage-fixes">
          {rows.map(({ view, course }) => (
            <PassageFixes key={view.id} view={view} marks={course.marks} width={width} />
          ))}
        </div>
      </div>
      {/* stays in view while the rows scroll over it */}
      <div className="board-ruler">
        <svg
          width={width}
          height={dayRulerHeight}
          viewBox={`0 0 ${width} ${dayRulerHeight}`}
          aria-hidden="true"
        >
          <DayRuler scale={scale} today={today} y={0} />
          <path d={`M${scale.x(today)} 0V13`} className="p-now" />
        </svg>
      </div>
    </div>
  )
}

function BoardRow({
  view,
  third,
  height,
  close,
}: {
  view: PassageView
  third: boolean
  height: number
  close: boolean
}) {
  const of = view.held ? passageWords.held : passageWords.of({ length: view.lengthDays })
  const face = (
    <>
      <span className="board-day" aria-hidden="true">
        <b>{view.day ?? '–'}</b>
        <span>{of}</span>
      </span>
      <span className="board-name">{view.name}</span>
      <span className="board-detail">
        {close ? null : <FlagMark flag={view.flag} />}
        <span>{close ? view.detail : `${view.number}, ${view.detail}`}</span>
      </span>
      {close ? <FlagMark flag={view.flag} /> : null}
    </>
  )
  const shared = { className: classNames('board-row', third && close && 'is-third'), style: { height } }
  return view.to === undefined ? (
    <div {...shared}>{face}</div>
  ) : (
    <Link {...shared} to={view.to} aria-label={passageSummary(view)}>
      {face}
    </Link>
  )
}
