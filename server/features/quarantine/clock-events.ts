import { nameInSentence } from '../../../shared/domain/taxa/name-in-sentence.ts'
import type { ClockEvent } from '../../../shared/domain/quarantine/clock-event.ts'
import type {
  BatchReadRow,
  CaseEventReadRow,
  CaseReadRow,
  CountChangeReadRow,
  DeathReadRow,
} from './case-facts.reads.ts'

export interface StoredFacts {
  cases: readonly CaseReadRow[]
  batches: readonly BatchReadRow[]
  events: readonly CaseEventReadRow[]
  deaths: readonly (DeathReadRow & { case_id: string })[]
  countChanges: readonly CountChangeReadRow[]
}

/** How many there were of some animals at an instant, by their ledgers. */
export function countAt(
  changes: readonly CountChangeReadRow[],
  animalIds: readonly string[],
  at: Date,
): number {
  return changes
    .filter((row) => animalIds.includes(row.animal_id) && row.happened_at <= at)
    .reduce((sum, row) => sum + row.delta, 0)
}

/**
 * The events of cases as the clock takes them: what was entered, and what the ledgers of animals say: each joining is an
 * arrival, each death a death.
 */
export function clockEventsOf(facts: StoredFacts): ClockEvent[] {
  const kinds = new Map(facts.cases.map((one) => [one.id, one.quarantine_kind]))
  const arrivals = facts.batches
    .filter((row) => !row.from_split)
    .map((row): ClockEvent => {
      const together = facts.batches.filter(
        (other) => other.case_id === row.case_id && other.joined_at <= row.joined_at,
      )
      const ids = together.map(({ animal_id }) => animal_id)
      return {
        eventId: row.member_id,
        caseId: row.case_id,
        at: row.joined_at.toISOString(),
        kind: 'arrival',
        quarantineKind: kinds.get(row.case_id) ?? 'fish',
        animalCount: Math.max(1, countAt(facts.countChanges, [row.animal_id], row.joined_at)),
        animalName: nameInSentence(row.common_name),
        heldAfter: countAt(facts.countChanges, ids, row.joined_at),
      }
    })
  const entered = facts.events
    .filter((row) => row.voided_reason === null && row.kind !== 'voided')
    .map((row): ClockEvent => ({
      ...row.facts,
      eventId: row.id,
      caseId: row.case_id,
      at: row.happened_at.toISOString(),
    }))
  const deaths = facts.deaths.map((row): ClockEvent => ({
    eventId: row.id,
    caseId: row.case_id,
    at: row.happened_at.toISOString(),
    kind: 'death',
    deathCount: row.seen_count,
    arrivedAt:
      facts.batches
        .find((one) => one.case_id === row.case_id && one.animal_id === row.animal_id)
        ?.joined_at.toISOString() ?? row.happened_at.toISOString(),
  }))
  return [...arrivals, ...entered, ...deaths]
}
