import { useId, useMemo, useRef, useState } from 'react'
import type { MouseEvent } from 'react'
import { Link } from 'react-router-dom'
import { partWords } from '../../shared/messages/parts.ts'
import { HourRulerDrawing } from './hour-ruler-drawing.tsx'
import { layHourRuler, nearestStop, stopAfterKey } from './hour-ruler-geometry.ts'
import type { DueItem, RulerGeometry } from './hour-ruler-geometry.ts'
import { useWidth } from './use-width.ts'

const tipsTurnAt = 15 * 60

const stateWords = {
  done: () => partWords.tickDone,
  due: () => partWords.tickDue,
  overdue: () => partWords.tickOverdue,
}

/**
 * The hours of today across the top of the sheet, with the due work standing on them. For readers and for the keyboard
 * it is a list of links in time order, overdue first: one tab stop, arrows from tick to tick, Home, End, Enter.
 *
 * @param now facility time as shown, "14:20", and as minutes after midnight
 */
export function HourRuler({
  items,
  now,
  nowMinute,
}: {
  items: readonly DueItem[]
  now: string
  nowMinute: number
}) {
  const id = useId()
  const [frame, width] = useWidth<HTMLElement>(1408)
  const late = items.filter((item) => item.state === 'overdue').length
  const ruler = useMemo(
    () => layHourRuler(items, width, nowMinute, partWords.overdueGroup({ count: late })),
    [items, width, nowMinute, late],
  )
  const [stop, setStop] = useState(0)
  const [named, setNamed] = useState<number | null>(null)
  const [focused, setFocused] = useState(false)
  const links = useRef<(HTMLAnchorElement | null)[]>([])
  const current = Math.min(stop, Math.max(0, ruler.stops.length - 1))
  const shown = named === null ? undefined : ruler.stops[named]

  return (
    <nav ref={frame} className="hour-ruler" aria-label={partWords.dueToday} aria-describedby={id}>
      <p id={id} className="visually-hidden">
        {partWords.dueSummary({
          overdue: late,
          done: items.filter((item) => item.state === 'done').length,
          due: items.filter((item) => item.state === 'due').length,
          now,
        })}
      </p>
      <HourRulerDrawing ruler={ruler} now={now} />
      {focused && shown ? <FocusFrame stop={shown} width={width} /> : null}
      <ol>
        {ruler.stops.map(({ item, x, overdue }, i) => (
          <li key={item.id}>
            <Link
              ref={(node) => {
                links.current[i] = node
              }}
              to={item.to}
              tabIndex={i === current ? 0 : -1}
              style={{ left: x - 12, top: overdue ? -3 : 11 }}
              onFocus={() => {
                setStop(i)
                setNamed(i)
                setFocused(true)
              }}
              onBlur={() => {
                setNamed(null)
                setFocused(false)
              }}
              onKeyDown={(event) => {
                const next = stopAfterKey(event.key, i, ruler.stops.length)
                if (next === null) return
                event.preventDefault()
                links.current[next]?.focus()
              }}
            >
              <span className="visually-hidden">
                {[item.time, item.what, stateWords[item.state](), item.until].filter(Boolean).join(', ')}
              </span>
            </Link>
          </li>
        ))}
      </ol>
      <PointerTargets ruler={ruler} onName={setNamed} onOpen={(i) => links.current[i]?.click()} />
      {shown ? <RulerTip stop={shown} width={width} /> : null}
    </nav>
  )
}

/** The rank is one target; a pointer in it takes the nearest tick. Links do the same for everybody else. */
function PointerTargets({
  ruler,
  onName,
  onOpen,
}: {
  ruler: RulerGeometry
  onName: (stop: number | null) => void
  onOpen: (stop: number) => void
}) {
  const late = ruler.overdue.items.length
  const targets = [
    ...(late > 0
      ? [{ x: 0, top: -3, width: Math.max(24, ruler.overdue.rings.length * 15 + 4), from: 0, count: late }]
      : []),
    ...ruler.ranks.map((rank) => ({
      x: rank.x,
      top: 8,
      width: rank.width,
      from: ruler.stops.findIndex((stop) => stop.item === rank.items[0]),
      count: rank.items.length,
    })),
  ]
  return targets.map((target) => {
    const stopAt = (event: MouseEvent<HTMLElement>) => {
      const x = event.clientX - event.currentTarget.getBoundingClientRect().left + target.x
      return target.from + nearestStop(ruler.stops.slice(target.from, target.from + target.count), x)
    }
    return (
      <div
        key={`${target.x} ${target.top}`}
        aria-hidden="true"
        className="rank-target"
        style={{ left: target.x, top: target.top, width: target.width, height: 24 }}
        onMouseMove={(event) => onName(stopAt(event))}
        onMouseLeave={() => onName(null)}
        onClick={(event) => onOpen(stopAt(event))}
      />
    )
  })
}

function FocusFrame({ stop, width }: { stop: RulerGeometry['stops'][number]; width: number }) {
  return (
    <svg viewBox={`0 0 ${width} 38`} aria-hidden="true">
      {stop.overdue ? (
        <circle cx={stop.x} cy="9" r="10.2" className="p-ring-focus" />
      ) : (
        <rect x={stop.x - 6.5} y="12.5" width="13" height="21" rx="1" className="p-ring-focus" />
      )}
    </svg>
  )
}

function RulerTip({ stop, width }: { stop: RulerGeometry['stops'][number]; width: number }) {
  const { item, x } = stop
  const fromRight = !stop.overdue && item.dueMinute >= tipsTurnAt
  return (
    <p
      className="ruler-tip"
      aria-hidden="true"
      style={fromRight ? { right: width - x - 2 } : { left: x - 2 }}
    >
      <b>{item.time}</b> {[item.what, item.until].filter(Boolean).join(', ')}
    </p>
  )
}
