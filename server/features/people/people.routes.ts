import * as contracts from '../../../shared/contracts/people.contract.ts'
import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import type { Person, PersonRow } from '../../../shared/contracts/people.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import { Problem } from '../../platform/http/problem.ts'
import { route } from '../../platform/http/route.ts'
import type { Route } from '../../platform/http/route.ts'
import { receiveUpload } from '../documents/index.ts'
import type { DocumentParent, DocumentsService } from '../documents/index.ts'
import type { PeopleFilter } from './people.reads.ts'
import type { PeopleService } from './people.service.ts'

export interface PeopleQueries {
  person(id: string): Promise<Person>
  people(filter: PeopleFilter): Promise<{ rows: PersonRow[]; total: number }>
  licenceParent(personId: string, licenceId: string): Promise<DocumentParent>
  document(id: string): Promise<AttachedDocument>
}

export function peopleRoutes(
  service: PeopleService,
  documents: DocumentsService,
  queries: PeopleQueries,
): Route[] {
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
    route(contracts.correctLicence, async ({ params, body, context }) => {
      await service.correctLicence(context, params.id, params.licenceId, body)
      return queries.person(params.id)
    }),
    route(contracts.endLicence, async ({ params, body, context }) => {
      await service.endLicence(context, params.id, params.licenceId, body)
      return queries.person(params.id)
    }),
    route(contracts.attachLicenceDocument, async ({ params, context, req, res }) => {
      const parent = await queries.licenceParent(params.id, params.licenceId)
      documents.checkMayAttach(context, parent)
      const { given, file } = await receiveUpload(req, res)
      await documents.attach(context, parent, given, file)
      return queries.document(given.id)
    }),
    route(contracts.getOwnLicences, async ({ context }) => {
      const { personId } = context.actor
      if (personId === null) throw new Problem('not-signed-in')
      return { licences: (await queries.person(personId)).licences }
    }),
    route(contracts.voidLicence, async ({ params, body, context }) => {
      await service.voidLicence(context, params.id, params.licenceId, body.reason)
      return queries.person(params.id)
    }),
  ]
}
