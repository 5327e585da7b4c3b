import type { Range, ReadingRow } from '../../../shared/contracts/water-facts.ts'

/** Geometry of one small multiple: what was measured over some days, and what is wanted. */
export interface ReadingChart {
  width: number
  height: number
  /** Points of the course, "x,y" each. */
  points: string
  /** The band between the inner limits, in full width; null where nothing is wanted. */
  band: { y: number; height: number } | null
  /** The newest reading. */
  last: { x: number; y: number } | null
  /** Readings outside what is wanted, to be marked. */
  outside: { x: number; y: number }[]
  /** Black grades of the days along the foot. */
  days: { x: number; width: number }[]
}

const width = 252
const height = 82
const foot = 78
const top = 6
const side = 8

/** A value's place between the lowest and the highest that are drawn. */
function scaleOf(values: readonly number[]): (value: number) => number {
  const least = Math.min(...values)
  const most = Math.max(...values)
  const spread = most - least || Math.abs(most) || 1
  const [low, high] = [least - spread * 0.12, most + spread * 0.12]
  return (value) => round(foot - 4 - ((value - low) / (high - low)) * (foot - 4 - top))
}

const round = (value: number) => Math.round(value * 10) / 10

/**
 * The drawing of one parameter.
 *
 * @param rows   readings of this parameter, in any order; those in another unit than the newest are left out, since
 *               practical salinity and g/kg have no common axis
 * @param fromMs start of the axis
 * @param untilMs end of the axis, now
 */
export function readingChart(
  rows: readonly ReadingRow[],
  range: Range | undefined,
  fromMs: number,
  untilMs: number,
): ReadingChart {
  const sorted = [...rows].sort((a, b) => (a.happenedAt < b.happenedAt ? -1 : 1))
  const unit = sorted.at(-1)?.canonicalUnit
  const drawn = sorted.filter((row) => row.canonicalUnit === unit)
  const limits = range && (unit === undefined || range.canonicalUnit === unit) ? range : undefined
  const low = limits?.innerLow ?? limits?.outerLow ?? null
  const high = limits?.innerHigh ?? limits?.outerHigh ?? null
  const values = [...drawn.map((row) => row.canonicalValue), ...[low, high].filter((one) => one !== null)]
  const y = values.length > 0 ? scaleOf(values) : () => foot
  const span = Math.max(untilMs - fromMs, 1)
  const x = (at: string) => round(side + ((Date.parse(at) - fromMs) / span) * (width - 2 * side))
  const places = drawn.map((row) => ({ row, x: x(row.happenedAt), y: y(row.canonicalValue) }))
  const last = places.at(-1)
  return {
    width,
    height,
    points: places.map((place) => `${place.x},${place.y}`).join(' '),
    band: bandOf(low, high, y),
    last: last ? { x: last.x, y: last.y } : null,
    outside: places
      .filter(({ row }) => row.judgement.level === 'inner' || row.judgement.level === 'outer')
      .map((place) => ({ x: place.x, y: place.y })),
    days: gradesOf(span),
  }
}

/** The band of what is wanted; a missing limit leaves it open to the edge. */
function bandOf(low: number | null, high: number | null, y: (value: number) => number) {
  if (low === null && high === null) return null
  const upper = high === null ? 0 : y(high)
  const lower = low === null ? foot : y(low)
  return { y: upper, height: Math.max(0, round(lower - upper)) }
}

/** Every second day is black; from 30 days on every second week. */
function gradesOf(spanMs: number): { x: number; width: number }[] {
  const days = spanMs / 86_400_000
  const step = days > 45 ? 7 : days > 20 ? 2 : 1
  const pitch = (width / days) * step
  return Array.from({ length: Math.ceil(days / step / 2) }, (_, i) => ({
    x: round(i * 2 * pitch),
    width: round(Math.min(pitch, width - i * 2 * pitch)),
  }))
}

/** Since when the readings have been outside on the same side without a break, walking back from the newest. */
export function outsideSince(rows: readonly ReadingRow[]): string | null {
  const sorted = [...rows].sort((a, b) => (a.happenedAt < b.happenedAt ? 1 : -1))
  const side = sorted[0]?.judgement.side ?? null
  if (side === null) return null
  let since: string | null = null
  for (const row of sorted) {
    if (row.judgement.side !== side) break
    since = row.happenedAt
  }
  return since
}
