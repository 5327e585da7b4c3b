import type { Quantity } from '../units/quantity.ts'
import type { WorkingLine } from '../working/working-line.ts'

/** An amount of product for a body of water. */
export interface BathDose {
  /** Unrounded; stays in the working. */
  amount: number
  /** Solids in grams, liquids in millilitres. */
  unit: 'g' | 'mL'
  /** What is weighed or measured: rounded to the division of the measure, halves up; absent without a measure. */
  measured?: Quantity
  /** What the error of the volume makes of the amount, in `unit`, unrounded; absent when no error is known. */
  range?: { low: number; high: number }
  working: WorkingLine[]
}
