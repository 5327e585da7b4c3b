import { compareInstants } from '../time/instant-arithmetic.ts'
import type { Instant } from '../time/instant.ts'
import type { PlannedDose } from '../schedule/plan-doses.ts'

export type OrderPhase =
  'draft' | 'proposed' | 'not-started' | 'in-progress' | 'held' | 'completed' | 'expired' | 'discontinued'

export interface OrderStanding {
  stage: 'draft' | 'proposed' | 'none'
  /** The signed version in force; null when none was signed. */
  signed: { planned: readonly PlannedDose[]; doneKeys: readonly string[]; lastWindowUntil: Instant } | null
  held: boolean
  ended: boolean
  /** A timed bath of it goes on: it went in and has no end. */
  running: boolean
  /** Doses of it stand on record: it was signed, though no version may be left of it. */
  hasRecords: boolean
}

/**
 * Where an order stands, computed and never stored. A signed order with a newer draft stands where its signed version
 * stands.
 *
 * @param doneKeys        planned doses given, recorded, withheld or refused
 * @param lastWindowUntil end of the window of the last planned dose: past it, an order not carried out has expired
 */
export function orderPhase(standing: OrderStanding, now: Instant): OrderPhase {
  const { signed } = standing
  if (standing.ended) return 'discontinued'
  // never a draft: what went in under it stands, whatever became of its text
  if (!signed && standing.hasRecords) return standing.held ? 'held' : 'in-progress'
  if (!signed) return standing.stage === 'proposed' ? 'proposed' : 'draft'
  const isAllRecorded = signed.planned.every((dose) => signed.doneKeys.includes(dose.key))
  if (isAllRecorded && !standing.running) return 'completed'
  if (standing.held) return 'held'
  // whoever looks sees first that animals are in a bath, however late it is for the doses that are left
  if (standing.running) return 'in-progress'
  if (compareInstants(now, signed.lastWindowUntil) > 0) return 'expired'
  return signed.doneKeys.length > 0 ? 'in-progress' : 'not-started'
}
