import { scaleLinear } from 'd3-scale'
import type { WeightEntry } from '../../../shared/contracts/animals.contract.ts'
import { addDays, facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import { instantToMs } from '../../../shared/domain/time/instant-arithmetic.ts'
import { startOfFacilityDay } from '../../../shared/domain/time/local-time.ts'
import { unitOf } from '../../../shared/domain/units/unit-of.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { MassUnit } from './weight-text.ts'

export interface WeightChartInput {
  weights: readonly WeightEntry[]
  band: { lowKg: number; highKg: number } | null
  unit: MassUnit
  width: number
  height: number
  now: string
  zone: string
}

export interface WeightChart {
  plot: { left: number; right: number; top: number; bottom: number }
  points: { id: string; x: number; y: number; doubtful: boolean }[]
  /** Weights that were struck out: crosses, beside the course. */
  struck: { id: string; x: number; y: number }[]
  band: { top: number; bottom: number; wider: boolean } | null
  yTicks: { y: number; text: string }[]
  /** Black grades of the ruler under the drawing, every second month or week. */
  grades: { x: number; width: number }[]
  xLabels: { x: number; date: string }[]
}

const marks = { left: 60, right: 14, top: 12, bottom: 40 }
const dayMs = 86_400_000
const shortestDays = 28
const labelRoomPx = 86
/** Below this nothing is laid out yet, or nothing could be read. */
const narrowest = 160

const inUnit = (kg: number, unit: MassUnit) => {
  const converted = convert(kg, 'kg', unit)
  return converted.ok ? converted.value : kg
}

/** First instants of months, or of weeks on a short scale, that fall between two dates, and one on either side. */
function gradeStarts(fromDate: string, toDate: string, days: number): string[] {
  const starts: string[] = []
  if (days > 100) {
    let [year, month] = fromDate.split('-').map(Number) as [number, number]
    for (;;) {
      const date = `${String(year)}-${String(month).padStart(2, '0')}-01`
      starts.push(date)
      if (date > toDate) return starts
      month += 1
      if (month > 12) [year, month] = [year + 1, 1]
    }
  }
  for (let date = fromDate; ; date = addDays(date, 7)) {
    starts.push(date)
    if (date > toDate) return starts
  }
}

/**
 * The drawing of weights over time inside the plausible range. The scale follows the weights, not the range: a change
 * of a few parts in a hundred must be seen.
 *
 * @returns null when there is no weight to draw, or no room
 */
export function layOutWeights(input: WeightChartInput): WeightChart | null {
  const { weights, band, unit, width, height, zone } = input
  const live = weights.filter((weight) => weight.struck === null)
  const first = weights.at(-1)
  if (live.length === 0 || !first || width < narrowest) return null
  const plot = { left: marks.left, right: width - marks.right, top: marks.top, bottom: height - marks.bottom }
  const nowMs = instantToMs(input.now)
  const times = weights.map((weight) => instantToMs(weight.happenedAt))
  const fromMs = Math.min(...times, nowMs - shortestDays * dayMs)
  const x = scaleLinear([fromMs, Math.max(nowMs, ...times)], [plot.left, plot.right])

  const values = live.map((weight) => inUnit(weight.weightKg, unit))
  const [lowest, highest] = [Math.min(...values), Math.max(...values)]
  const room = Math.max((highest - lowest) * 0.25, highest * 0.035)
  const y = scaleLinear([Math.max(0, lowest - room), highest + room], [plot.bottom, plot.top]).nice(4)
  const [bottomValue = 0, topValue = 0] = y.domain()
  const clamp = (value: number) => Math.min(Math.max(value, bottomValue), topValue)
  const at = (weight: WeightEntry) => ({
    id: weight.id,
    x: x(instantToMs(weight.happenedAt)),
    y: y(clamp(inUnit(weight.weightKg, unit))),
  })

  const ends = band && { low: inUnit(band.lowKg, unit), high: inUnit(band.highKg, unit) }
  const inView = ends !== null && ends.high > bottomValue && ends.low < topValue
  const tickTexts = y.ticks(4)
  const decimals = Math.max(0, ...tickTexts.map((tick) => (String(tick).split('.')[1] ?? '').length))

  const days = (nowMs - fromMs) / dayMs
  const fromDate = facilityDateOf(new Date(fromMs).toISOString(), zone)
  const toDate = facilityDateOf(input.now, zone)
  const starts = gradeStarts(fromDate, toDate, days).map((date) => ({
    date,
    x: Math.min(Math.max(x(instantToMs(startOfFacilityDay(date, zone))), plot.left), plot.right),
  }))
  const xLabels: { x: number; date: string }[] = []
  for (const start of starts) {
    const last = xLabels.at(-1)
    const fits = start.x + labelRoomPx * 0.6 <= plot.right && start.date >= fromDate
    if (fits && (!last || start.x - last.x >= labelRoomPx)) xLabels.push(start)
  }
  return {
    plot,
    points: live.map((weight) => ({ ...at(weight), doubtful: weight.doubt !== null })).reverse(),
    struck: weights.filter((weight) => weight.struck !== null).map(at),
    band: inView
      ? {
          top: y(clamp(ends.high)),
          bottom: y(clamp(ends.low)),
          wider: ends.high > topValue && ends.low < bottomValue,
        }
      : null,
    yTicks: tickTexts.map((tick) => ({
      y: y(tick),
      text: `${tick.toFixed(decimals)}\u00a0${unitOf(unit).symbol}`,
    })),
    grades: starts
      .flatMap((start, i) => {
        const next = starts[i + 1]
        return i % 2 === 0 && next ? [{ x: start.x, width: next.x - start.x }] : []
      })
      .filter((grade) => grade.width > 0.5),
    xLabels,
  }
}
