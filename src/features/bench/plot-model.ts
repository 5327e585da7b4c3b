import type { Curve, CurveAxis, CurvePoint } from '../../../shared/bench/curve.ts'
import { sayUp } from '../../../shared/bench/say-curve.ts'
import { formatDose } from '../../../shared/domain/quantities/format-dose.ts'
import { formatReading } from '../../../shared/domain/quantities/format-reading.ts'
import { benchPlotWords as words } from '../../../shared/messages/bench-plot.ts'

export interface Tick {
  /** CSS px along its axis. */
  at: number
  text: string
}

export interface PlotDrawing {
  plot: { left: number; right: number; top: number; bottom: number }
  /** "x,y" points of each unbroken piece of the line. */
  runs: string[]
  /** Answers to be seen as points: the steps of a plan, and what has a gap on either side. */
  dots: { x: number; y: number }[]
  /** The words begin at `textX`. */
  own: { x: number; y: number; text: string; textX: number; textY: number } | null
  acrossTicks: Tick[]
  upTicks: Tick[]
  /** Black grades of the ruler under the drawing, every second step. */
  grades: { x: number; width: number }[]
}

/** CSS px: a character of a tick, and what stands around the lines. */
const letter = 6.4
const boldLetter = 6.7
const margins = { right: 14, top: 28, bottom: 38, least: 34, most: 104 }
/** Between two ticks across, besides the longest of their figures. */
const acrossRoom = 26
const mostDots = 20
const upRoom = 40
const mostPowers = 9
/** A vertical axis begins at 0 unless all that is on it is above this share of its highest. */
const startsAtZero = 0.5

/**
 * Places everything of the drawing of a curve.
 *
 * @param width  CSS px of the whole drawing, 240 and more
 * @param height CSS px of the whole drawing
 */
export function layOutCurve(curve: Curve, width: number, height: number): PlotDrawing {
  const [top, bottom] = [margins.top, height - margins.bottom]
  const right = width - margins.right
  const ups = curve.points.flatMap(({ up }) => (up === null ? [] : [up]))
  const upEnds = roundEnds(ups, curve.up, (bottom - top) / upRoom)
  const upValues = ticksOf(upEnds, curve.up, (bottom - top) / upRoom)
  const longest = Math.max(...upValues.map(({ text }) => text.length))
  const left = Math.min(Math.max(longest * letter + 12, margins.least), margins.most)

  const acrossEnds = { low: curve.points[0]?.across ?? 0, high: curve.points.at(-1)?.across ?? 1 }
  const x = scaleOf(acrossEnds, curve.across, left, right)
  const y = scaleOf(upEnds, curve.up, bottom, top)
  // the first guess has figures as long as those that will stand there
  const room = Math.max(...ticksOf(acrossEnds, curve.across, 4).map(({ text }) => text.length)) * letter
  const acrossTicks = ticksOf(acrossEnds, curve.across, (right - left) / (acrossRoom + room)).map(
    ({ value, text }) => ({ at: x(value), text }),
  )
  const pieces = piecesOf(curve.points, x, y)
  const dotted = curve.steps && curve.points.length <= mostDots
  return {
    plot: { left, right, top, bottom },
    runs: pieces
      .filter((piece) => piece.length > 1)
      .map((piece) => piece.map((at) => `${at.x.toFixed(1)},${at.y.toFixed(1)}`).join(' ')),
    dots: pieces.flatMap((piece) => (dotted || piece.length === 1 ? piece : [])),
    own: ownMark(curve, x, y, pieces, { left, right, top, bottom }),
    acrossTicks,
    upTicks: upValues.map(({ value, text }) => ({ at: y(value), text })),
    grades: gradesOf([left, ...acrossTicks.map(({ at }) => at), right]),
  }
}

interface Ends {
  low: number
  high: number
}
type Scale = (value: number) => number
interface Place {
  x: number
  y: number
}

function scaleOf({ low, high }: Ends, { scale }: CurveAxis, from: number, to: number): Scale {
  const share =
    scale === 'tenfold'
      ? (value: number) => Math.log(value / low) / Math.log(high / low)
      : (value: number) => (value - low) / (high - low)
  return (value) => from + share(value) * (to - from)
}

/** The vertical axis ends at round figures around all that is on it. */
function roundEnds(values: readonly number[], { scale, whole }: CurveAxis, most: number): Ends {
  const [least, highest] = [Math.min(...values), Math.max(...values)]
  if (scale === 'tenfold') {
    return { low: power(Math.floor(Math.log10(least))), high: power(Math.ceil(Math.log10(highest))) }
  }
  const low = least > 0 && least < highest * startsAtZero ? 0 : least
  // a level line stands in the middle
  const around = highest === low ? Math.abs(low) * 0.1 || 1 : 0
  const step = tickStep((highest - low + 2 * around) / Math.max(2, most), whole)
  return {
    low: Math.floor((low - around) / step) * step,
    high: Math.ceil((highest + around) / step) * step,
  }
}

