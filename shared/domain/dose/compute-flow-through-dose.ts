import type { Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { BathDose } from './bath-dose.ts'
import { computeAmount, type AmountInput } from './compute-amount.ts'
import type { DoseRefusal } from './dose-refusal.ts'
import { litresLine } from './litres-line.ts'

export interface FlowThroughInput extends Omit<AmountInput, 'volume' | 'present' | 'volumeErrorPercent'> {
  flow: Quantity
  duration: Quantity
}

/**
 * Product for water that flows through at a constant rate while product drips in: target × flow × time. The tank itself
 * is not primed by this; without priming it reaches 63 % of the target after one turnover.
 *
 * @refuses as parseQuantity (flow, duration above zero), litresLine and computeAmount
 * @source  check value bath.02
 */
export function computeFlowThroughDose(input: FlowThroughInput): Result<BathDose, DoseRefusal> {
  const { flow, duration, ...rest } = input
  const through = parseQuantity(flow, { dimension: 'flow', above: 0, field: 'flow' })
  if (!through.ok) return through
  const time = parseQuantity(duration, { dimension: 'time', above: 0, field: 'duration' })
  if (!time.ok) return time
  const litres = through.value.value * time.value.value
  const sound = litresLine(litres, 'net-volume-used', 'duration')
  if (!sound.ok) return sound
  const volume: WorkingLine = {
    key: 'flow-volume',
    code: 'flow-volume',
    params: {},
    expression: `${enteredTerm(through.value)} * ${enteredTerm(time.value)} to L`,
    value: litres,
    unit: 'L',
    rests: [],
  }
  return computeAmount({ ...rest, volume })
}
