import { addDays, daysBetween } from '../../shared/domain/time/facility-date.ts'
import { longDay, shortDay } from './day-words.ts'
import type { DayScale } from './passage/day-scale.ts'

/** Height of the ruler in px. */
export const dayRulerHeight = 40
/** Room that a date takes before the next may stand. */
const dateRoom = 46

/**
 * The days under a passage: double ink line, black grades of one day, a date every 7 days with the first of a month in
 * bold, and today in an ink box. Drawn inside the SVG of the passage, at `y`.
 */
export function DayRuler({ scale, today, y }: { scale: DayScale; today: string; y: number }) {
  const { width, pxPerDay } = scale
  const days = daysBetween(scale.from, scale.until) + 1
  const gradeDays = pxPerDay >= 3 ? 1 : 7
  const nowX = scale.x(today)
  const boxX = Math.min(Math.max(nowX, 38), width - 38)
  return (
    <g>
      <rect x="0" y={y} width={width} height={dayRulerHeight} className="p-paper" />
      <path d={`M0 ${y + 0.5}H${width}M0 ${y + 9.5}H${width}`} className="p-line" />
      {Array.from({ length: Math.ceil(days / gradeDays / 2) }, (_, i) => (
        <rect
          key={i}
          x={i * 2 * gradeDays * pxPerDay}
          y={y + 3}
          width={gradeDays * pxPerDay}
          height="4"
          className="p-ink"
        />
      ))}
      {rulerDates(scale)
        .filter(({ x }) => x + dateRoom < boxX - 38 || x > boxX + 38)
        .map(({ date, x, bold }) => (
          <g key={date}>
            <path d={`M${x} ${y + 9}v5`} className="p-line" />
            <text x={x + 3} y={y + 26} className={`s-11 s-n ${bold ? 's-b' : 's-2'}`}>
              {shortDay(date)}
            </text>
          </g>
        ))}
      <rect x={boxX - 38} y={y + 13} width="76" height="19" className="p-ink" />
      <text x={boxX} y={y + 26.5} className="s-11 s-b mid s-on-ink">
        {longDay(today)}
      </text>
    </g>
  )
}

/** The dates that are printed: every 7 days, or a multiple where days are narrow; the first of a month is bold. */
export function rulerDates(scale: DayScale): { date: string; x: number; bold: boolean }[] {
  const every = 7 * Math.max(1, Math.ceil(dateRoom / (7 * scale.pxPerDay)))
  const days = daysBetween(scale.from, scale.until)
  let month = ''
  return Array.from({ length: Math.floor(days / every) + 1 }, (_, i) => addDays(scale.from, i * every))
    .map((date, i) => {
      const bold = i > 0 && date.slice(0, 7) !== month
      month = date.slice(0, 7)
      return { date, x: scale.x(date), bold }
    })
    .filter(({ x }) => x + 42 < scale.width)
}
