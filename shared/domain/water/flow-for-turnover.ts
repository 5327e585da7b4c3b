import { ok, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import { waterLimits } from './water-limits.ts'

/**
 * The flow that passes a volume once in a wanted time, L/min.
 *
 * @refuses as parseQuantity: volume and time above zero
 * @source  V ÷ t · check value lss.03
 */
export function flowForTurnover(input: {
  volume: Quantity
  turnover: Quantity
}): Result<{ litresPerMinute: number; working: WorkingLine[] }, VolumeRefusal> {
  const rules = { dimension: 'volume', above: 0, max: waterLimits.mostLitres, field: 'volume' } as const
  const volume = parseQuantity(input.volume, rules)
  if (!volume.ok) return volume
  const turnover = parseQuantity(input.turnover, { dimension: 'time', above: 0, field: 'turnover' })
  if (!turnover.ok) return turnover
  const litresPerMinute = volume.value.value / turnover.value.value
  const expression = `${enteredTerm(volume.value)} / (${enteredTerm(turnover.value)}) to L/minute`
  const key = 'flow-for-turnover'
  const line: WorkingLine = {
    key,
    code: key,
    params: {},
    expression,
    value: litresPerMinute,
    unit: 'L/min',
    rests: [],
  }
  return ok({ litresPerMinute, working: [line] })
}
