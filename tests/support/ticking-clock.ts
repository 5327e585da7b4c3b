import type { settableClock } from '../../server/platform/clock.ts'

/**
 * A clock that stands at the real time and goes on, for tests in which a browser says "now" too; setting it moves it and
 * it goes on from there.
 */
export function tickingClock(): ReturnType<typeof settableClock> {
  let aheadMs = 0
  return {
    now: () => new Date(Date.now() + aheadMs),
    set: (at) => void (aheadMs = at.getTime() - Date.now()),
  }
}
