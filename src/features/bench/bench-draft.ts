import type { AnyCalculator } from '../../../shared/bench/definition.ts'
import { isAsked } from '../../../shared/bench/read-inputs.ts'
import type { QuantityInput } from '../../../shared/bench/inputs.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'

/** What stands in the fields: a number and its unit as typed, or a chosen answer, "" while none is. */
export type Draft = Record<string, { value: string; unit: string } | string>

/** The units that a person last used, by calculator and input. */
export type RememberedUnits = Readonly<Record<string, string>>

export const unitKey = (of: AnyCalculator, input: string) => `${of.id} ${input}`

/** Empty fields, each in the unit that was used last, or in the first. */
export function emptyDraft(of: AnyCalculator, remembered: RememberedUnits): Draft {
  return Object.fromEntries(
    Object.entries(of.inputs).map(([name, input]) => [
      name,
      input.kind === 'choice' ? '' : { value: '', unit: unitFor(input, remembered[unitKey(of, name)]) },
    ]),
  )
}

const unitFor = (input: QuantityInput, last: string | undefined): string =>
  input.units.find((unit) => unit === last) ?? input.units[0] ?? ''

/** The example of a calculator, in its fields. */
export function exampleDraft(of: AnyCalculator): Draft {
  return { ...emptyDraft(of, {}), ...of.example }
}

/**
 * What the calculator is asked. A unit that was typed behind the number ("3785 US gal", "25 ppm") is the unit: the one
 * chosen beside it then is not meant.
 */
export function bodyOf(of: AnyCalculator, draft: Draft): Record<string, unknown> {
  return Object.fromEntries(
    Object.entries(draft).flatMap(([name, given]): [string, unknown][] => {
      if (!isAsked(of.inputs[name]?.when, draft)) return []
      if (typeof given === 'string') return given === '' ? [] : [[name, given]]
      const typed = /^\s*([-−–+]?[\d.,]+)\s*([a-zµμ°%‰].*)$/is.exec(given.value)
      return [[name, typed ? { value: typed[1], unit: typed[2] } : given]]
    }),
  )
}

/** The inputs that belong to the question as the choices stand, in order. */
export function askedInputs(of: AnyCalculator, draft: Draft): string[] {
  return Object.keys(of.inputs).filter((name) => isAsked(of.inputs[name]?.when, draft))
}

/** The units on offer for a choice of units: those of the dimension of the input that it goes with. */
export function fittingUnits(options: readonly string[], sameAs: readonly UnitCode[]): string[] {
  return options.filter((option) => sameAs.some((unit) => unit === option))
}

/** Whether anything has been filled in at all. */
export function isUntouched(draft: Draft): boolean {
  return Object.values(draft).every((given) =>
    typeof given === 'string' ? given === '' : given.value.trim() === '',
  )
}

/** The fields as a history entry keeps them, for whoever comes back. */
export const keptDraft = (draft: Draft, enclosureId: string | null) => ({ draft, enclosureId })

/** The fields that were left behind; null where there are none. Only what this calculator asks is taken. */
export function draftLeft(of: AnyCalculator, state: unknown): Draft | null {
  const left = (state as { draft?: unknown } | null)?.draft
  if (typeof left !== 'object' || left === null) return null
  const start = emptyDraft(of, {})
  for (const [name, input] of Object.entries(of.inputs)) {
    const given: unknown = Object.hasOwn(left, name) ? (left as Record<string, unknown>)[name] : undefined
    if (input.kind === 'choice') {
      if (typeof given === 'string') start[name] = given
    } else if (isTyped(given)) start[name] = { value: given.value, unit: given.unit }
  }
  return start
}

/** The enclosure whose water had filled them; null where none had. */
export function enclosureLeft(state: unknown): string | null {
  const left = (state as { enclosureId?: unknown } | null)?.enclosureId
  return typeof left === 'string' ? left : null
}

const isTyped = (given: unknown): given is { value: string; unit: string } =>
  typeof given === 'object' &&
  given !== null &&
  'value' in given &&
  'unit' in given &&
  typeof given.value === 'string' &&
  typeof given.unit === 'string'
