import { readFingerprint } from '../../../shared/domain/documents/read-fingerprint.ts'
import { decide, rolesThatMay } from '../../../shared/domain/permissions/decide.ts'
import { permissionWords } from '../../../shared/messages/permissions.ts'
import type { Db } from '../../platform/database/db.ts'
import type { FileStore } from '../../platform/files/file-store.ts'
import { createFileServer } from '../../platform/files/serve-kept.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { Parts } from '../../platform/parts.ts'
import { DocumentPrint, DocumentRecord, DocumentVoid } from './document.entity.ts'
import { presentDocument, presentPrints } from './documents.present.ts'
import { readDocument, readDocumentsOf, readFilesOnRecord, readPrints } from './documents.reads.ts'
import { documentRoutes } from './documents.routes.ts'
import type { DocumentQueries } from './documents.routes.ts'
import { createDocumentsService } from './documents.service.ts'
import { createOwnReaders } from './own-readers.ts'
import { createPrintStates } from './print-states.ts'

export { receiveUpload } from './documents.routes.ts'
export type { DocumentParent, DocumentsService, PrintGiven } from './documents.service.ts'
export type { AnswerForPrint, PrintState } from './print-states.ts'
export type { PrintReadRow } from './documents.reads.ts'
export const documentEntities = [DocumentRecord, DocumentVoid, DocumentPrint]

export function createDocuments(parts: Parts & { files: FileStore }) {
  const { dataSource } = parts
  const serve = createFileServer(parts)
  const service = createDocumentsService(parts)
  const prints = createPrintStates()
  const readers = createOwnReaders()
  const queries: DocumentQueries = {
    async document(id) {
      const row = await readDocument(dataSource, id)
      if (!row) throw new Problem('not-found')
      return presentDocument(row)
    },
    async file(context, id) {
      const row = await readDocument(dataSource, id)
      if (!row) throw new Problem('not-found')
      const mayRead =
        decide(row.read_action, context.actor.roles, {}).allowed ||
        (await readers.mayRead(row.parent_kind, row.parent_id, context.actor))
      if (!mayRead)
        throw new Problem('may-not', {
          detail: permissionWords.whoMay({ roles: rolesThatMay(row.read_action) }),
        })
      const body = await serve(context, 'document', { ...row, label: row.title })
      return { contentType: row.media_type, fileName: row.file_name, body }
    },
    async check(typed) {
      const read = readFingerprint(typed)
      if (!read.ok)
        throw new Problem('bad-input', {
          detail: 'Type at least the first 16 digits: 0 to 9 and A to F, as printed.',
          errors: [
            {
              pointer: '/params/fingerprint',
              detail: 'Type at least the first 16 digits: 0 to 9 and A to F, as printed.',
              code: read.refusal.code,
            },
          ],
        })
      const found = await readPrints(dataSource, read.value)
      const [newest] = found
      if (!newest)
        throw new Problem('not-found', {
          detail: 'No print with this fingerprint left this installation. Do not rely on the paper.',
        })
      if (new Set(found.map((print) => print.fingerprint)).size > 1)
        throw new Problem('fingerprint-not-unique', { detail: 'Type more of its digits.' })
      return presentPrints(found, await prints.stateOf(newest))
    },
  }
  return {
    service,
    prints,
    readers,
    /** One paper on file. */
    documentOf: queries.document,
    /** Every paper on file, also a struck one, for comparing the disk with the records. */
    filesOnRecord: () => readFilesOnRecord(dataSource),
    /** The papers of some records of one kind, by the id of the record. */
    async documentsOf(parentKind: string, parentIds: readonly string[], db: Db = dataSource) {
      const rows = parentIds.length > 0 ? await readDocumentsOf(db, parentKind, parentIds) : []
      return rows.map((row) => ({ parentId: row.parent_id, document: presentDocument(row) }))
    },
    routes: documentRoutes(service, queries),
  }
}

export type Documents = ReturnType<typeof createDocuments>
