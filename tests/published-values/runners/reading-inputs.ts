import { quantityOf } from '../../../shared/domain/units/quantity-of.ts'
import type { Quantity } from '../../../shared/domain/units/quantity.ts'
import type { UnitCode } from '../../../shared/domain/units/unit-table.ts'
import type { Inputs } from '../published-case.ts'

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
