import type { UnitCode } from '../domain/units/unit-table.ts'
import type { ReadingParameter } from '../domain/readings/parameters.ts'

/** Where a number is taken, and where it is doubted. All in the canonical unit of its dimension. */
export interface Limits {
  /** Exclusive lower limit; 0 asks for more than zero. */
  above?: number
  /** Inclusive lower limit. */
  min?: number
  /** Inclusive upper limit. */
  max?: number
  /** Outside this the figure is taken, and a caution asks whether it is meant. */
  plausible?: { min?: number; max?: number }
}

/** When an input belongs to the question at all: a choice has one of these answers. */
export type When = Readonly<Record<string, readonly string[]>>

/** A number with its unit. */
export interface QuantityInput {
  kind: 'quantity'
  /** What it may be given in, of one dimension or of several; the first is offered. */
  units: readonly UnitCode[]
  /** By dimension where the units are of several; otherwise for the one. */
  limits?: Limits
  /** A whole number: fish, changes, sides. */
  whole?: true
  /** A change or a difference, to which the doubts about a value of its unit do not apply. */
  difference?: true
  /** A figure of no water, only put in another unit: what is doubted of a water is not doubted of it. */
  toConvert?: true
  optional?: true
  /** Stable code of the refusal when it is left empty, where more is to be said than that; its sentence is `refusal.<code>`. */
  missing?: string
  when?: When
  /** This input states the relative error, in percent, of another. */
  errorOf?: string
  /** The newest reading of this parameter fills it when an enclosure is chosen. */
  reading?: ReadingParameter
  /** What such a reading says about choices, which it answers where it fills the field: nitrogen is always as N. */
  readingSays?: Readonly<Record<string, string>>
  /** The choice that the scale of such a reading answers: a pH of one scale is not one of another. */
  readingScaleIn?: string
  /** The volume that the enclosure is dosed by fills it. */
  netVolume?: true
}

/** One of several named answers. Nothing is preselected. */
export interface ChoiceInput<O extends string = string> {
  kind: 'choice'
  options: readonly O[]
  optional?: true
  when?: When
  /** Stable code of the refusal when it is left open; its sentence is `refusal.<code>` of the calculator. */
  missing?: string
  /** The options are codes of units, and only those of the dimension of this input make sense. */
  unitsOf?: string
}

export type Input = QuantityInput | ChoiceInput

/** A number with its unit; keeps the exact type of what is written. */
export function quantity<const Q extends Omit<QuantityInput, 'kind'>>(input: Q): Q & { kind: 'quantity' } {
  return { kind: 'quantity', ...input }
}

/** One of several named answers. */
export function choice<const O extends string, const C extends Omit<ChoiceInput, 'kind' | 'options'>>(
  options: readonly O[],
  rest: C = {} as C,
): C & { kind: 'choice'; options: readonly O[] } {
  return { kind: 'choice', options, ...rest }
}
