import { addHours, compareInstants } from '../time/instant-arithmetic.ts'
import type { Instant } from '../time/instant.ts'

/** A stop at one dose that a veterinarian answered with a signed reason. */
export interface DoseOverride {
  /** Names rule, code, facts and lot that it was given for. */
  finding: string
  signedAt: Instant
  /** Text, signature and columns fit. */
  isIntact: boolean
}

/** What was judged at the tank is judged again after an hour: readings grow old and animals change. */
export const overrideHours = 1

/**
 * Whether a signed override still answers a finding: the same rule and code on the same facts and lot, not longer ago
 * than an hour.
 *
 * @source project-default
 */
export function overrideStands(override: DoseOverride, finding: string, now: Instant): boolean {
  return (
    override.isIntact &&
    override.finding === finding &&
    compareInstants(override.signedAt, now) <= 0 &&
    compareInstants(now, addHours(override.signedAt, overrideHours)) <= 0
  )
}
