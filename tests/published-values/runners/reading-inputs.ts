import { ok, type Result } from '../../../shared/domain/result.ts'
import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Answer, Inputs } from '../published-case.ts'

/** A number of a case; its absence is a fault of the runner, not of the engine. */
export function numberOf(inputs: Inputs, key: string): number {
  const value = inputs[key]
  if (typeof value !== 'number') throw new Error(`the case has no number ${key}`)
  return value
}

/** An input as a person would enter it. */
export function quantityIn(inputs: Inputs, key: string, unit: UnitCode): Quantity {
  return quantityOf(numberOf(inputs, key), unit)
}

/** The first of several keys that the case has, with the unit that goes with the key. */
export function firstOf(inputs: Inputs, keys: Readonly<Record<string, UnitCode>>): Quantity | undefined {
  for (const [key, unit] of Object.entries(keys)) if (key in inputs) return quantityIn(inputs, key, unit)
  return undefined
}

/** One figure of an engine's answer; `names` says what the case calls the arguments that a refusal may point to. */
export function figure<T>(
  result: Result<T>,
  pick: (value: T) => number,
  names: Readonly<Record<string, string>>,
): Answer {
  if (result.ok) return ok({ value: pick(result.value) })
  const { field } = result.refusal
  return { ok: false, refusal: { ...result.refusal, field: names[field ?? ''] ?? field ?? '' } }
}
