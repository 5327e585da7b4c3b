import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import type { Range, ReadingRow } from '../../../shared/contracts/water-facts.ts'
import { parameterNames } from '../../../shared/messages/water.ts'
import { readingWords } from '../../../shared/messages/reading-words.ts'
import { outsideSince, readingChart } from './reading-chart-model.ts'
import type { ReadingChart } from './reading-chart-model.ts'
import { passedLimitText, rangeText, readingText } from './reading-text.ts'
import { parameterHeading } from './parameter-heading.ts'

export interface ReadingMultipleProps {
  parameter: ReadingParameter
  /** Readings of this parameter in the days that are shown. */
  rows: readonly ReadingRow[]
  /** The newest ever, which may be older than the days shown. */
  latest: ReadingRow | undefined
  range: Range | undefined
  days: number
  nowMs: number
  temperatureUnit: string | undefined
  sayWhen: (at: string) => string
  onSetRange?: (() => void) | undefined
}

/** One parameter: its newest figure, its course over some days in the band that is wanted, and the words beside it. */
export function ReadingMultiple(props: ReadingMultipleProps) {
  const { parameter, rows, latest, range, days, nowMs, temperatureUnit, sayWhen, onSetRange } = props
  const chart = readingChart(rows, range, nowMs - days * 86_400_000, nowMs)
  const name = parameterHeading(parameter)
  const shown = latest ? readingText(latest, temperatureUnit) : null
  const wanted = rangeText(range, temperatureUnit)
  const outside = latest?.judgement.level === 'inner' || latest?.judgement.level === 'outer'
  return (
    <figure className="small-multiple">
      <figcaption>
        <span>{name}</span>
        {shown ? (
          <b data-quantity="reading" className={outside ? 'text-magenta' : undefined}>
            {shown.number}
            {shown.symbol && parameter !== 'ph' ? <i>{`\u00a0${shown.symbol}`}</i> : null}
          </b>
        ) : null}
      </figcaption>
      <ReadingCourse
        chart={chart}
        label={readingWords.chartLabel({
          parameter: name,
          days,
          last: shown?.text ?? readingWords.noneEver,
          wanted,
        })}
      />
      <p className="t-note small-multiple-note">
        <span>
          {noteOf(props, outside, wanted)}
          {onSetRange ? (
            <button
              type="button"
              className="small-multiple-set"
              aria-label={readingWords.changeRange({ parameter: parameterNames[parameter] })}
              onClick={onSetRange}
            >
              {readingWords.change}
            </button>
          ) : null}
        </span>
        {latest ? <span className="num">{sayWhen(latest.happenedAt)}</span> : null}
      </p>
    </figure>
  )
}

function noteOf(props: ReadingMultipleProps, outside: boolean, wanted: string): string {
  const { latest, range, rows, temperatureUnit, sayWhen } = props
  if (!latest) return wanted
  if (latest.judgement.level === 'unknown') return `${readingWords.cannotTell}; ${wanted}`
  if (!outside) return wanted
  const p = {
    limit: passedLimitText(range, latest.judgement, temperatureUnit),
    since: sayWhen(outsideSince(rows) ?? latest.happenedAt),
  }
  const { level, side } = latest.judgement
  if (level === 'outer') return side === 'low' ? readingWords.farBelow(p) : readingWords.farAbove(p)
  return side === 'low' ? readingWords.below(p) : readingWords.above(p)
}

/** The drawing: shallow between the limits, the course, rings where it lies outside, the days along the foot. */
function ReadingCourse({ chart, label }: { chart: ReadingChart; label: string }) {
  const { width, height, points, band, last, outside, days } = chart
  const lastIsOutside = last !== null && outside.some((mark) => mark.x === last.x && mark.y === last.y)
  return (
    <svg viewBox={`0 0 ${String(width)} ${String(height)}`} role="img" aria-label={label}>
      {band ? (
        <>
          <rect x="0" y={band.y} width={width} height={band.height} className="p-water" />
          <path d={`M0 ${band.y}H${width}M0 ${band.y + band.height}H${width}`} className="p-shallow-edge" />
        </>
      ) : null}
      <polyline points={points} className="p-reading" />
      {outside.map((mark) => (
        <circle key={`${mark.x} ${mark.y}`} cx={mark.x} cy={mark.y} r="2.6" className="p-outside" />
      ))}
      {last && !lastIsOutside ? <circle cx={last.x} cy={last.y} r="3.5" className="p-ink" /> : null}
      {last && lastIsOutside ? (
        <>
          <circle cx={last.x} cy={last.y} r="5.5" className="p-outside-ring" />
          <circle cx={last.x} cy={last.y} r="9" className="p-outside-ring is-outer" />
        </>
      ) : null}
      <path d={`M0 78H${width}`} className="p-foot" />
      {days.map((day) => (
        <rect key={day.x} x={day.x} y="78" width={day.width} height="3" className="p-ink" />
      ))}
    </svg>
  )
}
