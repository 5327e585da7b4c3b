import { useRef, useState } from 'react'
import type { KeyboardEvent } from 'react'
import { Link } from 'react-router-dom'
import { passageWords } from '../../../shared/messages/passage.ts'
import { stopAfterKey } from '../hour-ruler-geometry.ts'
import type { CourseMark } from './passage-geometry.ts'
import { markWords } from './passage-words.ts'
import type { PassageView } from './passage-view.ts'

const target = 24

/**
 * The marks of one passage as things to focus and open. One tab stop a passage; arrows go along the course. Each target
 * is 24 px high and up to 24 wide; between close neighbours the border is halfway, so a pointer takes the nearer one.
 */
export function PassageFixes({
  view,
  marks,
  width,
  onOpenFix,
}: {
  view: PassageView
  marks: readonly CourseMark[]
  /** Width of the drawing. */
  width: number
  onOpenFix?: ((fixIds: string[]) => void) | undefined
}) {
  const nodes = useRef<(HTMLElement | null)[]>([])
  const [stop, setStop] = useState<number | null>(null)
  const [named, setNamed] = useState<number | null>(null)
  if (marks.length === 0) return null
  const due = marks.findIndex((mark) => mark.state === 'overdue' || mark.state === 'due')
  const current = Math.min(stop ?? Math.max(0, due), marks.length - 1)
  const shown = named === null ? undefined : marks[named]

  return (
    <>
      <ul aria-label={passageWords.courseOf({ name: `${view.number} ${view.name}` })}>
        {marks.map((mark, i) => {
          const edges = reach(marks, i)
          const shared = {
            className: 'passage-fix',
            tabIndex: i === current ? 0 : -1,
            'aria-label': markWords(mark, view),
            style: {
              left: mark.x - edges.left,
              top: mark.y - target / 2,
              width: edges.left + edges.right,
              height: target,
            },
            onFocus: () => {
              setStop(i)
              setNamed(i)
            },
            onBlur: () => setNamed(null),
            onMouseEnter: () => setNamed(i),
            onMouseLeave: () => setNamed(null),
            onKeyDown: (event: KeyboardEvent) => {
              const next = stopAfterKey(event.key, i, marks.length)
              if (next === null) return
              event.preventDefault()
              nodes.current[next]?.focus()
            },
          }
          const keep = (node: HTMLElement | null) => {
            nodes.current[i] = node
          }
          const to = mark.fixes[0]?.to
          return (
            <li key={mark.fixes[0]?.id}>
              {to !== undefined && !onOpenFix ? (
                <Link {...shared} ref={keep} to={to} />
              ) : (
                <button
                  {...shared}
                  ref={keep}
                  type="button"
                  onClick={() => onOpenFix?.(mark.fixes.map((fix) => fix.id))}
                />
              )}
            </li>
          )
        })}
      </ul>
      {shown ? (
        <p className="passage-tip" aria-hidden="true" style={tipPlace(shown, width)}>
          {markWords(shown, view)}
        </p>
      ) : null}
    </>
  )
}

/** How far a target reaches to each side: 12, or half the way to the neighbour on the same course. */
function reach(marks: readonly CourseMark[], i: number): { left: number; right: number } {
  const mark = marks[i]
  const half = target / 2
  if (!mark) return { left: half, right: half }
  const beside = marks.filter((other) => other !== mark && Math.abs(other.y - mark.y) < target)
  const gap = (side: -1 | 1) =>
    Math.min(
      half,
      ...beside.filter((o) => Math.sign(o.x - mark.x) === side).map((o) => Math.abs(o.x - mark.x) / 2),
    )
  return { left: gap(-1), right: gap(1) }
}

/** Under the mark, and on the side where there is more room. */
function tipPlace(mark: CourseMark, width: number) {
  const top = mark.y + 16
  return mark.x > width / 2
    ? { right: Math.max(2, width - mark.x - 8), top }
    : { left: Math.max(2, mark.x - 8), top }
}
