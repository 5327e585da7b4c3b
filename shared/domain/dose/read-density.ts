import { refuse, type Result } from '../result.ts'
import { parseQuantity, type ParsedQuantity } from '../units/parse-quantity.ts'
import type { BathProduct } from './bath-product.ts'
import { doseLimits } from './dose-limits.ts'
import type { DoseRefusal } from './dose-refusal.ts'

/**
 * The density of a liquid product, g/mL.
 *
 * @refuses density-missing · as parseQuantity, 0.5 to 3 g/mL
 */
export function readDensity(product: BathProduct): Result<ParsedQuantity<'density'>, DoseRefusal> {
  if (product.density === undefined) return refuse('density-missing', 'density')
  return parseQuantity(product.density, {
    dimension: 'density',
    min: doseLimits.leastDensityGPerMl,
    max: doseLimits.mostDensityGPerMl,
    field: 'density',
  })
}
