import type { ClockReasonView } from '../../../shared/contracts/quarantine-primitives.ts'
import type { ClockReason } from '../../../shared/domain/quarantine/clock-reason.ts'

/** A change of a clock in codes and figures, as it crosses the wire. */
export function presentReason(reason: ClockReason): ClockReasonView {
  const { code, rule, eventId, at, standing, effect, params } = reason
  return { code, rule, eventId, at, standing, effect: { ...effect }, params: { ...params } }
}
