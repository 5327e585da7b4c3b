import { addDays } from '../time/facility-date.ts'
import type { FacilityDate } from '../time/instant.ts'
import type { AgentCode } from './agent.ts'

/**
 * Agents after which an animal waits before it may be eaten or set free, of those that are given into the water. The
 * number of days is a threshold of the rule on the agent, which a facility confirms.
 *
 * @source cfr-529-2503: tricaine, 21 days
 */
export const withWithdrawal: readonly AgentCode[] = ['tricaine']

/** A dose after which its animals wait. */
export interface WithdrawalDose {
  agent: AgentCode
  orderNumber: string
  /** Day of the facility. */
  givenOn: FacilityDate
}

/** Until when an animal waits, and after which order. */
export interface WithdrawalHold {
  agent: AgentCode
  orderNumber: string
  /** The first day on which it may leave. */
  until: FacilityDate
}

/**
 * The hold that stands on a day: of several the one that lasts longest. The day of the last dose and the days of the
 * withdrawal make the first day on which it is over.
 *
 * @param days whole days, 0 or more; a part of a day counts as a whole one
 * @returns null where nothing is waited for any more on that day
 */
export function withdrawalHold(
  doses: readonly WithdrawalDose[],
  days: number,
  on: FacilityDate,
): WithdrawalHold | null {
  const holds = doses
    .map(({ agent, orderNumber, givenOn }) => ({
      agent,
      orderNumber,
      until: addDays(givenOn, Math.ceil(days)),
    }))
    .sort((a, b) => b.until.localeCompare(a.until))
  const [longest] = holds
  return longest && longest.until > on ? longest : null
}
