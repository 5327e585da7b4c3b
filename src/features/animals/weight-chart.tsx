import type { WeightEntry } from '../../../shared/contracts/animals.contract.ts'
import { animalWords } from '../../../shared/messages/animal-sheet.ts'
import { sayDate } from '../../../shared/messages/say-date.ts'
import { useWidth } from '../../ui/use-width.ts'
import { layOutWeights } from './weight-chart-model.ts'
import type { MassUnit } from './weight-text.ts'
import { weightOfOne } from './weight-text.ts'

const height = 210
const cross = 4.5

/** Weights over time in the plausible range. The same figures stand in the list under it. */
export function WeightChart({
  weights,
  band,
  bandWords,
  unit,
  now,
  zone,
}: {
  weights: readonly WeightEntry[]
  band: { lowKg: number; highKg: number } | null
  /** "10 to 100 kg", or nothing. */
  bandWords: string
  unit: MassUnit
  now: string
  zone: string
}) {
  const [place, width] = useWidth<HTMLDivElement>(560)
  const chart = layOutWeights({ weights, band, unit, width, height, now, zone })
  const last = weights.find((weight) => weight.struck === null)
  if (!chart || !last) return <div ref={place} />
  const { plot } = chart
  const end = chart.points.at(-1)
  const lastText = weightOfOne(last, unit).text
  const label = animalWords.chartLabel({
    count: chart.points.length,
    last: lastText,
    on: sayDate(last.happenedOn),
    range: bandWords,
  })
  return (
    <div ref={place}>
      <svg
        width={width}
        height={height}
        viewBox={`0 0 ${String(width)} ${String(height)}`}
        role="img"
        aria-label={label}
      >
        <rect
          x={plot.left}
          y={plot.top}
          width={plot.right - plot.left}
          height={plot.bottom - plot.top}
          fill="var(--paper)"
          stroke="var(--hair)"
        />
        {chart.band ? (
          <>
            <rect
              x={plot.left}
              y={chart.band.top}
              width={plot.right - plot.left}
              height={chart.band.bottom - chart.band.top}
              fill="var(--shallow)"
            />
            <text x={plot.right - 6} y={chart.band.top + 14} className="s-11 s-n s-2 end">
              {chart.band.wider
                ? animalWords.plausibleWide({ range: bandWords })
                : animalWords.plausible({ range: bandWords })}
            </text>
          </>
        ) : null}
        {chart.yTicks.map((tick) => (
          <g key={tick.text}>
            <path d={`M${String(plot.left - 4)} ${String(tick.y)}h4`} stroke="var(--line)" />
            <text x={plot.left - 7} y={tick.y + 4} className="s-11 s-n s-2 end">
              {tick.text}
            </text>
          </g>
        ))}
        <polyline
          points={chart.points.map((point) => `${point.x.toFixed(1)},${point.y.toFixed(1)}`).join(' ')}
          fill="none"
          stroke="var(--ink)"
          strokeWidth="1.6"
        />
        {chart.points.map((point) => (
          <g key={point.id}>
            <circle cx={point.x} cy={point.y} r="4" fill="var(--ink)" />
            <circle cx={point.x} cy={point.y} r="1.7" fill="var(--paper)" />
            {point.doubtful ? (
              <circle
                cx={point.x}
                cy={point.y}
                r="7.5"
                fill="none"
                stroke="var(--ink)"
                strokeDasharray="2 2"
              />
            ) : null}
          </g>
        ))}
        {chart.struck.map((point) => (
          <path
            key={point.id}
            d={`M${String(point.x - cross)} ${String(point.y - cross)}l${String(2 * cross)} ${String(2 * cross)}m0 ${String(-2 * cross)}l${String(-2 * cross)} ${String(2 * cross)}`}
            stroke="var(--ink-3)"
            strokeWidth="2"
          />
        ))}
        {end ? (
          <text
            x={Math.min(end.x, plot.right)}
            y={end.y > plot.top + 26 ? end.y - 13 : end.y + 20}
            className="s-13 s-b end"
          >
            {lastText}
          </text>
        ) : null}
        <rect
          x={plot.left + 0.5}
          y={plot.bottom + 5.5}
          width={plot.right - plot.left - 1}
          height="7"
          fill="var(--paper)"
          stroke="var(--ink)"
        />
        {chart.grades.map((grade) => (
          <rect
            key={grade.x}
            x={grade.x}
            y={plot.bottom + 7.5}
            width={grade.width}
            height="3"
            fill="var(--ink)"
          />
        ))}
        {chart.xLabels.map((mark) => (
          <text key={mark.date} x={mark.x} y={plot.bottom + 28} className="s-11 s-n s-2">
            {sayDate(mark.date)}
          </text>
        ))}
      </svg>
    </div>
  )
}
