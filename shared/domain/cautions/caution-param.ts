import type { UnitCode } from '../units/unit-table.ts'
import type { ReadingName } from './reading-name.ts'

/** A figure in a caution, said to be a dose or a reading. */
export interface CautionQuantity {
  quantity: 'dose' | 'reading'
  value: number
  unit: UnitCode
  /** Digits as an instrument showed them; without them the value is drawn to the places of its unit. */
  digits?: string
}

/** A water test that has to be fresh, and how fresh. */
export interface RequiredTest {
  reading: ReadingName
  maxAgeMinutes: number
}

/** An animal named in a caution. */
export interface NamedAnimal {
  label: string
  commonName: string
  enclosureCode: string
}

/** Anything that stands in a caution's sentence. */
export type CautionParam =
  string | number | CautionQuantity | readonly NamedAnimal[] | readonly RequiredTest[] | readonly string[]

/** A figure that follows the rules for doses: a target, a limit of a dose, a strength. */
export function doseOf(value: number, unit: UnitCode): CautionQuantity {
  return { quantity: 'dose', value, unit }
}

/** A figure that was measured, or a limit to compare a measurement with. */
export function readingOf(value: number, unit: UnitCode, digits?: string): CautionQuantity {
  return { quantity: 'reading', value, unit, ...(digits === undefined ? {} : { digits }) }
}
