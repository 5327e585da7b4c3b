import type { Quantity } from '../units/quantity.ts'
import type { ConcentrationBasis } from '../units/basis.ts'

/** Molar masses that say how much of a compound is the part that counts: copper in copper sulfate pentahydrate. */
export interface MolarShare {
  activeGPerMol: number
  compoundGPerMol: number
}

/** The product in the bottle, as its label describes it. */
export interface BathProduct {
  form: 'solid' | 'liquid'
  /**
   * How much of the labelled substance is in it. Of a solid a mass fraction (99 % w/w); of a liquid a mass
   * concentration (396.1 mg/mL, 3 % w/v), or a mass fraction together with its density (35 % w/w). Not needed for a
   * target on the basis of the product.
   */
  strength?: Quantity
  /** What the strength on the label is of: the salt, the base, the active substance, total copper. */
  strengthBasis?: Exclude<ConcentrationBasis, 'product'>
  /** Needed where the target is of one thing and the label of another. */
  share?: MolarShare
  /** g/mL; of a liquid whose strength is % w/w, or whose target is mg of product per litre. */
  density?: Quantity
}

/** What is wanted in the water, and of what. A concentration without a basis is refused. */
export interface BathTarget {
  concentration: Quantity
  basis: ConcentrationBasis | undefined
}

/** The balance or measure that the amount is taken with; its smallest step as printed on it. */
export interface Measure {
  division: Quantity
}
