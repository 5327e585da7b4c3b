import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import type { Licence, Person, PersonRow } from '../../../shared/contracts/people.contract.ts'
import { lastDayOf } from '../../../shared/domain/licences/licence-classes.ts'
import type { HeldLicence } from '../../../shared/domain/licences/licence-classes.ts'
import { licenceNotices } from '../../../shared/domain/licences/licence-notices.ts'
import { licenceState } from '../../../shared/domain/licences/licence-state.ts'
import type { WarningDays } from '../../../shared/domain/licences/licence-warning.ts'
import type { LicenceReadRow, PersonReadRow } from './people.reads.ts'

/** The facility's day, what it accepts and when it warns: what is said of a licence depends on them. */
export interface Today {
  now: Date
  on: string
  accepted: readonly string[]
  warningDays: WarningDays
}

/** Papers of licences, by the id of the licence. */
export type PapersOf = (licenceId: string) => AttachedDocument[]
const noPapers: PapersOf = () => []

export interface HeldRow extends HeldLicence {
  row: LicenceReadRow
}

/** A stored licence as the engine looks at it. */
export const heldLicence = (row: LicenceReadRow): HeldRow => ({
  id: row.id,
  class: row.class,
  jurisdiction: row.jurisdiction,
  number: row.number,
  validFrom: row.valid_from,
  validUntil: row.valid_until,
  endedOn: row.ended_on,
  void: row.voided_reason !== null,
  superseded: row.superseded,
  row,
})

export const licenceNoticesOf = (rows: readonly LicenceReadRow[], today: Today) =>
  licenceNotices(rows.map(heldLicence), today.on, today.accepted, today.warningDays)

export function presentLicences(
  rows: readonly LicenceReadRow[],
  today: Today,
  papersOf: PapersOf = noPapers,
): Licence[] {
  const notices = licenceNoticesOf(rows, today)
  return rows.map((row) => {
    const notice = notices.find(({ licence }) => licence.id === row.id)
    return {
      id: row.id,
      class: row.class,
      jurisdiction: row.jurisdiction,
      number: row.number,
      validFrom: row.valid_from,
      validUntil: row.valid_until,
      state: licenceState(heldLicence(row), today.on, today.accepted),
      lastDay: lastDayOf(heldLicence(row)),
      warning: notice ? { level: notice.level, daysLeft: notice.daysLeft } : null,
      ended:
        row.ended_on === null
          ? null
          : {
              on: row.ended_on,
              reason: row.ended_reason ?? '',
              by: row.ended_by_name ?? '',
              at: new Date(row.ended_at ?? row.recorded_at).toISOString(),
            },
      supersedesId: row.supersedes_id,
      reason: row.reason,
      documents: papersOf(row.id),
      voidedReason: row.voided_reason,
      recordedAt: new Date(row.recorded_at).toISOString(),
      recordedBy: row.recorded_by_name ?? '',
    }
  })
}

export function presentPersonRow(row: PersonReadRow, today: Today): PersonRow {
  const states = row.licences
    .filter((licence) => licence.class === 'veterinary')
    .map((licence) => licenceState(heldLicence(licence), today.on, today.accepted))
  const lockedUntil = row.signing_locked_until
  const [notice] = licenceNoticesOf(row.licences, today)
  return {
    id: row.id,
    email: row.email,
    printedName: row.printed_name,
    roles: row.roles,
    active: row.active,
    mustChangePassword: row.must_change_password,
    licenceState: states.includes('valid')
      ? 'valid'
      : states.some((state) => state !== 'void' && state !== 'superseded')
        ? 'not-valid'
        : 'none',
    licenceNotice: notice
      ? {
          class: notice.licence.class,
          number: notice.licence.number,
          jurisdiction: notice.licence.jurisdiction,
          level: notice.level,
          daysLeft: notice.daysLeft,
          lastDay: notice.lastDay,
        }
      : null,
    lastSignInAt: row.last_sign_in_at?.toISOString() ?? null,
    signingLockedUntil: lockedUntil !== null && lockedUntil > today.now ? lockedUntil.toISOString() : null,
    version: row.version,
  }
}

export function presentPerson(row: PersonReadRow, today: Today, papersOf: PapersOf = noPapers): Person {
  return {
    ...presentPersonRow(row, today),
    licences: presentLicences(row.licences, today, papersOf),
    createdAt: row.created_at.toISOString(),
  }
}
