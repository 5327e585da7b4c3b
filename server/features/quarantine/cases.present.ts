import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { CaseRow } from '../../../shared/contracts/quarantine-primitives.ts'
import type { CaseClock } from '../../../shared/domain/quarantine/case-clock.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { BatchReadRow, CaseReadRow } from './case-facts.reads.ts'
import { presentLegs } from './case-steps.ts'
import type { CaseWork } from './case-steps.ts'
import { countAt } from './clock-events.ts'
import { presentReason } from './present-reason.ts'
import { protocolContentOf, protocolInForce } from './protocol-in-force.ts'
import type { ClockFacts } from './read-clocks.ts'

/** Animals of the batch whose ledgers are estimates, with the range known of each. */
export type Estimates = ReadonlyMap<string, { low: number; high: number }>

export const batchOf = (facts: ClockFacts, head: Pick<CaseReadRow, 'id'>): BatchReadRow[] =>
  facts.batches.filter((row) => row.case_id === head.id)

export function clockOf(facts: ClockFacts, head: Pick<CaseReadRow, 'id'>): CaseClock {
  const clock = facts.clocks.get(head.id)
  if (!clock) throw new Error(`case ${head.id} has no clock`)
  return clock
}

/** How many of the batch there are: as counted, or between the figures of an estimate. */
function animalsNow(facts: ClockFacts, batch: readonly BatchReadRow[], estimates: Estimates) {
  const each = batch.map(({ animal_id }) => {
    const ledger = countAt(facts.countChanges, [animal_id], facts.asOf)
    return ledger > 0 ? (estimates.get(animal_id) ?? { low: ledger, high: ledger }) : { low: 0, high: 0 }
  })
  return {
    low: each.reduce((sum, one) => sum + one.low, 0),
    high: each.reduce((sum, one) => sum + one.high, 0),
  }
}

/** The count of the batch at each day on which it changed, by the ledgers. */
function countsOf(facts: ClockFacts, batch: readonly BatchReadRow[]): CaseRow['counts'] {
  const joined = new Map(batch.map((row) => [row.animal_id, row.joined_on]))
  const byDay = new Map<string, number>()
  for (const row of facts.countChanges) {
    const since = joined.get(row.animal_id)
    if (since === undefined || row.happened_at > facts.asOf) continue
    // What an animal counted before it joined came in with it
    const on = row.happened_on < since ? since : row.happened_on
    byDay.set(on, (byDay.get(on) ?? 0) + row.delta)
  }
  let animals = 0
  return [...byDay.entries()]
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .flatMap(([on, delta]) => {
      animals += delta
      return delta === 0 ? [] : [{ on, low: animals, high: animals }]
    })
}

const ended = (status: CaseClock['status']) => ['cleared', 'recalled', 'transferred'].includes(status)

/** A case as the board shows it. */
export function presentCaseRow(
  facts: ClockFacts,
  head: CaseReadRow,
  work: CaseWork,
  estimates: Estimates,
): CaseRow {
  const clock = clockOf(facts, head)
  const batch = batchOf(facts, head)
  const endedOn =
    ended(clock.status) && head.ended_at ? facilityDateOf(head.ended_at.toISOString(), facts.zone) : null
  const places = facts.stays
    .filter((row) => row.case_id === head.id && row.from_at <= facts.asOf)
    .filter((row) => row.until_at === null || row.until_at > facts.asOf)
    .flatMap((row) => facts.places.get(row.enclosure_id) ?? [])
  const standing = clock.locks.filter(({ liftedAt }) => liftedAt === null)
  return {
    id: head.id,
    number: head.number,
    name: head.name,
    quarantineKind: head.quarantine_kind,
    status: clock.status,
    held: standing.some(({ cause }) => cause === 'held'),
    enclosures: [...new Set(places.map(({ code }) => code))].sort(),
    areas: [...new Set(places.map(({ area }) => area))].sort(),
    boundaries: [...new Set(places.flatMap(({ boundary }) => boundary ?? []))].sort(),
    protocolCode: protocolInForce(facts, head).code,
    animals: animalsNow(facts, batch, estimates),
    members: batch.length,
    day0On: clock.day0On,
    dayNumber: clock.dayNumber,
    requiredDays: clock.requiredDays,
    pausedDays: clock.pausedDays,
    earliestClearanceOn: clock.earliestClearanceOn,
    readyToClear: !ended(clock.status) && clock.status !== 'open' && clock.unmet.length === 0,
    endedOn,
    legs: presentLegs(facts, head, clock.legs, clock.reasons, work, clock.asOfOn, endedOn),
    pauses: clock.pauses.map(({ from, until }) => ({
      fromOn: facilityDateOf(from, facts.zone),
      untilOn: until === null ? null : facilityDateOf(until, facts.zone),
    })),
    counts: countsOf(facts, batch),
    reasons: clock.reasons.map(presentReason),
    forVeterinarian: work.looks.filter(
      (row) => row.case_id === head.id && row.for_veterinarian && !row.reviewed,
    ).length,
  }
}

/** Names of what the sentences of some cases speak of. */
export function presentNames(facts: ClockFacts, heads: readonly CaseReadRow[]): CaseDetail['names'] {
  const contents = heads.map((head) => protocolContentOf(facts, head))
  return {
    cases: Object.fromEntries(facts.cases.map(({ id, number }) => [id, number])),
    criteria: Object.assign({}, ...contents.map(({ criterionNames }) => criterionNames)) as Record<
      string,
      string
    >,
    tests: Object.assign({}, ...contents.map(({ testNames }) => testNames)) as Record<string, string>,
  }
}
