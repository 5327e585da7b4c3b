import type { Db } from '../../platform/database/db.ts'
import { readChangedTables } from '../../platform/audit/changed-rows.ts'
import type { SignedIn } from '../../platform/http/guard.ts'
import type { FacilityService } from '../facility/index.ts'
import { presentLicence } from './people.present.ts'
import { readPeople, readPerson } from './people.reads.ts'

/** An institution has tens of people; more than this are not gone through. */
const mostAccounts = 1000

/** A licence that counts on the day of the act, as it stands on what is signed. */
export interface ValidLicence {
  jurisdiction: string
  number: string
  validUntil: string
}

/** Narrow answers that other features and the sign-in need of people. */
export function createPeopleQuestions(parts: { dataSource: Db; now(): Date; facility: FacilityService }) {
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
     * A licence of this person valid on the facility day of `at` for an accepted jurisdiction, the longest one; or null.
     * One that another hand changed is none to sign by.
     */
    async validLicence(personId: string, at: Date, db: Db = parts.dataSource) {
      const row = await readPerson(db, personId)
      const today = {
        on: await parts.facility.dateOf(at),
        accepted: await parts.facility.acceptedJurisdictions(),
      }
      const held = row?.licences ?? []
      const valid = held.find((licence) => presentLicence(licence, today).state === 'valid')
      if (valid && (await readChangedTables(db, [['licences', valid.id]])).length > 0) return null
      const found: ValidLicence | null = valid
        ? { jurisdiction: valid.jurisdiction, number: valid.number, validUntil: valid.valid_until }
        : null
      return found
    },
    /** Every open account with its roles, its last sign-in and the end of the longest licence valid now, by name. */
    async accounts(at: Date) {
      const today = {
        on: await parts.facility.dateOf(at),
        accepted: await parts.facility.acceptedJurisdictions(),
      }
      const { rows } = await readPeople(parts.dataSource, { active: 'yes', offset: 0, limit: mostAccounts })
      return rows.map((row) => {
        const valid = row.licences.find((licence) => presentLicence(licence, today).state === 'valid')
        return {
          personId: row.id,
          printedName: row.printed_name,
          roles: row.roles,
          lastSignInAt: row.last_sign_in_at?.toISOString() ?? null,
          createdAt: row.created_at.toISOString(),
          licenceUntil: valid?.valid_until ?? null,
        }
      })
    },
  }
}

export type PeopleQuestions = ReturnType<typeof createPeopleQuestions>
