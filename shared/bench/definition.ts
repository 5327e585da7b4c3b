import type { QuantityKind } from '../domain/quantities/formatted-quantity.ts'
import type { Result } from '../domain/result.ts'
import type { SourceKey } from '../domain/sources.ts'
import type { ConcentrationBasis } from '../domain/units/basis.ts'
import type { ParsedQuantity } from '../domain/units/parse-quantity.ts'
import type { Quantity } from '../domain/units/quantity.ts'
import type { UnitCode } from '../domain/units/unit-table.ts'
import type { ReadingParameter } from '../domain/readings/parameters.ts'
import type { VolumeSheet } from '../domain/water/volume-sheet.ts'
import type { WorkingLine } from '../domain/working/working-line.ts'
import type { Messages } from '../messages/define-messages.ts'
import type { BenchGroup } from './groups.ts'
import type { Input } from './inputs.ts'

/** A line of working whose words stand in the calculator, under `line.<code>`, or in the catalogue of working lines. */
export type BenchLine = Omit<WorkingLine, 'code'> & { code: string }

/** What a calculator gets for one input: it is there unless the input is optional or depends on a choice. */
type Answer<I> = I extends { kind: 'choice'; options: readonly (infer O)[] } ? O : ParsedQuantity
type MayLack<I> = I extends { optional: true } ? true : I extends { when: object } ? true : false
export type Given<Inputs> = {
  readonly [K in keyof Inputs]: MayLack<Inputs[K]> extends true
    ? Answer<Inputs[K]> | undefined
    : Answer<Inputs[K]>
}

/** A figure that a calculator gives, unrounded. */
export interface Figure {
  /** Its words are `result.<key>`. */
  key: string
  value: number
  unit: UnitCode
  /** Significant digits that the formula itself supports, 4 unless told. */
  figures?: number
  /** A count: days, changes. It has no decimal places. */
  whole?: true
  kind?: QuantityKind
  /** The digits as the balance or measure gives them; then they are the figure. */
  measured?: string
}

/** A row of figures for each step of a plan; the words of a column are `column.<key>`. */
export interface Schedule {
  columns: readonly { key: string; unit: UnitCode; figures?: number; whole?: true }[]
  rows: readonly (readonly number[])[]
}

export interface BenchCaution {
  /** Its words are `caution.<code>`. */
  code: string
  level: 'note' | 'warning'
  params?: Readonly<Record<string, string | number>>
}

/** What came out: the first figure is the result. */
export interface Outcome {
  figures: readonly [Figure, ...Figure[]]
  working: readonly BenchLine[]
  schedule?: Schedule
  /** What the errors make of the result where the engine combines them itself; otherwise `errorOf` inputs do. */
  range?: { low: number; high: number }
  cautions?: readonly BenchCaution[]
  /** Works that only this answer rests on. */
  sources?: readonly SourceKey[]
}

/** A curve worth seeing: the result while one input varies, or two columns of the schedule. */
export type Plot =
  { vary: string; unit: UnitCode; from: number; to: number; figure: string } | { across: string; up: string }

/** What a draft of an order takes over from the inputs; the rest of it has records of its own. */
export interface OrderCarry {
  to: 'order'
  /** The input that is the target in the water. */
  target?: string
  /** The input that says what the target is of: in the words of an order, or with what each answer is called there. */
  basis?: string | { input: string; as: Readonly<Record<string, ConcentrationBasis>> }
  /** The input that is the smallest step of the balance or measure. */
  division?: string
}

/** A determination of the volume of a water. Without a sheet it is a stated figure, which counts as an estimate. */
export interface VolumeCarry<Inputs> {
  to: 'volume'
  /** The sheet that the result is worked out from; an error of zero was not stated. */
  sheet?(given: Given<Inputs>): VolumeSheet
}

/** Where a result can be taken further. */
export type Carry<Inputs = Readonly<Record<string, Input>>> =
  OrderCarry | VolumeCarry<Inputs> | { to: 'reading'; parameter: ReadingParameter; figure: string }

/**
 * All there is to say of one calculator. The bench screen, the API and its documents, the page of published values and
 * the general tests are made from it.
 */
export interface Calculator<
  Inputs extends Readonly<Record<string, Input>> = Readonly<Record<string, Input>>,
> {
  /** In the address: `/bench/bath-dose`. */
  id: string
  group: BenchGroup
  /** Among the dozen that people use every week; the others are behind "more". */
  weekly?: true
  /**
   * name · purpose · input.<name> · help.<name> · option.<name>.<option> · result.<key> · line.<code> · column.<key> ·
   * caution.<code> · refusal.<code> · formula · search (other names that people look for) · axis.<key of another word> where
   * that one is too short on a curve
   */
  words: Messages
  inputs: Inputs
  /** The engine's name or path of an input in its refusals → the input; the last part of a path is tried by itself. */
  fields?: Readonly<Record<string, string>>
  /** A whole question, answered; it is what the documents show. */
  example: Readonly<Record<string, Quantity | string>>
  sources: readonly [SourceKey, ...SourceKey[]]
  /** Cautions that stand beside every answer. */
  cautions?: readonly BenchCaution[]
  plot?: Plot
  carries?: readonly Carry<Inputs>[]
  /** Names of the published values that it answers for. */
  published?: readonly string[]
  compute(given: Given<Inputs>): Result<Outcome>
}

/** A calculator whose exact input types are forgotten, as lists and tools hold it. */
export type AnyCalculator = Omit<Calculator, 'compute'> & {
  compute(given: Given<Record<string, Input>>): Result<Outcome>
}

/** Makes a calculator; `compute` gets its inputs by name and type. */
export function defineCalculator<const I extends Readonly<Record<string, Input>>>(
  description: Calculator<I>,
): AnyCalculator {
  // the reader hands over exactly what the inputs say, which the general type cannot know
  return description as unknown as AnyCalculator
}
