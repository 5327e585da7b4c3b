import { ok, refuse, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { QuantityRefusal } from '../units/number-refusal.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import { waterLimits } from './water-limits.ts'

/**
 * What share of the water a change replaced.
 *
 * @param input.changed   water taken out and put back
 * @param input.netVolume net volume of the connected water
 * @returns fraction 0…1, and the working in percent
 * @refuses as parseQuantity · changed-more-than-volume: an exchange beyond the whole volume is a flow, not a change
 */
export function waterChangeShare(input: {
  changed: Quantity
  netVolume: Quantity
}): Result<
  { fraction: number; changedLitres: number; working: WorkingLine[] },
  QuantityRefusal | 'changed-more-than-volume'
> {
  const rules = { dimension: 'volume', above: 0, max: waterLimits.mostLitres } as const
  const changed = parseQuantity(input.changed, { ...rules, field: 'changed' })
  if (!changed.ok) return changed
  const net = parseQuantity(input.netVolume, { ...rules, field: 'netVolume' })
  if (!net.ok) return net
  if (changed.value.value > net.value.value) return refuse('changed-more-than-volume', 'changed')
  const fraction = changed.value.value / net.value.value
  const line: WorkingLine = {
    key: 'change-fraction',
    code: 'change-fraction',
    params: {},
    expression: `${enteredTerm(changed.value)} / (${enteredTerm(net.value)}) * 100`,
    value: fraction * 100,
    unit: 'percent',
    rests: [],
  }
  return ok({ fraction, changedLitres: changed.value.value, working: [line] })
}
