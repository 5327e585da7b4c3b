import type { BrowserContext } from 'playwright-core'
import type { settableClock } from '../../server/platform/clock.ts'

/** The day on which all tests live, whenever they are run: early afternoon at the facility of the tests. */
export const testDay = new Date('2026-12-01T18:20:00Z')

/** Tests of the browser begin at that time and go on from it, server and page alike. */
const aheadMs = testDay.getTime() - Date.now()

/** A clock that goes, on the test day; setting it moves it and it goes on from there. */
export function tickingClock(): ReturnType<typeof settableClock> {
  let ahead = aheadMs
  return {
    now: () => new Date(Date.now() + ahead),
    set: (at) => void (ahead = at.getTime() - Date.now()),
  }
}

/** Puts the pages of a context on the test day, or days after it: they say "now" by their own clock. Timers go on as ever. */
export async function putOnTestDay(context: BrowserContext, daysLater = 0): Promise<void> {
  await context.addInitScript(
    (ahead) => {
      const Real = Date
      globalThis.Date = class extends Real {
        constructor(...given: [] | ConstructorParameters<typeof Real>) {
          if (given.length === 0) super(Real.now() + ahead)
          else super(...given)
        }
        static override now(): number {
          return Real.now() + ahead
        }
      } as DateConstructor
    },
    aheadMs + daysLater * 86_400_000,
  )
}
