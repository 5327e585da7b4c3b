import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import type { HistoryEvent, HistoryOrigin } from '../../../shared/contracts/exports.contract.ts'
import type { CountStatement } from '../../../shared/domain/ledger/compute-group-count.ts'
import type { CountEntry } from '../../../shared/domain/ledger/count-entry.ts'
import type { Move } from '../../../shared/domain/ledger/move.ts'
import { listCustody } from '../../../shared/domain/register/list-custody.ts'
import type { CustodyEvent } from '../../../shared/domain/register/list-custody.ts'
import type { BalancedEvent } from '../../../shared/domain/register/balance-custody.ts'
import { transportWords } from '../../../shared/messages/history.ts'
import type { LineReadRow, TransactionReadRow, UseReadRow } from '../acquisitions/index.ts'
import type {
  CountEntryReadRow,
  MoveReadRow,
  RecordedReadRow,
  StatementReadRow,
  SubjectReadRow,
} from './custody.reads.ts'

/** Everything that is stored about the custody of one animal or group. */
export interface CustodyFacts {
  subject: SubjectReadRow
  entries: readonly CountEntryReadRow[]
  moves: readonly MoveReadRow[]
  statements: readonly StatementReadRow[]
  enclosures: ReadonlyMap<string, { code: string; name: string }>
  transactions: readonly TransactionReadRow[]
  lines: readonly LineReadRow[]
  uses: readonly UseReadRow[]
  documents: readonly { parentId: string; document: AttachedDocument }[]
  zone: string
}

const times = (row: RecordedReadRow) => ({
  at: row.happened_at.toISOString(),
  recordedAt: row.recorded_at.toISOString(),
})

export function entriesOf(facts: CustodyFacts): CountEntry[] {
  return facts.entries.map((row) => ({
    entryId: row.id,
    animalId: facts.subject.id,
    kind: row.kind,
    delta: row.delta,
    ...times(row),
    transferId: row.transfer_id,
    voided: row.struck_reason !== null,
  }))
}

export function statementsOf(facts: CustodyFacts): CountStatement[] {
  return facts.statements.map((row) =>
    row.basis === 'counted'
      ? { statementId: row.id, ...times(row), basis: 'counted', count: row.low }
      : { statementId: row.id, ...times(row), basis: 'estimated', low: row.low, high: row.high },
  )
}

/** Everything that happened, in order, one event a line. */
export function custodyOf(facts: CustodyFacts): CustodyEvent[] {
  const moves = facts.moves.map((row): Move => ({
    moveId: row.id,
    animalId: facts.subject.id,
    fromEnclosureId: row.from_enclosure_id,
    toEnclosureId: row.to_enclosure_id,
    ...times(row),
    voided: row.struck_reason !== null,
  }))
  return listCustody(entriesOf(facts), moves, statementsOf(facts))
}

/** Where animals went outside the house; where they were collected is told of the time before: see `originsOf`. */
function siteOf(transaction: TransactionReadRow | undefined): HistoryEvent['site'] {
  if (transaction?.way !== 'out') return undefined
  const { place: locality, latitude, longitude, uncertainty_metres: uncertaintyMetres } = transaction
  if (locality === null && latitude === null) return undefined
  return { locality, latitude, longitude, uncertaintyMetres }
}

/** An event as people and files read it: with places, the other party, permits and papers. */
export function describeEvent(facts: CustodyFacts, event: BalancedEvent): HistoryEvent {
  const entry = facts.entries.find((row) => row.id === event.eventId)
  const row = entry ?? [...facts.moves, ...facts.statements].find((one) => one.id === event.eventId)
  if (!row) throw new Error(`event ${event.eventId} has no row`)
  const line = facts.lines.find((one) => one.count_entry_id === event.eventId)
  const transaction = facts.transactions.find((one) => one.id === line?.transaction_id)
  // An estimate made on arrival has the instant of the transaction and no line of it
  const entered =
    transaction ?? facts.transactions.find((one) => one.happened_at.getTime() === row.happened_at.getTime())
  const site = siteOf(transaction)
  const place = (id: string | null) => (id === null ? null : (facts.enclosures.get(id) ?? null))
  return {
    eventId: event.eventId,
    kind: event.kind,
    on: entered?.happened_text ?? row.happened_on,
    at: event.at,
    exact: entered ? entered.happened_time !== null : true,
    delta: event.delta,
    countAfter: event.countAfter,
    found: event.found ?? null,
    from: place(event.fromEnclosureId),
    to: place(event.toEnclosureId),
    ...(site ? { site } : {}),
    otherAccession: entry?.other_accession ?? null,
    transaction: transaction?.number ?? null,
    counterparty: transaction?.counterparty_name ?? null,
    reference: transaction?.reference ?? null,
    theirNumber: line?.their_number ?? null,
    deadOnArrival: line?.dead_on_arrival ?? null,
    sourceCode: line?.source_code ?? null,
    transport: transaction ? transportWords(transaction, facts.zone) : null,
    permits: facts.uses
      .filter((use) => line !== undefined && use.line_id === line.id)
      .map((use) => ({
        number: use.permit,
        permitNumber: use.permit_number,
        authority: use.authority,
        kind: use.kind,
        validFrom: use.valid_from,
        validUntil: use.valid_until,
        quantity: use.quantity,
        marks: use.marks,
      })),
    documents: facts.documents
      .filter((paper) => paper.parentId === transaction?.id)
      .map((paper) => paper.document),
    note: transaction?.note ?? row.remark,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorded_by_name ?? '',
    voided:
      row.struck_reason !== null && row.struck_at
        ? { reason: row.struck_reason, at: row.struck_at.toISOString(), by: row.struck_by_name ?? '' }
        : null,
  }
}

/** What is known of the time before it was kept here: birth, and where it was collected. */
export function originsOf(facts: CustodyFacts): HistoryOrigin[] {
  const { subject } = facts
  const nowhere = { locality: null, method: null, latitude: null, longitude: null, uncertaintyMetres: null }
  const born: HistoryOrigin[] =
    subject.birth_date === null
      ? []
      : [
          {
            kind: 'born',
            on: subject.birth_date,
            approximate: subject.birth_approximate,
            birthKind: subject.birth_kind,
            ...nowhere,
          },
        ]
  const collected = facts.transactions
    .filter((one) => one.way === 'in' && one.voided_reason === null)
    .filter((one) => one.place !== null || one.place_date !== null || one.latitude !== null)
    .map((one): HistoryOrigin => ({
      kind: 'collected',
      on: one.place_date,
      approximate: false,
      birthKind: null,
      locality: one.place,
      method: one.place_method,
      latitude: one.latitude,
      longitude: one.longitude,
      uncertaintyMetres: one.uncertainty_metres,
    }))
  return [...born, ...collected]
}
