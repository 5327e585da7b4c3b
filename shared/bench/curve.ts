import { convert } from '../domain/units/convert.ts'
import { quantityOf } from '../domain/units/quantity-of.ts'
import type { UnitCode } from '../domain/units/unit-table.ts'
import type { AnyCalculator, Plot } from './definition.ts'
import { evaluate, type BenchAnswer } from './evaluate.ts'
import type { QuantityInput } from './inputs.ts'
import { isAsked, readInputs } from './read-inputs.ts'
import type { RoundedFigure } from './round-figure.ts'

export interface CurvePoint {
  /** In the unit of the horizontal axis. */
  across: number
  /** In the unit of the vertical axis; null where the calculator refuses an answer: the line has a gap there. */
  up: number | null
  /** The point at what the person typed, with the figure as the result shows it. */
  own?: RoundedFigure
}

/** One axis: what is read off it, and how it is divided. */
export interface CurveAxis extends Pick<RoundedFigure, 'unit' | 'figures' | 'whole' | 'kind'> {
  /** Key of its name among the words of the calculator. */
  word: string
  /** `tenfold`: equal steps are powers of ten; everything on the axis is then above zero. */
  scale: 'even' | 'tenfold'
}

export interface Curve {
  across: CurveAxis
  up: CurveAxis
  /** From left to right, at most `mostPoints`, at least two with an answer, all finite. */
  points: readonly CurvePoint[]
  /** Each point is a step of a plan, and between them there is nothing to read. */
  steps?: true
}

/** The person's own point among them. */
export const mostPoints = 41

/** A horizontal axis over this many times its beginning is divided by powers of ten. */
const tenfoldAcross = 100
/** A vertical axis that spans this much, and no more than the second, is divided by powers of ten. */
const [tenfoldUp, mostTenfoldUp] = [1e3, 1e8]

type Varied = Extract<Plot, { vary: string }>
type Columns = Extract<Plot, { across: string }>

/**
 * The curve that a calculator has to show for a question: its result while one input varies and the others stay as
 * typed, or two columns of its plan.
 *
 * An axis is in the unit that the person typed where they typed one, and reaches to their own point where that lies
 * outside what the description shows.
 *
 * @param body as evaluate takes it
 * @returns null when the calculator has no plot, the question is not answered, or the answer has no curve: fewer than two
 *          points, an input that is asked only for another choice that could be one of several
 */
export function curveOf(of: AnyCalculator, body: unknown): Curve | null {
  if (!of.plot) return null
  const typed = evaluate(of, body)
  if (!typed.ok) return null
  return 'vary' in of.plot ? varied(of, of.plot, body) : planned(of.plot, typed.answer)
}

function planned({ across, up }: Columns, { schedule }: BenchAnswer): Curve | null {
  const columns = schedule?.columns ?? []
  const [x, y] = [across, up].map((key) => columns.findIndex((column) => column.key === key))
  const [left, right] = [columns[x ?? -1], columns[y ?? -1]]
  if (!schedule || !left || !right || x === undefined || y === undefined) return null
  const every = Math.ceil(schedule.rows.length / (mostPoints - 1))
  const rows = schedule.rows.filter((_, at) => at % every === 0 || at === schedule.rows.length - 1)
  const points = rows
    .map((row) => ({ across: row[x] ?? NaN, up: row[y] ?? NaN }))
    .filter((point) => Number.isFinite(point.across) && Number.isFinite(point.up))
    .sort((a, b) => a.across - b.across)
  const axis = ({ key, ...rest }: typeof left) => ({ ...rest, word: `column.${key}`, scale: 'even' as const })
  return points.length < 2 ? null : { across: axis(left), up: axis(right), points, steps: true }
}

function varied(of: AnyCalculator, plot: Varied, typed: unknown): Curve | null {
  const input = of.inputs[plot.vary]
  const body = withChoiceFor(input?.when, typed)
  if (input?.kind !== 'quantity' || body === null) return null
  const own = ownValue(of, plot.vary, body)
  const unit = own?.unit ?? plot.unit
  const shown = [plot.from, plot.to].map((end) => convert(end, plot.unit, unit))
  const [from, to] = shown.map((end) => (end.ok ? Number(end.value.toPrecision(4)) : NaN))
  if (from === undefined || to === undefined || !Number.isFinite(from) || !Number.isFinite(to)) return null
  const at = (across: number) => ({ ...body, [plot.vary]: quantityOf(across, unit) })
  const sampled = {
    range: { from: Math.min(from, own?.value ?? from), to: Math.max(to, own?.value ?? to) },
    whole: input.whole,
    own: own?.value,
    figureAt: (across: number): RoundedFigure | undefined => {
      // what the person typed is asked as they typed it
      const evaluation = evaluate(of, across === own?.value ? body : at(across))
      return evaluation.ok ? evaluation.answer.figures.find(({ key }) => key === plot.figure) : undefined
    },
  }
  const { points, figure } = closerLook(sampled, sample(sampled))
  if (!figure || answered(points).length < 2) return null
  const ends = { from: points[0]?.across ?? NaN, to: points.at(-1)?.across ?? NaN }
  return {
    across: {
      word: `input.${plot.vary}`,
      unit,
      scale: isTenfold(ends) ? 'tenfold' : 'even',
      ...(input.whole ? { whole: true as const } : {}),
    },
    up: {
      word: `result.${figure.key}`,
      unit: figure.unit,
      scale: scaleUp(points),
      ...(figure.figures === undefined ? {} : { figures: figure.figures }),
      ...(figure.whole ? { whole: true as const } : {}),
      ...(figure.kind ? { kind: figure.kind } : {}),
    },
    points,
  }
}

