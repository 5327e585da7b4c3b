import { formatReading } from '../domain/quantities/format-reading.ts'
import type { FormattedQuantity } from '../domain/quantities/formatted-quantity.ts'
import { quantityOf } from '../domain/units/quantity-of.ts'
import { unitOf } from '../domain/units/unit-of.ts'
import { benchPlotWords as words } from '../messages/bench-plot.ts'
import type { Curve, CurveAxis, CurvePoint } from './curve.ts'
import type { AnyCalculator } from './definition.ts'
import { formatFigure } from './present.ts'
import { roundFigure } from './round-figure.ts'
import { say, wordOf } from './words.ts'

/** What is read off an axis: "Concentration left, mg/L". */
export function axisName(of: AnyCalculator, axis: CurveAxis): string {
  const name = wordOf(of, `axis.${axis.word}`) ?? say(of, axis.word)
  const { symbol, symbolFirst } = unitOf(axis.unit)
  const whole = symbol === '' || symbolFirst ? name : words.axis({ name, symbol })
  return axis.scale === 'tenfold' ? words.tenfold({ axis: whole }) : whole
}

/** A place on the horizontal axis, without trailing zeros. */
export function sayAcross(curve: Curve, point: CurvePoint): FormattedQuantity {
  return formatReading(quantityOf(Number(point.across.toPrecision(6)), curve.across.unit))
}

/** What is read there: the person's own as the result shows it, any other with the digits that the formula supports. */
export function sayUp(curve: Curve, point: CurvePoint): FormattedQuantity | null {
  if (point.up === null) return null
  return formatFigure(point.own ?? roundFigure({ ...curve.up, key: curve.up.word, value: point.up }, null))
}

/**
 * Some of the points of a curve, evenly spread, for where there is no room for all: both ends, and the person's own.
 *
 * @param most how many there may be, 3 and more
 */
export function fewerPoints({ points }: Curve, most: number): CurvePoint[] {
  if (points.length <= most) return [...points]
  const own = points.findIndex((point) => point.own)
  // the own point stands between the others, and takes the place of none
  const others = points.flatMap((_, at) => (at === own ? [] : [at]))
  const room = own === -1 ? most : most - 1
  const taken = Array.from(
    { length: room },
    (_, i) => others[Math.round((i * (others.length - 1)) / (room - 1))],
  )
  const shown = new Set([...taken, own])
  return points.filter((_, at) => shown.has(at))
}
