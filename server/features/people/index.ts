import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import { createOwnPassword } from '../../platform/sign-in/own-password.ts'
import { createSigningLock } from '../../platform/sign-in/signing-lock.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { presentPerson, presentPersonRow } from './people.present.ts'
import type { PapersOf, Today } from './people.present.ts'
import { createPeopleQuestions } from './people.questions.ts'
import {
  countPeople,
  readCredentials,
  readLicenceHolder,
  readPasswordHash,
  readPeople,
  readPerson,
} from './people.reads.ts'
import type { LicenceReadRow } from './people.reads.ts'
import { peopleRoutes } from './people.routes.ts'
import type { PeopleQueries } from './people.routes.ts'
import { createPeopleService } from './people.service.ts'
import { LicenceEnd, LicenceRecord, LicenceVoid, Person, PersonRole } from './person.entity.ts'

export type { PeopleService } from './people.service.ts'
export { asSigned } from './people.questions.ts'
export type { PeopleQuestions, ValidLicence } from './people.questions.ts'
export const peopleEntities = [Person, PersonRole, LicenceRecord, LicenceEnd, LicenceVoid]

export function createPeople(parts: Parts & { facility: FacilityService; documents: Documents }) {
  const { dataSource, facility, clock, documents } = parts
  const ownPassword = createOwnPassword({
    signingLock: createSigningLock(parts),
    clock,
    readPasswordHash: (id) => readPasswordHash(dataSource, id),
  })
  const service = createPeopleService({ ...parts, ownPassword })
  const todayAt = async (now: Date): Promise<Today> => ({
    now,
    on: await facility.dateOf(now),
    accepted: await facility.acceptedJurisdictions(),
    warningDays: {
      first: Number(await facility.valueOf('licences.warn-first-days')),
      second: Number(await facility.valueOf('licences.warn-second-days')),
      last: Number(await facility.valueOf('licences.warn-last-days')),
    },
  })
  const questions = createPeopleQuestions({ dataSource, todayAt })
  const today = () => todayAt(clock.now())

  async function papersOf(licences: readonly LicenceReadRow[]): Promise<PapersOf> {
    const papers = await documents.documentsOf(
      'licence',
      licences.map(({ id }) => id),
    )
    return (licenceId) =>
      papers.filter(({ parentId }) => parentId === licenceId).map(({ document }) => document)
  }
  // everybody reads the papers of their own licences
  documents.readers.alsoReads(
    'licence',
    async (licenceId, { personId }) =>
      personId !== null && (await readLicenceHolder(dataSource, licenceId)) === personId,
  )

  const queries: PeopleQueries = {
    async person(id) {
      const row = await readPerson(dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentPerson(row, await today(), await papersOf(row.licences))
    },
    async people(filter) {
      const { rows, total } = await readPeople(dataSource, filter)
      const day = await today()
      return { rows: rows.map((row) => presentPersonRow(row, day)), total }
    },
    async licenceParent(personId, licenceId) {
      const row = await readPerson(dataSource, personId)
      const licence = row?.licences.find(({ id }) => id === licenceId)
      if (!row || !licence) throw new Problem('not-found')
      return {
        kind: 'licence',
        id: licence.id,
        label: `${row.printed_name}, ${licence.jurisdiction} ${licence.number}`,
        readAction: 'people.manage',
        writeAction: 'people.manage',
      }
    },
    document: documents.documentOf,
  }
  return {
    service,
    questions,
    queries,
    /** One person without the papers of their licences: as often as a page asks who is signed in. */
    async personAsSignedIn(id: string) {
      const row = await readPerson(dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentPerson(row, await today())
    },
    readPreferences: async (id: string) => (await readPerson(dataSource, id))?.preferences ?? {},
    readCredentials: (email: string) => readCredentials(dataSource, email),
    ownPassword,
    countPeople: () => countPeople(dataSource),
    routes: peopleRoutes(service, documents.service, queries),
  }
}

export type People = ReturnType<typeof createPeople>
