import type { CaseDetail } from '../../../shared/contracts/quarantine.contract.ts'
import type { SignatureBlock } from '../../../shared/contracts/signing.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { EventOf } from '../../../shared/domain/quarantine/clock-event.ts'
import { readsClinical } from '../../../shared/domain/permissions/reads-clinical.ts'
import type { BatchReadRow, CaseEventReadRow, CaseReadRow } from './case-facts.reads.ts'
import type { CaseWork } from './case-steps.ts'
import { batchOf, clockOf, presentCaseRow, presentNames } from './cases.present.ts'
import type { Estimates } from './cases.present.ts'
import { countAt } from './clock-events.ts'
import { protocolInForce } from './protocol-in-force.ts'
import { isLive } from './read-clocks.ts'
import { withholdFromCase } from './withhold-clinical.ts'
import type { ClockFacts } from './read-clocks.ts'

/** What a case shows besides its clock, read by the caller. */
export interface CaseExtras {
  work: CaseWork
  estimates: Estimates
  openDiscrepancies: number
  protocolConfirmed: boolean
  /** Signature blocks by the id of the signed event. */
  signatures: ReadonlyMap<string, SignatureBlock>
  /** What was signed at clearance; null until then. */
  cleared: { against: number; reason: string | null } | null
  roles: readonly Role[]
}

const caseActions: readonly Action[] = [
  'case.open',
  'case.configure',
  'case.hold',
  'case.lock',
  'hold.lift',
  'case.clear',
  'clock.report',
  'observation.record',
  'observation.flag',
  'result.enter',
  'sample.take',
  'necropsy.sign',
]

function presentMember(
  facts: ClockFacts,
  row: BatchReadRow,
  estimates: Estimates,
): CaseDetail['batch'][number] {
  const stay = facts.stays.find(
    (one) =>
      one.case_id === row.case_id &&
      one.animal_id === row.animal_id &&
      one.from_at <= facts.asOf &&
      (one.until_at === null || one.until_at > facts.asOf),
  )
  const ledger = countAt(facts.countChanges, [row.animal_id], facts.asOf)
  return {
    id: row.member_id,
    accession: row.accession,
    name: row.house_name === null ? row.common_name : `${row.common_name}, ${row.house_name}`,
    scientificName: row.scientific_name,
    form: row.form,
    enclosure: stay ? (facts.places.get(stay.enclosure_id)?.code ?? null) : null,
    animals:
      ledger > 0 ? (estimates.get(row.animal_id) ?? { low: ledger, high: ledger }) : { low: 0, high: 0 },
    joinedAt: row.joined_at.toISOString(),
    joinedOn: row.joined_on,
    fromSplit: row.from_split,
  }
}

/** Deaths of a batch up to the instant asked about, the newest first, with what was signed about them. */
export function presentDeaths(
  facts: ClockFacts,
  own: readonly CaseEventReadRow[],
  batch: readonly BatchReadRow[],
  head: CaseReadRow,
  signatures: CaseExtras['signatures'],
): CaseDetail['deaths'] {
  const ofAnimals = facts.deaths
    .filter((row) => row.case_id === head.id)
    .map((row) => ({
      id: row.id,
      at: row.happened_at,
      on: row.happened_on,
      count: row.seen_count,
      accession: batch.find((one) => one.animal_id === row.animal_id)?.accession ?? null,
    }))
  const ofNobody = own
    .filter((row) => row.kind === 'death' && isLive(row))
    .map((row) => ({
      id: row.id,
      at: row.happened_at,
      on: row.happened_on,
      count: (row.facts as EventOf<'death'>).deathCount ?? 1,
      accession: null,
    }))
  return [...ofAnimals, ...ofNobody]
    .filter(({ at }) => at <= facts.asOf)
    .sort((a, b) => b.at.getTime() - a.at.getTime())
    .map(({ id, at, on, count, accession }) => {
      const signed = own.findLast(
        (row) =>
          row.kind === 'death-cause-signed' &&
          isLive(row) &&
          (row.facts as EventOf<'death-cause-signed'>).deathEventId === id,
      )
      const said = signed?.facts as EventOf<'death-cause-signed'> | undefined
      return {
        eventId: id,
        at: at.toISOString(),
        on,
        count,
        accession,
        finding: said?.finding ?? 'unexplained',
        cause: said?.cause ?? null,
        signature: signatures.get(signed?.id ?? '') ?? null,
      }
    })
}

