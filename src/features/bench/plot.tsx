import { memo, useId, useMemo, useState } from 'react'
import { curveOf, type Curve, type CurvePoint } from '../../../shared/bench/curve.ts'
import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { axisName, sayAcross, sayUp } from '../../../shared/bench/say-curve.ts'
import { benchPlotWords as words } from '../../../shared/messages/bench-plot.ts'
import { Quantity } from '../../ui/quantity.tsx'
import { useWidth } from '../../ui/use-width.ts'
import { layOutCurve } from './plot-model.ts'

const height = 232
const narrowest = 240

/**
 * How the result changes with one input, or over the days of a plan; nothing where the calculator has no such curve or the
 * question is not answered.
 *
 * @param body the question. It may lag behind what is typed: a curve asks the calculator dozens of times
 */
export const BenchPlot = memo(function BenchPlot({ of, body }: { of: AnyCalculator; body: unknown }) {
  const curve = useMemo(() => curveOf(of, body), [of, body])
  return curve ? <CurveFigure of={of} curve={curve} /> : null
})

function CurveFigure({ of, curve }: { of: AnyCalculator; curve: Curve }) {
  const [open, setOpen] = useState(false)
  const heading = useId()
  return (
    <section className="bench-plot" aria-labelledby={heading}>
      <h2 id={heading} className="t-head">
        {words.heading}
      </h2>
      <p className="bench-plot-axis">{axisName(of, curve.up)}</p>
      <CurveDrawing of={of} curve={curve} />
      <p className="bench-plot-axis is-across">{axisName(of, curve.across)}</p>
      <details className="bench-plot-table" onToggle={(event) => setOpen(event.currentTarget.open)}>
        <summary>{words.asTable}</summary>
        {open ? <CurveTable of={of} curve={curve} /> : null}
      </details>
    </section>
  )
}

function CurveDrawing({ of, curve }: { of: AnyCalculator; curve: Curve }) {
  const [place, given] = useWidth<HTMLDivElement>(360)
  const width = Math.max(given, narrowest)
  const [title, description] = [useId(), useId()]
  const { plot, runs, dots, own, acrossTicks, upTicks, grades } = layOutCurve(curve, width, height)
  return (
    <div ref={place} className="bench-plot-place">
      <svg
        width={width}
        height={height}
        viewBox={`0 0 ${String(width)} ${String(height)}`}
        role="img"
        aria-labelledby={title}
        aria-describedby={description}
      >
        <title id={title}>
          {words.label({ up: axisName(of, curve.up), across: axisName(of, curve.across) })}
        </title>
        <desc id={description}>{describe(curve)}</desc>
        {upTicks.map(({ at, text }) => (
          <g key={text}>
            <path d={`M${String(plot.left)} ${String(at)}H${String(plot.right)}`} className="p-grid" />
            <path d={`M${String(plot.left - 4)} ${String(at)}h4`} className="p-line" />
            <text x={plot.left - 7} y={at + 4} className="s-11 s-n s-2 end">
              {text}
            </text>
          </g>
        ))}
        <path d={`M${String(plot.left)} ${String(plot.top)}V${String(plot.bottom)}`} className="p-line" />
        {own ? (
          <path
            d={`M${String(plot.left)} ${String(own.y)}H${String(own.x)}V${String(plot.bottom)}`}
            className="p-guide"
          />
        ) : null}
        {runs.map((points) => (
          <polyline key={points} points={points} className="p-curve" />
        ))}
        {dots.map(({ x, y }) => (
          <circle key={x} cx={x} cy={y} r="3" className="p-ink" />
        ))}
        <rect
          x={plot.left + 0.5}
          y={plot.bottom + 0.5}
          width={plot.right - plot.left - 1}
          height="7"
          fill="var(--paper)"
          stroke="var(--ink)"
        />
        {grades.map(({ x, width: wide }) => (
          <rect key={x} x={x} y={plot.bottom + 2.5} width={wide} height="3" className="p-ink" />
        ))}
        {acrossTicks.map(({ at, text }) => (
          <g key={text}>
            <path d={`M${String(at)} ${String(plot.bottom + 8)}v4`} className="p-line" />
            <text x={at} y={plot.bottom + 25} className="s-11 s-n s-2 mid">
              {text}
            </text>
          </g>
        ))}
        {own ? (
          <>
            <circle cx={own.x} cy={own.y} r="5" className="p-ink" />
            <circle cx={own.x} cy={own.y} r="1.8" className="p-paper" />
            <text x={own.textX} y={own.textY} className="s-13 s-b p-own">
              {own.text}
            </text>
          </>
        ) : null}
      </svg>
    </div>
  )
}

function describe(curve: Curve): string {
  const answered = curve.points.filter(({ up }) => up !== null)
  const own = answered.find((point) => point.own)
  const sayPoint = (point: CurvePoint | undefined) =>
    point
      ? words.point({ across: sayAcross(curve, point).text, up: sayUp(curve, point)?.text ?? words.noAnswer })
      : ''
  return [
    words.ends({
      first: sayPoint(answered[0]),
      last: sayPoint(answered.at(-1)),
      count: answered.length,
    }),
    ...(own ? [words.own({ point: sayPoint(own) })] : []),
    ...(answered.length < curve.points.length ? [words.gaps] : []),
  ].join(' ')
}

function CurveTable({ of, curve }: { of: AnyCalculator; curve: Curve }) {
  return (
    <table className="bench-schedule" aria-label={words.heading}>
      <thead>
        <tr>
          <th scope="col">{axisName(of, { ...curve.across, scale: 'even' })}</th>
          <th scope="col">{axisName(of, { ...curve.up, scale: 'even' })}</th>
        </tr>
      </thead>
      <tbody>
        {curve.points.map((point) => {
          const up = sayUp(curve, point)
          return (
            <tr key={point.across} className={point.own ? 'is-own' : undefined}>
              <th scope="row">
                {point.own ? <span className="t-2">{words.ownRow} </span> : null}
                {sayAcross(curve, point).number}
              </th>
              <td className="num">{up ? <Quantity of={{ ...up, text: up.number }} /> : words.noAnswer}</td>
            </tr>
          )
        })}
      </tbody>
    </table>
  )
}
