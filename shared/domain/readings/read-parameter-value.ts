import { type Result } from '../result.ts'
import { findUnit } from '../units/find-unit.ts'
import type { QuantityRefusal } from '../units/number-refusal.ts'
import { parseQuantity, type ParsedQuantity } from '../units/parse-quantity.ts'
import { unitOf } from '../units/unit-of.ts'
import { canonicalUnit, type Dimension } from '../units/unit-table.ts'
import { parameterOf, type ReadingParameter } from './parameters.ts'

/**
 * Reads a value of one parameter as somebody typed it.
 *
 * @param entered digits and unit, from a form or the wire
 * @param field   what a refusal points to
 * @returns the canonical number of the dimension it was entered in, and the quantity as entered
 * @refuses as parseQuantity (bare ppm among others); a value that no instrument shows: below-least, above-most
 */
export function readParameterValue(
  parameter: ReadingParameter,
  entered: { value: unknown; unit: unknown },
  field = 'value',
): Result<ParsedQuantity, QuantityRefusal> {
  const definition = parameterOf(parameter)
  const dimension = dimensionMeant(definition.dimensions, entered.unit)
  return parseQuantity(entered, { dimension, min: definition.least, max: definition.most, field })
}

/** The dimension of the unit typed where the parameter has it, else the first, so that the refusal names that one. */
function dimensionMeant(dimensions: readonly Dimension[], unit: unknown): Dimension {
  const [first] = dimensions
  for (const dimension of dimensions) {
    const found = findUnit(unit, { dimension })
    if (found.ok && unitOf(found.value).dimension === dimension) return dimension
  }
  return first as Dimension
}

/** The unit that values of a parameter are compared in, for each dimension it may be entered in. */
export function canonicalUnitsOf(parameter: ReadingParameter) {
  return parameterOf(parameter).dimensions.map((dimension) => canonicalUnit[dimension])
}
