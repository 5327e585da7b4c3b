/** Where the time comes from. Everything that needs it takes a clock, so that tests and the demo can stand on a fixed day. */
export interface Clock {
  now(): Date
}

export const systemClock: Clock = { now: () => new Date() }

/** A clock that stands still until it is set; for tests and for entering history that lies in the past. */
export function settableClock(start: Date): Clock & { set(at: Date): void } {
  let at = start
  return { now: () => at, set: (next) => void (at = next) }
}
