import type { Transactions } from '../database/transactions.ts'
import { Problem } from '../http/problem.ts'
import type { RequestContext } from '../http/request-context.ts'
import type { FileStore } from './file-store.ts'

/** A file on record, as a row names it. */
export interface FileOnRecord {
  id: string
  sha256: string
  /** What it is called where people read of it. */
  label: string
}

/** Gives out kept files, and puts on record that one was found gone or altered: somebody touched the disk, not Pratique. */
export function createFileServer(parts: { files: FileStore; transactions: Transactions }) {
  return async (context: RequestContext, kind: 'document' | 'export', file: FileOnRecord) => {
    try {
      return await parts.files.read(file.sha256)
    } catch (error) {
      if (error instanceof Problem && (error.code === 'file-damaged' || error.code === 'file-gone')) {
        const { code } = error
        await parts.transactions.inTransaction(context, async (tx) =>
          tx.audit({
            action: code === 'file-gone' ? 'file.find-gone' : 'file.find-damaged',
            subject: { kind, id: file.id, label: file.label },
            after: { sha256: file.sha256 },
          }),
        )
      }
      throw error
    }
  }
}
