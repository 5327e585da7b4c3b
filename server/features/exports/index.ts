import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { FileStore } from '../../platform/files/file-store.ts'
import { createFileServer } from '../../platform/files/serve-kept.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import type { PdfPool } from '../../platform/pdf/pdf-pool.ts'
import type { Acquisitions } from '../acquisitions/index.ts'
import type { Documents } from '../documents/index.ts'
import type { FacilityService } from '../facility/index.ts'
import { ExportRecord } from './export.entity.ts'
import { presentExport } from './exports.present.ts'
import { readExport, readExports, readFilesOnRecord } from './exports.reads.ts'
import { exportRoutes } from './exports.routes.ts'
import type { ExportQueries } from './exports.routes.ts'
import { createExportsService, historyPrintKind } from './exports.service.ts'
import { fingerprintOfHistory, readHistory } from './read-history.ts'
import type { HistoryPeriod } from './read-history.ts'

export type { ExportsService } from './exports.service.ts'
export const exportEntities = [ExportRecord]

export function createExports(
  parts: Parts & {
    facility: FacilityService
    acquisitions: Acquisitions
    documents: Documents
    files: FileStore
    pdf: PdfPool
  },
) {
  const { dataSource, clock, documents } = parts
  const serve = createFileServer(parts)
  const service = createExportsService(parts)
  const now = () => clock.now().toISOString()

  documents.prints.answerFor(historyPrintKind, async (print) => {
    const { accession, from, until } = JSON.parse(print.subject_id) as {
      accession: string
      from: string | null
      until: string | null
    }
    const period: HistoryPeriod = { from: from ?? undefined, until: until ?? undefined }
    const content = await readHistory(parts, accession, period, now())
    return fingerprintOfHistory(content) === print.fingerprint
      ? { state: 'current', now: null }
      : { state: 'changed', now: String(content.events.length) }
  })

  async function rowOf(id: string) {
    const row = await readExport(dataSource, id)
    if (!row) throw new Problem('not-found')
    return row
  }
  const queries: ExportQueries = {
    async history(context, accession, period) {
      const asOf = now()
      const content = await readHistory(parts, accession, period, asOf)
      const mayExport = decide('history.export', context.actor.roles, {}).allowed
      return {
        ...content,
        fingerprint: fingerprintOfHistory(content),
        asOf,
        may: mayExport ? ['history.export'] : [],
      }
    },
    exportOf: async (id) => presentExport(await rowOf(id)),
    async file(context, id) {
      const row = await rowOf(id)
      const body = await serve(context, 'export', { ...row, label: row.file_name })
      return { contentType: row.media_type, fileName: row.file_name, body }
    },
    async exports(filter) {
      const { rows, total } = await readExports(dataSource, filter)
      return { rows: rows.map(presentExport), total }
    },
  }
  /** Every export on record, for comparing the disk with the records. */
  const filesOnRecord = () => readFilesOnRecord(dataSource)
  return { service, filesOnRecord, routes: exportRoutes(service, queries) }
}

export type Exports = ReturnType<typeof createExports>
