import type { AnyCalculator, Carry, Given, OrderCarry } from '../../../shared/bench/definition.ts'
import type { BenchAnswer } from '../../../shared/bench/evaluate.ts'
import type { Input } from '../../../shared/bench/inputs.ts'
import { BenchAsked } from '../../../shared/contracts/order-primitives.ts'
import { readInputs, type Read } from '../../../shared/bench/read-inputs.ts'
import { roundedTo } from '../../../shared/bench/round-figure.ts'
import { sayAnswer } from '../../../shared/bench/say-answer.ts'
import { withoutTrailingZeros } from '../../../shared/domain/quantities/number-text.ts'
import type { ReadingParameter } from '../../../shared/domain/readings/parameters.ts'
import { concentrationBases, type ConcentrationBasis } from '../../../shared/domain/units/basis.ts'
import { convert } from '../../../shared/domain/units/convert.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { VolumeSheet } from '../../../shared/domain/water/volume-sheet.ts'
import type { BenchCarry } from '../../lib/bench-carry.ts'

/** A question and its answer. */
export interface Asked {
  body: unknown
  answer: BenchAnswer
  /** Where the figure of an input comes from and when it was found; undefined for one that was typed. */
  originOf: (input: string) => string | undefined
}

/**
 * What goes with a result into the form of an order, a volume or a reading. The form is filled in, nothing is kept, and
 * the server works everything out again.
 *
 * @param enclosureId the enclosure chosen on the bench; null when none is
 * @returns null where the answer has no such figure, or it is only what was typed: that is no reading worked out
 */
export function carriedOf(
  of: AnyCalculator,
  carry: Carry,
  asked: Asked,
  enclosureId: string | null,
): BenchCarry | null {
  const { body, answer } = asked
  const said = sayAnswer(of, asked)
  const { read } = readInputs(of, body)
  switch (carry.to) {
    case 'order':
      return { to: 'order', said, bench: askedOf(of, body), enclosureId, ...orderPart(carry, read) }
    case 'volume': {
      const sheet = carry.sheet?.(read as Given<Record<string, Input>>) ?? statedSheet(answer)
      return sheet && { to: 'volume', said, sheet: sheet as CarriedSheet }
    }
    case 'reading': {
      const figure = answer.figures.find((one) => one.key === carry.figure)
      if (!figure || isTyped(of, carry.parameter, read)) return null
      const value = { value: figure.rounded, unit: figure.unit }
      return { to: 'reading', said, parameter: carry.parameter, value }
    }
  }
}

/** The question as an order keeps it; null where it does not fit, and goes on without. */
function askedOf(of: AnyCalculator, body: unknown): BenchAsked | null {
  const asked = BenchAsked.safeParse({ calculator: of.id, inputs: body })
  return asked.success ? asked.data : null
}

const isTyped = (of: AnyCalculator, parameter: ReadingParameter, read: Read): boolean =>
  Object.entries(of.inputs).some(
    ([name, input]) => input.kind === 'quantity' && input.reading === parameter && read[name] !== undefined,
  )

type CarriedSheet = Extract<BenchCarry, { to: 'volume' }>['sheet']

/** Units in which an order states its target and the smallest step, the usual one of each dimension first. */
const orderUnits = {
  target: ['mg/L', 'g/L', 'ug/L', 'uL/L', 'mL/L'],
  division: ['g', 'mg', 'kg', 'mL', 'L'],
} as const satisfies Record<string, readonly UnitCode[]>

function orderPart({ target, basis, division }: OrderCarry, read: Read) {
  const entered = (name: string | undefined) => {
    const given = name === undefined ? undefined : read[name]
    return typeof given === 'object' ? given.entered : undefined
  }
  return {
    target: inUnits(entered(target), orderUnits.target),
    basis: basisOf(basis, read),
    division: inUnits(entered(division), orderUnits.division),
  }
}

function basisOf(basis: OrderCarry['basis'], read: Read): ConcentrationBasis | null {
  if (basis === undefined) return null
  const given = read[typeof basis === 'string' ? basis : basis.input]
  const named = typeof basis === 'string' ? given : typeof given === 'string' ? basis.as[given] : undefined
  return concentrationBases.find((one) => one === named) ?? null
}

/** As it was typed where the form takes the unit, otherwise in the first of its units that has the same dimension. */
function inUnits(given: Quantity | undefined, units: readonly UnitCode[]): Quantity | null {
  if (!given) return null
  if (units.includes(given.unit)) return given
  for (const unit of units) {
    const there = convert(Number(given.value), given.unit, unit)
    if (there.ok) return { value: plainDigits(there.value, 12), unit }
  }
  return null
}

/** A volume without a sheet of its own: the figure, with its error where one is known. */
function statedSheet({ figures: [figure], range }: BenchAnswer): VolumeSheet | null {
  const litres = convert(figure.value, figure.unit, 'L')
  if (!litres.ok || litres.value <= 0) return null
  const errorPercent =
    range === null ? 0 : Number((((range.high - range.low) / 2 / figure.value) * 100).toPrecision(3))
  return { method: 'stated', volume: { value: plainDigits(litres.value, 6), unit: 'L' }, errorPercent }
}

const plainDigits = (value: number, figures: number) =>
  value === 0 ? '0' : withoutTrailingZeros(roundedTo(value, figures))
