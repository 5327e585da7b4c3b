import type { ConcentrationBasis } from '../units/basis.ts'
import type { Quantity } from '../units/quantity.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { BathProduct, Measure } from './bath-product.ts'

/** What is ordered for the weight of an animal. A dose without a basis is refused. */
export interface WeightTarget {
  dose: Quantity
  basis: ConcentrationBasis | undefined
}

export interface WeightDoseInput {
  /** Of one animal, as it was weighed: "1.35", kg. */
  weight: Quantity
  weightErrorPercent?: number
  target: WeightTarget
  product: BathProduct
  /** The syringe or balance, by its smallest step. */
  measure?: Measure
  /** The largest volume for one place of an injection. */
  mostPerPlace?: Quantity
}

/** An amount of product for one animal. */
export interface WeightDose {
  /** Unrounded; stays in the working. */
  amount: number
  /** Solids in grams, liquids in millilitres. */
  unit: 'g' | 'mL'
  /** As the syringe or balance takes it, halves up; absent without one. */
  measured?: Quantity
  /** What the rounding makes of the dose, percent; absent without a measure. */
  roundingPercent?: number
  /** 1 in so many would bring the amount to a number of steps that can be read well; absent where it is one already. */
  thinTo?: number
  /** What goes in at each place, whole steps that come to the measured amount; absent for a single place. */
  portions?: Quantity[]
  /** What the error of the weight makes of the amount, in `unit`, unrounded; absent when no error is known. */
  range?: { low: number; high: number }
  working: WorkingLine[]
}
