import { addDays, facilityDateOf } from '../../shared/domain/time/facility-date.ts'
import { instantOfLocalTime } from '../../shared/domain/time/local-time.ts'
import type { settableClock } from '../platform/clock.ts'

/** How far back the practice scenario reaches. */
export const historyDays = 90
export const dayMs = 86_400_000

/** Days and times of day of the facility, counted back from the moment of loading. */
export function demoTimes(now: Date, zone: string) {
  const today = facilityDateOf(now.toISOString(), zone)
  return {
    /** The facility date so many days ago; in the future where negative. */
    dateOf: (daysAgo: number) => addDays(today, -daysAgo),
    /** A time of day so many days ago; never ahead of now. */
    at: (daysAgo: number, time: string): string => {
      const at = instantOfLocalTime(addDays(today, -daysAgo), time, zone)
      return at > now.toISOString() ? now.toISOString() : at
    },
    /** Whether that time of day has been. */
    hasBeen: (daysAgo: number, time: string): boolean =>
      instantOfLocalTime(addDays(today, -daysAgo), time, zone) <= now.toISOString(),
  }
}

export type DemoTimes = ReturnType<typeof demoTimes>

/** What happens in the practice scenario, told in any order and played in order of time on the clock. */
export function createTimeline(clock: ReturnType<typeof settableClock>, now: Date) {
  const steps: { at: Date; run: () => Promise<unknown> }[] = []
  const earliest = new Date(now.getTime() - historyDays * dayMs)
  return {
    /** Notes what is entered at a time; what is older than the history is entered at its beginning. */
    later(at: Date | string, run: () => Promise<unknown>): void {
      const when = new Date(at)
      steps.push({ at: when < earliest ? earliest : when, run })
    },
    async play(): Promise<void> {
      for (const step of steps.sort((a, b) => a.at.getTime() - b.at.getTime())) {
        clock.set(step.at)
        await step.run()
      }
      clock.set(now)
    },
  }
}
