import { ok, type Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import type { WorkingLine } from '../working/working-line.ts'
import type { VolumeRefusal } from './volume-refusal.ts'
import { waterLimits } from './water-limits.ts'

const minutesPerDay = 1440

/**
 * How long a flow takes to pass a volume once, and how often it does so in a day.
 *
 * @refuses as parseQuantity: volume and flow above zero
 * @source  V ÷ Q · check values lss.01, lss.02
 */
export function computeTurnover(input: {
  volume: Quantity
  flow: Quantity
}): Result<{ minutes: number; perDay: number; working: WorkingLine[] }, VolumeRefusal> {
  const max = waterLimits.mostLitres
  const volume = parseQuantity(input.volume, { dimension: 'volume', above: 0, max, field: 'volume' })
  if (!volume.ok) return volume
  const flow = parseQuantity(input.flow, { dimension: 'flow', above: 0, max, field: 'flow' })
  if (!flow.ok) return flow
  const [water, through] = [enteredTerm(volume.value), enteredTerm(flow.value)]
  const minutes = volume.value.value / flow.value.value
  const perDay = (flow.value.value * minutesPerDay) / volume.value.value
  const working: WorkingLine[] = [
    {
      key: 'turnover-time',
      code: 'turnover-time',
      params: {},
      expression: `${water} / (${through}) to minute`,
      value: minutes,
      unit: 'min',
      rests: [],
    },
    {
      key: 'turnovers-per-day',
      code: 'turnovers-per-day',
      params: {},
      expression: `${through} * 1440 minute / (${water})`,
      value: perDay,
      unit: 'per_d',
      rests: [],
    },
  ]
  return ok({ minutes, perDay, working })
}
