import { convert } from '../units/convert.ts'
import type { UnitCode } from '../units/unit-table.ts'

interface BenchFigure {
  /** Unrounded, in the unit beside it. */
  value: number
  /** The digits that are shown, in the same unit. */
  rounded: string
  unit: UnitCode
}

interface OwnAmount {
  /** Unrounded, in the unit beside it. */
  value: number
  unit: UnitCode
  /** What the balance or measure shows; null without one. */
  shown: { value: string; unit: UnitCode } | null
}

/** Two ways to the same figure differ by the arithmetic of the machine alone. */
const lastDigits = 1e-9

/**
 * How a figure of the bench stands to the amount of an order: the same where both come to one figure before rounding, or
 * are shown as one after it.
 *
 * @returns null where they are of different dimensions, and nothing can be said
 */
export function compareWithBench(bench: BenchFigure, own: OwnAmount): 'same' | 'differs' | null {
  const unrounded = convert(bench.value, bench.unit, own.unit)
  if (!unrounded.ok) return null
  if (isSame(unrounded.value, own.value)) return 'same'
  if (own.shown === null) return 'differs'
  const rounded = convert(Number(bench.rounded), bench.unit, own.shown.unit)
  return rounded.ok && isSame(rounded.value, Number(own.shown.value)) ? 'same' : 'differs'
}

const isSame = (a: number, b: number): boolean =>
  Math.abs(a - b) <= lastDigits * Math.max(Math.abs(a), Math.abs(b))
