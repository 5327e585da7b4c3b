import { ok, refuse, type Refusal, type Result } from '../domain/result.ts'
import { readsAsSpecificGravity } from '../domain/seawater/specific-gravity.ts'
import { findUnit } from '../domain/units/find-unit.ts'
import { parseQuantity, type ParsedQuantity } from '../domain/units/parse-quantity.ts'
import { quantityOf } from '../domain/units/quantity-of.ts'
import { unitOf } from '../domain/units/unit-of.ts'
import type { Dimension } from '../domain/units/unit-table.ts'
import type { AnyCalculator } from './definition.ts'
import type { ChoiceInput, QuantityInput, When } from './inputs.ts'

export type Read = Record<string, ParsedQuantity | string | undefined>

const own = (body: unknown, name: string): unknown =>
  typeof body === 'object' && body !== null && Object.hasOwn(body, name)
    ? (body as Record<string, unknown>)[name]
    : undefined

/** Whether an input belongs to the question, by the choices as they stand. */
export function isAsked(when: When | undefined, body: unknown): boolean {
  if (when === undefined) return true
  return Object.entries(when).every(([name, answers]) => {
    const answer = own(body, name)
    return typeof answer === 'string' && answers.includes(answer)
  })
}

/**
 * Reads what a person or another program gives a calculator: `{ target: { value: '0.2', unit: 'mg/L' }, basis: 'free' }`.
 * A value may be a number instead of digits. What belongs to another choice is left aside.
 *
 * @param body anything at all
 * @returns what the calculator's `compute` takes
 * @refuses every input at fault, not only the first: as parseQuantity · not-whole · not-chosen or the choice's own code ·
 *          not-an-option · too-near-zero · quantity-part-unknown (params: part) · not-asked for a name that the calculator does not know · specific-gravity-as-salinity
 */
export function readInputs(of: AnyCalculator, body: unknown): { read: Read; refusals: Refusal[] } {
  const read: Read = {}
  const refusals: Refusal[] = []
  if (typeof body === 'object' && body !== null)
    for (const name of unknownIn(of, body)) refusals.push({ code: 'not-asked', field: name })
  for (const [name, input] of Object.entries(of.inputs)) {
    if (!isAsked(input.when, body)) continue
    const given = own(body, name)
    const answer = input.kind === 'choice' ? readChoice(input, name, given) : readQuantity(input, name, given)
    if (!answer.ok) refusals.push(answer.refusal)
    else if (answer.value !== undefined) read[name] = answer.value
  }
  return { read, refusals }
}

/** More names than this say nothing new, and the answer to a body of ten thousand would be longer than the body. */
const mostUnknown = 20

const unknownIn = (of: AnyCalculator, body: object): string[] =>
  Object.keys(body)
    .filter((name) => !Object.hasOwn(of.inputs, name))
    .slice(0, mostUnknown)

/** Nearer to zero than this nothing is weighed, measured or lost; the digits of such figures are those of rounding alone. */
const nearestToZero = 1e-12

function readChoice(input: ChoiceInput, name: string, given: unknown): Result<string | undefined> {
  if (given === undefined || given === null || given === '')
    return input.optional ? ok(undefined) : refuse(input.missing ?? 'not-chosen', name)
  return typeof given === 'string' && input.options.includes(given)
    ? ok(given)
    : refuse('not-an-option', name)
}

const quantityParts = ['value', 'unit']

function readQuantity(
  input: QuantityInput,
  name: string,
  given: unknown,
): Result<ParsedQuantity | undefined> {
  // a part that nobody knows may be one that was meant, under another name
  if (typeof given === 'object' && given !== null && !Array.isArray(given))
    for (const part of Object.keys(given))
      if (!quantityParts.includes(part))
        return refuse('quantity-part-unknown', name, { part: part.slice(0, 40) })
  const value = own(given, 'value')
  const blank =
    given === undefined ||
    given === null ||
    value === '' ||
    (typeof value === 'string' && value.trim() === '')
  if (blank && input.optional) return ok(undefined)
  if (blank && input.missing !== undefined) return refuse(input.missing, name)
  // asked for in the unit that stands in the field
  const asked = input.units.find((each) => each === own(given, 'unit')) ?? input.units[0]
  if (blank && asked !== undefined) return refuse('blank', name, { unit: asked })
  const dimensions = [...new Set(input.units.map((unit) => unitOf(unit).dimension))]
  const unit = own(given, 'unit')
  // "mg/kg" is a code of its own and also how people write milligrams per kilogram of feed: the code goes first
  const exact = input.units.find((each) => each === unit)
  const dimension = exact
    ? unitOf(exact).dimension
    : (dimensions.find((each) => isOf(each, unit)) ?? dimensions[0])
  if (dimension === undefined) return refuse('unknown-unit', name)
  const parsed = parseQuantity({ value: digitsOf(value), unit }, { ...input.limits, dimension, field: name })
  if (!parsed.ok) return parsed
  if (isSalinity(parsed.value, input) && readsAsSpecificGravity(parsed.value.value))
    return refuse('specific-gravity-as-salinity', name)
  const typed = Math.abs(Number(parsed.value.entered.value))
  if (typed > 0 && typed < nearestToZero) return refuse('too-near-zero', name)
  if (input.whole && !Number.isInteger(parsed.value.value)) return refuse('not-whole', name)
  return parsed
}

/** A salinity of a water: not a difference between two, and not a figure that is only put in another unit. */
const isSalinity = ({ unit }: ParsedQuantity, { difference, toConvert }: QuantityInput): boolean =>
  !difference && !toConvert && (unit === 'PSS-78' || unit === 'g/kg')

const isOf = (dimension: Dimension, typed: unknown): boolean => {
  const unit = findUnit(typed, { dimension })
  return unit.ok && unitOf(unit.value).dimension === dimension
}

/** JSON has numbers: 25 is taken as "25". */
const digitsOf = (value: unknown): unknown =>
  typeof value === 'number' && Number.isFinite(value) ? quantityOf(value, 'ratio').value : value
