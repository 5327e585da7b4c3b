import type { Db } from '../../platform/database/db.ts'
import { readChangedTables } from '../../platform/audit/changed-rows.ts'
import type { SignedIn } from '../../platform/http/guard.ts'
import type { ControlledSchedule } from '../../../shared/domain/licences/controlled-agents.ts'
import { lastDayOf } from '../../../shared/domain/licences/licence-classes.ts'
import { licenceState } from '../../../shared/domain/licences/licence-state.ts'
import { signingLicence } from '../../../shared/domain/licences/signing-licence.ts'
import type { SigningAnswer } from '../../../shared/domain/licences/signing-licence.ts'
import { heldLicence, licenceNoticesOf } from './people.present.ts'
import type { HeldRow, Today } from './people.present.ts'
import { readPeople, readPerson, readSigningLocks } from './people.reads.ts'
import type { LicenceReadRow } from './people.reads.ts'

/** An institution has tens of people; more than this are not gone through. */
const mostAccounts = 1000

/** A licence that counts on the day of the act, as it stands on what is signed. */
export interface ValidLicence {
  jurisdiction: string
  number: string
  validUntil: string
}

/** As printed in a signature: with the day on which it really ends. */
export const asSigned = (licence: HeldRow): ValidLicence => ({
  jurisdiction: licence.jurisdiction,
  number: licence.number,
  validUntil: lastDayOf(licence),
})

/** Whether a licence, its end and its voiding are as the program wrote them. */
async function isAsWritten(db: Db, row: LicenceReadRow): Promise<boolean> {
  const rows: [table: string, key: string][] = [['licences', row.id]]
  if (row.end_id !== null) rows.push(['licence_ends', row.end_id])
  if (row.void_id !== null) rows.push(['licence_voids', row.void_id])
  return (await readChangedTables(db, rows)).length === 0
}

/** Narrow answers that other features and the sign-in need of people. */
export function createPeopleQuestions(parts: { dataSource: Db; todayAt(at: Date): Promise<Today> }) {
  return {
    /** The person behind a session, with the roles held at this moment; null when the account is closed or gone. */
    async signedIn(personId: string): Promise<SignedIn | null> {
      const row = await readPerson(parts.dataSource, personId)
      if (!row?.active) return null
      return {
        personId: row.id,
        printedName: row.printed_name,
        roles: row.roles,
        mustChangePassword: row.must_change_password,
      }
    },
    /**
     * A licence to practise of this person valid on the facility day of `at` for an accepted jurisdiction, the longest
     * one; or null. One that another hand changed is none to sign by.
     */
    async validLicence(personId: string, at: Date, db: Db = parts.dataSource): Promise<ValidLicence | null> {
      const row = await readPerson(db, personId)
      const today = await parts.todayAt(at)
      const valid = (row?.licences ?? [])
        .map(heldLicence)
        .find((one) => one.class === 'veterinary' && licenceState(one, today.on, today.accepted) === 'valid')
      return valid && (await isAsWritten(db, valid.row)) ? asSigned(valid) : null
    },
    /**
     * Which licence signs on the facility day of `at`, and what the person lacks. One that another hand changed counts as
     * none.
     *
     * @param asked the licence the signer chose, and the schedule of a controlled drug; null for neither
     */
    async signingLicence(
      personId: string,
      at: Date,
      asked: { chosenId: string | null; controlledSchedule: ControlledSchedule | null },
    ): Promise<SigningAnswer<HeldRow>> {
      const row = await readPerson(parts.dataSource, personId)
      const { on, accepted } = await parts.todayAt(at)
      const licences: HeldRow[] = []
      for (const licence of row?.licences ?? [])
        if (await isAsWritten(parts.dataSource, licence)) licences.push(heldLicence(licence))
      return signingLicence({ licences, on, accepted, ...asked })
    },
    /**
     * Every open account by name: roles, last sign-in, the end of the longest licence to practise valid now, and what is
     * to be said of its licences.
     */
    async accounts(at: Date) {
      const today = await parts.todayAt(at)
      const { rows } = await readPeople(parts.dataSource, { active: 'yes', offset: 0, limit: mostAccounts })
      return rows.map((row) => {
        const valid = row.licences
          .map(heldLicence)
          .find(
            (one) => one.class === 'veterinary' && licenceState(one, today.on, today.accepted) === 'valid',
          )
        return {
          personId: row.id,
          printedName: row.printed_name,
          roles: row.roles,
          lastSignInAt: row.last_sign_in_at?.toISOString() ?? null,
          createdAt: row.created_at.toISOString(),
          licenceUntil: valid ? lastDayOf(valid) : null,
          notices: licenceNoticesOf(row.licences, today),
        }
      })
    },
    /** What is to be said of one person's licences, the most pressing first. */
    async licenceNotices(personId: string, at: Date) {
      const row = await readPerson(parts.dataSource, personId)
      return licenceNoticesOf(row?.licences ?? [], await parts.todayAt(at))
    },
    /** The locks of signing since an instant, the newest first. */
    signingLocks: (since: Date) => readSigningLocks(parts.dataSource, since),
  }
}

export type PeopleQuestions = ReturnType<typeof createPeopleQuestions>
