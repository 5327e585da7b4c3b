import type { UnitCode } from '../units/unit-table.ts'

/** A figure in a caution, said to be a dose or a reading. */
export interface CautionQuantity {
  quantity: 'dose' | 'reading'
  value: number
  unit: UnitCode
}

/** An animal named in a caution. */
export interface NamedAnimal {
  label: string
  commonName: string
  enclosureCode: string
}

/** Anything that stands in a caution's sentence. */
export type CautionParam = string | number | CautionQuantity | readonly NamedAnimal[] | readonly string[]

/** A figure that follows the rules for doses: a target, a limit of a dose, a strength. */
export function doseOf(value: number, unit: UnitCode): CautionQuantity {
  return { quantity: 'dose', value, unit }
}

/** A figure that was measured, or a limit to compare a measurement with. */
export function readingOf(value: number, unit: UnitCode): CautionQuantity {
  return { quantity: 'reading', value, unit }
}
