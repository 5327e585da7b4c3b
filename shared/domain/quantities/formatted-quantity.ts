import type { UnitCode } from '../units/unit-table.ts'

/**
 * How a rendered quantity is to be judged. Screens and documents put it on the element (`data-quantity`), so that a
 * test can scan every dose by the rule for doses and every reading by the rule for readings.
 *
 * - `dose`    an amount or strength of a drug, ordered, computed or given: no trailing zero
 * - `reading` what an instrument or a person measured: its digits are kept
 * - `volume`  a volume of water and its error, or a line of its working
 */
export type QuantityKind = 'dose' | 'reading' | 'volume'

export interface FormattedQuantity {
  kind: QuantityKind
  /** The whole, for one text node: number and unit joined by a no-break space. */
  text: string
  /** The parts, where number and unit stand in separate elements. */
  number: string
  symbol: string
  unit: UnitCode
}
