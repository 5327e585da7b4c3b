import type { Transaction, TransactionRow } from '../../../shared/contracts/acquisitions.contract.ts'
import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import type { TransactionListRow } from './transaction-list.reads.ts'
import type { LineReadRow, TransactionReadRow, UseReadRow } from './transactions.reads.ts'

export function presentTransactionRow(row: TransactionListRow): TransactionRow {
  return {
    id: row.id,
    number: row.number,
    way: row.way,
    kind: row.kind,
    on: row.happened_text,
    counterparty: row.counterparty_name,
    reference: row.reference,
    animals: row.animals ?? [],
    lines: Number(row.lines),
    count: Number(row.count),
    permits: Number(row.permits),
    documents: Number(row.documents),
    openMarks: Number(row.open_marks),
    voided: row.voided,
    recordedAt: row.recorded_at.toISOString(),
  }
}

function presentLine(row: LineReadRow): Transaction['lines'][number] {
  return {
    id: row.id,
    animalId: row.animal_id,
    accession: row.accession,
    name: row.name,
    commonName: row.common_name,
    scientificName: row.scientific_name,
    form: row.form,
    accessioned: row.accessioned,
    count: row.count,
    estimate:
      row.estimate_low === null || row.estimate_high === null
        ? null
        : { low: row.estimate_low, high: row.estimate_high },
    deadOnArrival: row.dead_on_arrival,
    theirNumber: row.their_number,
    sourceCode: row.source_code,
    enclosure:
      row.enclosure_id === null
        ? null
        : { id: row.enclosure_id, code: row.enclosure_code ?? '', name: row.enclosure_name ?? '' },
  }
}

export function presentTransaction(
  row: TransactionReadRow,
  more: {
    lines: readonly LineReadRow[]
    uses: readonly UseReadRow[]
    documents: AttachedDocument[]
    roles: readonly Role[]
  },
): Transaction {
  const mayManage = decide('register.manage', more.roles, {}).allowed
  return {
    id: row.id,
    number: row.number,
    way: row.way,
    kind: row.kind,
    stage: row.stage,
    on: row.happened_text,
    time: row.happened_time,
    at: row.happened_at.toISOString(),
    counterparty:
      row.counterparty_id === null ? null : { id: row.counterparty_id, name: row.counterparty_name ?? '' },
    reference: row.reference,
    place: {
      locality: row.place,
      on: row.place_date,
      method: row.place_method,
      latitude: row.latitude,
      longitude: row.longitude,
      uncertaintyMetres: row.uncertainty_metres,
    },
    transport: {
      carrier: row.carrier,
      waybill: row.waybill,
      boxCount: row.box_count,
      sealedAt: row.sealed_at?.toISOString() ?? null,
      openedAt: row.opened_at?.toISOString() ?? null,
      note: row.transport_note,
    },
    loanDueOn: row.loan_due_on,
    note: row.note,
    lines: more.lines.map(presentLine),
    permitUses: more.uses.map((use) => ({
      id: use.id,
      lineId: use.line_id,
      permit: use.permit,
      permitNumber: use.permit_number,
      authority: use.authority,
      kind: use.kind,
      quantity: use.quantity,
      excess: use.excess,
      marks: use.marks,
      explained: use.explained,
    })),
    documents: more.documents,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorded_by_name ?? '',
    voided:
      row.voided_reason !== null && row.voided_at
        ? { reason: row.voided_reason, at: row.voided_at.toISOString(), by: row.voided_by_name ?? '' }
        : null,
    may: mayManage ? ['register.manage', 'document.attach'] : [],
  }
}
