import * as contracts from '../../../shared/contracts/acquisitions.contract.ts'
import type { Transaction, TransactionRow } from '../../../shared/contracts/acquisitions.contract.ts'
import type { AttachedDocument } from '../../../shared/contracts/documents.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { route } from '../../platform/http/route.ts'
import type { FileReply, Route } from '../../platform/http/route.ts'
import { receiveUpload } from '../documents/index.ts'
import type { DocumentParent, DocumentsService } from '../documents/index.ts'
import type { AcquisitionsService } from './acquisitions.service.ts'
import type { TransactionFilter } from './transaction-list.reads.ts'

export interface TransactionQueries {
  transaction(context: RequestContext, number: string): Promise<Transaction>
  transactions(filter: TransactionFilter): Promise<{ rows: TransactionRow[]; total: number }>
  csv(filter: Omit<TransactionFilter, 'offset' | 'limit'>, guarded: boolean): Promise<FileReply>
  parent(number: string): Promise<DocumentParent>
  document(id: string): Promise<AttachedDocument>
}

export function acquisitionRoutes(
  service: AcquisitionsService,
  documents: DocumentsService,
  queries: TransactionQueries,
): Route[] {
  return [
    route(contracts.listTransactions, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.transactions({ ...query, ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
    route(contracts.listTransactionsCsv, ({ query: { guarded, ...filter } }) =>
      queries.csv(filter, guarded === 'yes'),
    ),
    route(contracts.getTransaction, ({ params, context }) => queries.transaction(context, params.number)),
    route(contracts.recordAcquisition, async ({ body, context }) =>
      queries.transaction(context, await service.recordAcquisition(context, body)),
    ),
    route(contracts.recordDisposition, async ({ body, context }) =>
      queries.transaction(context, await service.recordDisposition(context, body)),
    ),
    route(contracts.voidTransaction, async ({ params, body, context }) => {
      await service.voidTransaction(context, params.number, body.reason)
      return queries.transaction(context, params.number)
    }),
    route(contracts.attachTransactionDocument, async ({ params, context, req, res }) => {
      const parent = await queries.parent(params.number)
      documents.checkMayAttach(context, parent)
      const { given, file } = await receiveUpload(req, res)
      await documents.attach(context, parent, given, file)
      return queries.document(given.id)
    }),
  ]
}
