import * as contracts from '../../../shared/contracts/people.contract.ts'
import type { Person, PersonRow } from '../../../shared/contracts/people.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import type { PeopleFilter } from './people.reads.ts'
import type { PeopleService } from './people.service.ts'

export interface PeopleQueries {
  person(id: string): Promise<Person>
  people(filter: PeopleFilter): Promise<{ rows: PersonRow[]; total: number }>
}

export function peopleRoutes(service: PeopleService, queries: PeopleQueries): Route[] {
  return [
    route(contracts.listPeople, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.people({ ...query, ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.getPerson, ({ params }) => queries.person(params.id)),
    route(contracts.enterPerson, async ({ body, context }) => {
      const { oneTimePassword } = await service.enterPerson(context, body)
      return { ...(await queries.person(body.id)), oneTimePassword }
    }),
    route(contracts.correctPerson, async ({ params, body, context }) => {
      await service.correctPerson(context, params.id, body)
      return queries.person(params.id)
    }),
    route(contracts.issueOneTimePassword, ({ params, context }) =>
      service.issueOneTimePassword(context, params.id),
    ),
    route(contracts.enterLicence, async ({ params, body, context }) => {
      await service.enterLicence(context, params.id, body)
      return queries.person(params.id)
    }),
    route(contracts.voidLicence, async ({ params, body, context }) => {
      await service.voidLicence(context, params.id, params.licenceId, body.reason)
      return queries.person(params.id)
    }),
  ]
}
