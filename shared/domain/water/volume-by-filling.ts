import type { Result } from '../result.ts'
import { parseQuantity } from '../units/parse-quantity.ts'
import type { Quantity } from '../units/quantity.ts'
import { enteredTerm } from '../working/entered-term.ts'
import { knownVolume } from './known-volume.ts'
import type { VolumeDetermination } from './volume-determination.ts'
import type { VolumeRefusal } from './volume-refusal.ts'

/**
 * Net volume from a steady flow into an empty system and the time that it took to fill: flow × time.
 *
 * @param input.errorPercent of flow and time together, 0…100
 * @refuses as parseQuantity (flow, duration above zero) · as knownVolume
 * @source  the time that a measured flow takes; mensuration
 */
export function volumeByFilling(input: {
  flow: Quantity
  duration: Quantity
  errorPercent: number
}): Result<VolumeDetermination, VolumeRefusal> {
  const flow = parseQuantity(input.flow, { dimension: 'flow', above: 0, field: 'flow' })
  if (!flow.ok) return flow
  const duration = parseQuantity(input.duration, { dimension: 'time', above: 0, field: 'duration' })
  if (!duration.ok) return duration
  const litres = flow.value.value * duration.value.value
  const expression = `${enteredTerm(flow.value)} * ${enteredTerm(duration.value)} to L`
  const line = { key: 'net-volume', code: 'water-metered' as const, params: {}, expression, value: litres }
  return knownVolume('metered', [{ ...line, unit: 'L', rests: [] }], litres, input.errorPercent)
}
