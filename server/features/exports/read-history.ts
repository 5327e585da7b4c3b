import type { History } from '../../../shared/contracts/exports.contract.ts'
import { canonicalJson } from '../../../shared/domain/canonical-json.ts'
import type { Json } from '../../../shared/domain/canonical-json.ts'
import { computeGroupCount } from '../../../shared/domain/ledger/compute-group-count.ts'
import { balanceCustody } from '../../../shared/domain/register/balance-custody.ts'
import { transactionKinds } from '../../../shared/domain/register/transaction-kinds.ts'
import type { TransactionKind } from '../../../shared/domain/register/transaction-kinds.ts'
import { addDays } from '../../../shared/domain/time/facility-date.ts'
import { startOfFacilityDay } from '../../../shared/domain/time/local-time.ts'
import type { Db } from '../../platform/database/db.ts'
import { Problem } from '../../platform/http/problem.ts'
import { fingerprintOf } from '../../platform/pdf/fingerprint.ts'
import type { Acquisitions } from '../acquisitions/index.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { custodyOf, describeEvent, entriesOf, originsOf, statementsOf } from './assemble-history.ts'
import type { CustodyFacts } from './assemble-history.ts'
import {
  readCountEntries,
  readEnclosureNames,
  readIdentifiers,
  readMoves,
  readStatements,
  readSubject,
} from './custody.reads.ts'

/** What a history says, without when it was put together and who reads it: what its fingerprint covers. */
export type HistoryContent = Omit<History, 'fingerprint' | 'asOf' | 'may'>

export interface HistoryPeriod {
  from?: string | undefined
  until?: string | undefined
}

export interface HistoryParts {
  dataSource: Db
  facility: FacilityService
  acquisitions: Pick<Acquisitions, 'custodyOf'>
  documents: Documents
}

async function readFacts(parts: HistoryParts, accession: string): Promise<CustodyFacts | null> {
  const db = parts.dataSource
  const subject = await readSubject(db, accession)
  if (!subject) return null
  const [entries, moves, statements, custody] = await Promise.all([
    readCountEntries(db, subject.id),
    readMoves(db, subject.id),
    readStatements(db, subject.id),
    parts.acquisitions.custodyOf(subject.id),
  ])
  const places = moves.flatMap((move) => [move.from_enclosure_id, move.to_enclosure_id])
  const ids = custody.transactions.map((transaction) => transaction.id)
  return {
    subject,
    entries,
    moves,
    statements,
    enclosures: await readEnclosureNames(
      db,
      places.filter((id) => id !== null),
    ),
    ...custody,
    documents: await parts.documents.documentsOf('transaction', ids),
    zone: await parts.facility.zone(),
  }
}

/** Owned, lent or gone, by the last transaction that stands. */
function holdingOf(facts: CustodyFacts, count: number): Pick<History, 'heldAs' | 'owner'> {
  const standing = facts.transactions.filter((one) => one.voided_reason === null)
  const last = standing.at(-1)
  if (count === 0) return { heldAs: last?.kind === 'loan-out' ? 'loan-out' : 'gone', owner: null }
  const lent = standing.findLast((one) => one.way === 'in')
  return lent && transactionKinds[lent.kind as TransactionKind].loan
    ? { heldAs: 'loan-in', owner: lent.counterparty_name }
    : { heldAs: 'owned', owner: null }
}

/** The history of one animal or group, as stored now. */
export async function readHistory(
  parts: HistoryParts,
  accession: string,
  period: HistoryPeriod,
  asOf: string,
): Promise<HistoryContent> {
  if (period.from !== undefined && period.until !== undefined && period.until < period.from)
    throw new Problem('period-reversed')
  const facts = await readFacts(parts, accession)
  if (!facts) throw new Problem('not-found')
  const { subject, zone } = facts
  const custody = custodyOf(facts)
  const balanced = balanceCustody(custody, {
    from: period.from === undefined ? undefined : startOfFacilityDay(period.from, zone),
    until: period.until === undefined ? undefined : startOfFacilityDay(addDays(period.until, 1), zone),
  })
  const known = computeGroupCount(entriesOf(facts), statementsOf(facts), asOf)
  // The database keeps both from happening; a history that does not add up must not leave the house
  if (!balanced.ok) throw new Error(`the ledger of ${accession} goes below zero: ${balanced.refusal.code}`)
  if (!known.ok) throw new Error(`the count of ${accession} cannot be told: ${known.refusal.code}`)
  const { opening, closing, gained, lost, totals, events } = balanced.value
  const first = custody.find((event) => !event.voided)
  const count = known.value
  const identifiers = await readIdentifiers(parts.dataSource, subject.id)
  return {
    animalId: subject.id,
    accession: subject.accession,
    form: subject.form,
    name: subject.name,
    commonName: subject.common_name,
    scientificName: subject.scientific_name,
    sex: subject.sex,
    lifeStage: subject.stage,
    ...holdingOf(facts, count.ledgerCount),
    since: first ? describeEvent(facts, { ...first, countAfter: 0 }).on : null,
    count:
      count.basis === 'counted'
        ? { basis: 'counted', ledger: count.ledgerCount, low: null, high: null }
        : { basis: 'estimated', ledger: count.ledgerCount, low: count.low, high: count.high },
    place: subject.place_code === null ? null : { code: subject.place_code, name: subject.place_name ?? '' },
    from: period.from ?? null,
    until: period.until ?? null,
    opening,
    gained,
    lost,
    closing,
    totals,
    origins: originsOf(facts),
    events: events.map((event) => describeEvent(facts, event)),
    identifiers: identifiers.map((row) => ({
      kind: row.kind,
      value: row.value,
      place: row.place,
      from: row.valid_from,
      until: row.valid_until,
    })),
  }
}

/** SHA-256 of what a history says: the same facts give the same fingerprint, whoever prints them and when. */
export function fingerprintOfHistory(content: HistoryContent): string {
  return fingerprintOf(canonicalJson(content as unknown as Json))
}
