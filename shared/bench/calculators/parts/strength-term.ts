import type { ParsedQuantity } from '../../../domain/units/parse-quantity.ts'
import { enteredTerm } from '../../../domain/working/entered-term.ts'

/** The strength of a solution in an expression. A percentage stands there as what it means: 2.27 % w/v is 2.27 g in 100 mL. */
export function strengthTerm(strength: ParsedQuantity): string {
  const { unit, value } = strength.entered
  return unit === 'percent_w_v' ? `${value} g / (100 mL)` : enteredTerm(strength)
}