/** A case with everything that its page shows. */
export function presentCase(facts: ClockFacts, head: CaseReadRow, extras: CaseExtras): CaseDetail {
  const clock = clockOf(facts, head)
  const batch = batchOf(facts, head)
  const own = facts.events.filter((row) => row.case_id === head.id && row.happened_at <= facts.asOf)
  const protocol = protocolInForce(facts, head)
  const numberOf = (id: string | null) => facts.cases.find((one) => one.id === id)?.number ?? null
  const eventOf = (id: string) => facts.events.find((row) => row.id === id)
  const clearedEvent = own.find((row) => row.kind === 'cleared')
  const clearedBy = signatureOf(clearedEvent)
  const detail: CaseDetail = {
    ...presentCaseRow(facts, head, extras.work, extras.estimates),
    asOf: facts.asOf.toISOString(),
    openedAt: head.happened_at.toISOString(),
    openedBy: head.recorded_by_name ?? '',
    protocol: {
      code: protocol.code,
      version: protocol.version,
      name: protocol.name,
      confirmed: extras.protocolConfirmed,
    },
    batch: batch.map((row) => presentMember(facts, row, extras.estimates)),
    sharesWaterWith: clock.sharesWaterWith.flatMap((id) => numberOf(id) ?? []),
    lastEntryOn: clock.lastEntryOn,
    criteria: clock.criteria.map(({ criterionId, met, metOn, count, wanted, earliestSampleOn }) => ({
      criterionId,
      name: protocol.content.criterionNames[criterionId] ?? criterionId,
      met,
      metOn,
      count,
      wanted,
      earliestSampleOn,
    })),
    extensions: clock.extensions.map(({ eventId, kind, fromOn, untilOn, state }) => ({
      eventId,
      kind,
      fromOn,
      untilOn,
      state,
    })),
    unmet: clock.unmet,
    decisionsDue: clock.decisionsDue.map(({ code, eventId }) => ({ code, eventId })),
    openDiscrepancies: extras.openDiscrepancies,
    locks: clock.locks
      .filter(({ liftedAt }) => liftedAt === null)
      .map(({ eventId, cause, from, fromCaseId }) => ({
        eventId,
        cause,
        since: from,
        by: eventOf(eventId)?.recorded_by_name ?? null,
        reason: eventOf(eventId)?.reason ?? null,
        fromCase: numberOf(fromCaseId),
      })),
    deaths: presentDeaths(facts, own, batch, head, extras.signatures),
    runningPauses: clock.pauses
      .filter(({ until, fromCaseId }) => until === null && fromCaseId === null)
      .map(({ pauseId, from, cause }) => ({ pauseId, since: from, cause })),
    events: own
      .map((row) => ({
        id: row.id,
        kind: row.kind,
        at: row.happened_at.toISOString(),
        on: row.happened_on,
        recordedAt: row.recorded_at.toISOString(),
        recordedBy: row.recorded_by_name ?? '',
        reason: row.reason,
        voidedReason: row.voided_reason,
      }))
      .reverse(),
    clearance:
      clearedEvent && clearedBy && extras.cleared
        ? { signature: clearedBy, on: clearedEvent.happened_on, ...extras.cleared }
        : null,
    names: presentNames(facts, [head]),
    version: head.version,
    may: caseActions.filter((action) => decide(action, extras.roles).allowed),
  }
  return readsClinical(extras.roles) ? detail : withholdFromCase(detail)

  function signatureOf(event: CaseEventReadRow | undefined): SignatureBlock | null {
    return extras.signatures.get(event?.id ?? '') ?? null
  }
}
