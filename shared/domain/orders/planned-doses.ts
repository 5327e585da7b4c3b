import { addHours } from '../time/instant-arithmetic.ts'
import type { Instant } from '../time/instant.ts'

export interface PlannedDose {
  /** Names the dose within its version: `1`, `2` … */
  key: string
  dueAt: Instant
}

/**
 * The doses that an order plans, at true hours from the first.
 *
 * @param plan doses, 1 or more; hours between them, null for a single dose
 */
export function plannedDoses(plan: {
  startsAt: Instant
  doses: number
  intervalHours: number | null
}): PlannedDose[] {
  return Array.from({ length: plan.doses }, (_, i) => ({
    key: String(i + 1),
    dueAt: addHours(plan.startsAt, i * (plan.intervalHours ?? 0)),
  }))
}
