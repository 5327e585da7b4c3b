import * as contracts from '../../../shared/contracts/exports.contract.ts'
import type { ExportRow, History } from '../../../shared/contracts/exports.contract.ts'
import { nextCursorOf, pageOf } from '../../platform/database/paging.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import { route } from '../../platform/http/route.ts'
import type { FileReply, Route } from '../../platform/http/route.ts'
import type { ExportFilter } from './exports.reads.ts'
import type { ExportsService } from './exports.service.ts'
import type { HistoryPeriod } from './read-history.ts'

export interface ExportQueries {
  history(context: RequestContext, accession: string, period: HistoryPeriod): Promise<History>
  exportOf(id: string): Promise<ExportRow>
  file(context: RequestContext, id: string): Promise<FileReply>
  exports(filter: ExportFilter): Promise<{ rows: ExportRow[]; total: number }>
}

export function exportRoutes(service: ExportsService, queries: ExportQueries): Route[] {
  return [
    route(contracts.getHistory, ({ params, query, context }) =>
      queries.history(context, params.accession, query),
    ),
    route(contracts.exportHistory, async ({ params, body, context }) => {
      await service.exportHistory(context, params.accession, body)
      return queries.exportOf(body.id)
    }),
    route(contracts.getExportFile, ({ params, context }) => queries.file(context, params.id)),
    route(contracts.listExports, async ({ query }) => {
      const page = pageOf(query)
      const { rows, total } = await queries.exports({ ...query, ...page })
      return { rows, total, nextCursor: nextCursorOf(page, total) }
    }),
  ]
}
