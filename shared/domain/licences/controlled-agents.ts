import type { SourceMark } from '../sources.ts'

/** Schedules of controlled substances that a veterinarian may prescribe under (United States). */
export const controlledSchedules = ['II', 'III', 'IV', 'V'] as const
export type ControlledSchedule = (typeof controlledSchedules)[number]

/**
 * Drugs of a schedule. What stands here wants a controlled-substance registration of whoever signs an order for it.
 *
 * @source us-controlled-schedules, from memory: confirm before relying on it
 */
export const controlledAgents: Record<string, { schedule: ControlledSchedule; mark: SourceMark }> = {
  butorphanol: { schedule: 'IV', mark: 'M' },
  ketamine: { schedule: 'III', mark: 'M' },
}

/** The schedule of a drug by its code; null of one that is in none. */
export const scheduleOf = (agent: string): ControlledSchedule | null =>
  Object.hasOwn(controlledAgents, agent) ? (controlledAgents[agent]?.schedule ?? null) : null
