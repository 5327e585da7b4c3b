import type { Licence, Person, PersonRow } from '../../../shared/contracts/people.contract.ts'
import { licenceState } from '../../../shared/domain/licences/licence-state.ts'
import type { LicenceReadRow, PersonReadRow } from './people.reads.ts'

/** The facility's day and what it accepts: a licence's state depends on both. */
export interface Today {
  on: string
  accepted: readonly string[]
}

export function presentLicence(row: LicenceReadRow, today: Today): Licence {
  const licence = {
    jurisdiction: row.jurisdiction,
    validFrom: row.valid_from,
    validUntil: row.valid_until,
    void: row.voided_reason !== null,
  }
  return {
    id: row.id,
    jurisdiction: row.jurisdiction,
    number: row.number,
    validFrom: row.valid_from,
    validUntil: row.valid_until,
    state: licenceState(licence, today.on, today.accepted),
    voidedReason: row.voided_reason,
    recordedAt: new Date(row.recorded_at).toISOString(),
    recordedBy: row.recorded_by_name ?? '',
  }
}

export function presentPersonRow(row: PersonReadRow, today: Today): PersonRow {
  const states = row.licences.map((licence) => presentLicence(licence, today).state)
  return {
    id: row.id,
    email: row.email,
    printedName: row.printed_name,
    roles: row.roles,
    active: row.active,
    mustChangePassword: row.must_change_password,
    licenceState: states.includes('valid')
      ? 'valid'
      : states.some((state) => state !== 'void')
        ? 'not-valid'
        : 'none',
    lastSignInAt: row.last_sign_in_at?.toISOString() ?? null,
    version: row.version,
  }
}

export function presentPerson(row: PersonReadRow, today: Today): Person {
  return {
    ...presentPersonRow(row, today),
    licences: row.licences.map((licence) => presentLicence(licence, today)),
    createdAt: row.created_at.toISOString(),
  }
}
