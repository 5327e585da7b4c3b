import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { CaseRow, ClockReasonView } from '../../../shared/contracts/quarantine-primitives.ts'
import type { Observation } from '../../../shared/contracts/observations.contract.ts'
import { clinicalWords } from '../../../shared/messages/quarantine-records.ts'

const { withheld } = clinicalWords

/** Names and words in the reasons of a clock that belong to the chart. */
const clinicalParams = new Set(['pathogenName', 'signs', 'agentName', 'subject'])
/** The cause of a death; of a fault it is no clinical word. */
const codesWithCause = new Set(['extended-transmissible-death', 'death-explained'])

function withholdReason<R extends ClockReasonView>(reason: R): R {
  const isClinical = (key: string) =>
    clinicalParams.has(key) || (key === 'cause' && codesWithCause.has(reason.code))
  const params = Object.entries(reason.params).map(([key, value]) => [
    key,
    isClinical(key) && value !== '' ? withheld : value,
  ])
  return { ...reason, params: Object.fromEntries(params) }
}

/** A case on the board without clinical words. */
export function withholdFromRow(row: CaseRow): CaseRow {
  return {
    ...row,
    legs: row.legs.map((leg) => ({
      ...leg,
      endReason: leg.endReason === null ? null : withholdReason(leg.endReason),
    })),
    reasons: row.reasons.map(withholdReason),
  }
}

/** The same of the whole sheet of a case: causes of deaths, reasons in words. */
export function withholdFromCase(detail: CaseDetail): CaseDetail {
  return {
    ...detail,
    ...withholdFromRow(detail),
    deaths: detail.deaths.map((death) => ({ ...death, cause: death.cause === null ? null : withheld })),
    locks: detail.locks.map((lock) => ({ ...lock, reason: lock.reason === null ? null : withheld })),
    events: detail.events.map((event) => ({
      ...event,
      reason: event.reason === null ? null : withheld,
      voidedReason: event.voidedReason === null ? null : withheld,
    })),
    clearance: detail.clearance && {
      ...detail.clearance,
      reason: detail.clearance.reason === null ? null : withheld,
    },
  }
}

/** An observation without what was said in words and signs. */
export function withholdFromObservation(one: Observation): Observation {
  return {
    ...one,
    signs: [],
    words: one.words === null ? null : withheld,
    bodies: one.bodies && { ...one.bodies, reason: one.bodies.reason === null ? null : withheld },
    reviewed: one.reviewed && { ...one.reviewed, words: one.reviewed.words === null ? null : withheld },
    voidedReason: one.voidedReason === null ? null : withheld,
  }
}
