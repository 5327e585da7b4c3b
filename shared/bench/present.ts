import { formatDose } from '../domain/quantities/format-dose.ts'
import { formatExpression } from '../domain/quantities/format-expression.ts'
import { formatReading } from '../domain/quantities/format-reading.ts'
import { formatWorkingValue } from '../domain/quantities/format-working-value.ts'
import type { FormattedQuantity, QuantityKind } from '../domain/quantities/formatted-quantity.ts'
import { convert } from '../domain/units/convert.ts'
import { quantityOf } from '../domain/units/quantity-of.ts'
import type { UnitCode } from '../domain/units/unit-table.ts'
import type { BenchLine, Schedule } from './definition.ts'
import type { BenchAnswer } from './evaluate.ts'
import { roundFigure, type RoundedFigure } from './round-figure.ts'

/** A figure as it is shown: a dose without trailing zeros, everything else with the digits that it is worth. */
export function formatFigure(figure: RoundedFigure): FormattedQuantity {
  if (isResidue(figure.value)) return nextToNothing(figure.value, figure.unit, figure.kind)
  return figure.kind === 'dose'
    ? formatDose(figure.rounded, figure.unit)
    : formatReading({ value: figure.rounded, unit: figure.unit })
}

/** What is left of something after days of washing: no instrument and no animal tells it from nothing. */
const leastShown = '0.000000001'

const isResidue = (value: number): boolean => value !== 0 && Math.abs(value) < Number(leastShown)

function nextToNothing(value: number, unit: UnitCode, kind: QuantityKind = 'reading'): FormattedQuantity {
  const least = formatDose(leastShown, unit)
  const sign = value > 0 ? '< ' : '> \u2212'
  return { ...least, kind, number: sign + least.number, text: sign + least.text }
}

/** The ends of a range, to one digit more than the result has. */
export function formatRange(
  range: { low: number; high: number },
  figure: RoundedFigure,
): { low: FormattedQuantity; high: FormattedQuantity } {
  const digits = Math.min(figure.significantFigures + 1, 12)
  const at = (value: number) =>
    formatDose(quantityOf(Number(value.toPrecision(digits)), figure.unit).value, figure.unit)
  return { low: at(range.low), high: at(range.high) }
}

/** So many digits no table prints and nobody types: the arithmetic itself made them. */
const madeDigits = 15

/** A line of working as people read it: the arithmetic with its numbers put in, and what it gives. */
export function formatLine(
  line: BenchLine,
  lines: readonly BenchLine[],
): { formula: string; result: FormattedQuantity } {
  const earlier = new Set(
    lines.filter((each) => line.rests.includes(each.key)).map((each) => String(Math.abs(each.value))),
  )
  for (const [number] of line.expression.matchAll(/\d+\.\d+/g))
    if (number.replace('.', '').replace(/^0+/, '').length >= madeDigits) earlier.add(number)
  const result = isResidue(line.value) ? nextToNothing(line.value, line.unit) : formatWorkingValue(line)
  return { formula: formatExpression(line.expression, earlier), result }
}

/** A line of a whole working. */
export interface ShownLine {
  line: BenchLine
  formula: string
  result: FormattedQuantity
  /** The line that the result of the calculator is the rounded value of. */
  isResult: boolean
}

/** As many digits of an unrounded result as an inspector could want; a double holds a few more. */
const unroundedDigits = 10

/**
 * The working as people read it. The result is rounded to what it is worth where it stands large; here it keeps its
 * digits, so that both can be compared.
 */
export function formatWorking({ figures, working }: Pick<BenchAnswer, 'figures' | 'working'>): ShownLine[] {
  const [result] = figures
  const byName = working.findLastIndex((line) => line.key === result.key && isSame(line, result))
  const byValue = working.findLastIndex((line) => isSame(line, result))
  const at = [byName, byValue, working.length - 1].find((each) => each >= 0)
  return working.map((line, index) => {
    const { formula, result } = formatLine(line, working)
    const isResult = index === at
    return { line, formula, result: isResult && !isResidue(line.value) ? unrounded(line) : result, isResult }
  })
}

/** A line may be in grams where the result is in kilograms. */
function isSame(line: BenchLine, result: RoundedFigure): boolean {
  const there = convert(line.value, line.unit, result.unit)
  return there.ok && Math.abs(there.value - result.value) <= 1e-12 * Math.abs(result.value)
}

function unrounded({ value, unit }: BenchLine): FormattedQuantity {
  return formatDose(quantityOf(Number(value.toPrecision(unroundedDigits)), unit).value, unit)
}

/** A figure of a plan, with the digits that its column is worth. */
export function formatCell(value: number, column: Schedule['columns'][number]): FormattedQuantity {
  return formatFigure(roundFigure({ ...column, value }, null))
}
