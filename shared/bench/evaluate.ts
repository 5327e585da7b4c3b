import { formatReading } from '../domain/quantities/format-reading.ts'
import type { Refusal } from '../domain/result.ts'
import type { SourceKey } from '../domain/sources.ts'
import { convert } from '../domain/units/convert.ts'
import type { ParsedQuantity } from '../domain/units/parse-quantity.ts'
import { quantityOf } from '../domain/units/quantity-of.ts'
import type { AnyCalculator, BenchCaution, Figure, Given, Outcome } from './definition.ts'
import type { Input, QuantityInput } from './inputs.ts'
import { readInputs, type Read } from './read-inputs.ts'
import { roundFigure, type RoundedFigure } from './round-figure.ts'

export interface BenchAnswer {
  /** The first is the result. */
  figures: readonly [RoundedFigure, ...RoundedFigure[]]
  /** What the stated errors of the inputs make of the result, in its unit, unrounded; null when none moves it. */
  range: { low: number; high: number } | null
  working: Outcome['working']
  schedule: Outcome['schedule'] | null
  sources: readonly SourceKey[]
  cautions: readonly BenchCaution[]
}

export type Evaluation = { ok: true; answer: BenchAnswer } | { ok: false; refusals: Refusal[] }

/**
 * Asks a calculator. The answer is unrounded, with the digits that it is worth said beside it.
 *
 * Stated errors of inputs are carried to the result as the widest range they can make together: the calculator is asked
 * again at both ends of each.
 *
 * @param body anything at all; see readInputs
 * @refuses every input at fault, or the one reason why the calculator has no answer; a result that is not finite is
 *          refused as not-finite
 */
export function evaluate(of: AnyCalculator, body: unknown): Evaluation {
  const { read, refusals } = readInputs(of, body)
  if (refusals.length > 0) return { ok: false, refusals }
  const outcome = ask(of, read)
  if (!outcome.ok) return outcome
  const { figures, working, schedule } = outcome.value
  const range = outcome.value.range
    ? { known: true, value: outcome.value.range }
    : rangeOf(of, read, figures[0])
  const [first, ...rest] = figures
  const halfWidth = range.known && range.value ? (range.value.high - range.value.low) / 2 : null
  return {
    ok: true,
    answer: {
      figures: [roundFigure(first, halfWidth), ...rest.map((figure) => roundFigure(figure, null))],
      range: range.value,
      working,
      schedule: schedule ?? null,
      sources: [...new Set([...of.sources, ...(outcome.value.sources ?? [])])],
      cautions: [
        ...implausible(of, read),
        ...(range.known ? [] : [{ code: 'range-not-known', level: 'warning' } as const]),
        ...(outcome.value.cautions ?? []),
        ...(of.cautions ?? []),
      ],
    },
  }
}

function ask(
  of: AnyCalculator,
  read: Read,
): { ok: true; value: Outcome } | { ok: false; refusals: Refusal[] } {
  const result = of.compute(read as Given<Record<string, Input>>)
  if (!result.ok) {
    const name = inputAt(of, result.refusal.field)
    return { ok: false, refusals: [{ ...result.refusal, ...(name === undefined ? {} : { field: name }) }] }
  }
  const { figures, working, schedule } = result.value
  const numbers = [...figures, ...working].map((each) => each.value)
  const finite = [...numbers, ...(schedule?.rows.flat() ?? [])].every(Number.isFinite)
  return finite ? result : { ok: false, refusals: [{ code: 'result-not-finite' }] }
}

/** The input that an engine's refusal is about, by its own name or by the path that the engine has for it. */
function inputAt(of: AnyCalculator, field: string | undefined): string | undefined {
  if (field === undefined) return undefined
  const last = field.split('.').at(-1) ?? field
  return of.fields?.[field] ?? of.fields?.[last] ?? last
}

/** The inputs that have a stated error, with the share of it. */
function statedErrors(of: AnyCalculator, read: Read): { name: string; share: number }[] {
  return Object.entries(of.inputs).flatMap(([key, input]) => {
    const stated = read[key]
    if (input.kind !== 'quantity' || input.errorOf === undefined || typeof stated !== 'object') return []
    return stated.value > 0 ? [{ name: input.errorOf, share: stated.value / 100 }] : []
  })
}

/** Two results nearer than this, relative, differ by the arithmetic of the machine alone. */
const lastDigit = 1e-12

function rangeOf(
  of: AnyCalculator,
  read: Read,
  result: Figure,
): { known: boolean; value: { low: number; high: number } | null } {
  const errors = statedErrors(of, read).filter(({ name }) => typeof read[name] === 'object')
  if (errors.length === 0) return { known: true, value: null }
  const values: number[] = []
  for (let corner = 0; corner < 2 ** errors.length; corner += 1) {
    const moved = { ...read }
    for (const [index, { name, share }] of errors.entries())
      moved[name] = scaled(read[name] as ParsedQuantity, 1 + ((corner >> index) & 1 ? share : -share))
    const outcome = ask(of, moved)
    if (!outcome.ok) return { known: false, value: null }
    // a calculator may go over from grams to kilograms between the ends: the range is in the unit of the result
    const [figure] = outcome.value.figures
    const value = convert(figure.value, figure.unit, result.unit)
    if (!value.ok) return { known: false, value: null }
    values.push(value.value)
  }
  const [low, high] = [Math.min(...values), Math.max(...values)]
  // an error of something that this answer does not go by: "0.9 g to 0.9 g" says nothing
  const moves = high - low > lastDigit * Math.max(Math.abs(low), Math.abs(high))
  return { known: true, value: moves ? { low, high } : null }
}

function scaled(parsed: ParsedQuantity, factor: number): ParsedQuantity {
  const value = parsed.value * factor
  return { ...parsed, value, entered: quantityOf(value, parsed.unit) } as ParsedQuantity
}

/** Figures that are taken but hardly meant: centimetres in a field of metres, a meter reading in the wrong unit. */
function implausible(of: AnyCalculator, read: Read): BenchCaution[] {
  return Object.entries(of.inputs).flatMap(([name, input]): BenchCaution[] => {
    const given = read[name]
    if (input.kind !== 'quantity' || typeof given !== 'object') return []
    if (
      input.units[0] === 'percent_w_w' &&
      given.entered.unit === 'percent_w_w' &&
      isFraction(given.entered.value)
    )
      return [
        {
          code: 'fraction-as-percent',
          level: 'warning',
          params: { input: name, shown: formatReading(given.entered).text },
        },
      ]
    const band = (input as QuantityInput).limits?.plausible
    if (band === undefined) return []
    const { min = -Infinity, max = Infinity } = band
    if (given.value >= min && given.value <= max) return []
    const shown = formatReading(given.entered).text
    return [
      {
        code: 'not-plausible',
        level: 'warning',
        params: { input: name, shown, band: bandText(given, min, max) },
      },
    ]
  })
}

/** 0.98 typed for 98 %. */
const isFraction = (digits: string): boolean => Number(digits) > 0 && Number(digits) <= 1

function bandText({ unit, entered }: ParsedQuantity, min: number, max: number): string {
  const shown = (value: number) => {
    const there = convert(value, unit, entered.unit)
    const limit = Number((there.ok ? there.value : value).toPrecision(4))
    return formatReading(quantityOf(limit, entered.unit)).text
  }
  if (min === -Infinity) return `≤ ${shown(max)}`
  return max === Infinity ? `≥ ${shown(min)}` : `${shown(min)} … ${shown(max)}`
}
