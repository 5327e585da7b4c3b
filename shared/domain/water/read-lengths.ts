import { ok, type Result } from '../result.ts'
import type { QuantityRefusal } from '../units/number-refusal.ts'
import { parseQuantity, type ParsedQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { waterLimits } from './water-limits.ts'

const depths: readonly string[] = ['depth', 'coneHeight']

/**
 * Reads the lengths of a shape: each above zero, depths at most 15 m, others at most 150 m.
 *
 * @refuses the first that is not so, as parseQuantity, with `field` = path and name
 */
export function readLengths<Name extends string>(
  source: Readonly<Record<Name, Quantity>>,
  names: readonly Name[],
  path: string,
): Result<Record<Name, ParsedQuantity<'length'>>, QuantityRefusal> {
  const lengths: Partial<Record<Name, ParsedQuantity<'length'>>> = {}
  for (const name of names) {
    const max = depths.includes(name) ? waterLimits.deepestMetres : waterLimits.longestMetres
    const parsed = parseQuantity(source[name], {
      dimension: 'length',
      above: 0,
      max,
      field: `${path}${name}`,
    })
    if (!parsed.ok) return parsed
    lengths[name] = parsed.value
  }
  return ok(lengths as Record<Name, ParsedQuantity<'length'>>)
}
