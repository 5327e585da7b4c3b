import { AnchorMark } from '../empty-harbour.tsx'
import { StepMark } from '../step-mark.tsx'
import { classNames } from '../class-names.ts'
import { caseHalf } from './passage-geometry.ts'
import type { CourseGeometry, CourseMark, CourseText, PassageSize } from './passage-geometry.ts'
import { pauseWords } from './passage-words.ts'

/** The linework of one passage: legs, course, marks, ship or strokes of a hold, harbour. */
export function CourseDrawing({
  course,
  size,
  allMet,
}: {
  course: CourseGeometry
  size: PassageSize
  allMet: boolean
}) {
  const { y, nowX } = course
  const inCase = size === 'case'
  const half = inCase ? caseHalf : 5
  return (
    <g>
      {course.oldLegs.map((old) => (
        <g key={old.x2}>
          <path d={`M${old.x1} ${old.y}H${old.x2}`} className="p-old" />
          <BreakMark x={old.breakX} y={old.y} />
          <path d={`M${old.breakX} ${old.y + 9}V${old.dropTo - 8}`} className="p-drop" />
        </g>
      ))}
      {course.beginsBefore ? <path d={`M0 ${y}l6 -4v8z`} className="p-ink" opacity=".6" /> : null}
      {course.made.map((piece) => (
        <path
          key={piece.x1}
          d={`M${piece.x1} ${y}H${piece.x2}`}
          className={classNames('p-course', inCase && 'p-course-case')}
        />
      ))}
      {course.pauses.map((pause) => (
        <g key={pause.x1}>
          <path
            d={`M${pause.x1} ${y - half}v${half * 2}M${pause.x2} ${y - half}v${half * 2}`}
            className="p-line"
          />
        </g>
      ))}
      {(size === 'close' ? [] : pauseWords(course, half)).map((words) => (
        <text key={words.x} x={words.x} y={words.y} className="s-11 s-n s-2 mid">
          {words.text}
        </text>
      ))}
      {course.ahead ? <path d={`M${course.ahead.x1} ${y}H${course.ahead.x2}`} className="p-ahead" /> : null}
      {course.texts.map((text) => (
        <CourseWords key={`${text.kind} ${text.x} ${text.text}`} text={text} />
      ))}
      {inFront(course.marks).map((mark) => (
        <MergedMark key={`${mark.x} ${mark.y}`} mark={mark} small={!inCase} />
      ))}
      {course.shipX === null ? null : (
        <path d={`M${course.shipX} ${y}l-13 -5.5l3.5 5.5l-3.5 5.5z`} className="p-ink" />
      )}
      {course.heldX === null ? null : <HeldMark x={course.heldX} y={y} />}
      {course.harbourX === null ? null : (
        <AnchorMark
          x={course.harbourX}
          y={y}
          scale={inCase ? 1.3 : 0.95}
          met={allMet && course.harbourX <= nowX + 0.5}
        />
      )}
    </g>
  )
}

/** What is due stands in front where marks overlap. */
function inFront(marks: readonly CourseMark[]): CourseMark[] {
  const due = (mark: CourseMark) => mark.state === 'due' || mark.state === 'overdue'
  return [...marks.filter((mark) => !due(mark)), ...marks.filter(due)]
}

/** Two leaning strokes: the clock was restarted here. */
export function BreakMark({ x, y }: { x: number; y: number }) {
  return <path d={`M${x - 1} ${y - 7}l-4 14m7 -14l-4 14`} className="p-break" />
}

/** Two upright strokes across the course: held. */
export function HeldMark({ x, y }: { x: number; y: number }) {
  return <path d={`M${x} ${y - 9}v18m4 -18v18`} className="p-line" strokeWidth="1.6" />
}

function MergedMark({ mark, small }: { mark: CourseMark; small: boolean }) {
  const { x, y, state, fixes, old } = mark
  if (fixes.length === 1) {
    const step = <StepMark state={state} x={x} y={y} small={small} />
    return old ? <g opacity=".7">{step}</g> : step
  }
  return (
    <g opacity={old ? 0.7 : undefined}>
      <circle
        cx={x}
        cy={y}
        r="7"
        className={state === 'done' ? 'p-done' : state === 'due' ? 'p-due' : 'p-to-come'}
      />
      <text x={x} y={y + 3.8} className={classNames('s-10 s-b mid', state === 'done' && 's-paper')}>
        {fixes.length}
      </text>
    </g>
  )
}

const looks: Record<CourseText['kind'], string> = {
  late: 's-11 s-m s-b s-n',
  note: 's-11 s-n s-2',
  break: 's-11 s-n s-2',
  sounding: 'sounding',
}

function CourseWords({ text }: { text: CourseText }) {
  return (
    <text
      x={text.x}
      y={text.y}
      className={classNames(
        looks[text.kind],
        text.anchor === 'end' && 'end',
        text.anchor === 'middle' && 'mid',
      )}
    >
      {text.text}
    </text>
  )
}
