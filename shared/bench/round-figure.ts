import { fixedPlaces } from '../domain/quantities/number-text.ts'
import type { Figure } from './definition.ts'

export interface RoundedFigure extends Figure {
  /** How many digits of the value mean something. */
  significantFigures: number
  /** The digits to show, with a decimal point; trailing zeros are kept. */
  rounded: string
}

const usualFigures = 4
const mostFigures = 12

/**
 * A figure with the digits that it is worth: those of the balance where one was named; otherwise as many as the formula
 * supports, and none smaller than the first digit of its error. Halves go up in decimal.
 *
 * @param halfWidth half of the range that the stated errors make, in the figure's unit; null when none is stated
 */
export function roundFigure(figure: Figure, halfWidth: number | null): RoundedFigure {
  const { value, measured } = figure
  if (measured !== undefined) return { ...figure, significantFigures: digitsIn(measured), rounded: measured }
  if (figure.whole) return { ...figure, significantFigures: digitsIn(String(value)), rounded: String(value) }
  const formula = Math.min(figure.figures ?? usualFigures, mostFigures)
  if (value === 0) return { ...figure, significantFigures: 1, rounded: '0' }
  const first = exponentOf(value)
  const byError =
    halfWidth === null || halfWidth === 0 ? formula : Math.max(1, first - exponentOf(halfWidth) + 1)
  const significantFigures = Math.min(formula, byError)
  return { ...figure, significantFigures, rounded: roundedTo(value, significantFigures) }
}

/** `figures` significant digits, halves up in decimal: 9.996 to three is 10.0, and 1,086 to two is 1,100. */
export function roundedTo(value: number, figures: number): string {
  const text = fixedPlaces(value, figures - 1 - exponentOf(value))
  // 9.996 has grown by a digit, which is then one too many
  return exponentOf(Number(text)) > exponentOf(value)
    ? fixedPlaces(value, figures - 2 - exponentOf(value))
    : text
}

function exponentOf(value: number): number {
  return Number(value.toExponential().split('e')[1])
}

function digitsIn(text: string): number {
  return text.replace(/^-/, '').replace('.', '').replace(/^0+/, '').length || 1
}
