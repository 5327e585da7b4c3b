import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import type { Permit, PermitRow, PermitUse } from '../../../shared/contracts/permits.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Role } from '../../../shared/domain/permissions/roles.ts'
import { permitState } from '../../../shared/domain/register/permit-state.ts'
import { daysBetween } from '../../../shared/domain/time/facility-date.ts'
import type { PermitReadRow, PermitUseReadRow } from './permits.reads.ts'

export function presentPermitRow(row: PermitReadRow, today: string): PermitRow {
  const dates = { validFrom: row.valid_from, validUntil: row.valid_until }
  const used = Number(row.used)
  return {
    id: row.id,
    number: row.number,
    permitNumber: row.permit_number,
    authority: row.authority,
    kind: row.kind,
    ...dates,
    state: permitState({ ...dates, voided: row.voided_reason !== null }, today),
    daysLeft: daysBetween(today, row.valid_until),
    quantityAllowed: row.quantity_allowed,
    used,
    remaining: row.quantity_allowed === null ? null : row.quantity_allowed - used,
    taxa: row.taxa,
    openMarks: Number(row.open_marks),
    documents: Number(row.documents),
  }
}

function presentUse(row: PermitUseReadRow, allowed: number | null): PermitUse {
  return {
    id: row.id,
    transaction: row.transaction_number,
    kind: row.transaction_kind,
    on: row.happened_text,
    accession: row.accession,
    commonName: row.common_name,
    quantity: row.quantity,
    excess: row.excess,
    remaining: allowed === null ? null : allowed - Number(row.running),
    marks: row.marks,
    explained:
      row.explained_reason !== null && row.explained_at
        ? {
            reason: row.explained_reason,
            at: row.explained_at.toISOString(),
            by: row.explained_by_name ?? '',
          }
        : null,
    voided: row.voided,
  }
}

export function presentPermit(
  row: PermitReadRow,
  more: {
    today: string
    uses: readonly PermitUseReadRow[]
    papers: AttachedDocument[]
    roles: readonly Role[]
  },
): Permit {
  const mayManage = decide('register.manage', more.roles, {}).allowed
  return {
    ...presentPermitRow(row, more.today),
    counterparty:
      row.counterparty_id === null ? null : { id: row.counterparty_id, name: row.counterparty_name ?? '' },
    purposeCode: row.purpose_code,
    conditions: row.conditions,
    uses: more.uses.map((use) => presentUse(use, row.quantity_allowed)),
    papers: more.papers,
    recordedAt: row.recorded_at.toISOString(),
    recordedBy: row.recorded_by_name ?? '',
    voided:
      row.voided_reason !== null && row.voided_at
        ? { reason: row.voided_reason, at: row.voided_at.toISOString(), by: row.voided_by_name ?? '' }
        : null,
    may: mayManage ? ['register.manage', 'document.attach'] : [],
  }
}