function ticksOf(ends: Ends, { scale, whole }: CurveAxis, most: number): { value: number; text: string }[] {
  if (scale === 'tenfold') {
    const [first, last] = [Math.ceil(Math.log10(ends.low) - 1e-9), Math.floor(Math.log10(ends.high) + 1e-9)]
    const every = Math.ceil((last - first + 1) / mostPowers)
    return Array.from({ length: Math.floor((last - first) / every) + 1 }, (_, i) => {
      const value = power(first + i * every)
      return { value, text: formatDose(value, 'ratio').text }
    })
  }
  const step = tickStep((ends.high - ends.low) / Math.max(2, most), whole)
  const [first, last] = [Math.ceil(ends.low / step - 1e-9), Math.floor(ends.high / step + 1e-9)]
  const places = placesIn(step)
  return Array.from({ length: last - first + 1 }, (_, i) => {
    const value = (first + i) * step
    return { value, text: formatReading({ value: value.toFixed(places), unit: 'ratio' }).text }
  })
}

const power = (exponent: number) => Number(`1e${String(exponent)}`)

/** 1, 2, 2.5 or 5 times a power of ten, no smaller than `least`. */
function tickStep(least: number, whole: true | undefined): number {
  const exponent = Math.floor(Math.log10(least) + 1e-9)
  const factor = [1, 2, 2.5, 5, 10].find((each) => each * power(exponent) >= least * (1 - 1e-9)) ?? 10
  const step = Number((factor * power(exponent)).toPrecision(3))
  return whole ? Math.max(1, Math.ceil(step)) : step
}

/** Decimal places of a step: 0.25 has two. */
function placesIn(step: number): number {
  const [mantissa = '', exponent = '0'] = step.toExponential().split('e')
  return Math.max(0, (mantissa.split('.')[1] ?? '').length - Number(exponent))
}

function piecesOf(points: readonly CurvePoint[], x: Scale, y: Scale): Place[][] {
  const pieces: Place[][] = [[]]
  for (const { across, up } of points) {
    if (up === null) pieces.push([])
    else pieces.at(-1)?.push({ x: x(across), y: y(up) })
  }
  return pieces
}

/** The words of the person's own point stand beside it where the line runs under the fewest of them. */
function ownMark(
  curve: Curve,
  x: Scale,
  y: Scale,
  pieces: readonly (readonly Place[])[],
  edge: PlotDrawing['plot'],
): PlotDrawing['own'] {
  const own = curve.points.find((point) => point.own)
  const up = own && sayUp(curve, own)
  if (!own || own.up === null || !up) return null
  const at = { x: x(own.across), y: y(own.up) }
  const whole = words.ownMark({ up: up.text })
  const fits = whole.length * boldLetter < edge.right - edge.left - 12
  const text = fits ? whole : words.ownRow
  const wide = text.length * boldLetter
  const beside = [at.x + 9, at.x - 9 - wide].filter(
    (from) => from >= edge.left + 4 && from + wide <= edge.right + margins.right,
  )
  // no room on either side: above or below the point, from the one edge or the other
  const lefts = beside.length > 0 ? beside : [edge.left + 6, Math.max(edge.left + 6, edge.right - wide)]
  const bases = [at.y - 9, at.y + 18].filter((base) => base >= edge.top - 14 && base <= edge.bottom - 3)
  const spots = lefts.flatMap((textX) =>
    bases.map((textY) => {
      const box = { left: textX, right: textX + wide, top: textY - 12, bottom: textY + 4 }
      return { textX, textY, covered: crossings(pieces, box) }
    }),
  )
  const best = spots.sort((a, b) => a.covered - b.covered)[0]
  return best ? { ...at, text, textX: best.textX, textY: best.textY } : null
}

/** CSS px across that the line runs through a box. */
function crossings(pieces: readonly (readonly Place[])[], box: PlotDrawing['plot']): number {
  let through = 0
  for (const piece of pieces)
    for (const [i, from] of piece.entries()) {
      const to = piece[i + 1]
      if (!to || to.x < box.left || from.x > box.right) continue
      for (let at = Math.max(box.left, from.x); at <= Math.min(box.right, to.x); at += 2) {
        const y = from.y + ((to.y - from.y) * (at - from.x)) / Math.max(to.x - from.x, 1e-6)
        if (y > box.top && y < box.bottom) through += 2
      }
    }
  return through
}

function gradesOf(stops: readonly number[]): { x: number; width: number }[] {
  return stops.flatMap((stop, i) => {
    const next = stops[i + 1]
    return i % 2 === 0 && next !== undefined && next - stop > 0.5 ? [{ x: stop, width: next - stop }] : []
  })
}
