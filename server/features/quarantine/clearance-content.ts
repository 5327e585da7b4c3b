import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { UnmetCriterion } from '../../../shared/domain/quarantine/case-clock.ts'
import type { QuarantineKind } from '../../../shared/domain/quarantine/quarantine-kind.ts'
import { sayClockReason } from '../../../shared/messages/say-clock-reason.ts'
import type { ClockWords } from '../../../shared/messages/say-clock-reason.ts'
import { sayDate, sayInstantWithOffset } from '../../../shared/messages/say-date.ts'
import { sayUnmet } from '../../../shared/messages/say-unmet.ts'
import { facilityDateOf } from '../../../shared/domain/time/facility-date.ts'
import type { AnimalFacts } from '../animals/index.ts'
import { presentDeaths } from './case-detail.present.ts'
import type { CaseReadRow } from './case-facts.reads.ts'
import { batchOf, clockOf, presentNames } from './cases.present.ts'
import { protocolInForce } from './protocol-in-force.ts'
import type { ClockFacts } from './read-clocks.ts'

/** Raised whenever the clock changes in a way that could change a date; stands in every signed clearance. */
export const clockVersion = 1

/** Everything that a signature under a clearance covers, as it was signed; the certificate is made from it alone. */
export interface ClearanceContent {
  kind: 'quarantine-clearance'
  clockVersion: number
  /** The event of the clock that this signature makes. */
  eventId: string
  caseId: string
  number: string
  name: string
  quarantineKind: QuarantineKind
  protocol: { code: string; version: number; name: string; confirmed: boolean }
  clearedAt: string
  clearedOn: string
  zone: string
  day0On: string | null
  dayNumber: number | null
  requiredDays: number
  pausedDays: number
  earliestClearanceOn: string | null
  /** Numbers of the cases on the same water. */
  sharesWaterWith: string[]
  batch: {
    accession: string
    commonName: string
    scientificName: string
    houseName: string | null
    enclosureCode: string | null
    joinedOn: string
    count: { basis: 'counted' | 'estimated'; low: number; high: number }
  }[]
  criteria: { name: string; met: boolean; metOn: string | null; count: number; wanted: number }[]
  clock: { code: string; on: string; text: string; standing: boolean }[]
  deaths: {
    on: string
    count: number
    accession: string | null
    finding: CaseDetail['deaths'][number]['finding']
    cause: string | null
  }[]
  unmet: { code: UnmetCriterion['code']; params: UnmetCriterion['params']; text: string }[]
  reason: string | null
}

/** How dates and names are written in a text that is signed. */
function writtenWords(facts: ClockFacts, head: CaseReadRow): ClockWords {
  const names = presentNames(facts, [head])
  return {
    date: sayDate,
    instant: (at) => sayInstantWithOffset(at, facts.zone),
    caseName: (id) => names.cases[id] ?? id,
    criterionName: (id) => names.criteria[id] ?? id,
    testName: (key) => names.tests[key] ?? key,
  }
}

/** Writes out what a clearance says, from the facts as they stand under the lock. */
export function writeClearance(given: {
  facts: ClockFacts
  head: CaseReadRow
  animals: readonly AnimalFacts[]
  protocolConfirmed: boolean
  eventId: string
  clearedOn: string
  reason: string | null
}): ClearanceContent {
  const { facts, head } = given
  const clock = clockOf(facts, head)
  const words = writtenWords(facts, head)
  const protocol = protocolInForce(facts, head)
  const batch = batchOf(facts, head)
  const own = facts.events.filter((row) => row.case_id === head.id)
  return {
    kind: 'quarantine-clearance',
    clockVersion,
    eventId: given.eventId,
    caseId: head.id,
    number: head.number,
    name: head.name,
    quarantineKind: head.quarantine_kind,
    protocol: {
      code: protocol.code,
      version: protocol.version,
      name: protocol.name,
      confirmed: given.protocolConfirmed,
    },
    clearedAt: facts.asOf.toISOString(),
    clearedOn: given.clearedOn,
    zone: facts.zone,
    day0On: clock.day0On,
    dayNumber: clock.dayNumber,
    requiredDays: clock.requiredDays,
    pausedDays: clock.pausedDays,
    earliestClearanceOn: clock.earliestClearanceOn,
    sharesWaterWith: clock.sharesWaterWith.map(words.caseName),
    batch: batch.map((row) => {
      const animal = given.animals.find((one) => one.animalId === row.animal_id)
      return {
        accession: row.accession,
        commonName: row.common_name,
        scientificName: row.scientific_name,
        houseName: row.house_name,
        enclosureCode: animal?.enclosureCode ?? null,
        joinedOn: row.joined_on,
        count: {
          basis: animal?.count.basis ?? 'counted',
          low: animal?.count.low ?? 0,
          high: animal?.count.high ?? 0,
        },
      }
    }),
    criteria: clock.criteria.map(({ criterionId, met, metOn, count, wanted }) => ({
      name: words.criterionName(criterionId),
      met,
      metOn,
      count,
      wanted,
    })),
    clock: clock.reasons.map((reason) => ({
      code: reason.code,
      on: facilityDateOf(reason.at, facts.zone),
      text: sayClockReason(reason, words),
      standing: reason.standing,
    })),
    deaths: presentDeaths(facts, own, batch, head, new Map()).map(
      ({ on, count, accession, finding, cause }) => ({ on, count, accession, finding, cause }),
    ),
    unmet: clock.unmet.map(({ code, params }) => ({ code, params, text: sayUnmet({ code, params }, words) })),
    reason: given.reason,
  }
}
