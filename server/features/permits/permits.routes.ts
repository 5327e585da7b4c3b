import * as contracts from '../../../shared/contracts/permits.contract.ts'
import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import type { Permit, PermitRow } from '../../../shared/contracts/permits.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { route } from '../../platform/http/route.ts'
import type { FileReply, Route } from '../../platform/http/route.ts'
import { receiveUpload } from '../documents/index.ts'
import type { DocumentParent, DocumentsService } from '../documents/index.ts'
import type { PermitFilter } from './permits.reads.ts'
import type { PermitsService } from './permits.service.ts'

export interface PermitQueries {
  permit(context: RequestContext, number: string): Promise<Permit>
  permits(filter: PermitFilter): Promise<{ rows: PermitRow[]; total: number }>
  csv(filter: Omit<PermitFilter, 'offset' | 'limit'>, guarded: boolean): Promise<FileReply>
  parent(number: string): Promise<DocumentParent>
  document(id: string): Promise<AttachedDocument>
}

export function permitRoutes(
  service: PermitsService,
  documents: DocumentsService,
  queries: PermitQueries,
): Route[] {
  return [
    route(contracts.listPermits, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.permits({ ...query, ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.listPermitsCsv, ({ query: { guarded, ...filter } }) =>
      queries.csv(filter, guarded === 'yes'),
    ),
    route(contracts.getPermit, ({ params, context }) => queries.permit(context, params.number)),
    route(contracts.enterPermit, async ({ body, context }) =>
      queries.permit(context, await service.enterPermit(context, body)),
    ),
    route(contracts.voidPermit, async ({ params, body, context }) => {
      await service.voidPermit(context, params.number, body.reason)
      return queries.permit(context, params.number)
    }),
    route(contracts.explainPermitUse, async ({ params, body, context }) => {
      await service.explainUse(context, params.number, params.useId, body.reason)
      return queries.permit(context, params.number)
    }),
    route(contracts.attachPermitDocument, async ({ params, context, req, res }) => {
      const parent = await queries.parent(params.number)
      documents.checkMayAttach(context, parent)
      const { given, file } = await receiveUpload(req, res)
      await documents.attach(context, parent, given, file)
      return queries.document(given.id)
    }),
  ]
}
