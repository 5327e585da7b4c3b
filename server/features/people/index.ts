import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { Lockout } from '../../platform/sign-in/lockout.ts'
import { createOwnPassword } from '../../platform/sign-in/own-password.ts'
import type { FacilityService } from '../facility/index.ts'
import { presentPerson, presentPersonRow } from './people.present.ts'
import { createPeopleQuestions } from './people.questions.ts'
import { countPeople, readCredentials, readPasswordHash, readPeople, readPerson } from './people.reads.ts'
import { peopleRoutes } from './people.routes.ts'
import type { PeopleQueries } from './people.routes.ts'
import { createPeopleService } from './people.service.ts'
import { LicenceRecord, LicenceVoid, Person, PersonRole } from './person.entity.ts'

export type { PeopleService } from './people.service.ts'
export type { PeopleQuestions, ValidLicence } from './people.questions.ts'
export const peopleEntities = [Person, PersonRole, LicenceRecord, LicenceVoid]

export function createPeople(parts: Parts & { facility: FacilityService; lockout: Lockout }) {
  const { dataSource, facility, clock } = parts
  const ownPassword = createOwnPassword({
    lockout: parts.lockout,
    readPasswordHash: (id) => readPasswordHash(dataSource, id),
  })
  const service = createPeopleService({ ...parts, ownPassword })
  const questions = createPeopleQuestions({ dataSource, facility, now: () => clock.now() })
  const today = async () => ({
    on: await facility.dateOf(clock.now()),
    accepted: await facility.acceptedJurisdictions(),
  })
  const queries: PeopleQueries = {
    async person(id) {
      const row = await readPerson(dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentPerson(row, await today())
    },
    async people(filter) {
      const { rows, total } = await readPeople(dataSource, filter)
      const day = await today()
      return { rows: rows.map((row) => presentPersonRow(row, day)), total }
    },
  }
  return {
    service,
    questions,
    queries,
    readPreferences: async (id: string) => (await readPerson(dataSource, id))?.preferences ?? {},
    readCredentials: (email: string) => readCredentials(dataSource, email),
    ownPassword,
    countPeople: () => countPeople(dataSource),
    routes: peopleRoutes(service, queries),
  }
}

export type People = ReturnType<typeof createPeople>