/** The body with every choice made that the input needs; null when more than one answer would do, or none was typed. */
function withChoiceFor(when: QuantityInput['when'], typed: unknown): Record<string, unknown> | null {
  if (typeof typed !== 'object' || typed === null) return null
  const body = { ...typed } as Record<string, unknown>
  for (const [name, answers] of Object.entries(when ?? {})) {
    if (isAsked({ [name]: answers }, body)) continue
    if (answers.length !== 1) return null
    body[name] = answers[0]
  }
  return body
}

function ownValue(of: AnyCalculator, name: string, body: unknown): { value: number; unit: UnitCode } | null {
  const given = readInputs(of, body).read[name]
  if (typeof given !== 'object') return null
  return { value: Number(given.entered.value), unit: given.entered.unit }
}

interface Sampled {
  range: { from: number; to: number }
  whole: true | undefined
  own: number | undefined
  figureAt: (across: number) => RoundedFigure | undefined
}

interface Samples {
  points: CurvePoint[]
  figure: RoundedFigure | undefined
}

/** Figures in one unit: that of the person's own point, or of the first; what cannot be put in it is a gap. */
function sample({ range, whole, own, figureAt }: Sampled): Samples {
  const places = new Set(placesOf(range, whole))
  if (own !== undefined) places.add(own)
  const found = [...places].sort((a, b) => a - b).map((across) => ({ across, figure: figureAt(across) }))
  const figure = (found.find(({ across }) => across === own) ?? found.find((each) => each.figure))?.figure
  const points = found.map(({ across, figure: each }): CurvePoint => {
    const up = each && figure ? convert(each.value, each.unit, figure.unit) : undefined
    return {
      across,
      up: up?.ok ? up.value : null,
      ...(each && across === own ? { own: each } : {}),
    }
  })
  return { points, figure }
}

/** Where most of the axis has no answer, the part that has one is looked at again by itself. */
function closerLook(sampled: Sampled, seen: Samples): Samples {
  const { points } = seen
  const found = answered(points)
  if (found.length === 0 || found.length * 2 > points.length) return seen
  const first = points.findIndex(({ up }) => up !== null)
  const last = points.findLastIndex(({ up }) => up !== null)
  const from = points[Math.max(0, first - 1)]?.across ?? sampled.range.from
  const to = points[Math.min(points.length - 1, last + 1)]?.across ?? sampled.range.to
  const own = sampled.own
  return sample({
    ...sampled,
    range: { from: Math.min(from, own ?? from), to: Math.max(to, own ?? to) },
  })
}

const answered = (points: readonly CurvePoint[]) =>
  points.flatMap(({ across, up }) => (up === null ? [] : [{ across, up }]))

const isTenfold = ({ from, to }: { from: number; to: number }) => from > 0 && to >= from * tenfoldAcross

function scaleUp(points: readonly CurvePoint[]): CurveAxis['scale'] {
  const ups = answered(points).map(({ up }) => up)
  const [low, high] = [Math.min(...ups), Math.max(...ups)]
  return low > 0 && high >= low * tenfoldUp && high <= low * mostTenfoldUp ? 'tenfold' : 'even'
}

/** Round places on an axis with both of its ends, one fewer than `mostPoints`. */
function placesOf(range: { from: number; to: number }, whole: true | undefined): number[] {
  const { from, to } = range
  const room = mostPoints - 1
  if (isTenfold(range)) {
    const ratio = (to / from) ** (1 / (room - 1))
    const between = Array.from({ length: room - 2 }, (_, i) =>
      Number((from * ratio ** (i + 1)).toPrecision(3)),
    )
    return [from, ...between.map((place) => (whole ? Math.round(place) : place)), to]
  }
  const step = Math.max(roundStep((to - from) / (room - 2)), whole ? 1 : 0)
  const first = Math.floor(from / step) + 1
  const count = Math.max(0, Math.ceil(to / step) - first)
  const between = Array.from({ length: count }, (_, i) => Number(((first + i) * step).toPrecision(12)))
  return [from, ...between, to].map((place) => (whole ? Math.round(place) : place))
}

const steps = [1, 1.5, 2, 2.5, 4, 5, 10]

/** The next round step that is no smaller. Infinite for an axis without length, which then has no places between. */
export function roundStep(least: number): number {
  if (!(least > 0)) return Infinity
  const power = 10 ** Math.floor(Math.log10(least))
  const factor = steps.find((each) => each * power >= least * (1 - 1e-9)) ?? 10
  return Number((factor * power).toPrecision(3))
}
