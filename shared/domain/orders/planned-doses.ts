import { type PlannedDose, planDoses } from '../schedule/plan-doses.ts'
import type { Instant, Zone } from '../time/instant.ts'

/**
 * The doses that an order for a bath plans, with their windows.
 *
 * @param plan doses, 1 or more; hours between them, null for a single dose
 * @param zone the facility's zone: a daily dose keeps its time of day when the clocks change
 * @returns in time order; none where the plan is not one (a draft that lacks a figure)
 */
export function plannedDoses(
  plan: { startsAt: Instant; doses: number; intervalHours: number | null },
  zone: Zone,
): PlannedDose[] {
  const { startsAt, doses, intervalHours } = plan
  const planned = planDoses(
    intervalHours === null ? { kind: 'once' } : { kind: 'every-hours', intervalHours, doseCount: doses },
    startsAt,
    zone,
  )
  return planned.ok ? planned.value : []
}
