import type { UploadFields } from '../../../shared/contracts/documents.contract.ts'
import { decide } from '../../../shared/domain/permissions/decide.ts'
import type { Action } from '../../../shared/domain/permissions/table.ts'
import type { Transactions, Tx } from '../../platform/database/transactions.ts'
import type { FileStore } from '../../platform/files/file-store.ts'
import type { ReceivedFile } from '../../platform/files/receive-file.ts'
import { Problem } from '../../platform/http/problem.ts'
import type { RequestContext } from '../../platform/http/request-context.ts'
import type { Ids } from '../../platform/ids.ts'
import * as repository from './documents.repository.ts'

/** The record that a paper belongs to, as its own feature names it. */
export interface DocumentParent {
  kind: string
  id: string
  label: string
  /** The right that opens the record; it opens its papers too. */
  readAction: Action
  /** The right to change the record; whoever has it may attach papers. */
  writeAction: Action
}

/** A printing to be found again by the fingerprint on the paper. */
export interface PrintGiven {
  /** SHA-256 of the record's canonical text, 64 hexadecimal digits. */
  fingerprint: string
  /** Kind of document, for example `treatment-order` */
  kind: string
  subjectId: string
  subjectLabel: string
  /** Version of the record as printed. */
  version: string
}

export interface DocumentsParts {
  transactions: Transactions
  ids: Ids
  files: FileStore
}

export function createDocumentsService(parts: DocumentsParts) {
  /** Refuses whoever may not write the record that a paper belongs to. */
  function checkMayAttach(context: RequestContext, parent: Pick<DocumentParent, 'writeAction'>): void {
    const mayWrite = decide(parent.writeAction, context.actor.roles, {}).allowed
    if (!decide('document.attach', context.actor.roles, { 'may-write-parent': mayWrite }).allowed)
      throw new Problem('may-not', { detail: 'Whoever may change this record may attach papers to it.' })
  }

  return {
    checkMayAttach,

    /** Keeps a file and attaches it to a record. The same paper sent again changes nothing. */
    async attach(
      context: RequestContext,
      parent: DocumentParent,
      given: UploadFields,
      file: ReceivedFile,
    ): Promise<void> {
      checkMayAttach(context, parent)
      // First the file, then the row that names it: a file without a row harms nobody, a row without a file does
      const kept = await parts.files.keep(file.content)
      await parts.transactions.inTransaction(context, async (tx) => {
        const { created } = await repository.insertDocument(tx, {
          id: given.id,
          parentKind: parent.kind,
          parentId: parent.id,
          readAction: parent.readAction,
          writeAction: parent.writeAction,
          title: given.title,
          kind: given.kind,
          fileName: file.name,
          mediaType: file.type,
          bytes: kept.bytes,
          sha256: kept.sha256,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        if (!created) return
        tx.audit({
          action: 'document.attach',
          subject: { kind: parent.kind, id: parent.id, label: parent.label },
          after: { ...given, fileName: file.name, mediaType: file.type, ...kept },
        })
      })
    },

    async voidDocument(context: RequestContext, id: string, reason: string): Promise<void> {
      await parts.transactions.inTransaction(context, async (tx) => {
        const document = await repository.findDocument(tx, id)
        if (!document) throw new Problem('not-found')
        checkMayAttach(context, document)
        if (await repository.isVoided(tx, id)) throw new Problem('already-voided')
        await repository.insertDocumentVoid(tx, {
          id: parts.ids.next(),
          documentId: id,
          reason,
          recordedAt: tx.at,
          recordedBy: tx.actor.personId,
        })
        tx.audit({
          action: 'document.void',
          subject: { kind: document.parentKind, id: document.parentId, label: document.title },
          before: { id, sha256: document.sha256 },
          after: { reason },
        })
      })
    },

    /** Notes that a record was printed, so that `/check` finds the paper again by its fingerprint. */
    async registerPrint(tx: Tx, given: PrintGiven): Promise<void> {
      await repository.insertPrint(tx, {
        id: parts.ids.next(),
        ...given,
        printedBy: tx.actor.personId,
        printedByName: tx.actor.printedName,
        printedAt: tx.at,
      })
    },
  }
}

export type DocumentsService = ReturnType<typeof createDocumentsService>
